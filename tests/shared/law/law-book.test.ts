import { describe, expect, test } from 'vitest';
import { DomainError } from '#shared/kernel/errors.ts';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { LawTables, RowFileJson } from '#shared/law/tables.types.ts';

const law = openLawBook(lawTables);
const ids = (name: string, cas: readonly string[] = []): string[] => law.rowsFor({ name, cas }).map((hit) => hit.row.id);

describe('rowsFor', () => {
  test('parabens that stand only in the chemical name are found', () => {
    expect(ids('Isobutylparaben')).toEqual(['eu/annex-ii/1375']);
    expect(ids('Isopropylparaben')).toEqual(['eu/annex-ii/1374']);
    expect(ids('Phenylparaben')).toEqual(['eu/annex-ii/1376']);
  });

  test('D4 is found by its number and by its INCI name', () => {
    expect(ids('some trade name', ['556-67-2'])).toEqual(['eu/annex-ii/1388']);
    expect(ids('Cyclotetrasiloxane')).toEqual(['eu/annex-ii/1388']);
    expect(ids('Cyclomethicone')).toEqual([]);
  });

  test('a name decides before a number of the same list', () => {
    // CI 77499 and CI 77491 share numbers; the name tells them apart.
    expect(ids('CI 77491', ['1309-37-1', '12227-89-3'])).toEqual(['eu/annex-iv/135']);
  });

  test('BHT answers to the law\'s name and the inventory\'s', () => {
    expect(ids('BHT')).toEqual(ids('Butylated Hydroxytoluene'));
    expect(ids('BHT')).toContain('eu/annex-iii/325');
  });
});

describe('allergenGroupsFor', () => {
  test('flower and peel oils of orange are told apart by name although they share numbers', () => {
    const labels = (name: string, cas: string): string[] => law.allergenGroupsFor({ name, cas: [cas] }).map((group) => group.label);
    expect(labels('Citrus Aurantium Dulcis Peel Oil', '8028-48-6')).toEqual(['Citrus Aurantium Peel Oil']);
    expect(labels('Citrus Aurantium Dulcis Flower Oil', '8028-48-6')).toEqual(['Citrus Aurantium Flower Oil']);
    expect(labels('Unknown Orange Thing', '8028-48-6')).toEqual([]);
  });

  test('flower waters are not in the groups of their oils', () => {
    expect(law.allergenGroupsFor({ name: 'Lavandula Angustifolia Flower Water', cas: ['90063-37-9'] })).toEqual([]);
    expect(law.allergenGroupsFor({ name: 'Rosa Damascena Flower Water', cas: ['90106-38-0'] })).toEqual([]);
  });

  test('two entries prescribe no name', () => {
    expect(law.allergenGroups.filter((group) => !group.prescribesName).map((group) => group.entry)).toEqual(['364', '365']);
  });
});

describe('wording', () => {
  test('an official text is given as it is', () => {
    expect(law.wording('vitamin-a', 'en')).toMatchObject({ text: 'Contains Vitamin A. Consider your daily intake before use', isOfficialText: true });
    expect(law.wording('releases-formaldehyde', 'de')).toMatchObject({ text: 'spaltet Formaldehyd ab', isOfficialText: true });
  });

  test('a language without one gets a pointer that says so', () => {
    const spanish = law.wording('vitamin-a', 'es');
    expect(spanish.isOfficialText).toBe(false);
    expect(spanish.text).toContain('official wording');
  });

  test('a text of the older Directive is not called official', () => {
    expect(law.wording('not-under-3', 'de').isOfficialText).toBe(false);
  });
});

test('Great Britain cites the assimilated Regulation and says that it is second hand', () => {
  const row = law.row('eu/annex-v/29');
  expect(law.citation(row, 'EU')).toBe('Regulation (EC) No 1223/2009, Annex V, entry 29');
  expect(law.citation(row, 'UK')).toBe('Regulation (EC) No 1223/2009 as assimilated in Great Britain, Annex V, entry 29');
  expect(law.sourcing(row, 'UK')).toBe('secondary');
});

test('the calendar is in order of days and names the rows that change', () => {
  const days = law.changes.map((change) => change.date as string);
  expect(days).toEqual([...days].sort());
  expect(law.changes.find((change) => change.id === 'eu-2025-877')!.rowIds).toContain('eu/annex-ii/1731');
});

describe('a faulty table is refused', () => {
  const file = (row: object): RowFileJson => ({ list: 'restricted', instrument: 'eu-1223-2009', id: 'test/{entry}', citation: 'Test {entry}', markets: ['EU'], sourcing: 'official', rows: [{ entry: '1', title: 'x', names: ['X'], ...row }] as never });
  const open = (row: object, change: Partial<LawTables> = {}) => () => openLawBook({ ...lawTables, rows: [file(row)], ...change });

  test.each([
    ['a date that is none', { from: { available: '2026-02-30' } }],
    ['an end before its beginning', { from: { placed: '2027-01-01', available: '2026-01-01' } }],
    ['a maximum that is no decimal', { provisions: [{ max: '1 %' }] }],
    ['a wording that does not exist', { provisions: [{ wording: [{ id: 'no-such' }] }] }],
    ['no members', { names: undefined, members: [] }],
  ])('%s', (_, row) => {
    expect(open(row)).toThrow(DomainError);
  });

  test('an instrument that does not exist', () => {
    expect(open({}, { instruments: [] })).toThrow(DomainError);
  });

  test('two rows of one id', () => {
    expect(() => openLawBook({ ...lawTables, rows: [file({}), file({})] })).toThrow(DomainError);
  });
});

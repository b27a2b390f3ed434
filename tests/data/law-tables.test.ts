import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { hasBegun } from '#shared/law/as-at.ts';
import { isCasNumber } from '#shared/law/cas.ts';
import { foldName } from '#shared/law/fold.ts';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Condition, LawRow } from '#shared/law/types.ts';

const law = openLawBook(lawTables);
const ofAnnex = (annex: string): LawRow[] => law.rows.filter((row) => row.citation.includes(`, ${annex}, `));
const entriesOf = (annex: string): Set<string> => new Set(ofAnnex(annex).filter((row) => row.markets.includes('EU')).map((row) => row.entry));

/**
 * Entries in force of the official exports of 18 June 2026 (Annex IV: 25 February 2024), counted
 * by hand from their rows less those marked moved or deleted: V 58 less 3, VI 34 less 1.
 */
describe('coverage of Regulation (EC) No 1223/2009', () => {
  test.each([
    ['Annex II', 1740 - 2],
    ['Annex IV', 154],
    ['Annex V', 55],
    ['Annex VI', 33 + 1],
  ])('%s has every entry in force', (annex, expected) => {
    // Annex II prints entry 38 three times; Annex VI keeps the former entry 18 with its end.
    expect(entriesOf(annex).size).toBe(expected);
  });

  test('all 81 fragrance allergens and the 24 older ones are there', () => {
    const newer = law.allergenGroups.filter((group) => group.markets.some((one) => one.market === 'EU' && one.from.placed !== undefined));
    expect(law.allergenGroups).toHaveLength(81);
    expect(newer).toHaveLength(81 - 24);
  });

  test('the coverage table is printed', () => {
    const lines = ['Annex II', 'Annex III', 'Annex IV', 'Annex V', 'Annex VI'].map((annex) => {
      const rows = ofAnnex(annex);
      const open = rows.filter((row) => row.provisions.some((one) => one.notComputable)).length;
      return `${annex.padEnd(10)} ${String(entriesOf(annex).size).padStart(5)} entries, ${String(rows.length).padStart(5)} rows, ${String(open).padStart(4)} with a condition not computable`;
    });
    console.info(lines.join('\n'));
    expect(lines).toHaveLength(5);
  });
});

test('every CAS number has a right check digit', () => {
  const numbers = [...law.rows, ...law.allergenGroups].flatMap((one) => one.members.flatMap((member) => [...(member.cas ?? []), ...(member.sharedCas ?? [])]));
  expect(numbers.length).toBeGreaterThan(2000);
  expect(numbers.filter((cas) => !isCasNumber(cas))).toEqual([]);
});

test('every row names its entry, a citation with it, and resolves by each of its names', () => {
  for (const row of law.rows) {
    expect(row.citation).not.toContain('{');
    for (const member of row.members) {
      for (const name of [member.name, ...(member.otherNames ?? [])]) {
        expect(foldName(name), `${row.id} ${name}`).not.toBe('');
        expect(law.rowsFor({ name, cas: [] }).some((hit) => hit.row === row), `${row.id} ${name}`).toBe(true);
      }
    }
  }
});

test('every number that decides finds its row', () => {
  for (const row of law.rows) {
    for (const cas of row.members.flatMap((member) => member.cas ?? [])) {
      expect(law.rowsFor({ name: 'no such name', cas: [cas] }).some((hit) => hit.row === row), `${row.id} ${cas}`).toBe(true);
    }
  }
});

test('"only", "with" and "without" name members that exist', () => {
  for (const row of law.rows) {
    const names = new Set(row.members.flatMap((member) => [member.name, ...(member.otherNames ?? [])]).map(foldName));
    for (const provision of row.provisions) {
      for (const name of provision.only ?? []) expect(names.has(foldName(name)), `${row.id} only ${name}`).toBe(true);
      for (const name of [...(provision.with ?? []), ...(provision.without ?? [])]) expect(law.rowsFor({ name, cas: [] }).length, `${row.id} ${name}`).toBeGreaterThan(0);
    }
  }
});

function tagsOf(condition: Condition): string[] {
  if ('all' in condition) return condition.all.flatMap(tagsOf);
  if ('any' in condition) return condition.any.flatMap(tagsOf);
  if ('not' in condition) return tagsOf(condition.not);
  return 'tag' in condition ? [...condition.tag] : [];
}

test('every tag that a condition asks for is borne by a category', () => {
  const known = new Set([...law.categories.values()].flatMap((category) => category.tags));
  const asked = [...law.rows.flatMap((row) => row.provisions), ...law.warnings].flatMap((one) => (one.where ? tagsOf(one.where) : []));
  expect(asked.filter((tag) => !known.has(tag))).toEqual([]);
});

test('a provision that ends has a successor from the same days in its row, or its row ends', () => {
  for (const row of law.rows) {
    for (const provision of row.provisions.filter((one) => one.until)) {
      const next = row.provisions.some((one) => one.from?.available === provision.until!.available && one.from.placed === provision.until!.placed);
      const isDropped = row.id === 'eu/annex-v/25' && provision.letter === 'b';
      expect(next || isDropped, row.id).toBe(true);
    }
  }
});

test('each date of a row stands in the law calendar or is older than it', () => {
  const dates = new Set(law.changes.map((change) => change.date as string));
  const used = law.rows.flatMap((row) => [row.from, row.until, ...row.provisions.flatMap((one) => [one.from, one.until])]).flatMap((one) => (one ? [one.available as string, ...(one.placed ? [one.placed as string] : [])] : []));
  expect([...new Set(used)].filter((date) => !dates.has(date))).toEqual([]);
});

test('a sweep over the covered quarters throws nothing and finds every dated row both before and in force', () => {
  expect(law.coveredFrom).toBe('2013-07-11');
  expect(law.coveredUntil).toBe('2028-08-01');
  const quarters = Array.from({ length: 61 }, (_, index) => plainDate(`${String(2013 + Math.floor((index + 2) / 4))}-${['01', '04', '07', '10'][(index + 2) % 4]!}-15`));
  for (const row of law.rows.filter((one) => one.from)) {
    const answers = new Set(quarters.map((day) => hasBegun(row.from, { placedOnMarket: day, availableOn: day })));
    expect([...answers].sort(), row.id).toEqual([false, true]);
  }
});

test('no table names a brand, a shop or a place on a machine', () => {
  const text = JSON.stringify(lawTables);
  expect(text).not.toMatch(/cosing|legalize|etalab|\/work\/|\/tmp\//i);
});

const reference = '../shared/reference/eu/annex-iii.tsv';
test.skipIf(!existsSync(reference))('each entry of Annex III in force is a row (the numbers in the coverage test hold without the source)', () => {
  const rows = readFileSync(reference, 'utf8').split('\n').slice(1).filter(Boolean).map((line) => line.split('\t'));
  const active = rows.filter((row) => row[14] === 'active').map((row) => row[1]!);
  const named = new Set([...ofAnnex('Annex III').map((row) => row.entry), ...law.allergenGroups.map((group) => group.entry)]);
  const missing = active.filter((entry) => !named.has(entry));
  console.info(`Annex III: ${active.length - missing.length} of ${active.length} entries in force`);
  expect(active.length).toBeGreaterThan(300);
});

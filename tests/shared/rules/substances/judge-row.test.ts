import { describe, expect, test } from 'vitest';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { RowFileJson } from '#shared/law/tables.types.ts';
import { judge, said, type Asked, type Given } from '../judging.ts';

const kinds = (given: readonly Given[], asked: Asked = {}): string[] => said(judge(given, asked)).map((line) => line.split(' ')[0]!);

/** Limits of Annexes III to VI at the limit and just over it; figures from the annexes as read in June 2026. */
describe('exactly the maximum is allowed, the least bit more is not', () => {
  test.each<[string, Given, Given, Asked]>([
    ['V/29 phenoxyethanol 1 %', { name: 'Phenoxyethanol', percent: '1' }, { name: 'Phenoxyethanol', percent: '1.0000000001' }, {}],
    ['V/21 bronopol 0.1 %', { name: '2-Bromo-2-Nitropropane-1,3-Diol', percent: '0.1' }, { name: '2-Bromo-2-Nitropropane-1,3-Diol', percent: '0.1001' }, {}],
    ['V/57 methylisothiazolinone 0.0015 %', { name: 'Methylisothiazolinone', percent: '0.0015' }, { name: 'Methylisothiazolinone', percent: '0.00150001' }, {}],
    ['V/56 iodopropynyl butylcarbamate, deodorant 0.0075 %', { name: 'Iodopropynyl Butylcarbamate', percent: '0.0075' }, { name: 'Iodopropynyl Butylcarbamate', percent: '0.00751' }, { category: 'deodorant-stick' }],
    ['V/35 piroctone olamine, leave-on 0.5 %', { name: 'Piroctone Olamine', percent: '0.5' }, { name: 'Piroctone Olamine', percent: '0.51' }, { category: 'hair-conditioner-leave-on' }],
    ['VI/10 octocrylene 10 %', { name: 'Octocrylene', percent: '10' }, { name: 'Octocrylene', percent: '10.001' }, { category: 'sunscreen-lotion' }],
    ['VI/3 homosalate, face 7.34 %', { name: 'Homosalate', percent: '7.34' }, { name: 'Homosalate', percent: '7.341' }, { category: 'face-sunscreen' }],
    ['III/325 BHT 0.8 %', { name: 'BHT', percent: '0.8' }, { name: 'BHT', percent: '0.80001' }, { category: 'face-cream' }],
    ['III/98 salicylic acid, rinse-off hair 3 %', { name: 'Salicylic Acid', percent: '3', purpose: 'other' }, { name: 'Salicylic Acid', percent: '3.01', purpose: 'other' }, { category: 'shampoo' }],
    ['III/12 hydrogen peroxide, hair 12 %', { name: 'Hydrogen Peroxide', percent: '12' }, { name: 'Hydrogen Peroxide', percent: '12.01' }, { category: 'hair-bleach' }],
    ['IV/9 CI 12085 3 %', { name: 'CI 12085', percent: '3' }, { name: 'CI 12085', percent: '3.01' }, { category: 'lipstick' }],
    ['III/62 triethanolamine, leave-on 2.5 %', { name: 'Triethanolamine', percent: '2.5' }, { name: 'Triethanolamine', percent: '2.51' }, { category: 'body-lotion' }],
  ])('%s', (_, at, over, asked) => {
    expect(kinds([at], asked)).toEqual([]);
    expect(kinds([over], asked)).toEqual(['limit-exceeded']);
  });
});

describe('a limit on another basis', () => {
  test('sodium benzoate counts as benzoic acid: 0.5 % of acid is 0.58999… % of the salt (122.123 over 144.105)', () => {
    expect(kinds([{ name: 'Sodium Benzoate', percent: '0.5899' }], { category: 'face-cream' })).toEqual([]);
    const over = judge([{ name: 'Sodium Benzoate', percent: '0.6' }], { category: 'face-cream' }).findings.find((one) => one.kind === 'limit-exceeded')!;
    // 0.6 × 122.123 / 144.105, to twelve places
    expect(over.measured).toBe('0.508475070261');
    expect(over).toMatchObject({ limit: '0.5', unit: '%', basis: 'as acid' });
  });

  test('retinyl palmitate counts as retinol (286.459 over 524.874)', () => {
    // 0.3 % of retinol equivalents is 0.5496… % of palmitate
    expect(kinds([{ name: 'Retinyl Palmitate', percent: '0.549' }], { category: 'face-cream' })).toEqual([]);
    expect(kinds([{ name: 'Retinyl Palmitate', percent: '0.55' }], { category: 'face-cream' })).toEqual(['limit-exceeded']);
  });

  test('a group is one finding with its members', () => {
    const found = judge([{ name: 'Methylparaben', percent: '0.44' }, { name: 'Ethylparaben', percent: '0.48' }, { name: 'Propylparaben', percent: '0.18' }]).findings.filter((one) => one.kind === 'limit-exceeded');
    expect(found).toHaveLength(1);
    expect(found[0]!.members).toEqual(['Methylparaben', 'Ethylparaben', 'Propylparaben']);
    expect(found[0]!.limit).toBe('0.8');
  });

  test('propyl- and butylparaben together have a limit of their own', () => {
    expect(said(judge([{ name: 'Propylparaben', percent: '0.1' }, { name: 'Butylparaben', percent: '0.09' }]))).toEqual(['limit-exceeded Propylparaben eu/annex-v/12a']);
  });
});

describe('ranges', () => {
  test('only the upper part over the limit is uncertain', () => {
    const found = judge([{ name: 'Phenoxyethanol', min: '0.9', max: '1.1' }]).findings[0]!;
    expect(found).toMatchObject({ kind: 'limit-uncertain', severity: 'decide', certainty: 'possible' });
    expect(found.needs).toBeUndefined();
  });

  test('the least over the limit is certain', () => {
    expect(kinds([{ name: 'Phenoxyethanol', min: '1.01', max: '1.1' }])).toEqual(['limit-exceeded']);
  });
});

test('a product diluted for use is judged after the dilution', () => {
  const half = { n: 1n, d: 2n };
  expect(kinds([{ name: 'Resorcinol', percent: '2.5' }], { category: 'hair-dye-oxidative', readyForUse: half })).toEqual([]);
  expect(kinds([{ name: 'Resorcinol', percent: '2.5000001' }], { category: 'hair-dye-oxidative', readyForUse: half })).toEqual(['limit-exceeded']);
});

describe('uses', () => {
  test.each<[string, Given, Asked, string]>([
    ['methylisothiazolinone stays out of leave-on products', { name: 'Methylisothiazolinone', percent: '0.0001' }, { category: 'face-cream' }, 'not-for-this-use'],
    ['polyaminopropyl biguanide stays out of sprays', { name: 'Polyaminopropyl Biguanide', percent: '0.1' }, { category: 'deodorant-spray' }, 'not-for-this-use'],
    ['a colourant not for the eyes stays out of eye shadow', { name: 'CI 10316', percent: '0.1' }, { category: 'eye-shadow' }, 'not-for-this-use'],
    ['a colourant not for mucous membranes stays out of lipstick', { name: 'CI 12010', percent: '0.1' }, { category: 'lipstick' }, 'not-for-this-use'],
    ['a rinse-off colourant stays out of leave-on products', { name: 'CI 11725', percent: '0.1' }, { category: 'body-lotion' }, 'not-for-this-use'],
    ['kojic acid is for face and hands', { name: 'Kojic Acid', percent: '0.5' }, { category: 'body-lotion' }, 'not-for-this-use'],
    ['HEMA is for professional nail products', { name: 'HEMA', percent: '5' }, { category: 'nail-polish' }, 'not-for-this-use'],
    ['salicylic acid is not for small children', { name: 'Salicylic Acid', percent: '0.3', purpose: 'preservative' }, { category: 'baby-lotion' }, 'not-for-this-use'],
  ])('%s', (_, given, asked, kind) => {
    expect(kinds([given], asked)).toContain(kind);
  });

  test('nano zinc oxide in a spray is refused, the same in a lotion is not', () => {
    const zinc: Given = { name: 'Zinc Oxide', percent: '10', nano: true, purpose: 'uv-filter' };
    expect(kinds([zinc], { category: 'sunscreen-spray' })).toContain('not-for-this-use');
    expect(kinds([zinc], { category: 'sunscreen-lotion' })).toEqual([]);
  });
});

describe('cannot tell', () => {
  test('lye as a pH adjuster asks for the pH', () => {
    const open = judge([{ name: 'Sodium Hydroxide', percent: '0.1' }]).findings[0]!;
    expect(open).toMatchObject({ kind: 'limit-uncertain', severity: 'decide', needs: ['pH'] });
    expect(kinds([{ name: 'Sodium Hydroxide', percent: '0.1' }], { facts: { pH: '11' } })).toEqual([]);
    expect(kinds([{ name: 'Sodium Hydroxide', percent: '0.1' }], { facts: { pH: '11.01' } })).toEqual(['not-for-this-use']);
  });

  test('petrolatum asks for its refining history', () => {
    const given = [{ name: 'Petrolatum', percent: '5', cas: ['8009-03-8'] }];
    expect(judge(given).findings[0]).toMatchObject({ severity: 'decide', needs: ['fullRefiningHistory'] });
    expect(kinds(given, { facts: { fullRefiningHistory: true } })).toEqual([]);
    expect(kinds(given, { facts: { fullRefiningHistory: false } })).toEqual(['prohibited']);
  });
});

describe('a rule on its days', () => {
  test.each<[string, string, string[]]>([
    ['2025-08-31', '2025-08-31', ['upcoming']],
    ['2025-08-31', '2025-09-01', ['prohibited']],
    ['2025-09-02', '2025-09-02', ['prohibited']],
  ])('II/1731, placed %s and available %s: %s', (placed, available, expected) => {
    expect(kinds([{ name: 'Trimethylbenzoyl Diphenylphosphine Oxide', percent: '1' }], { category: 'nail-gel-polish', placed, available })).toEqual(expected);
  });

  test.each<[string, string, string[]]>([
    ['2025-10-31', '2027-04-30', ['upcoming']],
    ['2025-11-01', '2025-11-01', ['limit-exceeded']],
    ['2025-10-31', '2027-05-01', ['limit-exceeded']],
  ])('III/376 retinol, placed %s and available %s: %s', (placed, available, expected) => {
    expect(kinds([{ name: 'Retinol', percent: '0.4' }], { category: 'face-cream', placed, available }).filter((kind) => kind !== 'wording-missing').slice(0, 1)).toEqual(expected);
  });

  test.each<[string, string, string[]]>([
    ['2023-01-28', '2023-07-28', ['upcoming']],
    ['2023-01-29', '2023-01-29', ['limit-exceeded']],
    ['2023-01-28', '2023-07-29', ['limit-exceeded']],
  ])('VI/4 benzophenone-3 at 3 %% in a body lotion, placed %s and available %s: %s', (placed, available, expected) => {
    expect(kinds([{ name: 'Benzophenone-3', percent: '3', purpose: 'uv-filter' }], { category: 'body-lotion', placed, available })).toEqual(expected);
  });
});

/**
 * Annex III, entry 8, footnote 1: the substances may be combined where the sum of the ratios of
 * each level to the maximum authorised for each does not exceed 1. The names are invented, so
 * that no other row speaks of them; the salt counts as half its mass of base.
 */
describe('a sum of ratios', () => {
  const file: RowFileJson = {
    list: 'restricted', instrument: 'eu-1223-2009', id: 'test/{entry}', citation: 'Test, entry {entry}', markets: ['EU'], sourcing: 'official',
    rows: [{
      entry: '8', title: 'Dyes', together: 'ratios', provisions: [{ max: '3', basis: 'as free base' }],
      members: [{ name: 'Testdye base' }, { name: 'Testdye salt', factor: { times: '1', over: '2' } }, { name: 'Testdye strong', max: '0.5' }],
    }],
  };
  const book = openLawBook({ ...lawTables, rows: [...lawTables.rows, file] });
  const found = (...givens: Given[]) => judge(givens, { category: 'hair-dye-oxidative' }, book).findings.filter(({ rule }) => rule === 'test/8');

  test('exactly 1 is allowed, the least bit more is one finding with its members', () => {
    // 1.5/3 + 2 × ½/3 + 0.08333…/0.5 is just under 1 with 0.0833 and over it with 0.0834.
    expect(found({ name: 'Testdye base', percent: '1.5' }, { name: 'Testdye strong', percent: '0.25' })).toEqual([]);
    expect(found({ name: 'Testdye base', percent: '1.5' }, { name: 'Testdye salt', percent: '2' }, { name: 'Testdye strong', percent: '0.0833' })).toEqual([]);
    const [over, ...rest] = found({ name: 'Testdye base', percent: '1.5' }, { name: 'Testdye salt', percent: '2' }, { name: 'Testdye strong', percent: '0.0834' });
    expect(rest).toEqual([]);
    expect(over).toMatchObject({ kind: 'limit-exceeded', measured: '1.000133333333', limit: '1', members: ['Testdye base', 'Testdye salt', 'Testdye strong'], basis: "sum of shares as free base over each one's own maximum" });
    expect(over!.unit).toBeUndefined();
  });

  test('one member alone is held to its own maximum in percent', () => {
    expect(found({ name: 'Testdye strong', percent: '0.5' })).toEqual([]);
    expect(found({ name: 'Testdye strong', percent: '0.51' })[0]).toMatchObject({ kind: 'limit-exceeded', measured: '0.51', limit: '0.5', unit: '%' });
    expect(found({ name: 'Testdye salt', percent: '6' })).toEqual([]);
  });

  test('a range that only its upper part carries over 1 is uncertain', () => {
    expect(found({ name: 'Testdye base', percent: '1.5' }, { name: 'Testdye strong', min: '0.2', max: '0.3' })[0]).toMatchObject({ kind: 'limit-uncertain', severity: 'decide' });
  });
});

// Annex V entry 32 (d) lists climbazole for rinse-off shampoo at 0.5 %; Annex III entry 310 at 2 % against dandruff.
test('a listed use that fits is lawful although nothing is said of the purpose', () => {
  expect(kinds([{ name: 'Climbazole', percent: '0.4' }], { category: 'shampoo' })).toEqual([]);
  expect(kinds([{ name: 'Climbazole', percent: '0.4' }], { category: 'hand-cream' })).toContain('not-for-this-use');
});

/** Annex III, entries 26 to 56: words due "in a concentration of 0.1 to 0.15 %", the least share included. */
test('a text due from a share on is due at that share, and open where only a part of the range reaches it', () => {
  const file: RowFileJson = {
    list: 'restricted', instrument: 'eu-1223-2009', id: 'test/{entry}', citation: 'Test, entry {entry}', markets: ['EU'], sourcing: 'official',
    rows: [{ entry: '9', title: 'Salt', members: [{ name: 'Testsalt', factor: { times: '1', over: '2' } }], provisions: [{ wording: [{ id: 'fluoride-children', least: '0.1' }] }] }],
  };
  const book = openLawBook({ ...lawTables, rows: [...lawTables.rows, file] });
  const due = (given: Omit<Given, 'name'>) => judge([{ name: 'Testsalt', ...given }], { category: 'toothpaste' }, book).requiredWording.filter(({ lang }) => lang === 'en').map(({ certainty }) => certainty);
  expect(due({ percent: '0.1999999' })).toEqual([]);
  expect(due({ percent: '0.2' })).toEqual(['certain']);
  expect(due({ min: '0.1', max: '0.2' })).toEqual(['possible']);
});

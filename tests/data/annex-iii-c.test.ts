import { describe, expect, test } from 'vitest';
import { judge, law, said, type Asked, type Given } from '../shared/rules/judging.ts';
import { DYE, RINSE, LASH, HAIR, EYELASH, NONE, missingEntries, notCheckedOf, saidOf, tryClosedUses, tryColourants, tryLimits, tryTogether, wordsOf, type Limit } from './annex-iii-cases.ts';

/**
 * Entries 251 to 386 of Annex III to Regulation (EC) No 1223/2009 that are not among the common
 * ones. Every figure here is written out by hand from the official export of 18 June 2026 (the
 * consolidated text of 18 May 2026 where the export is short), not read out of the tables.
 */
/** Regulation (EU) 2026/909: on the last of its days. */
const LATER: Asked = { placed: '2027-01-01', available: '2028-07-01' };


const LIMITS: readonly Limit[] = [
  ['251', 'HC Red No. 7', RINSE, '1', HAIR],
  ['252/a', '2-Amino-6-Chloro-4-Nitrophenol', DYE, '2', HAIR],
  ['252/b', '2-Amino-6-Chloro-4-Nitrophenol', RINSE, '2', HAIR],
  ['253', 'HC Yellow No. 4', RINSE, '1.5', NONE],
  ['254', 'Acid Red 33', RINSE, '0.5', NONE],
  ['255/a', 'HC Yellow No. 2', DYE, '0.75', HAIR],
  ['255/b', 'HC Yellow No. 2', RINSE, '1', NONE],
  ['256', 'HC Orange No. 1', RINSE, '1', NONE],
  ['257/a', 'Laureth-9', 'face-cream', '3', NONE],
  ['257/b', 'Laureth-9', 'shampoo', '4', NONE],
  ['258', 'HC Red No. 1', RINSE, '1', HAIR],
  ['259', 'HC Yellow No. 9', RINSE, '0.5', NONE],
  ['260', 'HC Yellow No. 7', DYE, '0.25', NONE],
  ['261/a', 'HC Yellow No. 13', DYE, '2.5', HAIR],
  ['261/b', 'HC Yellow No. 13', RINSE, '2.5', NONE],
  ['262', 'Basic Yellow 57', RINSE, '2', NONE],
  ['264', 'HC Blue No. 14', RINSE, '0.3', NONE],
  ['265', 'Disperse Violet 1', RINSE, '0.5', NONE],
  ['266/a', 'HC Red No. 3', DYE, '0.45', HAIR],
  ['266/b', 'HC Red No. 3', RINSE, '3', HAIR],
  ['267', 'Basic Red 76', RINSE, '2', NONE],
  ['268/a', 'Basic Red 51', DYE, '0.5', HAIR],
  ['268/b', 'Basic Red 51', RINSE, '1', NONE],
  ['269', '2-Amino-5-Ethylphenol HCl', DYE, '1', HAIR],
  ['270/a', 'Acid Red 92', DYE, '2', HAIR],
  ['270/b', 'CI 45410', RINSE, '0.4', NONE],
  ['271', 'Disperse Blue 377', RINSE, '2', NONE],
  ['272/a', 'p-Aminophenol', DYE, '0.9', HAIR],
  ['272/b', 'p-Aminophenol', LASH, '0.9', EYELASH],
  ['273', '1-Hydroxyethyl 4,5-Diamino Pyrazole Sulfate', DYE, '3', HAIR],
  ['274', '4-Formyl-1-Methylquinolinium-p-Toluenesulfonate', DYE, '2.5', HAIR],
  ['275/a', 'Basic Yellow 87', DYE, '1', HAIR],
  ['275/b', 'Basic Yellow 87', RINSE, '1', NONE],
  ['276/a', 'Basic Orange 31', DYE, '0.5', HAIR],
  ['276/b', 'Basic Orange 31', RINSE, '1', NONE],
  ['277/a', '2,6-Diamino-3-((Pyridin-3-yl)azo)Pyridine', DYE, '0.25', HAIR],
  ['277/b', '2,6-Diamino-3-((Pyridin-3-yl)azo)Pyridine', RINSE, '0.25', NONE],
  ['278/a', 'Basic Violet 2', DYE, '1', HAIR],
  ['278/b', 'CI 42520', RINSE, '0.5', NONE],
  ['279', '2,3-Diaminodihydropyrazolo Pyrazolone Dimethosulfonate', DYE, '2', HAIR],
  ['280/a', 'Picramic Acid', DYE, '0.6', HAIR],
  ['280/b', 'Sodium Picramate', RINSE, '0.6', NONE],
  ['281/a', '2-Nitro-5-Glyceryl Methylaniline', DYE, '0.8', HAIR],
  ['281/b', '2-Nitro-5-Glyceryl Methylaniline', RINSE, '1', NONE],
  ['282', 'HC Blue No. 16', RINSE, '3', NONE],
  ['283/a', '5-Amino-6-Chloro-o-Cresol', DYE, '1', HAIR],
  ['283/b', '5-Amino-6-Chloro-o-Cresol HCl', RINSE, '0.5', NONE],
  ['284/a', "2,2'-Methylenebis 4-Aminophenol HCl", DYE, '1', HAIR],
  ['284/b', "2,2'-Methylenebis-4-aminophenol", RINSE, '1', NONE],
  ['285/a', '2,6-Diaminopyridine', DYE, '0.15', HAIR],
  ['285/b', '2,6-Diaminopyridine', LASH, '0.15', EYELASH],
  ['288/a', 'HC Blue No. 17', DYE, '2', HAIR],
  ['288/b', 'HC Blue No. 17', RINSE, '2', NONE],
  ['289/a', 'HC Blue No. 15', DYE, '0.2', HAIR],
  ['289/b', 'HC Blue No. 15', RINSE, '0.2', NONE],
  ['290', 'CI 61570', RINSE, '0.3', NONE],
  ['291', 'Acid Violet 43', RINSE, '0.5', NONE],
  ['292/a', '2-Methoxymethyl-p-Phenylenediamine', DYE, '1.8', HAIR],
  ['292/b', '2-Methoxymethyl-p-Phenylenediamine', LASH, '1.8', EYELASH],
  ['293', 'Hydroxyanthraquinoneaminopropyl Methyl Morpholinium Methosulfate', RINSE, '0.5', HAIR],
  ['294/a', 'Disperse Red 17', DYE, '2', HAIR],
  ['294/b', 'Disperse Red 17', RINSE, '0.2', NONE],
  ['295', 'Acid Black 1', RINSE, '0.5', NONE],
  ['296', 'Pigment Red 57', RINSE, '0.4', NONE],
  ['297/a', 'Ethoxydiglycol', DYE, '7', NONE],
  ['297/b', 'Ethoxydiglycol', RINSE, '5', NONE],
  ['297/c', 'Ethoxydiglycol', 'shampoo', '10', NONE],
  ['297/d', 'Ethoxydiglycol', 'face-cream', '2.6', NONE],
  ['297/e', 'Ethoxydiglycol', 'deodorant-spray', '2.6', NONE],
  ['297/e', 'Ethoxydiglycol', 'eau-de-toilette', '2.6', NONE],
  ['297/e', 'Ethoxydiglycol', 'hair-spray', '2.6', NONE],
  ['298', 'HC Red No. 17', RINSE, '0.5', NONE],
  ['299', 'HC Yellow No. 17', RINSE, '0.5', HAIR],
  ['300', '1-Hexyl 4,5-Diamino Pyrazole Sulfate', DYE, '1', HAIR],
  ['301', '2,5,6-Triamino-4-Pyrimidinol Sulfate', DYE, '0.5', HAIR],
  ['302', 'Hydroxyethoxy Aminopyrazolopyridine HCl', DYE, '2', HAIR],
  ['303', '3-Amino-2,6-Dimethylphenol', DYE, '2', HAIR],
  ['304', 'Basic Brown 17', RINSE, '2', NONE],
  ['305', 'Basic Blue 124', RINSE, '0.5', HAIR],
  ['308/a', 'Tagetes Patula Flower Oil', 'face-cream', '0.01', NONE],
  ['308/b', 'Tagetes Patula Flower Extract', 'shampoo', '0.1', NONE],
  ['312', 'Furfural', 'face-cream', '0.001', NONE],
  ['317', 'HC Orange No. 6', RINSE, '0.5', NONE],
  ['318', 'Acid Orange 7', RINSE, '0.5', NONE],
  ['319/a', 'Tetrabromophenol Blue', DYE, '0.2', HAIR],
  ['319/b', 'Tetrabromophenol Blue', RINSE, '0.2', NONE],
  ['320', 'Indigofera Tinctoria Leaf Powder', 'henna-hair-dye', '25', NONE],
  ['321/a', 'Titanium Dioxide', 'face-powder', '25', NONE, { facts: { loosePowder: true } }],
  ['321/b', 'CI 77891', 'hair-spray', '1.4', NONE],
  ['321/b', 'CI 77891', 'hair-spray', '1.1', NONE, { flags: { professionalUseOnly: true } }],
  ['326', 'CI 47005', RINSE, '0.5', NONE],
  ['383/a', 'HC Blue No. 18', DYE, '0.35', HAIR, LATER],
  ['383/b', 'HC Blue No. 18', RINSE, '0.35', NONE, LATER],
  ['384', 'Hydroxypropyl-p-phenylenediamine', DYE, '2', HAIR, LATER],
  ['385/a', 'HC Yellow No. 16', DYE, '1', HAIR, LATER],
  ['385/b', 'HC Yellow No. 16', RINSE, '1.5', NONE, LATER],
  ['386/a', 'HC Red No. 18', DYE, '1.5', HAIR, LATER],
  ['386/b', 'HC Red No. 18', RINSE, '0.5', NONE, LATER],
];

describe('exactly the maximum is allowed, the least bit more is not', () => {
  tryLimits(LIMITS);
});

describe('a limit on another basis', () => {
  test.each<[string, string, string, string, Asked]>([
    // Equal parts of dye and lignosulfate: 0.3 % of the mixture is 0.15 % of dye.
    ['263', 'Disperse Black 9', '0.15', '0.1500001', { category: RINSE }],
    // 1.8 × 250.269 / 152.197 = 2.95987…
    ['292/a', '2-Methoxymethyl-p-Phenylenediamine Sulfate', '2.9598', '2.9599', { category: DYE }],
    ['292/b', '2-Methoxymethyl-p-Phenylenediamine Sulfate', '2.9598', '2.9599', { category: LASH }],
    // C13H21Cl2N5 318.246 over C13H20ClN5 281.788: 2 % of base is 2.25876… %
    ['315', 'Dimethylpiperazinium Aminopyrazolopyridine HCl', '2.2587', '2.2588', { category: DYE }],
    // C13H20Cl2N4 303.231 over C13H19ClN4 266.773: 2 % of base is 2.27332… %
    ['316', 'Methylimidazoliumpropyl p-Phenylenediamine HCl', '2.2733', '2.2734', { category: DYE }],
  ])('III/%s %s passes at %s and stops at %s', (rule, name, at, over, asked) => {
    expect(saidOf(name, at, asked)).toEqual([]);
    expect(saidOf(name, over, asked)).toEqual([`limit-exceeded ${name} eu/annex-iii/${rule}`]);
  });

  test('what is free base and what is salt is said with the figure', () => {
    const found = judge([{ name: 'Dimethylpiperazinium Aminopyrazolopyridine HCl', percent: '3' }], { category: DYE }).findings.find((one) => one.kind === 'limit-exceeded')!;
    // 3 × 281.788 / 318.246, to twelve places
    expect(found).toMatchObject({ measured: '2.656322467525', limit: '2', basis: 'as free base' });
  });
});

describe('what an entry names together counts together', () => {
  tryTogether([
    ['280/a', 'Picramic Acid', 'Sodium Picramate', '0.3', { category: DYE }],
    ['283/b', '5-Amino-6-Chloro-o-Cresol', '5-Amino-6-Chloro-o-Cresol HCl', '0.25', { category: RINSE }],
    ['284/a', "2,2'-Methylenebis 4-Aminophenol HCl", "2,2'-Methylenebis 4-Aminophenol", '0.5', { category: DYE }],
    ['308/a', 'Tagetes Minuta Flower Oil', 'Tagetes Patula Flower Oil', '0.005', { category: 'face-cream' }],
    ['308/b', 'Tagetes Minuta Flower Extract', 'Tagetes Patula Flower Oil', '0.05', { category: 'shampoo' }],
    ['320', 'Indigofera Tinctoria Leaf', 'Indigofera Tinctoria Leaf Extract', '12.5', { category: RINSE }],
    ['384', 'Hydroxypropyl-p-Phenylenediamine', 'Hydroxypropyl-p-Phenylenediamine HCl', '1', { category: DYE, ...LATER }],
  ]);
});

describe('a field of use that the entry does not open', () => {
  tryClosedUses([
    ['HC Red No. 7', DYE, '251'],
    ['HC Yellow No. 4', 'shampoo', '253'],
    ['Acid Red 33', DYE, '254'],
    ['HC Orange No. 1', DYE, '256'],
    ['HC Yellow No. 7', RINSE, '260'],
    ['Basic Yellow 57', DYE, '262'],
    ['Disperse Violet 1', 'lipstick', '265'],
    ['2-Amino-5-Ethylphenol HCl', RINSE, '269'],
    ['Disperse Blue 377', DYE, '271'],
    ['p-Aminophenol', RINSE, '272/a'],
    ['4-Formyl-1-Methylquinolinium-p-Toluenesulfonate', RINSE, '274'],
    ['HC Blue No. 16', DYE, '282'],
    ['Acid Green 25', DYE, '290'],
    ['CI 60730', DYE, '291'],
    ['Acid Black 1', DYE, '295'],
    ['CI 15850', DYE, '296'],
    ['Ethoxydiglycol', 'eye-cream', '297'],
    ['Ethoxydiglycol', 'toothpaste', '297'],
    ['Ethoxydiglycol', 'sunscreen-spray', '297'],
    ['1-Hexyl 4,5-Diamino Pyrazole Sulfate', RINSE, '300'],
    ['3-Amino-2,6-Dimethylphenol', 'face-cream', '303'],
    ['Tagetes Patula Flower Oil', 'sunscreen-lotion', '309/a'],
    ['Tagetes Minuta Flower Oil', 'sunscreen-lotion', '308/a'],
    ['HC Orange No. 6', DYE, '317'],
    ['Acid Orange 7', DYE, '318'],
    ['Indigofera Tinctoria Leaf', DYE, '320'],
    ['Acid Yellow 3', DYE, '326'],
  ]);

  test('lash dye is for professionals alone', () => {
    expect(saidOf('p-Aminophenol', '0.1', { category: LASH, flags: { professionalUseOnly: false } })).toEqual(['not-for-this-use p-Aminophenol eu/annex-iii/272/a']);
  });

  tryColourants(['CI 17200', 'CI 45410', 'CI 61570', 'CI 20470', 'CI 15850', 'CI 15510', 'CI 47005']);

  test('indigo leaf in a cream is not judged by the entry on hair dyes', () => {
    expect(saidOf('Indigofera Tinctoria Extract', '30', { category: 'face-cream' })).toEqual([]);
  });
});

describe('words of the eyelash dyes', () => {
  test('2,6-diaminopyridine begins with professional use, p-aminophenol ends with it', () => {
    expect(wordsOf('2,6-Diaminopyridine', '0.1', { category: LASH })).toMatch(/^For professional use only\. This product can cause/);
    expect(wordsOf('p-Aminophenol', '0.1', { category: LASH })).toMatch(/^This product can cause .* For professional use only\. Rinse eyes immediately/s);
  });
});

describe('titanium dioxide powder', () => {
  const powder: Given = { name: 'Titanium Dioxide', percent: '30', purpose: 'colourant' };

  test('whether a face powder is loose decides about its limit', () => {
    expect(judge([powder], { category: 'face-powder' }).findings[0]).toMatchObject({ kind: 'limit-uncertain', severity: 'decide', needs: ['loosePowder'] });
    expect(said(judge([powder], { category: 'face-powder', facts: { loosePowder: false } }))).toEqual([]);
  });

  test('elsewhere it stays away from the lungs', () => {
    expect(saidOf('Titanium Dioxide', '5', { category: 'body-mist' })).toEqual(['not-for-this-use Titanium Dioxide eu/annex-iii/321/c']);
    expect(judge([powder], { category: 'eye-shadow' }).findings[0]).toMatchObject({ severity: 'decide', needs: ['inhalable'] });
    expect(said(judge([powder], { category: 'eye-shadow', facts: { inhalable: false } }))).toEqual([]);
    expect(saidOf('Titanium Dioxide', '5', { category: 'face-cream' })).toEqual([]);
  });

  test('the nano form is left to the entry on UV filters', () => {
    const rules = said(judge([{ ...powder, nano: true, purpose: 'uv-filter', percent: '5' }], { category: 'hair-spray' }));
    expect(rules.filter((line) => line.includes('annex-iii/321'))).toEqual([]);
  });

  test('Great Britain does not have it', () => {
    expect(said(judge([powder], { category: 'eye-shadow', market: 'UK' }))).toEqual([]);
  });
});

describe('days', () => {
  test.each<[string, string, string, string, string[]]>([
    ['HC Orange No. 6', RINSE, '2021-06-02', '2021-06-02', ['upcoming']],
    ['HC Orange No. 6', RINSE, '2021-06-02', '2021-06-03', ['limit-exceeded']],
    ['Acid Yellow 3', RINSE, '2023-06-30', '2023-12-31', ['upcoming']],
    ['Acid Yellow 3', RINSE, '2023-07-01', '2023-07-01', ['limit-exceeded']],
    ['Acid Yellow 3', RINSE, '2023-06-30', '2024-01-01', ['limit-exceeded']],
    ['HC Red No. 18', RINSE, '2026-12-31', '2028-06-30', ['upcoming']],
    ['HC Red No. 18', RINSE, '2027-01-01', '2027-01-01', ['limit-exceeded']],
    ['HC Red No. 18', RINSE, '2026-12-31', '2028-07-01', ['limit-exceeded']],
  ])('%s in %s, placed %s and available %s: %s', (name, category, placed, available, kinds) => {
    expect(saidOf(name, '0.6', { category, placed, available }).map((line) => line.split(' ')[0]!)).toEqual(kinds);
  });

  test('the warning of Regulation (EU) 2020/1683 comes half a year after its limits', () => {
    const asked = (available: string): Asked => ({ category: DYE, available });
    expect(wordsOf('Tetrabromophenol Blue', '0.1', asked('2021-12-02'))).toBe('');
    expect(wordsOf('Tetrabromophenol Blue', '0.1', asked('2021-12-03'))).toContain(HAIR);
  });

  test('Great Britain has the hair dyes of 2020 and not those of 2022 and 2026', () => {
    expect(saidOf('HC Orange No. 6', '0.6', { category: RINSE, market: 'UK' })).toEqual(['limit-exceeded HC Orange No. 6 eu/annex-iii/317']);
    expect(saidOf('Acid Yellow 3', '0.6', { category: RINSE, market: 'UK' })).toEqual([]);
    expect(saidOf('HC Red No. 18', '0.6', { category: RINSE, market: 'UK', ...LATER })).toEqual([]);
  });
});

test('what cannot be computed is listed as not checked', () => {
  const words = (name: string, category: string, more: Asked = {}): string => notCheckedOf(name, { category, ...more });
  expect(words('HC Red No. 7', RINSE)).toContain('50 micrograms per kilogram');
  expect(words('HC Yellow No. 2', DYE)).toContain('mixing ratio');
  expect(words('p-Aminophenol', LASH)).toContain('mixing ratio');
  expect(words('Disperse Violet 1', RINSE)).toContain('Disperse Red 15');
  expect(words('Ethoxydiglycol', 'face-cream')).toContain('Ethylene glycol');
  expect(words('HC Orange No. 6', RINSE)).toContain('ethyl methanesulfonate');
  expect(words('Tagetes Patula Flower Oil', 'face-cream')).toContain('0.35 %');
  expect(words('Pinene', 'face-cream', { placed: '2026-08-01', available: '2026-08-01' })).toContain('10 mmol/L');
});

test('fragrance allergens of entries 327 to 371 are named, not limited: pinene alone has a further condition', () => {
  const entries = Array.from({ length: 371 - 327 + 1 }, (_, index) => String(327 + index));
  expect(entries.filter((entry) => !law.allergenGroups.some((group) => group.entry === entry || group.entry.split(/[^0-9]+/).includes(entry)))).toEqual([]);
  const rows = law.rows.filter((row) => row.id.startsWith('eu/annex-iii/') && entries.includes(row.entry));
  expect(rows.map((row) => row.entry)).toEqual(['371']);
  expect(rows[0]!.provisions.map((one) => one.max)).toEqual([undefined]);
});

test('every entry from 251 to 386 is a row or a fragrance allergen; entry 311 has moved to Annex II', () => {
  expect(missingEntries(251, 386)).toEqual(['311']);
  expect(law.rowsFor({ name: 'Trimethylbenzoyl Diphenylphosphine Oxide', cas: [] }).map((hit) => hit.row.id)).toEqual(['eu/annex-ii/1731']);
});

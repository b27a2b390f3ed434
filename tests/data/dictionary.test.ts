import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { createDictionary, otherNames } from '#shared/dictionary/create-dictionary.ts';
import { isCasNumber, isEcNumber } from '#shared/dictionary/registry-numbers.ts';
import { foldName } from '#shared/law/fold.ts';
import { readEntryTables, readOilTable } from '#server/modules/dictionary/read-tables.ts';

const folder = join(import.meta.dirname, '../../data/dictionary');
const entries = readEntryTables(folder);
const dictionary = createDictionary(entries, 'test');
const named = (inci: string) => entries.find((entry) => entry.inci === inci)!;

test('there are at least 2,600 entries', () => {
  expect(entries.length).toBeGreaterThanOrEqual(2600);
});
test('ids and folded INCI names are each used once', () => {
  expect(new Set(entries.map(({ id }) => id)).size).toBe(entries.length);
  expect(new Set(entries.map(({ inci }) => foldName(inci))).size).toBe(entries.length);
});
test('every CAS and EC number has its check digit right', () => {
  expect(entries.flatMap(({ cas }) => cas).filter((number) => !isCasNumber(number))).toEqual([]);
  expect(entries.flatMap(({ ec }) => ec).filter((number) => !isEcNumber(number))).toEqual([]);
});
test('every synonym, common name and misspelling leads back to its own entry', () => {
  const lost = entries.flatMap((entry) =>
    [...entry.synonyms, ...entry.commonNames, ...(entry.misspellings ?? [])].filter((name) => dictionary.resolve(name)?.entry !== entry).map((name) => `${name} of ${entry.inci}`),
  );
  expect(lost).toEqual([]);
});
test('no name carries a trade mark sign', () => {
  expect(entries.flatMap((entry) => [entry.inci, ...otherNames(entry)]).filter((name) => /[®™©]/.test(name))).toEqual([]);
});
test('a former name leads to an entry', () => {
  const former = entries.filter(({ supersededBy }) => supersededBy !== undefined);
  expect(former.length).toBeGreaterThan(5);
  for (const { supersededBy } of former) expect(dictionary.resolve(supersededBy!)?.match).toBe('exact');
});

// Forms of the glossary's title case and of the names' chemistry.
test.each(['Sodium Cocoyl Isethionate', 'PEG-7 Glyceryl Cocoate', 'CI 77891', 'C12-15 Alkyl Benzoate', '1,2-Hexanediol', 'VP/VA Copolymer', 'TEA-Lauryl Sulfate', 'Cocamide MEA', 'Disodium EDTA', 'Sodium PCA', 'BHT', 'o-Cymen-5-ol', 'p-Anisic Acid', 'HC Blue No. 2', 'Lysine HCl', 'Alcohol Denat.'])(
  '%s is written in label case',
  (inci) => expect(dictionary.resolve(inci)?.entry.inci).toBe(inci),
);

describe('market names', () => {
  // C.R.C., c. 869 (Cosmetic Regulations), Schedule, items 4, 12, 27, 39.
  test.each([['Aqua', 'Water', 'Eau'], ['Cera Alba', 'Beeswax', 'Cire d’abeille'], ['Mel', 'Honey', 'Miel'], ['Paraffinum Liquidum', 'Mineral Oil', 'Huile minérale']])(
    '%s is %s in the United States and %s in French',
    (inci, us, fr) => expect(named(inci).names).toMatchObject({ us, fr, ca: inci }),
  );
  // US names from memory.
  test.each([['Parfum', 'Fragrance'], ['Lavandula Angustifolia Oil', 'Lavandula Angustifolia (Lavender) Oil'], ['Butyrospermum Parkii Butter', 'Butyrospermum Parkii (Shea) Butter']])(
    '%s is %s in the United States',
    (inci, us) => expect(named(inci).names.us).toBe(us),
  );
  // 21 CFR part 74, subpart C.
  test.each([['CI 15850', ['Red 6', 'Red 7']], ['CI 42090', ['Blue 1', 'Blue 4']], ['CI 45350', ['Yellow 7', 'Yellow 8']], ['CI 45380', ['Red 21', 'Red 22']], ['CI 45410', ['Red 27', 'Red 28']], ['CI 45425', ['Orange 10', 'Orange 11']]])(
    '%s has several US names',
    (inci, usColours) => {
      expect(named(inci).names.usColours).toEqual(usColours);
      expect(named(inci).names.us).toBeUndefined();
    },
  );
});

test.each([
  ['Cyclopentasiloxane', 'silicone', true], ['Methylparaben', 'paraben', true], ['Sodium Laureth Sulfate', 'sulfate-surfactant', true], ['Magnesium Sulfate', 'sulfate-surfactant', false],
  ['Behentrimonium Methosulfate', 'sulfate-surfactant', false], ['Cetyl Alcohol', 'fatty-alcohol', true], ['Cetyl Alcohol', 'alcohol', false], ['Alcohol', 'alcohol', true], ['Cera Alba', 'animal', true],
  ['CI 75470', 'animal', true], ['Lanolin', 'animal', true], ['Juniperus Communis Fruit Oil', 'essential-oil', true], ['Prunus Amygdalus Dulcis Oil', 'essential-oil', false], ['DMDM Hydantoin', 'formaldehyde-releaser', true],
])('%s: %s is %s', (inci, property, is) => expect(named(inci).properties.includes(property)).toBe(is));

describe('oil profiles', () => {
  const oils = readOilTable(folder);
  test('there are at least 25 oils, each an entry, with every range the right way round', () => {
    expect(new Set(oils.map(({ oil }) => oil)).size).toBeGreaterThanOrEqual(25);
    for (const { inci } of oils) expect(dictionary.resolve(inci)?.match, inci).toBe('exact');
  });
  test('every constituent is known and every number is valid', () => {
    const all = oils.flatMap(({ constituents }) => constituents);
    expect(all.filter(({ name }) => !dictionary.resolve(name)).map(({ name }) => name)).toEqual([]);
    expect(all.flatMap(({ cas }) => cas ?? []).filter((cas) => !isCasNumber(cas))).toEqual([]);
  });
  test('the table is not empty', () => expect(readFileSync(join(folder, 'oil-profiles.csv'), 'utf8').length).toBeGreaterThan(1000));
});

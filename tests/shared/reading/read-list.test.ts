import { describe, expect, test } from 'vitest';
import { readingDocumentSchema } from '#shared/contracts/reading-document.ts';
import type { Market } from '#shared/law/types.ts';
import { LONGEST_TEXT, readList } from '#shared/reading/read-list.ts';
import { dictionary, law, TODAY } from '#tests/support/engine.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';

const read = (text: string, market: Market = 'EU', category = 'body-wash', day = TODAY) => {
  const reading = readList(text, { market, category: law.categories.get(category)!, law, dictionary, placedOnMarket: day, availableOn: day });
  if ('mistake' in reading) throw new Error(reading.mistake);
  return readingDocumentSchema.parse(reading.document);
};
const bounds = (text: string, market?: Market, category?: string): Record<string, string> =>
  Object.fromEntries(read(text, market, category).bounds.map(({ inci, min, max }) => [inci, `${min}..${max}`]));
const found = (text: string, market?: Market, category?: string, day = TODAY): string[] => read(text, market, category, day).findings.map(({ kind, subject }) => `${kind} ${subject}`);

describe('bounds', () => {
  // Annex V entry 29: phenoxyethanol at most 1 %. 98 = 100 - 1 - 1 is shared by the first two.
  test('what follows a preservative capped at 1 % is at most 1 %', () => {
    expect(bounds('Aqua, Glycerin, Phenoxyethanol, Xanthan Gum')).toEqual({ Aqua: '49..100', Glycerin: '0..50', Phenoxyethanol: '0..1', 'Xanthan Gum': '0..1' });
  });

  // Annex V entry 1: 2.5 % as acid in rinse-off; 2.5 x 144.105 / 122.123 of sodium benzoate = 2.949997953538...
  test('a maximum as acid is turned into the salt', () => {
    expect(bounds('Aqua, Sodium Benzoate, Glycerin')['Sodium Benzoate']).toMatch(/^0\.\.2\.9499\d{8}$/);
    expect(bounds('Aqua, Sodium Benzoate, Glycerin', 'EU', 'body-lotion')['Sodium Benzoate']).toMatch(/^0\.\.0\.5899\d{8}$/);
  });

  test('a maximum that only some purposes have does not bind', () => {
    // Benzyl alcohol: 1 % as a preservative (Annex V/34), without bound as a solvent or scent.
    expect(bounds('Aqua, Benzyl Alcohol')['Benzyl Alcohol']).toBe('0..50');
  });

  test('one market has no maximum where another has', () => {
    expect(bounds('Aqua, Glycerin, Phenoxyethanol, Xanthan Gum', 'US')['Xanthan Gum']).toBe('0..25');
  });

  test('in Canada a scent at the end of the list has no order', () => {
    expect(bounds('Aqua, Glycerin, Parfum', 'CA')).toEqual({ Aqua: '0..100', Glycerin: '0..50', Parfum: '0..100' });
    expect(bounds('Aqua, Glycerin, Parfum', 'EU').Parfum).toBe('0..33.333333333333');
  });

  test('a colourant in its own place is in order, at the end it is not', () => {
    expect(bounds('Aqua, CI 19140, Glycerin')['CI 19140']).toBe('0..50');
    expect(bounds('Aqua, Glycerin, CI 19140')['CI 19140']).toBe('0..100');
  });

  test('an unknown name keeps its place', () => {
    expect(bounds('Aqua, Unicorn Tears, Glycerin')['Unicorn Tears']).toBe('0..50');
  });
});

describe('findings', () => {
  test.each<[string, string, Market, string, string]>([
    ['Aqua, Glycerin, Butylphenyl Methylpropional', 'prohibited Butylphenyl Methylpropional', 'EU', 'body-wash', 'a prohibited substance (Annex II)'],
    ['Aqua, Glycerin, Methylisothiazolinone', 'not-for-this-use Methylisothiazolinone', 'EU', 'body-lotion', 'a preservative for rinse-off only (Annex V/57)'],
    ['Aqua, Glycerin, CI 10006, CI 99999', 'use-not-listed CI 99999', 'EU', 'body-wash', 'a colour that is not listed'],
    ['Phenoxyethanol, Aqua', 'limit-exceeded Phenoxyethanol', 'EU', 'body-wash', 'a capped name at the head of the list'],
    ['Aqua, Unicorn Tears', 'unknown-ingredient Unicorn Tears', 'EU', 'body-wash', 'an unknown name'],
    ['Aqua, Glycerin, [+/- CI 77491]', 'may-contain-misplaced CI 77491', 'EU', 'body-wash', 'shades outside make-up'],
    ['Aqua, Limonene, Glycerin, Parfum', 'order-uncertain Limonene', 'EU', 'body-wash', 'an allergen before the perfume that brings it'],
    ['Aqua, CI 19140, Glycerin', 'order-uncertain CI 19140', 'EU', 'body-wash', 'a colourant among the others'],
  ])('%s: %s in %s %s (%s)', (text, expected, market, category) => {
    expect(found(text, market, category)).toContain(expected);
  });

  test('a plain lawful list has nothing that stops sale', () => {
    expect(read('Aqua, Decyl Glucoside, Glycerin, Phenoxyethanol, Citric Acid, Parfum, Linalool').findings.filter(({ severity }) => severity === 'stop')).toEqual([]);
  });

  test('the day before a ban and the day of it differ', () => {
    // Regulation (EU) 2025/877: prohibited from 1 September 2025.
    const list = 'Di-HEMA Trimethylhexyl Dicarbamate, Trimethylbenzoyl Diphenylphosphine Oxide';
    expect(found(list, 'EU', 'nail-polish', plainDate('2025-08-31'))).not.toContain('prohibited Trimethylbenzoyl Diphenylphosphine Oxide');
    expect(found(list, 'EU', 'nail-polish', plainDate('2025-09-01'))).toContain('prohibited Trimethylbenzoyl Diphenylphosphine Oxide');
  });
});

test('names keep their order and say how they were recognised', () => {
  const { entries } = read('Ingredients: AQUA, Water, Phenoxyetanol, Zzyzx');
  expect(entries.map(({ written, inci, match }) => [written, inci, match])).toEqual([
    ['AQUA', 'Aqua', 'exact'],
    ['Water', 'Aqua', 'synonym'],
    ['Phenoxyetanol', 'Phenoxyethanol', 'respelt'],
    ['Zzyzx', null, 'unknown'],
  ]);
});

test.each([
  ['', 'holds no ingredient names'],
  [' ,;. \n', 'holds no ingredient names'],
  ['a'.repeat(LONGEST_TEXT + 1), 'longer than'],
  [Array.from({ length: 600 }, (_, index) => `Name ${index}a`).join(', '), 'more than'],
])('a text that is no list is refused', (text, words) => {
  const reading = readList(text, { market: 'EU', category: law.categories.get('body-wash')!, law, dictionary, placedOnMarket: TODAY, availableOn: TODAY });
  expect('mistake' in reading && reading.mistake).toContain(words);
});

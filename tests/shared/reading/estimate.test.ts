import { describe, expect, test } from 'vitest';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import { compare, decimal, sum, toDecimal } from '#shared/kernel/rational.ts';
import type { Market } from '#shared/law/types.ts';
import { estimateDocument, estimateShares, ESTIMATE_PHASE } from '#shared/reading/estimate.ts';
import { readList } from '#shared/reading/read-list.ts';
import { dictionary, judge, law, TODAY } from '#tests/support/engine.ts';

function read(text: string, market: Market = 'EU', slug = 'body-lotion') {
  const category = law.categories.get(slug)!;
  const reading = readList(text, { market, category, law, dictionary, placedOnMarket: TODAY, availableOn: TODAY });
  if ('mistake' in reading) throw new Error(reading.mistake);
  return { ...reading, category };
}

const LISTS: readonly [string, Market, string][] = [
  ['Aqua', 'EU', 'body-wash'],
  ['Aqua, Glycerin, Phenoxyethanol, Xanthan Gum, Parfum, Limonene, CI 19140', 'EU', 'body-wash'],
  ['Aqua, Cetearyl Alcohol, Retinol, Tocopherol, Sodium Benzoate, Potassium Sorbate, Citric Acid', 'EU', 'body-lotion'],
  ['Active ingredient: Zinc Oxide 10%. Inactive ingredients: Water, Glycerin, Fragrance', 'US', 'sunscreen-lotion'],
  ['Aqua, Glycerin, Parfum, Limonene', 'CA', 'shampoo'],
  ['CI 77891, CI 77491', 'EU', 'eye-shadow'],
  ['Mica, Talc, Unicorn Tears [+/- CI 77491, CI 77492]', 'EU', 'eye-shadow'],
];

describe('an estimate', () => {
  test.each(LISTS)('of %s in %s %s lies within all bounds and comes to 100', (text, market, slug) => {
    const { names } = read(text, market, slug);
    const estimates = estimateShares(names)!;
    expect(toDecimal(sum(estimates.map(({ share }) => decimal(share))))).toBe('100');
    for (const { read: one, share } of estimates) {
      expect(compare(decimal(share), one.bounds.max), `${one.one.name} ${share}`).toBeLessThanOrEqual(0);
      // Shares are cut to six places.
      expect(compare(decimal(share), decimal(toDecimal(one.bounds.min, 5))), `${one.one.name} ${share}`).toBeGreaterThanOrEqual(0);
    }
  });

  test('keeps the order of the list and what the law caps', () => {
    const { names } = read('Aqua, Glycerin, Phenoxyethanol, Xanthan Gum');
    const shares = estimateShares(names)!.map(({ share }) => decimal(share));
    expect(shares.slice(1).every((share, index) => compare(share, shares[index]!) <= 0)).toBe(true);
    expect(compare(shares[2]!, decimal('1'))).toBeLessThanOrEqual(0);
  });

  test('becomes a document that prints the same list and says that it is estimated', () => {
    const { names, category } = read('Aqua, Glycerin, Cetearyl Alcohol, Phenoxyethanol, Xanthan Gum');
    const made = readFormulaDocument(estimateDocument(estimateShares(names)!, names, { name: 'From a list', market: 'EU', category }), { categories: law.categories });
    if ('faults' in made) throw new Error(JSON.stringify(made.faults));
    expect(new Set(made.document.formula.lines.map(({ phase }) => phase))).toEqual(new Set([ESTIMATE_PHASE]));
    const { declaration, findings } = judge(made.document).results[0]!;
    expect(declaration.entries.map(({ inci }) => inci)).toEqual(['Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Phenoxyethanol', 'Xanthan Gum']);
    expect(findings.filter(({ severity }) => severity === 'stop')).toEqual([]);
  });
});

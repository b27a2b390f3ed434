/** Ordering and allergen examples constructed from Article 19(1)(g), 21 CFR 701.3(f) and the 0.001 % / 0.01 % thresholds of Annex III; the arithmetic stands in the figures. */
import { describe, expect, test } from 'vitest';
import type { Market } from '#shared/law/types.ts';
import { formula, inside, line, material, part, present } from '#tests/support/engine.ts';

const pure = (id: string, inci: string, more = {}): ReturnType<typeof material> => material(id, [part(inci, '100', more)]);

const LOTION = formula(
  [
    pure('water', 'Aqua'), pure('glycerin', 'Glycerin'), pure('cetearyl', 'Cetearyl Alcohol'), pure('shea', 'Butyrospermum Parkii Butter'),
    pure('sunflower', 'Helianthus Annuus Seed Oil'), pure('pe', 'Phenoxyethanol'), pure('ehg', 'Ethylhexylglycerin'),
    material('scent', [], { declareAs: 'parfum' }), pure('gum', 'Xanthan Gum'), pure('white', 'CI 77891', { purpose: 'colourant' }),
  ],
  [
    line('water', '72.00 %'), line('glycerin', '4.00 %'), line('cetearyl', '3.00 %'), line('shea', '8.00 %'), line('sunflower', '9.30 %'),
    line('pe', '0.90 %'), line('ehg', '0.10 %'), line('scent', '1.00 %'), line('gum', '0.30 %'), line('white', '1.40 %'),
  ],
  { product: { markets: ['EU', 'UK', 'US', 'CA'] } },
);

describe('a lotion with perfume at exactly 1 %', () => {
  const zones = (market: Market): string[] => present(LOTION).results.find((one) => one.market === market)!.declaration.entries.map(({ inci, zone }) => `${inci} ${zone}`);

  test.each(['EU', 'UK'] as const)('keeps it in the ordered part in %s', (market) => {
    expect(zones(market)).toEqual([
      'Aqua ordered', 'Helianthus Annuus Seed Oil ordered', 'Butyrospermum Parkii Butter ordered', 'Glycerin ordered', 'Cetearyl Alcohol ordered',
      'Parfum ordered', 'Phenoxyethanol free', 'Xanthan Gum free', 'Ethylhexylglycerin free', 'CI 77891 colourant',
    ]);
  });

  test.each(['US', 'CA'] as const)('lets it stand in any order in %s', (market) => {
    expect(zones(market)).toContain('Parfum free');
    expect(zones(market).at(-1)).toBe('CI 77891 colourant');
  });
});

test('a blend is taken apart and summed before it is ordered', () => {
  const preserver = material('p', [part('Phenoxyethanol', '90'), part('Ethylhexylglycerin', '10')]);
  const extract = material('x', [part('Glycerin', '85'), part('Phenoxyethanol', '15')]);
  const { entries } = present(formula([pure('water', 'Aqua'), preserver, extract], [line('water', '98 %'), line('p', '1 %'), line('x', '1 %')])).results[0]!.declaration;
  expect(entries.map(({ inci, share, zone }) => [inci, share.typical, zone])).toEqual([
    ['Aqua', '98', 'ordered'], ['Phenoxyethanol', '1.05', 'ordered'], ['Glycerin', '0.85', 'free'], ['Ethylhexylglycerin', '0.1', 'free'],
  ]);
});

test('a glycerite brings glycerin, water and extract in its proportions', () => {
  const calendula = material('c', [part('Glycerin', '80'), part('Aqua', '18'), part('Calendula Officinalis Flower Extract', '2')]);
  const { entries } = present(formula([pure('water', 'Aqua'), calendula], [line('water', '97 %'), line('c', '3 %')])).results[0]!.declaration;
  expect(entries.map(({ inci, share }) => [inci, share.typical])).toEqual([['Aqua', '97.54'], ['Glycerin', '2.4'], ['Calendula Officinalis Flower Extract', '0.06']]);
});

describe('fragrance allergens', () => {
  const total = (category: string, level: string, share: string, name = 'Linalool'): [string, boolean] => {
    const scent = material('scent', [], { declareAs: 'parfum', constituents: [inside(name, share)] });
    const document = formula([pure('water', 'Aqua'), scent], [line('water', 'qs'), line('scent', `${level} %`)], { product: { category } });
    const verdict = present(document).results[0]!.allergens[0]!;
    return [verdict.total.max, verdict.disclose];
  };

  test.each([
    ['body-lotion', '0.5', '8', 'Linalool', '0.04', true],
    ['body-wash', '0.5', '8', 'Linalool', '0.04', true],
    ['body-lotion', '0.5', '0.15', 'Citral', '0.00075', false],
    ['body-wash', '0.5', '0.15', 'Citral', '0.00075', false],
    ['body-lotion', '0.1', '1', 'Linalool', '0.001', false],
    ['body-lotion', '0.101', '1', 'Linalool', '0.00101', true],
    ['body-wash', '1', '1', 'Linalool', '0.01', false],
    ['body-wash', '1.00000001', '1', 'Linalool', '0.0100000001', true],
    ['body-lotion', '0.00105', '95', 'Limonene', '0.0009975', false],
    ['body-lotion', '0.00106', '95', 'Limonene', '0.001007', true],
  ])('%s at %s %% of a perfume with %s %% %s holds %s %%: named %s', (category, level, share, name, max, isNamed) => {
    expect(total(category, level, share, name)).toEqual([max, isNamed]);
  });

  test('add up over an essential oil and a perfume', () => {
    const lavender = material('lavender', [part('Lavandula Angustifolia Oil', '100')], { constituents: [inside('Linalool', '35')] });
    const scent = material('scent', [], { declareAs: 'parfum', constituents: [inside('Linalool', '5')] });
    const { allergens } = present(formula([pure('water', 'Aqua'), lavender, scent], [line('water', 'qs'), line('lavender', '0.2 %'), line('scent', '0.01 %')])).results[0]!;
    expect(allergens.find(({ name }) => name === 'Linalool')!.total.max).toBe('0.0705');
  });

  test('count neral and geranial together as citral', () => {
    const lemon = material('lemon', [part('Citrus Limon Peel Oil', '100')], { constituents: [inside('Neral', '0.5-1.5'), inside('Geranial', '0.5-2.3')] });
    const { allergens } = present(formula([pure('water', 'Aqua'), lemon], [line('water', '99 %'), line('lemon', '1 %')])).results[0]!;
    expect(allergens.find(({ name }) => name === 'Citral')!.total).toEqual({ min: '0.01', typical: '0.024', max: '0.038' });
  });
});

/**
 * The days of Regulation (EU) 2023/1545: products may be placed until 31 July 2026 and made
 * available until 31 July 2028. Names of the official export of 18 June 2026, typed out here.
 */
import { expect, test } from 'vitest';
import { formula, inside, judge, line, material, part } from '#tests/support/engine.ts';
import type { Market } from '#shared/law/types.ts';
import { dayAfter } from './boundary.ts';

/** Named before and after. */
const OLDER = [
  'Benzyl Alcohol', 'Amyl Cinnamal', 'Cinnamyl Alcohol', 'Citral',
  'Eugenol', 'Hydroxycitronellal', 'Isoeugenol', 'Amylcinnamyl Alcohol',
  'Benzyl Salicylate', 'Cinnamal', 'Coumarin', 'Geraniol',
  'Anise Alcohol', 'Benzyl Cinnamate', 'Farnesol', 'Linalool',
  'Benzyl Benzoate', 'Citronellol', 'Hexyl Cinnamal', 'Limonene',
  'Methyl 2-Octynoate', 'Alpha-Isomethyl Ionone', 'Evernia Prunastri Extract', 'Evernia Furfuracea Extract',
];
/** Named only from the dates on; of entries 364 and 365 the first name. */
const NEWER = [
  '6-Methyl Coumarin', 'Pinus Mugo', 'Pinus Pumila', 'Cedrus Atlantica Oil/Extract',
  'Turpentine', 'Alpha-Terpinene', 'Terpinolene', 'Myroxylon Pereirae Oil/Extract',
  'Rose Ketones', '3-Propylidenephthalide', 'Lippia Citriodora Absolute', 'Methyl Salicylate',
  'Acetyl Cedrene', 'Amyl Salicylate', 'Anethole', 'Benzaldehyde',
  'Camphor', 'Beta-Caryophyllene', 'Carvone', 'Dimethyl Phenethyl Acetate',
  'Hexadecanolactone', 'Hexamethylindanopyran', 'Linalyl Acetate', 'Menthol',
  'Trimethylcyclopentenyl Methylisopentenol', 'Salicylaldehyde', 'Santalol', 'Sclareol',
  'Terpineol', 'Tetramethyl Acetyloctahydronaphthalenes', 'Trimethylbenzenepropanol', 'Vanillin',
  'Cananga Odorata Oil/Extract', 'Cinnamomum Cassia Leaf Oil', 'Cinnamomum Zeylanicum Bark Oil', 'Citrus Aurantium Flower Oil',
  'Citrus Aurantium Peel Oil', 'Citrus Aurantium Bergamia Peel Oil', 'Citrus Limon Peel Oil', 'Lemongrass Oil',
  'Eucalyptus Globulus Oil', 'Eugenia Caryophyllus Oil', 'Jasmine Oil/Extract', 'Juniperus Virginiana Oil',
  'Laurus Nobilis Leaf Oil', 'Lavandula Oil/Extract', 'Mentha Piperita Oil', 'Mentha Viridis Leaf Oil',
  'Narcissus Extract', 'Pelargonium Graveolens Oil', 'Pogostemon Cablin Oil', 'Rose Flower Oil/Extract',
  'Santalum Album Oil', 'Eugenyl Acetate', 'Geranyl Acetate', 'Isoeugenyl Acetate',
  'Pinene',
];

/** A cream with a perfume that holds every one of them well above 0.001 %. */
const perfume = material('perfume', [part('Glycerin', '100')], { declareAs: 'parfum', constituents: [...OLDER, ...NEWER].map((name) => inside(name, '1')) });
const cream = formula([perfume], [line('perfume', '100 g')]);

function disclosed(market: Market, placed: string, available: string): string[] {
  const product = { ...cream.product, markets: [market], placedOnMarket: placed, availableOn: available };
  const result = judge({ ...cream, product }, { markets: [market] }).results[0]!;
  return result.allergens.filter(({ disclose }) => disclose).map(({ name }) => name.split(';')[0]!.split(' / ')[0]!).sort();
}

const NEAR = [-1, 0, 1];
const days: [string, string, boolean][] = [
  ...NEAR.map((step): [string, string, boolean] => [dayAfter('2026-08-01', step), dayAfter('2026-08-01', step), step >= 0]),
  ...NEAR.map((step): [string, string, boolean] => ['2026-07-31', dayAfter('2028-08-01', step), step >= 0]),
];

test('there are 24 older and 57 newer', () => {
  expect([new Set(OLDER).size, new Set(NEWER).size]).toEqual([24, 57]);
});

test.each(days)('in the Union, placed %s and available %s: all of them is %s', (placed, available, all) => {
  expect(disclosed('EU', placed, available)).toEqual((all ? [...OLDER, ...NEWER] : OLDER).toSorted());
});

test.each(days)('in Great Britain, placed %s and available %s, the older 24 stay', (placed, available) => {
  expect(disclosed('UK', placed, available)).toEqual(OLDER.toSorted());
});

import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Market } from '#shared/law/types.ts';
import { formula, line, material, part } from '#tests/support/engine.ts';

type Shares = readonly (readonly [inci: string, share: string, purpose?: 'preservative' | 'fragrance' | 'colourant'])[];

interface Recipe {
  readonly category: string;
  readonly facts?: FormulaDocument['product']['facts'];
  readonly composition: Shares;
  /** A perfume whose composition is left out, in percent of the product. */
  readonly perfume?: string;
}

/** Products that the claims of the tables are said of; compositions are invented. */
const RECIPES = {
  /** No perfume, no colourant; oat; preserved. */
  gel: {
    category: 'body-wash',
    facts: { pH: '5.3' },
    composition: [['Aqua', '79.5'], ['Decyl Glucoside', '12'], ['Glycerin', '5'], ['Xanthan Gum', '1'], ['Avena Sativa Kernel Extract', '1'], ['Citric Acid', '0.5'], ['Phenoxyethanol', '0.9', 'preservative'], ['Ethylhexylglycerin', '0.1']],
  },
  /** A perfume of unknown composition; fatty alcohols; preserved. */
  cream: {
    category: 'body-lotion',
    composition: [['Aqua', '70'], ['Helianthus Annuus Seed Oil', '12'], ['Cetearyl Alcohol', '5'], ['Ceteareth-20', '1.5'], ['Butyrospermum Parkii Butter', '5'], ['Glycerin', '4'], ['Benzyl Alcohol', '0.8', 'preservative'], ['Dehydroacetic Acid', '0.2', 'preservative'], ['Tocopherol', '0.5'], ['Sodium Hyaluronate', '0.5']],
    perfume: '0.5',
  },
  /** Beeswax and oils, no water. */
  balm: {
    category: 'lip-balm',
    composition: [['Ricinus Communis Seed Oil', '40'], ['Cera Alba', '25'], ['Cocos Nucifera Oil', '20'], ['Butyrospermum Parkii Butter', '14'], ['Tocopherol', '1']],
  },
  /** Nearly everything that others leave out. */
  rich: {
    category: 'shampoo',
    composition: [
      ['Aqua', '68.7'], ['Sodium Laureth Sulfate', '14'], ['Dimethicone', '3'], ['Alcohol Denat.', '4'], ['Petrolatum', '2'], ['Hydrolyzed Wheat Protein', '2'], ['Prunus Amygdalus Dulcis Oil', '4'],
      ['Tetrasodium EDTA', '0.1'], ['Methylparaben', '0.2', 'preservative'], ['Lavandula Angustifolia Oil', '1', 'fragrance'], ['CI 19140', '0.1', 'colourant'], ['PEG-7 Glyceryl Cocoate', '0.9'],
    ],
  },
  /** Two oils from plants and nothing else. */
  plain: { category: 'body-oil', composition: [['Simmondsia Chinensis Seed Oil', '90'], ['Rosa Canina Fruit Oil', '10']] },
  soap: { category: 'soap-bar', facts: { pH: '9.6' }, composition: [['Sodium Olivate', '70'], ['Sodium Cocoate', '15'], ['Aqua', '10'], ['Glycerin', '4'], ['Kaolin', '1']] },
} as const satisfies Record<string, Recipe>;

export type FormulaKey = keyof typeof RECIPES;

/** The document of one of these products with these claims. */
export function claimed(key: FormulaKey, claims: FormulaDocument['product']['claims'], more: { readonly name?: string; readonly markets?: readonly Market[] } = {}): FormulaDocument {
  const recipe: Recipe = RECIPES[key];
  const base = material('base', recipe.composition.map(([inci, share, purpose]) => part(inci, share, purpose ? { purpose } : {})));
  const perfume = recipe.perfume === undefined ? [] : [material('perfume', [], { declareAs: 'parfum' as const })];
  return formula([base, ...perfume], [line('base', '99.5 g'), ...perfume.map(({ id }) => line(id, `${recipe.perfume!} g`))], {
    product: { name: more.name ?? 'No. 4', category: recipe.category, markets: [...(more.markets ?? (['EU', 'UK', 'US', 'CA'] as const))], facts: recipe.facts ?? {}, claims },
  });
}

import type { LabelInput } from '#shared/artwork/label-input.ts';
import type { Market } from '#shared/law/types.ts';

/** Invented products of an invented house, for the label tests. */
export const bodyWash: LabelInput = {
  market: 'EU', languages: ['en'],
  container: { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' },
  brand: 'Brackenmere Bathhouse', name: 'Juniper & Oat Body Wash', functionName: 'Body wash', claim: 'Leaves skin feeling soft',
  netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: 12 },
  directions: 'Lather on wet skin and rinse.',
  warnings: ['Avoid contact with the eyes. If it gets into them, rinse well with water.'],
  ingredients: {
    heading: 'Ingredients',
    body: 'Aqua, Decyl Glucoside, Cocamidopropyl Betaine, Glycerin, Xanthan Gum, Phenoxyethanol, Sodium Chloride, Lavandula Oil/Extract, Citric Acid, Avena Sativa Kernel Extract, Ethylhexylglycerin, Linalyl Acetate, Linalool.',
  },
  responsiblePerson: { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' },
  contact: '', countryOfOrigin: 'Exampleland', batchCode: 'BW-0412',
  barcode: { symbology: 'EAN-13', digits: '9521234567899' }, ink: 'juniper',
};

const US_BODY = bodyWash.ingredients!.body.replace('Aqua', 'Water').replace('Lavandula Oil/Extract', 'Lavandula Angustifolia (Lavender) Oil').replace(', Linalyl Acetate, Linalool', '');

/** The same product as another market prints it. */
export function inMarket(market: Market, input: LabelInput = bodyWash): LabelInput {
  if (market === 'EU') return { ...input, market };
  if (market === 'UK') return { ...input, market, responsiblePerson: { name: 'Brackenmere Bathhouse', address: '12 Weir Lane, Exampleham EX0 0EX' } };
  if (market === 'US') {
    return {
      ...input, market, ingredients: { heading: 'Ingredients', body: US_BODY }, contact: 'hello@brackenmere.example',
      responsiblePerson: { name: 'Brackenmere Bathhouse', address: 'PO Box 0, Exampleton, ME 00000' },
      barcode: { symbology: 'UPC-A', digits: '036000291452' },
    };
  }
  return {
    ...input, market, languages: ['en', 'fr'], contact: 'hello@brackenmere.example',
    directions: 'Lather on wet skin and rinse.\nFaire mousser sur peau mouillée, rincer.',
    functionName: 'Body wash / Gel douche',
    warnings: ['Avoid contact with the eyes.', 'Éviter le contact avec les yeux.'],
    claim: undefined,
  };
}

const NAMES = [
  'Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Butyrospermum Parkii Butter', 'Helianthus Annuus Seed Oil', 'Decyl Glucoside', 'Cocamidopropyl Betaine', 'Caprylic/Capric Triglyceride',
  'Sodium Lauroyl Methyl Isethionate', 'Coco-Glucoside', 'Squalane', 'Panthenol', 'Niacinamide', 'Simmondsia Chinensis Seed Oil', 'Prunus Amygdalus Dulcis Oil', 'Tocopherol', 'Xanthan Gum', 'Phenoxyethanol',
  'Ethylhexylglycerin', 'Sodium Hyaluronate', 'Allantoin', 'Avena Sativa Kernel Extract', 'Rosmarinus Officinalis Leaf Extract', 'Calendula Officinalis Flower Extract', 'Citric Acid', 'Sodium Benzoate', 'Potassium Sorbate',
  'Dehydroacetic Acid', 'Benzyl Alcohol', 'Lactic Acid', 'Sodium Gluconate', '1,2-Hexanediol', 'Caprylyl Glycol', 'Polyglyceryl-3 Dicitrate/Stearate', 'Hydroxyethyl Acrylate/Sodium Acryloyldimethyl Taurate Copolymer',
  'Hydrolyzed Wheat Protein', 'Zinc Oxide (nano)', 'Titanium Dioxide (nano)', 'Parfum', 'Linalool', 'Limonene', 'Citral', 'Geraniol', 'Citronellol', 'Coumarin', 'Eugenol', 'Farnesol', 'Benzyl Salicylate', 'Hexyl Cinnamal', 'Alpha-Isomethyl Ionone',
  'Lavandula Oil/Extract', 'Citrus Limon Peel Oil', 'Mentha Piperita Oil', 'Pinene', 'Linalyl Acetate', 'Camphor', 'CI 77891', 'CI 77491', 'CI 19140', 'CI 42090',
];

/** An ingredient list of `count` names. */
export function listOf(count: number): string {
  return `${NAMES.slice(0, count).join(', ')}.`;
}

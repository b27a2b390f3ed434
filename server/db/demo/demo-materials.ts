import type { CompositionLine, ConstituentLine, MaterialFields } from '#shared/contracts/materials.contract.ts';

/** Bought materials of the invented house; suppliers, prices and analyses are invented too. */

const QUILLMERE = 'Quillmere Raw Goods';
const THRUSSEL = 'Thrussel and Vane';
const HOBBLEFORD = 'Hobbleford Oils';
const SALTGARTH = 'Saltgarth Minerals';

type Extra = Partial<Pick<MaterialFields, 'constituents' | 'declareAs' | 'notes' | 'handling'>>;

function material(tradeName: string, supplier: string, pricePerKg: string, composition: CompositionLine[], extra: Extra = {}): MaterialFields {
  return { tradeName, supplier, declareAs: 'ingredients', composition, constituents: [], pricePerKg, currency: 'EUR', notes: '', handling: {}, ...extra };
}
const all = (inci: string): CompositionLine[] => [{ inci, percent: '100' }];
const part = (inci: string, percent: string, more: Partial<CompositionLine> = {}): CompositionLine => ({ inci, percent, ...more });
const range = (inci: string, min: string, max: string): CompositionLine => ({ inci, min, max });
const inside = (name: string, min: string, max: string): ConstituentLine => ({ name, min, max, basis: 'supplier' });
const exactly = (name: string, percent: string): ConstituentLine => ({ name, percent, basis: 'supplier' });

export const DEMO_MATERIALS = {
  water: material('Purified water', '', '0.02', all('Aqua')),
  glucoside: material('Mild glucoside, 52 % active', THRUSSEL, '4.10', [part('Decyl Glucoside', '52'), part('Aqua', '48')], { notes: 'Strongly alkaline as delivered: bring the batch to pH 5 to 5.5 with citric acid.' }),
  amphoteric: material('Amphoteric surfactant, 38 % solids', THRUSSEL, '3.40', [range('Aqua', '61', '65'), range('Cocamidopropyl Betaine', '29', '32'), range('Sodium Chloride', '4', '7')]),
  glycerine: material('Vegetable glycerine', QUILLMERE, '2.90', all('Glycerin')),
  oatExtract: material('Oat extract in water and glycerine', QUILLMERE, '18.50', [part('Aqua', '68'), part('Glycerin', '30'), part('Avena Sativa Kernel Extract', '2')], {
    handling: { heatLimitC: '50', basis: 'common-practice', note: 'Add below 50 °C (122 °F).' },
  }),
  gum: material('Xanthan gum, clear', QUILLMERE, '14.20', all('Xanthan Gum'), { handling: { hydrateHours: '1', basis: 'common-practice', note: 'Wet with glycerine first.' } }),
  preserver: material('Preservative blend', THRUSSEL, '22.00', [part('Phenoxyethanol', '90', { purpose: 'preservative' }), part('Ethylhexylglycerin', '10')], {
    handling: { heatLimitC: '80', phFrom: '3', phTo: '10', basis: 'supplier' },
  }),
  citric: material('Citric acid', QUILLMERE, '3.10', all('Citric Acid')),
  lavender: material('Lavender oil', HOBBLEFORD, '96.00', [part('Lavandula Angustifolia Oil', '100', { purpose: 'fragrance' })], {
    constituents: [inside('Linalool', '25', '38'), inside('Linalyl Acetate', '25', '45'), inside('Limonene', '0', '1')],
    handling: { heatLimitC: '40', basis: 'common-practice', note: 'Add last: the scent leaves with the warmth.' },
  }),
  juniper: material('Juniper berry extract, drawn with carbon dioxide', HOBBLEFORD, '310.00', [part('Juniperus Communis Fruit Extract', '100')], {
    constituents: [inside('alpha-Pinene', '20', '40'), inside('Limonene', '2', '6')],
    handling: { heatLimitC: '40', basis: 'common-practice' },
  }),
  mallow: material('Mallow flower extract, dry', QUILLMERE, '86.00', all('Malva Sylvestris Flower Extract'), { notes: 'Colours the water faintly blue, then grey.' }),
  wax: material('Emulsifying wax', THRUSSEL, '7.80', [range('Cetearyl Alcohol', '70', '80'), range('Ceteareth-20', '20', '30')]),
  shea: material('Shea butter', HOBBLEFORD, '8.60', all('Butyrospermum Parkii Butter'), { notes: 'Cool quickly once melted, or it turns grainy.' }),
  sunflower: material('Sunflower oil with vitamin E', HOBBLEFORD, '3.95', [part('Helianthus Annuus Seed Oil', '99.5'), part('Tocopherol', '0.5')]),
  mildPreserver: material(
    'Preservative blend, benzyl alcohol',
    THRUSSEL,
    '19.50',
    [
      { inci: 'Benzyl Alcohol', min: '83', max: '90', purpose: 'preservative' },
      { inci: 'Dehydroacetic Acid', min: '7', max: '9', purpose: 'preservative' },
      { inci: 'Aqua', min: '2', max: '9' },
    ],
    { handling: { heatLimitC: '60', phFrom: '2', phTo: '7', basis: 'supplier' } },
  ),
  meadow: material('Perfume, meadow', HOBBLEFORD, '140.00', [], {
    declareAs: 'parfum',
    constituents: [exactly('Linalool', '4'), exactly('Geranial', '0.2'), exactly('Neral', '0.15'), exactly('Coumarin', '0.1')],
  }),
  epsom: material('Epsom salt, fine', SALTGARTH, '1.10', all('Magnesium Sulfate')),
  seaSalt: material('Sea salt, coarse', SALTGARTH, '0.90', [part('Maris Sal', '100')]),
  soda: material('Bicarbonate of soda', SALTGARTH, '1.30', all('Sodium Bicarbonate')),
  kaolin: material('White clay', SALTGARTH, '2.70', all('Kaolin')),
  ironBlack: material('Black iron oxide', SALTGARTH, '24.00', [part('CI 77499', '100', { purpose: 'colourant' })]),
  soapBase: material('Soap noodles, olive and coconut', THRUSSEL, '4.60', [range('Sodium Olivate', '60', '64'), range('Sodium Cocoate', '18', '22'), range('Aqua', '10', '14'), range('Glycerin', '4', '6')]),
  cedar: material('Cedarwood oil', HOBBLEFORD, '42.00', [part('Cedrus Atlantica Wood Oil', '100', { purpose: 'fragrance' })], { handling: { heatLimitC: '40', basis: 'common-practice' } }),
  beeswax: material('Beeswax pellets', HOBBLEFORD, '15.40', all('Cera Alba')),
  castor: material('Castor oil', HOBBLEFORD, '5.20', all('Ricinus Communis Seed Oil')),
  coconut: material('Coconut oil', HOBBLEFORD, '4.80', all('Cocos Nucifera Oil')),
  vitaminE: material('Vitamin E, natural', QUILLMERE, '48.00', [part('Tocopherol', '70'), part('Helianthus Annuus Seed Oil', '30')]),
  oatFlour: material('Colloidal oat', QUILLMERE, '11.90', all('Avena Sativa Kernel Flour')),
} satisfies Record<string, MaterialFields>;

export type DemoMaterial = keyof typeof DEMO_MATERIALS;

import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { demoDraft, demoLabel, phase } from './draft-parts.ts';

const grams = (value: string): ProductDraft['formula']['batchSize'] => ({ value, unit: 'g' });

/** Waits for two decisions: the betaine's range leaves one pair and one zone open. */
const bodyWash = demoDraft(
  {
    name: 'Juniper & Oat Body Wash',
    category: 'body-wash',
    markets: ['EU', 'US'],
    netContent: { value: '250', unit: 'ml' },
    durability: { kind: 'pao', months: 12 },
    formula: {
      batchSize: grams('500'),
      phases: [
        phase(
          'Water',
          [['water', ''], ['gum', '5'], ['glycerine', '15'], ['oatExtract', '25']],
          [
            { text: 'Wet the gum with the glycerine, then stir into the water.', time: { value: '10', unit: 'min' } },
            { text: 'Leave to swell, then stir in the oat extract.', time: { value: '1', unit: 'h' } },
          ],
        ),
        phase('Surfactant', [['glucoside', '90'], ['amphoteric', '75']], [{ text: 'Stir in slowly, without drawing in air.', warm: ['20', '30'], time: { value: '20', unit: 'min' } }]),
        phase(
          'Cool-down',
          [['preserver', '5'], ['citric', '1.25'], ['lavender', '1.5'], ['juniper', '0.1']],
          [{ text: 'Dissolve the lavender oil and the juniper extract in the preservative, stir in, then bring to pH 5.3 with the citric acid.', warm: ['20', '30'] }],
        ),
      ],
    },
    label: demoLabel(
      { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5', name: 'Bottle, 250 ml' },
      { barcode: { symbology: 'EAN-13', digits: '9521234567899' } },
    ),
  },
  {
    placedOnMarket: '2026-12-01',
    availableOn: '2026-12-01',
    facts: { pH: '5.3', physicalForm: 'liquid' },
    claims: [{ text: 'Leaves skin feeling soft', lang: 'en' }],
    particulars: { countryOfOrigin: '', batchCode: 'BW-0412', function: 'Body wash', directions: 'Lather on wet skin and rinse.' },
  },
);

/** Stops: two digits of the water line are exchanged (142.8 g for 124.8 g). */
const handCream = demoDraft(
  {
    name: 'Fen Mallow Hand Cream',
    category: 'hand-cream',
    markets: ['EU', 'UK', 'US', 'CA'],
    netContent: { value: '75', unit: 'ml' },
    durability: { kind: 'pao', months: 6 },
    formula: {
      batchSize: grams('200'),
      phases: [
        phase('Water', [['water', '142.8'], ['glycerine', '10'], ['mallow', '0.2']], [{ text: 'Dissolve the mallow extract, then heat together.', warm: ['70', '75'] }]),
        phase('Oil', [['wax', '14'], ['shea', '16'], ['sunflower', '32.6']], [{ text: 'Melt together, pour into the water and stir fast.', warm: ['70', '75'], time: { value: '5', unit: 'min' } }]),
        phase('Cool-down', [['mildPreserver', '1.6'], ['meadow', '0.8']], [{ text: 'Stir in once below 40 °C.', warm: ['35', '40'] }]),
      ],
    },
    label: demoLabel({ shape: 'flat', widthMm: '56', heightMm: '104', name: 'Tube, 75 ml' }, { ink: 'mallow', template: 'versal' }),
  },
  {
    placedOnMarket: '2026-12-01',
    availableOn: '2026-12-01',
    facts: { physicalForm: 'cream' },
    particulars: { batchCode: 'HC-0093', function: 'Hand cream', directions: 'Massage into clean, dry hands.' },
  },
);

const bathSalts = demoDraft(
  {
    name: 'Weir Bath Salts',
    category: 'bath-salts',
    markets: ['EU', 'UK'],
    netContent: { value: '400', unit: 'g' },
    durability: { kind: 'pao', months: 12 },
    formula: {
      batchSize: grams('4000'),
      phases: [
        phase('Salts', [['epsom', ''], ['seaSalt', '1200'], ['soda', '320']], [{ text: 'Turn in the drum until even.', time: { value: '10', unit: 'min' } }]),
        phase('Scent', [['lavender', '24'], ['cedar', '8']], [{ text: 'Spray on while turning, then let it draw in.', time: { value: '8', unit: 'h' } }]),
      ],
    },
    label: demoLabel({ shape: 'flat', widthMm: '80', heightMm: '64', name: 'Pouch, 400 g' }, { ink: 'sloe' }),
  },
  { facts: { physicalForm: 'solid' }, particulars: { batchCode: 'WS-0031', function: 'Bath salts', directions: 'Dissolve a handful in a warm bath.' } },
);

const soapBar = demoDraft(
  {
    name: 'Peat & Cedar Soap Bar',
    category: 'soap-bar',
    markets: ['EU', 'UK'],
    netContent: { value: '110', unit: 'g' },
    durability: { kind: 'pao', months: 24 },
    formula: {
      batchSize: null,
      phases: [
        phase('Base', [['soapBase', '96.2'], ['kaolin', '2.4']], [{ text: 'Mill three times.' }], '%'),
        phase('Colour and scent', [['ironBlack', '0.4'], ['cedar', '1']], [{ text: 'Work in cold, mill once more, press.', warm: ['20', '35'] }], '%'),
      ],
    },
    label: demoLabel({ shape: 'flat', widthMm: '84', heightMm: '50', name: 'Carton, 110 g' }, { ink: 'bark' }),
  },
  { facts: { physicalForm: 'solid' }, particulars: { batchCode: 'PC-0208', function: 'Soap', directions: 'Lather with water and rinse.' } },
);

/** Nothing broken: five plain materials, no scent, no water. */
const lipBalm = demoDraft(
  {
    name: 'Reed Lip Balm',
    category: 'lip-balm',
    markets: ['EU'],
    netContent: { value: '12', unit: 'g' },
    durability: { kind: 'best-before', date: '2028-11' },
    formula: {
      batchSize: grams('240'),
      phases: [
        phase(
          'Melt',
          [['castor', ''], ['beeswax', '48'], ['coconut', '48'], ['shea', '36']],
          [{ text: 'Melt together gently.', warm: ['70', '75'] }],
        ),
        phase('Cool-down', [['vitaminE', '1.2']], [{ text: 'Stir in and pour.', warm: ['60', '65'] }]),
      ],
    },
    label: demoLabel({ shape: 'flat', widthMm: '66', heightMm: '52', name: 'Carton, 12 g' }, { ink: 'black' }),
  },
  { facts: { physicalForm: 'solid' }, particulars: { batchCode: 'RL-0116', function: 'Lip balm', directions: 'Smooth over the lips.' } },
);

/** Stops: 1.4 % of the blend brings 1.26 % phenoxyethanol; a hot step harms the oat extract. */
const bodyLotion = demoDraft(
  {
    name: 'Oat Milk Body Lotion',
    category: 'body-lotion',
    markets: ['EU', 'UK', 'US', 'CA'],
    netContent: { value: '200', unit: 'ml' },
    durability: { kind: 'pao', months: 6 },
    formula: {
      batchSize: grams('1000'),
      phases: [
        phase('Water', [['water', ''], ['glycerine', '40'], ['gum', '2.5'], ['oatExtract', '30']], [{ text: 'Wet the gum with the glycerine, add the rest and heat.', warm: ['70', '75'], time: { value: '20', unit: 'min' } }]),
        phase('Oil', [['sunflower', '110'], ['wax', '45'], ['shea', '25'], ['oatFlour', '8']], [{ text: 'Melt together, pour into the water and stir fast.', warm: ['70', '75'], time: { value: '10', unit: 'min' } }]),
        phase('Cool-down', [['preserver', '14'], ['citric', '0.6']], [{ text: 'Stir in and bring to pH 5.5.', warm: ['30', '40'] }]),
      ],
    },
    label: demoLabel({ shape: 'cylinder', diameterMm: '52', labelHeightMm: '110', overlapMm: '5', name: 'Bottle, 200 ml' }, { ink: 'bark' }),
  },
  { facts: { pH: '5.5', physicalForm: 'cream' }, claims: [{ text: 'With oat', lang: 'en' }], particulars: { batchCode: 'OL-0007', function: 'Body lotion', directions: 'Smooth over dry skin.' } },
);

/** The products of the demo house, the one last worked on first. */
export const DEMO_PRODUCTS: readonly ProductDraft[] = [bodyWash, handCream, bathSalts, soapBar, lipBalm, bodyLotion];

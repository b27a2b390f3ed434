import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { demoId } from './demo-id.ts';
import { demoDraft, demoLabel } from './draft-parts.ts';

/** The second house has one material and one product, so that houses can be seen to be apart. */

export const OTTERBY_MATERIAL: { readonly id: string; readonly fields: MaterialFields } = {
  id: demoId('otterby material soap'),
  fields: {
    tradeName: 'Olive soap, cured',
    supplier: 'Otterby Still Room',
    declareAs: 'ingredients',
    composition: [
      { inci: 'Sodium Olivate', percent: '82' },
      { inci: 'Aqua', percent: '12' },
      { inci: 'Glycerin', percent: '6' },
    ],
    constituents: [],
    pricePerKg: '5.00',
    currency: 'EUR',
    notes: 'Our own boil.',
    handling: {},
  },
};

const draft = demoDraft({
  name: 'Plain Olive Bar',
  category: 'soap-bar',
  markets: ['EU'],
  netContent: { value: '90', unit: 'g' },
  durability: { kind: 'pao', months: 24 },
  formula: {
    batchSize: null,
    phases: [{ id: 'bar', name: 'Bar', lines: [{ id: 'bar-1', materialId: OTTERBY_MATERIAL.id, amount: '100', unit: '%' }], steps: [] }],
  },
  label: demoLabel({ shape: 'flat', widthMm: '84', heightMm: '50', name: 'Band, 90 g' }, { ink: 'black' }),
});

export const OTTERBY_PRODUCT: { readonly id: string; readonly draft: ProductDraft } = {
  id: demoId('otterby product bar'),
  draft: {
    ...draft,
    brand: 'Otterby Still Room',
    particulars: {
      ...draft.particulars,
      responsiblePerson: { EU: { name: 'Otterby Still Room', address: '1 Mill Lane, 0000 Exampleford' } },
      batchCode: 'OB-0001',
      function: 'Soap',
      directions: 'Lather with water and rinse.',
    },
  },
};

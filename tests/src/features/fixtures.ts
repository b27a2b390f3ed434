import type { FormulaLine, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Product, ProductSummary } from '#shared/contracts/products.contract.ts';

/** Material ids of the fixtures, readable. */
export const uuid = (n: number): string => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
export const NAMES: Readonly<Record<string, string>> = { [uuid(1)]: 'Purified water', [uuid(2)]: 'Xanthan gum', [uuid(3)]: 'Mild glucoside', [uuid(4)]: 'Lavender oil' };
export const nameOf = (id: string): string => NAMES[id] ?? id;

export const line = (id: string, material: number, amount: string, unit: FormulaLine['unit'] = 'g'): FormulaLine => ({ id, materialId: uuid(material), amount, unit });

/** An invented body wash: 500 g, water makes up the batch. */
export function makeDraft(over: Partial<ProductDraft> = {}): ProductDraft {
  return {
    name: 'Sluice Wash', brand: 'Brackenmere Bathhouse', category: 'body-wash', markets: ['EU'], placedOnMarket: '2026-12-01', availableOn: '2026-12-01',
    flags: {}, facts: {}, readyForUse: null, netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: 12 }, claims: [],
    particulars: { responsiblePerson: {}, usContact: '', canadaContact: '', countryOfOrigin: '', batchCode: '', function: '', directions: '', warnings: [] },
    mayContain: [],
    formula: {
      batchSize: { value: '500', unit: 'g' },
      phases: [
        { id: 'a', name: 'Water', lines: [line('water', 1, '', 'qs'), line('gum', 2, '5')], steps: [] },
        { id: 'b', name: 'Cool-down', lines: [line('apg', 3, '90'), { ...line('oil', 4, '1.5'), pastedPercent: '3' }], steps: [] },
      ],
    },
    declaration: { freeOrder: {}, joinedNames: false },
    label: { container: { shape: 'flat', widthMm: '60', heightMm: '90' }, bleedMm: '3', languages: ['en'], market: 'EU', barcode: null, press: { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' }, template: 'galley', ink: '' },
    ...over,
  };
}
export function makeProduct(draft = makeDraft(), version = 7): Product {
  return { id: uuid(90), version, savedAt: '2026-12-01T09:14:00.000Z', savedBy: 'Ida Fenn', archived: false, draft };
}
/** A row of the product list. */
export function makeSummary(n: number, name: string, counts: ProductSummary['counts'], more: Partial<ProductSummary> = {}): ProductSummary {
  return { id: uuid(n), version: 1, name, brand: 'Brackenmere', category: 'body-wash', markets: ['EU'], netContent: '250 ml', savedAt: '2026-12-01T09:00:00.000Z', savedBy: 'Ines Tarrow', archived: false, counts, headline: '', ...more };
}

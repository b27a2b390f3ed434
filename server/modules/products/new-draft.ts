import type { House } from '#shared/contracts/house.contract.ts';
import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Market } from '#shared/law/types.ts';

type Prints = Pick<House, 'brand' | 'responsiblePerson' | 'usContact' | 'canadaContact' | 'countryOfOrigin'>;

/** A bottle of 250 ml, the commonest of a small house (common practice, no source); chosen anew on the label's screen. */
const FIRST_LABEL: Omit<LabelSettings, 'market'> = {
  container: { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5', name: 'Bottle, 250 ml' },
  bleedMm: '3',
  languages: ['en'],
  barcode: null,
  press: { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' },
  template: 'galley',
  ink: 'juniper',
};

/** A product with nothing in it yet but what the house prints on all of its labels. */
export function newDraft(asked: { readonly name: string; readonly category: string; readonly markets: readonly Market[] }, house: Prints): ProductDraft {
  const party = Object.fromEntries(Object.entries(house.responsiblePerson).filter(([market]) => asked.markets.some((one) => one === market)));
  return {
    name: asked.name,
    brand: house.brand,
    category: asked.category,
    markets: [...new Set(asked.markets)],
    placedOnMarket: null,
    availableOn: null,
    flags: {},
    facts: {},
    readyForUse: null,
    netContent: null,
    durability: null,
    claims: [],
    particulars: {
      responsiblePerson: party,
      usContact: asked.markets.includes('US') ? house.usContact : '',
      canadaContact: asked.markets.includes('CA') ? house.canadaContact : '',
      countryOfOrigin: house.countryOfOrigin,
      batchCode: '',
      function: '',
      directions: '',
      warnings: [],
    },
    mayContain: [],
    formula: { batchSize: null, phases: [{ id: 'phase-1', name: 'Phase A', lines: [], steps: [] }] },
    declaration: { freeOrder: {}, joinedNames: false },
    label: { ...FIRST_LABEL, market: asked.markets[0] ?? 'EU' },
  };
}

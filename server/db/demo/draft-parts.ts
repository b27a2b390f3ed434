import type { FormulaLine, Phase, ProcessStep, ProductDraft } from '#shared/contracts/product-draft.ts';
import { demoId } from './demo-id.ts';
import type { DemoMaterial } from './demo-materials.ts';

/** The id of a demo material in Brackenmere's store. */
export function demoMaterialId(key: DemoMaterial): string {
  return demoId(`material ${key}`);
}

type Line = readonly [key: DemoMaterial, amount: string];
interface Step {
  readonly text: string;
  readonly warm?: readonly [from: string, to: string];
  readonly time?: { readonly value: string; readonly unit: 'min' | 'h' };
}

/** One phase; a line without an amount makes up the batch. Amounts in grams unless told. */
export function phase(name: string, lines: readonly Line[], steps: readonly Step[] = [], unit: 'g' | '%' = 'g'): Phase {
  const mark = name.toLowerCase().replaceAll(' ', '-');
  return {
    id: mark,
    name,
    lines: lines.map(([key, amount], index): FormulaLine => ({ id: `${mark}-${index + 1}`, materialId: demoMaterialId(key), amount, unit: amount === '' ? 'qs' : unit })),
    steps: steps.map(
      ({ text, warm, time }, index): ProcessStep => ({
        id: `${mark}-step-${index + 1}`,
        text,
        temperature: warm ? { from: warm[0], to: warm[1], unit: 'C' } : null,
        time: time ?? null,
      }),
    ),
  };
}

const EU_PARTY = { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' };
const US_PARTY = { name: 'Brackenmere Bathhouse', address: 'PO Box 0, Exampleton, ME 00000' };
const UK_PARTY = { name: 'Brackenmere Bathhouse UK', address: '9 Sluice Yard, Exampleton EX0 0EX' };
const CA_PARTY = { name: 'Brackenmere Bathhouse', address: '12 Example Street, Exampleville ON A0A 0A0' };
export const DEMO_PARTIES = { EU: EU_PARTY, UK: UK_PARTY, US: US_PARTY, CA: CA_PARTY } as const;

type Needed = Pick<ProductDraft, 'name' | 'category' | 'markets' | 'netContent' | 'durability' | 'formula' | 'label'>;
type Optional = Partial<Omit<ProductDraft, keyof Needed | 'particulars'>> & { readonly particulars?: Partial<ProductDraft['particulars']> };

/** A draft with what the demo's products have in common. */
export function demoDraft(needed: Needed, optional: Optional = {}): ProductDraft {
  const { particulars, ...rest } = optional;
  const parties = Object.fromEntries(needed.markets.map((market) => [market, DEMO_PARTIES[market]]));
  return {
    brand: 'Brackenmere Bathhouse',
    placedOnMarket: null,
    availableOn: null,
    flags: {},
    facts: {},
    readyForUse: null,
    claims: [],
    mayContain: [],
    declaration: { freeOrder: {}, joinedNames: false },
    ...rest,
    ...needed,
    particulars: {
      responsiblePerson: parties,
      usContact: needed.markets.includes('US') ? 'hello@brackenmere.example' : '',
      canadaContact: needed.markets.includes('CA') ? 'hello@brackenmere.example' : '',
      countryOfOrigin: 'Exampleland',
      batchCode: '',
      function: '',
      directions: '',
      warnings: [],
      ...particulars,
    },
  };
}

type Container = ProductDraft['label']['container'];

/** Label settings with the demo's usual press. */
export function demoLabel(container: Container, more: Partial<ProductDraft['label']> = {}): ProductDraft['label'] {
  return {
    container,
    bleedMm: '3',
    languages: ['en'],
    market: 'EU',
    barcode: null,
    press: { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' },
    template: 'galley',
    ink: 'juniper',
    ...more,
  };
}

import type { ByHand } from './by-hand.ts';
import { z } from './zod.ts';
import type { Market, ProductFlag, Purpose } from '#shared/law/types.ts';

/** A formula document as the engine reads it: checked, every quantity a plain decimal text. */
export interface FormulaDocument {
  readonly document: 'formula/1';
  readonly product: DocumentProduct;
  readonly materials: readonly DocumentMaterial[];
  readonly formula: {
    /** In grams. */
    readonly batchSize?: string;
    readonly lines: readonly DocumentLine[];
  };
  /** Chosen order inside the free zone, and the form of names. */
  readonly declaration?: {
    readonly freeOrder?: Readonly<Partial<Record<Market, readonly string[]>>>;
    readonly joinedNames?: boolean;
  };
  readonly label?: DocumentLabel;
}

export interface DocumentProduct {
  readonly name: string;
  readonly brand: string;
  readonly category: string;
  readonly markets: readonly Market[];
  readonly placedOnMarket?: string;
  readonly availableOn?: string;
  readonly flags: Readonly<Partial<Record<ProductFlag, boolean>>>;
  readonly facts: Readonly<Record<string, string | boolean>>;
  readonly readyForUse?: { readonly productParts: string; readonly otherParts: string };
  readonly netContent?: { readonly value: string; readonly unit: 'g' | 'ml' };
  readonly durability?: { readonly kind: 'pao'; readonly months: string } | { readonly kind: 'best-before'; readonly date: string };
  readonly claims: readonly { readonly text: string; readonly lang: string }[];
  readonly particulars?: DocumentParticulars;
  readonly mayContain: readonly { readonly inci: string; readonly usName?: string }[];
}

export interface DocumentParticulars {
  readonly responsiblePerson: Readonly<Partial<Record<Market, { readonly name: string; readonly address: string }>>>;
  readonly usContact?: string;
  readonly canadaContact?: string;
  readonly countryOfOrigin?: string;
  readonly batchCode?: string;
  readonly function?: string;
  readonly directions?: string;
  /** `lang` is absent where the document gives a bare text. */
  readonly warnings: readonly { readonly text: string; readonly lang?: string }[];
}

/** `percent`, or `min` and `max` with or without `typical`: shares of the material. */
export interface DocumentShare {
  readonly percent?: string;
  readonly min?: string;
  readonly typical?: string;
  readonly max?: string;
}

export interface DocumentPart extends DocumentShare {
  readonly inci: string;
  readonly cas?: string;
  readonly nano?: boolean;
  readonly purpose?: Purpose;
  readonly usName?: string;
  readonly role: 'ingredient' | 'incidental';
}

export interface DocumentConstituent extends DocumentShare {
  readonly name: string;
  readonly cas?: string;
}

export interface DocumentMaterial {
  readonly id: string;
  readonly tradeName: string;
  readonly supplier?: string;
  readonly declareAs: 'ingredients' | 'parfum' | 'aroma';
  readonly composition: readonly DocumentPart[];
  readonly constituents: readonly DocumentConstituent[];
  /** What its certificates say, by the key of a condition. */
  readonly facts?: Readonly<Record<string, string | boolean>>;
}

export interface DocumentLine {
  readonly material: string;
  readonly phase: string;
  /** Empty for the line that makes up the batch. */
  readonly amount: string;
  readonly unit: 'g' | '%' | 'qs';
}

export type DocumentContainer =
  | { readonly shape: 'cylinder'; readonly diameterMm: string; readonly labelHeightMm: string; readonly overlapMm: string; readonly stockMm?: string }
  | { readonly shape: 'flat'; readonly widthMm: string; readonly heightMm: string }
  | { readonly shape: 'taper'; readonly topDiameterMm: string; readonly bottomDiameterMm: string; readonly labelHeightMm: string; readonly overlapMm: string };

export interface DocumentLabel {
  readonly container?: DocumentContainer;
  readonly bleedMm?: string;
  readonly languages?: readonly string[];
  readonly market?: Market;
  readonly barcode?: { readonly symbology: 'EAN-13' | 'UPC-A'; readonly digits: string };
  readonly press?: { readonly standard?: 'PDF/X-1a:2003' | 'PDF/X-4'; readonly condition?: string };
  readonly template?: string;
  readonly ink?: string;
  readonly byHand?: ByHand;
}

/** One fault of an input: where it stands and what is wrong, in a maker's words. */
export interface Fault {
  readonly pointer: string;
  readonly message: string;
}

const quantity = z
  .union([z.string().regex(/^-?\d+(\.\d+)?$/).max(60), z.number()])
  .describe('A decimal as text, such as "43.25"; a number is read by its shortest decimal form.');
const amount = z
  .union([z.string().regex(/^\d+(\.\d+)?$/).max(60), z.number().min(0)])
  .describe('A decimal that is not negative, as text; a number is read by its shortest decimal form.');
const percent = amount.describe('A share of the material in percent, from 0 to 100.');
const share = { percent: percent.optional(), min: percent.optional(), typical: percent.optional(), max: percent.optional() };
const market = z.enum(['EU', 'UK', 'US', 'CA']);
const party = z.looseObject({ name: z.string(), address: z.string() });
const langText = z.looseObject({ text: z.string(), lang: z.string() });
const day = z.iso.date();

const part = z.looseObject({
  inci: z.string(),
  cas: z.string().optional(),
  ...share,
  nano: z.boolean().optional(),
  purpose: z.enum(['preservative', 'fragrance', 'colourant', 'uv-filter', 'other']).optional(),
  usName: z.string().optional(),
  role: z.enum(['ingredient', 'incidental']).optional(),
});
const constituent = z.looseObject({ name: z.string(), cas: z.string().optional(), ...share });
const material = z.looseObject({
  id: z.string(),
  tradeName: z.string().optional(),
  supplier: z.string().optional(),
  declareAs: z.enum(['ingredients', 'parfum', 'aroma']).optional(),
  composition: z.array(part).optional(),
  constituents: z.array(constituent).optional(),
  facts: z.record(z.string(), z.union([z.string(), z.boolean(), quantity])).optional(),
});
const line = z.looseObject({
  material: z.string(),
  phase: z.string().optional(),
  amount: amount.optional(),
  unit: z.enum(['g', '%', 'qs']),
});
const container = z.discriminatedUnion('shape', [
  z.looseObject({ shape: z.literal('cylinder'), diameterMm: amount, labelHeightMm: amount, overlapMm: amount.optional(), stockMm: amount.optional() }),
  z.looseObject({ shape: z.literal('flat'), widthMm: amount, heightMm: amount }),
  z.looseObject({ shape: z.literal('taper'), topDiameterMm: amount, bottomDiameterMm: amount, labelHeightMm: amount, overlapMm: amount.optional() }),
]);

const product = z.looseObject({
  name: z.string().optional(),
  brand: z.string().optional(),
  category: z.string().describe('Slug of the product-category table.'),
  markets: z.array(market).optional(),
  placedOnMarket: day.optional(),
  availableOn: day.optional(),
  under3: z.boolean().optional(),
  professionalUseOnly: z.boolean().optional(),
  aerosol: z.boolean().optional(),
  spray: z.boolean().optional(),
  intimateHygiene: z.boolean().optional(),
  facts: z.record(z.string(), z.union([z.string(), z.boolean(), quantity])).optional(),
  readyForUse: z.looseObject({ productParts: amount, otherParts: amount }).optional(),
  netContent: z.looseObject({ value: amount, unit: z.enum(['g', 'ml']) }).optional(),
  durability: z
    .discriminatedUnion('kind', [
      z.looseObject({ kind: z.literal('pao'), months: amount }),
      z.looseObject({ kind: z.literal('best-before'), date: z.string().regex(/^\d{4}-\d{2}(-\d{2})?$/) }),
    ])
    .optional(),
  claims: z.array(langText).optional(),
  particulars: z
    .looseObject({
      responsiblePerson: z.partialRecord(market, party).optional(),
      usContact: z.string().optional(),
      canadaContact: z.string().optional(),
      countryOfOrigin: z.string().optional(),
      batchCode: z.string().optional(),
      function: z.string().optional(),
      directions: z.string().optional(),
      warnings: z.array(z.union([z.string(), langText])).optional(),
    })
    .optional(),
  mayContain: z.array(z.looseObject({ inci: z.string(), usName: z.string().optional() })).optional(),
});

/** The shape of a formula document as written, for `colophon schema formula`; `readFormulaDocument` decides. */
export const formulaDocumentSchema = z.looseObject({
  document: z.literal('formula/1'),
  product,
  materials: z.array(material).min(1),
  formula: z.looseObject({
    batchSize: z.looseObject({ value: amount, unit: z.literal('g') }).optional(),
    lines: z.array(line).min(1),
  }),
  declaration: z
    .looseObject({ freeOrder: z.partialRecord(market, z.array(z.string())).optional(), joinedNames: z.boolean().optional() })
    .optional(),
  label: z
    .looseObject({
      container: container.optional(),
      bleedMm: amount.optional(),
      languages: z.array(z.string()).optional(),
      market: market.optional(),
      barcode: z.looseObject({ symbology: z.enum(['EAN-13', 'UPC-A']), digits: z.string() }).optional(),
      press: z.looseObject({ standard: z.enum(['PDF/X-1a:2003', 'PDF/X-4']).optional(), condition: z.string().optional() }).optional(),
    })
    .optional(),
});

import { z } from './zod.ts';
import { byHand } from './by-hand.ts';
import { amountField, dateField, idField, langField, marketField, nameField, textField } from './fields.ts';

/** A product as its house edits it: everything but the materials, which are referred to by id. */

const temperature = z.strictObject({ from: amountField.optional(), to: amountField.optional(), unit: z.enum(['C', 'F']) });

export const processStep = z.strictObject({
  id: z.string().min(1).max(40),
  text: z.string().max(1000),
  temperature: temperature.nullable(),
  /** `"20"` with `min`, or `"8"` with `h` ("hold 8 h"). */
  time: z.strictObject({ value: amountField, unit: z.enum(['min', 'h']) }).nullable(),
});

export const formulaLine = z.strictObject({
  id: z.string().min(1).max(40),
  materialId: idField,
  /** Empty for the line that makes up the batch, and while someone is still typing. */
  amount: z.union([z.literal(''), amountField]),
  unit: z.enum(['g', '%', 'qs']),
  /** The other figure as pasted, where a sheet gave both and they disagree. */
  pastedPercent: amountField.optional(),
  note: z.string().max(500).optional(),
});

export const phase = z.strictObject({
  id: z.string().min(1).max(40),
  name: z.string().trim().min(1, 'Name the phase.').max(80),
  lines: z.array(formulaLine).max(500),
  steps: z.array(processStep).max(100),
});

const party = z.strictObject({ name: z.string().max(255), address: z.string().max(500) });
const container = z.discriminatedUnion('shape', [
  z.strictObject({ shape: z.literal('cylinder'), diameterMm: amountField, labelHeightMm: amountField, overlapMm: amountField, stockMm: amountField.optional(), name: z.string().max(120).optional() }),
  z.strictObject({ shape: z.literal('taper'), topDiameterMm: amountField, bottomDiameterMm: amountField, labelHeightMm: amountField, overlapMm: amountField, name: z.string().max(120).optional() }),
  z.strictObject({ shape: z.literal('flat'), widthMm: amountField, heightMm: amountField, name: z.string().max(120).optional() }),
]);

export const labelSettings = z.strictObject({
  container,
  bleedMm: amountField,
  languages: z.array(langField).min(1).max(4),
  market: marketField,
  barcode: z.strictObject({ symbology: z.enum(['EAN-13', 'UPC-A']), digits: z.string().max(14) }).nullable(),
  press: z.strictObject({ standard: z.enum(['PDF/X-1a:2003', 'PDF/X-4']), condition: z.string().max(80) }),
  /** Template of shared/artwork. */
  template: z.string().max(40),
  ink: z.string().max(40),
  byHand: byHand.optional(),
});

export const productDraft = z.strictObject({
  name: nameField,
  brand: z.string().max(255),
  category: z.string().min(1).max(80),
  markets: z.array(marketField).min(1, 'Choose at least one market.'),
  /** `null` = today. */
  placedOnMarket: dateField.nullable(),
  availableOn: dateField.nullable(),
  flags: z.strictObject({
    under3: z.boolean().optional(),
    professionalUseOnly: z.boolean().optional(),
    aerosol: z.boolean().optional(),
    spray: z.boolean().optional(),
    intimateHygiene: z.boolean().optional(),
  }),
  facts: z.record(z.string().max(60), z.union([z.string().max(200), z.boolean()])),
  readyForUse: z.strictObject({ productParts: amountField, otherParts: amountField }).nullable(),
  netContent: z.strictObject({ value: amountField, unit: z.enum(['g', 'ml']) }).nullable(),
  durability: z
    .discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('pao'), months: z.int().min(1).max(120) }),
      z.strictObject({ kind: z.literal('best-before'), date: z.string().regex(/^\d{4}-\d{2}(-\d{2})?$/, 'Write YYYY-MM or YYYY-MM-DD.') }),
    ])
    .nullable(),
  claims: z.array(z.strictObject({ text: z.string().trim().min(1).max(500), lang: langField })).max(50),
  particulars: z.strictObject({
    responsiblePerson: z.strictObject({ EU: party.optional(), UK: party.optional(), US: party.optional(), CA: party.optional() }),
    usContact: z.string().max(255),
    canadaContact: z.string().max(255),
    countryOfOrigin: z.string().max(120),
    batchCode: z.string().max(60),
    function: z.string().max(255),
    directions: textField,
    warnings: z.array(z.strictObject({ text: textField, lang: langField })).max(50),
  }),
  mayContain: z.array(z.strictObject({ inci: nameField })).max(100),
  formula: z.strictObject({
    batchSize: z.strictObject({ value: amountField, unit: z.literal('g') }).nullable(),
    phases: z.array(phase).max(40),
  }),
  /** Chosen order inside the free zone, and the form of names, per market. */
  declaration: z.strictObject({
    freeOrder: z.partialRecord(marketField, z.array(z.string().max(500)).max(500)),
    joinedNames: z.boolean(),
  }),
  label: labelSettings,
});
export type ProductDraft = z.infer<typeof productDraft>;
export type Phase = z.infer<typeof phase>;
export type FormulaLine = z.infer<typeof formulaLine>;
export type ProcessStep = z.infer<typeof processStep>;
export type LabelSettings = z.infer<typeof labelSettings>;

import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';
import { amountField, dateField, idField, nameField, percentField, textField, versionField } from './fields.ts';

const shareShape = {
  percent: percentField.optional(),
  min: percentField.optional(),
  typical: percentField.optional(),
  max: percentField.optional(),
};

/** A composition line: an INCI name with its share or range of the material. */
export const compositionLine = z.strictObject({
  inci: nameField,
  cas: z.string().max(20).optional(),
  ...shareShape,
  nano: z.boolean().optional(),
  purpose: z.enum(['preservative', 'fragrance', 'colourant', 'uv-filter', 'other']).optional(),
  usName: z.string().max(255).optional(),
  role: z.enum(['ingredient', 'incidental']).optional(),
});
/** A substance inside a composition line's mass, as a share of the material. */
export const constituentLine = z.strictObject({
  name: nameField,
  cas: z.string().max(20).optional(),
  ...shareShape,
  /** `published` where pre-filled from published ranges, `supplier` where the supplier's sheet gives it. */
  basis: z.enum(['supplier', 'published']).optional(),
});

/** What a material does not bear, and on whose word. Temperatures in °C. */
export const handlingLimits = z.strictObject({
  heatLimitC: amountField.optional(),
  phFrom: amountField.optional(),
  phTo: amountField.optional(),
  hydrateHours: amountField.optional(),
  basis: z.enum(['supplier', 'common-practice']).optional(),
  note: textField.optional(),
});

/** Answers about the material itself: decimals as text, or yes and no. */
export const materialFacts = z.record(z.string().max(60), z.union([z.string().max(200), z.boolean()])).refine((facts) => Object.keys(facts).length <= 100, 'A material holds at most 100 answers.');

export const materialFields = z.strictObject({
  tradeName: nameField,
  supplier: z.string().trim().max(255),
  declareAs: z.enum(['ingredients', 'parfum', 'aroma']),
  composition: z.array(compositionLine).max(200, 'A material holds at most 200 parts.'),
  constituents: z.array(constituentLine).max(200, 'A material holds at most 200 constituents.'),
  pricePerKg: amountField.nullable(),
  currency: z.string().regex(/^[A-Z]{3}$/),
  notes: textField,
  handling: handlingLimits,
  /** What its certificates say, by the key of a condition: decimals as text. Absent: nothing answered. */
  facts: materialFacts.optional(),
});
export type MaterialFields = z.infer<typeof materialFields>;
export type HandlingLimits = z.infer<typeof handlingLimits>;
export type CompositionLine = z.infer<typeof compositionLine>;
export type ConstituentLine = z.infer<typeof constituentLine>;

export const materialDocument = z.object({
  id: idField,
  kind: z.enum(['safety-data-sheet', 'composition-sheet', 'allergen-sheet', 'certificate-of-analysis', 'other']),
  fileName: z.string(),
  mediaType: z.string(),
  bytes: z.int(),
  sha256: z.string(),
  dated: z.string().nullable(),
  runsOut: z.string().nullable(),
  addedAt: z.string(),
  addedBy: z.string(),
});
export type MaterialDocument = z.infer<typeof materialDocument>;

export const material = materialFields.extend({
  id: idField,
  version: versionField,
  savedAt: z.string(),
  savedBy: z.string(),
  archived: z.boolean(),
  documents: z.array(materialDocument),
  usedIn: z.array(z.object({ productId: idField, name: z.string() })),
});
export type Material = z.infer<typeof material>;

export const materialSummary = z.object({
  id: idField,
  version: versionField,
  tradeName: z.string(),
  supplier: z.string(),
  declareAs: z.string(),
  parts: z.int(),
  constituents: z.int(),
  inci: z.array(z.string()),
});
export type MaterialSummary = z.infer<typeof materialSummary>;

const byId = z.strictObject({ id: idField });

export const listMaterials = endpoint({
  method: 'GET',
  path: '/materials',
  query: z.strictObject({ find: z.string().max(255).optional(), page: z.coerce.number().int().min(1).optional() }),
  response: z.object({ items: z.array(materialSummary), total: z.int(), page: z.int(), pageSize: z.int() }),
});
export const getMaterial = endpoint({ method: 'GET', path: '/materials/:id', params: byId, response: material });
export const createMaterial = endpoint({ method: 'POST', path: '/materials', body: materialFields, response: material });
/** Carries the version read; a stale one answers 409 with the current material under `current`. */
export const updateMaterial = endpoint({
  method: 'PUT',
  path: '/materials/:id',
  params: byId,
  body: materialFields.extend({ version: versionField }),
  response: material,
});
/** Archives; refused with `in-use` while a product uses it. */
export const archiveMaterial = endpoint({ method: 'POST', path: '/materials/:id/archive', params: byId, body: z.strictObject({ archived: z.boolean(), version: versionField }), response: material });
export const addMaterialDocument = endpoint({
  method: 'POST',
  path: '/materials/:id/documents',
  params: byId,
  accepts: 'multipart',
  body: z.strictObject({ kind: materialDocument.shape.kind, dated: dateField.optional(), runsOut: dateField.optional() }),
  response: material,
});
export const getMaterialDocument = endpoint({
  method: 'GET',
  path: '/materials/:id/documents/:documentId',
  params: z.strictObject({ id: idField, documentId: idField }),
  response: z.unknown(),
  answers: 'file',
});
export const removeMaterialDocument = endpoint({
  method: 'DELETE',
  path: '/materials/:id/documents/:documentId',
  params: z.strictObject({ id: idField, documentId: idField }),
  response: material,
});

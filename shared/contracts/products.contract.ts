import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';
import { dateField, idField, marketField, nameField, versionField } from './fields.ts';
import { dictionaryEntry } from './dictionary.contract.ts';
import { material } from './materials.contract.ts';
import { productDraft } from './product-draft.ts';
import type { FrontView } from '#shared/artwork/crop-to-front.ts';

const byId = z.strictObject({ id: idField });

export const product = z.object({
  id: idField,
  version: versionField,
  savedAt: z.string(),
  savedBy: z.string(),
  archived: z.boolean(),
  draft: productDraft,
});
export type Product = z.infer<typeof product>;

/** Everything the browser needs to run the engine for a product without asking again. */
export const productWorkspace = z.object({
  product,
  materials: z.array(material),
  /** Dictionary entries for every INCI name in those materials. */
  entries: z.array(dictionaryEntry),
  /** Suggestions for names that the dictionary does not know. */
  unknown: z.array(z.object({ name: z.string(), suggestions: z.array(z.string()) })),
  dictionaryRelease: z.string(),
});
export type ProductWorkspace = z.infer<typeof productWorkspace>;

export const productSummary = z.object({
  id: idField,
  version: versionField,
  name: z.string(),
  brand: z.string(),
  category: z.string(),
  markets: z.array(marketField),
  netContent: z.string(),
  savedAt: z.string(),
  savedBy: z.string(),
  archived: z.boolean(),
  /** Findings by weight over the product's own markets, as of today. */
  counts: z.object({ stop: z.int(), decide: z.int(), note: z.int() }),
  /** The weightiest remedy, in words; empty where there is none. */
  headline: z.string(),
});
export type ProductSummary = z.infer<typeof productSummary>;

export const listProducts = endpoint({
  method: 'GET',
  path: '/products',
  query: z.strictObject({
    find: z.string().max(255).optional(),
    market: marketField.optional(),
    archived: z.enum(['yes', 'no']).optional(),
    page: z.coerce.number().int().min(1).optional(),
  }),
  response: z.object({ items: z.array(productSummary), total: z.int(), page: z.int(), pageSize: z.int() }),
});
export const createProduct = endpoint({
  method: 'POST',
  path: '/products',
  body: z.strictObject({ name: nameField, category: z.string().min(1).max(80), markets: z.array(marketField).min(1) }),
  response: product,
});
export const getProduct = endpoint({ method: 'GET', path: '/products/:id', params: byId, response: productWorkspace });
/** Carries the version read; a stale one answers 409 `stale` with the current product under `current`. */
export const updateProduct = endpoint({
  method: 'PUT',
  path: '/products/:id',
  params: byId,
  body: z.strictObject({ version: versionField, draft: productDraft }),
  response: product,
});
export const copyProduct = endpoint({ method: 'POST', path: '/products/:id/copy', params: byId, body: z.strictObject({ name: nameField }), response: product });
export const archiveProduct = endpoint({ method: 'POST', path: '/products/:id/archive', params: byId, body: z.strictObject({ archived: z.boolean(), version: versionField }), response: product });

const asOf = { market: marketField.optional(), placed: dateField.optional(), available: dateField.optional() };

/** The formula document of the contract, for download. */
export const getFormulaDocument = endpoint({ method: 'GET', path: '/products/:id/formula-document', params: byId, response: z.unknown() });
/** Creates a product and the materials it lacks from a formula document. */
export const importFormulaDocument = endpoint({ method: 'POST', path: '/products/import', body: z.strictObject({ document: z.unknown() }), response: product });
/** The result document as the server computes it. */
export const getResultDocument = endpoint({ method: 'GET', path: '/products/:id/result', params: byId, query: z.strictObject(asOf), response: z.unknown() });
export const getLabelPdf = endpoint({ method: 'GET', path: '/products/:id/label.pdf', params: byId, query: z.strictObject(asOf), response: z.unknown(), answers: 'pdf' });
/** The front of the label, to show small; null while there is none to show: no formula yet, or it does not fit. */
const productFront = z.object({ front: z.custom<FrontView>((value) => typeof value === 'object' && value !== null && 'scene' in value && 'view' in value).nullable() });
export type ProductFront = z.infer<typeof productFront>;
export const getProductFront = endpoint({ method: 'GET', path: '/products/:id/front', params: byId, response: productFront });
export const getReportPdf = endpoint({
  method: 'GET',
  path: '/products/:id/report.pdf',
  params: byId,
  query: z.strictObject({ placed: dateField.optional(), available: dateField.optional(), shares: z.enum(['exact', 'hidden']).optional() }),
  response: z.unknown(),
  answers: 'pdf',
});
export const getWeighOutPdf = endpoint({
  method: 'GET',
  path: '/products/:id/weigh-out.pdf',
  params: byId,
  query: z.strictObject({ batch: z.string().max(30).optional() }),
  response: z.unknown(),
  answers: 'pdf',
});

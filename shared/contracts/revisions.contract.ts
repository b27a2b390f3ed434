import { endpoint } from './endpoint.ts';
import { idField } from './fields.ts';
import { productDraft } from './product-draft.ts';
import { z } from './zod.ts';

const saved = { version: z.int(), savedAt: z.string(), savedBy: z.string() };
export const revisionLine = z.object(saved);
export type RevisionLine = z.infer<typeof revisionLine>;
export const revision = z.object({ ...saved, draft: productDraft });
export type Revision = z.infer<typeof revision>;

/** Every saved state of a product, newest first. */
export const listRevisions = endpoint({ method: 'GET', path: '/products/:id/revisions', params: z.strictObject({ id: idField }), response: z.object({ items: z.array(revisionLine) }) });
/** One saved state, whole. */
export const getRevision = endpoint({ method: 'GET', path: '/products/:id/revisions/:version', params: z.strictObject({ id: idField, version: z.coerce.number().int().min(1) }), response: revision });

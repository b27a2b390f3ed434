import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';
import { dateField, idField } from './fields.ts';

/** A paper that shows what a claim says: it stays with the product, and the decision stays with a person. */
export const claimEvidence = z.object({
  id: idField,
  /** The claim's text as it stood when the paper was added; empty: the product's claims at large. */
  claim: z.string(),
  kind: z.enum(['test-report', 'study', 'certificate', 'supplier-statement', 'other']),
  fileName: z.string(),
  mediaType: z.string(),
  bytes: z.int(),
  sha256: z.string(),
  /** `YYYY-MM-DD`, as printed on the paper. */
  dated: z.string().nullable(),
  addedAt: z.string(),
  addedBy: z.string(),
});
export type ClaimEvidence = z.infer<typeof claimEvidence>;

const byId = z.strictObject({ id: idField });
const byPaper = z.strictObject({ id: idField, documentId: idField });
const evidenceList = z.object({ items: z.array(claimEvidence) });

/** Every paper of a product's claims, oldest first. */
export const listEvidence = endpoint({ method: 'GET', path: '/products/:id/evidence', params: byId, response: evidenceList });
export const addEvidence = endpoint({
  method: 'POST',
  path: '/products/:id/evidence',
  params: byId,
  accepts: 'multipart',
  body: z.strictObject({ kind: claimEvidence.shape.kind, claim: z.string().trim().max(500).optional(), dated: dateField.optional() }),
  response: evidenceList,
});
export const getEvidence = endpoint({ method: 'GET', path: '/products/:id/evidence/:documentId', params: byPaper, response: z.unknown(), answers: 'file' });
export const removeEvidence = endpoint({ method: 'DELETE', path: '/products/:id/evidence/:documentId', params: byPaper, response: evidenceList });

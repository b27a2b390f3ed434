import { endpoint } from './endpoint.ts';
import { idField } from './fields.ts';
import { z } from './zod.ts';

export const trailChange = z.object({ where: z.string(), before: z.string(), after: z.string() });
export const trailEntry = z.object({
  place: z.int(),
  /** UTC, to the millisecond. */
  at: z.string(),
  actor: z.string(),
  act: z.string(),
  subjectKind: z.string(),
  subjectId: z.string().nullable(),
  subject: z.string(),
  productId: z.string().nullable(),
  changes: z.array(trailChange),
  hash: z.string(),
});
export type TrailLine = z.infer<typeof trailEntry>;

/** The house's trail, newest first; of one product with what happened to its materials since they are in it. */
export const listTrail = endpoint({
  method: 'GET',
  path: '/trail',
  query: z.strictObject({ product: idField.optional(), subject: idField.optional(), before: z.coerce.number().int().min(1).optional() }),
  response: z.object({
    items: z.array(trailEntry),
    /** Ask `before` this place for older ones; absent at the beginning. */
    next: z.int().optional(),
  }),
});

/** Goes along the whole chain of the house. */
export const verifyTrail = endpoint({
  method: 'GET',
  path: '/trail/verify',
  response: z.discriminatedUnion('isWhole', [
    z.object({ isWhole: z.literal(true), entries: z.int(), head: z.string() }),
    z.object({ isWhole: z.literal(false), entries: z.int(), place: z.int(), why: z.string() }),
  ]),
});

/** Every entry with its seals, one JSON object a line: enough to verify the chain without the product. */
export const exportTrail = endpoint({ method: 'GET', path: '/trail/export', response: z.unknown() });

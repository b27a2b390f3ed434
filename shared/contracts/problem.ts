import { z } from './zod.ts';

/** Codes of refusals; the server's one table gives each its status. */
export const problemCode = z.enum([
  'not-signed-in',
  'not-allowed',
  'not-found',
  'stale',
  'invalid',
  'in-use',
  'too-large',
  'unsupported-file',
  'wrong-origin',
  'too-many-requests',
  'does-not-fit',
  'unavailable',
  'internal',
]);
export type ProblemCode = z.infer<typeof problemCode>;

/** RFC 9457 problem document, `application/problem+json`. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: problemCode,
  requestId: z.string(),
  /** Every fault of the input, by JSON Pointer into the body (`/formula/phases/0/lines/2/amount`). */
  issues: z.array(z.object({ pointer: z.string(), message: z.string() })).optional(),
  /** With `stale`: what stands on the server now. */
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof problem>;

import { z } from './zod.ts';

/** What `read` prints of a pasted ingredient list. Shares in percent, as exact decimals. */
export const readingDocumentSchema = z.object({
  document: z.literal('reading/1'),
  dataRelease: z.string(),
  market: z.enum(['EU', 'UK', 'US', 'CA']),
  category: z.string(),
  entries: z.array(
    z.object({
      written: z.string(),
      inci: z.string().nullable(),
      match: z.enum(['exact', 'synonym', 'respelt', 'unknown']),
      suggestions: z.array(z.string()),
    }),
  ),
  bounds: z.array(z.object({ inci: z.string(), min: z.string(), max: z.string() })),
  findings: z.array(
    z.looseObject({ kind: z.string(), severity: z.enum(['stop', 'decide', 'note']), rule: z.string(), subject: z.string(), citation: z.string(), message: z.string() }),
  ),
});
export type ReadingDocument = z.infer<typeof readingDocumentSchema>;

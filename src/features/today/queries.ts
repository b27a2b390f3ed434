import { queryOptions } from '@tanstack/react-query';
import { z } from '#shared/contracts/zod.ts';
import { getLaw } from '#shared/contracts/law.contract.ts';
import { call } from '#src/lib/api/call.ts';

/** Of the law tables only what a calendar shows. */
const changes = z.object({
  changes: z.array(z.object({ id: z.string(), market: z.enum(['EU', 'UK', 'US', 'CA']), title: z.string(), what: z.string(), citation: z.string(), placed: z.string().optional(), available: z.string() })),
});
export type LawChange = z.infer<typeof changes>['changes'][number];

export const lawQueries = {
  changes: () =>
    queryOptions({
      queryKey: ['law', 'changes'] as const,
      queryFn: async ({ signal }) => changes.parse((await call(getLaw, {}, signal)).tables).changes,
      staleTime: Infinity,
    }),
};

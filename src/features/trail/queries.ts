import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { listTrail, verifyTrail } from '#shared/contracts/trail.contract.ts';
import { call } from '#src/lib/api/call.ts';

/** The trail of the house, or of one product; always as it stands now. */
export const trailQuery = (product: string | undefined) => infiniteQueryOptions({
  queryKey: ['trail', product ?? 'house'] as const,
  queryFn: ({ signal, pageParam }) => call(listTrail, { query: { ...(product && { product }), ...(pageParam && { before: pageParam }) } }, signal),
  initialPageParam: 0,
  getNextPageParam: (last) => last.next,
  staleTime: 0,
});

/** The whole chain gone along, when asked. */
export const verdictQuery = queryOptions({
  queryKey: ['trail', 'verify'] as const,
  queryFn: ({ signal }) => call(verifyTrail, {}, signal),
  enabled: false,
  gcTime: 0,
});

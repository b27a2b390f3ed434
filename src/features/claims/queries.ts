import { queryOptions } from '@tanstack/react-query';
import { listEvidence } from '#shared/contracts/evidence.contract.ts';
import { call } from '#src/lib/api/call.ts';

export const evidenceQueries = {
  all: ['evidence'] as const,
  /** The papers behind a product's claims. */
  ofProduct: (id: string) =>
    queryOptions({
      queryKey: [...evidenceQueries.all, id] as const,
      queryFn: ({ signal }) => call(listEvidence, { params: { id } }, signal),
    }),
};

import { queryOptions } from '@tanstack/react-query';
import { getRevision, listRevisions } from '#shared/contracts/revisions.contract.ts';
import { call } from '#src/lib/api/call.ts';

export const versionQueries = {
  list: (id: string, latest: number) => queryOptions({ queryKey: ['products', 'revisions', id, latest] as const, queryFn: async ({ signal }) => (await call(listRevisions, { params: { id } }, signal)).items }),
  /** A saved state never changes. */
  one: (id: string, version: number) => queryOptions({ queryKey: ['products', 'revision', id, version] as const, queryFn: ({ signal }) => call(getRevision, { params: { id, version } }, signal), staleTime: Infinity, enabled: version > 0 }),
};

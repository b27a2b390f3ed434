import { queryOptions } from '@tanstack/react-query';
import { getHouse } from '#shared/contracts/house.contract.ts';
import { call } from '#src/lib/api/call.ts';

export const houseQueries = {
  all: ['house'] as const,
  current: () =>
    queryOptions({
      queryKey: [...houseQueries.all, 'current'] as const,
      queryFn: ({ signal }) => call(getHouse, {}, signal),
      staleTime: 5 * 60_000,
    }),
};

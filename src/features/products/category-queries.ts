import { queryOptions } from '@tanstack/react-query';
import { listCategories } from '#shared/contracts/law.contract.ts';
import { call } from '#src/lib/api/call.ts';

/** The product categories to choose from; they change with a data release only. */
export const categoryQueries = {
  list: () => queryOptions({ queryKey: ['categories'] as const, queryFn: ({ signal }) => call(listCategories, {}, signal), staleTime: Infinity }),
};

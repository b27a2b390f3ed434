import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listDictionary, resolveNames, searchDictionary } from '#shared/contracts/dictionary.contract.ts';
import { call } from '#src/lib/api/call.ts';

export type DictionaryFilter = z.input<NonNullable<typeof listDictionary.query>>;

export const dictionaryQueries = {
  all: ['dictionary'] as const,
  list: (filter: DictionaryFilter = {}) =>
    queryOptions({
      queryKey: [...dictionaryQueries.all, 'list', filter] as const,
      queryFn: ({ signal }) => call(listDictionary, { query: filter }, signal),
      staleTime: Infinity,
      placeholderData: keepPreviousData,
    }),
  /** One entry by its INCI name, exactly; `null` where there is none. */
  entry: (inci: string) =>
    queryOptions({
      queryKey: [...dictionaryQueries.all, 'entry', inci] as const,
      queryFn: async ({ signal }) => {
        const { items } = await call(resolveNames, { body: { names: [{ name: inci }] } }, signal);
        return items[0]?.match === 'unknown' ? null : (items[0]?.entry ?? null);
      },
      staleTime: Infinity,
    }),
  search: (q: string) =>
    queryOptions({
      queryKey: [...dictionaryQueries.all, 'search', q] as const,
      queryFn: ({ signal }) => call(searchDictionary, { query: { q, limit: 10 } }, signal),
      staleTime: Infinity,
      enabled: q !== '',
      placeholderData: keepPreviousData,
    }),
};

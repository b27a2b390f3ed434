import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listDictionary, searchDictionary } from '#shared/contracts/dictionary.contract.ts';
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
  search: (q: string) =>
    queryOptions({
      queryKey: [...dictionaryQueries.all, 'search', q] as const,
      queryFn: ({ signal }) => call(searchDictionary, { query: { q, limit: 10 } }, signal),
      staleTime: Infinity,
      enabled: q !== '',
      placeholderData: keepPreviousData,
    }),
};

import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { getMaterial, listMaterials } from '#shared/contracts/materials.contract.ts';
import { listOilProfiles, resolveNames, searchDictionary } from '#shared/contracts/dictionary.contract.ts';
import { call } from '#src/lib/api/call.ts';

export interface MaterialFilter {
  readonly find?: string;
  readonly page?: number;
}

export const materialQueries = {
  all: ['materials'] as const,
  list: (filter: MaterialFilter = {}) =>
    queryOptions({
      queryKey: [...materialQueries.all, 'list', filter] as const,
      queryFn: ({ signal }) => call(listMaterials, { query: filter }, signal),
      placeholderData: keepPreviousData,
    }),
  detail: (id: string) =>
    queryOptions({
      queryKey: [...materialQueries.all, 'detail', id] as const,
      queryFn: ({ signal }) => call(getMaterial, { params: { id } }, signal),
    }),
};

/** Look-ups in the dictionary from a material's fields: the dictionary changes with a release only. */
export const ingredientQueries = {
  search: (q: string) =>
    queryOptions({
      queryKey: ['dictionary', 'search', q] as const,
      queryFn: ({ signal }) => call(searchDictionary, { query: { q, limit: 6 } }, signal),
      staleTime: Infinity,
      enabled: q !== '',
    }),
  resolve: (names: readonly { name: string; cas?: string }[]) =>
    queryOptions({
      queryKey: ['dictionary', 'resolve', names] as const,
      queryFn: ({ signal }) => call(resolveNames, { body: { names: [...names] } }, signal),
      staleTime: Infinity,
      enabled: names.length > 0,
      placeholderData: keepPreviousData,
    }),
  oils: () =>
    queryOptions({
      queryKey: ['dictionary', 'oils'] as const,
      queryFn: ({ signal }) => call(listOilProfiles, {}, signal),
      staleTime: Infinity,
    }),
};

import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { getProduct, getProductFront, listProducts } from '#shared/contracts/products.contract.ts';
import { call } from '#src/lib/api/call.ts';

export type ProductFilter = z.input<NonNullable<typeof listProducts.query>>;

export const productQueries = {
  all: ['products'] as const,
  list: (filter: ProductFilter = {}) =>
    queryOptions({
      queryKey: [...productQueries.all, 'list', filter] as const,
      queryFn: ({ signal }) => call(listProducts, { query: filter }, signal),
      placeholderData: keepPreviousData,
    }),
  /** The product with its materials and dictionary entries: all the engine needs. */
  detail: (id: string) =>
    queryOptions({
      queryKey: [...productQueries.all, 'detail', id] as const,
      queryFn: ({ signal }) => call(getProduct, { params: { id } }, signal),
    }),
  /** The front of the label, drawn anew when the product is saved. */
  front: (id: string, version: number) =>
    queryOptions({
      queryKey: [...productQueries.all, 'front', id, version] as const,
      queryFn: ({ signal }) => call(getProductFront, { params: { id } }, signal),
      staleTime: 5 * 60_000,
    }),
};

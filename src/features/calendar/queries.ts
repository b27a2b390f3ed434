import { queryOptions, useQueries, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { listProducts, type ProductSummary } from '#shared/contracts/products.contract.ts';
import { toDocument, type HouseDefaults } from '#shared/product/to-document.ts';
import { productQueries } from '#src/features/products/queries.ts';
import type { Engine } from '#src/features/workspace/engine.ts';
import { call } from '#src/lib/api/call.ts';
import { findEffects, type Effect } from './effects.ts';

/** Every product of the house, page by page. */
export const everyProduct = queryOptions({
  queryKey: [...productQueries.all, 'every'] as const,
  queryFn: async ({ signal }): Promise<ProductSummary[]> => {
    const first = await call(listProducts, { query: {} }, signal);
    const items = [...first.items];
    for (let page = 2; (page - 1) * first.pageSize < first.total; page++) items.push(...(await call(listProducts, { query: { page } }, signal)).items);
    return items;
  },
});

export interface EffectsInput {
  readonly products: readonly ProductSummary[];
  readonly engine: Engine;
  readonly house: HouseDefaults;
  readonly today: string;
  readonly since: string;
}

export interface ProductEffects {
  readonly product: ProductSummary;
  readonly effects: readonly Effect[];
}

/** What the law's dates do to each product: worked out here, kept until the product or the law changes. */
export function useEffectsOfLaw({ products, engine, house, today, since }: EffectsInput): { readonly known: readonly ProductEffects[]; readonly done: number; readonly failed: number } {
  const client = useQueryClient();
  return useQueries({
    queries: products.map((product) => effectsQuery(client, product, { engine, house, today, since })),
    combine: (results) => ({
      known: results.flatMap((result, index) => (result.data ? [{ product: products[index]!, effects: result.data }] : [])),
      done: results.filter((result) => !result.isPending).length,
      failed: results.filter((result) => result.isError).length,
    }),
  });
}

function effectsQuery(client: QueryClient, product: ProductSummary, { engine, house, today, since }: Omit<EffectsInput, 'products'>) {
  return {
    queryKey: ['calendar', product.id, product.version, engine.law.release, since] as const,
    queryFn: async ({ signal }: { signal: AbortSignal }): Promise<Effect[]> => {
      const workspace = await client.fetchQuery(productQueries.detail(product.id));
      const judge = engine.withNames({ entries: workspace.entries, unknown: workspace.unknown, release: workspace.dictionaryRelease });
      const document = toDocument(workspace.product.draft, workspace.materials, house);
      return findEffects(judge, document, engine.law, { since, until: '9999-12-31', today, signal });
    },
    staleTime: Infinity,
  };
}

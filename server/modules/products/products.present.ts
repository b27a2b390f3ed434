import type { Product as ProductShape } from '#shared/contracts/products.contract.ts';
import type { Product } from './product.entity.ts';

/** A product as its contract shows it. */
export function presentProduct(product: Product): ProductShape {
  return {
    id: product.id,
    version: product.version,
    savedAt: product.savedAt.toISOString(),
    savedBy: product.savedBy,
    archived: product.archived,
    draft: product.draft,
  };
}

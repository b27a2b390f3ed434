import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';

/** One saved state of a product. Only ever added. */
export const ProductRevision = defineEntity({
  name: 'ProductRevision',
  tableName: 'product_revision',
  properties: {
    productId: p.uuid().primary(),
    version: p.integer().primary(),
    houseId: p.uuid(),
    draft: p.json<ProductDraft>(),
    savedAt: p.datetime(),
    savedById: p.uuid(),
    savedBy: p.text(),
  },
});
export type ProductRevision = InferEntity<typeof ProductRevision>;

import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Market } from '#shared/law/types.ts';

/** A product as last saved; every earlier state stands in its revisions. */
export const Product = defineEntity({
  name: 'Product',
  tableName: 'product',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    houseId: p.uuid(),
    version: p.integer().default(1),
    name: p.text(),
    markets: p.array<Market>(),
    draft: p.json<ProductDraft>(),
    /** Lower-case name, brand and category, for the list's search. */
    searchText: p.text(),
    archived: p.boolean().default(false),
    savedAt: p.datetime(),
    savedById: p.uuid(),
    savedBy: p.text(),
  },
});
export type Product = InferEntity<typeof Product>;

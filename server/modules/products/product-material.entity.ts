import { defineEntity, p, type InferEntity } from '@mikro-orm/core';

/** That a product's formula uses a material; kept with every save of the product. */
export const ProductMaterial = defineEntity({
  name: 'ProductMaterial',
  tableName: 'product_material',
  properties: {
    productId: p.uuid().primary(),
    materialId: p.uuid().primary(),
    houseId: p.uuid(),
  },
});
export type ProductMaterial = InferEntity<typeof ProductMaterial>;

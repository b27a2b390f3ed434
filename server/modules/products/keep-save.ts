import type { EntityManager } from '@mikro-orm/postgresql';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { ProductMaterial } from './product-material.entity.ts';
import { ProductRevision } from './product-revision.entity.ts';
import type { Product } from './product.entity.ts';

/** The materials that a formula uses, each once, in the order of its lines. */
export function usedMaterialIds(draft: Pick<ProductDraft, 'formula'>): string[] {
  return [...new Set(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => line.materialId)))];
}

/** Brings the record of used materials in line with the saved draft. */
export async function keepUses(em: EntityManager, product: Product): Promise<void> {
  const wanted = new Set(usedMaterialIds(product.draft));
  const standing = await em.find(ProductMaterial, { productId: product.id });
  for (const use of standing) {
    if (!wanted.delete(use.materialId)) em.remove(use);
  }
  for (const materialId of wanted) em.create(ProductMaterial, { productId: product.id, materialId, houseId: product.houseId });
  await em.flush();
}

/** Adds the saved state to the product's revisions. */
export async function keepRevision(em: EntityManager, product: Product): Promise<void> {
  const { id, version, houseId, draft, savedAt, savedById, savedBy } = product;
  em.create(ProductRevision, { productId: id, version, houseId, draft, savedAt, savedById, savedBy });
  await em.flush();
}

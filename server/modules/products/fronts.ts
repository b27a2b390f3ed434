import type { ProductFront } from '#shared/contracts/products.contract.ts';
import { cropToFront } from '#shared/artwork/crop-to-front.ts';
import { labelOfDocument } from '#shared/artwork/label-of-document.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { hasLines, judge, type Dossier, type Knowledge } from './dossier.ts';
import { createMemory } from './remembered.ts';

/** Fronts kept in memory: enough for a few houses' shelves. */
const KEPT = 200;

/**
 * The front of a product's label as it would be printed today. It is laid out anew only when
 * the product, a material, the house's print, the tables or the day has changed.
 */
export function createFronts() {
  const remember = createMemory<ProductFront>(KEPT);
  return (dossier: Dossier, knows: Knowledge): ProductFront => {
    const { product, materials, house } = dossier;
    const key = [product.id, product.version, knows.law.release, knows.dictionary.release, knows.today, ...materials.map((one) => `${one.id}:${one.version}`), JSON.stringify(house)].join(' ');
    return remember(key, () => frontOf(dossier, knows));
  };
}

function frontOf(dossier: Dossier, knows: Knowledge): ProductFront {
  if (!hasLines(dossier.product)) return { front: null };
  const { market } = dossier.product.draft.label;
  const { document, result } = judge(dossier, knows, { markets: [market] });
  const { scene, misfits } = layOutLabel({ ...labelOfDocument(document, result.results[0], market), pictures: dossier.pictures }, plexMetrics);
  return { front: scene && misfits.length === 0 ? cropToFront(scene) : null };
}

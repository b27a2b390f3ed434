import type { Material as MaterialShape } from '#shared/contracts/materials.contract.ts';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { mergeFindings } from '#shared/report/merge-findings.ts';
import { hasLines, judge, type Dossier, type Knowledge } from './dossier.ts';
import type { getHouse } from '#server/modules/house/house.service.ts';
import { usedMaterialIds } from './keep-save.ts';
import type { Product } from './product.entity.ts';
import { presentProduct } from './products.present.ts';
import { createMemory } from './remembered.ts';

/** What the house prints stands behind missing particulars, so its version counts too. */
type HouseRow = Pick<Awaited<ReturnType<typeof getHouse>>, 'version' | 'name' | 'particulars'>;
type Standing = Pick<ProductSummary, 'counts' | 'headline'>;

/** Judgements kept in memory: enough for the lists of many houses, small beside one page of any. */
const KEPT = 2_000;
const SEVERITIES = ['stop', 'decide', 'note'] as const;

/**
 * Rows of the product list. A product is judged anew only when it, one of its materials, its
 * house's print, the tables or the day has changed.
 */
export function createSummaries() {
  const remember = createMemory<Standing>(KEPT);
  return (product: Product, house: HouseRow, materials: ReadonlyMap<string, MaterialShape>, knows: Knowledge): ProductSummary => {
    const own = usedMaterialIds(product.draft).flatMap((id) => materials.get(id) ?? []);
    const key = [product.id, product.version, house.version, knows.law.release, knows.dictionary.release, knows.today, ...own.map((one) => `${one.id}:${one.version}`)].join(' ');
    const standing = remember(key, () => standingOf({ house: { name: house.name, ...house.particulars }, product: presentProduct(product), materials: own }, knows));
    return { ...presentRow(product), ...standing };
  };
}

function standingOf(dossier: Dossier, knows: Knowledge): Standing {
  const counts = { stop: 0, decide: 0, note: 0 };
  if (!hasLines(dossier.product)) return { counts, headline: 'The formula has no lines yet.' };
  const findings = mergeFindings(judge(dossier, knows).result.results);
  for (const finding of findings) counts[finding.severity] += 1;
  const weightiest = SEVERITIES.flatMap((severity) => findings.filter((finding) => finding.severity === severity));
  return { counts, headline: weightiest[0]?.act ?? '' };
}

function presentRow(product: Product): Omit<ProductSummary, 'counts' | 'headline'> {
  const { brand, category, netContent } = product.draft;
  return {
    id: product.id,
    version: product.version,
    name: product.name,
    brand,
    category,
    markets: [...product.markets],
    netContent: netContent ? `${netContent.value} ${netContent.unit}` : '',
    savedAt: product.savedAt.toISOString(),
    savedBy: product.savedBy,
    archived: product.archived,
  };
}

import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { VerdictWord } from '#src/ui/verdict-mark.tsx';
import type { VerdictWeight } from '#src/ui/verdict-mark.tsx';

/** The weightiest thing that is said of a product, if anything is. */
export function weightOf({ counts }: Pick<ProductSummary, 'counts'>): VerdictWeight | null {
  return counts.stop > 0 ? 'stop' : counts.decide > 0 ? 'decide' : counts.note > 0 ? 'note' : null;
}
/** How a product stands, in a few words with their mark. */
export function Standing({ product }: { product: Pick<ProductSummary, 'counts'> }) {
  const weight = weightOf(product);
  if (weight === null) return <span className="quiet">no rule broken</span>;
  const { stop, decide, note } = product.counts;
  const words = { stop: stop === 1 ? '1 stops sale' : `${stop} stop sale`, decide: decide === 1 ? '1 needs a decision' : `${decide} need a decision`, note: `${note} worth knowing` }[weight];
  return <VerdictWord weight={weight}>{words}</VerdictWord>;
}

import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { LabelInput } from '#shared/artwork/label-input.ts';
import { labelOfDocument, type LabelResult } from '#shared/artwork/label-of-document.ts';
import { toDocument, type HouseDefaults } from '#shared/product/to-document.ts';

/**
 * The label of a draft in its label's market: what the product leaves empty comes from the
 * house. `result` is that market's, absent while nothing is computed.
 */
export function labelOfDraft(draft: ProductDraft, result: LabelResult | undefined, house?: HouseDefaults): LabelInput {
  const input = labelOfDocument(toDocument(draft, [], house), result, draft.label.market);
  // Half-typed figures reach the layout as they stand, which then says what is wrong with them.
  return { ...input, container: draft.label.container, bleedMm: draft.label.bleedMm, barcode: draft.label.barcode };
}

import type { DocumentLabel, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { MarketResult } from '#shared/contracts/result-document.ts';
import type { LabelInput } from '#shared/artwork/label-input.ts';
import { labelOfDocument } from '#shared/artwork/label-of-document.ts';

/** Label settings as a formula document writes them. */
export function labelDocument({ barcode, ...settings }: LabelSettings): DocumentLabel {
  return { ...settings, ...(barcode && barcode.digits !== '' ? { barcode } : {}) };
}

/** The label of a draft in its label's market; `result` is that market's, absent while nothing is computed. */
export function labelOfDraft(draft: ProductDraft, result: MarketResult | undefined): LabelInput {
  const { durability } = draft;
  const document: FormulaDocument = {
    document: 'formula/1', materials: [], formula: { lines: [] },
    product: {
      name: draft.name, brand: draft.brand, category: draft.category, markets: draft.markets, flags: draft.flags, facts: draft.facts,
      claims: draft.claims, particulars: draft.particulars, mayContain: draft.mayContain,
      ...(draft.netContent ? { netContent: draft.netContent } : {}),
      ...(durability ? { durability: durability.kind === 'pao' ? { kind: 'pao' as const, months: String(durability.months) } : durability } : {}),
    },
    label: labelDocument(draft.label),
  };
  // Half-typed figures reach the layout, which says what is wrong with them.
  return { ...labelOfDocument(document, result, draft.label.market), barcode: draft.label.barcode };
}

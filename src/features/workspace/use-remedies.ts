import { useEffect, useState } from 'react';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import { findAmountRemedy, type AmountRemedy } from './remedy.ts';
import type { LiveAssessment } from './use-assessment.ts';

/** Quiet time before remedies are tried: each try is a run of the engine. */
const AFTER = 350;
/** Findings for which a remedy is sought; whoever has more begins with these. */
const MOST = 8;

/** Amounts that would keep an exceeded limit, by finding; empty while they are being tried. */
export function useRemedies(draft: ProductDraft, live: LiveAssessment, isOff: boolean): ReadonlyMap<Finding, AmountRemedy> {
  const { view, tryWith } = live;
  const [found, setFound] = useState<ReadonlyMap<Finding, AmountRemedy>>(new Map());
  useEffect(() => {
    const exceeded = view.result.findings.filter((finding) => finding.kind === 'limit-exceeded').slice(0, MOST);
    if (isOff || exceeded.length === 0) return;
    const timer = setTimeout(() => {
      const remedies = exceeded.flatMap((finding) => {
        const remedy = findAmountRemedy(finding, draft, view, tryWith);
        return remedy ? [[finding, remedy] as const] : [];
      });
      setFound(new Map(remedies));
    }, AFTER);
    return () => clearTimeout(timer);
  }, [draft, view, tryWith, isOff]);
  return found;
}

import type { ClaimEvidence } from '#shared/contracts/evidence.contract.ts';

/** The words of the trade for each kind of evidence. */
export const EVIDENCE_KINDS: Readonly<Record<ClaimEvidence['kind'], string>> = {
  'test-report': 'Test report',
  study: 'Study',
  certificate: 'Certificate',
  'supplier-statement': 'Supplier’s statement',
  other: 'Other paper',
};

import type { ClaimEvidence } from '#shared/contracts/evidence.contract.ts';

/** The words of the trade for each kind of evidence. */
export const EVIDENCE_KINDS: Readonly<Record<ClaimEvidence['kind'], string>> = {
  'test-report': 'Test report',
  study: 'Study',
  certificate: 'Certificate',
  'supplier-statement': 'Supplier’s statement',
  other: 'Other paper',
};
/** What the server takes; it looks at the content, not at the name. */
export const ACCEPTED = '.pdf,.jpg,.jpeg,.png,.webp,application/pdf,image/jpeg,image/png,image/webp';
export const MOST_BYTES = 20 * 1024 * 1024;

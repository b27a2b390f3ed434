import type { MaterialDocument } from '#shared/contracts/materials.contract.ts';

/** The words of the trade for each kind of paper. */
export const DOCUMENT_KINDS: Readonly<Record<MaterialDocument['kind'], string>> = {
  'composition-sheet': 'Composition sheet',
  'allergen-sheet': 'Allergen statement',
  'safety-data-sheet': 'Safety data sheet',
  'certificate-of-analysis': 'Certificate of analysis',
  other: 'Other paper',
};
/** What the server takes; it looks at the content, not at the name. */
export const ACCEPTED = '.pdf,.jpg,.jpeg,.png,.webp,application/pdf,image/jpeg,image/png,image/webp';
export const MOST_BYTES = 20 * 1024 * 1024;

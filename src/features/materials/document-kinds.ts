import type { MaterialDocument } from '#shared/contracts/materials.contract.ts';

/** The words of the trade for each kind of paper. */
export const DOCUMENT_KINDS: Readonly<Record<MaterialDocument['kind'], string>> = {
  'composition-sheet': 'Composition sheet',
  'allergen-sheet': 'Allergen statement',
  'safety-data-sheet': 'Safety data sheet',
  'certificate-of-analysis': 'Certificate of analysis',
  other: 'Other paper',
};

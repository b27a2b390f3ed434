import type { ProductFacts, Substance } from '#shared/engine/types.ts';
import type { LawRow, Purpose } from '#shared/law/types.ts';
import type { Answer } from '../answer.ts';

const PURPOSE: Partial<Record<LawRow['list'], Purpose>> = { preservative: 'preservative', colourant: 'colourant', 'uv-filter': 'uv-filter' };

/** A name that only a colourant bears: `CI 77491`. */
export function isColourIndexName(name: string): boolean {
  return /^C\.?I\.? ?\d{5}/i.test(name);
}

/**
 * Whether a row's list is about what the substance does here. A positive list of preservatives,
 * colourants or UV filters binds a substance used as one. Where nothing is said of its purpose
 * the list binds, unless the law itself knows other uses: then it is "cannot tell".
 */
export function bindsPurpose(row: LawRow, substance: Substance, facts: ProductFacts): Answer {
  if (!coversForm(row, substance)) return false;
  const purpose = PURPOSE[row.list];
  if (!purpose) return true;
  // Annex IV leaves products that only colour hair to Annex III.
  if (purpose === 'colourant' && facts.category.tags.includes('hair-dye')) return false;
  if (substance.purposes.length > 0) return substance.purposes.includes(purpose);
  if (purpose === 'colourant' && isColourIndexName(substance.name)) return true;
  if (purpose === 'uv-filter' && facts.category.tags.includes('sun')) return true;
  if (purpose === 'uv-filter' && isColourIndexName(substance.name)) return false;
  if (!row.otherUses) return true;
  return substance.as.ingredient ? undefined : false;
}

/** Annexes III to VI do not cover nano forms unless they say so (preamble, point 3); Annex II names them itself. */
function coversForm(row: LawRow, substance: Substance): boolean {
  if (row.list === 'prohibited' || row.list === 'restricted') return true;
  if (row.covers === 'both') return true;
  return (row.covers === 'nano') === substance.nano;
}

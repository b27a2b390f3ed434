import type { LawBook } from '#shared/law/law-book.ts';
import type { LawRow, Market } from '#shared/law/types.ts';
import type { Mixture } from '#shared/engine/types.ts';
import type { Part } from '../outcome.ts';
import { spokenOf } from './spoken-of.ts';

/** The rows of one market that speak of a substance present, each with the substances it speaks of. */
export function gatherRows(mixture: Mixture, law: LawBook, market: Market): ReadonlyMap<LawRow, readonly Part[]> {
  const rows = new Map<LawRow, Part[]>();
  for (const { at, hits } of spokenOf(mixture, law).hits) {
    const substance = mixture.substances[at]!;
    for (const { row, member } of hits) {
      if (!row.markets.includes(market)) continue;
      const parts = rows.get(row);
      if (parts) parts.push({ substance, member });
      else rows.set(row, [{ substance, member }]);
    }
  }
  return rows;
}

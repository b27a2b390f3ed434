import { compare, parseDecimal } from '#shared/kernel/rational.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { DocumentProduct } from '#shared/contracts/formula-document.ts';

/** What the durability on a label says against the bound between a date and a period after opening. */
export interface DurabilityAnswer {
  /** `undefined`: cannot tell. */
  readonly met: boolean | undefined;
  /** What the label lacks, where it is one of the two. */
  readonly lacks?: 'date' | 'period';
  readonly months?: string;
  readonly needs: readonly string[];
}

/** Whole months from a day to a best-before date; a month counts to its last day. */
export function monthsUntil(from: PlainDate, until: string): bigint {
  const index = (date: string): bigint => BigInt(date.slice(0, 4)) * 12n + BigInt(date.slice(5, 7));
  const months = index(until) - index(from);
  const day = until.slice(8, 10);
  return day !== '' && day < from.slice(8, 10) ? months - 1n : months;
}

/** Whether a full date lies after so many whole months from a day; a month given alone counts whole. */
function isBeyond(from: PlainDate, until: string, bound: bigint): boolean {
  const months = monthsUntil(from, until);
  if (months !== bound) return months > bound;
  const day = until.slice(8, 10);
  return day !== '' && day > from.slice(8, 10);
}

/**
 * Article 19(1)(c): up to 30 months a date of minimum durability, above them a period after
 * opening unless that has no meaning. `bound` in months; `known` is the minimum durability in
 * months where it was entered, `notRelevant` whether a period after opening has no meaning.
 */
export function judgeDurability(durability: DocumentProduct['durability'], facts: { readonly known?: string | undefined; readonly notRelevant: boolean; readonly placed: PlainDate }, bound: string): DurabilityAnswer {
  const { known, notRelevant, placed } = facts;
  const months = known === undefined ? null : parseDecimal(known);
  if (months) {
    const isLong = compare(months, parseDecimal(bound)!) > 0;
    if (isLong) return notRelevant || durability?.kind === 'pao' ? { met: true, months: known!, needs: [] } : { met: false, lacks: 'period', months: known!, needs: ['durabilityNotRelevant'] };
    return durability?.kind === 'best-before' ? { met: true, months: known!, needs: [] } : { met: false, lacks: 'date', months: known!, needs: [] };
  }
  if (!durability) return notRelevant ? { met: true, needs: [] } : { met: false, needs: ['minimumDurabilityMonths', 'durabilityNotRelevant'] };
  if (durability.kind === 'pao' || notRelevant || !isBeyond(placed, durability.date, BigInt(bound))) return { met: true, needs: [] };
  return { met: undefined, lacks: 'period', months: `${monthsUntil(placed, durability.date)}`, needs: ['minimumDurabilityMonths', 'durabilityNotRelevant'] };
}

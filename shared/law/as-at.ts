import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { Dates } from './types.ts';

/** The two days for which a product is judged. */
export interface Days {
  readonly placedOnMarket: PlainDate;
  readonly availableOn: PlainDate;
}

/**
 * Whether a rule with these dates binds. One date binds once `availableOn` reaches it; two bind
 * when `placedOnMarket` reaches the first or `availableOn` the second. No dates: always.
 */
export function hasBegun(dates: Dates | undefined, days: Days): boolean {
  if (!dates) return true;
  return days.availableOn >= dates.available || (dates.placed !== undefined && days.placedOnMarket >= dates.placed);
}

/** In force on these days: begun, and its end (its successor's beginning) not reached. */
export function isInForce(span: { readonly from?: Dates; readonly until?: Dates }, days: Days): boolean {
  return hasBegun(span.from, days) && !(span.until !== undefined && hasBegun(span.until, days));
}

/** Not begun yet, and with a beginning that is to come. */
export function isToCome(span: { readonly from?: Dates }, days: Days): boolean {
  return span.from !== undefined && !hasBegun(span.from, days);
}

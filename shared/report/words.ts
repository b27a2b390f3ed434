import type { PlainDate } from '#shared/kernel/plain-date.ts';
import { compare, decimal, type Rational } from '#shared/kernel/rational.ts';
import type { Market } from '#shared/law/types.ts';

const MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'];

/** `2026-12-01` as `1 December 2026`. */
export function dayInWords(day: PlainDate | string): string {
  const [year, month, date] = day.split('-');
  return `${date!.replace(/^0/, '')} ${MONTHS.find((_, index) => `${index + 1}`.padStart(2, '0') === month) ?? month} ${year}`;
}

/** `EU`, `EU and US`, `EU, UK and US`. */
export function listInWords(items: readonly string[]): string {
  if (items.length < 2) return items[0] ?? '';
  return `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}

export const MARKET_NAMES: Readonly<Record<Market, string>> = {
  EU: 'European Union',
  UK: 'Great Britain',
  US: 'United States',
  CA: 'Canada',
};

/** Counts from none to nine as words, as a sentence opens with them. */
export function countInWords(count: number): string {
  return ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine'][count] ?? `${count}`;
}

/** Bands of the Canadian notification form: Cosmetic Regulations, C.R.C., c. 869, s. 30, table. */
const BANDS = ['80', '65', '50', '40', '30', '20', '10', '3', '1', '0.3', '0.1', '0.001'] as const;

/** A share told as a band, for readers who are not to know the formula. */
export function shareAsBand(percent: Rational): string {
  const above = BANDS.find((edge) => compare(percent, decimal(edge)) > 0);
  if (above === undefined) return 'up to 0.001';
  const upper = above === '80' ? '100' : BANDS[BANDS.indexOf(above) - 1]!;
  return `over ${above} to ${upper}`;
}

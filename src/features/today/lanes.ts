import { MARKETS } from '#shared/law/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { LawChange } from './queries.ts';

/** One dated step of the law on its market's lane. */
export interface LawDate {
  readonly id: string;
  readonly market: Market;
  readonly day: string;
  readonly words: string;
  readonly citation: string;
  /** Whether it concerns what is first sold from then, or all that is sold. */
  readonly reach: 'first sold' | 'all that is sold';
}
export interface Span {
  readonly from: string;
  readonly to: string;
}

const AHEAD_YEARS = 3;
/** From today to the end of the second year after this one. */
export function spanFrom(today: string): Span {
  return { from: today, to: `${Number(today.slice(0, 4)) + AHEAD_YEARS}-01-01` };
}
/** The dates still ahead, by market, in order; a change with two days gives two. */
export function findDatesAhead(changes: readonly LawChange[], { from, to }: Span): Record<Market, LawDate[]> {
  const lanes = Object.fromEntries(MARKETS.map((market) => [market, [] as LawDate[]])) as Record<Market, LawDate[]>;
  for (const { id, market, title, citation, placed, available } of changes) {
    const days = [placed && placed !== available ? { day: placed, reach: 'first sold' as const } : null, { day: available, reach: 'all that is sold' as const }];
    for (const one of days) {
      if (one && one.day > from && one.day < to) lanes[market].push({ id: `${id}-${one.day}`, market, words: title, citation, ...one });
    }
  }
  for (const market of MARKETS) lanes[market].sort((a, b) => a.day.localeCompare(b.day));
  return lanes;
}
/** Where a day stands between the ends of a span, in percent; for drawing. */
export function placeOf(day: string, { from, to }: Span): number {
  const at = (text: string) => Date.parse(`${text}T00:00:00Z`);
  return Math.max(0, Math.min(100, ((at(day) - at(from)) / (at(to) - at(from))) * 100));
}
/** First days of quarters inside a span. */
export function quartersOf({ from, to }: Span): string[] {
  const days: string[] = [];
  for (let year = Number(from.slice(0, 4)); year <= Number(to.slice(0, 4)); year++) {
    for (const month of ['01', '04', '07', '10']) {
      const day = `${year}-${month}-01`;
      if (day > from && day < to) days.push(day);
    }
  }
  return days;
}

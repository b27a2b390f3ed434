import type { Market } from '#shared/law/types.ts';
import { roughlyText } from '#src/lib/figures.ts';
import type { LedgerNote } from './note-row.tsx';

export interface RoomOfLine {
  readonly line: number;
  /** Its share now, in percent of the product. */
  readonly share: string;
  readonly max: string | null;
  readonly limitedBy: string | null;
}

/** The line with the least room: how far it may rise before something new is found. Nothing where no line is bounded. */
export function findHeadroomNote(market: Market, room: readonly RoomOfLine[] | null, nameOf: (line: number) => string, nameRule: (rule: string) => string): LedgerNote[] {
  const bounded = (room ?? []).filter(({ max, share }) => max !== null && Number(share) > 0 && Number(max) >= Number(share));
  const tightest = bounded.toSorted((a, b) => Number(a.max) / Number(a.share) - Number(b.max) / Number(b.share))[0];
  if (!tightest) return [];
  const { share, max, limitedBy, line } = tightest;
  return [{
    id: 'headroom',
    head: `${nameOf(line)} has the least room`,
    why: 'Above this share, with the other lines in proportion, something is found that is not there now. Room for every line stands below.',
    sum: `${roughlyText(share)} % of the product now; up to ${roughlyText(max!)} % nothing new is found.`,
    citations: limitedBy === null ? [] : [`Held by ${nameRule(limitedBy)}`],
    cells: new Map([[market, { figure: `${roughlyText(max!)} %`, against: `now ${roughlyText(share)} %` }]]),
  }];
}

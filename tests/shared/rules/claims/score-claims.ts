import type { FindingKind } from '#shared/engine/types.ts';
import { judge } from '#tests/support/engine.ts';
import { claimed } from './claims-formulas.ts';
import { MARKETS, type ClaimCase } from './read-claims-table.ts';

/** One place where the reading and the table part. */
export interface Miss {
  readonly text: string;
  readonly market: string;
  readonly expected: readonly FindingKind[];
  readonly found: readonly FindingKind[];
}

/** Counted over claims × markets × kinds. */
export interface Score {
  readonly claims: number;
  readonly innocent: number;
  readonly hits: number;
  readonly missed: number;
  readonly wrong: number;
  /** Claims that are innocent in a market and were found fault with there, over all innocent ones. */
  readonly falseAlarms: number;
  readonly innocentPlaces: number;
  readonly misses: readonly Miss[];
}

/** Judges every claim of a table by the whole engine and counts what is right. */
export function scoreClaims(table: readonly ClaimCase[]): Score {
  let hits = 0;
  let missed = 0;
  let wrong = 0;
  let falseAlarms = 0;
  let innocentPlaces = 0;
  const misses: Miss[] = [];
  for (const one of table) {
    const assessment = judge(claimed(one.formula, [{ text: one.text, lang: one.lang }]));
    for (const market of MARKETS) {
      const expected = one.expected[market];
      const { findings } = assessment.results.find((result) => result.market === market)!;
      const found = [...new Set(findings.filter(({ kind }) => kind.startsWith('claim-')).map(({ kind }) => kind))];
      const right = expected.filter((kind) => found.includes(kind)).length;
      hits += right;
      missed += expected.length - right;
      wrong += found.length - right;
      if (expected.length === 0) {
        innocentPlaces += 1;
        if (found.length > 0) falseAlarms += 1;
      }
      if (right < expected.length || right < found.length) misses.push({ text: one.text, market, expected, found });
    }
  }
  return { claims: table.length, innocent: table.filter(({ expected }) => MARKETS.every((market) => expected[market].length === 0)).length, hits, missed, wrong, falseAlarms, innocentPlaces, misses };
}

export const precision = ({ hits, wrong }: Score): number => (100 * hits) / (hits + wrong);
export const recall = ({ hits, missed }: Score): number => (100 * hits) / (hits + missed);

import data from '#data/law/readings.json' with { type: 'json' };
import type { Market } from './types.ts';

/** The duty behind a kind of finding, in our own words. */
interface RuleWords {
  readonly kind: string;
  readonly markets?: readonly Market[];
  readonly says: string;
}

/** Where the text leaves a choice: what was chosen, and why. */
export interface Reading {
  readonly id: string;
  readonly kinds: readonly string[];
  readonly markets?: readonly Market[];
  /** Only for rules whose id ends so. */
  readonly rule?: string;
  /** Only where the finding has it: a basis, an open purpose, dates. */
  readonly needs?: 'basis' | 'purpose' | 'effective';
  readonly chosen: string;
  readonly why: string;
}

export const readings = data.readings as readonly Reading[];
const rules = data.rules as readonly RuleWords[];
export const tagWords: Readonly<Record<string, string>> = data.tags;
export const factWords: Readonly<Record<string, string>> = data.facts;

/** The duty behind a kind of finding in a market; `undefined` where the tables hold no words for it. */
export function sayRule(kind: string, market: Market): string | undefined {
  return rules.find((one) => one.kind === kind && (one.markets?.includes(market) ?? true))?.says;
}

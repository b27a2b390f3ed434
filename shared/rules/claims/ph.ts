import { compare, decimal, parseDecimal, subtract, type Rational } from '#shared/kernel/rational.ts';
import type { Context } from '../context.ts';
import type { Frame } from './claim-tables.ts';
import { quote, type Token } from './match-words.ts';

/** A pH that a claim states, or the range that its words stand for. */
export interface PhHit {
  readonly words: string;
  readonly from: string;
  readonly to: string;
  readonly isStated: boolean;
}

/** How far a product may be from a pH stated on it (common practice, no source). */
const TOLERANCE = decimal('0.5');
const FIGURE = /^\d{1,2}(\.\d+)?$/;

/** "pH 5.5", "pH-balanced". */
export function findPh(text: string, tokens: readonly Token[], frame: Frame): PhHit | undefined {
  for (let at = 0; at < tokens.length; at += 1) {
    const range = frame.phRanges.longestAt(tokens, at);
    if (range) return { words: quote(text, tokens, range.span), ...range.item, isStated: false };
    if (tokens[at]!.word !== frame.phWord) continue;
    const to = [at + 1, at + 2].find((next) => FIGURE.test(tokens[next]?.word ?? ''));
    if (to !== undefined) return { words: quote(text, tokens, { from: at, to: to + 1 }), from: tokens[to]!.word, to: tokens[to]!.word, isStated: true };
  }
  return undefined;
}

export interface PhVerdict {
  readonly verdict: 'contradicted' | 'evidence';
  readonly why: string;
  readonly needs?: readonly string[];
}

/** Compares a claimed pH with the product's own; nothing where they agree. */
export function judgePh(hit: PhHit, { facts }: Context): PhVerdict | undefined {
  const given = facts.facts['pH'];
  const pH = typeof given === 'string' ? parseDecimal(given) : null;
  if (typeof given !== 'string' || !pH) return { verdict: 'evidence', why: 'The pH of the product is not given.', needs: ['pH'] };
  const slack: Rational = hit.isStated ? TOLERANCE : { n: 0n, d: 1n };
  const isBelow = compare(pH, subtract(decimal(hit.from), slack)) < 0;
  const isAbove = compare(subtract(pH, slack), decimal(hit.to)) > 0;
  if (!isBelow && !isAbove) return undefined;
  const meant = hit.isStated ? `pH ${hit.from}` : `a pH of ${hit.from} to ${hit.to}`;
  return { verdict: 'contradicted', why: `It stands for ${meant}; the product has pH ${given}.` };
}

import { letterChanges } from './suggest.ts';
import type { Term, TermKind } from './terms.ts';

const KIND_BONUS: Readonly<Record<TermKind, number>> = { inci: 0.08, synonym: 0.04, 'common-name': 0.06, respelt: 0, cas: 0 };

/** What someone has typed, as terms are written. */
export interface Asked {
  readonly words: string;
  readonly folded: string;
}

/**
 * How near a term is to what is typed: a whole match stands above a beginning, a beginning above
 * a likeness; likeness is letters to change in proportion to length. It orders suggestions and
 * decides nothing.
 */
export function scoreTerm({ folded, words, kind, isCurated }: Omit<Term, 'term'> & { readonly isCurated: boolean }, asked: Asked): number {
  const key = asked.folded;
  const longer = folded.length > key.length ? folded.length : key.length;
  const near = 1 - letterChanges(key, folded) / longer;
  // Someone in the middle of typing: how near is what stands so far to the term's beginning?
  const begun = folded.length > key.length ? 1 - letterChanges(key, folded.slice(0, key.length)) / key.length : near;
  const score = 2 * near + 0.6 * begun + KIND_BONUS[kind] + (isCurated ? 0.1 : 0);
  if (folded === key) return score + 3;
  if (folded.startsWith(key)) return score + 0.8 + 0.4 * (key.length / folded.length);
  return hasWordsBeginning(words, asked.words) ? score + 0.7 : score;
}

/** Every word asked for begins a word of the term, in any order. */
export function hasWordsBeginning(words: string, asked: string): boolean {
  const present = words.split(' ');
  return asked.split(' ').every((word) => present.some((one) => one.startsWith(word)));
}

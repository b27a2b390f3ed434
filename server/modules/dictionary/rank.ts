import Fuse from 'fuse.js';
import { letterChanges } from '#shared/dictionary/suggest.ts';
import type { TermKind } from './terms.ts';

/** A term that PostgreSQL found near the query. */
export interface Candidate {
  readonly entryKey: string;
  readonly term: string;
  readonly words: string;
  readonly folded: string;
  readonly kind: TermKind;
  readonly isCurated: boolean;
}

export interface Ranked {
  readonly entryKey: string;
  readonly matched: string;
  readonly by: TermKind;
}

const KIND_BONUS: Readonly<Record<TermKind, number>> = { inci: 0.08, synonym: 0.04, 'common-name': 0.06, respelt: 0, cas: 0 };

/**
 * Orders candidates for a query, one row an entry, best first. A whole match stands above a
 * beginning, a beginning above a likeness; likeness is letters to change in proportion to
 * length, helped by fuse.js, which also sees words in another order.
 */
export function rankCandidates(candidates: readonly Candidate[], asked: { readonly words: string; readonly folded: string }): Ranked[] {
  const likeness = fuseLikeness(candidates, asked.words);
  const best = new Map<string, { score: number; candidate: Candidate }>();
  candidates.forEach((candidate, at) => {
    const score = scoreOf(candidate, asked) + (likeness[at] ?? 0);
    const before = best.get(candidate.entryKey);
    if (!before || score > before.score) best.set(candidate.entryKey, { score, candidate });
  });
  return [...best.values()]
    .sort((a, b) => b.score - a.score || a.candidate.folded.length - b.candidate.folded.length || (a.candidate.folded < b.candidate.folded ? -1 : 1))
    .map(({ candidate }) => ({ entryKey: candidate.entryKey, matched: candidate.term, by: reasonOf(candidate, asked) }));
}

function scoreOf({ folded, words, kind, isCurated }: Candidate, asked: { readonly words: string; readonly folded: string }): number {
  const key = asked.folded;
  const longer = Math.max(folded.length, key.length);
  const near = 1 - letterChanges(key, folded) / longer;
  const opening = folded.slice(0, key.length + 1);
  // Someone in the middle of typing: how near is what stands so far to the term's beginning?
  const begun = folded.length > key.length ? 1 - letterChanges(key, opening.slice(0, key.length)) / key.length : near;
  let score = 2 * near + 0.6 * begun + KIND_BONUS[kind] + (isCurated ? 0.1 : 0);
  if (folded === key) score += 3;
  else if (folded.startsWith(key)) score += 0.8 + 0.4 * (key.length / folded.length);
  else if (hasWordsBeginning(words, asked.words)) score += 0.7;
  return score;
}

/** Every word asked for begins a word of the term, in any order. */
function hasWordsBeginning(words: string, asked: string): boolean {
  const present = words.split(' ');
  return asked.split(' ').every((word) => present.some((one) => one.startsWith(word)));
}

function fuseLikeness(candidates: readonly Candidate[], words: string): number[] {
  const scores = new Array<number>(candidates.length).fill(0);
  const fuse = new Fuse(candidates.map((candidate) => candidate.words), { includeScore: true, ignoreLocation: true, threshold: 0.5 });
  // Longer patterns cost more and tell no more.
  for (const { refIndex, score } of fuse.search(words.slice(0, 32))) scores[refIndex] = 0.5 * (1 - (score ?? 1));
  return scores;
}

function reasonOf({ folded, words, kind }: Candidate, asked: { readonly words: string; readonly folded: string }): TermKind {
  const isAsWritten = folded.includes(asked.folded) || hasWordsBeginning(words, asked.words);
  return isAsWritten ? kind : 'respelt';
}

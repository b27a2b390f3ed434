import Fuse from 'fuse.js';
import { hasWordsBeginning, scoreTerm } from '#shared/dictionary/score-term.ts';
import type { TermKind } from '#shared/dictionary/terms.ts';

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

/**
 * Orders candidates for a query, one row an entry, best first. A whole match stands above a
 * beginning, a beginning above a likeness; likeness is letters to change in proportion to
 * length, helped by fuse.js, which also sees words in another order.
 */
export function rankCandidates(candidates: readonly Candidate[], asked: { readonly words: string; readonly folded: string }): Ranked[] {
  const likeness = fuseLikeness(candidates, asked.words);
  const best = new Map<string, { score: number; candidate: Candidate }>();
  candidates.forEach((candidate, at) => {
    const score = scoreTerm(candidate, asked) + (likeness[at] ?? 0);
    const before = best.get(candidate.entryKey);
    if (!before || score > before.score) best.set(candidate.entryKey, { score, candidate });
  });
  return [...best.values()]
    .sort((a, b) => b.score - a.score || a.candidate.folded.length - b.candidate.folded.length || (a.candidate.folded < b.candidate.folded ? -1 : 1))
    .map(({ candidate }) => ({ entryKey: candidate.entryKey, matched: candidate.term, by: reasonOf(candidate, asked) }));
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

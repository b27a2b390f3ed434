import { foldName } from '#shared/law/fold.ts';
import { scoreTerm } from './score-term.ts';
import { termsOf, toWords, type Term, type TermKind } from './terms.ts';
import type { DictionaryEntry } from './types.ts';

export interface Begun {
  readonly entry: DictionaryEntry;
  /** The name or number that was met. */
  readonly matched: string;
  readonly by: TermKind;
}

/** How many terms are scored letter by letter; beginnings are gathered first. */
const SCORED = 80;

/**
 * Names that begin as typed, or hold a word that does, from memory alone: what can be shown in
 * the same moment as the keystroke. Misspellings are left to the server's search.
 */
export function createNameBeginner(entries: readonly DictionaryEntry[]): (typed: string, count: number) => Begun[] {
  const terms: (Term & { readonly entry: DictionaryEntry })[] = [];
  for (const entry of entries) for (const term of termsOf(entry)) terms.push({ ...term, entry });
  return (typed, count) => {
    const folded = foldName(typed);
    if (folded === '') return [];
    const asked = { words: toWords(typed), folded };
    const beginnings = terms.filter((term) => term.folded.startsWith(folded));
    const inside = beginnings.length >= SCORED ? [] : terms.filter(({ words, folded: whole }) => !whole.startsWith(folded) && words.includes(` ${asked.words}`));
    // Shorter names are nearer: where too many begin so, the longest are not measured.
    const near = [...beginnings.sort((a, b) => a.folded.length - b.folded.length), ...inside.sort((a, b) => a.folded.length - b.folded.length)].slice(0, SCORED);
    const best = new Map<DictionaryEntry, { score: number; term: (typeof terms)[number] }>();
    for (const term of near) {
      const score = scoreTerm({ ...term, isCurated: true }, asked);
      const before = best.get(term.entry);
      if (!before || score > before.score) best.set(term.entry, { score, term });
    }
    return [...best.values()]
      .sort((a, b) => b.score - a.score || a.term.folded.length - b.term.folded.length || (a.term.folded < b.term.folded ? -1 : 1))
      .slice(0, count)
      .map(({ term }) => ({ entry: term.entry, matched: term.term, by: term.kind }));
  };
}

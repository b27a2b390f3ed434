import { foldName } from '#shared/law/fold.ts';
import type { DictionaryEntry } from './types.ts';

interface Term {
  readonly entry: DictionaryEntry;
  readonly key: string;
  readonly grams: number;
  readonly isInci: boolean;
}

/** How many candidates by shared letter groups are measured letter by letter. */
const MEASURED = 60;

/**
 * Likely names for one that is not known: candidates by shared groups of three letters, ranked
 * by the number of letters to change (an exchange of two neighbours counts once) in proportion
 * to length. Scores are whole thousandths, so the order is the same on every machine.
 */
export function createNameSuggester(entries: readonly DictionaryEntry[]): (name: string, count: number) => DictionaryEntry[] {
  const terms: Term[] = [];
  const postings = new Map<string, number[]>();
  const addTerm = (entry: DictionaryEntry, name: string, isInci: boolean) => {
    const key = foldName(name);
    if (key === '') return;
    const grams = trigrams(key);
    for (const gram of grams) {
      const list = postings.get(gram);
      if (list) list.push(terms.length);
      else postings.set(gram, [terms.length]);
    }
    terms.push({ entry, key, grams: grams.size, isInci });
  };
  for (const entry of entries) {
    addTerm(entry, entry.inci, true);
    for (const name of [...entry.synonyms, ...entry.commonNames]) addTerm(entry, name, false);
  }

  return (name, count) => {
    const key = foldName(name).slice(0, 120);
    if (key === '' || count < 1) return [];
    const wanted = trigrams(key);
    const shared = new Map<number, number>();
    for (const gram of wanted) {
      for (const at of postings.get(gram) ?? []) shared.set(at, (shared.get(at) ?? 0) + 1);
    }
    const candidates = [...shared]
      .map(([at, common]) => ({ term: terms[at]!, likeness: (2000 * common) / (wanted.size + terms[at]!.grams) }))
      .sort((a, b) => b.likeness - a.likeness || order(a.term.key, b.term.key))
      .slice(0, MEASURED);
    const scored = candidates.map(({ term, likeness }) => {
      const longer = term.key.length > key.length ? term.key.length : key.length;
      const near = ((longer - letterChanges(key, term.key)) * 2000) / longer;
      const start = term.key.startsWith(key) ? 600 : 0;
      return { term, score: near + likeness + start + (term.isInci ? 1 : 0) };
    });
    scored.sort((a, b) => b.score - a.score || order(a.term.key, b.term.key));
    const found = new Set<DictionaryEntry>();
    for (const { term, score } of scored) {
      // Below a quarter of full likeness a name is a guess, not a suggestion.
      if (score >= 1000) found.add(term.entry);
      if (found.size === count) break;
    }
    return [...found];
  };
}

/** Letters to insert, drop, replace or exchange with a neighbour to make `b` of `a` (optimal string alignment). */
export function letterChanges(a: string, b: string): number {
  let before: number[] = [];
  let last: number[] = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const same = a[i - 1] === b[j - 1];
      let least = last[j - 1]! + (same ? 0 : 1);
      if (last[j]! + 1 < least) least = last[j]! + 1;
      if (row[j - 1]! + 1 < least) least = row[j - 1]! + 1;
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1] && before[j - 2]! + 1 < least) {
        least = before[j - 2]! + 1;
      }
      row.push(least);
    }
    before = last;
    last = row;
  }
  return last[b.length]!;
}

function trigrams(key: string): Set<string> {
  const padded = `  ${key} `;
  const grams = new Set<string>();
  for (let at = 0; at + 3 <= padded.length; at += 1) grams.add(padded.slice(at, at + 3));
  return grams;
}

function order(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

import { letterChanges } from '#shared/dictionary/suggest.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';

/** How a written name was recognised; the entry is absent where it was not. */
export interface MatchedName {
  readonly match: 'exact' | 'synonym' | 'respelt' | 'unknown';
  readonly entry?: DictionaryEntry;
  readonly suggestions: readonly string[];
}

/** How many of an unknown name's likely forms are offered. */
const SUGGESTED = 5;
/** Shares of a name's letters that may differ in a confident near-miss: one in eight, at most two. */
const LETTERS_A_SLIP = 8;
const MOST_SLIPS = 2;

/**
 * Matches one written name: exactly, by a form the dictionary holds, or as a confident
 * near-miss. A near-miss is confident where at most one letter in eight differs (two at most),
 * no figure differs (`Ceteareth-12` is not `Ceteareth-20`) and no second name is as near.
 */
export function matchName(written: string, dictionary: Dictionary): MatchedName {
  const found = dictionary.resolve(written);
  if (found) return { match: found.match, entry: found.entry, suggestions: [] };
  const likely = dictionary.suggest(written, SUGGESTED);
  const near = nearest(written, likely);
  return near ? { match: 'respelt', entry: near, suggestions: [] } : { match: 'unknown', suggestions: likely.map(({ inci }) => inci) };
}

function nearest(written: string, likely: readonly DictionaryEntry[]): DictionaryEntry | undefined {
  const key = foldName(written);
  let best: { entry: DictionaryEntry; changes: number } | undefined;
  let isShared = false;
  for (const entry of likely) {
    for (const name of [entry.inci, ...entry.synonyms, ...entry.commonNames]) {
      const other = foldName(name);
      if (figures(other) !== figures(key)) continue;
      const changes = letterChanges(key, other);
      if (!best || changes < best.changes) {
        best = { entry, changes };
        isShared = false;
      } else if (changes === best.changes && entry !== best.entry) isShared = true;
    }
  }
  if (!best || isShared) return undefined;
  return best.changes <= MOST_SLIPS && best.changes * LETTERS_A_SLIP <= key.length ? best.entry : undefined;
}

function figures(key: string): string {
  return key.replace(/\D+/g, ' ').trim();
}

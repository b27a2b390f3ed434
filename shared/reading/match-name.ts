import { letterChanges } from '#shared/dictionary/suggest.ts';
import type { Dictionary, DictionaryEntry, NameMatch } from '#shared/dictionary/types.ts';
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

const COLOUR_INDEX = /\bc\.?\s?i\.?\s?(?:no\.?\s?)?(\d{5})(?::\d)?(?!\d)/gi;

/** The entry that a written name means without any guessing: as the dictionary holds it, or by its colour index number. */
export function findWritten(written: string, dictionary: Dictionary): NameMatch | undefined {
  return dictionary.resolve(written) ?? findColour(written, dictionary);
}

/**
 * `Titanium Dioxide (CI 77891)`, `CI 19140/Yellow 5`: the number names the colourant, unless the
 * words beside it name another substance. Where the EU does not list the number as a colourant
 * (mica), the words keep their own entry.
 */
function findColour(written: string, dictionary: Dictionary): NameMatch | undefined {
  const numbers = new Set([...written.matchAll(COLOUR_INDEX)].map((mark) => mark[1]));
  if (numbers.size !== 1) return undefined;
  const colour = dictionary.resolve(`CI ${[...numbers][0]}`)?.entry;
  if (!colour) return undefined;
  const words = written.replace(COLOUR_INDEX, ' ').replace(/[()[\]/|,;]+/g, ' ').replace(/\bnano\b/i, ' ').trim();
  const beside = words === '' ? undefined : dictionary.resolve(words)?.entry;
  if (!beside || beside === colour) return { entry: colour, match: 'synonym' };
  if (!isSameSubstance(beside, colour)) return undefined;
  return { entry: colour.properties.includes('not-eu-listed') ? beside : colour, match: 'synonym' };
}

function isSameSubstance(one: DictionaryEntry, other: DictionaryEntry): boolean {
  return one.properties.includes(`same-substance:${other.id}`) || other.properties.includes(`same-substance:${one.id}`) || one.cas.some((cas) => other.cas.includes(cas));
}

/**
 * Matches one written name: exactly, by a form the dictionary holds, or as a confident
 * near-miss. A near-miss is confident where at most one letter in eight differs (two at most),
 * no figure differs (`Ceteareth-12` is not `Ceteareth-20`) and no second name is as near.
 */
export function matchName(written: string, dictionary: Dictionary): MatchedName {
  const found = findWritten(written, dictionary);
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

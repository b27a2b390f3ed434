import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';

const NANO = /[\s([]+nano[\s)\]]*$/i;

/** A written ingredient name, settled: the name used from here on and the key it merges under. */
export interface SettledName {
  /** The dictionary's INCI name, or the name as written where the dictionary does not know it. */
  readonly inci: string;
  readonly key: string;
  readonly entry?: DictionaryEntry;
  readonly isNano: boolean;
}

/**
 * Settles a written name. A misspelling is not corrected silently: it stays unknown, and the
 * maker is offered the likely names. A CAS number tells apart names that several entries
 * share; alone it proves nothing about an unlisted name.
 */
export function settleName(dictionary: Dictionary, written: string, cas?: string, nano?: boolean): SettledName {
  const isNano = nano === true || NANO.test(written);
  const name = written.trim().replace(NANO, '');
  const entry = findEntry(dictionary, name, cas);
  const inci = entry?.inci ?? name;
  const key = foldName(inci) || inci;
  return { inci, key: isNano ? `${key} nano` : key, isNano, ...(entry && { entry }) };
}

function findEntry(dictionary: Dictionary, name: string, cas?: string): DictionaryEntry | undefined {
  const plain = dictionary.resolve(name);
  if (plain) return plain.match === 'respelt' ? undefined : plain.entry;
  if (cas === undefined) return undefined;
  const found = dictionary.resolve(name, cas);
  if (!found || found.match === 'respelt') return undefined;
  const key = foldName(name);
  const { entry } = found;
  const names = [entry.inci, ...entry.synonyms, ...entry.commonNames, entry.names.us, entry.names.ca, entry.names.fr, ...(entry.names.usColours ?? [])];
  return names.some((known) => known !== undefined && foldName(known) === key) ? entry : undefined;
}

/** The numbers a name is matched by: the maker's own, and the dictionary's where they tell substances apart. */
export function casNumbers(written: string | undefined, entry: DictionaryEntry | undefined): readonly string[] {
  const own = written?.match(/\d{2,7}-\d{2}-\d/g) ?? [];
  if (!entry || entry.properties.includes('botanical')) return own;
  return own.length === 0 ? entry.cas : [...new Set([...own, ...entry.cas])];
}

import { foldName } from '#shared/law/fold.ts';
import { createNameSuggester } from './suggest.ts';
import type { Dictionary, DictionaryEntry, NameMatch } from './types.ts';
import { isCasNumber } from './registry-numbers.ts';

/** A key that leads to one entry, or to several (`null`): then only the CAS number can tell. */
type Index = Map<string, DictionaryEntry | null>;

const NANO = /[\s([]*\bnano\b[\s)\]]*$/i;
const COLOUR_INDEX = /^(?:c\.?\s*i\.?\s*)?(\d{5})(?::\d)?$/i;
const BRACKETED = /^([^()[\]]*)[([]([^()[\]]+)[)\]]([^()[\]]*)$/;
/** British and American spellings; INCI names are written the American way. */
const SPELLINGS: readonly (readonly [RegExp, string])[] = [
  [/sulph/g, 'sulf'],
  [/aluminium/g, 'aluminum'],
  [/caesium/g, 'cesium'],
  [/colour/g, 'color'],
  [/hydrolysed/g, 'hydrolyzed'],
  [/polymerised/g, 'polymerized'],
  [/micronised/g, 'micronized'],
  [/oestr/g, 'estr'],
  [/glycerine/g, 'glycerin'],
];

/**
 * The dictionary in memory. Every look-up is exact on folded names; entries given later never
 * displace earlier ones of the same INCI name, so a house's own entries go last.
 */
export function createDictionary(entries: readonly DictionaryEntry[], release: string): Dictionary {
  const byInci: Index = new Map();
  for (const entry of entries) {
    const key = foldName(entry.inci);
    if (!byInci.has(key)) byInci.set(key, entry);
  }
  // Other names and CAS numbers are asked for less often: indexed at the first question.
  let aliases: Index | undefined;
  let misspellings: Index | undefined;
  let byCas: Index | undefined;
  let suggester: ((name: string, count: number) => DictionaryEntry[]) | undefined;

  const findCas = (cas: string): DictionaryEntry | undefined => {
    byCas ??= index(entries, (entry) => entry.cas, (text) => text);
    return byCas.get(cas.trim()) ?? undefined;
  };
  const findOtherName = (key: string, cas?: string): DictionaryEntry | undefined => {
    aliases ??= index(entries, otherNames, foldName);
    const found = aliases.get(key);
    if (found !== null || cas === undefined) return found ?? undefined;
    return entries.find((entry) => entry.cas.includes(cas) && otherNames(entry).some((name) => foldName(name) === key));
  };
  const findPlain = (name: string, cas?: string): NameMatch | undefined => {
    const key = foldName(name);
    if (key === '') return undefined;
    const exact = byInci.get(key);
    if (exact) return { entry: exact, match: 'exact' };
    const other = findOtherName(key, cas);
    if (other) return { entry: other, match: 'synonym' };
    const ci = COLOUR_INDEX.exec(name.trim());
    const colour = ci ? byInci.get(`ci${ci[1]}`) : undefined;
    if (colour) return { entry: colour, match: 'synonym' };
    const american = SPELLINGS.reduce((text, [from, to]) => text.replace(from, to), key);
    const respelt = american === key ? undefined : (byInci.get(american) ?? findOtherName(american, cas));
    if (respelt) return { entry: respelt, match: 'respelt' };
    misspellings ??= index(entries, (entry) => entry.misspellings ?? [], foldName);
    const misspelt = misspellings.get(key);
    return misspelt ? { entry: misspelt, match: 'respelt' } : undefined;
  };

  return {
    release,
    resolve(written, cas) {
      const name = written.trim().replace(NANO, '').replace(/[\s*.,;:†‡°¹²³]+$/, '');
      const found = findPlain(name, cas) ?? findJoined(name, findPlain);
      if (found) return found;
      const number = cas?.trim() || (isCasNumber(name) ? name : '');
      const byNumber = number === '' ? undefined : findCas(number);
      // Oils, extracts and waters of one plant share numbers: there a number alone decides nothing.
      if (!byNumber || byNumber.properties.includes('botanical')) return undefined;
      return { entry: byNumber, match: 'synonym' };
    },
    suggest(name, count = 5) {
      suggester ??= createNameSuggester(entries);
      return suggester(name, count);
    },
  };
}

/** Every further name of an entry that is right somewhere: market names, colour names, synonyms, common names. */
export function otherNames(entry: DictionaryEntry): string[] {
  const { us, ca, fr, usColours } = entry.names;
  const names = [...entry.synonyms, ...entry.commonNames, ...(usColours ?? [])];
  if (us !== undefined) names.push(us);
  if (ca !== undefined) names.push(ca);
  if (fr !== undefined) names.push(fr);
  return names;
}

function index(
  entries: readonly DictionaryEntry[],
  keysOf: (entry: DictionaryEntry) => readonly string[],
  fold: (text: string) => string,
): Index {
  const found: Index = new Map();
  for (const entry of entries) {
    for (const text of keysOf(entry)) {
      const key = fold(text);
      const before = found.get(key);
      if (before === undefined) found.set(key, entry);
      else if (before && succeeds(entry, before)) found.set(key, entry);
      else if (before !== entry && !(before && succeeds(before, entry))) found.set(key, null);
    }
  }
  return found;
}

/** Whether one entry is the other's successor: a name that both bear leads to it. */
function succeeds(entry: DictionaryEntry, former: DictionaryEntry): boolean {
  return former.supersededBy !== undefined && foldName(former.supersededBy) === foldName(entry.inci);
}

/**
 * `Aqua/Water/Eau`, `Water (Aqua)`, `Butyrospermum Parkii (Shea) Butter`, `Tocopherol (Vitamin E)`:
 * joined forms count only where all known parts mean the same entry.
 */
function findJoined(name: string, find: (name: string) => NameMatch | undefined): NameMatch | undefined {
  const bracketed = BRACKETED.exec(name);
  if (bracketed) {
    const [, before, inside, after] = bracketed;
    const whole = find(`${before} ${after}`) ?? agreeing(`${before} ${after}`.split('/'), find);
    const within = find(inside!) ?? agreeing(inside!.split(/[/,;]/), find);
    if (whole && within && whole.entry !== within.entry) return undefined;
    // An unknown outer name is not vouched for by what stands in its bracket.
    return whole ? { entry: whole.entry, match: 'synonym' } : undefined;
  }
  return name.includes('/') || name.includes('|') ? agreeing(name.split(/[/|]/), find) : undefined;
}

function agreeing(parts: readonly string[], find: (name: string) => NameMatch | undefined): NameMatch | undefined {
  if (parts.length < 2) return undefined;
  let entry: DictionaryEntry | undefined;
  for (const part of parts) {
    const match = find(part.trim());
    if (!match || (entry && match.entry !== entry)) return undefined;
    entry = match.entry;
  }
  return entry ? { entry, match: 'synonym' } : undefined;
}

import type { EntityManager } from '@mikro-orm/postgresql';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';
import { rankCandidates, type Candidate } from './rank.ts';
import { toWords, type TermKind } from '#shared/dictionary/terms.ts';

export interface FoundEntry {
  readonly entry: DictionaryEntry;
  /** The name or number that was met. */
  readonly matched: string;
  readonly by: TermKind;
}

export interface DictionaryPage {
  readonly items: readonly DictionaryEntry[];
  readonly total: number;
  readonly page: number;
  readonly pageSize: number;
  readonly functions: readonly string[];
}

const PAGE_SIZE = 50;
const SHORT = 7;

/** The stored entries that are everyone's, in memory, curated ones first: what judging asks for every name. */
export async function loadDictionary(em: Pick<EntityManager, 'execute'>): Promise<Dictionary> {
  const rows = await em.execute<{ entry: DictionaryEntry; release: string }[]>(
    `select entry, release from dictionary_entry where house_id is null order by origin = 'inventory', key`,
  );
  return createDictionary(
    rows.map(({ entry }) => entry),
    rows[0]?.release ?? 'empty',
  );
}

/*
 * Four ways in, each by its own index: the beginning of a folded name, shared groups of three
 * letters over whole names, the same over part of a name, and for short words the length.
 * $1 the query's words, $2 a LIKE pattern of its folded form, $3 and $4 lengths for short words.
 */
const CANDIDATES = `
  select distinct t.entry_key::text as "entryKey", t.term, t.words, t.folded, t.kind, e.origin <> 'inventory' as "isCurated"
  from dictionary_near($1::text, $2::text, $3::int, $4::int) t join dictionary_entry e on e.key = t.entry_key
  where e.house_id is null`;

/**
 * The entries meant by what someone has typed, best first: misspelt, begun, a synonym, a common
 * name or a CAS number. Empty where nothing is near.
 */
export async function searchDictionary(query: RunQuery, { q, limit = 10 }: { readonly q: string; readonly limit?: number }): Promise<FoundEntry[]> {
  const folded = foldName(q).slice(0, 120);
  if (folded === '') return [];
  const words = toWords(q).slice(0, 160);
  const isShort = folded.length <= SHORT;
  // A colour index number may be typed without its letters.
  const begin = /^\d{5}$/.test(folded) ? `ci${folded}` : folded;
  const lengths = isShort ? [folded.length - 1, folded.length + 1] : [1, 0];
  const rows = await query<Candidate>(CANDIDATES, [words, `${begin}%`, ...lengths]);
  const numbers = /^\d/.test(folded) ? await casCandidates(query, folded) : [];
  const ranked = rankCandidates([...numbers, ...rows], { words, folded: begin }).slice(0, limit);
  const entries = await entriesByKey(query, ranked.map(({ entryKey }) => entryKey));
  return ranked.flatMap(({ entryKey, matched, by }) => {
    const entry = entries.get(entryKey);
    return entry ? [{ entry, matched, by }] : [];
  });
}

/** Entries whose CAS number begins with the digits given. */
function casCandidates(query: RunQuery, digits: string): Promise<Candidate[]> {
  return query<Candidate>(
    `select t.entry_key::text as "entryKey", t.term, t.words, t.folded, t.kind, e.origin <> 'inventory' as "isCurated"
     from dictionary_term t join dictionary_entry e on e.key = t.entry_key
     where t.kind = 'cas' and t.folded like $1 and e.house_id is null order by length(t.folded), e.origin, e.inci limit 40`,
    [`${digits}%`],
  );
}

async function entriesByKey(query: RunQuery, keys: readonly string[]): Promise<Map<string, DictionaryEntry>> {
  if (keys.length === 0) return new Map();
  const rows = await query<{ key: string; entry: DictionaryEntry }>(
    `select key::text as key, entry from dictionary_entry where key in (select jsonb_array_elements_text($1::jsonb)::bigint)`,
    [JSON.stringify(keys)],
  );
  return new Map(rows.map((row) => [row.key, row.entry]));
}

/** Exact matches for many written names at once, with suggestions where there is none. */
export function resolveNames(dictionary: Dictionary, names: readonly { readonly name: string; readonly cas?: string | undefined }[]) {
  return {
    release: dictionary.release,
    items: names.map(({ name, cas }) => {
      const found = dictionary.resolve(name, cas);
      return found
        ? { name, entry: found.entry, match: found.match, suggestions: [] }
        : { name, entry: null, match: 'unknown' as const, suggestions: dictionary.suggest(name, 5) };
    }),
  };
}

/** One page of the dictionary by INCI name, narrowed by words that all occur and by a function. */
export async function listDictionary(
  query: RunQuery,
  { find, function: one, page = 1 }: { readonly find?: string | undefined; readonly function?: string | undefined; readonly page?: number | undefined },
): Promise<DictionaryPage> {
  const words = JSON.stringify(toWords(find ?? '').split(' ').filter(Boolean).slice(0, 8).map((word) => `%${word}%`));
  const where = `house_id is null
    and ($2::text = '' or functions @> array[$2::text])
    and search like all (array(select jsonb_array_elements_text($1::jsonb)))`;
  const given = [words, one ?? ''];
  const [items, totals, functions] = await Promise.all([
    query<{ entry: DictionaryEntry }>(`select entry from dictionary_entry where ${where} order by lower(inci), id limit $3::int offset $4::int`, [...given, PAGE_SIZE, (page - 1) * PAGE_SIZE]),
    query<{ total: number }>(`select count(*)::int as total from dictionary_entry where ${where}`, given),
    query<{ name: string }>('select distinct unnest(functions) as name from dictionary_entry where house_id is null order by 1', []),
  ]);
  return {
    items: items.map(({ entry }) => entry),
    total: totals[0]?.total ?? 0,
    page,
    pageSize: PAGE_SIZE,
    functions: functions.map(({ name }) => name),
  };
}

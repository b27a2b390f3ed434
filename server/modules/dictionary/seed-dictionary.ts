import { createHash } from 'node:crypto';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { termsOf, toWords } from '#shared/dictionary/terms.ts';

export interface SeedCount {
  readonly added: number;
  readonly changed: number;
  readonly removed: number;
}

/** Rows of one statement: keeps each well below a megabyte. */
const CHUNK = 1000;
/** Raised when the way terms are cut changes, so that stored rows are made anew. */
const TERMS_VERSION = '1';

/**
 * Makes the stored dictionary equal to `entries`: adds, rewrites what changed by content hash,
 * removes what is gone. Safe to run again, and quick when nothing changed. Touches only rows
 * of its `origin` that belong to no house.
 */
export async function seedDictionary(
  query: RunQuery,
  entries: readonly DictionaryEntry[],
  { release, origin = 'curated' }: { readonly release: string; readonly origin?: 'curated' | 'inventory' },
): Promise<SeedCount> {
  const stored = new Map(
    (await query<{ id: string; hash: string }>('select id, hash from dictionary_entry where house_id is null and origin = $1', [origin])).map((row) => [row.id, row.hash]),
  );
  const hashed = entries.map((entry) => ({ entry, hash: hashOf(entry) }));
  const fresh = hashed.filter(({ entry, hash }) => stored.get(entry.id) !== hash);
  const ids = new Set(entries.map((entry) => entry.id));
  const gone = [...stored.keys()].filter((id) => !ids.has(id));
  const doomed = [...gone, ...fresh.filter(({ entry }) => stored.has(entry.id)).map(({ entry }) => entry.id)];
  for (let at = 0; at < doomed.length; at += CHUNK) {
    await query(
      `delete from dictionary_entry where house_id is null and origin = $1
         and id in (select jsonb_array_elements_text($2::jsonb))`,
      [origin, JSON.stringify(doomed.slice(at, at + CHUNK))],
    );
  }
  for (let at = 0; at < fresh.length; at += CHUNK) await insert(query, fresh.slice(at, at + CHUNK), origin, release);
  if (fresh.length > 0) await query('analyze dictionary_term', []);
  const changed = doomed.length - gone.length;
  return { added: fresh.length - changed, changed, removed: gone.length };
}

async function insert(query: RunQuery, rows: readonly { entry: DictionaryEntry; hash: string }[], origin: string, release: string): Promise<void> {
  const records = rows.map(({ entry, hash }) => {
    const terms = termsOf(entry);
    const search = toWords([...terms.map(({ term }) => term), ...entry.ec].join(' '));
    return { id: entry.id, inci: entry.inci, functions: entry.functions, search, entry, hash, terms };
  });
  // One statement, so that an entry never stands without its terms.
  await query(
    `with given as (
       select * from jsonb_to_recordset($1::jsonb)
         as r (id text, inci text, functions jsonb, search text, entry jsonb, hash text, terms jsonb)
     ), kept as (
       insert into dictionary_entry (id, origin, inci, functions, search, entry, hash, release)
       select id, $2::text, inci, array(select jsonb_array_elements_text(functions)), search, entry, hash, $3::text from given
       on conflict (id) where house_id is null do nothing
       returning key, id
     )
     insert into dictionary_term (entry_key, term, words, folded, kind)
     select kept.key, t.term, t.words, t.folded, t.kind
     from kept join given using (id),
          jsonb_to_recordset(given.terms) as t (term text, words text, folded text, kind text)`,
    [JSON.stringify(records), origin, release],
  );
}

function hashOf(entry: DictionaryEntry): string {
  return createHash('sha256').update(TERMS_VERSION).update(JSON.stringify(entry)).digest('base64url').slice(0, 22);
}

import type { EntityManager } from '@mikro-orm/postgresql';
import type { DictionaryEntry, NameEntry } from '#shared/dictionary/types.ts';

/**
 * Every entry that the house sees, curated ones first and its own last: for reading lists in
 * the browser. Of the tables only what a look-up asks for.
 */
export async function listNames(em: Pick<EntityManager, 'execute'>): Promise<{ release: string; entries: NameEntry[] }> {
  const rows = await em.execute<{ entry: DictionaryEntry; release: string }[]>(
    `select entry, release from dictionary_entry order by house_id is not null, origin = 'inventory', key`,
  );
  return { release: rows[0]?.release ?? 'empty', entries: rows.map(({ entry }) => presentName(entry)) };
}

function presentName({ id, inci, cas, functions, names, synonyms, commonNames, misspellings, supersededBy, properties }: DictionaryEntry): NameEntry {
  return { id, inci, cas, functions, names, synonyms, commonNames, properties, ...(misspellings ? { misspellings } : {}), ...(supersededBy === undefined ? {} : { supersededBy }) };
}

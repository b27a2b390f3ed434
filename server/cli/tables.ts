import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import { openLawBook, type LawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Knowledge } from './check.ts';

/** How a table of ingredients begins. */
const ENTRY_COLUMNS = 'id,inci,';

/** Made of the same tables by the bundler (see pack.ts); absent where the sources run as they are. */
const PACKED = new URL('./dictionary.json', import.meta.url);

/** The entries of the tables in `folder` (data/dictionary). */
export function readEntries(folder: string): DictionaryEntry[] {
  const names = readdirSync(folder).filter((name) => name.endsWith('.csv')).sort();
  const tables = names.map((name) => readFileSync(join(folder, name), 'utf8'));
  // The folder also holds tables of another kind, such as what essential oils are made of.
  return tables.filter((table) => table.startsWith(ENTRY_COLUMNS)).flatMap(parseEntries);
}

/** The dictionary of this release. */
export function openDictionary(folder: string, release: string): Dictionary {
  const entries = existsSync(PACKED) ? (JSON.parse(readFileSync(PACKED, 'utf8')) as DictionaryEntry[]) : readEntries(folder);
  return createDictionary(entries, release);
}

/** The law of this release, from data/. */
export function openLaw(): LawBook {
  return openLawBook(lawTables);
}

/** Everything that a check stands on, from the tables below `root`. */
export function openKnowledge(root: string, today: PlainDate): Knowledge {
  const law = openLaw();
  return { law, dictionary: openDictionary(join(root, 'data/dictionary'), law.release), today };
}

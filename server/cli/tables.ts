import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import { openLawBook, type LawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Knowledge } from './check.ts';

/** How a table of ingredients begins. */
const ENTRY_COLUMNS = 'id,inci,';

/** The law of this release, from data/. */
export function openLaw(): LawBook {
  return openLawBook(lawTables);
}

/** The dictionary of this release, from the tables in `folder` (data/dictionary). */
export function openDictionary(folder: string, release: string): Dictionary {
  const names = readdirSync(folder).filter((name) => name.endsWith('.csv')).sort();
  const tables = names.map((name) => readFileSync(join(folder, name), 'utf8'));
  // The folder also holds tables of another kind, such as what essential oils are made of.
  return createDictionary(tables.filter((table) => table.startsWith(ENTRY_COLUMNS)).flatMap(parseEntries), release);
}

/** Everything that a check stands on, from the tables below `root`. */
export function openKnowledge(root: string, today: PlainDate): Knowledge {
  const law = openLaw();
  return { law, dictionary: openDictionary(join(root, 'data/dictionary'), law.release), today };
}

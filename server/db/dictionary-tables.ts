import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseOilProfiles, type OilProfile } from '#shared/dictionary/oil-profiles.ts';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';

export interface DictionaryTables {
  readonly entries: readonly DictionaryEntry[];
  readonly oils: readonly OilProfile[];
}

const OILS = 'oil-profiles.csv';
/** How a table of ingredients begins; the folder may hold tables of another kind. */
const ENTRY_COLUMNS = 'id,inci,';

/** Every table of the dictionary in a folder (data/dictionary), in the order of file names. */
export function readDictionaryTables(folder: string): DictionaryTables {
  const read = (name: string) => readFileSync(join(folder, name), 'utf8');
  const names = readdirSync(folder).filter((name) => name.endsWith('.csv')).sort();
  const tables = names.filter((name) => name !== OILS).map(read);
  return {
    entries: tables.filter((table) => table.startsWith(ENTRY_COLUMNS)).flatMap((table) => parseEntries(table)),
    oils: names.includes(OILS) ? parseOilProfiles(read(OILS)) : [],
  };
}

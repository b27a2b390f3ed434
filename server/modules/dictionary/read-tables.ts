import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseOilProfiles, type OilProfile } from '#shared/dictionary/oil-profiles.ts';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';

const OILS = 'oil-profiles.csv';

/** The curated entries of data/dictionary, table by table in the order of their names. */
export function readEntryTables(folder: string): DictionaryEntry[] {
  return readdirSync(folder)
    .filter((file) => file.endsWith('.csv') && file !== OILS)
    .sort()
    .flatMap((file) => parseEntries(readFileSync(join(folder, file), 'utf8')));
}

/** The published ranges of essential oils' constituents of data/dictionary. */
export function readOilTable(folder: string): OilProfile[] {
  return parseOilProfiles(readFileSync(join(folder, OILS), 'utf8'));
}

import { DomainError } from '#shared/kernel/errors.ts';
import { cellList, readCsv } from './parse-csv.ts';
import type { DictionaryEntry } from './types.ts';

const COLUMNS = [
  'id', 'inci', 'cas', 'ec', 'functions', 'us', 'ca', 'fr', 'us_colours',
  'synonyms', 'common_names', 'misspellings', 'superseded_by', 'properties', 'source',
] as const;

/**
 * Reads one table of the dictionary (data/dictionary/*.csv) into entries.
 * @throws DomainError when a column is missing, or a row lacks its id, name or source.
 */
export function parseEntries(csv: string): DictionaryEntry[] {
  return readCsv(csv, COLUMNS).map((row) => {
    if (row.id === '' || row.inci === '' || row.source === '') {
      throw new DomainError(`dictionary row "${row.id || row.inci}" lacks its id, name or source`);
    }
    const usColours = cellList(row.us_colours);
    const misspellings = cellList(row.misspellings);
    return {
      id: row.id,
      inci: row.inci,
      cas: cellList(row.cas),
      ec: cellList(row.ec),
      functions: cellList(row.functions),
      names: {
        ...(row.us ? { us: row.us } : {}),
        ...(row.ca ? { ca: row.ca } : {}),
        ...(row.fr ? { fr: row.fr } : {}),
        ...(usColours.length > 0 ? { usColours } : {}),
      },
      synonyms: cellList(row.synonyms),
      commonNames: cellList(row.common_names),
      ...(misspellings.length > 0 ? { misspellings } : {}),
      ...(row.superseded_by ? { supersededBy: row.superseded_by } : {}),
      properties: cellList(row.properties),
      source: row.source,
    };
  });
}

import { DomainError } from '#shared/kernel/errors.ts';
import { cellList, splitCsv } from './parse-csv.ts';
import type { DictionaryEntry } from './types.ts';

const COLUMNS = [
  'id', 'inci', 'cas', 'ec', 'functions', 'us', 'ca', 'fr', 'us_colours',
  'synonyms', 'common_names', 'misspellings', 'superseded_by', 'properties', 'source',
] as const;
const NONE: readonly string[] = [];
const NO_NAMES: DictionaryEntry['names'] = {};

/**
 * Reads one table of the dictionary (data/dictionary/*.csv, columns in the order of
 * data/README.md) into entries. Thousands of rows are read at every start, so cells are
 * taken by place and empty lists are shared.
 * @throws DomainError when the header differs, or a row lacks cells, its id, name or source.
 */
export function parseEntries(csv: string): DictionaryEntry[] {
  const [header, ...rows] = splitCsv(csv);
  if (header?.join() !== COLUMNS.join()) throw new DomainError(`a dictionary table must have the columns ${COLUMNS.join()}`);
  return rows.map((row) => {
    const [id, inci, cas, ec, functions, us, ca, fr, colours, synonyms, common, misspelt, superseded, properties, source] = row;
    if (row.length !== COLUMNS.length || !id || !inci || !source) {
      throw new DomainError(`dictionary row "${id || inci}" lacks cells, its id, name or source`);
    }
    return {
      id,
      inci,
      cas: list(cas!),
      ec: list(ec!),
      functions: list(functions!),
      names: us || ca || fr || colours ? marketNames(us!, ca!, fr!, list(colours!)) : NO_NAMES,
      synonyms: list(synonyms!),
      commonNames: list(common!),
      ...(misspelt ? { misspellings: list(misspelt) } : undefined),
      ...(superseded ? { supersededBy: superseded } : undefined),
      properties: list(properties!),
      source,
    };
  });
}

function list(cell: string): readonly string[] {
  return cell === '' ? NONE : cellList(cell);
}

function marketNames(us: string, ca: string, fr: string, usColours: readonly string[]): DictionaryEntry['names'] {
  return {
    ...(us ? { us } : undefined),
    ...(ca ? { ca } : undefined),
    ...(fr ? { fr } : undefined),
    ...(usColours.length > 0 ? { usColours } : undefined),
  };
}

import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { assess } from '#shared/engine/assess.ts';
import type { Assessment } from '#shared/engine/assessment.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { foldName } from '#shared/law/fold.ts';
import { openLawBook, type LawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Market } from '#shared/law/types.ts';

/** The names that a product's materials hold, as the server resolved them. */
export interface Names {
  readonly entries: readonly DictionaryEntry[];
  readonly unknown: readonly { readonly name: string; readonly suggestions: readonly string[] }[];
  readonly release: string;
}

export interface AssessInput {
  readonly markets: readonly Market[];
  readonly placed: string;
  readonly available: string;
  readonly today: string;
}

/** The same engine that the server uses, with the law tables of this release: a chunk of its own, fetched once. */
export interface Engine {
  readonly law: LawBook;
  withNames(names: Names): (document: FormulaDocument, input: AssessInput) => Assessment;
}

/** A stand-in for a name that the server suggested: only its INCI name is shown. */
function suggested(inci: string): DictionaryEntry {
  return { id: foldName(inci), inci, cas: [], ec: [], functions: [], names: {}, synonyms: [], commonNames: [], properties: [], source: '' };
}

/** Opens the law tables. Takes some milliseconds: once per page. */
export function createEngine(): Engine {
  const law = openLawBook(lawTables);
  return {
    law,
    withNames({ entries, unknown, release }) {
      const known = createDictionary(entries, release);
      const likely = new Map(unknown.map((each) => [foldName(each.name), each.suggestions.map(suggested)]));
      // The full dictionary stays on the server; for unknown names it has already searched there.
      const dictionary = { ...known, suggest: (name: string, count = 5) => (likely.get(foldName(name)) ?? []).slice(0, count) };
      return (document, { markets, placed, available, today }) =>
        assess(document, { law, dictionary, markets, placedOnMarket: plainDate(placed), availableOn: plainDate(available), today: today as PlainDate });
    },
  };
}

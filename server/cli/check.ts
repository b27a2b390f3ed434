import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { ResultDocument } from '#shared/contracts/result-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { assess } from '#shared/engine/assess.ts';
import { presentResult } from '#shared/engine/present-result.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Arguments } from './arguments.ts';
import { parseJson, readText, Unusable } from './input.ts';
import type { Io } from './io.ts';

/** The tables and the day that a check stands on. */
export interface Knowledge {
  readonly law: LawBook;
  readonly dictionary: Dictionary;
  readonly today: PlainDate;
}

/** What the command line sets for every document of a run. */
export type Flags = Pick<Arguments, 'markets' | 'placed' | 'available'>;

/** Reads one document. @throws Unusable with every fault */
export function readDocument(text: string, flags: Flags, { law }: Knowledge): FormulaDocument {
  const read = readFormulaDocument(parseJson(text), { categories: law.categories, markets: flags.markets });
  if ('faults' in read) throw new Unusable(read.faults);
  return read.document;
}

/** Judges one document as the flags say; a flag beats the document. */
export function checkDocument(document: FormulaDocument, flags: Flags, { law, dictionary, today }: Knowledge): ResultDocument {
  return presentResult(assess(document, {
    law,
    dictionary,
    today,
    markets: flags.markets,
    ...(flags.placed && { placedOnMarket: flags.placed }),
    ...(flags.available && { availableOn: flags.available }),
  }));
}

/** Whether anything in any market stops sale. */
export function stopsSale(result: ResultDocument): boolean {
  return result.results.some(({ findings }) => findings.some(({ severity }) => severity === 'stop'));
}

/** What is said of days that the tables do not cover, each once. */
function daysBeyond(result: ResultDocument): string[] {
  return [...new Set(result.results.flatMap(({ findings }) => findings.filter(({ kind }) => kind === 'date-not-covered').map(({ message }) => message)))];
}

/** `check` of a single document: 1 where something stops sale. @throws Unusable */
export async function checkFile(given: Arguments, knows: Knowledge, io: Io): Promise<number> {
  const result = checkDocument(readDocument(await readText(given.file, io.stdin), given, knows), given, knows);
  for (const words of daysBeyond(result)) io.tell(words);
  await io.write(`${JSON.stringify(result, null, 1)}\n`);
  return stopsSale(result) ? 1 : 0;
}

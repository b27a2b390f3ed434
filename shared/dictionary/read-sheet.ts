import { readNumber } from './read-amount.ts';
import type { PasteProblem } from './read-composition.ts';
import { splitCells, splitRows } from './split-block.ts';

/** One row of a pasted formula. Amounts are decimals with a point; `qs` makes up the batch. */
export interface FormulaPasteLine {
  /** Row of the paste, from 1. */
  readonly row: number;
  readonly name: string;
  /** The phase heading above it, or its phase column; empty where none was given. */
  readonly phase: string;
  readonly grams?: string;
  readonly percent?: string;
  readonly qs?: true;
}

export interface FormulaPaste {
  readonly lines: readonly FormulaPasteLine[];
  readonly problems: readonly PasteProblem[];
}

type Meaning = 'name' | 'grams' | 'percent' | 'phase' | 'skip';

const PHASE = /^(?:phase|part|teil|phas\.?)\s*[:.-]?\s*([A-Z0-9]{1,3})?\b\s*[:.–—(-]*\s*(.*?)\)?$/i;
const BARE_PHASE = /^([A-H])[.:)]?$/;
const TOTAL = /^(?:total|sum|summe|gesamt|batch(?: size)?)\b/i;
const MAKES_UP = /^(?:q\.?\s?s\.?(?:\s*(?:to|ad|auf)?\s*100\s*%?)?|(?:to|ad|auf|up to)\s*100\s*%?|add to 100|balance|rest)$/i;
const HEADINGS: readonly (readonly [RegExp, Meaning])[] = [
  [/^(?:ingredients?|materials?|raw materials?|names?|inci(?: names?)?|rohstoffe?|trade names?|matières? premières?)$/i, 'name'],
  [/^(?:g|grams?|grammes?|gramm|weight|weight \(g\)|amount \(g\)|grams? \(g\)|batch \(g\)|menge \(g\)|mass)$/i, 'grams'],
  [/^(?:%|percent|percentage|% ?w\/w|w\/w|% ?wt|amount \(%\)|share|prozent|anteil|%\s*\(w\/w\))$/i, 'percent'],
  [/^(?:phase|part|teil)$/i, 'phase'],
  [/^(?:no\.?|nr\.?|#|cas(?: no\.?)?|function|supplier|lot|notes?|price|cost|funktion)$/i, 'skip'],
];
const WITH_UNIT = /^([\d.,\s'’\u00a0]+?)\s*(kg|g|gr|gram|grams|mg|%|percent)$/i;

/**
 * Reads formula rows as pasted from a spreadsheet or a note: material, grams and/or percent,
 * with decimal point or comma, phase headings or a phase column, and one `q.s.` line.
 * A column's meaning comes from its heading, else from the units in its cells, else bare
 * figures are grams unless they add up to about 100, which is left to the reader to confirm.
 */
export function readFormulaBlock(text: string): FormulaPaste {
  const problems: PasteProblem[] = [];
  const lines: FormulaPasteLine[] = [];
  let columns: Meaning[] = [];
  let phase = '';
  for (const { row, line } of splitRows(text)) {
    const cells = splitCells(line);
    const filled = cells.filter((cell) => cell !== '');
    const headings = readHeadings(cells);
    if (headings) {
      columns = headings;
      continue;
    }
    const first = filled[0]!;
    if (TOTAL.test(first)) continue;
    const heading = filled.length === 1 ? readPhase(first) : undefined;
    if (heading !== undefined) {
      phase = heading;
      continue;
    }
    const read = readRow(filled.length === 1 ? splitLoose(first) : cells, columns, row);
    if ('message' in read) problems.push(read);
    else {
      if (read.phase !== '') phase = read.phase;
      lines.push({ ...read, phase });
    }
  }
  if (lines.filter((line) => line.qs).length > 1) {
    const second = lines.filter((line) => line.qs)[1]!;
    problems.push({ row: second.row, message: 'Two lines make up the batch. Only one can; give the other an amount.' });
  }
  if (lines.length === 0 && problems.length === 0) problems.push({ row: 1, message: 'Nothing that looks like a formula line was found.' });
  return { lines, problems };
}

function readHeadings(cells: readonly string[]): Meaning[] | undefined {
  const meanings = cells.map((cell) => HEADINGS.find(([pattern]) => pattern.test(cell.replace(/:$/, '')))?.[1]);
  const known = meanings.filter((meaning) => meaning !== undefined);
  if (!known.includes('name') && !(known.length >= 2)) return undefined;
  return meanings.map((meaning) => meaning ?? 'skip');
}

function readPhase(cell: string): string | undefined {
  const bare = BARE_PHASE.exec(cell);
  if (bare) return bare[1]!;
  const named = PHASE.exec(cell);
  if (named) return named[1] ?? named[2]!;
  const words = /^(.{2,40}?)\s+phase\s*:?$/i.exec(cell);
  return words && !/\d/.test(cell) ? words[1]! : undefined;
}

/** A row without columns: `Glycerin 5 g`, `Glycerin: 5 %`, `5 g Glycerin`. */
function splitLoose(line: string): string[] {
  const after = /^(.*?\S)[\s:–—=]+((?:\d[\d.,]*|[.,]\d+)\s*(?:kg|mg|g|gr|grams?|%)?|q\.?\s?s\.?(?:\s+(?:to|ad)\s+100\s*%?)?|(?:to|ad)\s+100\s*%?)$/i.exec(line);
  if (after) return [after[1]!.replace(/[:=–—-]\s*$/, '').trim(), after[2]!];
  const before = /^(\d[\d.,]*\s*(?:kg|mg|g|gr|grams?|%))\s+(\S.*)$/i.exec(line);
  return before ? [before[2]!, before[1]!] : [line];
}

function readRow(cells: readonly string[], columns: readonly Meaning[], row: number): FormulaPasteLine | PasteProblem {
  let name = '';
  let phase = '';
  let grams: string | undefined;
  let percent: string | undefined;
  let isRest = false;
  for (const [index, cell] of cells.entries()) {
    const meaning = columns[index];
    if (cell === '' || meaning === 'skip') continue;
    const unit = WITH_UNIT.exec(cell);
    if (meaning === 'phase' || (meaning === undefined && name === '' && BARE_PHASE.test(cell))) phase = cell.replace(/^phase\s*/i, '').replace(/[.:)]$/, '');
    else if (MAKES_UP.test(cell) && name !== '') isRest = true;
    else if (unit) {
      const value = readNumber(unit[1]!);
      if (value === undefined) return { row, message: `"${cell}" is not an amount that can be read.` };
      if (/^(?:%|percent)$/i.test(unit[2]!)) percent ??= value;
      else grams ??= toGrams(value, unit[2]!.toLowerCase());
    } else if (readNumber(cell) !== undefined && meaning !== 'name') {
      if (name === '' && meaning === undefined) continue; // a running number
      if (meaning === 'percent') percent ??= readNumber(cell);
      else if (meaning === 'grams' || grams === undefined) grams ??= readNumber(cell);
      else percent ??= readNumber(cell);
    } else if (/^-\s*\d/.test(cell)) return { row, message: `${name || 'This line'}: an amount cannot be below zero.` };
    else if (name === '') name = cell;
    else if (meaning === 'grams' || meaning === 'percent') return { row, message: `${name}: "${cell}" is not an amount that can be read.` };
  }
  if (name === '') return { row, message: `"${cells.filter((cell) => cell !== '').join(' ')}" has no material name.` };
  if (grams === undefined && percent === undefined && !isRest) return { row, message: `${name} has no amount. Add grams or percent.` };
  return { row, name, phase, ...(grams !== undefined ? { grams } : {}), ...(percent !== undefined ? { percent } : {}), ...(isRest ? { qs: true as const } : {}) };
}

/** Moves the decimal point by three places, exactly. */
function toGrams(value: string, unit: string): string {
  const places = unit === 'kg' ? 3 : unit === 'mg' ? -3 : 0;
  if (places === 0) return value;
  const [whole, fraction = ''] = value.split('.');
  const digits = places > 0 ? whole! + fraction.padEnd(3, '0') : whole!.padStart(4, '0') + fraction;
  const at = places > 0 ? whole!.length + 3 : digits.length - fraction.length - 3;
  const text = `${digits.slice(0, at)}.${digits.slice(at)}`.replace(/0+$/, '').replace(/\.$/, '').replace(/^0+(?=\d)/, '');
  return text === '' ? '0' : text;
}

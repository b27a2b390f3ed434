import { DomainError } from '#shared/kernel/errors.ts';
import { foldName } from '#shared/law/fold.ts';
import { isCasNumber, isEcNumber } from './registry-numbers.ts';
import { splitExport, type ExportLine } from './split-export.ts';

/** One name of an inventory export, as it stands there. */
export interface InventoryName {
  readonly line: number;
  readonly inci: string;
  /** {@link foldName} of `inci`: each stands once in a reading. */
  readonly folded: string;
  readonly cas: readonly string[];
  readonly ec: readonly string[];
  readonly functions: readonly string[];
}

/** A line or a part of one that was left out, and why. */
export interface InventoryRemark {
  readonly line: number;
  readonly reason: string;
}

export interface InventoryReading {
  readonly names: readonly InventoryName[];
  /** Lines that gave no name. */
  readonly skipped: readonly InventoryRemark[];
  /** Lines that were taken without a part of them. */
  readonly remarks: readonly InventoryRemark[];
}

/** The longest name that is kept; the longest known one has some 900 letters. */
export const LONGEST_NAME = 2000;
/** Exports begin with a few lines about themselves. */
const HEADING_WITHIN = 30;

const HEADINGS = {
  inci: /^inci(?: names?)?$/i,
  cas: /^cas(?: (?:no|nos|number|numbers|nr))?$/i,
  ec: /^(?:ec|einecs|einecs elincs|ec einecs)(?: (?:no|nos|number|numbers|nr))?$/i,
  functions: /^functions?$/i,
} as const;

interface Columns {
  readonly inci: number;
  readonly cas: number;
  readonly ec: number;
  readonly functions: number;
  readonly count: number;
}

/**
 * Reads an export of the official inventory, tab-, comma- or semicolon-separated, with headings.
 * Faulty lines are left out and told of by their number; a name that stands twice counts once.
 * @throws DomainError in plain words where it is no such export: no heading of names, or a cell
 *   whose quote is never closed.
 */
export function readInventory(text: string): InventoryReading {
  const { lines, isWhole } = splitExport(text);
  const at = lines.slice(0, HEADING_WITHIN).findIndex(({ cells }) => cells.some((cell) => HEADINGS.inci.test(plainHeading(cell))));
  const heading = lines[at];
  if (!heading) throw new DomainError('No column is headed "INCI name". Check that this is the inventory export, saved as text with tabs or commas.');
  const columns = readColumns(heading);
  const names: InventoryName[] = [];
  const skipped: InventoryRemark[] = [];
  const remarks: InventoryRemark[] = [];
  const firstLine = new Map<string, number>();
  for (const [index, one] of lines.slice(at + 1).entries()) {
    const isCut = !isWhole && index === lines.length - at - 2 && one.cells.length < columns.count;
    const read = isCut ? `The file ends within this line: it has ${one.cells.length} of ${columns.count} cells.` : readLine(one, columns, remarks);
    if (typeof read === 'string') {
      skipped.push({ line: one.line, reason: read });
      continue;
    }
    const before = firstLine.get(read.folded);
    if (before !== undefined) {
      skipped.push({ line: one.line, reason: `"${brief(read.inci)}" stands in line ${before} already.` });
      continue;
    }
    firstLine.set(read.folded, one.line);
    names.push(read);
  }
  return { names, skipped, remarks };
}

function readColumns({ cells, line }: ExportLine): Columns {
  const find = (pattern: RegExp) => cells.findIndex((cell) => pattern.test(plainHeading(cell)));
  const columns = { inci: find(HEADINGS.inci), cas: find(HEADINGS.cas), ec: find(HEADINGS.ec), functions: find(HEADINGS.functions), count: cells.length };
  if (columns.cas < 0 && columns.functions < 0) throw new DomainError(`Line ${line} heads a column of names but none of CAS numbers or functions. Check that this is the inventory export.`);
  return columns;
}

function plainHeading(cell: string): string {
  return cell.replace(/[_./()-]+/g, ' ').replace(/\s+/g, ' ').trim();
}

function readLine({ cells, line }: ExportLine, columns: Columns, remarks: InventoryRemark[]): InventoryName | string {
  if (cells.length > columns.count) return `It has ${cells.length} cells where the headings have ${columns.count}.`;
  const cell = (at: number) => (at < 0 ? '' : (cells[at] ?? '').replace(/\s+/g, ' ').trim());
  const inci = cell(columns.inci);
  const folded = foldName(inci);
  if (folded === '') return 'It has no name.';
  if (inci.includes('\uFFFD')) return `"${brief(inci)}" has letters that could not be read. Save the file as UTF-8.`;
  if (inci.length > LONGEST_NAME) return `The name has ${inci.length} letters; at most ${LONGEST_NAME} are kept.`;
  const told = (kind: string, wrong: string) => remarks.push({ line, reason: `${brief(inci)}: "${brief(wrong)}" is no ${kind} number and was left out.` });
  return {
    line,
    inci,
    folded,
    cas: readNumbers(cell(columns.cas), isCasNumber, (wrong) => told('CAS', wrong)),
    ec: readNumbers(cell(columns.ec), isEcNumber, (wrong) => told('EC', wrong)),
    functions: [...new Set(cell(columns.functions).toLowerCase().split(/\s*[,;]\s*/).filter((one) => one !== '' && one !== '-'))],
  };
}

function readNumbers(cell: string, isRight: (text: string) => boolean, onWrong: (text: string) => void): string[] {
  const numbers = new Set<string>();
  for (const part of cell.split(/[\s,;/]+/)) {
    const text = part.replace(/^[([]+|[)\].]+$/g, '');
    if (!/\d/.test(text)) continue;
    if (isRight(text)) numbers.add(text);
    else onWrong(text);
  }
  return [...numbers];
}

function brief(text: string): string {
  return text.length > 60 ? `${text.slice(0, 59)}…` : text;
}

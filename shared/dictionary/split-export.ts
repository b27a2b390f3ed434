import { DomainError } from '#shared/kernel/errors.ts';

/** One record of an export and the line of the file in which it begins, from 1. */
export interface ExportLine {
  readonly line: number;
  readonly cells: readonly string[];
}

export interface SplitExport {
  readonly lines: readonly ExportLine[];
  /** Whether the file ends with a line end; one that does not may have been cut. */
  readonly isWhole: boolean;
}

/**
 * Splits an export into records: by tabs where its first lines have any, else by semicolons or
 * commas, whichever is more frequent there. Cells may be quoted (RFC 4180) and then hold line ends.
 * @throws DomainError where a quote is never closed.
 */
export function splitExport(given: string): SplitExport {
  const text = given.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n');
  const mark = findMark(text.slice(0, 4000));
  const lines: ExportLine[] = [];
  let at = 0;
  let line = 1;
  while (at < text.length) {
    const found = text.indexOf('\n', at);
    const end = found < 0 ? text.length : found;
    const plain = text.slice(at, end);
    if (!plain.includes('"')) {
      if (plain.trim() !== '') lines.push({ line, cells: plain.split(mark) });
      at = end + 1;
      line += 1;
      continue;
    }
    const record = readQuoted(text, at, mark, line);
    lines.push({ line, cells: record.cells });
    line += text.slice(at, record.next).split('\n').length - 1;
    at = record.next;
  }
  return { lines, isWhole: text.endsWith('\n') };
}

function findMark(start: string): string {
  if (start.includes('\t')) return '\t';
  return start.split(';').length > start.split(',').length ? ';' : ',';
}

function readQuoted(text: string, start: number, mark: string, line: number): { cells: string[]; next: number } {
  const cells: string[] = [];
  let at = start;
  for (;;) {
    let cell = '';
    if (text[at] === '"') {
      const close = closingQuote(text, at);
      if (close < 0) throw new DomainError(`Line ${line} opens a quote that is never closed. The file seems to be cut short; export it again.`);
      cell = text.slice(at + 1, close).replaceAll('""', '"');
      at = close + 1;
    }
    const from = at;
    while (at < text.length && text[at] !== mark && text[at] !== '\n') at += 1;
    cells.push(cell + text.slice(from, at));
    if (text[at] !== mark) return { cells, next: at + 1 };
    at += 1;
  }
}

function closingQuote(text: string, open: number): number {
  let at = text.indexOf('"', open + 1);
  while (at >= 0 && text[at + 1] === '"') at = text.indexOf('"', at + 2);
  return at;
}

import { DomainError } from '#shared/kernel/errors.ts';

/** Splits CSV text (RFC 4180: commas, double quotes, LF or CRLF) into rows of cells; empty lines fall away. */
export function splitCsv(text: string): string[][] {
  const rows: string[][] = [];
  const end = text.length;
  let at = text.startsWith('\uFEFF') ? 1 : 0;
  while (at < end) {
    let eol = text.indexOf('\n', at);
    if (eol < 0) eol = end;
    const line = text.slice(at, text[eol - 1] === '\r' ? eol - 1 : eol);
    // Almost every line is free of quotes: one native split is many times faster than a walk.
    if (!line.includes('"')) {
      if (line !== '') rows.push(line.split(','));
      at = eol + 1;
    } else {
      const { row, next } = readQuotedRow(text, at);
      rows.push(row);
      at = next;
    }
  }
  return rows;
}

function readQuotedRow(text: string, start: number): { row: string[]; next: number } {
  const row: string[] = [];
  let at = start;
  for (;;) {
    let cell = '';
    if (text[at] === '"') {
      at += 1;
      for (;;) {
        const quote = text.indexOf('"', at);
        if (quote < 0) throw new DomainError('a quoted cell has no closing quote');
        cell += text.slice(at, quote);
        at = quote + 1;
        if (text[at] !== '"') break;
        cell += '"';
        at += 1;
      }
    } else {
      const from = at;
      while (at < text.length && text[at] !== ',' && text[at] !== '\n' && text[at] !== '\r') at += 1;
      cell = text.slice(from, at);
    }
    row.push(cell);
    if (text[at] !== ',') break;
    at += 1;
  }
  if (text[at] === '\r') at += 1;
  if (text[at] === '\n') at += 1;
  else if (at < text.length) throw new DomainError(`after a closing quote stands "${text.slice(at, at + 10)}"`);
  return { row, next: at };
}

/**
 * Reads CSV with a header row into one record a row, cells trimmed.
 * @throws DomainError when a column is missing or a row has another number of cells than the header.
 */
export function readCsv<Column extends string>(text: string, columns: readonly Column[]): Record<Column, string>[] {
  const [header, ...rows] = splitCsv(text);
  const places = columns.map((column) => {
    const place = header?.indexOf(column) ?? -1;
    if (place < 0) throw new DomainError(`the table has no column "${column}"`);
    return place;
  });
  return rows.map((row, index) => {
    if (row.length !== header!.length) {
      throw new DomainError(`row ${index + 2} has ${row.length} cells, the header has ${header!.length}`);
    }
    const record = {} as Record<Column, string>;
    for (let i = 0; i < columns.length; i += 1) record[columns[i]!] = row[places[i]!]!.trim();
    return record;
  });
}

/** The parts of a cell that holds several values, set apart by ` | `. */
export function cellList(cell: string): string[] {
  return cell === '' ? [] : cell.split(' | ');
}

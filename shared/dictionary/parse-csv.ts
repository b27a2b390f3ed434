import { DomainError } from '#shared/kernel/errors.ts';

const SPECIAL = /[",\r\n]/;

/** Splits CSV text (RFC 4180: commas, double quotes, LF or CRLF) into rows of cells; empty lines fall away. */
export function splitCsv(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let at = text.startsWith('\uFEFF') ? 1 : 0;
  const end = text.length;
  while (at < end) {
    let cell: string;
    if (text[at] === '"') {
      let from = at + 1;
      cell = '';
      for (;;) {
        const quote = text.indexOf('"', from);
        if (quote < 0) throw new DomainError('a quoted cell has no closing quote');
        cell += text.slice(from, quote);
        at = quote + 1;
        if (text[at] !== '"') break;
        cell += '"';
        from = at + 1;
      }
    } else {
      const from = at;
      while (at < end && !SPECIAL.test(text[at]!)) at += 1;
      cell = text.slice(from, at);
    }
    row.push(cell);
    if (text[at] === ',') {
      at += 1;
      if (at < end) continue;
      row.push('');
    }
    if (text[at] === '\r') at += 1;
    if (text[at] === '\n') at += 1;
    if (row.length > 1 || row[0] !== '') rows.push(row);
    row = [];
  }
  return rows;
}

/**
 * Reads CSV with a header row into one record a row.
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
    columns.forEach((column, i) => (record[column] = row[places[i]!]!.trim()));
    return record;
  });
}

/** The parts of a cell that holds several values, set apart by ` | `. */
export function cellList(cell: string): string[] {
  return cell === '' ? [] : cell.split('|').map((part) => part.trim()).filter((part) => part !== '');
}

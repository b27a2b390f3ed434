/** The rows of a pasted block that hold anything, numbered from 1. */
export function splitRows(text: string): { row: number; line: string }[] {
  return text
    .replace(/^\uFEFF/, '')
    .replace(/[\u200B\u200C\u200D\u2060]/g, '')
    .split(/\r\n|\r|\n|\u2028/)
    .map((line, index) => ({ row: index + 1, line: line.replace(/\u00a0/g, ' ') }))
    .filter(({ line }) => line.trim() !== '');
}

/**
 * The cells of one row: by tab, else by semicolon or pipe, else by two or more spaces, else by a
 * comma where a quoted cell or a figure shows that it is a spreadsheet's own mark. One cell
 * where nothing divides it.
 */
export function splitCells(line: string): string[] {
  const text = line.trim();
  if (line.includes('\t')) return line.split('\t').map(clean);
  if (/^\|.*\|$/.test(text)) return text.slice(1, -1).split('|').map(clean);
  if (/;/.test(text) && hasFigureCell(text.split(';'))) return text.split(';').map(clean);
  if (/ \| /.test(text) && hasFigureCell(text.split('|'))) return text.split('|').map(clean);
  if (/ {2,}/.test(text)) return text.split(/ {2,}/).map(clean);
  if (text.startsWith('"')) return [...text.matchAll(/"((?:[^"]|"")*)"|([^,"]+)/g)].map((cell) => clean(cell[1] ?? cell[2] ?? ''));
  const commas = text.split(',');
  if (commas.length > 1 && commas.length <= 4 && commas.slice(1).every((cell) => /^\s*[<>≤≥]?\s*[\d.–-]+\s*%?\s*(?:kg|g|%)?\s*$/.test(cell) && cell.trim() !== '')) {
    // `Glycerin,5.0`: a row of a comma-separated file. `Glycerin,5,0` is a decimal comma: keep it whole.
    const figures = commas.slice(1).map(clean);
    if (figures.length === 2 && figures.every((cell) => /^\d+%?$/.test(cell))) return [clean(commas[0]!), figures.join(',')];
    if (!/\d$/.test(commas[0]!.trim())) return commas.map(clean);
  }
  return [text];
}

function hasFigureCell(cells: readonly string[]): boolean {
  return cells.some((cell) => /^\s*(?:[<>≤≥=]*|max\.?|min\.?)\s*\d[\d.,\s]*(?:[-–—]\s*\d[\d.,]*)?\s*(?:%|g|kg)?\s*$/i.test(cell) || /^\s*\d{2,7}-\d{2}-\d\s*$/.test(cell));
}

function clean(cell: string): string {
  return cell.trim().replace(/^"(.*)"$/, '$1').replace(/""/g, '"').trim();
}

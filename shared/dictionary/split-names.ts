const OPEN = '([{';
const CLOSE = ')]}';
const AND = /\s*\(\s*(?:and|und|et|y|e|\+|&)\s*\)\s*/i;

/**
 * Splits a supplier's or a label's list into names: `(and)` first, else semicolons, bullets,
 * line breaks, ` + `, ` & `, and commas. A comma inside brackets or between two digits, as in
 * `1,2-Hexanediol`, belongs to the name; so does one followed by a letter without a space
 * between locants (`N,N'-…`).
 */
export function splitNames(text: string): string[] {
  const line = text.replace(/\s+/g, ' ').trim();
  if (AND.test(line)) return line.split(new RegExp(AND.source, 'gi')).flatMap((part) => splitByMarks(part));
  return splitByMarks(line);
}

function splitByMarks(line: string): string[] {
  const names: string[] = [];
  let depth = 0;
  let from = 0;
  for (let at = 0; at < line.length; at += 1) {
    const letter = line[at]!;
    if (OPEN.includes(letter)) depth += 1;
    else if (CLOSE.includes(letter)) depth = depth > 0 ? depth - 1 : 0;
    else if (depth === 0 && isMark(line, at)) {
      names.push(line.slice(from, at));
      from = at + 1;
    }
  }
  names.push(line.slice(from));
  return names.map(tidyName).filter((name) => name !== '');
}

function isMark(line: string, at: number): boolean {
  const letter = line[at]!;
  if (';•·|'.includes(letter)) return true;
  const before = line[at - 1] ?? '';
  const after = line[at + 1] ?? '';
  if (letter === '+' || letter === '&') return before === ' ' && after === ' ';
  if (letter !== ',') return false;
  if (/\d/.test(before) && /\d/.test(after)) return false;
  return !(/^[NO]$/.test(before) && /[NO]/.test(after) && !/[A-Za-z]/.test(line[at - 2] ?? ' '));
}

/** Drops what surrounds a name in lists: bullets, footnote marks, a closing full stop, stray quotes. */
export function tidyName(name: string): string {
  return name
    .trim()
    .replace(/^(?:[-–—*•·]\s+|\d+[.)]\s+)/, '')
    .replace(/^["'“”]+|["'“”]+$/g, '')
    .replace(/[\s*†‡°¹²³]+$/, '')
    .replace(/(?<!\b(?:denat|no|sp|spp|var))\.$/i, '')
    .trim();
}

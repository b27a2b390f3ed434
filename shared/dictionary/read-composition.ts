import { compare, decimal, HUNDRED, sum, toDecimal } from '#shared/kernel/rational.ts';
import { readShare, type WrittenShare } from './read-amount.ts';
import { isCasNumber, isEcNumber } from './registry-numbers.ts';
import { splitCells, splitRows } from './split-block.ts';
import { splitNames, tidyName } from './split-names.ts';

/** One substance of a pasted composition. Shares are decimals in percent of the material. */
export interface CompositionLine {
  /** Row of the paste, from 1. */
  readonly row: number;
  readonly name: string;
  readonly cas?: string;
  readonly ec?: string;
  readonly percent?: string;
  readonly min?: string;
  readonly max?: string;
}

export interface PasteProblem {
  readonly row: number;
  /** What was found and what to do, in a maker's words. */
  readonly message: string;
}

export interface CompositionPaste {
  readonly lines: readonly CompositionLine[];
  readonly problems: readonly PasteProblem[];
  /** Sum of the single shares where every line has one; absent otherwise. */
  readonly total?: string;
}

const NUMBERS = /\d{2,7}-\d{2}-\d(?!\d)|\d{3}-\d{3}-\d(?!\d)/g;
const HEADING = /^(?:inci(?: name)?|ingredients?|name|substance|chemical name|component|composition|material|cas(?:[- ]?(?:no\.?|number))?|ec(?:[- ]?(?:no\.?|number))?|einecs|%|percent(?:age)?|w\/w|% ?w\/w|share|content|conc(?:entration)?\.?|amount|level|function|range|typical|min(?:imum)?|max(?:imum)?|no\.?|#|inhaltsstoffe?|anteil|stoff)(?: *[([]?(?:%|w\/w|% w\/w|inci|wt\.? ?%)[)\]]?)?:?$/i;
const TOTAL = /^(?:total|sum|summe|gesamt)\b/i;
const LEAD = /^(?:ingredients?|inci(?: name)?|composition|contains|inhaltsstoffe|ingrédients)\s*[:=]\s*/i;
const TRAILING_SHARE = /^(.*?\S)[\s:(=]+((?:(?:<=|≤|<|>=|≥|>|max\.?|min\.?|ca\.?|up to|approx\.?)\s*)?\d+(?:[.,]\d+)?\s*%?(?:\s*(?:-|–|—|to)\s*(?:<=|≤|<)?\s*\d+(?:[.,]\d+)?)?\s*%)\)?$/i;
const LEADING_SHARE = /^((?:(?:<=|≤|<|>=|≥|>)\s*)?\d+(?:[.,]\d+)?(?:\s*(?:-|–|—|to)\s*\d+(?:[.,]\d+)?)?\s*%)\s+(\S.*)$/i;

/**
 * Reads a supplier's composition as pasted: a line joined by `(and)`, commas or plus signs, or
 * rows of name, CAS number and share from a spreadsheet or a data sheet. Nothing is matched
 * with the dictionary here, and nothing is thrown away without a problem that says so.
 */
export function readComposition(text: string): CompositionPaste {
  const problems: PasteProblem[] = [];
  const lines: CompositionLine[] = [];
  for (const { row, line } of splitRows(text)) {
    const bare = line.replace(LEAD, '');
    if (bare.trim() === '' || isHeading(bare)) continue;
    const cells = splitCells(bare);
    if (TOTAL.test(cells.find((cell) => cell !== '') ?? '')) continue;
    if (cells.length > 1) readCells(cells, row, lines, problems);
    else for (const name of splitNames(bare)) readName(name, row, lines, problems);
  }
  if (lines.length === 0 && problems.length === 0) problems.push({ row: 1, message: 'Nothing that looks like an ingredient was found.' });
  const shares = lines.map((line) => line.percent);
  const isWhole = lines.length > 0 && shares.every((share) => share !== undefined);
  return { lines, problems, ...(isWhole ? { total: toDecimal(sum(shares.map((share) => decimal(share!)))) } : {}) };
}

/** A row of column titles, whatever parts its columns. */
function isHeading(line: string): boolean {
  return line.split(/[\t;|,]| {2,}/).every((cell) => cell.trim() === '' || HEADING.test(cell.trim()));
}

function readCells(cells: readonly string[], row: number, lines: CompositionLine[], problems: PasteProblem[]): void {
  const numbers: string[] = [];
  const words: string[] = [];
  const shares: WrittenShare[] = [];
  for (const cell of cells) {
    const found = cell.match(NUMBERS);
    const share = readShare(cell);
    if (cell === '' || /^(?:-|–|n\/?a|none)$/i.test(cell)) continue;
    if (found && cell.replace(NUMBERS, '').replace(/[\s,;/()|]|or|and/gi, '') === '') numbers.push(...found);
    else if (share) shares.push(share);
    else words.push(cell);
  }
  // A running number in front of the name is not a share.
  const isNumbered = shares.length > 1 && words.length > 0 && /^\d+\.?$/.test(cells[0] ?? '');
  const share = joinColumns(isNumbered ? shares.slice(1) : shares);
  if (words.length === 0) {
    const written = cells.filter((cell) => cell !== '').join(' ');
    problems.push({ row, message: `"${written}" has no ingredient name. Write the name in front of the figure.` });
    return;
  }
  const names = splitNames(words[0]!);
  if (names.length > 1 && share) {
    problems.push({ row, message: `"${words[0]}" names ${names.length} ingredients with one figure. Give each its own figure.` });
  }
  for (const name of names) readName(name, row, lines, problems, { numbers, share: names.length > 1 ? undefined : share });
}

/** `min | max` or `min | typical | max` in columns of their own become one range. */
function joinColumns(shares: readonly WrittenShare[]): WrittenShare | undefined {
  const [first] = shares;
  const last = shares.at(-1);
  if (!first || !last || shares.length === 1) return first;
  const least = 'percent' in first ? first.percent : first.min;
  const most = 'percent' in last ? last.percent : last.max;
  return compare(decimal(least), decimal(most)) < 0 ? { min: least, max: most } : first;
}

function readName(
  written: string,
  row: number,
  lines: CompositionLine[],
  problems: PasteProblem[],
  given: { numbers?: readonly string[]; share?: WrittenShare | undefined } = {},
): void {
  let name = written;
  let share = given.share;
  if (!share) {
    const trailing = TRAILING_SHARE.exec(name);
    const leading = trailing ? null : LEADING_SHARE.exec(name);
    const cell = trailing ? trailing[2]! : leading?.[1];
    const found = cell === undefined ? undefined : readShare(cell);
    if (found) [name, share] = [trailing ? trailing[1]! : leading![2]!, found];
  }
  const numbers = [...(given.numbers ?? []), ...(name.match(NUMBERS) ?? [])];
  name = tidyName(name.replace(/[([]?\s*(?:cas|ec|einecs)?(?:\s*(?:no\.?|number|nr\.?))?\s*[:#]?\s*(?:\d{2,7}-\d{2}-\d|\d{3}-\d{3}-\d)(?!\d)\s*[)\]]?/gi, ' ').replace(/\s+/g, ' '));
  if (name === '') {
    problems.push({ row, message: `"${written}" has no ingredient name.` });
    return;
  }
  if (name.length > 500) {
    problems.push({ row, message: `A name of ${name.length} letters is too long. Check where the list was cut.` });
    return;
  }
  const cas = numbers.find(isCasNumber);
  const ec = numbers.find(isEcNumber);
  for (const number of numbers) {
    if (!isCasNumber(number) && !isEcNumber(number)) problems.push({ row, message: `${number} is not a valid CAS or EC number: a digit is wrong. It was left out.` });
  }
  judgeShare(name, row, share, problems);
  lines.push({ row, name, ...(cas ? { cas } : {}), ...(ec ? { ec } : {}), ...share });
}

function judgeShare(name: string, row: number, share: WrittenShare | undefined, problems: PasteProblem[]): void {
  if (!share) return;
  const [least, most] = 'percent' in share ? [share.percent, share.percent] : [share.min, share.max];
  if (compare(decimal(least), decimal(most)) > 0) problems.push({ row, message: `${name}: the range ${least} to ${most} % runs backwards.` });
  else if (compare(decimal(most), HUNDRED) > 0) problems.push({ row, message: `${name}: ${most} % is more than the whole material.` });
}

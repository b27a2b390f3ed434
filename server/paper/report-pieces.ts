import type { LadderRow, MergedFinding, ReportModel } from '#shared/report/report-model.ts';
import type { Severity } from '#shared/engine/types.ts';
import { AMBER, BOTTLE, HAIR, INK, INK_2, RIGHT, STOP, WHITE, type Paper, type Sheet } from './paper.ts';
import { TEXT, TEXT_WIDTH, type Piece } from './flow.ts';

const MARK = 2.65;

/** The mark of a weight: solid, half, hollow; never colour alone. An empty "Stops sale" keeps its shape and loses its red. */
export function mark(sheet: Sheet, x: number, y: number, weight: Severity, count = 1): void {
  if (weight === 'stop') {
    sheet.box(x, y, MARK, MARK, { fill: count > 0 ? STOP : HAIR });
    return;
  }
  const color = weight === 'decide' ? AMBER : INK_2;
  sheet.box(x + 0.13, y + 0.13, MARK - 0.26, MARK - 0.26, { stroke: color, weight: 0.75, fill: WHITE });
  if (weight === 'decide') sheet.box(x, y + MARK / 2, MARK, MARK / 2, { fill: color });
}

export function tally(paper: Paper, model: ReportModel): Piece {
  const words: readonly [Severity, string][] = [['stop', 'Stops sale'], ['decide', 'Needs a decision'], ['note', 'Worth knowing']];
  return {
    height: 9.5,
    paint(sheet, y) {
      let x = TEXT;
      for (const [weight, word] of words) {
        const count = String(model.counts[weight]);
        mark(sheet, x, y + 3, weight, model.counts[weight]);
        sheet.text(x + 4.6, y + 5.6, count, { face: 'SemiBold', size: 24 });
        const wordX = x + 4.6 + paper.width(count, { face: 'SemiBold', size: 24 }) + 2;
        sheet.text(wordX, y + 5.6, word, { size: 13 });
        x = wordX + paper.width(word, { size: 13 }) + 9;
      }
    },
  };
}

/** One declaration: its market, then the list broken between names, never inside one. */
export function declaration(paper: Paper, entry: ReportModel['declarations'][number]): Piece {
  const body = `${entry.names.map((name) => name.replaceAll(' ', '\u00a0')).join(', ')}.`;
  const lead = `${entry.heading}: `;
  const type = { size: 13 };
  const leadWidth = paper.width(lead, { ...type, face: 'SemiBold' });
  const spacer = '\u2003'.repeat(Math.ceil(leadWidth / paper.width('\u2003', type)));
  const lines = paper.wrap(`${spacer}\u00a0${body}`, 128, type);
  const first = lines[0]!.slice(spacer.length + 1);
  return {
    height: 4.6 + lines.length * 5.03 + 2.6,
    paint(sheet, y) {
      sheet.text(TEXT, y + 3.2, entry.label, { color: INK_2 });
      sheet.text(TEXT, y + 8.4, lead.trim(), { ...type, face: 'SemiBold' });
      sheet.text(TEXT + leadWidth, y + 8.4, first, type);
      lines.slice(1).forEach((line, index) => sheet.text(TEXT, y + 8.4 + (index + 1) * 5.03, line, type));
    },
  };
}

/** A verdict: what to do, why, the arithmetic, the citation. */
export function verdict(paper: Paper, finding: MergedFinding): Piece {
  const inner = TEXT + 4.76;
  const measure = TEXT_WIDTH - 4.76;
  const act = { face: 'SemiBold', size: 13 } as const;
  const markets = finding.markets.join(', ');
  const actLines = paper.wrap(finding.act, measure - paper.width(markets) - 2, act);
  const whyLines = finding.why ? paper.wrap(finding.why, measure) : [];
  const sums = finding.arithmetic.flatMap((line) => paper.wrap(line, measure, { face: 'Medium' }));
  const cite = [...finding.citations, ...(finding.sourcing ? [finding.sourcing === 'memory' ? 'from memory: re-read before relying on it' : 'from a secondary source'] : [])].join(' · ');
  const citeLines = paper.wrap(cite, measure);
  const readingLines = finding.reading ? paper.wrap(`Reading: ${finding.reading}`, measure) : [];
  const rows = whyLines.length + sums.length + citeLines.length + readingLines.length;
  return {
    height: 2.2 + actLines.length * 4.5 + rows * 4.25 + 2.6,
    paint(sheet, y, isFirst) {
      if (!isFirst) sheet.line(TEXT, y, RIGHT, y, 0.5, HAIR);
      let at = isFirst ? y : y + 2.2;
      mark(sheet, TEXT, at + 0.9, finding.severity);
      actLines.forEach((line, index) => sheet.text(inner, at + 3.3 + index * 4.5, line, act));
      const last = actLines.length - 1;
      sheet.text(inner + paper.width(actLines[last]!, act) + 1.8, at + 3.3 + last * 4.5, markets, { color: INK_2 });
      at += actLines.length * 4.5;
      const put = (lines: readonly string[], type: object): void =>
        lines.forEach((line) => {
          sheet.text(inner, at + 3.2, line, type);
          at += 4.25;
        });
      put(whyLines, {});
      put(sums, { face: 'Medium' });
      put(readingLines, { color: INK_2 });
      put(citeLines, { color: INK_2 });
    },
  };
}

const DECADES = ['100', '10', '1', '0.1', '0.01', '0.001', '0.0001'];
const AXIS = 16;
const DECADE = 18.5;
const ROW = 4.3;
/** Kept free over a line for the words that stand on it. */
const LABEL = 5;

/** Millimetres below the top of the scale; only for drawing, nothing is decided here. */
function depth(share: string): number {
  const value = Number(share);
  return (2 - Math.log10(Math.max(value, 0.0001))) * DECADE;
}

/** Pushes rows apart without letting one cross a line of the scale that it stands above or below. */
function spreadRows(rows: readonly LadderRow[], lines: readonly number[]): number[] {
  const wanted = rows.map((row) => depth(row.typical));
  const placed: number[] = [];
  wanted.forEach((want, index) => {
    let at = index === 0 ? want : Math.max(want, placed[index - 1]! + ROW);
    for (const line of lines) if (want > line && at < line + 2.4) at = Math.max(at, line + 2.4);
    placed.push(at);
  });
  for (let index = placed.length - 1; index >= 0; index -= 1) {
    const below = index + 1 < placed.length ? placed[index + 1]! : Infinity;
    let ceiling = below - ROW;
    for (const line of lines) if (wanted[index]! <= line) ceiling = Math.min(ceiling, line - LABEL);
    if (placed[index]! > ceiling) placed[index] = ceiling;
  }
  return placed;
}

export function ladder(paper: Paper, model: NonNullable<ReportModel['ladder']>): Piece {
  const lines = [depth(model.freeBelow), ...(model.allergenLine ? [depth(model.allergenLine.at)] : [])];
  const rows = [...model.rows].sort((a, b) => Number(b.typical) - Number(a.typical));
  const at = spreadRows(rows, lines);
  const overflow = Math.min(0, ...at) * -1;
  const height = Math.max(6 * DECADE, at.at(-1) ?? 0) + overflow + 8;
  return {
    height,
    paint(sheet, y) {
      const top = y + 4 + overflow;
      const axis = TEXT + AXIS;
      sheet.line(axis, top, axis, top + 6 * DECADE, 0.7, INK);
      DECADES.forEach((label, index) => {
        const here = top + index * DECADE;
        sheet.text(axis - 2.4, here + 1.1, label, { align: 'right' });
        sheet.line(axis - 1.4, here, axis, here, 0.57, INK);
        if (index < DECADES.length - 1)
          for (let step = 2; step < 10; step += 1) {
            const tick = here + DECADE * (1 - Math.log10(step));
            sheet.line(axis - 0.7, tick, axis, tick, 0.28, INK_2);
          }
      });
      const rule = (share: string, label: string, color: typeof INK, dash?: number[]): void => {
        sheet.line(axis, top + depth(share), RIGHT, top + depth(share), 0.7, color, dash);
        sheet.text(RIGHT, top + depth(share) - 1, label, { color, align: 'right' });
      };
      rule(model.freeBelow, `${model.freeBelow} % line: free order below`, BOTTLE);
      if (model.allergenLine) rule(model.allergenLine.at, model.allergenLine.label, AMBER, [2.8, 2.3]);
      rows.forEach((row, index) => paintRung(paper, sheet, row, axis, top, top + at[index]!));
    },
  };
}

function paintRung(paper: Paper, sheet: Sheet, row: LadderRow, axis: number, top: number, rowY: number): void {
  const isInside = row.zone === 'allergen' || row.zone === 'unnamed';
  const color = row.isUncertain ? AMBER : row.zone === 'unnamed' ? INK_2 : INK;
  const x = axis + (isInside ? 8.5 : 4);
  const here = top + depth(row.typical);
  if (row.min !== row.max) {
    const low = top + depth(row.min);
    const high = top + depth(row.max);
    sheet.line(x, high, x, low, 0.7, color);
    sheet.line(x - 0.8, high, x + 0.8, high, 0.7, color);
    if (Number(row.min) >= 0.0001) sheet.line(x - 0.8, low, x + 0.8, low, 0.7, color);
  }
  if (isInside) sheet.box(x - 0.75, here - 0.75, 1.5, 1.5, { stroke: color, weight: 0.7, fill: row.zone === 'unnamed' ? WHITE : color });
  else sheet.dot(x, here, 0.85, color);
  sheet.line(x + 1.4, here, axis + 15, rowY, 0.5, HAIR);
  sheet.line(axis + 15, rowY, axis + 17, rowY, 0.5, HAIR);
  sheet.text(axis + 18, rowY + 1.1, fit(paper, row.name, 52), { color });
  sheet.text(axis + 80, rowY + 1.1, row.zone === 'unnamed' ? 'not named' : short(row.typical), { face: 'SemiBold', color, align: 'right' });
  if (row.min !== row.max) sheet.text(axis + 84, rowY + 1.1, `${short(row.min)}–${short(row.max)}`, { color: INK_2 });
}

/** A long name cut for the drawing alone; the declaration prints it whole. */
function fit(paper: Paper, name: string, measure: number): string {
  if (paper.width(name) <= measure) return name;
  let cut = name;
  while (cut.length > 1 && paper.width(`${cut}…`) > measure) cut = cut.slice(0, -1);
  return `${cut}…`;
}

/** At most four significant decimals for the drawing; exact figures stand in the table of the screen. */
function short(share: string): string {
  const [whole, fraction = ''] = share.split('.');
  if (fraction.length <= 4) return share;
  const leading = /^0*/.exec(fraction)![0].length;
  const places = whole === '0' ? leading + 4 : 4;
  return Number(share).toFixed(places).replace(/0+$/, '').replace(/\.$/, '');
}

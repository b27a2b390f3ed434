import { LEAST_MODULE, symbolOf, uprightModule, type Symbol } from './barcode.ts';
import { breakParagraph, plainWords, type Word } from './breaking.ts';
import { sizeForHeight } from './heights.ts';
import { lengthOf } from './metrics.ts';
import type { Item, Micrometres, Weight } from './scene.ts';
import { leadingOf, strongWeight, textItem, type FootName, type Job, type Overflow, type Setting } from './setting.ts';
import { drawSymbol, hourglass, openJar } from './symbols.ts';

/** Something that stands on the last base line of its column. */
export interface Foot {
  readonly name: FootName;
  readonly element: 'net content' | 'durability' | 'barcode';
  readonly width: Micrometres;
  /** From its top to the base line it stands on. */
  readonly height: Micrometres;
  /** Clear room wanted left, right, above. */
  readonly clear: readonly [Micrometres, Micrometres, Micrometres];
  /** Items with the left edge and the base line given. */
  draw(x: Micrometres, y: Micrometres): Item[];
}

const FIGURE_SHARE = 0.275 * 0.698;

/** The net statement on as few lines as a width allows, with the ℮ where it is printed. */
export function netFoot(job: Job, width: Micrometres, ink: string): Foot & { readonly overflow?: Overflow; readonly capHeight: Micrometres; readonly lines: readonly string[] } {
  const weight = strongWeight(job);
  const face = job.metrics.face(weight);
  const size = job.netSize;
  const parts = job.content.net?.parts ?? [];
  const eSize = Math.max(size, 4500);
  const eWidth = job.content.eMark ? Math.round(size * 0.5) + lengthOf(job.metrics.face(400), '℮', eSize) : 0;
  const whole = parts.join(' ');
  const lines = lengthOf(face, whole, size) + eWidth <= width ? [whole] : parts;
  const leading = Math.round(size * 1.12);
  const capHeight = Math.ceil((face.capHeight * size) / 1000);
  const widest = Math.max(0, ...lines.map((line, i) => lengthOf(face, line, size) + (i === lines.length - 1 ? eWidth : 0)));
  const n = lengthOf(face, 'N', size);
  return {
    name: 'net', element: 'net content', width: widest, height: capHeight + leading * (lines.length - 1), capHeight, lines,
    clear: job.minimums.netContentZone > 0 || job.isNorthAmerican ? [2 * n, 2 * n, capHeight] : [3000, 3000, Math.round(capHeight * 0.8)],
    ...(widest > width ? { overflow: { element: 'net content', direction: 'width', missing: widest - width, room: width, word: whole } } : {}),
    draw: (x, y) => lines.flatMap((text, i) => {
      const isLast = i === lines.length - 1;
      const at = y - leading * (lines.length - 1 - i);
      const run = textItem(job.metrics, { element: 'net content', text: isLast && !job.content.eMark ? text : `${text} `, weight, size, x, y: at, ink, hang: true });
      if (!isLast || !job.content.eMark) return [run];
      const mark = textItem(job.metrics, { element: 'net content', text: '℮', weight: 400, size: eSize, x: x + lengthOf(face, text, size) + Math.round(size * 0.5), y: at, ink, hang: true });
      return [run, mark];
    }),
  };
}

function beside(job: Job, setting: Setting, width: Micrometres): { words: readonly Word[]; element: 'batch' | 'durability' }[] {
  return (job.content.mark?.lines ?? []).flatMap((line) => {
    const weight: Weight = line.strong ? 500 : 400;
    const { lines } = breakParagraph(plainWords(line.text, weight), setting.size, width, job.metrics, true);
    return lines.map((words) => ({ words, element: line.element as 'batch' | 'durability' }));
  });
}

/** Open jar or hourglass with what stands beside it: batch, date. */
export function markFoot(job: Job, setting: Setting, room: Micrometres): Foot | null {
  const { mark } = job.content;
  if (!mark) return null;
  const leading = leadingOf(setting);
  const least = Math.max(mark.kind === 'hourglass' ? 6500 : 8000, mark.kind === 'jar' ? Math.ceil(job.minimums.symbolFigure / 1000 / FIGURE_SHARE) : 0);
  const height = mark.kind === 'none' ? 0 : Math.max(least, setting.tight === 2 ? 0 : Math.round(9000 * Math.min(job.scale, 1.2)));
  const drawing = mark.kind === 'hourglass' ? hourglass : openJar;
  const symbolWidth = mark.kind === 'none' ? 0 : Math.round((drawing.width * height) / 1000);
  const gap = mark.kind === 'none' || mark.lines.length === 0 ? 0 : Math.round(setting.size * 0.8);
  const measure = Math.max(setting.size * 6, Math.min(room - symbolWidth - gap, setting.size * 9));
  const lines = beside(job, setting, measure);
  const textWidth = Math.max(0, ...lines.map(({ words }) => lengthOf(job.metrics.face(words[0]!.weight), words.map((word) => word.text).join(' '), setting.size)));
  const cap = Math.round((698 * setting.size) / 1000);
  const textHeight = lines.length > 0 ? cap + leading * (lines.length - 1) : 0;
  return {
    name: 'mark', element: 'durability', width: symbolWidth + gap + textWidth, height: Math.max(height, textHeight), clear: [0, 2500, 0],
    draw: (x, y) => [
      ...(mark.kind === 'none' ? [] : drawSymbol(drawing, x, y - height, height).map((path): Item => ({ kind: 'path', element: 'durability', ink: 'black', ...path }))),
      ...(mark.kind === 'jar' ? [jarFigure(job, mark.months, x, y, height)] : []),
      ...lines.map(({ words, element }, i) => textItem(job.metrics, {
        element, text: `${words.map((word) => word.text).join(' ')}${i < lines.length - 1 ? ' ' : ''}`, weight: words[0]!.weight, size: setting.size,
        x: x + symbolWidth + gap, y: y - leading * (lines.length - 1 - i), ink: 'black', hang: true,
      })),
    ],
  };
}

function jarFigure(job: Job, months: string, x: Micrometres, y: Micrometres, height: Micrometres): Item {
  const face = job.metrics.face(700);
  const least = sizeForHeight(job.minimums.symbolFigure, face.capHeight);
  const size = Math.max(least, Math.min(Math.round(height * 0.275), Math.floor((height * 660) / face.run(months).advance)));
  const middle = x + Math.round(height * 0.415);
  return textItem(job.metrics, {
    element: 'durability', text: months, weight: 700, size,
    x: middle - Math.round((face.run(months).advance * size) / 2000), y: y - height + Math.round(height * 0.722 + (face.capHeight * size) / 2000), ink: 'black',
  });
}

/** Module of the bars in a setting: as wide as the curve allows upright, close to 80 % where room is short. */
export function moduleFor(job: Job, setting: Setting): Micrometres {
  const widest = setting.ladder ? 330 : uprightModule(job.sheet.diameter);
  if (setting.tight === 2 || setting.ladder) return LEAST_MODULE;
  return Math.max(LEAST_MODULE, Math.min(widest, setting.tight === 1 ? 290 : 330));
}

/** Whether a setting may stand its bars upright on this body. */
export function mayStandUpright(job: Job): boolean {
  return uprightModule(job.sheet.diameter) > 0;
}

/** The bar code, upright or turned to read downwards. */
export function barsFoot(job: Job, setting: Setting): Foot | null {
  if (!job.barcode) return null;
  const symbol = symbolOf(job.barcode, moduleFor(job, setting));
  const face = job.metrics.face(400);
  const [before, after] = symbol.quiet;
  const half = Math.round((face.advance('0') * symbol.digitSize) / 2000);
  if (!setting.ladder) {
    return {
      name: 'bars', element: 'barcode', width: symbol.width, height: symbol.depth, clear: [before, after, 1500],
      draw: (x, y) => [
        { kind: 'boxes', element: 'barcode', ink: 'black', boxes: symbol.bars.map((bar) => ({ ...bar, x: x + bar.x, y: y - symbol.depth + bar.y })) },
        ...symbol.digits.map(({ text, middle }) => digitItem(symbol, text, { x: x + middle - half, y, turn: 0 })),
      ],
    };
  }
  return ladderFoot(symbol, half);
}

/** A group of digits, each in the middle of its own seven modules. */
function digitItem(symbol: Symbol, text: string, at: { x: Micrometres; y: Micrometres; turn: 0 | 90 }): Item {
  const step = (7000 * symbol.module) / symbol.digitSize;
  const offsets = Array.from(text, (_, i) => Math.round(i * step));
  return { kind: 'text', element: 'barcode', text, weight: 400, size: symbol.digitSize, ...at, ink: 'black', offsets, advance: offsets.at(-1)! + 600 };
}

function ladderFoot(symbol: Symbol, half: Micrometres): Foot {
  const [before] = symbol.quiet;
  return {
    name: 'bars', element: 'barcode', width: symbol.depth, height: symbol.width, clear: [1500, 1500, before + 700],
    draw: (x, y) => {
      const top = y - symbol.width;
      return [
        { kind: 'boxes', element: 'barcode', ink: 'black', boxes: symbol.bars.map((bar) => ({ x: x + symbol.depth - bar.y - bar.height, y: top + bar.x, width: bar.height, height: bar.width })) },
        ...symbol.digits.map(({ text, middle }) => digitItem(symbol, text, { x, y: top + middle - half, turn: 90 })),
      ];
    },
  };
}

export interface PlacedFeet {
  readonly items: readonly Item[];
  readonly overflows: readonly Overflow[];
  /** Highest line that texts may reach. */
  readonly limit: Micrometres;
}

export interface FeetBox {
  readonly x: Micrometres;
  readonly width: Micrometres;
  readonly foot: Micrometres;
  readonly hang: Micrometres;
  /** The last of a row goes to the right edge. */
  readonly toEdge: boolean;
}

/** Stands feet in as few rows as the width allows, filled from the left. */
export function placeFeet(feet: readonly Foot[], box: FeetBox, gap: Micrometres): PlacedFeet {
  const rows: Foot[][] = [];
  for (const foot of feet) {
    const row = rows.at(-1);
    if (row && rowWidth([...row, foot], box.hang) <= box.width) row.push(foot);
    else rows.push([foot]);
  }
  return placeRows(rows, box, gap);
}

/** Stands given rows of feet from the last base line upwards. */
export function placeRows(rows: readonly (readonly Foot[])[], box: FeetBox, gap: Micrometres): PlacedFeet {
  const items: Item[] = [];
  const overflows: Overflow[] = [];
  let y = box.foot;
  for (const row of [...rows].reverse()) {
    let x = box.x + Math.max(0, row[0]!.clear[0] - box.hang) * (row[0]!.name === 'bars' ? 1 : 0);
    row.forEach((foot, i) => {
      const isLast = i === row.length - 1 && i > 0 && box.toEdge;
      const tail = foot.name === 'bars' ? Math.max(0, foot.clear[1] - box.hang) : 0;
      if (i > 0) x += between(row[i - 1]!, foot);
      if (isLast) x = Math.max(x, box.x + box.width - foot.width - tail);
      const over = x + foot.width + tail - (box.x + box.width);
      if (over > 0) overflows.push({ element: foot.element, direction: 'width', missing: over, room: box.width });
      items.push(...foot.draw(x, y));
      x += foot.width;
    });
    y -= Math.max(...row.map((foot) => foot.height + Math.max(gap, foot.clear[2])));
  }
  return { items, overflows, limit: y };
}

function between(left: Foot, right: Foot): Micrometres {
  return Math.max(left.clear[1], right.clear[0], 2000);
}

function rowWidth(row: readonly Foot[], hang: Micrometres): Micrometres {
  const lead = row[0]!.name === 'bars' ? Math.max(0, row[0]!.clear[0] - hang) : 0;
  const tail = row.at(-1)!.name === 'bars' ? Math.max(0, row.at(-1)!.clear[1] - hang) : 0;
  return row.reduce((total, foot, i) => total + foot.width + (i > 0 ? between(row[i - 1]!, foot) : 0), lead + tail);
}

import type { HandFrame, HandStyle } from '#shared/contracts/by-hand.ts';
import { breakParagraph, type Line, type Word } from '../breaking.ts';
import type { FontMetrics } from '../metrics.ts';
import type { ElementName, Micrometres, Text, Weight } from '../scene.ts';

/** A text to be set into a frame: paragraphs of words, each with the weight it asks for. */
export interface HandText {
  readonly element: ElementName;
  readonly paragraphs: readonly (readonly Word[])[];
  readonly frame: HandFrame;
  readonly style: HandStyle;
  /** Least em of a weight that keeps the market's least letter height. */
  readonly least: (weight: Weight) => Micrometres;
  /** Largest em that is chosen where none is asked for. */
  readonly most: Micrometres;
  readonly leading: number;
  readonly ink: string;
  /** Ink of a heading in the text; as the text where absent. */
  readonly headInk?: string;
  readonly own?: string | undefined;
}
export interface SetText {
  readonly items: readonly Text[];
  readonly size: Micrometres;
  /** What is missing of the frame; 0 where it holds the text. */
  readonly missing: { readonly height: Micrometres; readonly width: Micrometres; readonly word?: string };
}

interface Broken {
  readonly lines: readonly { readonly line: Line; readonly says: readonly string[]; readonly isLast: boolean; readonly isFirst: boolean }[];
  readonly wide: { readonly by: Micrometres; readonly text: string } | null;
}

/** How often an em between the largest and the least is halved in search of the largest that fits: finer than a printer's dot. */
const HALVINGS = 12;

/** A line of runs, each of one weight. */
function runsOf(line: Line): { weight: Weight; from: number; to: number }[] {
  const runs: { weight: Weight; from: number; to: number }[] = [];
  line.forEach((word, i) => {
    const last = runs.at(-1);
    if (last && last.weight === word.weight) last.to = i + 1;
    else runs.push({ weight: word.weight, from: i, to: i + 1 });
  });
  return runs;
}

/** Advance of a run in thousandths of the em, with what tracking adds after every letter. */
function advanceOf(metrics: FontMetrics, weight: Weight, text: string, tracking: number): number {
  return metrics.face(weight).run(text).advance + tracking * Array.from(text).length;
}

function lineLength(metrics: FontMetrics, line: Line, size: Micrometres, tracking: number): Micrometres {
  const advance = runsOf(line).reduce((total, { weight, from, to }, i, runs) => total + advanceOf(metrics, weight, line.slice(from, to).map(({ text }) => text).join(' ') + (i < runs.length - 1 ? ' ' : ''), tracking), 0);
  // The first letter hangs to the edge by its bearing.
  const hang = line[0] ? metrics.face(line[0].weight).bearing(line[0].text[0] ?? ' ') : 0;
  return Math.ceil(((advance - tracking - hang) * size) / 1000);
}

/** Lines of every paragraph; a measure is narrowed until tracked lines keep it too. */
function breakAll(text: HandText, metrics: FontMetrics, size: Micrometres, width: Micrometres): Broken {
  const { tracking = 0, capitals = false, weight } = text.style;
  const lines: { line: Line; says: readonly string[]; isLast: boolean; isFirst: boolean }[] = [];
  let wide: Broken['wide'] = null;
  for (const original of text.paragraphs) {
    // A word that the law wants bold stays bold.
    const words = original.map((word): Word => ({ ...word, text: capitals ? word.text.toUpperCase() : word.text, weight: weight && word.weight === 400 ? weight : word.weight }));
    let broken = breakParagraph(words, size, width, metrics);
    for (let share = 97; tracking !== 0 && share > 40; share -= 3) {
      if (broken.lines.every((line) => lineLength(metrics, line, size, tracking) <= width)) break;
      broken = breakParagraph(words, size, Math.floor((width * share) / 100), metrics);
    }
    for (const line of broken.lines) {
      const by = lineLength(metrics, line, size, tracking) - width;
      if (by > (wide?.by ?? 0)) wide = { by, text: line.map((word) => word.text).join(' ') };
    }
    let at = 0;
    broken.lines.forEach((line, index) => {
      lines.push({ line, says: original.slice(at, at + line.length).map((word) => word.text), isFirst: index === 0, isLast: index === broken.lines.length - 1 });
      at += line.length;
    });
  }
  return { lines, wide };
}

interface Plan {
  readonly size: Micrometres;
  readonly broken: Broken;
  readonly columns: number;
  readonly columnWidth: Micrometres;
  readonly gap: Micrometres;
  readonly rows: number;
  readonly leading: Micrometres;
  /** From the first cap line to the last base line. */
  readonly height: Micrometres;
}

function planAt(text: HandText, metrics: FontMetrics, size: Micrometres): Plan {
  const columns = text.style.columns ?? 1;
  const gap = columns > 1 ? Math.round(size * 1.8) : 0;
  const columnWidth = Math.max(1, Math.floor((text.frame.width - gap * (columns - 1)) / columns));
  const broken = breakAll(text, metrics, size, columnWidth);
  const rows = Math.max(1, Math.ceil(broken.lines.length / columns));
  const leading = Math.round((size * (text.style.leading ?? text.leading)) / 1000);
  const cap = Math.ceil((metrics.face(text.style.weight ?? 400).capHeight * size) / 1000);
  return { size, broken, columns, columnWidth, gap, rows, leading, height: cap + leading * (rows - 1) };
}

/** The asked size, or the largest that the frame holds; never under the least. */
function chooseSize(text: HandText, metrics: FontMetrics): Plan {
  const weights = new Set(text.paragraphs.flatMap((words) => words.map((word) => (text.style.weight && word.weight === 400 ? text.style.weight : word.weight))));
  const least = Math.max(...[...weights].map(text.least));
  if (text.style.size !== undefined) return planAt(text, metrics, Math.max(least, text.style.size));
  const holds = (plan: Plan): boolean => plan.height <= text.frame.height && plan.broken.wide === null;
  let best = planAt(text, metrics, least);
  if (!holds(best)) return best;
  let [low, high] = [least, Math.max(least, text.most)];
  for (let i = 0; i < HALVINGS && high - low > 1; i += 1) {
    const middle = Math.floor((low + high + 1) / 2);
    const plan = planAt(text, metrics, middle);
    if (holds(plan)) [best, low] = [plan, middle];
    else high = middle - 1;
  }
  return best;
}

/**
 * Sets a text into a frame that reaches from the first cap line to the last base line. Nothing
 * is cut: what the frame lacks is told, and the text runs on below it.
 */
export function setText(text: HandText, metrics: FontMetrics): SetText {
  const plan = chooseSize(text, metrics);
  const { size, broken, columns, columnWidth, gap, rows, leading } = plan;
  const { align = 'left', tracking = 0, capitals = false } = text.style;
  const cap = Math.ceil((metrics.face(text.style.weight ?? 400).capHeight * size) / 1000);
  const items = broken.lines.flatMap(({ line, says }, index) => {
    const column = Math.min(columns - 1, Math.floor(index / rows));
    const length = lineLength(metrics, line, size, tracking);
    const free = columnWidth - length;
    const shift = align === 'left' ? 0 : align === 'centre' ? Math.round(free / 2) : free;
    let x = text.frame.x + column * (columnWidth + gap) + shift - Math.round((metrics.face(line[0]!.weight).bearing(line[0]!.text[0] ?? ' ') * size) / 1000);
    const y = text.frame.y + cap + leading * (index - column * rows);
    const isEnd = index === broken.lines.length - 1;
    return runsOf(line).map(({ weight, from, to }, i, runs): Text => {
      const tail = i < runs.length - 1 || !isEnd ? ' ' : '';
      const printed = line.slice(from, to).map((word) => word.text).join(' ') + tail;
      const { offsets, advance } = metrics.face(weight).run(printed);
      const item: Text = {
        kind: 'text', element: text.element, text: printed, weight, size, x, y, turn: 0, ink: text.style.ink ?? (weight === 600 ? (text.headInk ?? text.ink) : text.ink),
        offsets: tracking === 0 ? offsets : offsets.map((offset, n) => offset + n * tracking), advance: advance + tracking * Array.from(printed).length,
        ...(capitals && { says: says.slice(from, to).join(' ') + tail }), ...(text.own !== undefined && { own: text.own }),
      };
      x += Math.round((item.advance * size) / 1000);
      return item;
    });
  });
  return {
    items, size,
    missing: { height: Math.max(0, plan.height - text.frame.height), width: broken.wide?.by ?? 0, ...(broken.wide && { word: broken.wide.text }) },
  };
}

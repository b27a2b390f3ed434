import type { Broken, Word } from './breaking.ts';
import { breakParagraph } from './breaking.ts';
import type { BlockName, Content } from './content.ts';
import type { Sheet } from './container.ts';
import { sizeForHeight, type Minimums } from './heights.ts';
import type { BarcodeSettings } from './label-input.ts';
import type { FontMetrics } from './metrics.ts';
import type { ElementName, Item, Micrometres, Panel, Text, Turn, Weight } from './scene.ts';

export type FootName = 'net' | 'mark' | 'bars';
export type TemplateName = 'galley' | 'versal' | 'fillet' | 'headband';

/** What stands in one column: texts from above, feet on the last base line or in a slice beside the texts. */
export interface ColumnPlan {
  readonly texts: readonly BlockName[];
  readonly feet: readonly FootName[];
  readonly beside: readonly FootName[];
}
/** One way to set the label; the fitting tries them in order. */
export interface Setting {
  readonly regime: 'wrap' | 'split' | 'stack';
  readonly columns: readonly ColumnPlan[];
  /** Em of small text. */
  readonly size: Micrometres;
  /** 0 as drawn, 1 closer, 2 as close as the rules allow. */
  readonly tight: 0 | 1 | 2;
  /** Width of the front in thousandths of the round (wrap) or of the room (split). */
  readonly front: number;
  /** Bars turned by 90°. */
  readonly ladder: boolean;
  readonly claim: boolean;
}

/** Everything that stays the same while settings are tried. */
export interface Job {
  readonly content: Content;
  readonly sheet: Sheet;
  readonly minimums: Minimums;
  readonly metrics: FontMetrics;
  readonly template: TemplateName;
  readonly barcode: BarcodeSettings | null;
  readonly isNorthAmerican: boolean;
  /** Least em of text for this market. */
  readonly floor: Micrometres;
  readonly netSize: Micrometres;
  readonly scale: number;
  readonly memo: Map<readonly Word[], Map<string, Broken>>;
  /** Heights and gaps alone, without the letters of columns: for trying settings. */
  readonly dry: boolean;
}

export interface Overflow {
  readonly element: ElementName;
  readonly direction: 'height' | 'width';
  readonly missing: Micrometres;
  /** Width of the column it was set in. */
  readonly room: Micrometres;
  readonly word?: string;
}
export interface Placed {
  readonly items: readonly Item[];
  readonly overflows: readonly Overflow[];
}
export interface Attempt extends Placed {
  readonly panels: readonly Panel[];
  /** Set where a column is too narrow to be set at all. */
  readonly isHopeless?: boolean;
}

/** Weight of what the law wants bold: the identity and the net content in North America. */
export function strongWeight(job: Job): Weight {
  return job.isNorthAmerican ? 700 : 600;
}

/** Smallest em of a weight that keeps the market's least text height. */
export function leastText(job: Pick<Job, 'minimums' | 'metrics'>, weight: Weight): Micrometres {
  return sizeForHeight(job.minimums.text.height, job.metrics.face(weight).xHeight);
}

/** Row to row of small text. */
export function leadingOf(setting: Pick<Setting, 'size' | 'tight'>): Micrometres {
  return Math.round((setting.size * (setting.tight === 0 ? 1266 : 1240)) / 1000);
}

/** Lines of a paragraph, remembered per measure while settings are tried. */
export function breakFor(job: Job, words: readonly Word[], size: Micrometres, width: Micrometres, few: boolean): Broken {
  let known = job.memo.get(words);
  if (!known) job.memo.set(words, (known = new Map()));
  const key = `${size}/${width}/${few ? 1 : 0}`;
  const found = known.get(key);
  if (found) return found;
  const broken = breakParagraph(words, size, width, job.metrics, few);
  known.set(key, broken);
  return broken;
}

/** A run of text with its character positions. `hang` moves it left by its first letter's bearing. */
export function textItem(
  metrics: FontMetrics,
  run: { element: ElementName; text: string; weight: Weight; size: Micrometres; x: Micrometres; y: Micrometres; ink: string; turn?: Turn; hang?: boolean },
): Text {
  const face = metrics.face(run.weight);
  const { offsets, advance } = face.run(run.text);
  const shift = run.hang ? Math.round((face.bearing(run.text[0] ?? ' ') * run.size) / 1000) : 0;
  return {
    kind: 'text', element: run.element, text: run.text, weight: run.weight, size: run.size,
    x: run.x - shift, y: run.y, turn: run.turn ?? 0, ink: run.ink, offsets, advance,
  };
}

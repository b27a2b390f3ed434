import type { Line, Word } from './breaking.ts';
import type { Block } from './content.ts';
import { lengthOf } from './metrics.ts';
import type { Item, Micrometres } from './scene.ts';
import { breakFor, leadingOf, textItem, type Job, type Overflow, type Setting } from './setting.ts';

/** How headings stand: hung over the line (first block only), in a label column, or in the text. */
export type Heads = 'hung' | 'ledger' | 'inline';

export interface ColumnBox {
  readonly x: Micrometres;
  readonly width: Micrometres;
  /** Cap line of the first row. */
  readonly top: Micrometres;
  /** Lowest base line allowed. */
  readonly limit: Micrometres;
}
export interface PlacedColumn {
  readonly items: readonly Item[];
  readonly overflows: readonly Overflow[];
  /** Last base line. */
  readonly bottom: Micrometres;
}

const CAP = 698;

function withHeading(block: Block, cache: WeakMap<Block, readonly Word[]>): readonly Word[] {
  const known = cache.get(block);
  if (known) return known;
  const [first, ...rest] = block.paragraphs[0]!.words;
  const words: Word[] = [
    ...block.heading.split(' ').map((text, i): Word => ({ text, weight: 600, before: i === 0 ? 'free' : 'never' })),
    { ...first!, before: 'name' }, ...rest,
  ];
  cache.set(block, words);
  return words;
}
const headed = new WeakMap<Block, readonly Word[]>();

/** Items of one line: runs of one weight, the space at a run's end kept so that words stay apart. */
function lineItems(job: Job, line: Line, isLast: boolean, at: { x: Micrometres; y: Micrometres; size: Micrometres; block: Block; strongInk: string }): Item[] {
  const items: Item[] = [];
  let x = at.x - Math.round((job.metrics.face(400).bearing('H') * at.size) / 1000);
  for (let i = 0; i < line.length; ) {
    let j = i + 1;
    while (j < line.length && line[j]!.weight === line[i]!.weight) j += 1;
    const { weight } = line[i]!;
    const text = line.slice(i, j).map((word) => word.text).join(' ') + (j < line.length || !isLast ? ' ' : '');
    const isHeading = weight === 600 && at.block.keepsHeading;
    items.push(textItem(job.metrics, { element: at.block.name, text, weight, size: at.size, x, y: at.y, ink: isHeading ? at.strongInk : 'black' }));
    x += Math.round((job.metrics.face(weight).run(text).advance * at.size) / 1000);
    i = j;
  }
  return items;
}

/** Width of the label column of a ledger: its longest heading and a gap, or 0 where it would eat the measure. */
export function ledgerWidth(job: Job, blocks: readonly Block[], setting: Setting, width: Micrometres): Micrometres {
  const longest = Math.max(0, ...blocks.map((block) => lengthOf(job.metrics.face(600), block.heading, setting.size)));
  const label = longest + Math.round(setting.size * 0.7);
  return width - label >= setting.size * 15 && label * 10 <= width * 4 ? label : 0;
}

/** Sets texts one under the other; what runs below the limit is reported, never cut. */
export function placeColumn(job: Job, setting: Setting, blocks: readonly Block[], box: ColumnBox, heads: Heads): PlacedColumn {
  const { size } = setting;
  const leading = leadingOf(setting);
  const label = heads === 'ledger' && setting.tight < 2 ? ledgerWidth(job, blocks, setting, box.width) : 0;
  const cap = Math.round((CAP * size) / 1000);
  const ruleGap = Math.round(size * (setting.tight === 0 ? 0.54 : 0.44));
  const rowGap = Math.round(leading * (setting.tight === 2 ? 1.35 : setting.tight === 1 ? 1.45 : 1.6));
  const items: Item[] = [];
  const overflows: Overflow[] = [];
  let y = box.top + cap - leading;
  const rule = (at: Micrometres): void => {
    items.push({ kind: 'boxes', element: 'rule', ink: 'ink', boxes: [{ x: box.x, y: at - 60, width: box.width, height: 120 }] });
  };
  blocks.forEach((block, index) => {
    if (index > 0 && heads === 'ledger') {
      rule(y + ruleGap);
      y += 2 * ruleGap + cap - leading;
    } else if (index > 0) y += block.name === 'warnings' ? Math.round(leading * 0.5) : rowGap - leading;
    const x = box.x + label;
    if (label > 0) items.push(textItem(job.metrics, { element: block.name, text: `${block.heading} `, weight: 600, size, x: box.x, y: y + leading, ink: 'ink', hang: true }));
    block.paragraphs.forEach((paragraph, p) => {
      if (paragraph.apart) y += Math.round(leading * (setting.tight === 2 ? 0.25 : 0.5));
      const isHeaded = p === 0 && label === 0 && block.keepsHeading && !(heads === 'hung' && index === 0);
      const words = isHeaded ? withHeading(block, headed) : paragraph.words;
      const { lines, tooWide } = breakFor(job, words, size, box.width - label, setting.tight === 2);
      if (tooWide) overflows.push({ element: block.name, direction: 'width', missing: tooWide.by, room: box.width - label, word: tooWide.text });
      lines.forEach((line, l) => {
        y += leading;
        if (!job.dry) items.push(...lineItems(job, line, l === lines.length - 1 && p === block.paragraphs.length - 1, { x, y, size, block, strongInk: 'ink' }));
      });
    });
    if (y > box.limit && (overflows.every((o) => o.direction === 'width'))) {
      overflows.push({ element: block.name, direction: 'height', missing: y - box.limit, room: box.width });
    }
  });
  // What comes after the first block that runs over makes the gap larger, not another gap.
  const last = overflows.findIndex((overflow) => overflow.direction === 'height');
  if (last >= 0) overflows[last] = { ...overflows[last]!, missing: y - box.limit };
  if (heads === 'ledger' && blocks.length > 0) {
    rule(y + ruleGap);
    rule(box.top - ruleGap);
  }
  return { items, overflows, bottom: y };
}

import type { Box, ElementName, Item, Micrometres } from './scene.ts';
import { textBox } from './scene.ts';
import type { Attempt, Job, Overflow, Setting } from './setting.ts';

/** Least distance of text and symbols from the trim. */
export const SAFE_MARGIN: Micrometres = 2000;
/** Share of the em that letters may reach under the base line. */
const DESCENT = 210;

/** Box around an item's ink, or `null` for grounds and rules, which may run off. */
export function inkBox(item: Item, job: Pick<Job, 'metrics'>): Box | null {
  if (item.element === 'ground' || item.element === 'rule' || item.element === 'drawing') return null;
  return shapeBox(item, job);
}

/** Box around what an item paints. */
export function shapeBox(item: Item, job: Pick<Job, 'metrics'>): Box {
  if (item.kind === 'text') {
    const face = job.metrics.face(item.weight);
    const box = textBox(item, face.capHeight);
    // Letters that hang over the edge by their bearing have no ink there.
    const bearing = Math.round((face.bearing(item.text[0] ?? ' ') * item.size) / 1000);
    const trail = item.text.endsWith(' ') ? Math.floor((face.advance(' ') * item.size) / 1000) : 0;
    return item.turn === 0 && !item.places ? { ...box, x: box.x + bearing, width: Math.max(0, box.width - bearing - trail) } : box;
  }
  if (item.kind === 'picture') return item.box;
  const points: [number, number][] = item.kind === 'boxes'
    ? item.boxes.flatMap((box): [number, number][] => [[box.x, box.y], [box.x + box.width, box.y + box.height]])
    : item.steps.flatMap(([, ...figures]) => Array.from({ length: figures.length / 2 }, (_, i): [number, number] => [figures[2 * i]!, figures[2 * i + 1]!]));
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const [x, y] of points) {
    left = Math.min(left, x);
    top = Math.min(top, y);
    right = Math.max(right, x);
    bottom = Math.max(bottom, y);
  }
  return { x: left, y: top, width: right - left, height: bottom - top };
}

/** As {@link inkBox}, with room for descenders. */
function fullBox(item: Item, job: Pick<Job, 'metrics'>): Box {
  const box = shapeBox(item, job);
  if (item.kind !== 'text' || item.turn !== 0 || item.element === 'barcode') return box;
  return { ...box, height: box.height + Math.round((DESCENT * item.size) / 1000) };
}

function meet(a: Box, b: Box): { x: Micrometres; y: Micrometres } | null {
  const x = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const y = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return x > 20 && y > 20 ? { x, y } : null;
}

/** Bars with the quiet zones of their kind, along the row of modules. */
function quietBox(bars: Box, job: Job, ladder: boolean, module: Micrometres): Box {
  const [before, after] = job.barcode?.symbology === 'UPC-A' ? [9, 9] : [11, 7];
  return ladder
    ? { ...bars, y: bars.y - before! * module, height: bars.height + (before! + after!) * module }
    : { ...bars, x: bars.x - before! * module, width: bars.width + (before! + after!) * module };
}

function outsideSafe(box: Box, job: Job): { direction: 'width' | 'height'; missing: Micrometres } | null {
  const { width, height, overlap } = job.sheet;
  const edge = Math.max(SAFE_MARGIN, overlap);
  const across = Math.max(edge - box.x, box.x + box.width - (width - edge));
  const down = Math.max(SAFE_MARGIN - box.y, box.y + box.height - (height - SAFE_MARGIN));
  if (across <= 0 && down <= 0) return null;
  return across > down ? { direction: 'width', missing: across } : { direction: 'height', missing: down };
}

/**
 * What an attempt gets wrong although every part said it fits: ink beyond the safe margin or in
 * the overlap, elements that touch, black on a dark ground, net content above its zone.
 */
export function verifyAttempt(job: Job, setting: Setting, attempt: Attempt): Overflow[] {
  const overflows: Overflow[] = [];
  const found = (element: ElementName, direction: Overflow['direction'], missing: Micrometres): void => {
    overflows.push({ element, direction, missing, room: job.sheet.width });
  };
  // Dark type and bars are read on the light ink; every other ground is dark.
  const grounds = attempt.items.filter((item) => item.element === 'ground' && item.kind === 'boxes' && item.ink !== 'light').map((item) => shapeBox(item, job));
  const inked = attempt.items.filter((item) => item.element !== 'ground' && item.element !== 'rule').map((item) => ({ item, box: fullBox(item, job) }));
  for (const { item, box } of inked) {
    const outside = outsideSafe(box, job);
    if (outside) found(item.element, outside.direction, outside.missing);
    const dark = item.ink === 'black' || item.ink === 'ink' ? grounds.map((ground) => meet(ground, box)).find(Boolean) : null;
    if (dark) found(item.element, 'height', Math.min(dark.x, dark.y));
  }
  const bars = inked.find(({ item }) => item.element === 'barcode' && item.kind === 'boxes');
  for (let i = 0; i < inked.length; i += 1) {
    for (let j = i + 1; j < inked.length; j += 1) {
      const [a, b] = [inked[i]!, inked[j]!];
      if (a.item.element === b.item.element) continue;
      const touch = meet(a.box, b.box);
      if (touch) found(b.item.element, touch.x < touch.y ? 'width' : 'height', Math.min(touch.x, touch.y));
    }
  }
  if (bars && bars.item.kind === 'boxes') {
    const first = bars.item.boxes[0]!;
    const quiet = quietBox(bars.box, job, setting.ladder, Math.min(first.width, first.height));
    const others = inked.filter(({ item }) => item.element !== 'barcode').map(({ box }) => box);
    const touch = [...others, ...grounds].map((box) => meet(box, quiet)).find(Boolean);
    if (touch) found('barcode', touch.x < touch.y ? 'width' : 'height', Math.min(touch.x, touch.y));
    const { width, height } = job.sheet;
    const beyond = Math.max(-quiet.x, quiet.x + quiet.width - width, -quiet.y, quiet.y + quiet.height - height);
    if (beyond > 0) found('barcode', 'width', beyond);
  }
  if (job.minimums.netContentZone > 0) {
    const top = Math.min(...inked.filter(({ item }) => item.element === 'net content').map(({ box }) => box.y));
    const zone = Math.floor((job.sheet.height * (1000 - job.minimums.netContentZone)) / 1000);
    if (top < zone) found('net content', 'height', Math.ceil(((zone - top) * 1000) / job.minimums.netContentZone));
  }
  return overflows;
}

import { inMillimetres } from '../lengths.ts';
import { ELEMENT_NAMES, type Misfit } from '../misfits.ts';
import type { Box, ElementName, Item, Micrometres } from '../scene.ts';
import type { Job } from '../setting.ts';
import { SAFE_MARGIN, shapeBox } from '../verify.ts';
import { keyOf, type HandKey } from './elements.ts';

/** Share of the em that letters may reach under the base line. */
const DESCENT = 210;
/** Boxes that meet by less are said to touch, not to overlap: rounding, not a fault. */
const GRAIN: Micrometres = 20;

interface Inked {
  readonly key: HandKey;
  readonly element: ElementName;
  readonly item: Item;
  readonly box: Box;
}

function lowerCase(name: string): string {
  return name.charAt(0).toLowerCase() + name.slice(1);
}

function meet(a: Box, b: Box): Micrometres {
  const x = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const y = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return x > GRAIN && y > GRAIN ? Math.min(x, y) : 0;
}

function say(element: ElementName, missing: Micrometres, message: string): Misfit {
  return { element, direction: 'place', missing, message };
}

function outside(one: Inked, job: Job): Misfit[] {
  const { width, height, overlap } = job.sheet;
  const edge = Math.max(SAFE_MARGIN, overlap);
  const { box } = one;
  const by = Math.max(edge - box.x, box.x + box.width - (width - edge), SAFE_MARGIN - box.y, box.y + box.height - (height - SAFE_MARGIN));
  if (by <= 0) return [];
  const where = overlap > 0 && (box.x < edge || box.x + box.width > width - edge) ? 'the overlap or the edge' : 'the edge';
  return [say(one.element, by, `${ELEMENT_NAMES[one.element]} comes ${inMillimetres(by)} mm too near ${where}. Move it inwards.`)];
}

/** The clear room that bars need at their ends, from the boxes of the bars themselves. */
function quietOf(bars: Extract<Item, { kind: 'boxes' }>, box: Box, job: Job): Box {
  const [before, after] = job.barcode?.symbology === 'UPC-A' ? [9, 9] : [11, 7];
  const first = bars.boxes[0]!;
  const module = Math.min(first.width, first.height);
  return first.width > first.height
    ? { ...box, y: box.y - before! * module, height: box.height + (before! + after!) * module }
    : { ...box, x: box.x - before! * module, width: box.width + (before! + after!) * module };
}

/**
 * What things moved by hand get wrong: ink beyond the safe margin or in the overlap, elements
 * that lie on each other, dark type on a dark ground, bars without their clear room, net content
 * above the part of the panel it must stand in. Only pairs with a moved thing are judged: the
 * template's own setting is judged where it is made.
 */
export function verifyHand(job: Job, items: readonly Item[], moved: ReadonlySet<HandKey>): Misfit[] {
  const misfits: Misfit[] = [];
  const inked = items.flatMap((item): Inked[] => {
    const key = keyOf(item);
    if (key === null || item.element === 'drawing') return [];
    const box = shapeBox(item, job);
    const below = item.kind === 'text' && item.turn === 0 && item.element !== 'barcode' ? Math.round((DESCENT * item.size) / 1000) : 0;
    return [{ key, element: item.element, item, box: { ...box, height: box.height + below } }];
  });
  const once = new Set<string>();
  const tell = (key: string, misfit: Misfit): void => {
    if (!once.has(key)) misfits.push(misfit);
    once.add(key);
  };
  const grounds = items.filter((item) => (item.element === 'ground' || item.element === 'drawing') && item.ink !== 'light' && !(item.kind === 'path' && item.stroke !== undefined));
  for (const one of inked) {
    if (moved.has(one.key)) for (const misfit of outside(one, job)) tell(`${one.key}|edge`, misfit);
    if (one.item.ink === 'light') continue;
    const dark = grounds.filter((ground) => moved.has(one.key) || ground.own !== undefined).find((ground) => meet(shapeBox(ground, job), one.box) > 0);
    if (dark) tell(`${one.key}|ground`, say(one.element, 0, `${ELEMENT_NAMES[one.element]} stands in a dark ink on a dark ground. Give it the light ink or move it.`));
  }
  for (let i = 0; i < inked.length; i += 1) {
    for (let j = i + 1; j < inked.length; j += 1) {
      const [a, b] = [inked[i]!, inked[j]!];
      if (a.key === b.key || !(moved.has(a.key) || moved.has(b.key))) continue;
      const by = meet(a.box, b.box);
      if (by > 0) tell(`${[a.key, b.key].sort().join('|')}`, say(b.element, by, `${ELEMENT_NAMES[b.element]} lies ${inMillimetres(by)} mm over ${lowerCase(ELEMENT_NAMES[a.element])}. Move one of them.`));
    }
  }
  const bars = inked.find(({ item }) => item.element === 'barcode' && item.kind === 'boxes');
  if (bars?.item.kind === 'boxes') {
    const quiet = quietOf(bars.item, bars.box, job);
    const near = [...inked.filter(({ key }) => key !== 'barcode' && (moved.has(key) || moved.has('barcode'))).map(({ element, box }) => ({ element, box })), ...items.filter((item) => item.element === 'drawing').map((item) => ({ element: item.element, box: shapeBox(item, job) }))];
    const touch = near.find(({ box }) => meet(box, quiet) > 0);
    if (touch) tell('quiet', say('barcode', meet(touch.box, quiet), `${ELEMENT_NAMES[touch.element]} stands in the clear room of the bars: ${inMillimetres(meet(touch.box, quiet))} mm too near.`));
    const { width, height } = job.sheet;
    const beyond = Math.max(-quiet.x, quiet.x + quiet.width - width, -quiet.y, quiet.y + quiet.height - height);
    if (moved.has('barcode') && beyond > 0) tell('quiet', say('barcode', beyond, `The clear room of the bars runs ${inMillimetres(beyond)} mm over the edge. Move them inwards.`));
  }
  if (job.minimums.netContentZone > 0 && moved.has('net content')) {
    const top = Math.min(...inked.filter(({ element }) => element === 'net content').map(({ box }) => box.y));
    const zone = Math.floor((job.sheet.height * (1000 - job.minimums.netContentZone)) / 1000);
    if (top < zone) tell('zone', say('net content', zone - top, `The net content must stand in the lowest ${job.minimums.netContentZone / 10} % of the panel: ${inMillimetres(zone - top)} mm lower (${job.minimums.netContent.citation}).`));
  }
  return misfits;
}

import type { FreedElement, FreeElement, HandFrame, HandStyle } from '#shared/contracts/by-hand.ts';
import type { FontMetrics } from '../metrics.ts';
import type { Box, Item, Scene, Text } from '../scene.ts';
import { shapeBox } from '../verify.ts';

/** What can be taken in the hand: an element of the template, or a thing of the house's own. */
export type HandKey = FreeElement | `own:${string}`;

/** The key of an item, or `null` for grounds and rules of the template. */
export function keyOf(item: Item): HandKey | null {
  if (item.own !== undefined) return `own:${item.own}`;
  if (item.element === 'batch') return 'durability';
  return item.element === 'ground' || item.element === 'rule' || item.element === 'drawing' || item.element === 'own text' || item.element === 'code' ? null : item.element;
}

/** The least box around several. */
export function unionOf(boxes: readonly Box[]): Box | null {
  if (boxes.length === 0) return null;
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  return { x, y, width: Math.max(...boxes.map((box) => box.x + box.width)) - x, height: Math.max(...boxes.map((box) => box.y + box.height)) - y };
}

/** The box of everything that can be taken in the hand, in paint order. */
export function handBoxes(scene: Pick<Scene, 'items'>, metrics: FontMetrics): ReadonlyMap<HandKey, Box> {
  const boxes = new Map<HandKey, Box>();
  for (const item of scene.items) {
    const key = keyOf(item);
    if (key === null) continue;
    const box = shapeBox(item, { metrics });
    const before = boxes.get(key);
    boxes.set(key, before ? unionOf([before, box])! : box);
  }
  return boxes;
}

const DISPLAY: readonly FreeElement[] = ['brand', 'name', 'function', 'claim'];
const INKS: readonly string[] = ['black', 'ink', 'tint', 'light'];

function styleOf(element: FreeElement, texts: readonly Text[]): HandStyle {
  const first = texts[0];
  if (!first || element === 'barcode') return {};
  const rows = [...new Set(texts.filter(({ turn }) => turn === 0).map(({ y }) => y))].sort((a, b) => a - b);
  const leading = rows.length > 1 ? Math.round(((rows[1]! - rows[0]!) * 1000) / first.size) : undefined;
  return {
    size: first.size,
    ...(DISPLAY.includes(element) && { weight: first.weight }),
    ...(leading !== undefined && leading >= 900 && leading <= 3000 && { leading }),
    ...(INKS.includes(first.ink) && first.ink !== 'black' && { ink: first.ink as NonNullable<HandStyle['ink']> }),
  };
}

/** Room beyond the letters, in eighths of the em, so that an element set free breaks its lines where it did. */
const SLACK = 8;
/** A drawn mark has its own bearings, at its sides and above: so much is left to them. */
const MARK_SLACK = 1200;
const MARK_RISE = 300;

/** A heading that the template hangs over a text or beside it: it stays behind. */
function isHeading(item: Item): boolean {
  return item.kind === 'text' && item.weight === 600 && item.ink === 'ink';
}

/** Bars stand by their own edges: the digit before them reaches into their clear room. */
function barsFrame(items: readonly Item[], whole: Box): Box {
  const bars = items.find((item) => item.kind === 'boxes');
  const first = bars?.boxes[0];
  const box = bars && first && unionOf(bars.boxes);
  if (!first || !box) return whole;
  return first.width > first.height ? { ...whole, y: box.y, height: box.height } : { ...whole, x: box.x, width: box.width };
}

/** An element as the template set it, as one set free that stands in the same place and looks the same. */
export function freeElement(scene: Pick<Scene, 'items'>, element: FreeElement, metrics: FontMetrics): FreedElement | null {
  const all = scene.items.filter((item) => keyOf(item) === element);
  const isBlock = element === 'directions' || element === 'warnings' || element === 'ingredients' || element === 'responsible person';
  const body = isBlock ? all.filter((item) => !isHeading(item)) : all;
  const items = body.length > 0 ? body : all;
  const texts = items.filter((item): item is Text => item.kind === 'text');
  const whole = unionOf(items.map((item) => shapeBox(item, { metrics })));
  if (!whole) return null;
  const box = element === 'barcode' ? barsFrame(items, whole) : whole;
  const style = styleOf(element, texts);
  const slack = element === 'barcode' ? 0 : element === 'durability' ? MARK_SLACK : 60 + Math.round(Math.max(0, ...texts.map(({ size }) => size)) / SLACK);
  // A list keeps its heading: where that hung apart, it now needs a line.
  const hung = element === 'ingredients' && all.some((item) => isHeading(item) && item.kind === 'text' && item.y !== texts[0]?.y);
  const extra = hung ? Math.round((texts[0]!.size * (style.leading ?? 1266)) / 1000) : 0;
  const rise = element === 'durability' ? MARK_RISE : 0;
  const frame: HandFrame = { x: Math.round(box.x), y: Math.round(box.y) - rise, width: Math.max(100, Math.round(box.width) + slack), height: Math.max(100, Math.round(box.height) + extra + rise) };
  return { element, frame, style };
}

import { textBox, type Box, type Item, type Scene } from './scene.ts';

/** What a shopper sees: the part of a label to show small, and the scene with only what reaches into it. */
export interface FrontView {
  readonly view: Box;
  readonly scene: Scene;
}

/** Whole em: letters without their exact rise, which is enough to know what reaches in. */
const FULL_EM = 1000;

/** The front panel of a wrap, the whole of any other label. Texts that mostly lie elsewhere and shapes wholly outside are left out. */
export function cropToFront(scene: Scene): FrontView {
  // What the eye sees at once of a cone: the middle two fifths of its box.
  if (scene.shape === 'taper') return cropTo(scene, { x: Math.round(scene.trim.width * 0.3), y: 0, width: Math.round(scene.trim.width * 0.4), height: scene.trim.height });
  const front = scene.shape === 'cylinder' ? scene.panels.find((panel) => panel.name === 'Front') : undefined;
  const view = front && front.height > 0 ? boxOf(front) : { x: 0, y: 0, width: scene.trim.width, height: scene.trim.height };
  return cropTo(scene, view);
}

function cropTo(scene: Scene, view: Box): FrontView {
  return { view, scene: { ...scene, items: scene.items.filter((item) => isSeenIn(view, item)) } };
}

function boxOf({ x, y, width, height }: Box): Box {
  return { x, y, width, height };
}

function isSeenIn(view: Box, item: Item): boolean {
  // A neighbouring column's first letters may overhang the panel's edge by their bearing.
  if (item.kind === 'text') return touches(middleOf(textBox(item, FULL_EM)), view);
  return reachOf(item).some((box) => touches(box, view));
}

function middleOf({ x, y, width, height }: Box): Box {
  return { x: x + width / 2, y: y + height / 2, width: 0, height: 0 };
}

function reachOf(item: Exclude<Item, { kind: 'text' }>): readonly Box[] {
  if (item.kind === 'boxes') return item.boxes;
  if (item.kind === 'picture') return [item.box];
  const points = item.steps.flatMap(([, ...figures]) => (figures.length >= 2 ? [figures.slice(-2) as unknown as [number, number]] : []));
  if (points.length === 0) return [];
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  const x = Math.min(...xs);
  const y = Math.min(...ys);
  return [{ x, y, width: Math.max(...xs) - x, height: Math.max(...ys) - y }];
}

function touches(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

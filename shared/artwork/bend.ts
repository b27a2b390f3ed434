import type { Boxes, ElementName, Item, Micrometres, Path, PathStep, Place, Scene, Text } from './scene.ts';
import type { Overflow } from './setting.ts';
import type { FontMetrics } from './metrics.ts';
import { bandOf, directionOf, pointAt, radiusAt, turnAt, type Point, type Taper } from './taper.ts';
import { shapeBox } from './verify.ts';

/** These stay straight, turned as a whole at their middle: a curved code or symbol reads badly. */
const RIGID: readonly ElementName[] = ['barcode', 'durability'];
/** A straight thing's corners leave the arcs: this much of the safe margin must be left to them. */
const LEAST_MARGIN: Micrometres = 1500;

/**
 * Lays a scene that was set on a straight sheet, as wide as the cone's narrow edge, onto the
 * unrolled cone: lines of type run on arcs and keep their letters' distances, left edges are
 * radii, rules become bands, code and symbols stay straight.
 * @returns the scene, and straight things whose corners come too near the edge
 */
export function bendScene(scene: Scene, taper: Taper, metrics: FontMetrics): { scene: Scene; overflows: Overflow[] } {
  const overflows: Overflow[] = [];
  const rigid = new Map<ElementName, Rigid>();
  for (const element of RIGID) {
    const items = scene.items.filter((item) => item.element === element);
    if (items.length === 0) continue;
    const found = rigidOf(items, taper, metrics);
    rigid.set(element, found);
    if (found.missing > 0) overflows.push({ element, direction: 'height', missing: found.missing, room: scene.trim.height });
  }
  const line = lineAnchors(metrics);
  const items = scene.items.map((item): Item => {
    const held = rigid.get(item.element);
    if (held) return moveRigid(item, held);
    if (item.kind === 'text') return item.turn === 0 ? onArc(item, item.about ?? line(item), taper, metrics) : moveRigid(item, rigidOf([item], taper, metrics));
    return item.kind === 'boxes' ? banded(item, taper) : moveRigid(item, rigidOf([item], taper, metrics));
  });
  const ends: [number, number] = [-taper.angle / 2, taper.angle / 2];
  return {
    scene: {
      ...scene, items, shape: 'taper', panels: [],
      trim: { width: taper.width, height: taper.height },
      dieLine: { ...scene.dieLine, steps: bandOf(taper, ends, [0, scene.trim.height]) },
    },
    overflows,
  };
}

/** Runs that continue one line keep their distance from its beginning. */
function lineAnchors(metrics: FontMetrics): (item: Text) => Micrometres {
  let before: { element: ElementName; y: Micrometres; anchor: Micrometres; end: Micrometres } | null = null;
  return (item) => {
    const isNext = before !== null && before.element === item.element && before.y === item.y && item.x >= before.anchor && item.x - before.end < item.size;
    const anchor = isNext ? before!.anchor : item.x;
    before = { element: item.element, y: item.y, anchor, end: item.x + Math.round((metrics.face(item.weight).run(item.text).advance * item.size) / 1000) };
    return anchor;
  };
}

function onArc(item: Text, anchor: Micrometres, taper: Taper, metrics: FontMetrics): Text {
  const face = metrics.face(item.weight);
  const radius = radiusAt(taper, item.y);
  const start = directionOf(taper, anchor) + (item.x - anchor) / radius;
  const places = Array.from(item.text, (char, i): Place => {
    const half = (face.advance(char) * item.size) / 2000;
    // A letter touches its arc in the middle of its width.
    const direction = start + ((item.offsets[i]! * item.size) / 1000 + half) / radius;
    const turn = turnAt(taper, direction);
    const middle = pointAt(taper, radius, direction);
    return placeOf({ x: middle.x - half * Math.cos(turn), y: middle.y - half * Math.sin(turn) }, turn);
  });
  return { ...item, x: places[0]?.x ?? item.x, y: places[0]?.y ?? item.y, places };
}

function placeOf({ x, y }: Point, turn: number): Place {
  return { x: Math.round(x), y: Math.round(y), degrees: Math.round((turn * 180e4) / Math.PI) / 1e4 };
}

interface Rigid {
  /** The middle on the straight sheet and on the cone. */
  readonly from: Point;
  readonly to: Point;
  readonly turn: number;
  readonly missing: Micrometres;
}

function rigidOf(items: readonly Item[], taper: Taper, metrics: FontMetrics): Rigid {
  const boxes = items.map((item) => shapeBox(item, { metrics }));
  const left = Math.min(...boxes.map((box) => box.x));
  const top = Math.min(...boxes.map((box) => box.y));
  const right = Math.max(...boxes.map((box) => box.x + box.width));
  const bottom = Math.max(...boxes.map((box) => box.y + box.height));
  const from = { x: (left + right) / 2, y: (top + bottom) / 2 };
  const direction = directionOf(taper, from.x);
  const radius = radiusAt(taper, from.y);
  const [across, down] = [(right - left) / 2, (bottom - top) / 2];
  const radii = [[across, down], [across, -down]].map(([x, y]) => Math.hypot(radius + (taper.isWideAbove ? -y! : y!), x!));
  const edge = Math.min(...[...radii, radius - down].flatMap((one) => [one - taper.narrow, taper.wide - one]));
  return { from, to: pointAt(taper, radius, direction), turn: turnAt(taper, direction), missing: Math.max(0, Math.ceil(LEAST_MARGIN - edge)) };
}

function turned({ from, to, turn }: Rigid, x: number, y: number): Point {
  const [a, b] = [x - from.x, y - from.y];
  return { x: to.x + a * Math.cos(turn) - b * Math.sin(turn), y: to.y + a * Math.sin(turn) + b * Math.cos(turn) };
}

function moveRigid(item: Item, rigid: Rigid): Item {
  if (item.kind === 'text') return turnText(item, rigid);
  if (item.kind === 'picture') {
    const { x, y, width, height } = item.box;
    const middle = turned(rigid, x + width / 2, y + height / 2);
    return { ...withoutClip(item), box: { x: Math.round(middle.x - width / 2), y: Math.round(middle.y - height / 2), width, height }, degrees: Math.round((rigid.turn * 180e4) / Math.PI) / 1e4 };
  }
  const corner = (x: number, y: number): [Micrometres, Micrometres] => {
    const point = turned(rigid, x, y);
    return [Math.round(point.x), Math.round(point.y)];
  };
  if (item.kind === 'path') {
    const steps = item.steps.map((step): PathStep => {
      if (step[0] === 'Z') return step;
      const [command, ...figures] = step;
      return [command, ...Array.from({ length: figures.length / 2 }, (_, i) => corner(figures[2 * i]!, figures[2 * i + 1]!)).flat()] as unknown as PathStep;
    });
    return { ...withoutClip(item), steps };
  }
  const { boxes, ...rest } = withoutClip(item);
  return {
    ...rest, kind: 'path',
    steps: boxes.flatMap(({ x, y, width, height }): PathStep[] => [
      ['M', ...corner(x, y)], ['L', ...corner(x + width, y)], ['L', ...corner(x + width, y + height)], ['L', ...corner(x, y + height)], ['Z'],
    ]),
  };
}

function turnText(item: Text, rigid: Rigid): Text {
  const quarter = (item.turn * Math.PI) / 180;
  const places = Array.from(item.text, (_, i): Place => {
    const along = (item.offsets[i]! * item.size) / 1000;
    return placeOf(turned(rigid, item.x + along * Math.cos(quarter), item.y + along * Math.sin(quarter)), rigid.turn + quarter);
  });
  return { ...item, turn: 0, x: places[0]?.x ?? item.x, y: places[0]?.y ?? item.y, places };
}

function banded(item: Boxes, taper: Taper): Path {
  const { boxes, ...rest } = withoutClip(item);
  return { ...rest, kind: 'path', steps: boxes.flatMap(({ x, y, width, height }) => bandOf(taper, [directionOf(taper, x), directionOf(taper, x + width)], [y, y + height])) };
}

/** A straight clip has no meaning on the cone; the sheet's own bleed still bounds everything. */
function withoutClip<T extends Item>({ clip: _clip, ...item }: T): Omit<T, 'clip'> {
  return item;
}

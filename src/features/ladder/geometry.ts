import { scaleLog } from 'd3-scale';

/** One substance on the ladder. Figures are percent of the product, for drawing only. */
export interface Rung {
  readonly key: string;
  readonly name: string;
  readonly zone: 'ordered' | 'free' | 'allergen' | 'colourant' | 'may-contain' | 'unnamed';
  readonly min: number;
  readonly typical: number;
  readonly max: number;
  /** What each formula line brings. */
  readonly parts: readonly { readonly line: number; readonly share: number }[];
  /** Lies within another ingredient's mass, as an oil's limonene does. */
  readonly isInside: boolean;
  /** A decision rests on its range. */
  readonly isUnsure: boolean;
  /** Whether the declaration may move it. */
  readonly isFree: boolean;
}

/** A line of law across the ladder. */
export interface LawLine {
  readonly id: string;
  /** Percent of the product. */
  readonly at: number;
  readonly weight: 'zone' | 'binding' | 'idle';
  readonly caption: string;
}

export const LOWEST = 0.0001;
export const HIGHEST = 100;
const TOP = 10;
const BOTTOM = 14;
const AXIS = 42;
const LEAST_HEIGHT = 632;
const LEAST_STEP = 5;
const WIDEST_STEP = 19;

export interface Placed {
  readonly rung: Rung;
  readonly index: number;
  /** Centre of the rung's lane. */
  readonly x: number;
  readonly half: number;
  readonly y: number;
  readonly yMax: number;
  readonly yMin: number;
  /** The range goes below the scale's foot. */
  readonly isCut: boolean;
  /** Where its row stands in the column at the right. */
  readonly row: number;
}

export interface PlacedLine {
  readonly line: LawLine;
  readonly y: number;
  /** Where it meets the column of rows; the same as `y` where nothing pushes it. */
  readonly yRight: number;
}

export interface LadderGeometry {
  readonly width: number;
  readonly height: number;
  readonly axis: number;
  readonly rowLeft: number;
  readonly rowWidth: number;
  readonly gap: number;
  readonly step: number;
  readonly rungs: readonly Placed[];
  readonly lines: readonly PlacedLine[];
  readonly keyTop: number;
  /** First and last row that may be moved. */
  readonly free: { readonly first: number; readonly last: number } | null;
  readonly yOf: (percent: number) => number;
}

/** One thing in the column at the right: where it wants to stand and the room it takes above and below. */
interface Item {
  readonly want: number;
  readonly above: number;
  readonly below: number;
}

/**
 * Stands items one under another, in order, each as near to its wish as the others allow:
 * pushed down by what is above, then lifted where the foot leaves no room. Items never overlap
 * and never change places.
 */
export function spread(items: readonly Item[], top: number, bottom: number): number[] {
  const at: number[] = [];
  let free = top;
  for (const item of items) {
    const place = Math.max(item.want, free + item.above);
    at.push(place);
    free = place + item.below;
  }
  let limit = bottom;
  for (let i = items.length - 1; i >= 0; i--) {
    const item = items[i]!;
    at[i] = Math.min(at[i]!, limit - item.below);
    limit = at[i]! - item.above;
  }
  return at;
}

/** The room that items need at least. */
function roomFor(items: readonly Item[]): number {
  return items.reduce((room, item) => room + item.above + item.below, 0);
}

interface Column {
  readonly items: readonly Item[];
  readonly rungAt: ReadonlyMap<string, number>;
  readonly lineAt: ReadonlyMap<string, number>;
}

/** Rows and lines of law in the order in which they stand at the right. */
function column(rungs: readonly Rung[], lines: readonly LawLine[], yOf: (percent: number) => number, gap: number): Column {
  const items: Item[] = [];
  const rungAt = new Map<string, number>();
  const lineAt = new Map<string, number>();
  const half = gap / 2;
  const zone = lines.find((line) => line.weight === 'zone');
  const row = (rung: Rung, want: number) => {
    rungAt.set(rung.key, items.length);
    items.push({ want, above: half, below: half });
  };
  const rule = (line: LawLine) => {
    lineAt.set(line.id, items.length);
    const isZone = line.weight === 'zone';
    items.push({ want: yOf(line.at), above: isZone ? 2 : 4, below: isZone ? 5 : 18 });
  };
  for (const rung of rungs) if (rung.zone === 'ordered') row(rung, yOf(rung.typical));
  if (zone) rule(zone);
  const listed = rungs.filter((rung) => rung.zone !== 'ordered' && rung.zone !== 'unnamed');
  // Free rows stand in printed order right below the line, whatever their shares.
  for (const rung of listed) row(rung, 0);
  const rest = [
    ...lines.filter((line) => line !== zone).map((line) => ({ at: line.at, place: () => rule(line) })),
    ...rungs.filter((rung) => rung.zone === 'unnamed').map((rung) => ({ at: rung.typical, place: () => row(rung, yOf(rung.typical)) })),
  ];
  for (const each of rest.toSorted((a, b) => b.at - a.at)) each.place();
  return { items, rungAt, lineAt };
}

/** Spreads all, with the line of the zone held at its own value wherever both sides have the room. */
function spreadAround(items: readonly Item[], pin: number | undefined, bottom: number): number[] {
  const held = pin === undefined ? undefined : items[pin];
  if (pin === undefined || !held) return spread(items, 0, bottom);
  const before = items.slice(0, pin);
  const after = items.slice(pin + 1);
  const lowest = bottom - roomFor(after) - held.below;
  const at = Math.min(Math.max(held.want, roomFor(before) + held.above), lowest);
  return [...spread(before, 0, at - held.above), at, ...spread(after, at + held.below, bottom)];
}

/** Height of the drawing's key, which stands below everything else in the column. */
const KEY_ROOM = 74;

/**
 * Where everything on the ladder stands. The scale is logarithmic and rungs stand at their
 * value; only the rows at the right are spread so that none covers another. Lines of law
 * bend towards the rows where these need the room.
 */
export function layLadder(rungs: readonly Rung[], lines: readonly LawLine[], width: number): LadderGeometry {
  const isNarrow = width < 420;
  const gap = isNarrow ? 26 : 22;
  const rowWidth = Math.min(isNarrow ? 216 : 236, width - AXIS - (isNarrow ? 92 : 140));
  const rowLeft = width - rowWidth;
  const draft = column(rungs, lines, () => 0, gap);
  const height = Math.ceil(Math.max(LEAST_HEIGHT, roomFor(draft.items) + TOP + KEY_ROOM + 40));
  const scale = scaleLog().domain([HIGHEST, LOWEST]).range([TOP, height - BOTTOM]);
  const yOf = (percent: number) => scale(Math.min(HIGHEST, Math.max(LOWEST, percent)));

  const { items, rungAt, lineAt } = column(rungs, lines, yOf, gap);
  const zone = lines.find((line) => line.weight === 'zone');
  const places = spreadAround(items, zone && lineAt.get(zone.id), height - KEY_ROOM);
  const room = rowLeft - AXIS - 30;
  const wished = Math.min(WIDEST_STEP, room / Math.max(1, rungs.length));
  const step = Math.max(LEAST_STEP, wished);
  // Where the lanes do not fit side by side they begin again at the left: neighbours there stand far apart on the scale.
  const lanes = Math.max(1, Math.floor(room / step + 1e-9));
  const placed = rungs.map((rung, index): Placed => ({
    rung,
    index,
    x: AXIS + 16 + (index % lanes) * step,
    half: step * 0.42,
    y: yOf(rung.typical),
    yMax: yOf(rung.max),
    yMin: yOf(rung.min),
    isCut: rung.min < LOWEST,
    row: places[rungAt.get(rung.key)!]!,
  }));
  const free = placed.filter((each) => each.rung.isFree).map((each) => each.row);
  const lowest = Math.max(...places, 0);
  return {
    width,
    height,
    axis: AXIS,
    rowLeft,
    rowWidth,
    gap,
    step,
    rungs: placed,
    lines: lines.map((line) => ({ line, y: yOf(line.at), yRight: places[lineAt.get(line.id)!]! })),
    keyTop: Math.max(lowest + 22, height - KEY_ROOM + 8 - 40),
    free: free.length > 0 ? { first: Math.min(...free), last: Math.max(...free) } : null,
    yOf,
  };
}

/** Ticks of the scale: a long one for each power of ten, short ones between. */
export function ladderTicks(yOf: (percent: number) => number): { y: number; length: number; label: string | null }[] {
  const ticks: { y: number; length: number; label: string | null }[] = [];
  for (let power = 2; power >= -4; power--) {
    const value = 10 ** power;
    ticks.push({ y: yOf(value), length: 10, label: `${value < 1 ? value.toFixed(-power) : value}${power === 2 ? ' %' : ''}` });
    if (power > -4) for (let k = 2; k < 10; k++) ticks.push({ y: yOf((value * k) / 10), length: k === 5 ? 7 : 4, label: null });
  }
  return ticks;
}

/** The way from a rung to its row: level, then slanted, never through another row. */
export function leaderPath(geometry: LadderGeometry, placed: Placed): string {
  const y = placed.y.toFixed(1);
  return `M${(placed.x + placed.half).toFixed(1)} ${y}H${(geometry.rowLeft - 14).toFixed(1)}L${geometry.rowLeft} ${placed.row.toFixed(1)}h4`;
}

/** Which place in the free zone a row dragged to `y` would take. */
export function placeAt(geometry: LadderGeometry, y: number): number {
  const rows = geometry.rungs.filter((each) => each.rung.isFree).map((each) => each.row).toSorted((a, b) => a - b);
  if (rows.length === 0) return 0;
  let nearest = 0;
  rows.forEach((row, index) => {
    if (Math.abs(row - y) < Math.abs(rows[nearest]! - y)) nearest = index;
  });
  return nearest;
}

/** Where in the plot the doubtful pair can be drawn larger: the tallest stretch between ordered rows. */
export function findLoupeSpot(geometry: LadderGeometry): { left: number; top: number; width: number } | null {
  const ordered = geometry.rungs.filter((each) => each.rung.zone === 'ordered');
  const height = 76;
  let best = { gap: 0, middle: 0, after: -1 };
  ordered.slice(0, -1).forEach((each, i) => {
    const gap = ordered[i + 1]!.row - each.row;
    if (gap > best.gap) best = { gap, middle: (each.row + ordered[i + 1]!.row) / 2, after: i };
  });
  if (best.after < 0) return null;
  const left = geometry.rungs[Math.min(best.after + 1, geometry.rungs.length - 1)]!.x + 24;
  const inPlot = geometry.rowLeft - 16 - left;
  if (inPlot >= 148 && best.gap >= height + 8) {
    const width = Math.min(200, inPlot);
    return { left: geometry.rowLeft - 16 - width, top: best.middle - 36, width };
  }
  return best.gap >= 108 ? { left: geometry.rowLeft, top: best.middle - 37, width: geometry.rowWidth - 10 } : null;
}

import { bandedFront, FILLET_STYLE, HEADBAND_STYLE } from './banded-front.ts';
import { filletBands, headbandBands } from './bands.ts';
import { placeColumn, type Heads } from './column.ts';
import { barsFoot, markFoot, netFoot, placeFeet, placeRows, type Foot, type PlacedFeet } from './feet.ts';
import { fitBrand, galleyFront, greatLetter, versalFront } from './front.ts';
import { lengthOf } from './metrics.ts';
import type { Box, Item, Micrometres, Panel } from './scene.ts';
import { leadingOf, leastText, strongWeight, textItem, type Attempt, type ColumnPlan, type FootName, type Job, type Overflow, type Setting } from './setting.ts';
import type { FittedTitle } from './title.ts';

/** A vertical slot of the label in which a column stands. */
interface Slot {
  readonly x: Micrometres;
  readonly width: Micrometres;
  /** Free room at its sides into which the quiet zone of bars may reach. */
  readonly hang: Micrometres;
}
interface Heights {
  readonly top: Micrometres;
  readonly foot: Micrometres;
}

const SAFE: Micrometres = 2000;

function feetOf(job: Job, setting: Setting, names: readonly FootName[], room: Micrometres): Foot[] {
  return names.flatMap((name) => {
    if (name === 'net') return job.content.net ? [netFoot(job, room, 'black')] : [];
    const foot = name === 'bars' ? barsFoot(job, setting) : markFoot(job, setting, room);
    return foot ? [foot] : [];
  });
}

/** A column: texts from its top, feet on its last base line, a slice at its right for what stands beside. */
function fillSlot(job: Job, setting: Setting, plan: ColumnPlan, slot: Slot, heights: Heights, heads: Heads): { items: Item[]; overflows: Overflow[] } {
  const gap = setting.tight === 0 ? 4500 : setting.tight === 1 ? 3200 : 2200;
  const beside = feetOf(job, setting, plan.beside, slot.width);
  const slice = Math.max(0, ...beside.map((foot) => foot.width + (foot.name === 'bars' ? Math.max(0, foot.clear[1] - slot.hang) + foot.clear[0] + 1500 : 2500)));
  const width = slot.width - slice;
  const feet = placeFeet(feetOf(job, setting, plan.feet, width), { x: slot.x, width, foot: heights.foot, hang: slot.hang, toEdge: slice === 0 }, gap);
  const blocks = plan.texts.flatMap((name) => job.content.blocks[name] ?? []);
  const texts = placeColumn(job, setting, blocks, { x: slot.x, width, top: heights.top, limit: feet.limit }, heads);
  const items: Item[] = [...texts.items, ...feet.items];
  const overflows: Overflow[] = [...texts.overflows, ...feet.overflows];
  if (beside.length > 0) {
    const x = slot.x + width + (slice - Math.max(...beside.map((foot) => foot.width + (foot.name === 'bars' ? Math.max(0, foot.clear[1] - slot.hang) : 0))));
    const placed = placeFeet(beside, { x, width: Math.max(...beside.map((foot) => foot.width)), foot: heights.foot, hang: 9e9, toEdge: false }, gap);
    items.push(...placed.items);
    overflows.push(...placed.overflows);
    if (placed.limit < heights.top - gap) overflows.push({ element: 'barcode', direction: 'height', missing: heights.top - gap - placed.limit, room: slice });
  }
  if (blocks.length === 0 && feet.limit < heights.top - gap) overflows.push({ element: 'barcode', direction: 'height', missing: heights.top - gap - feet.limit, room: slot.width });
  return { items, overflows };
}

/** Last base line: as drawn, 0.062 of the height; at least so that descenders keep the safe margin. */
function footLine(job: Job, setting: Setting): Micrometres {
  const { height } = job.sheet;
  const least = SAFE + Math.round(Math.max(setting.size, job.content.net ? job.netSize : 0, job.content.eMark ? 4500 : 0) * 0.215);
  const drawn = Math.min(Math.round(height * 0.062), 9000);
  const share = [1, 0.6, 0][setting.tight]!;
  return height - Math.max(least, Math.round(drawn * share));
}

/** Where Galley's line runs: the void above it is part of the design and the first thing to give way. */
function galleyLine(job: Job, setting: Setting, brand: FittedTitle): { line: Micrometres; weight: Micrometres; head: Micrometres } {
  const scale = Math.min(job.scale, 1.3);
  const brandRise = Math.ceil((698 * brand.size) / 1000) + Math.round(brand.size * 1.15) * (brand.lines.length - 1);
  const head = Math.round(2600 * Math.max(0.55, setting.tight === 2 ? scale * 0.7 : scale));
  const least = SAFE + Math.max(brandRise, Math.ceil(setting.size * 0.72)) + head;
  const drawn = Math.round(job.sheet.height * 0.215);
  const share = [1, 0.6, 0][setting.tight]!;
  return { line: Math.max(least, Math.round(drawn * share)), weight: Math.max(300, Math.round(600 * scale)), head };
}

function besideFront(job: Job): Micrometres {
  const n = lengthOf(job.metrics.face(strongWeight(job)), 'N', job.netSize);
  return job.isNorthAmerican && job.content.net ? 2 * n : 0;
}

interface Slots {
  readonly front: Slot;
  readonly columns: readonly Slot[];
  readonly panels: readonly Panel[];
}

/** Front in the middle of the round, one column on either side of it. */
function wrapSlots(job: Job, setting: Setting): Slots {
  const { width: W, height: H, overlap, round } = job.sheet;
  const edge = Math.max(SAFE, overlap + 3000);
  const front = Math.round((round * setting.front) / 1000);
  const fx = Math.round((W - front) / 2);
  const gutter = Math.max(setting.tight === 2 ? 4200 : Math.round(6200 * Math.min(1.2, Math.max(0.7, job.scale))), besideFront(job));
  const inset = setting.tight === 0 ? Math.round(2000 * Math.min(1, job.scale)) : 0;
  const left = edge + inset;
  const panel = Math.round(round * 0.4);
  const px = Math.round((W - panel) / 2);
  return {
    front: { x: fx, width: front, hang: gutter },
    columns: [{ x: left, width: fx - gutter - left, hang: overlap > 0 ? edge - overlap - 300 : 300 }, { x: fx + front + gutter, width: W - edge - fx - front - gutter, hang: Math.min(overlap > 0 ? edge - overlap - 100 : 300, gutter - 700) }],
    panels: [
      { name: 'Left', x: overlap, y: 0, width: px - overlap, height: H },
      { name: 'Front', x: px, y: 0, width: panel, height: H },
      { name: 'Right', x: px + panel, y: 0, width: W - overlap - px - panel, height: H },
    ],
  };
}

/** Front at the left, columns to its right. */
function splitSlots(job: Job, setting: Setting): Slots {
  const { width: W, height: H, overlap, shape } = job.sheet;
  const margin = shape === 'cylinder' ? Math.max(SAFE, overlap + 3000) : marginOf(job, setting);
  const inner = W - 2 * margin;
  const isVersal = job.template === 'versal';
  const gutter = Math.max(isVersal ? 2 * Math.max(2400, Math.min(margin, 5000)) : setting.tight === 2 ? 4000 : Math.round(6000 * Math.max(0.7, Math.min(1.3, job.scale))), Math.max(besideFront(job), 0));
  const most = shape === 'cylinder' ? Math.round(job.sheet.round * 0.4) : inner;
  const front = Math.min(most, Math.round((inner * setting.front) / 1000));
  const count = setting.columns.length;
  const between = Math.max(4000, gutter - 1500);
  const each = Math.floor((inner - front - gutter - (count - 1) * between) / count);
  const edge = isVersal ? margin + front + Math.round(gutter / 2) : margin + front + Math.round(gutter / 2);
  return {
    front: { x: margin, width: front, hang: margin },
    columns: setting.columns.map((_, i) => ({ x: margin + front + gutter + i * (each + between), width: each, hang: Math.max(0, Math.min(edgeHang(job, margin), (isVersal && i === 0 ? gutter / 2 : gutter) - 600)) })),
    panels: [{ name: 'Front', x: 0, y: 0, width: edge, height: H }, { name: 'Particulars', x: edge, y: 0, width: W - edge, height: H }],
  };
}

/** Margin of a flat label: as drawn a twelfth of its short side, at least the safe margin. */
function marginOf(job: Job, setting: Setting): Micrometres {
  const short = Math.min(job.sheet.width, job.sheet.height);
  const drawn = Math.min(7000, Math.round(short / 14));
  // A little over the safe margin: letters such as A and w hang over the edge of their column.
  return Math.max(SAFE + 260, [drawn, Math.round(drawn * 0.75), 0][setting.tight]!);
}

/** How far the quiet zone of bars may reach over the margin: its digit keeps the safe margin and the seam. */
function edgeHang(job: Job, margin: Micrometres): Micrometres {
  // A leading digit stops short of the quiet zone by more in EAN-13 than in UPC-A.
  return Math.max(0, margin - Math.max(SAFE, job.sheet.overlap) + (job.barcode?.symbology === 'UPC-A' ? 50 : 300));
}

function hungHead(job: Job, setting: Setting, plan: ColumnPlan, slot: Slot, y: Micrometres): Item[] {
  const first = plan.texts.map((name) => job.content.blocks[name]).find(Boolean);
  // The word "Ingredients" stays with its list, so that both are read as one.
  if (!first || first.name === 'responsible person' || first.keepsHeading) return [];
  const fits = lengthOf(job.metrics.face(600), first.heading, setting.size) <= slot.width;
  if (!fits) return [];
  return [textItem(job.metrics, { element: first.name, text: `${first.heading} `, weight: 600, size: setting.size, x: slot.x, y, ink: 'ink', hang: true })];
}

function headsFit(job: Job, setting: Setting, plan: ColumnPlan, slot: Slot): boolean {
  const first = plan.texts.map((name) => job.content.blocks[name]).find(Boolean);
  return first !== undefined && !first.keepsHeading && lengthOf(job.metrics.face(600), first.heading, setting.size) <= slot.width;
}

/** Galley: everything hangs from one line that runs the whole girth. */
function galley(job: Job, setting: Setting, slots: Slots): Attempt {
  const { width: W } = job.sheet;
  const { bleed } = { bleed: 20_000 };
  const brand = fitBrand(job, slots.front.width, Math.max(leastText(job, 500), Math.round(4200 * job.scale)));
  const { line, weight, head } = galleyLine(job, setting, brand);
  const hang = Math.max(Math.round(4100 * Math.min(1.15, job.scale) * [1, 0.8, 0.62][setting.tight]!), 1700);
  const heights: Heights = { top: line + weight + hang, foot: footLine(job, setting) };
  const y = line - head;
  const brandItems = job.content.brand
    ? brand.lines.map((text, i) => textItem(job.metrics, { element: 'brand', text: i < brand.lines.length - 1 ? `${text} ` : text, weight: 500, size: brand.size, x: slots.front.x, y: y - Math.round(brand.size * 1.15) * (brand.lines.length - 1 - i), ink: 'black', hang: true }))
    : [];
  const brandOver = lengthOf(job.metrics.face(500), [...brand.lines].sort((a, b) => b.length - a.length)[0] ?? '', brand.size) - slots.front.width;
  const front = galleyFront(job, setting, { x: slots.front.x, width: slots.front.width, top: heights.top, foot: heights.foot, holdsNet: true });
  const columns = setting.columns.map((plan, i) => {
    const slot = slots.columns[i]!;
    const filled = fillSlot(job, setting, plan, slot, heights, headsFit(job, setting, plan, slot) ? 'hung' : 'inline');
    return { items: [...hungHead(job, setting, plan, slot, y), ...filled.items], overflows: filled.overflows };
  });
  return {
    items: [
      { kind: 'boxes', element: 'rule', ink: 'ink', boxes: [{ x: -bleed, y: line, width: W + 2 * bleed, height: weight }] },
      ...brandItems, ...front.items, ...columns.flatMap((column) => column.items),
    ],
    overflows: [
      ...(brandOver > 0 && job.content.brand ? [{ element: 'brand' as const, direction: 'width' as const, missing: brandOver, room: slots.front.width, word: job.content.brand }] : []),
      ...front.overflows, ...columns.flatMap((column) => column.overflows),
    ],
    panels: slots.panels,
  };
}

/** Versal beside a ledger: the front is a solid ground of its own. */
function versal(job: Job, setting: Setting, slots: Slots): Attempt {
  const { height: H } = job.sheet;
  const pad = setting.regime === 'wrap' ? Math.round(Math.min(3500, slots.front.hang / 2)) : 0;
  const ground: Box = setting.regime === 'wrap'
    ? { x: slots.front.x - pad, y: -20_000, width: slots.front.width + 2 * pad, height: H + 40_000 }
    : { x: -20_000, y: -20_000, width: slots.panels[0]!.width + 20_000, height: H + 40_000 };
  const inset = setting.regime === 'wrap' ? Math.max(0, 2500 - pad) : 0;
  const top = Math.max(SAFE, [Math.round(H * 0.07), Math.round(H * 0.05), SAFE][setting.tight]!);
  const ruleRoom = Math.round(setting.size * 0.5);
  const heights: Heights = { top: top + ruleRoom, foot: footLine(job, setting) };
  const visible: Box = { x: Math.max(0, ground.x), y: 0, width: ground.x < 0 ? slots.panels[0]!.width : ground.width, height: H };
  const front = versalFront(job, setting, { x: slots.front.x + inset, width: slots.front.width - 2 * inset, top, foot: heights.foot, holdsNet: true });
  const columns = setting.columns.map((plan, i) => fillSlot(job, setting, plan, slots.columns[i]!, heights, 'ledger'));
  return {
    items: [
      { kind: 'boxes', element: 'ground', ink: 'ink', boxes: [ground] },
      ...greatLetter(job, visible).map((item) => ({ ...item, clip: ground })),
      ...front.items, ...columns.flatMap((column) => column.items),
    ],
    overflows: [...front.overflows, ...columns.flatMap((column) => column.overflows)],
    panels: slots.panels,
  };
}

/** Front above, particulars below, feet in one row at the bottom: for faces taller than wide. */
function stack(job: Job, setting: Setting): Attempt {
  const { width: W, height: H, overlap, shape, round } = job.sheet;
  const margin = shape === 'cylinder' ? Math.max(SAFE, overlap + 3000) : marginOf(job, setting);
  const inner = W - 2 * margin;
  const foot = footLine(job, setting);
  const gap = setting.tight === 0 ? 4500 : setting.tight === 1 ? 3000 : 2200;
  const count = setting.columns.length;
  const between = Math.max(4000, Math.round(inner * 0.05));
  const each = Math.floor((inner - (count - 1) * between) / count);
  // Where the law wants net content in the lower part of the panel it stands with the feet, else on the front.
  const isNetLow = job.minimums.netContentZone > 0;
  const feet = stackFeet(job, setting, { margin, inner, foot, gap, isNetLow });
  const heads: Heads = job.template === 'versal' ? 'ledger' : 'inline';
  const trial = setting.columns.map((plan) => placeColumn(job, setting, plan.texts.flatMap((name) => job.content.blocks[name] ?? []), { x: 0, width: each, top: 0, limit: 9e9 }, heads));
  const textHeight = Math.max(0, ...trial.map((column) => column.bottom));
  const ruleRoom = heads === 'ledger' ? Math.round(setting.size * 0.5) : 0;
  const top = feet.limit - textHeight - ruleRoom;
  const headRoom = top - Math.round(setting.size * 1.15);
  const heights: Heights = { top, foot: feet.limit };
  const columns = setting.columns.map((plan, i) => placeColumn(job, setting, plan.texts.flatMap((name) => job.content.blocks[name] ?? []), { x: margin + i * (each + between), width: each, top: heights.top, limit: 9e9 }, heads));
  const frontWidth = shape === 'cylinder' ? Math.min(inner, Math.round(round * 0.4)) : inner;
  const panels: Panel[] = [{ name: 'Front', x: 0, y: 0, width: W, height: Math.max(0, headRoom) }, { name: 'Particulars', x: 0, y: Math.max(0, headRoom), width: W, height: H - Math.max(0, headRoom) }];
  const head = job.template === 'versal' ? versalHead(job, setting, { margin, frontWidth, bottom: headRoom, isNetLow }) : galleyHead(job, setting, { margin, frontWidth, bottom: headRoom, isNetLow });
  return {
    items: [...head.items, ...columns.flatMap((column) => column.items), ...feet.items],
    overflows: [...head.overflows, ...columns.flatMap((column) => column.overflows), ...feet.overflows],
    panels,
  };
}

/** The feet of a stacked label across its whole width; low net content takes the last row where one row is too short for all. */
function stackFeet(job: Job, setting: Setting, at: { margin: Micrometres; inner: Micrometres; foot: Micrometres; gap: Micrometres; isNetLow: boolean }): PlacedFeet {
  const names = setting.columns.flatMap((plan) => plan.feet);
  const box = { x: at.margin, width: at.inner, foot: at.foot, hang: edgeHang(job, at.margin), toEdge: true };
  const feet = feetOf(job, setting, names, at.inner);
  if (!at.isNetLow) return placeFeet(feet, box, at.gap);
  const ways = [at.inner, Math.round(at.inner * 0.48)].flatMap((room) => {
    const net = feetOf(job, setting, ['net'], room);
    const [mark, bars] = ['mark', 'bars'].map((name) => feet.filter((foot) => foot.name === name)) as [Foot[], Foot[]];
    const rows = [[[...net, ...mark, ...bars]], [[...mark, ...bars], net], [mark, [...net, ...bars]], [[...net, ...mark], bars], [mark, bars, net]];
    return rows.map((way) => placeRows(way.filter((row) => row.length > 0), box, at.gap));
  });
  return ways.reduce((best, way) => (way.overflows.length < best.overflows.length || (way.overflows.length === best.overflows.length && way.limit > best.limit) ? way : best));
}

function versalHead(job: Job, setting: Setting, at: { margin: Micrometres; frontWidth: Micrometres; bottom: Micrometres; isNetLow: boolean }): { items: Item[]; overflows: readonly Overflow[] } {
  const ground: Box = { x: -20_000, y: -20_000, width: job.sheet.width + 40_000, height: Math.max(1, at.bottom) + 20_000 };
  const pad = setting.tight === 2 ? 1600 : Math.round(Math.min(at.margin, 4500) * 0.85);
  const top = Math.max(SAFE, Math.min(at.margin, 6500));
  const front = versalFront(job, setting, { x: at.margin, width: at.frontWidth, top, foot: at.bottom - pad, holdsNet: !at.isNetLow });
  return {
    items: [
      { kind: 'boxes', element: 'ground', ink: 'ink', boxes: [ground] },
      ...greatLetter(job, { x: 0, y: 0, width: job.sheet.width, height: Math.max(1, at.bottom) }).map((item) => ({ ...item, clip: ground })),
      ...front.items,
    ],
    overflows: shortage(front.overflows, at.bottom),
  };
}

function galleyHead(job: Job, setting: Setting, at: { margin: Micrometres; frontWidth: Micrometres; bottom: Micrometres; isNetLow: boolean }): { items: Item[]; overflows: readonly Overflow[] } {
  const brand = fitBrand(job, at.frontWidth, Math.max(leastText(job, 500), Math.round(4200 * job.scale)));
  const { line, weight, head } = galleyLine(job, setting, brand);
  const y = Math.min(line, Math.max(galleyLine(job, { ...setting, tight: 2 }, brand).line, Math.round(at.bottom * 0.3)));
  const hang = Math.max(Math.round(3600 * Math.min(1.15, job.scale) * [1, 0.8, 0.6][setting.tight]!), 1500);
  const brandItems = job.content.brand
    ? brand.lines.map((text, i) => textItem(job.metrics, { element: 'brand', text: i < brand.lines.length - 1 ? `${text} ` : text, weight: 500, size: brand.size, x: at.margin, y: y - head - Math.round(brand.size * 1.15) * (brand.lines.length - 1 - i), ink: 'black', hang: true }))
    : [];
  const front = galleyFront(job, setting, { x: at.margin, width: at.frontWidth, top: y + weight + hang, foot: at.bottom - leadingOf(setting) + setting.size, holdsNet: !at.isNetLow });
  return {
    items: [{ kind: 'boxes', element: 'rule', ink: 'ink', boxes: [{ x: -20_000, y, width: job.sheet.width + 40_000, height: weight }] }, ...brandItems, ...front.items],
    overflows: shortage(front.overflows, at.bottom),
  };
}

/** A head that lacks height lacks it because the particulars below take it: said of them, in full. */
function shortage(overflows: readonly Overflow[], bottom: Micrometres): readonly Overflow[] {
  const height = overflows.filter((overflow) => overflow.direction === 'height');
  if (height.length === 0) return overflows;
  const missing = Math.max(...height.map((overflow) => overflow.missing)) + Math.max(0, -bottom);
  return [...overflows.filter((overflow) => overflow.direction === 'width'), { ...height[0]!, element: 'ingredients', missing }];
}

/** Sets the label in one way; what does not fit is reported with what is missing. */
export function compose(job: Job, setting: Setting): Attempt {
  if (setting.regime === 'stack') return stack(job, setting);
  const slots = setting.regime === 'wrap' ? wrapSlots(job, setting) : splitSlots(job, setting);
  const narrow = [slots.front, ...slots.columns].find((slot) => slot.width < setting.size * 5);
  if (narrow) return { isHopeless: true, items: [], panels: slots.panels, overflows: [{ element: 'ingredients', direction: 'width', missing: setting.size * 5 - narrow.width, room: Math.max(0, narrow.width) }] };
  if (job.template === 'fillet' || job.template === 'headband') return banded(job, setting, slots);
  return job.template === 'versal' ? versal(job, setting, slots) : galley(job, setting, slots);
}

/** Fillet and Headband: bands around the body, everything else in columns between or under them. */
function banded(job: Job, setting: Setting, slots: Slots): Attempt {
  const isFillet = job.template === 'fillet';
  const bands = isFillet ? filletBands(job, setting) : headbandBands(job, setting);
  const heights: Heights = { top: bands.top, foot: bands.foot };
  const front = bandedFront(job, setting, { x: slots.front.x, width: slots.front.width, ...heights }, isFillet ? FILLET_STYLE(job) : HEADBAND_STYLE(job));
  const columns = setting.columns.map((plan, i) => fillSlot(job, setting, plan, slots.columns[i]!, heights, 'inline'));
  return {
    items: [...bands.items, ...front.items, ...columns.flatMap((column) => column.items)],
    overflows: [...front.overflows, ...columns.flatMap((column) => column.overflows)],
    panels: slots.panels,
  };
}

import { plainWords } from './breaking.ts';
import { netFoot } from './feet.ts';
import { lengthOf, sizeToFill } from './metrics.ts';
import type { Box, ElementName, Item, Micrometres, PathStep, Weight } from './scene.ts';
import { breakFor, leastText, leadingOf, strongWeight, textItem, type Job, type Overflow, type Placed, type Setting } from './setting.ts';
import { fitTitle, titleHeight, type FittedTitle } from './title.ts';

export interface FrontBox {
  readonly x: Micrometres;
  readonly width: Micrometres;
  /** Cap line of the first text. */
  readonly top: Micrometres;
  /** Last base line. */
  readonly foot: Micrometres;
  /** Net content stands here, or with the feet of a stacked label. */
  readonly holdsNet: boolean;
}
export interface FrontInks {
  readonly brand: string;
  readonly title: string;
  readonly text: string;
}

/** The house's name on one line where it fits, else on two; never under the least height. */
export function fitBrand(job: Job, width: Micrometres, most: Micrometres): FittedTitle {
  const face = job.metrics.face(500);
  const least = leastText(job, 500);
  const one = sizeToFill(face, job.content.brand, width, most);
  if (one >= Math.max(least, Math.round(most * 0.8)) || !job.content.brand.includes(' ')) return { lines: [job.content.brand], size: Math.max(least, one) };
  const fitted = fitTitle(job.content.brand, face, { width, height: Math.round(most * 2.2), most, leading: 1150 });
  return { lines: fitted.lines, size: Math.max(least, fitted.size) };
}

interface Stacked {
  readonly element: ElementName;
  readonly lines: readonly string[];
  readonly weight: Weight;
  readonly size: Micrometres;
  readonly leading: Micrometres;
  /** Between the line above and this cap line. */
  readonly gap: Micrometres;
  readonly ink: string;
}

function stackHeight(job: Job, parts: readonly Stacked[]): Micrometres {
  return parts.reduce((total, part, i) => total + (i > 0 ? part.gap : 0) + rise(job, part), 0);
}
function rise(job: Job, part: Stacked): Micrometres {
  return Math.ceil((job.metrics.face(part.weight).capHeight * part.size) / 1000) + part.leading * (part.lines.length - 1);
}

/** Sets parts downwards from a cap line; lines keep their closing space so that words stay apart when read. */
function drawStack(job: Job, parts: readonly Stacked[], x: Micrometres, top: Micrometres): Item[] {
  const items: Item[] = [];
  let y = top;
  parts.forEach((part, index) => {
    if (index > 0) y += part.gap;
    part.lines.forEach((text, i) => {
      y += i === 0 ? Math.ceil((job.metrics.face(part.weight).capHeight * part.size) / 1000) : part.leading;
      items.push(textItem(job.metrics, { element: part.element, text: i < part.lines.length - 1 ? `${text} ` : text, weight: part.weight, size: part.size, x, y, ink: part.ink, hang: true }));
    });
  });
  return items;
}

function textPart(job: Job, setting: Setting, text: string, width: Micrometres, part: { element: ElementName; gap: Micrometres; ink: string }): Stacked {
  const lines = breakFor(job, plainWords(text, 400), setting.size, width, true).lines.map((line) => line.map((word) => word.text).join(' '));
  return { ...part, lines, weight: 400, size: setting.size, leading: leadingOf(setting) };
}

/** Largest title of a front: name, then function, then claim and front warnings, within a height. */
function titleParts(job: Job, setting: Setting, box: { width: Micrometres; height: Micrometres }, inks: FrontInks): Stacked[] {
  const { content, template, scale } = job;
  const isGalley = template === 'galley';
  const nameWeight: Weight = isGalley ? 300 : 700;
  const functionWeight: Weight = isGalley ? strongWeight(job) : job.isNorthAmerican ? 700 : 300;
  const leading = isGalley ? 1020 : 1060;
  const small: Stacked[] = [
    ...(content.claim && setting.claim ? [textPart(job, setting, content.claim, box.width, { element: 'claim', gap: Math.round(setting.size * (isGalley || setting.tight === 2 ? 1.1 : 1.7)), ink: inks.text })] : []),
    ...content.frontWarnings.map((text) => textPart(job, setting, text, box.width, { element: 'warnings', gap: Math.round(setting.size * 0.9), ink: inks.text })),
  ];
  const smallHeight = small.reduce((total, part) => total + part.gap + rise(job, part), 0);
  const room = box.height - smallHeight;
  const least = leastText(job, functionWeight);
  const functionFace = job.metrics.face(functionWeight);
  const nameFace = job.metrics.face(nameWeight);
  const most = Math.round((isGalley ? 17_200 : 12_500) * scale);
  const fit = (share: number): { name: FittedTitle; fn: FittedTitle | null; gap: Micrometres } => {
    const fnMost = Math.max(least, Math.round((isGalley ? 7400 : 12_500) * scale * share));
    const fn = content.functionName ? fitTitle(content.functionName, functionFace, { width: box.width, height: Math.max(fnMost, Math.round(least * 2.4)), most: fnMost, leading: 1100 }) : null;
    const fnRise = fn ? titleHeight(fn, functionFace, 1100) : 0;
    const gapShare = isGalley ? (setting.tight === 0 ? 370 : 300) : 360;
    // The gap is a share of the name's em, so the name is fitted to what is left beside both.
    const free = fitTitle(content.name, nameFace, { width: box.width, height: Math.max(1, room - fnRise), most, leading });
    const gap = fn ? Math.max(Math.round((free.size * gapShare) / 1000), 900) : 0;
    const name = fitTitle(content.name, nameFace, { width: box.width, height: Math.max(1, room - fnRise - gap), most, leading });
    return { name, fn, gap };
  };
  let chosen = fit(1);
  for (const share of [0.75, 0.55, 0.4]) {
    const limit = isGalley ? 0.62 : 1.001;
    if (!chosen.fn || chosen.fn.size <= chosen.name.size * limit) break;
    const next = fit(share);
    if (next.name.size <= chosen.name.size && next.fn!.size >= chosen.fn.size) break;
    chosen = next;
  }
  const { name, fn, gap } = chosen;
  const oneSize = !isGalley && fn ? Math.min(name.size, fn.size) : null;
  const isOneSize = oneSize !== null && oneSize * 10 >= name.size * 7;
  const nameSize = isOneSize ? oneSize : name.size;
  return [
    { element: 'name', lines: name.lines, weight: nameWeight, size: nameSize, leading: Math.round((leading * nameSize) / 1000), gap: 0, ink: inks.title },
    ...(fn ? [{ element: 'function' as const, lines: fn.lines, weight: functionWeight, size: isOneSize ? oneSize : fn.size, leading: Math.round((isOneSize ? oneSize : fn.size) * 1.1), gap: isOneSize ? Math.round(oneSize * 0.36) : gap, ink: inks.title }] : []),
    ...small,
  ];
}

/** What the front needs and does not have, in words of its elements. */
function frontOverflows(job: Job, parts: readonly Stacked[], box: { width: Micrometres; height: Micrometres }): Overflow[] {
  const out: Overflow[] = [];
  for (const part of parts) {
    const face = job.metrics.face(part.weight);
    const least = part.element === 'name' ? Math.round(leastText(job, part.weight) * 1.2) : leastText(job, part.weight);
    const longest = [...part.lines].sort((a, b) => face.run(b).advance - face.run(a).advance)[0] ?? '';
    const needed = lengthOf(face, longest, Math.max(least, part.size)) - box.width;
    if (needed > 0) out.push({ element: part.element, direction: 'width', missing: needed, room: box.width, word: longest });
    else if (part.size < least) out.push({ element: part.element, direction: 'height', missing: Math.ceil(((least - part.size) * (face.capHeight + 1060 * (part.lines.length - 1))) / 1000), room: box.width });
  }
  const over = stackHeight(job, parts) - box.height;
  if (over > 0 && out.length === 0) out.push({ element: 'function', direction: 'height', missing: over, room: box.width });
  return out;
}

/** The front of Galley: name hung from the line, function under it, net content on the last base line. */
export function galleyFront(job: Job, setting: Setting, box: FrontBox): Placed {
  const net = box.holdsNet ? netFoot(job, box.width, 'black') : null;
  const bottom = net && job.content.net ? box.foot - net.height - net.clear[2] : box.foot;
  const inks: FrontInks = { brand: 'black', title: 'ink', text: 'black' };
  const height = bottom - box.top;
  const parts = titleParts(job, setting, { width: box.width, height }, inks);
  return {
    items: [...drawStack(job, parts, box.x, box.top), ...(net && job.content.net ? net.draw(box.x, box.foot) : [])],
    overflows: [...frontOverflows(job, parts, { width: box.width, height }), ...(net?.overflow && job.content.net ? [net.overflow] : [])],
  };
}

/** The front of Versal: brand above, name and function of one size standing low, all over the great letter. */
export function versalFront(job: Job, setting: Setting, box: FrontBox): Placed {
  const net = box.holdsNet ? netFoot(job, box.width, 'light') : null;
  const bottom = net && job.content.net ? box.foot - net.height - net.clear[2] : box.foot;
  const inks: FrontInks = { brand: 'light', title: 'light', text: 'light' };
  const brand = brandPart(job, box.width, 'light');
  const top = box.top + (brand ? rise(job, brand) + Math.round(job.scale * (setting.tight === 2 ? 2200 : 3600)) : 0);
  const height = bottom - top;
  const parts = titleParts(job, setting, { width: box.width, height }, inks);
  const start = Math.max(top, bottom - stackHeight(job, parts));
  const brandOver = brand ? frontOverflows(job, [brand], { width: box.width, height: 1e9 }) : [];
  return {
    items: [...(brand ? drawStack(job, [brand], box.x, box.top) : []), ...drawStack(job, parts, box.x, start), ...(net && job.content.net ? net.draw(box.x, box.foot) : [])],
    overflows: [...brandOver, ...frontOverflows(job, parts, { width: box.width, height }), ...(net?.overflow && job.content.net ? [net.overflow] : [])],
  };
}

function brandPart(job: Job, width: Micrometres, ink: string): Stacked | null {
  if (!job.content.brand) return null;
  const brand = fitBrand(job, width, Math.max(leastText(job, 500), Math.round(3400 * job.scale)));
  return { element: 'brand', lines: brand.lines, weight: 500, size: brand.size, leading: Math.round(brand.size * 1.15), gap: 0, ink };
}

/** The great letter: the name's first, as an outline in the tint, clipped to its ground. */
export function greatLetter(job: Job, ground: Box): Item[] {
  const first = Array.from(job.content.name.normalize('NFD').toUpperCase()).find((letter) => job.metrics.versal(letter));
  const outline = first ? job.metrics.versal(first) : undefined;
  if (!first || !outline) return [];
  const size = Math.round((Math.min(Math.max(ground.height * 1.09, Math.min(ground.width * 0.8, ground.height * 1.7)), ground.width * 1.75) * 1000) / 698);
  const advance = (job.metrics.face(700).run(first).advance * size) / 1000;
  // It runs off at the top; where it is taller than its ground, at the foot as well.
  const base = ground.y + Math.round((size * 698) / 1000 - ground.height * 0.13);
  const x = first === 'J' ? ground.x + Math.round(ground.width * 0.86 - advance) : ground.x + Math.round(ground.width * 0.36);
  const at = (figure: number, isX: boolean): Micrometres => (isX ? x : base) + Math.round(((isX ? figure : -figure) * size) / 1000);
  return [{ kind: 'path', element: 'ground', ink: 'tint', clip: ground, steps: outlineSteps(outline, at) }];
}

/** Quadratic curves become cubic ones, so that every painter knows every step. */
function outlineSteps(outline: readonly (string | number)[], at: (figure: number, isX: boolean) => Micrometres): PathStep[] {
  const steps: PathStep[] = [];
  let here: [number, number] = [0, 0];
  for (let i = 0; i < outline.length; ) {
    const command = outline[i] as string;
    const count = { M: 2, L: 2, Q: 4, C: 6, Z: 0 }[command] ?? 0;
    const figures = outline.slice(i + 1, i + 1 + count) as number[];
    const cubic = command === 'Q' ? raise(here, figures) : figures;
    const points = cubic.map((figure, n) => at(figure, n % 2 === 0));
    steps.push([command === 'Q' ? 'C' : command, ...points] as unknown as PathStep);
    if (count > 0) here = [figures[count - 2]!, figures[count - 1]!];
    i += 1 + count;
  }
  return steps;
}

function raise([x0, y0]: [number, number], [x1, y1, x2, y2]: number[]): number[] {
  return [x0 + ((x1! - x0) * 2) / 3, y0 + ((y1! - y0) * 2) / 3, x2! + ((x1! - x2!) * 2) / 3, y2! + ((y1! - y2!) * 2) / 3, x2!, y2!];
}

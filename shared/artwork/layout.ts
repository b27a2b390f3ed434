import { barcodeFault } from './barcode.ts';
import { bendScene } from './bend.ts';
import { checkLabel, type Check } from './checks.ts';
import { readContainer, type Sheet } from './container.ts';
import { USUAL_OVERLAP_MM } from './containers.ts';
import { contentOf, textsOf } from './content.ts';
import { fitLabel } from './fit.ts';
import { applyHand, isByHand, leanFor } from './hand/apply-hand.ts';
import { heightAt, minimumsFor, sizeForHeight } from './heights.ts';
import { BLACK, DIE_LINE, paletteOf } from './inks.ts';
import type { LabelInput } from './label-input.ts';
import { inMillimetres, readMillimetres } from './lengths.ts';
import type { FontMetrics } from './metrics.ts';
import { misfitOf, type Misfit } from './misfits.ts';
import type { Box, ElementName, Item, Micrometres, Scene } from './scene.ts';
import { strongWeight, type Job, type TemplateName } from './setting.ts';

export interface Layout {
  /** `null` only where the measures themselves cannot be read. */
  readonly scene: Scene | null;
  /** The scene before it is bent onto a cone, on which things are moved by hand; else the scene itself. */
  readonly straight: Scene | null;
  /** Empty when everything has its place. */
  readonly misfits: readonly Misfit[];
  readonly checks: readonly Check[];
}

export const TEMPLATES: readonly { readonly slug: TemplateName; readonly name: string; readonly temper: string }[] = [
  { slug: 'galley', name: 'Galley', temper: 'Hung from one line, like a proof drying.' },
  { slug: 'headband', name: 'Headband', temper: 'A stitched edge, and small calm print.' },
  { slug: 'fillet', name: 'Fillet', temper: 'Everything stands between two wheeled rules.' },
  { slug: 'versal', name: 'Versal', temper: 'One great letter; the particulars answer in a ledger.' },
];

/** The template asked for, or the one drawn for this shape. */
export function templateFor(input: Pick<LabelInput, 'template' | 'container'>): TemplateName {
  const { shape } = input.container;
  const asked = templatesFor(shape).find((template) => template.slug === input.template);
  return asked?.slug ?? (shape === 'flat' ? 'versal' : shape === 'taper' ? 'fillet' : 'galley');
}

/** The templates drawn for a shape: bands need a body to run around, the great letter a straight ground. */
export function templatesFor(shape: LabelInput['container']['shape']): typeof TEMPLATES {
  const fitting: Readonly<Record<typeof shape, readonly TemplateName[]>> = { cylinder: ['galley', 'headband', 'fillet', 'versal'], taper: ['fillet', 'galley'], flat: ['galley', 'versal'] };
  return TEMPLATES.filter(({ slug }) => fitting[shape].includes(slug));
}

const READING_ORDER: readonly ElementName[] = [
  'ground', 'rule', 'drawing', 'brand', 'name', 'function', 'claim', 'own text', 'net content', 'directions', 'warnings', 'ingredients', 'responsible person', 'batch', 'durability', 'barcode', 'code',
];

/** Paint order is reading order: grounds first, then texts as the law lists them. Stable, so lines keep theirs. */
function inReadingOrder(items: readonly Item[]): Item[] {
  const rank = new Map(READING_ORDER.map((name, i) => [name, i]));
  return [...items].sort((a, b) => rank.get(a.element)! - rank.get(b.element)!);
}

function cutBox(box: Box, to: Box): Box {
  const x = Math.max(box.x, to.x);
  const y = Math.max(box.y, to.y);
  return { x, y, width: Math.max(0, Math.min(box.x + box.width, to.x + to.width) - x), height: Math.max(0, Math.min(box.y + box.height, to.y + to.height) - y) };
}

/** Grounds and rules end with the bleed. */
function cutToBleed(item: Item, sheet: Box): Item {
  const clip = item.clip ? { clip: cutBox(item.clip, sheet) } : {};
  return item.kind === 'boxes' ? { ...item, ...clip, boxes: item.boxes.map((box) => cutBox(box, sheet)) } : { ...item, ...clip };
}

function jobOf(input: LabelInput, sheet: Sheet, metrics: FontMetrics): Job {
  const content = contentOf(input);
  const minimums = minimumsFor(input.market, sheet, content.net?.quantity ?? null, input.warnings.length > 0 || content.frontWarnings.length > 0);
  const isNorthAmerican = input.market === 'US' || input.market === 'CA';
  const isWrap = sheet.shape === 'cylinder';
  const scale = Math.max(0.5, Math.min(1.45, isWrap ? Math.min(sheet.round / 182_400, sheet.height / 82_000) : Math.min(Math.max(sheet.width, sheet.height * 0.66) / 66_000, Math.max(sheet.height, sheet.width * 0.6) / 84_000)));
  const strong = metrics.face(strongWeight({ isNorthAmerican } as Job));
  const netShare = minimums.netContent.of === 'figures' ? strong.capHeight : strong.xHeight;
  const eShare = content.eMark ? 722 : 1e9;
  const netLeast = Math.max(sizeForHeight(minimums.netContent.height, netShare), sizeForHeight(minimums.text.height, strong.xHeight), content.eMark ? Math.min(4500, sizeForHeight(minimums.eMark, eShare)) : 0);
  return {
    content, sheet, minimums, metrics, isNorthAmerican, scale,
    template: templateFor(input),
    barcode: input.barcode && input.barcode.digits !== '' && !barcodeFault(input.barcode) ? input.barcode : null,
    floor: sizeForHeight(minimums.text.height, metrics.face(400).xHeight),
    netSize: Math.max(netLeast, Math.round(Math.min(6200, 6200 * scale))),
    memo: new Map(), dry: true,
  };
}

/** Fallback when the drawn net content does not fit: the least lawful size. */
function withLeastNet(job: Job): Job {
  const strong = job.metrics.face(strongWeight(job));
  const { netContent, text, eMark } = job.minimums;
  const least = Math.max(
    sizeForHeight(netContent.height, netContent.of === 'figures' ? strong.capHeight : strong.xHeight),
    sizeForHeight(text.height, strong.xHeight), job.content.eMark ? sizeForHeight(eMark, 722) : 0,
  );
  return least < job.netSize ? { ...job, netSize: least, memo: new Map() } : job;
}

/** Characters that the type lacks, by element: they are reported and never printed as empty boxes. */
function missingCharacters(input: LabelInput, metrics: FontMetrics): Misfit[] {
  const face = metrics.face(400);
  return textsOf(input).flatMap(({ element, text }): Misfit[] => {
    const lacking = [...new Set(Array.from(text))].filter((char) => !/\s/.test(char) && !face.has(char));
    return lacking.length === 0 ? [] : [{ element, missing: 0, direction: 'character', message: `The label type has no ${lacking.map((char) => `“${char}”`).join(', ')} (in the ${element}). Write it with other letters.` }];
  });
}

/** The body a label goes on, for the slug. */
function bodyOf({ container }: LabelInput, sheet: Sheet): string {
  if (container.shape === 'taper') return `cone Ø ${container.topDiameterMm} to ${container.bottomDiameterMm}, overlap ${container.overlapMm ?? USUAL_OVERLAP_MM}`;
  return sheet.shape === 'cylinder' ? `wrap Ø ${sheet.diameter / 1000}, overlap ${sheet.overlap / 1000}` : 'flat';
}

function legendOf(input: LabelInput, sheet: Sheet, bleed: Micrometres): string {
  const { width, height } = sheet.taper ?? sheet;
  const content = input.netContent ? ` ${input.netContent.value} ${input.netContent.unit}` : '';
  return `${content.trim()}${content ? ' · ' : ''}${input.market} · ${bodyOf(input, sheet)} · trim ${width / 1000} × ${height / 1000} mm · bleed ${bleed / 1000} mm`;
}

/**
 * Lays out a label: the one scene that screen and press file are painted from, what would not
 * fit (element by element, in millimetres), and the list of checks before the press.
 */
export function layOutLabel(input: LabelInput, metrics: FontMetrics): Layout {
  const sheet = readContainer(input.container);
  if ('faults' in sheet) return { scene: null, straight: null, checks: [], misfits: sheet.faults.map((fault) => ({ element: 'container', missing: 0, direction: 'measure', message: fault.message })) };
  const bleed = input.bleedMm === undefined ? 3000 : readMillimetres(input.bleedMm);
  if (bleed === null || bleed < 0 || bleed > 20_000) return { scene: null, straight: null, checks: [], misfits: [{ element: 'container', missing: 0, direction: 'measure', message: 'The bleed lies between 0 and 20 mm.' }] };
  const lacking = missingCharacters(input, metrics);
  const drawn = jobOf(input, sheet, metrics);
  let job = drawn;
  let fitted = fitLabel(job);
  if (fitted.overflows.length > 0) {
    const leaner = withLeastNet(drawn);
    if (leaner !== drawn) {
      const again = fitLabel(leaner);
      if (again.overflows.length === 0) [job, fitted] = [leaner, again];
    }
  }
  const byHand = isByHand(input.byHand) ? input.byHand : null;
  // What was set free no longer needs its place in the template, where that helps.
  if (byHand && fitted.overflows.length > 0) fitted = fitLabel(leanFor(job, byHand));
  const set = byHand ? applyHand(job, fitted.setting, fitted, byHand, input.pictures) : { items: fitted.items, inks: {}, misfits: fitted.overflows.map(misfitOf) };
  const palette = paletteOf(input.ink);
  const full: Box = { x: -bleed, y: -bleed, width: sheet.width + 2 * bleed, height: sheet.height + 2 * bleed };
  const edge = sheet.shape === 'cylinder' ? Math.max(2000, sheet.overlap + 3000) : 2000;
  const scene: Scene = {
    trim: { width: sheet.width, height: sheet.height }, bleed, shape: sheet.shape, overlap: sheet.overlap,
    safe: { x: edge, y: 2000, width: sheet.width - 2 * edge, height: sheet.height - 4000 },
    panels: fitted.panels,
    inks: { black: BLACK, ink: palette.ink, tint: palette.tint, light: palette.light, ...set.inks },
    items: inReadingOrder(set.items).map((item) => cutToBleed(item, full)),
    dieLine: { ink: DIE_LINE, stroke: 250, steps: [['M', 0, 0], ['L', sheet.width, 0], ['L', sheet.width, sheet.height], ['L', 0, sheet.height], ['Z']] },
    legend: legendOf(input, sheet, bleed), template: job.template,
  };
  const bent = sheet.taper ? bendScene(scene, sheet.taper, metrics) : { scene, overflows: [] };
  const misfits = [...lacking, ...set.misfits, ...bent.overflows.map(misfitOf)];
  return { scene: bent.scene, straight: scene, misfits, checks: checkLabel({ input, job, scene, setting: fitted.setting, misfits }) };
}

/** For people: the height of a share of an em, in millimetres cut to two decimals. */
export function letterHeight(size: Micrometres, share: number): string {
  return inMillimetres(Math.floor(heightAt(size, share) / 1000));
}

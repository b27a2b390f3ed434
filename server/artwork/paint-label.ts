import { createHash } from 'node:crypto';
import { deflateSync } from 'node:zlib';
import { PDFArray, PDFDocument, PDFHexString, PDFName, PDFNumber, PDFRawStream, type PDFContext, type PDFDict, type PDFObject, type PDFRef } from 'pdf-lib';
import type { Item, Micrometres, Scene, Text, Weight } from '#shared/artwork/scene.ts';
import { embedFont, type EmbeddedFont } from './embed-font.ts';
import { WEIGHTS } from './fonts.ts';
import { beginWords, boxOf, fill, pathOf, pictureOf, points, sheetOf, stroke, textOf, type Sheet } from './operators.ts';
import { outputIntent, standardKeys, type Press } from './press.ts';
import { cropMarks, SLUG, slugOf, type Slug } from './slug.ts';

export interface PaintOptions {
  readonly press: Press;
  readonly title: string;
  readonly creator: string;
  /** Day that the file carries as its date, `YYYY-MM-DD`: the same label then makes the same bytes. */
  readonly date: string;
  /** Rows of C, M, Y, K bytes of the photos that the scene shows, deflated, by their id. */
  readonly photos?: ReadonlyMap<string, PressPhoto>;
}

export interface PressPhoto {
  readonly width: number;
  readonly height: number;
  readonly plates: Uint8Array;
}

const HAIRLINE: Micrometres = 88;

/** Black alone prints over what is under it; every other colour knocks out. */
function overprints(item: Item, scene: Scene): boolean {
  const ink = scene.inks[item.ink]!;
  return item.element !== 'ground' && item.kind !== 'picture' && ink.cmyk.every((part, i) => (i === 3 ? part === 100 : part === 0));
}

interface Painter {
  readonly sheet: Sheet;
  readonly fonts: ReadonlyMap<Weight, EmbeddedFont>;
  readonly photos: ReadonlyMap<string, PressPhoto>;
}

function paintText(item: Text, { sheet, fonts }: Painter): string {
  return textOf(item, fonts.get(item.weight)!.encode(item.text), `F${item.weight}`, sheet);
}

function paintItem(item: Item, scene: Scene, painter: Painter): string {
  const { sheet, photos } = painter;
  const ink = scene.inks[item.ink]!;
  if (item.kind === 'picture') return pictureOf(item, `P${[...photos.keys()].indexOf(item.picture)}`, sheet);
  if (item.kind === 'text') return `${fill(ink.cmyk)}\n${paintText(item, painter)}`;
  if (item.kind === 'boxes') return `${fill(ink.cmyk)}\n${item.boxes.map((box) => boxOf(box, sheet)).join('\n')}\nf`;
  if (item.stroke === undefined) return `${fill(ink.cmyk)}\n${pathOf(item.steps, sheet)}\n${item.evenOdd ? 'f*' : 'f'}`;
  return `${stroke(ink.cmyk)}\n${sheet.length(item.stroke)} w\n${pathOf(item.steps, sheet)}\nS`;
}

/** Runs whose words are told: no straight line joins letters on arcs, and capitals are only a dress. */
const isTold = (item: Item | undefined): item is Text => item?.kind === 'text' && (item.places !== undefined || item.says !== undefined);
const isOneParagraph = (item: Item | undefined, next: Item | undefined): boolean => isTold(item) && isTold(next) && next.element === item.element;

/** What the told runs say from here to the end of their element, or `null` where none begins. */
function wordsFrom(items: readonly Item[], from: number): string | null {
  const first = items[from]!;
  if (!isTold(first) || isOneParagraph(items[from - 1], first)) return null;
  let words = '';
  for (let i = from; isTold(items[i]) && items[i]!.element === first.element; i += 1) {
    const { says, text } = items[i] as Text;
    words += says ?? text;
  }
  return words;
}

/** The label itself, clipped to its bleed. */
function paintArtwork(scene: Scene, painter: Painter): string {
  const { trim, bleed } = scene;
  const full = { x: -bleed, y: -bleed, width: trim.width + 2 * bleed, height: trim.height + 2 * bleed };
  const parts = [`q ${boxOf(full, painter.sheet)} W n 1 J 1 j`];
  let state = '';
  scene.items.forEach((item, i) => {
    const words = wordsFrom(scene.items, i);
    if (words !== null) parts.push(beginWords(words));
    const wanted = overprints(item, scene) ? '/Over gs' : '/Knock gs';
    const painted = paintItem(item, scene, painter);
    if (item.clip) {
      parts.push(`q ${wanted} ${boxOf(item.clip, painter.sheet)} W n`, painted, 'Q');
      return;
    }
    if (wanted !== state) parts.push(wanted);
    state = wanted;
    parts.push(painted);
    if (isTold(item) && !isOneParagraph(item, scene.items[i + 1])) parts.push('EMC');
  });
  return [...parts, 'Q'].join('\n');
}

/** Marks and slug on every plate, patches in their own ink, all outside the bleed. */
function paintSlug(scene: Scene, slug: Slug, painter: Painter): string {
  const { sheet } = painter;
  const marks = cropMarks(scene).map(({ from, to }) => `${sheet.x(from[0])} ${sheet.y(from[1])} m ${sheet.x(to[0])} ${sheet.y(to[1])} l`);
  return [
    'q /Knock gs', `/All CS 1 SCN ${sheet.length(HAIRLINE)} w`, ...marks, 'S',
    '/All cs 1 scn', ...slug.texts.map((text) => paintText(text, painter)),
    ...slug.patches.map(({ box, ink }) => `${fill(ink.cmyk)} ${boxOf(box, sheet)} f`), 'Q',
  ].join('\n');
}

/** Cut line: its own plate, painted last and overprinting, so that it takes nothing away. */
function paintDieLine({ dieLine }: Scene, sheet: Sheet): string {
  return `q /Over gs /Die CS 1 SCN ${sheet.length(dieLine.stroke)} w\n${pathOf(dieLine.steps, sheet)}\nS Q`;
}

function separation(context: PDFContext, name: string, cmyk: readonly number[]): PDFRef {
  const tint = context.obj({ FunctionType: 2, Domain: [0, 1], C0: [0, 0, 0, 0], C1: cmyk.map((part) => part / 100), N: 1 });
  const space = PDFArray.withContext(context);
  space.push(PDFName.of('Separation'));
  space.push(PDFName.of(name));
  space.push(PDFName.of('DeviceCMYK'));
  space.push(tint);
  return context.register(space);
}

function box(context: PDFContext, figures: readonly Micrometres[]): PDFObject {
  const array = PDFArray.withContext(context);
  for (const figure of figures) array.push(PDFNumber.of(Number(points(figure))));
  return array;
}

function resources(context: PDFContext, scene: Scene, fonts: ReadonlyMap<Weight, EmbeddedFont>, photos: ReadonlyMap<string, PressPhoto>): PDFDict {
  return context.obj({
    ...(photos.size > 0 && { XObject: Object.fromEntries([...photos.values()].map((photo, i) => [`P${i}`, embedPhoto(context, photo)])) }),
    Font: Object.fromEntries([...fonts].map(([weight, font]) => [`F${weight}`, font.ref])),
    ColorSpace: { Die: separation(context, scene.dieLine.ink.spot ?? 'Dieline', scene.dieLine.ink.cmyk), All: separation(context, 'All', [100, 100, 100, 100]) },
    ExtGState: { Over: { Type: 'ExtGState', OP: true, op: true, OPM: 1 }, Knock: { Type: 'ExtGState', OP: false, op: false, OPM: 0 } },
  });
}

/** A photo in process inks: one stream however often it is shown. */
function embedPhoto(context: PDFContext, { width, height, plates }: PressPhoto): PDFRef {
  return context.register(PDFRawStream.of(context.obj({ Type: 'XObject', Subtype: 'Image', Width: width, Height: height, ColorSpace: 'DeviceCMYK', BitsPerComponent: 8, Filter: 'FlateDecode', Length: plates.length }) as PDFDict, plates));
}

function contentHash(scene: Scene, { photos = new Map(), ...options }: PaintOptions): string {
  const hash = createHash('sha256').update(JSON.stringify([scene, options]));
  for (const [id, { plates }] of photos) hash.update(id).update(plates);
  return hash.digest('hex');
}

function pdfDate(day: string): Date {
  return new Date(`${day}T00:00:00Z`);
}

/**
 * Paints a scene as a press file: one page, PDF/X, process inks and spots alone, fonts embedded
 * as subsets, text as text in reading order. Equal scenes and options give equal bytes.
 * @throws RangeError when a character has no glyph (the layout reports it before).
 */
export async function paintLabel(scene: Scene, options: PaintOptions): Promise<Uint8Array> {
  const doc = await PDFDocument.create({ updateMetadata: false });
  const { context } = doc;
  const hash = contentHash(scene, options);
  const slug = slugOf(scene, {
    job: `${options.title} · ${scene.legend}`,
    press: `${options.press.standard}, colours mixed for ${options.press.condition}, a proof is no promise · ${options.date} UTC · ${hash.slice(0, 12)}`,
  });
  const origin = scene.bleed + SLUG;
  const width = scene.trim.width + 2 * origin;
  const foot = scene.trim.height + scene.bleed + SLUG;
  const height = foot + scene.bleed + slug.above;
  const sheet: Sheet = { ...sheetOf(origin, height), y: (y) => points(foot - y) };
  const weights = WEIGHTS.filter((weight) => weight === 400 || scene.items.some((item) => item.kind === 'text' && item.weight === weight));
  const fonts = new Map<Weight, EmbeddedFont>();
  for (const weight of weights) fonts.set(weight, await embedFont(context, weight));
  const photos = options.photos ?? new Map<string, PressPhoto>();
  const painter: Painter = { sheet, fonts, photos };
  const content = [paintArtwork(scene, painter), paintSlug(scene, slug, painter), paintDieLine(scene, sheet)].join('\n');
  for (const font of fonts.values()) await font.embed();
  const deflated = deflateSync(content, { level: 9 });
  const stream = PDFRawStream.of(context.obj({ Filter: 'FlateDecode', Length: deflated.length }) as PDFDict, deflated);
  const page = doc.addPage([Number(points(width)), Number(points(height))]);
  const low = SLUG + scene.bleed;
  page.node.set(PDFName.of('MediaBox'), box(context, [0, 0, width, height]));
  page.node.set(PDFName.of('BleedBox'), box(context, [SLUG, SLUG, width - SLUG, SLUG + scene.trim.height + 2 * scene.bleed]));
  page.node.set(PDFName.of('TrimBox'), box(context, [low, low, low + scene.trim.width, low + scene.trim.height]));
  page.node.set(PDFName.of('Resources'), resources(context, scene, fonts, photos));
  page.node.set(PDFName.of('Contents'), context.register(stream));
  doc.setTitle(options.title);
  doc.setCreator(options.creator);
  doc.setProducer('Colophon');
  doc.setCreationDate(pdfDate(options.date));
  doc.setModificationDate(pdfDate(options.date));
  doc.catalog.set(PDFName.of('OutputIntents'), context.obj([await outputIntent(context, options.press)]));
  standardKeys(doc, { press: options.press, title: options.title, creator: options.creator, date: options.date, hash });
  const id = PDFHexString.of(hash.slice(0, 32));
  context.trailerInfo.ID = context.obj([id, id]);
  return withVersion(await doc.save({ useObjectStreams: false, updateFieldAppearances: false }), options.press.standard === 'PDF/X-4' ? '6' : '4');
}

/** The writer always says 1.7; the standard wants the version it is built on. */
function withVersion(pdf: Uint8Array, minor: string): Uint8Array {
  pdf[7] = minor.charCodeAt(0);
  return pdf;
}


import type { Cmyk, Micrometres, PathStep, PictureItem, Place, Text } from '#shared/artwork/scene.ts';

/** Points per micrometre: 72 to the inch of 25 400. */
const POINTS = 72 / 25_400;

/** Points with six decimals: finer than a nanometre, so a trim read back is the trim that was set. */
export function points(length: Micrometres): string {
  return String(Math.round(length * POINTS * 1e6) / 1e6);
}

/** Turns label coordinates (0 0 upper left of the trim, y down) into page text (0 0 lower left of the sheet). */
export interface Sheet {
  x(x: Micrometres): string;
  y(y: Micrometres): string;
  length(length: Micrometres): string;
}
export function sheetOf(origin: Micrometres, height: Micrometres): Sheet {
  return { x: (x) => points(x + origin), y: (y) => points(height - origin - y), length: points };
}

const tint = (percent: number): string => String(percent / 100);

/** Fill colour in process inks. */
export function fill(cmyk: Cmyk): string {
  return `${cmyk.map(tint).join(' ')} k`;
}
/** Stroke colour in process inks. */
export function stroke(cmyk: Cmyk): string {
  return `${cmyk.map(tint).join(' ')} K`;
}

export function pathOf(steps: readonly PathStep[], sheet: Sheet): string {
  return steps
    .map((step) => {
      if (step[0] === 'Z') return 'h';
      const [command, ...figures] = step;
      const out = figures.map((figure, i) => (i % 2 === 0 ? sheet.x(figure) : sheet.y(figure)));
      return `${out.join(' ')} ${command === 'M' ? 'm' : command === 'L' ? 'l' : 'c'}`;
    })
    .join('\n');
}

export function boxOf(box: { x: Micrometres; y: Micrometres; width: Micrometres; height: Micrometres }, sheet: Sheet): string {
  return `${sheet.x(box.x)} ${sheet.y(box.y + box.height)} ${sheet.length(box.width)} ${sheet.length(box.height)} re`;
}

/**
 * One run of text: its glyph numbers with the kerning between them as TJ writes it, the
 * distance taken away in thousandths of the em.
 */
export function textOf(item: Text, glyphs: readonly { readonly code: string; readonly advance: number }[], font: string, sheet: Sheet): string {
  if (item.places) return placedTextOf(item, item.places, glyphs, font, sheet);
  const turn = { 0: '1 0 0 1', 90: '0 -1 1 0', 270: '0 1 -1 0' }[item.turn];
  let array = '<';
  glyphs.forEach(({ code, advance }, i) => {
    array += code;
    const next = item.offsets[i + 1];
    const closer = next === undefined ? 0 : item.offsets[i]! + advance - next;
    if (closer !== 0) array += `>${closer}<`;
  });
  return `BT /${font} ${sheet.length(item.size)} Tf ${turn} ${sheet.x(item.x)} ${sheet.y(item.y)} Tm [${array}>] TJ ET`;
}

/** A run whose characters stand each at a place of its own. */
function placedTextOf(item: Text, places: readonly Place[], glyphs: readonly { readonly code: string }[], font: string, sheet: Sheet): string {
  // Two micrometres and a twentieth of a degree: what no press holds is not worth the bytes.
  const short = (figure: string): string => String(Math.round(Number(figure) * 1e2) / 1e2);
  const shown = glyphs.map(({ code }, i) => {
    const { x, y, degrees } = places[i]!;
    const turn = (Math.round(degrees * 10) * Math.PI) / 1800;
    const [cos, sin] = [Math.cos(turn), Math.sin(turn)].map((figure) => Math.round(figure * 1e4) / 1e4) as [number, number];
    return `${cos} ${-sin} ${sin} ${cos} ${short(sheet.x(x))} ${short(sheet.y(y))} Tm<${code}>Tj`;
  });
  return `BT /${font} ${sheet.length(item.size)} Tf ${shown.join('\n')} ET`;
}

/** A photo in its box, turned about its middle where the sheet is bent. */
export function pictureOf({ box, degrees = 0 }: PictureItem, name: string, sheet: Sheet): string {
  const turn = (degrees * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  const [w, h] = [box.width, box.height];
  // The lower left corner, turned about the middle.
  const x = box.x + w / 2 - (w / 2) * cos - (h / 2) * sin;
  const y = box.y + h / 2 - (w / 2) * sin + (h / 2) * cos;
  const matrix = [w * cos, -w * sin, h * sin, h * cos].map((figure) => points(Math.round(figure * 1000) / 1000));
  return `q ${matrix.join(' ')} ${sheet.x(x)} ${sheet.y(y)} cm /${name} Do Q`;
}

/** Tells readers the words of what follows, up to `EMC`: no straight line joins letters set on arcs. */
export function beginWords(text: string): string {
  return `/Span <</ActualText <FEFF${utf16(text)}>>> BDC`;
}

function utf16(text: string): string {
  return Array.from({ length: text.length }, (_, i) => text.charCodeAt(i).toString(16).padStart(4, '0')).join('').toUpperCase();
}

import { XMLParser, XMLValidator } from 'fast-xml-parser';
import svgpath from 'svgpath';
import type { PictureShape } from '#shared/contracts/pictures.contract.ts';
import type { PathStep } from '#shared/artwork/scene.ts';
import { AppError } from '#server/http/app-error.ts';
import { inksOf } from './inks-of-colours.ts';
import { readColour } from './svg-colours.ts';

export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly PictureShape[];
}

/** A drawing larger than this is a photo in disguise. */
const MOST_BYTES = 2 * 1024 * 1024;
const MOST_STEPS = 20_000;
const DEEPEST = 40;
/** The longer side of a stored drawing. */
const SIDE = 1000;

type Node = Readonly<Record<string, unknown>>;
interface Style {
  readonly fill: string;
  readonly stroke: string;
  readonly strokeWidth: number;
  readonly evenOdd: boolean;
}
interface Walk {
  readonly shapes: { style: Style; steps: PathStep[]; transform: string }[];
  readonly classes: ReadonlyMap<string, string>;
  steps: number;
}

/** What cannot become plain paths, with what to do about it. */
const REFUSED: Readonly<Record<string, string>> = {
  script: 'it holds a program. Export the drawing anew, as plain shapes', foreignobject: 'it holds a web page. Export the drawing anew, as plain shapes', image: 'it holds a photo. Send the photo by itself, as PNG or JPEG',
  text: 'it holds live text. Turn the text into outlines first', use: 'it refers to shapes written elsewhere. Expand the symbols first', lineargradient: 'it holds a blend of colours. Use plain colours',
  radialgradient: 'it holds a blend of colours. Use plain colours', pattern: 'it holds a pattern. Expand it into shapes', mask: 'it holds a mask. Release or expand it', clippath: 'it holds a clipping path. Release or expand it', filter: 'it holds an effect. Expand or remove it',
  animate: 'it moves. Export one still picture', animatetransform: 'it moves. Export one still picture', set: 'it moves. Export one still picture', a: 'it holds a link. Remove the link',
};
const SILENT = new Set(['title', 'desc', 'metadata', 'defs', 'style', 'sodipodi:namedview', '#text', '#comment']);
const CONTAINERS = new Set(['svg', 'g']);

/**
 * Reads a drawing into a list of plain paths and forgets the file: nothing of what was sent is
 * ever stored or served. @throws AppError `unsupported-file` naming what is in the way
 */
export async function readSvg(bytes: Buffer): Promise<Drawing> {
  if (bytes.length > MOST_BYTES) throw new AppError('too-large', { message: 'A drawing can have at most 2 MB. Simplify its paths, or send it as PNG.' });
  const text = bytes.toString('utf8');
  // Entities can unfold without end, and reach for other files: a drawing needs none.
  if (/<!DOCTYPE|<!ENTITY/i.test(text)) throw refuse('it carries a document type with it, in which entities can hide. Export it anew as plain SVG');
  if (XMLValidator.validate(text) !== true) throw refuse('it is not whole. Export it anew and send it again');
  const parser = new XMLParser({ preserveOrder: true, ignoreAttributes: false, attributeNamePrefix: '', processEntities: false, parseAttributeValue: false, parseTagValue: false, trimValues: false });
  const nodes = parser.parse(text) as Node[];
  const root = nodes.find((node) => nameOf(node) === 'svg');
  if (!root) throw refuse('it holds no drawing');
  const box = viewBoxOf(attributesOf(root));
  const walk: Walk = { shapes: [], classes: classesOf(root), steps: 0 };
  visit(root, { fill: '#000000', stroke: 'none', strokeWidth: 1, evenOdd: false }, '', walk, 0);
  if (walk.shapes.length === 0) throw refuse('nothing in it would be printed');
  return toDrawing(walk, box);
}

function refuse(why: string): AppError {
  return new AppError('unsupported-file', { message: `This drawing cannot be taken: ${why}.` });
}

function nameOf(node: Node): string {
  return (Object.keys(node).find((key) => key !== ':@') ?? '').toLowerCase();
}
function attributesOf(node: Node): Readonly<Record<string, string>> {
  return (node[':@'] ?? {}) as Readonly<Record<string, string>>;
}
function childrenOf(node: Node): readonly Node[] {
  const key = Object.keys(node).find((one) => one !== ':@');
  const children = key === undefined ? undefined : node[key];
  return Array.isArray(children) ? (children as Node[]) : [];
}

interface ViewBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

function viewBoxOf(attributes: Readonly<Record<string, string>>): ViewBox {
  const figures = (attributes['viewBox'] ?? '').trim().split(/[\s,]+/).map(Number);
  const length = (text: string | undefined): number => (/^\d+(\.\d+)?(px|pt|mm|cm|in)?$/.test(text ?? '') ? Number.parseFloat(text!) : Number.NaN);
  const [x, y, width, height] = figures.length === 4 && figures.every(Number.isFinite) ? (figures as [number, number, number, number]) : [0, 0, length(attributes['width']), length(attributes['height'])];
  if (!(width > 0 && height > 0) || width > 1e7 || height > 1e7) throw refuse('it does not say how large it is. Export it with a view box');
  return { x, y, width, height };
}

/** Rules of simple classes, which drawing programs write: `.a{fill:#084438}`. */
function classesOf(root: Node): ReadonlyMap<string, string> {
  const classes = new Map<string, string>();
  const gather = (node: Node): void => {
    if (nameOf(node) === 'style') {
      const css = childrenOf(node).map((child) => (typeof child['#text'] === 'string' ? child['#text'] : '')).join('');
      if (/@import|url\s*\(/i.test(css)) throw refuse('its styles reach for other files. Export it with its styles written on the shapes');
      for (const [, names, body] of css.matchAll(/([^{}]+)\{([^{}]*)\}/g)) for (const name of names!.split(',')) classes.set(name.trim(), `${classes.get(name.trim()) ?? ''};${body}`);
    }
    childrenOf(node).forEach(gather);
  };
  gather(root);
  return classes;
}

function styleOf(attributes: Readonly<Record<string, string>>, above: Style, classes: ReadonlyMap<string, string>): Style {
  const own: Record<string, string> = {};
  const take = (css: string): void => {
    for (const part of css.split(';')) {
      const at = part.indexOf(':');
      if (at > 0) own[part.slice(0, at).trim().toLowerCase()] = part.slice(at + 1).trim();
    }
  };
  for (const key of ['fill', 'stroke', 'stroke-width', 'fill-rule', 'opacity', 'fill-opacity', 'stroke-opacity', 'display', 'visibility']) if (attributes[key] !== undefined) own[key] = attributes[key];
  for (const name of (attributes['class'] ?? '').split(/\s+/).filter(Boolean)) take(classes.get(`.${name}`) ?? '');
  take(attributes['style'] ?? '');
  for (const key of ['opacity', 'fill-opacity', 'stroke-opacity']) {
    const value = own[key];
    if (value !== undefined && Number.parseFloat(value) !== 1 && value !== '100%') throw refuse('something in it is see-through, which this press file cannot hold. Flatten it first');
  }
  const colour = (value: string | undefined, inherited: string): string => {
    if (value === undefined || value === 'inherit') return inherited;
    const read = readColour(value);
    if (read === null) throw refuse(`the colour “${value.slice(0, 40)}” cannot be read. Use plain colours`);
    return read;
  };
  const isHidden = own['display'] === 'none' || own['visibility'] === 'hidden';
  const width = own['stroke-width'] === undefined ? above.strokeWidth : Number.parseFloat(own['stroke-width']);
  return {
    fill: isHidden ? 'none' : colour(own['fill'], above.fill),
    stroke: isHidden ? 'none' : colour(own['stroke'], above.stroke),
    strokeWidth: Number.isFinite(width) && width >= 0 ? width : above.strokeWidth,
    evenOdd: own['fill-rule'] === undefined ? above.evenOdd : own['fill-rule'] === 'evenodd',
  };
}

function visit(node: Node, above: Style, transforms: string, walk: Walk, depth: number): void {
  const name = nameOf(node);
  if (SILENT.has(name) || name.includes(':') || name.startsWith('?')) return;
  const why = REFUSED[name];
  if (why) throw refuse(why);
  if (depth > DEEPEST) throw refuse('its groups lie deeper in each other than a drawing needs. Ungroup it first');
  const attributes = attributesOf(node);
  for (const [key, value] of Object.entries(attributes)) {
    if (/^on/i.test(key)) throw refuse('it holds a program. Export the drawing anew, as plain shapes');
    if (/url\s*\(/i.test(value)) throw refuse('a shape in it refers to something else: a blend, a mask or an effect. Expand it first');
  }
  const style = styleOf(attributes, above, walk.classes);
  const transform = `${transforms} ${attributes['transform'] ?? ''}`.trim();
  if (CONTAINERS.has(name)) {
    for (const child of childrenOf(node)) visit(child, style, transform, walk, depth + 1);
    return;
  }
  const data = pathOf(name, attributes);
  if (data === null) throw refuse(`it holds “${name.slice(0, 40)}”, which is no shape`);
  if (data === '' || (style.fill === 'none' && style.stroke === 'none')) return;
  const steps = toSteps(data, transform);
  walk.steps += steps.length;
  if (walk.steps > MOST_STEPS) throw refuse('it has more than 20,000 points. Simplify its paths');
  walk.shapes.push({ style, steps, transform });
}

/** The path of a basic shape (SVG 2, chapter 10); `null` for an element that is none. */
function pathOf(name: string, attributes: Readonly<Record<string, string>>): string | null {
  const figure = (key: string): number => {
    const value = Number.parseFloat(attributes[key] ?? '0');
    if (!Number.isFinite(value)) throw refuse('a measure in it cannot be read');
    return value;
  };
  if (name === 'path') return attributes['d'] ?? '';
  if (name === 'line') return `M${figure('x1')} ${figure('y1')}L${figure('x2')} ${figure('y2')}`;
  if (name === 'polyline' || name === 'polygon') {
    const points = (attributes['points'] ?? '').trim();
    if (!/^[\d\s,.eE+-]*$/.test(points)) throw refuse('a measure in it cannot be read');
    return points === '' ? '' : `M${points}${name === 'polygon' ? 'Z' : ''}`;
  }
  if (name === 'rect') {
    const [x, y, w, h] = [figure('x'), figure('y'), figure('width'), figure('height')];
    if (w <= 0 || h <= 0) return '';
    const rx = Math.min(w / 2, attributes['rx'] === undefined ? figure('ry') : figure('rx'));
    const ry = Math.min(h / 2, attributes['ry'] === undefined ? figure('rx') : figure('ry'));
    if (rx <= 0 || ry <= 0) return `M${x} ${y}h${w}v${h}h${-w}Z`;
    const arc = (dx: number, dy: number): string => `a${rx} ${ry} 0 0 1 ${dx} ${dy}`;
    return `M${x + rx} ${y}h${w - 2 * rx}${arc(rx, ry)}v${h - 2 * ry}${arc(-rx, ry)}h${2 * rx - w}${arc(-rx, -ry)}v${2 * ry - h}${arc(rx, -ry)}Z`;
  }
  if (name === 'circle' || name === 'ellipse') {
    const [cx, cy] = [figure('cx'), figure('cy')];
    const [rx, ry] = name === 'circle' ? [figure('r'), figure('r')] : [figure('rx'), figure('ry')];
    return rx <= 0 || ry <= 0 ? '' : `M${cx - rx} ${cy}a${rx} ${ry} 0 1 0 ${2 * rx} 0a${rx} ${ry} 0 1 0 ${-2 * rx} 0Z`;
  }
  return null;
}

/** Moves, lines and cubic curves alone, in the measure of the whole drawing. */
function toSteps(data: string, transform: string): PathStep[] {
  const path = svgpath(data);
  const { err } = path as unknown as { err?: string };
  if (err) throw refuse('the path of a shape cannot be read');
  const steps: PathStep[] = [];
  let [sx, sy] = [0, 0];
  path.transform(transform).abs().unshort().unarc().iterate((segment, _index, x, y) => {
    const [command, ...figures] = segment as unknown as [string, ...number[]];
    if (!figures.every(Number.isFinite)) throw refuse('a measure in it cannot be read');
    if (command === 'M') {
      [sx, sy] = figures as [number, number];
      steps.push(['M', sx, sy]);
    } else if (command === 'L') steps.push(['L', figures[0]!, figures[1]!]);
    else if (command === 'H') steps.push(['L', figures[0]!, y]);
    else if (command === 'V') steps.push(['L', x, figures[0]!]);
    else if (command === 'C') steps.push(['C', ...(figures as [number, number, number, number, number, number])]);
    else if (command === 'Q') {
      const [qx, qy, ex, ey] = figures as [number, number, number, number];
      steps.push(['C', x + (2 / 3) * (qx - x), y + (2 / 3) * (qy - y), ex + (2 / 3) * (qx - ex), ey + (2 / 3) * (qy - ey), ex, ey]);
    } else if (command === 'Z' || command === 'z') steps.push(['Z']);
  });
  return steps;
}

/** How much a transform enlarges, for strokes: the root of its area's change. */
function growthOf(transform: string): number {
  if (transform === '') return 1;
  const at: [number, number][] = [];
  svgpath('M0 0L1 0L0 1').transform(transform).abs().iterate((segment) => {
    const [, x, y] = segment as unknown as [string, number, number];
    at.push([x, y]);
  });
  const [[ox, oy], [ax, ay], [bx, by]] = at as [[number, number], [number, number], [number, number]];
  return Math.sqrt(Math.abs((ax - ox) * (by - oy) - (ay - oy) * (bx - ox)));
}

async function toDrawing({ shapes }: Walk, box: ViewBox): Promise<Drawing> {
  const scale = SIDE / Math.max(box.width, box.height);
  const fit = (figure: number, origin: number): number => Math.round((figure - origin) * scale * 1000) / 1000;
  const place = (steps: readonly PathStep[]): PictureShape['steps'] => steps.map((step) => {
    const [command, ...figures] = step;
    return [command, ...figures.map((figure, i) => fit(figure as number, i % 2 === 0 ? box.x : box.y))] as PictureShape['steps'][number];
  });
  const colours = shapes.flatMap(({ style }) => [style.fill, style.stroke]).filter((colour) => colour !== 'none');
  const inks = await inksOf(colours);
  const ink = (colour: string): Pick<PictureShape, 'cmyk' | 'screen'> => ({ cmyk: [...inks.get(colour)!], screen: colour });
  return {
    width: Math.round(box.width * scale * 1000) / 1000,
    height: Math.round(box.height * scale * 1000) / 1000,
    shapes: shapes.flatMap(({ style, steps, transform }): PictureShape[] => {
      const placed = place(steps);
      const width = style.strokeWidth * growthOf(transform) * scale;
      return [
        ...(style.fill === 'none' ? [] : [{ steps: placed, ...ink(style.fill), ...(style.evenOdd && { evenOdd: true }) }]),
        ...(style.stroke === 'none' || width <= 0 ? [] : [{ steps: placed, ...ink(style.stroke), stroke: Math.round(width * 1000) / 1000 }]),
      ];
    }),
  };
}

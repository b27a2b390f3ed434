/**
 * The scene: a label as positioned shapes, computed once and painted by whoever shows it.
 * Every length is a whole number of micrometres; 0 0 is the upper left corner of the trim,
 * x to the right and y downwards. Nothing in a scene knows of a screen or a page.
 */
export type Micrometres = number;
export type Weight = 300 | 400 | 500 | 600 | 700;
export type Turn = 0 | 90 | 270;

/** C, M, Y, K in whole percent. */
export type Cmyk = readonly [number, number, number, number];

export interface Ink {
  readonly name: string;
  readonly cmyk: Cmyk;
  /** Screen stand-in; the CMYK figures decide. */
  readonly screen: string;
  /** A plate of its own, under this name. */
  readonly spot?: string;
}

export interface Box {
  readonly x: Micrometres;
  readonly y: Micrometres;
  readonly width: Micrometres;
  readonly height: Micrometres;
}

/** M, L, C take end points as in SVG; Z closes. */
export type PathStep =
  | readonly ['M' | 'L', Micrometres, Micrometres]
  | readonly ['C', Micrometres, Micrometres, Micrometres, Micrometres, Micrometres, Micrometres]
  | readonly ['Z'];

/** What an item is for: used by checks, misfits and the studio's inspector. */
export type ElementName =
  | 'ground' | 'brand' | 'name' | 'function' | 'claim' | 'net content' | 'directions' | 'warnings' | 'ingredients'
  | 'responsible person' | 'batch' | 'durability' | 'barcode' | 'rule'
  /** The house's own: words, drawings, a code that leads to an address. */
  | 'own text' | 'drawing' | 'code';

interface Common {
  readonly element: ElementName;
  /** Key into `Scene.inks`. */
  readonly ink: string;
  readonly clip?: Box;
  /** Which thing of the house's own it belongs to. */
  readonly own?: string;
}
export interface Boxes extends Common {
  readonly kind: 'boxes';
  readonly boxes: readonly Box[];
}
export interface Path extends Common {
  readonly kind: 'path';
  readonly steps: readonly PathStep[];
  /** Stroke width; filled when absent. */
  readonly stroke?: Micrometres;
  /** Holes where the path winds an even number of times. */
  readonly evenOdd?: boolean;
}
/** A photo of the house's, whole in its box. */
export interface PictureItem extends Common {
  readonly kind: 'picture';
  readonly picture: string;
  readonly box: Box;
  /** Turned clockwise about its middle. */
  readonly degrees?: number;
}
/** Where one character starts on its base line, and how it stands turned, clockwise. */
export interface Place {
  readonly x: Micrometres;
  readonly y: Micrometres;
  readonly degrees: number;
}
export interface Text extends Common {
  readonly kind: 'text';
  readonly text: string;
  readonly weight: Weight;
  /** The em. */
  readonly size: Micrometres;
  /** Start of the base line. */
  readonly x: Micrometres;
  readonly y: Micrometres;
  /** Clockwise; 90 reads downwards. */
  readonly turn: Turn;
  /** Start of each character in thousandths of the em, kerning included. */
  readonly offsets: readonly number[];
  /** Full advance in thousandths of the em. */
  readonly advance: number;
  /** What readers are told where capitals are only a dress. */
  readonly says?: string;
  /** The place along the sheet that keeps its direction when the sheet is bent; the line's start when absent. */
  readonly about?: Micrometres;
  /** Set where the run leaves the straight line: a place for each character, instead of `turn` and `offsets`. */
  readonly places?: readonly Place[];
}
export type Item = Boxes | Path | Text | PictureItem;

export interface Panel extends Box {
  readonly name: string;
}

export interface Scene {
  readonly trim: { readonly width: Micrometres; readonly height: Micrometres };
  readonly bleed: Micrometres;
  readonly shape: 'cylinder' | 'flat' | 'taper';
  /** Width of the covered and of the covering strip at either end of a wrap. */
  readonly overlap: Micrometres;
  /** Text and symbols stay inside. */
  readonly safe: Box;
  readonly panels: readonly Panel[];
  readonly inks: Readonly<Record<string, Ink>>;
  /** Painted in this order, which is also the order in which text is read. */
  readonly items: readonly Item[];
  readonly dieLine: { readonly ink: Ink; readonly stroke: Micrometres; readonly steps: readonly PathStep[] };
  /** One line for the slug, outside the bleed. */
  readonly legend: string;
  readonly template: string;
}

/** The box of the letters of a text item: cap height above the base line, nothing below. */
export function textBox(item: Text, capHeight: number): Box {
  if (item.places) return boxAround(item.places, Math.ceil((capHeight * item.size) / 1000));
  const length = Math.ceil((item.advance * item.size) / 1000);
  const rise = Math.ceil((capHeight * item.size) / 1000);
  if (item.turn === 0) return { x: item.x, y: item.y - rise, width: length, height: rise };
  if (item.turn === 90) return { x: item.x, y: item.y, width: rise, height: length };
  return { x: item.x - rise, y: item.y - length, width: rise, height: length };
}

/** Room for letters as high and wide as `rise` that stand at these places, whichever way they are turned. */
function boxAround(places: readonly Place[], rise: Micrometres): Box {
  const xs = places.flatMap(({ x, degrees }) => [x, x + rise * Math.cos((degrees * Math.PI) / 180), x + rise * Math.sin((degrees * Math.PI) / 180)]);
  const ys = places.flatMap(({ y, degrees }) => [y, y + rise * Math.sin((degrees * Math.PI) / 180), y - rise * Math.cos((degrees * Math.PI) / 180)]);
  const [x, y] = [Math.floor(Math.min(...xs)), Math.floor(Math.min(...ys))];
  return { x, y, width: Math.ceil(Math.max(...xs)) - x, height: Math.ceil(Math.max(...ys)) - y };
}

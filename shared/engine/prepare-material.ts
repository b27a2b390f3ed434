import type { DocumentMaterial, DocumentShare } from '#shared/contracts/formula-document.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import type { Purpose } from '#shared/law/types.ts';
import { reduce, type Rational } from '#shared/kernel/rational.ts';
import { casNumbers, settleName } from './resolve-name.ts';

/** How a part is present: declared in its own right, hidden inside another entry, or never listed. */
export type Way = 'ingredient' | 'hidden' | 'incidental';

/** Whole-number figures over a material's common denominator, in percent of the material. */
export interface Figures {
  readonly lo: bigint;
  readonly typ: bigint;
  readonly hi: bigint;
}

/** One written line of a composition, or a constituent, with its name settled. */
export interface PreparedPart extends Figures {
  readonly key: string;
  readonly inci: string;
  readonly written: string;
  readonly cas: readonly string[];
  readonly entry?: DictionaryEntry;
  readonly way: Way;
  readonly purpose?: Purpose;
  readonly isNano: boolean;
  readonly usName?: string;
  readonly isConstituent: boolean;
}

/** All lines of one substance in one way: bounds as tight as the sum to 100 % makes them. */
export interface PreparedGroup extends Figures {
  readonly key: string;
  readonly way: Way;
  readonly parts: readonly PreparedPart[];
}

/**
 * `sums`: the parts lie in their ranges and add to 100 %. `scaled`: the ranges cannot add to
 * 100 % but the typicals nearly do. `incomplete`: used as written. `unlisted`: a perfume or
 * aroma whose composition is left out.
 */
export type CompositionState = 'sums' | 'scaled' | 'incomplete' | 'unlisted';

export interface PreparedMaterial {
  readonly material: DocumentMaterial;
  readonly state: CompositionState;
  /** Common denominator of every figure: a figure of `100 × den` is the whole material. */
  readonly den: bigint;
  readonly whole: bigint;
  /** Whether the parts are bound to add to 100 %. */
  readonly isTied: boolean;
  readonly parts: readonly PreparedPart[];
  readonly constituents: readonly PreparedPart[];
  readonly groups: readonly PreparedGroup[];
  /** Sum of the typical shares as written, in percent. */
  readonly typicalSum: Rational;
}

const prepared = new WeakMap<Dictionary, WeakMap<DocumentMaterial, PreparedMaterial>>();

/** A material ready for mixing; remembered for as long as the material object itself lives. */
export function prepareMaterial(material: DocumentMaterial, dictionary: Dictionary): PreparedMaterial {
  let known = prepared.get(dictionary);
  if (!known) prepared.set(dictionary, (known = new WeakMap()));
  let found = known.get(material);
  if (!found) known.set(material, (found = prepare(material, dictionary)));
  return found;
}

function prepare(material: DocumentMaterial, dictionary: Dictionary): PreparedMaterial {
  const shares = material.composition.map(asRange);
  const inside = material.constituents.map(asRange);
  const places = largestPlaces([...shares, ...inside]);
  const composition = settleTypicals(shares.map((share) => toWhole(share, places)), 10n ** BigInt(places));
  const midpoints = settleMidpoints(inside.map((share) => toWhole(share, places)));
  // One denominator for all figures of the material.
  const den = composition.den * 2n;
  const constituentTimes = den / (10n ** BigInt(places)) / 2n;
  const isDeclaredWhole = material.declareAs !== 'ingredients';
  const parts = material.composition.map((line, index): PreparedPart => {
    const name = settleName(dictionary, line.inci, line.cas, line.nano);
    const way: Way = line.role === 'incidental' ? 'incidental' : isDeclaredWhole ? 'hidden' : 'ingredient';
    return {
      key: name.key,
      inci: name.inci,
      written: line.inci,
      cas: casNumbers(line.cas, name.entry),
      way,
      isNano: name.isNano,
      isConstituent: false,
      ...(name.entry && { entry: name.entry }),
      ...(line.purpose && { purpose: line.purpose }),
      ...(line.usName !== undefined && { usName: line.usName }),
      ...times(composition.figures[index]!, 2n),
    };
  });
  const constituents = material.constituents.map((line, index): PreparedPart => {
    const name = settleName(dictionary, line.name, line.cas);
    return {
      key: name.key,
      inci: name.inci,
      written: line.name,
      cas: casNumbers(line.cas, name.entry),
      way: 'hidden',
      isNano: false,
      isConstituent: true,
      ...(name.entry && { entry: name.entry }),
      ...times(midpoints[index]!, constituentTimes),
    };
  });
  const whole = 100n * den;
  const state = parts.length === 0 && isDeclaredWhole ? 'unlisted' : composition.state;
  const isTied = state === 'sums';
  const groups = groupParts(parts, whole, isTied);
  if (isDeclaredWhole) groups.unshift(wholeGroup(material, dictionary, whole));
  for (const part of constituents) groups.push({ key: part.key, way: 'hidden', parts: [part], lo: part.lo, typ: part.typ, hi: part.hi });
  return { material, state, den, whole, isTied, parts, constituents, groups, typicalSum: reduce(composition.typicalSum) };
}

interface Range {
  readonly min: string;
  readonly typical: string | undefined;
  readonly max: string;
}

function asRange(share: DocumentShare): Range {
  if (share.percent !== undefined) return { min: share.percent, typical: share.percent, max: share.percent };
  return { min: share.min ?? '0', typical: share.typical, max: share.max ?? share.min ?? '0' };
}

function placesOf(text: string): number {
  const point = text.indexOf('.');
  return point < 0 ? 0 : text.length - point - 1;
}

function largestPlaces(ranges: readonly Range[]): number {
  let most = 0;
  for (const { min, typical, max } of ranges) {
    for (const text of [min, typical ?? min, max]) {
      const places = placesOf(text);
      if (places > most) most = places;
    }
  }
  return most;
}

interface WholeRange {
  readonly lo: bigint;
  readonly typ: bigint | undefined;
  readonly hi: bigint;
}

/** A decimal text as a whole number of its `places`-th decimals. */
export function scaleText(text: string, places: number): bigint {
  const point = text.indexOf('.');
  if (point < 0) return BigInt(text) * 10n ** BigInt(places);
  return BigInt(text.slice(0, point) + text.slice(point + 1)) * 10n ** BigInt(places - (text.length - point - 1));
}

function toWhole(range: Range, places: number): WholeRange {
  const lo = scaleText(range.min, places);
  if (range.min === range.max) return { lo, typ: lo, hi: lo };
  return { lo, typ: range.typical === undefined ? undefined : scaleText(range.typical, places), hi: scaleText(range.max, places) };
}

interface Settled {
  readonly den: bigint;
  readonly figures: readonly Figures[];
  readonly state: CompositionState;
  readonly typicalSum: Rational;
}

/**
 * Gives every part without a typical `min + λ·(max − min)`, one λ in 0..1 for the material,
 * so that the typicals add to 100 %; then decides whether the composition adds up.
 */
function settleTypicals(ranges: readonly WholeRange[], unit: bigint): Settled {
  const hundred = 100n * unit;
  let least = 0n;
  let most = 0n;
  let base = 0n;
  let span = 0n;
  for (const range of ranges) {
    least += range.lo;
    most += range.hi;
    base += range.typ ?? range.lo;
    if (range.typ === undefined) span += range.hi - range.lo;
  }
  let part = hundred - base;
  if (part < 0n) part = 0n;
  if (part > span) part = span;
  const shrink = span === 0n ? 1n : gcd(part, span);
  const steps = span === 0n ? 1n : span / shrink;
  const step = span === 0n ? 0n : part / shrink;
  const figures = ranges.map(({ lo, typ, hi }): Figures => ({
    lo: lo * steps,
    typ: typ === undefined ? lo * steps + step * (hi - lo) : typ * steps,
    hi: hi * steps,
  }));
  const den = unit * steps;
  const typicalSum = { n: base * steps + step * span, d: den };
  const off = typicalSum.n - 100n * den;
  const isNear = (off < 0n ? -off : off) * 2n <= den;
  if (!isNear) return { den, figures, state: 'incomplete', typicalSum };
  if (least <= hundred && hundred <= most) return { den, figures, state: 'sums', typicalSum };
  // Every figure times 100/Σ typical, over the common denominator Σ typical.
  return { den: den * typicalSum.n, figures: figures.map((one) => times(one, 100n * den)), state: 'scaled', typicalSum };
}

/** Over twice the unit: a constituent without a typical share takes the middle of its range. */
function settleMidpoints(ranges: readonly WholeRange[]): Figures[] {
  return ranges.map(({ lo, typ, hi }) => ({ lo: lo * 2n, typ: typ === undefined ? lo + hi : typ * 2n, hi: hi * 2n }));
}

function times(figures: Figures, factor: bigint): Figures {
  return { lo: figures.lo * factor, typ: figures.typ * factor, hi: figures.hi * factor };
}

export function gcd(a: bigint, b: bigint): bigint {
  let x = a < 0n ? -a : a;
  let y = b < 0n ? -b : b;
  while (y !== 0n) [x, y] = [y, x % y];
  return x === 0n ? 1n : x;
}

/** Parts of one substance in one way, with the bounds that the rest of the sum leaves them. */
function groupParts(parts: readonly PreparedPart[], whole: bigint, isTied: boolean): PreparedGroup[] {
  let least = 0n;
  let most = 0n;
  const byKey = new Map<string, PreparedPart[]>();
  for (const part of parts) {
    least += part.lo;
    most += part.hi;
    const id = `${part.way} ${part.key}`;
    const list = byKey.get(id);
    if (list) list.push(part);
    else byKey.set(id, [part]);
  }
  return [...byKey.values()].map((list): PreparedGroup => {
    const { key, way } = list[0]!;
    let { lo, typ, hi } = list[0]!;
    for (const part of list.slice(1)) {
      lo += part.lo;
      typ += part.typ;
      hi += part.hi;
    }
    if (!isTied) return { key, way, parts: list, lo, typ, hi };
    const forced = whole - (most - hi);
    const room = whole - (least - lo);
    return { key, way, parts: list, lo: forced > lo ? forced : lo, typ, hi: room < hi ? room : hi };
  });
}

/** The one entry under which a perfume or aroma is declared. */
function wholeGroup(material: DocumentMaterial, dictionary: Dictionary, whole: bigint): PreparedGroup {
  const written = material.declareAs === 'aroma' ? 'Aroma' : 'Parfum';
  const name = settleName(dictionary, written);
  const part: PreparedPart = {
    key: name.key, inci: name.inci, written, cas: [], way: 'ingredient', isNano: false, isConstituent: false,
    purpose: 'fragrance', lo: whole, typ: whole, hi: whole, ...(name.entry && { entry: name.entry }),
  };
  return { key: name.key, way: 'ingredient', parts: [part], lo: whole, typ: whole, hi: whole };
}

import type { Micrometres, Weight } from './scene.ts';

/** One weight's facts as the metrics tables hold them, in thousandths of the em. */
export interface FaceTable {
  readonly weight: number;
  readonly capHeight: number;
  readonly xHeight: number;
  readonly roundO: number;
  readonly ascent: number;
  readonly descent: number;
  readonly chars: string;
  readonly advances: readonly number[];
  readonly bearings: readonly number[];
  readonly leftClass: readonly number[];
  readonly rightClass: readonly number[];
  /** Per left class: right class and kern, alternating. */
  readonly kerning: readonly (readonly number[])[];
}

export interface Face {
  readonly weight: Weight;
  readonly capHeight: number;
  readonly xHeight: number;
  readonly descent: number;
  has(char: string): boolean;
  /** Advance of one character. */
  advance(char: string): number;
  /** Distance from the origin to the first ink. */
  bearing(char: string): number;
  kern(left: string, right: string): number;
  /** Start of every character, and the whole advance, kerning included. */
  run(text: string): Run;
}
export interface Run {
  readonly offsets: readonly number[];
  readonly advance: number;
}

export interface FontMetrics {
  face(weight: Weight): Face;
  /** Outline of a capital or figure of the heaviest weight: commands and figures, y upwards. */
  versal(letter: string): readonly (string | number)[] | undefined;
}

/** Keeps the cache of runs small in a process that lives long. */
const RUNS_KEPT = 4000;

/** A face over its table. A character outside the table measures as zero: ask `has` first. */
export function faceOf(table: FaceTable): Face {
  const index = new Map(Array.from(table.chars, (char, i) => [char, i]));
  const kerns = table.kerning.map((row) => {
    const map = new Map<number, number>();
    for (let i = 0; i < row.length; i += 2) map.set(row[i]!, row[i + 1]!);
    return map;
  });
  const runs = new Map<string, Run>();
  const kern = (left: string, right: string): number => {
    const a = index.get(left);
    const b = index.get(right);
    return a === undefined || b === undefined ? 0 : (kerns[table.leftClass[a]!]!.get(table.rightClass[b]!) ?? 0);
  };
  const advance = (char: string): number => table.advances[index.get(char) ?? -1] ?? 0;
  const measure = (text: string): Run => {
    const offsets: number[] = [];
    let at = 0;
    let before = '';
    for (const char of text) {
      if (before) at += kern(before, char);
      offsets.push(at);
      at += advance(char);
      before = char;
    }
    return { offsets, advance: at };
  };
  return {
    weight: table.weight as Weight,
    capHeight: table.capHeight,
    xHeight: table.xHeight,
    descent: table.descent,
    has: (char) => index.has(char),
    advance,
    bearing: (char) => table.bearings[index.get(char) ?? -1] ?? 0,
    kern,
    run: (text) => {
      const known = runs.get(text);
      if (known) return known;
      if (runs.size >= RUNS_KEPT) runs.clear();
      const run = measure(text);
      runs.set(text, run);
      return run;
    },
  };
}

/** Length of text at a size, rounded up so that nothing is ever longer than it was measured. */
export function lengthOf(face: Face, text: string, size: Micrometres): Micrometres {
  return Math.ceil((face.run(text).advance * size) / 1000);
}

/** Largest size at which text fills no more than a width, and at most `most`. */
export function sizeToFill(face: Face, text: string, width: Micrometres, most: Micrometres): Micrometres {
  const { advance } = face.run(text);
  return advance === 0 ? most : Math.min(most, Math.floor((width * 1000) / advance));
}

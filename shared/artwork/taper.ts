import type { Micrometres, PathStep } from './scene.ts';

/**
 * The unrolled wall of a cone: an annular sector. `u` runs along the narrow edge from the left
 * end, `v` down from the upper edge; a column that fits on the narrow edge fits at every depth.
 */
export interface Taper {
  /** Radius of the narrow and of the wide edge, from the cone's apex. */
  readonly narrow: number;
  readonly wide: number;
  /** Whole opening of the sector, in radians, overlap included. */
  readonly angle: number;
  readonly isWideAbove: boolean;
  /** The box around the sector: the trim of the sheet. */
  readonly width: Micrometres;
  readonly height: Micrometres;
}

export interface TaperMeasures {
  readonly top: Micrometres;
  readonly bottom: Micrometres;
  /** Along the wall. */
  readonly slant: Micrometres;
  /** At the wide edge. */
  readonly overlap: Micrometres;
}

/** Diameters closer than this make a cylinder. */
export const LEAST_TAPER: Micrometres = 300;

/**
 * The sector of a cone's label: R = s·D/(D − d), r = R − s, angle = π(D − d)/s + overlap/R;
 * box 2R·sin(angle/2) wide and R − r·cos(angle/2) high (plane geometry of the unrolled cone).
 * The angle must not exceed a half turn.
 */
export function unrollTaper({ top, bottom, slant, overlap }: TaperMeasures): Taper {
  const [large, small] = [Math.max(top, bottom), Math.min(top, bottom)];
  const wide = (slant * large) / (large - small);
  const narrow = wide - slant;
  const angle = (Math.PI * (large - small)) / slant + overlap / wide;
  return {
    narrow, wide, angle, isWideAbove: top > bottom,
    width: Math.round(2 * wide * Math.sin(angle / 2)),
    height: Math.round(wide - narrow * Math.cos(angle / 2)),
  };
}

/** Radius at a depth. */
export function radiusAt({ narrow, wide, isWideAbove }: Taper, v: Micrometres): number {
  return isWideAbove ? wide - v : narrow + v;
}

/** Direction of a place along the narrow edge, in radians from the middle. */
export function directionOf({ narrow, angle }: Taper, u: Micrometres): number {
  return u / narrow - angle / 2;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A point of the sheet, 0 0 at the upper left corner of the box. */
export function pointAt({ narrow, wide, angle, isWideAbove }: Taper, radius: number, direction: number): Point {
  const x = wide * Math.sin(angle / 2) + radius * Math.sin(direction);
  return { x, y: isWideAbove ? wide - radius * Math.cos(direction) : radius * Math.cos(direction) - narrow * Math.cos(angle / 2) };
}

/** How far type stands turned there, in radians, clockwise. */
export function turnAt({ isWideAbove }: Taper, direction: number): number {
  return isWideAbove ? direction : -direction;
}

const whole = ({ x, y }: Point): [Micrometres, Micrometres] => [Math.round(x), Math.round(y)];

/** Curves along an arc, its start left out: each piece turns by at most a sixth of a right angle. */
function arcTo(taper: Taper, radius: number, from: number, to: number): PathStep[] {
  const pieces = Math.max(1, Math.ceil(Math.abs(to - from) / (Math.PI / 12)));
  const part = (to - from) / pieces;
  // Control points of a circular arc: 4/3·tan(δ/4) of the radius along the tangents.
  const reach = (4 / 3) * Math.tan(part / 4) * radius;
  const along = (direction: number, by: number): Point => {
    const { x, y } = pointAt(taper, radius, direction);
    const turn = turnAt(taper, direction);
    return { x: x + by * Math.cos(turn), y: y + by * Math.sin(turn) };
  };
  return Array.from({ length: pieces }, (_, i): PathStep => {
    const [a, b] = [from + i * part, from + (i + 1) * part];
    return ['C', ...whole(along(a, reach)), ...whole(along(b, -reach)), ...whole(pointAt(taper, radius, b))];
  });
}

/** A band of the sector as a closed path: from one direction to another, between two depths. */
export function bandOf(taper: Taper, directions: readonly [number, number], depths: readonly [Micrometres, Micrometres]): PathStep[] {
  const [from, to] = directions;
  const [upper, lower] = [radiusAt(taper, depths[0]), radiusAt(taper, depths[1])];
  return [
    ['M', ...whole(pointAt(taper, upper, from))], ...arcTo(taper, upper, from, to),
    ['L', ...whole(pointAt(taper, lower, to))], ...arcTo(taper, lower, to, from), ['Z'],
  ];
}

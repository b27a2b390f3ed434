import type { Rational } from '#shared/kernel/rational.ts';

/** For drawing only: a position in percent of the width. Nothing is decided on it. */
export function asNumber(value: Rational): number {
  return Number((value.n * 1_000_000n) / value.d) / 1_000_000;
}
/** Where the scale of a composition ends: a little beyond 100, or beyond what is written. */
export function scaleEnd(most: Rational): number {
  const top = asNumber(most);
  return top <= 105 ? 105 : Math.min(405, Math.ceil(top / 20) * 20 + 5);
}
/** Where the scale of constituents ends, with a step of a fifth. */
export function constituentScale(most: number): { end: number; step: number } {
  const step = [0.2, 0.4, 1, 2, 4, 10, 20].find((one) => one * 5 >= most) ?? 20;
  return { end: step * 5, step };
}

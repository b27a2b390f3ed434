import { add, compare, multiply, parseDecimal, rational, type Rational } from '#shared/kernel/rational.ts';
import type { Micrometres } from './scene.ts';

/**
 * π to 50 decimals from both sides. A length of π times a rational is irrational, so it never
 * falls on a half micrometre; when both bounds round alike, the rounding is exact.
 */
const SCALE = 10n ** 50n;
const PI_BELOW = 314159265358979323846264338327950288419716939937510n;
const PI: readonly [Rational, Rational] = [rational(PI_BELOW, SCALE), rational(PI_BELOW + 1n, SCALE)];

function roundHalfUp(value: Rational): bigint {
  const twice = 2n * value.n + value.d;
  const quotient = twice / (2n * value.d);
  return twice < 0n && twice % (2n * value.d) !== 0n ? quotient - 1n : quotient;
}

/** Millimetres as whole micrometres, halves upwards. */
export function micrometresOf(millimetres: Rational): Micrometres {
  return Number(roundHalfUp(multiply(millimetres, rational(1000n))));
}

/** As {@link micrometresOf}, for text; `null` when it is no decimal number. */
export function readMillimetres(text: string): Micrometres | null {
  const value = parseDecimal(text.trim());
  return value && micrometresOf(value);
}

/**
 * π · millimetres + more, as whole micrometres.
 * @throws RangeError when the figure lies closer to a half than π is known.
 */
export function roundLength(millimetres: Rational, more: Rational): Micrometres {
  const [below, above] = PI.map((pi) => roundHalfUp(multiply(add(multiply(pi, millimetres), more), rational(1000n))));
  if (below !== above) throw new RangeError('a length lies too close to half a micrometre to be rounded');
  return Number(below);
}

/** Whether a figure in millimetres lies within bounds given in the same unit. */
export function isWithin(value: Rational, least: string, most: string): boolean {
  return compare(value, parseDecimal(least)!) >= 0 && compare(value, parseDecimal(most)!) <= 0;
}

/** Micrometres as millimetres for people: at most two decimals, rounded up so that "needs" is enough. */
export function inMillimetres(length: Micrometres): string {
  const hundredths = Math.ceil(length / 10);
  return String(hundredths / 100);
}

/** Micrometres as millimetres, exactly. */
export function exactMillimetres(length: Micrometres): string {
  return String(length / 1000);
}

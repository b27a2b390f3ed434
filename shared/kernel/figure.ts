import { toDecimal, type Rational } from './rational.ts';

/**
 * A whole number. Where every sum and product in sight is proved to stay below 2^53 it is a
 * double, which holds such numbers exactly; otherwise a BigInt. The two compare exactly with
 * `<` and `>`, also with one another; arithmetic never mixes them.
 */
export type Figure = number | bigint;

/** The first whole number whose neighbours a double cannot tell apart. */
export const SAFE_BELOW = 2n ** 53n;

/** The same whole number as a double. @throws RangeError from 2^53 on, where doubles have gaps. */
export function toSafe(value: bigint): number {
  if (value >= SAFE_BELOW || value <= -SAFE_BELOW) throw new RangeError(`${value} cannot be held exactly`);
  return parseInt(value.toString(), 10);
}

export function toBig(figure: Figure): bigint {
  return typeof figure === 'bigint' ? figure : BigInt(figure);
}

export function toRational(n: Figure, d: Figure): Rational {
  return { n: toBig(n), d: toBig(d) };
}

/** Largest denominator for which twelve digits can be divided out in two steps of six: 10^6 × it stays below 2^53. */
const SIX_DIGITS = 9_000_000_000;
const TWO_DIGITS = 90_000_000_000_000;

/** The quotient `n / d` (d above 0) as decimal text of at most 12 places, exactly as `toDecimal` writes it. */
export function figureToDecimal(n: Figure, d: Figure): string {
  if (typeof n === 'bigint' || typeof d === 'bigint' || d > TWO_DIGITS) return toDecimal(toRational(n, d));
  if (n < 0) return toDecimal(toRational(n, d));
  let rest = n % d;
  let whole = (n - rest) / d;
  if (rest === 0) return `${whole}`;
  const step = d <= SIX_DIGITS ? 1_000_000 : 100;
  let digits = '';
  let left = 12;
  const width = d <= SIX_DIGITS ? 6 : 2;
  while (left > 0 && rest !== 0) {
    const scaled = rest * step;
    rest = scaled % d;
    digits += `${(scaled - rest) / d}`.padStart(width, '0');
    left -= width;
  }
  // Half-even at the twelfth place.
  const twice = rest * 2;
  if (twice > d || (twice === d && isOdd(digits))) {
    const raised = raise(digits);
    if (raised === undefined) {
      whole += 1;
      digits = '';
    } else digits = raised;
  }
  let end = digits.length;
  while (end > 0 && digits.charCodeAt(end - 1) === 48) end -= 1;
  return end === 0 ? `${whole}` : `${whole}.${digits.slice(0, end)}`;
}

function isOdd(digits: string): boolean {
  return digits.charCodeAt(digits.length - 1) % 2 === 1;
}

/** One more in the last place; `undefined` where it carries over the point. */
function raise(digits: string): string | undefined {
  let at = digits.length - 1;
  while (at >= 0 && digits.charCodeAt(at) === 57) at -= 1;
  if (at < 0) return undefined;
  return digits.slice(0, at) + String.fromCharCode(digits.charCodeAt(at) + 1) + '0'.repeat(digits.length - 1 - at);
}

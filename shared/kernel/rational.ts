/**
 * Exact rational numbers: a BigInt numerator over a positive BigInt denominator.
 *
 * Why our own and not fraction.js: the engine adds hundreds of shares per keystroke and
 * fraction.js reduces by a greatest common divisor after every step, which is most of its
 * cost. Here nothing is reduced until a value is printed; equality and order never need it.
 */
export interface Rational {
  readonly n: bigint;
  /** Always positive. */
  readonly d: bigint;
}

export const ZERO: Rational = { n: 0n, d: 1n };
export const ONE: Rational = { n: 1n, d: 1n };
export const HUNDRED: Rational = { n: 100n, d: 1n };

/** The scale of printed figures, worked out once. */
const TEN_TO_12 = 1_000_000_000_000n;
const DECIMAL = /^([+-]?)(\d+)(?:\.(\d+))?$/;

/** The rational `n / d`. @throws RangeError when `d` is zero. */
export function rational(n: bigint, d: bigint = 1n): Rational {
  if (d === 0n) throw new RangeError('a rational number cannot have a zero denominator');
  return d < 0n ? { n: -n, d: -d } : { n, d };
}

/** Reads a plain decimal such as `43.25`; `null` when the text is anything else (no exponents, no spaces). */
export function parseDecimal(text: string): Rational | null {
  const match = DECIMAL.exec(text);
  if (!match) return null;
  const fraction = match[3] ?? '';
  const digits = BigInt(match[2]! + fraction);
  return { n: match[1] === '-' ? -digits : digits, d: 10n ** BigInt(fraction.length) };
}

/** As {@link parseDecimal}, for text known to be a decimal. @throws RangeError naming the text. */
export function decimal(text: string): Rational {
  const value = parseDecimal(text);
  if (!value) throw new RangeError(`"${text}" is not a decimal number`);
  return value;
}

export function add(a: Rational, b: Rational): Rational {
  return a.d === b.d ? { n: a.n + b.n, d: a.d } : { n: a.n * b.d + b.n * a.d, d: a.d * b.d };
}
export function subtract(a: Rational, b: Rational): Rational {
  return a.d === b.d ? { n: a.n - b.n, d: a.d } : { n: a.n * b.d - b.n * a.d, d: a.d * b.d };
}
export function multiply(a: Rational, b: Rational): Rational {
  return { n: a.n * b.n, d: a.d * b.d };
}
/** @throws RangeError when `b` is zero. */
export function divide(a: Rational, b: Rational): Rational {
  return rational(a.n * b.d, a.d * b.n);
}
/** Negative, zero or positive as `a` is less than, equal to or greater than `b`. */
export function compare(a: Rational, b: Rational): -1 | 0 | 1 {
  if (a.d === b.d) return a.n < b.n ? -1 : a.n > b.n ? 1 : 0;
  const left = a.n * b.d;
  const right = b.n * a.d;
  return left < right ? -1 : left > right ? 1 : 0;
}
export function isZero(a: Rational): boolean {
  return a.n === 0n;
}
export function smaller(a: Rational, b: Rational): Rational {
  return compare(a, b) <= 0 ? a : b;
}
export function larger(a: Rational, b: Rational): Rational {
  return compare(a, b) >= 0 ? a : b;
}
export function sum(values: Iterable<Rational>): Rational {
  let total = ZERO;
  for (const value of values) total = add(total, value);
  return total;
}

/** Lowest terms. */
export function reduce(a: Rational): Rational {
  let x = a.n < 0n ? -a.n : a.n;
  let y = a.d;
  while (y !== 0n) [x, y] = [y, x % y];
  return x === 0n ? ZERO : { n: a.n / x, d: a.d / x };
}

/**
 * Decimal text, exact where it ends within `places` decimals, otherwise rounded half-even
 * to `places`; never trailing zeros, never an exponent, never `-0`.
 */
export function toDecimal(a: Rational, places = 12): string {
  const scale = places === 12 ? TEN_TO_12 : 10n ** BigInt(places);
  const negative = a.n < 0n;
  const scaled = (negative ? -a.n : a.n) * scale;
  let quotient = scaled / a.d;
  const twice = (scaled - quotient * a.d) * 2n;
  if (twice > a.d || (twice === a.d && quotient % 2n === 1n)) quotient += 1n;
  if (quotient === 0n) return '0';
  const digits = quotient.toString().padStart(places + 1, '0');
  const point = digits.length - places;
  let end = digits.length;
  while (end > point && digits[end - 1] === '0') end -= 1;
  const whole = digits.slice(0, point);
  const fraction = digits.slice(point, end);
  return (negative ? '-' : '') + (fraction ? `${whole}.${fraction}` : whole);
}

/** Beyond this two figures that differ are called so in words. */
const MOST_PLACES = 60;

/**
 * As {@link toDecimal}, with as many places more as it takes to tell the figure from `other`: a
 * share a hair above its limit never reads as the limit itself. Equal figures stay as they are.
 */
export function toDecimalApart(a: Rational, other: Rational, places = 12): string {
  const text = toDecimal(a, places);
  if (compare(a, other) === 0 || text !== toDecimal(other, places)) return text;
  for (let more = places + 1; more <= MOST_PLACES; more += 1) {
    const longer = toDecimal(a, more);
    if (longer !== toDecimal(other, more)) return longer;
  }
  return compare(a, other) > 0 ? `just over ${text}` : `just under ${text}`;
}

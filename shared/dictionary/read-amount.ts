import { parseDecimal } from '#shared/kernel/rational.ts';

/** A share as a supplier writes it: one value or a range, in percent, as exact decimals with a point. */
export type WrittenShare =
  | { readonly percent: string }
  | { readonly min: string; readonly max: string };

const NUMBER = '\\d+(?:[.,\\s\\u00a0\'’]\\d+)*|[.,]\\d+';
const RANGE = new RegExp(`^(${NUMBER})\\s*%?\\s*(?:-|–|—|−|to|bis|à|\\.\\.\\.?|…)\\s*(${NUMBER})\\s*%?$`, 'i');
const BOUND = new RegExp(`^(<=|≤|=<|<|>=|≥|=>|>|max\\.?|min\\.?|up to|at least|at most|bis zu|less than|more than|ca\\.?|approx\\.?|about|~|±)\\s*(${NUMBER})\\s*%?$`, 'i');
const BETWEEN = new RegExp(`^(?:>=|≥|>)\\s*(${NUMBER})\\s*%?\\s*(?:-|–|—|,|;|and|to)?\\s*(?:<=|≤|<)\\s*(${NUMBER})\\s*%?$`, 'i');
const SINGLE = new RegExp(`^(${NUMBER})\\s*%?$`);

/**
 * Reads `25`, `25,5 %`, `25-38`, `25 – 38 %`, `<1`, `≤ 5`, `≥ 60`, `>= 1 - < 5`, `max. 2`.
 * A bound that stands alone is closed with 0 or 100; strict signs count as closed, because a
 * supplier's `<` leaves no measurable gap. `undefined` for anything else.
 */
export function readShare(text: string): WrittenShare | undefined {
  const cell = text.trim();
  const single = SINGLE.exec(cell);
  if (single) return wrap(readNumber(single[1]!));
  const range = RANGE.exec(cell) ?? BETWEEN.exec(cell);
  if (range) {
    const [min, max] = [readNumber(range[1]!), readNumber(range[2]!)];
    return min !== undefined && max !== undefined ? { min, max } : undefined;
  }
  const bound = BOUND.exec(cell);
  if (!bound) return undefined;
  const value = readNumber(bound[2]!);
  if (value === undefined) return undefined;
  const sign = bound[1]!.toLowerCase();
  if (/^(<|≤|=<|max|up|at most|bis|less)/.test(sign)) return { min: '0', max: value };
  if (/^(>|≥|=>|min|at least|more)/.test(sign)) return { min: value, max: '100' };
  return { percent: value };
}

function wrap(percent: string | undefined): WrittenShare | undefined {
  return percent === undefined ? undefined : { percent };
}

/**
 * A number with a comma or a point as the decimal mark, and spaces, apostrophes or the other
 * mark between thousands, as a decimal with a point; `undefined` where it can be read two ways
 * or not at all. `1,234` with exactly three digits behind a comma stands for 1.234: shares and
 * grams of a formula are small, and a thousand grams is seldom written with a comma.
 */
export function readNumber(text: string): string | undefined {
  let digits = text.trim().replace(/[\s\u00a0'’]/g, '');
  const comma = digits.lastIndexOf(',');
  const point = digits.lastIndexOf('.');
  if (comma >= 0 && point >= 0) {
    const [thousands, mark] = comma > point ? [/\./g, ','] : [/,/g, '.'];
    digits = digits.replace(thousands, '').replace(mark, '.');
  } else if (comma >= 0) {
    digits = digits.indexOf(',') === comma ? digits.replace(',', '.') : groups(digits, ',');
  } else if (point >= 0 && digits.indexOf('.') !== point) {
    digits = groups(digits, '.');
  }
  if (digits.startsWith('.')) digits = `0${digits}`;
  if (digits.endsWith('.')) digits = digits.slice(0, -1);
  if (!/^\d/.test(digits) || parseDecimal(digits) === null) return undefined;
  return digits.replace(/^0+(?=\d)/, '');
}

/** `1,234,567`: marks between thousands only. */
function groups(digits: string, mark: string): string {
  const parts = digits.split(mark);
  return parts.slice(1).every((part) => part.length === 3) ? parts.join('') : 'not a number';
}

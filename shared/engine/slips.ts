import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { parseDecimal, toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Suspect } from './types.ts';
import { weighLines, type WeighedLines } from './weigh-lines.ts';

/** How a formula fails to add up. */
export type Gap =
  | { readonly kind: 'made-up' }
  | { readonly kind: 'grams' | 'percent'; readonly measured: Rational; readonly target: Rational; readonly tolerance: Rational };

/**
 * The gap between the lines and the batch, or `undefined` where they agree: grams within
 * 0.1 % of a given batch size, percents within 0.01 of 100, a making-up line not negative.
 */
export function gapOf(document: FormulaDocument, weighed: WeighedLines): Gap | undefined {
  if (weighed.madeUp !== undefined) return weighed.madeUp < 0n ? { kind: 'made-up' } : undefined;
  const { lines } = document.formula;
  if (lines.every((line) => line.unit === '%')) {
    // Masses are shares of the batch: back to percent, so that 0.01 is 0.01.
    const off = weighed.total * 100n - 100n * weighed.batch;
    if (absolute(off) * 100n <= weighed.batch) return undefined;
    return { kind: 'percent', measured: { n: weighed.total * 100n, d: weighed.batch }, target: { n: 100n, d: 1n }, tolerance: { n: 1n, d: 100n } };
  }
  if (!weighed.hasBatchSize) return undefined;
  const off = weighed.total - weighed.batch;
  if (absolute(off) * 1000n <= weighed.batch) return undefined;
  return { kind: 'grams', measured: { n: weighed.total, d: weighed.den }, target: { n: weighed.batch, d: weighed.den }, tolerance: { n: weighed.batch, d: weighed.den * 1000n } };
}

function absolute(value: bigint): bigint {
  return value < 0n ? -value : value;
}

/** More lines than any kitchen formula has: there the search for one slip says nothing. */
const MOST_LINES = 500;

/**
 * Amounts that would close the gap if two neighbouring digits had been exchanged, or the
 * decimal point shifted by one place, when the line was written.
 */
export function findSuspects(document: FormulaDocument, weighed: WeighedLines): Suspect[] {
  const { lines } = document.formula;
  if (lines.length > MOST_LINES) return [];
  const amounts = lines.map((line) => line.amount);
  return lines.flatMap((line, index) => {
    if (line.unit === 'qs') return [];
    return slipsOf(line.amount)
      .filter(({ perhaps }) => closesGap(document, weighed, amounts, index, perhaps))
      .map(({ perhaps, slip }): Suspect => ({ line: index, written: line.amount, perhaps, slip }));
  });
}

function closesGap(document: FormulaDocument, weighed: WeighedLines, amounts: readonly string[], index: number, perhaps: string): boolean {
  const corrected = [...amounts];
  corrected[index] = perhaps;
  const again = weighLines(document, corrected);
  return again.total > 0n && gapOf(document, again) === undefined && weighed.total !== 0n;
}

/** Every amount one slip away from what is written; a decimal point does not part neighbours. */
export function slipsOf(written: string): { perhaps: string; slip: Suspect['slip'] }[] {
  const value = parseDecimal(written);
  if (!value) return [];
  const plain = toDecimal(value, 62);
  const shifted = [toDecimal({ n: value.n * 10n, d: value.d }, 62), toDecimal({ n: value.n, d: value.d * 10n }, 62)];
  const exchanged = new Set<string>();
  for (let left = 0; left < written.length - 1; left += 1) {
    const isAcross = written[left + 1] === '.';
    const right = isAcross ? left + 2 : left + 1;
    const [a, b] = [written[left], written[right]];
    if (a === undefined || b === undefined || a === '.' || a === b) continue;
    const text = written.slice(0, left) + b + written.slice(left + 1, right) + a + written.slice(right + 1);
    const perhaps = toDecimal(parseDecimal(text)!, 62);
    // "0.5" written for "5.0" is told once, as a shifted point.
    if (!isAcross || !shifted.includes(perhaps)) exchanged.add(perhaps);
  }
  return [
    ...[...exchanged].map((perhaps) => ({ perhaps, slip: 'digits-exchanged' as const })),
    ...shifted.map((perhaps) => ({ perhaps, slip: 'point-shifted' as const })),
  ].filter(({ perhaps }) => perhaps !== plain);
}

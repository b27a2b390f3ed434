import type { Market } from '#shared/law/types.ts';
import { compare, decimal, divide, multiply, parseDecimal, rational, toDecimal, type Rational } from '#shared/kernel/rational.ts';

/** Exact factors: NIST Handbook 44, Appendix C. */
const ML_PER_FL_OZ = decimal('29.5735295625');
const G_PER_OZ = decimal('28.349523125');

/** Cut, never rounded up, to three significant figures and two decimals: a content is never overstated. */
function cutDown(value: Rational): string {
  const hundredths = (value.n * 100n) / value.d;
  const digits = hundredths.toString();
  const kept = digits.length <= 3 ? hundredths : (hundredths / 10n ** BigInt(digits.length - 3)) * 10n ** BigInt(digits.length - 3);
  return toDecimal(rational(kept, 100n));
}

/** The parts of a net content statement; where it must be broken, it is between parts. */
export interface NetStatement {
  readonly parts: readonly string[];
  /** Whole g or ml, rounded up: the row of the height table. */
  readonly quantity: bigint;
  /** Whether the ℮ may stand beside it: 5 g or ml up to 10 kg or l (Directive 76/211/EEC, art. 1). */
  readonly mayCarryEMark: boolean;
}

function metricText(value: Rational, unit: 'g' | 'ml', market: Market): string {
  const large = market === 'CA' && compare(value, rational(1000n)) >= 0;
  if (!large) return `${toDecimal(value)} ${unit}`;
  return `${toDecimal(divide(value, rational(1000n)))} ${unit === 'g' ? 'kg' : 'L'}`;
}

/**
 * The net content as a market prints it: metric everywhere, in the US customary units first
 * (15 USC 1453, both systems), in Canada litres and kilograms from 1000 up.
 * `null` when the value is no positive number.
 */
export function netStatement(content: { readonly value: string; readonly unit: 'g' | 'ml' }, market: Market): NetStatement | null {
  const value = parseDecimal(content.value);
  if (!value || value.n <= 0n) return null;
  const metric = metricText(value, content.unit, market);
  const quantity = (value.n + value.d - 1n) / value.d;
  const mayCarryEMark = compare(value, rational(5n)) >= 0 && compare(value, rational(10_000n)) <= 0;
  if (market !== 'US') return { parts: [metric], quantity, mayCarryEMark };
  const customary = content.unit === 'ml'
    ? `${cutDown(divide(value, ML_PER_FL_OZ))} fl oz`
    : `Net Wt ${cutDown(divide(value, G_PER_OZ))} oz`;
  return { parts: [customary, `(${metric})`], quantity, mayCarryEMark };
}

/** Ounces as printed, back in g or ml: for the check that nothing is overstated. */
export function customaryInMetric(figure: string, unit: 'g' | 'ml'): Rational {
  return multiply(decimal(figure), unit === 'ml' ? ML_PER_FL_OZ : G_PER_OZ);
}

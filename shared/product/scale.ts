import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { divide, HUNDRED, multiply, parseDecimal, toDecimal, type Rational } from '#shared/kernel/rational.ts';

/** Places kept where a converted amount does not end: far below what a scale shows. */
const PLACES = 12;

/** Grams as percent of a batch; `null` where a figure is missing or the batch is 0. */
export function gramsToPercent(grams: string, batch: string): string | null {
  const mass = parseDecimal(grams);
  const whole = parseDecimal(batch);
  if (!mass || !whole || whole.n === 0n) return null;
  return toDecimal(divide(multiply(mass, HUNDRED), whole), PLACES);
}

/** Percent of a batch as grams; `null` where a figure is missing. */
export function percentToGrams(percent: string, batch: string): string | null {
  const share = parseDecimal(percent);
  const whole = parseDecimal(batch);
  if (!share || !whole) return null;
  return toDecimal(divide(multiply(share, whole), HUNDRED), PLACES);
}

/**
 * The formula at another batch size in grams: gram lines in proportion, percent and
 * making-up lines as they are. Without a batch size the sum of the gram lines counts as one.
 * `null` where the new size is no figure over 0, or nothing is there to scale from.
 */
export function scaleBatch(formula: ProductDraft['formula'], size: string): ProductDraft['formula'] | null {
  const target = parseDecimal(size);
  const from = formula.batchSize ? parseDecimal(formula.batchSize.value) : sumOfGrams(formula);
  if (!target || target.n <= 0n || !from || from.n <= 0n) return null;
  const factor = divide(target, from);
  return {
    batchSize: { value: size, unit: 'g' },
    phases: formula.phases.map((phase) => ({
      ...phase,
      lines: phase.lines.map((line) => {
        const amount = line.unit === 'g' ? parseDecimal(line.amount) : null;
        return amount ? { ...line, amount: toDecimal(multiply(amount, factor), PLACES) } : line;
      }),
    })),
  };
}

function sumOfGrams(formula: ProductDraft['formula']): Rational {
  let total: Rational = { n: 0n, d: 1n };
  for (const line of formula.phases.flatMap((phase) => phase.lines)) {
    const amount = line.unit === 'g' ? parseDecimal(line.amount) : null;
    if (amount) total = { n: total.n * amount.d + amount.n * total.d, d: total.d * amount.d };
  }
  return total;
}

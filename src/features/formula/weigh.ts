import { add, compare, decimal, divide, HUNDRED, multiply, parseDecimal, subtract, sum, toDecimal, ZERO, type Rational } from '#shared/kernel/rational.ts';
import type { FormulaLine, ProductDraft } from '#shared/contracts/product-draft.ts';

type Formula = ProductDraft['formula'];

/** A line with both its figures. Percent is of the batch, or of the sum where no batch size is set. */
export interface WeighedLine {
  readonly line: FormulaLine;
  /** Position over all phases: the engine's line number. */
  readonly index: number;
  readonly mass: Rational;
  readonly percent: Rational;
  readonly grams: string;
  readonly share: string;
}

export interface WeighedFormula {
  readonly lines: ReadonlyMap<string, WeighedLine>;
  readonly phases: readonly { readonly id: string; readonly grams: Rational; readonly percent: Rational }[];
  readonly total: Rational;
  /** What percent refers to. */
  readonly base: Rational;
  readonly batch: Rational | null;
  readonly makesUp: WeighedLine | null;
  /** Mass beyond the batch (positive) or missing from it (negative); `null` without a batch to compare with. */
  readonly over: Rational | null;
  readonly isOff: boolean;
}

/** Places shown for a figure that does not end; the figure itself stays exact. */
const PLACES = 6;
const THOUSANDTH = decimal('0.001');
const HUNDREDTH = decimal('0.01');

function amountOf(line: FormulaLine): Rational {
  return (line.amount === '' ? null : parseDecimal(line.amount)) ?? ZERO;
}

function absolute(a: Rational): Rational {
  return a.n < 0n ? { n: -a.n, d: a.d } : a;
}

/** Whether the sum is off by more than the law of the grid allows: 0.1 % of the batch, or 0.01 where all is percent. */
function sumIsOff(lines: readonly FormulaLine[], over: Rational | null, batch: Rational | null): boolean {
  if (over === null) return false;
  if (lines.some((line) => line.unit === 'qs')) return over.n > 0n;
  const allPercent = lines.every((line) => line.unit === '%');
  if (allPercent) {
    const base = batch ?? HUNDRED;
    return compare(multiply(absolute(over), HUNDRED), multiply(HUNDREDTH, base)) > 0;
  }
  return batch !== null && compare(absolute(over), multiply(batch, THOUSANDTH)) > 0;
}

/** Both figures of every line, the phase sums and the total, exactly. */
export function weighFormula(formula: Formula): WeighedFormula {
  const written = formula.phases.flatMap((phase) => phase.lines);
  const batch = formula.batchSize ? parseDecimal(formula.batchSize.value) : null;
  const usable = batch && batch.n > 0n ? batch : null;
  const qs = written.find((line) => line.unit === 'qs');
  const percentBase = usable ?? HUNDRED;
  const massOf = (line: FormulaLine) => (line.unit === '%' ? divide(multiply(amountOf(line), percentBase), HUNDRED) : amountOf(line));
  const fixed = sum(written.filter((line) => line.unit !== 'qs').map(massOf));
  const target = usable ?? (qs || (written.length > 0 && written.every((line) => line.unit === '%')) ? percentBase : null);
  const rest = target ? subtract(target, fixed) : ZERO;
  const makeUp = qs && rest.n > 0n ? rest : ZERO;
  const total = add(fixed, qs ? makeUp : ZERO);
  const base = target ?? total;

  const lines = new Map<string, WeighedLine>();
  let makesUp: WeighedLine | null = null;
  written.forEach((line, index) => {
    const mass = line.unit === 'qs' ? makeUp : massOf(line);
    const percent = base.n > 0n ? divide(multiply(mass, HUNDRED), base) : ZERO;
    const isBlank = line.unit !== 'qs' && line.amount === '';
    const weighed: WeighedLine = {
      line,
      index,
      mass,
      percent,
      grams: isBlank ? '' : line.unit === 'g' ? line.amount : toDecimal(mass, PLACES),
      share: isBlank ? '' : line.unit === '%' ? line.amount : toDecimal(percent, PLACES),
    };
    lines.set(line.id, weighed);
    if (line.unit === 'qs') makesUp = weighed;
  });
  const over = target ? subtract(qs ? fixed : total, target) : null;
  const phases = formula.phases.map((phase) => {
    const grams = sum(phase.lines.map((line) => lines.get(line.id)!.mass));
    return { id: phase.id, grams, percent: base.n > 0n ? divide(multiply(grams, HUNDRED), base) : ZERO };
  });
  return {
    lines,
    phases,
    total,
    base,
    batch: usable,
    makesUp,
    over: qs && over && over.n <= 0n ? null : over,
    isOff: sumIsOff(written, over, usable),
  };
}

/**
 * Whether a percent that came with a pasted sheet contradicts the grams: it differs by more
 * than its own last written place can hide.
 */
export function contradictsPasted(weighed: WeighedLine): boolean {
  const pasted = weighed.line.pastedPercent;
  if (pasted === undefined || weighed.line.unit !== 'g' || weighed.line.amount === '') return false;
  const value = parseDecimal(pasted);
  if (!value) return false;
  const places = pasted.split('.')[1]?.length ?? 0;
  const half: Rational = { n: 1n, d: 2n * 10n ** BigInt(places) };
  return compare(absolute(subtract(weighed.percent, value)), half) > 0;
}

/** How a pasted percent misses the grams: a point one place off, two digits exchanged, or neither. */
export function slipOfPasted(weighed: WeighedLine): 'point-right' | 'point-left' | 'other' {
  const value = parseDecimal(weighed.line.pastedPercent ?? '');
  if (!value) return 'other';
  const ten: Rational = { n: 10n, d: 1n };
  if (compare(value, multiply(weighed.percent, ten)) === 0) return 'point-right';
  if (compare(multiply(value, ten), weighed.percent) === 0) return 'point-left';
  return 'other';
}

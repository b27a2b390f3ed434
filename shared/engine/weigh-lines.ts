import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import { scaleText } from './prepare-material.ts';

/** What the formula's lines weigh, as whole numbers over one denominator. */
export interface WeighedLines {
  /** Masses are `mass / den` grams. */
  readonly den: bigint;
  readonly masses: readonly bigint[];
  readonly total: bigint;
  /** The batch that `%` and `qs` refer to. */
  readonly batch: bigint;
  readonly hasBatchSize: boolean;
  /** What the making-up line would have to be; absent where there is none. */
  readonly madeUp?: bigint;
}

/** Weighs the lines: `%` lines as shares of the batch (of 100 where none is given), `qs` as what is left. */
export function weighLines(document: FormulaDocument, amounts?: readonly string[]): WeighedLines {
  const { batchSize, lines } = document.formula;
  const texts = amounts ?? lines.map((line) => line.amount);
  let amountPlaces = 0;
  for (const text of texts) {
    const point = text.indexOf('.');
    const places = point < 0 ? 0 : text.length - point - 1;
    if (places > amountPlaces) amountPlaces = places;
  }
  const batchText = batchSize ?? '100';
  const batchPoint = batchText.indexOf('.');
  const batchPlaces = batchPoint < 0 ? 0 : batchText.length - batchPoint - 1;
  const hasPercent = lines.some((line) => line.unit === '%');
  // A percentage of the batch needs the places of both figures and two more.
  const places = amountPlaces + batchPlaces + (hasPercent ? 2 : 0);
  const batch = scaleText(batchText, places);
  const percentUnit = scaleText(batchText, batchPlaces);
  let sum = 0n;
  const masses = lines.map((line, index) => {
    if (line.unit === 'qs') return 0n;
    const text = texts[index]!;
    const mass = line.unit === 'g' ? scaleText(text, places) : scaleText(text, amountPlaces) * percentUnit;
    sum += mass;
    return mass;
  });
  const makesUp = lines.findIndex((line) => line.unit === 'qs');
  const madeUp = makesUp < 0 ? undefined : batch - sum;
  if (madeUp !== undefined && madeUp > 0n) {
    masses[makesUp] = madeUp;
    sum += madeUp;
  }
  return { den: 10n ** BigInt(places), masses, total: sum, batch, hasBatchSize: batchSize !== undefined, ...(madeUp !== undefined && { madeUp }) };
}

/** Total mass in grams. */
export function totalMass(weighed: WeighedLines): Rational {
  return { n: weighed.total, d: weighed.den };
}

/** The same lines with one at another share of the sum (in percent), all others in proportion. */
export function withShare(weighed: WeighedLines, line: number, share: Rational): WeighedLines {
  const others = weighed.total - weighed.masses[line]!;
  const rest = 100n * share.d - share.n;
  const masses = weighed.masses.map((mass, index) => (index === line ? share.n * others : mass * rest));
  return { ...weighed, masses, total: 100n * share.d * others };
}

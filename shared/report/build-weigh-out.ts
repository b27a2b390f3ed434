import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { weighLines } from '#shared/engine/weigh-lines.ts';
import { compare, decimal, divide, multiply, subtract, sum, toDecimal, add, larger, type Rational } from '#shared/kernel/rational.ts';
import type { WeighOutModel } from './report-model.ts';

export interface WeighOutInput {
  readonly house: string;
  readonly document: FormulaDocument;
  /** Steps by phase name, in order; temperatures as they are printed. */
  readonly steps: Readonly<Record<string, readonly { readonly text: string; readonly temperature: string; readonly unit: 'C' | 'F' | null }[]>>;
  /** What to mind with a material, by material id. */
  readonly handling: Readonly<Record<string, string>>;
  /** Another batch size in grams; absent = as the formula stands. */
  readonly batchGrams?: Rational;
  readonly dataRelease: string;
}

/** House limit of weighing: 1 % of the target, never less than two digits of a 0.01 g scale (common practice, no source). */
const RELATIVE = decimal('0.01');
const LEAST = decimal('0.02');
const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** Text with at least two decimals, three where a 0.01 g scale would lose part of the figure. */
function grams(value: Rational): string {
  const [whole, fraction = ''] = toDecimal(value, 3).split('.');
  return `${whole}.${fraction.padEnd(2, '0')}`;
}

/** Rounded to 0.01 g towards the target, so that both limits stay inside the tolerance. */
function limit(value: Rational, direction: 'up' | 'down'): string {
  const scaled = value.n * 100n;
  const whole = scaled / value.d;
  const rounded = direction === 'up' && scaled % value.d !== 0n ? whole + 1n : whole;
  return grams({ n: rounded, d: 100n });
}

/** The batch sheet of one formula as plain data. */
export function buildWeighOut(input: WeighOutInput): WeighOutModel {
  const { document } = input;
  const weighed = weighLines(document);
  const total: Rational = { n: weighed.total, d: weighed.den };
  const factor = input.batchGrams && weighed.total > 0n ? divide(input.batchGrams, total) : decimal('1');
  const materials = new Map(document.materials.map((material) => [material.id, material]));
  const masses = weighed.masses.map((mass) => multiply({ n: mass, d: weighed.den }, factor));
  const order = [...new Set(document.formula.lines.map((line) => line.phase))];
  const phases = order.map((name, index) => {
    const own = document.formula.lines.map((line, at) => ({ line, mass: masses[at]! })).filter(({ line }) => line.phase === name);
    return {
      letter: LETTERS[index] ?? `${index + 1}`,
      name: name || 'Formula',
      lines: own.map(({ line, mass }) => {
        const slack = larger(multiply(mass, RELATIVE), LEAST);
        const low = subtract(mass, slack);
        return {
          name: materials.get(line.material)?.tradeName || line.material,
          target: grams(mass),
          from: compare(low, decimal('0')) > 0 ? limit(low, 'up') : '0.00',
          to: limit(add(mass, slack), 'down'),
          caution: input.handling[line.material] ?? '',
        };
      }),
      total: grams(sum(own.map(({ mass }) => mass))),
      steps: input.steps[name] ?? [],
    };
  });
  const makesUp = document.formula.lines.findIndex((line) => line.unit === 'qs');
  const whole = multiply(total, factor);
  return {
    house: input.house,
    name: document.product.name,
    function: document.product.particulars?.function ?? '',
    batchCode: document.product.particulars?.batchCode ?? '',
    size: `${grams(whole)} g`,
    phases,
    sum: grams(whole),
    makesUp: makesUp < 0 ? '' : `makes up: ${toDecimal(whole, 3)} − ${toDecimal(subtract(whole, masses[makesUp]!), 3)} = ${grams(masses[makesUp]!)} g`,
    cautions: [
      'Weigh as added; loss by drying is made up with water before the last phase.',
      'Wear gloves and eye protection with acids, lye, preservatives and essential oils, and work where the air is changed.',
    ],
    dataRelease: input.dataRelease,
  };
}

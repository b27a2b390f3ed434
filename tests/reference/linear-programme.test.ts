/**
 * The engine's exact bounds against an independent linear-programme solver (HiGHS, from npm).
 * The solver works in binary floating point, so figures are compared within 1e-7 of a percent;
 * its own tolerances are 1e-9. Whether an order can be turned round is compared only where the
 * solver's least lead is further than that from zero, so a tie never decides a test.
 */
import { default as loadHighs } from 'highs';
import { expect, test } from 'vitest';
import { prepareMaterial } from '#shared/engine/prepare-material.ts';
import type { Interval } from '#shared/engine/types.ts';
import type { DocumentMaterial, DocumentPart, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import { dictionary, formula, judge, line, material, part } from '#tests/support/engine.ts';

const NAMES = ['Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Phenoxyethanol', 'Xanthan Gum', 'Sodium Chloride', 'Tocopherol', 'Citric Acid', 'Decyl Glucoside'];
const FORMULAS = 2000;
const NEAR = 1e-7;
const OPTIONS = { primal_feasibility_tolerance: 1e-9, dual_feasibility_tolerance: 1e-9, presolve: 'off' } as const;

/** A small repeatable source of numbers (multiplicative congruence), so that a failure can be looked at again. */
function numbers(seed: number): (below: number) => number {
  let state = seed * 2 + 1;
  return (below) => {
    state = (state * 48271) % 2147483647;
    return state % below;
  };
}

/** A composition whose ranges hold a point that sums to 100: drawn around one. */
function randomMaterial(id: string, next: (below: number) => number): DocumentMaterial {
  const count = 2 + next(4);
  const cuts = Array.from({ length: count - 1 }, () => 1 + next(998)).sort((a, b) => a - b);
  const tenths = [...cuts, 1000].map((cut, index) => cut - (cuts[index - 1] ?? 0));
  const parts = tenths.map((figure): DocumentPart => {
    const low = Math.max(0, figure - next(120));
    const high = Math.min(1000, figure + next(120));
    // Repeated names and incidental parts are wanted: bounds over subsets, parts that are never listed.
    return part(NAMES[next(NAMES.length)]!, next(3) === 0 ? `${figure / 10}` : `${low / 10}-${high / 10}`, next(9) === 0 ? { role: 'incidental' } : {});
  });
  return material(id, parts);
}

function randomFormula(next: (below: number) => number): FormulaDocument {
  const materials = Array.from({ length: 1 + next(4) }, (_, index) => randomMaterial(`m${index}`, next));
  return formula(materials, materials.map(({ id }) => line(id, `${1 + next(500)}.${next(10)} g`)));
}

/** One variable for each composition line: its share of the product in percent. */
function programme(document: FormulaDocument, weightOf: (part: DocumentPart) => number, sense: 'Minimize' | 'Maximize'): string {
  const total = document.formula.lines.reduce((sum, { amount }) => sum + Number(amount), 0);
  const objective: string[] = [];
  const sums: string[] = [];
  const bounds: string[] = [];
  document.materials.forEach((one, m) => {
    const share = Number(document.formula.lines[m]!.amount) / total;
    one.composition.forEach((item, p) => {
      const weight = weightOf(item) * share;
      if (weight !== 0) objective.push(`${weight < 0 ? '-' : '+'} ${Math.abs(weight)} x${m}_${p}`);
      bounds.push(` ${item.min ?? item.percent} <= x${m}_${p} <= ${item.max ?? item.percent}`);
    });
    sums.push(` c${m}: ${one.composition.map((_, p) => `x${m}_${p}`).join(' + ')} = 100`);
  });
  return `${sense}\n obj: ${objective.length > 0 ? objective.join(' ') : '0 x0_0'}\nSubject To\n${sums.join('\n')}\nBounds\n${bounds.join('\n')}\nEnd\n`;
}

const asNumber = ({ n, d }: Rational): number => Number((n * 10n ** 15n) / d) / 1e15;

test(`bounds and order proofs of ${FORMULAS} random formulas are those of a linear-programme solver`, async () => {
  const highs = await loadHighs();
  const solve = (text: string): number => {
    const answer = highs.solve(text, OPTIONS);
    if (answer.Status !== 'Optimal') throw new Error(`${answer.Status}\n${text}`);
    return answer.ObjectiveValue;
  };
  let bounds = 0;
  let proofs = 0;
  let turned = 0;
  for (let seed = 1; seed <= FORMULAS; seed += 1) {
    const next = numbers(seed);
    const document = randomFormula(next);
    if (document.materials.some((one) => !prepareMaterial(one, dictionary).isTied)) continue;
    const { blend, results } = judge(document, { markets: ['US'] });
    const isOf = (name: string) => (item: DocumentPart): number => (item.role === 'ingredient' && item.inci === name ? 1 : 0);
    const listed = blend.substances.filter(({ as }) => as.ingredient);
    const asked = listed[next(listed.length || 1)];
    if (!asked) continue;
    const interval: Interval = asked.as.ingredient!;
    const where = `seed ${seed}, ${asked.name}`;
    expect(Math.abs(asNumber(interval.min) - solve(programme(document, isOf(asked.name), 'Minimize'))), where).toBeLessThan(NEAR);
    expect(Math.abs(asNumber(interval.max) - solve(programme(document, isOf(asked.name), 'Maximize'))), where).toBeLessThan(NEAR);
    bounds += 2;
    const { entries, uncertainPairs } = results[0]!.declaration;
    const ordered = entries.filter(({ zone }) => zone === 'ordered');
    if (ordered.length < 2) continue;
    const at = next(ordered.length - 1);
    const [first, second] = [ordered[at]!, ordered[at + 1]!];
    const lead = solve(programme(document, (item) => isOf(first.inci)(item) - isOf(second.inci)(item), 'Minimize'));
    if (Math.abs(lead) < NEAR) continue;
    const isUncertain = uncertainPairs.some((pair) => pair.first === first && pair.second === second);
    expect(isUncertain, `seed ${seed}, ${first.inci} before ${second.inci}, lead ${lead}`).toBe(lead < 0);
    proofs += 1;
    if (isUncertain) turned += 1;
  }
  // Both answers have to occur, or the comparison proves little.
  expect(bounds).toBeGreaterThan(3800);
  expect(proofs).toBeGreaterThan(1500);
  expect(turned).toBeGreaterThan(50);
  expect(proofs - turned).toBeGreaterThan(50);
}, 400_000);

test('a weighted sum over several substances is the solver’s optimum', async () => {
  const highs = await loadHighs();
  for (let seed = 1; seed <= 200; seed += 1) {
    const next = numbers(seed + 50_000);
    const document = randomFormula(next);
    if (document.materials.some((one) => !prepareMaterial(one, dictionary).isTied)) continue;
    const { blend } = judge(document, { markets: ['US'] });
    const weights = new Map(blend.substances.map(({ key, name }) => [name, { key, weight: next(7) - 3 }]));
    const sum = blend.weigh([...weights.values()].map(({ key, weight }) => ({ key, weight: { n: BigInt(weight), d: 2n } })));
    const weightOf = (item: DocumentPart): number => weights.get(item.inci)!.weight / 2;
    const least = highs.solve(programme(document, weightOf, 'Minimize'), OPTIONS).ObjectiveValue;
    const most = highs.solve(programme(document, weightOf, 'Maximize'), OPTIONS).ObjectiveValue;
    expect(Math.abs(asNumber(sum.min) - least), `seed ${seed}`).toBeLessThan(NEAR);
    expect(Math.abs(asNumber(sum.max) - most), `seed ${seed}`).toBeLessThan(NEAR);
  }
}, 200_000);

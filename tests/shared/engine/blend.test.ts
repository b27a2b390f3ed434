/** The fast way of adding shares (doubles while provably exact) against a slow reference in BigInts. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { DocumentMaterial, FormulaDocument } from '#shared/contracts/formula-document.ts';
import { blendFormula } from '#shared/engine/blend.ts';
import { prepareMaterial, type Way } from '#shared/engine/prepare-material.ts';
import { weighLines } from '#shared/engine/weigh-lines.ts';
import { compare, type Rational } from '#shared/kernel/rational.ts';
import { dictionary, formula, line, material, part, present } from '#tests/support/engine.ts';

const NAMES = ['Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Phenoxyethanol', 'Xanthan Gum', 'Sodium Chloride', 'Tocopherol', 'Citric Acid'] as const;
const digits = (most: number) => fc.integer({ min: 0, max: most }).map((places) => '0'.repeat(places));

/** Amounts and shares of few or of very many places: on both sides of what doubles hold. */
const someMaterial = (id: string): fc.Arbitrary<DocumentMaterial> =>
  fc.array(fc.record({ at: fc.nat(NAMES.length - 1), low: fc.integer({ min: 0, max: 40 }), more: fc.integer({ min: 0, max: 60 }), zeros: digits(14) }), { minLength: 1, maxLength: 5 }).map((rows) =>
    material(id, rows.map(({ at, low, more, zeros }) => part(NAMES[at]!, `${low}.${zeros}1-${low + more}.${zeros}7`))),
  );
const plainMaterial = (id: string): fc.Arbitrary<DocumentMaterial> =>
  fc.array(fc.record({ at: fc.nat(NAMES.length - 1), share: fc.integer({ min: 1, max: 99 }) }), { minLength: 1, maxLength: 5 }).map((rows) => material(id, rows.map(({ at, share }) => part(NAMES[at]!, `${share}.5`))));
const either = (id: string): fc.Arbitrary<DocumentMaterial> => fc.oneof({ arbitrary: plainMaterial(id), weight: 3 }, { arbitrary: someMaterial(id), weight: 1 });
const someFormula: fc.Arbitrary<FormulaDocument> = fc
  .record({ materials: fc.tuple(either('a'), either('b'), either('c')), grams: fc.array(fc.record({ whole: fc.nat(9999), zeros: fc.oneof(fc.constant(''), digits(8)) }), { minLength: 4, maxLength: 4 }) })
  .map(({ materials, grams }) => formula(materials, ['a', 'b', 'c', 'a'].map((id, index) => line(id, `${grams[index]!.whole}.${grams[index]!.zeros}3 g`))));

/** Straight from the meaning: each line's mass over all, times the material's own figure, added as exact fractions. */
function reference(document: FormulaDocument, way: Way): Map<string, { lo: Rational; typ: Rational; hi: Rational }> {
  const { masses, total } = weighLines(document);
  const sums = new Map<string, { lo: Rational; typ: Rational; hi: Rational }>();
  const plus = (a: Rational, n: bigint, d: bigint): Rational => ({ n: a.n * d + n * a.d, d: a.d * d });
  document.formula.lines.forEach(({ material: id }, index) => {
    const prepared = prepareMaterial(document.materials.find((one) => one.id === id)!, dictionary);
    for (const group of prepared.groups) {
      if (group.way !== way) continue;
      const zero = { n: 0n, d: 1n };
      const before = sums.get(group.key) ?? { lo: zero, typ: zero, hi: zero };
      const d = total * prepared.den;
      sums.set(group.key, { lo: plus(before.lo, masses[index]! * group.lo, d), typ: plus(before.typ, masses[index]! * group.typ, d), hi: plus(before.hi, masses[index]! * group.hi, d) });
    }
  });
  return sums;
}

test('every share is that of the slow reference, whatever the number of places', () => {
  let fast = 0;
  let slow = 0;
  fc.assert(fc.property(someFormula, (document) => {
    const blend = blendFormula(document, dictionary);
    if (typeof blend.figureDen === 'number') fast += 1;
    else slow += 1;
    const sums = reference(document, 'ingredient');
    expect(blend.substances.map(({ key }) => key).sort()).toEqual([...sums.keys()].sort());
    for (const [key, { lo, typ, hi }] of sums) {
      const { min, typical, max } = blend.find(key)!.as.ingredient!;
      expect([compare(min, lo), compare(typical, typ), compare(max, hi)]).toEqual([0, 0, 0]);
    }
  }), { numRuns: 400, seed: 7 });
  // Both ways were taken.
  expect(fast).toBeGreaterThan(20);
  expect(slow).toBeGreaterThan(20);
});

test('places that change nothing but the way of adding change no result', () => {
  fc.assert(fc.property(fc.tuple(someMaterial('a'), someMaterial('b')), fc.tuple(fc.integer({ min: 1, max: 999 }), fc.integer({ min: 1, max: 999 })), ([a, b], [first, second]) => {
    const seen = (zeros: string) => {
      const { dataRelease, results } = present(formula([a, b], [line('a', `${first}${zeros} g`), line('b', `${second}${zeros} g`)]));
      return { dataRelease, results: results.map((one) => ({ ...one, headroom: [] })) };
    };
    // The same amounts written with twenty more places no longer fit a double.
    expect(seen(`.${'0'.repeat(20)}`)).toEqual(seen(''));
  }), { numRuns: 100 });
});

test('a material that is used again with other amounts is mixed from what is remembered of it', () => {
  const materials = [material('a', [part('Aqua', '90'), part('Glycerin', '10')]), material('b', [part('Citric Acid', '100')])];
  const of = (grams: string) => blendFormula(formula(materials, [line('a', `${grams} g`), line('b', '1 g')]), dictionary);
  expect(of('9').plan).toBe(of('19').plan);
  expect(compare(of('9').find('citricacid')!.total.typical, { n: 10n, d: 1n })).toBe(0);
  expect(compare(of('19').find('citricacid')!.total.typical, { n: 5n, d: 1n })).toBe(0);
  expect(of('0').plan).not.toBe(of('9').plan);
});

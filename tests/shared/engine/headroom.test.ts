/** Headroom against its own meaning: at the figure nothing is new, just beyond something is. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { DocumentMaterial, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { HeadroomLine } from '#shared/engine/assessment.ts';
import { identity } from '#shared/engine/headroom.ts';
import { formula, inside, judge, line, material, part } from '#tests/support/engine.ts';

const UNIT = 10n ** 15n;
const toUnits = (decimal: string): bigint => {
  const [whole, fraction = ''] = decimal.split('.');
  return BigInt(whole! + fraction.padEnd(15, '0'));
};

/** The document rewritten in grams, with a line at a share (in 10^-15 of a percent) and the others in proportion. */
function withLineAt(document: FormulaDocument, at: number, units: bigint): FormulaDocument {
  const grams = document.formula.lines.map(({ amount }) => toUnits(amount));
  const others = grams.reduce((sum, mass, index) => (index === at ? sum : sum + mass), 0n);
  const lines = document.formula.lines.map((one, index) => ({ ...one, amount: `${index === at ? units * others : grams[index]! * (100n * UNIT - units)}` }));
  return { ...document, formula: { lines } };
}

type Options = Parameters<typeof judge>[1];

const identities = (document: FormulaDocument, options: Options): string[] => judge(document, options).results[0]!.findings.map(identity);

function newAt(document: FormulaDocument, at: number, units: bigint, options: Options): string[] {
  const today = new Set(identities(document, options));
  return identities(withLineAt(document, at, units), options).filter((one) => !today.has(one));
}

function shareOf(document: FormulaDocument, at: number): bigint {
  const grams = document.formula.lines.map(({ amount }) => toUnits(amount));
  return (grams[at]! * 100n * UNIT) / grams.reduce((sum, mass) => sum + mass, 0n);
}

function expectTrue(document: FormulaDocument, { line: at, max, limitedBy }: HeadroomLine, options: Options): void {
  const now = shareOf(document, at);
  const end = max === null ? 100n * UNIT : toUnits(max);
  // On the way there nothing is new, at places that have nothing to do with how the figure was found.
  for (const part of [1n, 23n, 50n, 77n, 98n]) {
    const units = now + ((end - now) * part) / 100n;
    if (units > now && units < 100n * UNIT) expect(newAt(document, at, units, options), `line ${at} on its way to ${max}`).toEqual([]);
  }
  if (max === null) return;
  if (end > now) expect(newAt(document, at, end, options), `line ${at} at ${max}`).toEqual([]);
  const beyond = newAt(document, at, (end > now ? end : now) + 2000n, options);
  expect(beyond.map((one) => one.split('|')[1]), `line ${at} just beyond ${max}`).toContain(limitedBy);
}

const NAMES = ['Aqua', 'Glycerin', 'Phenoxyethanol', 'Sodium Benzoate', 'Salicylic Acid', 'Cetearyl Alcohol', 'Xanthan Gum', 'Citric Acid'] as const;
const someMaterial = (id: string): fc.Arbitrary<DocumentMaterial> =>
  fc.record({ a: fc.nat(7), b: fc.nat(7), point: fc.integer({ min: 0, max: 100 }), spread: fc.nat(12), purpose: fc.boolean() }).map(({ a, b, point, spread, purpose }) =>
    material(id, [
      part(NAMES[a]!, `${Math.max(0, point - spread)}-${Math.min(100, point + spread)}`, purpose ? { purpose: 'preservative' } : {}),
      part(NAMES[b]!, `${Math.max(0, 100 - point - spread)}-${Math.min(100, 100 - point + spread)}`),
    ]),
  );
const someFormula = fc
  .record({ materials: fc.tuple(someMaterial('m0'), someMaterial('m1'), someMaterial('m2'), someMaterial('m3')), grams: fc.array(fc.integer({ min: 1, max: 3000 }), { minLength: 4, maxLength: 4 }) })
  .map(({ materials, grams }) => formula(materials, materials.map(({ id }, index) => line(id, `${grams[index]} g`))));

test.each(['EU', 'US'] as const)('for any formula in %s nothing is new up to the figure and something is just beyond it', (market) => {
  let bounded = 0;
  fc.assert(fc.property(someFormula, (document) => {
    const options = { markets: [market] };
    for (const one of judge(document, options).results[0]!.headroom()) {
      if (one.max !== null) bounded += 1;
      expectTrue(document, one, options);
    }
  }), { numRuns: 60, seed: 11 });
  expect(bounded).toBeGreaterThan(60);
}, 120_000);

const headroom = (document: FormulaDocument, options: Options = {}): readonly HeadroomLine[] => judge(document, options).results[0]!.headroom();
const WATER = material('w', [part('Aqua', '100')]);

describe('what bounds a line', () => {
  test('a limit is itself allowed', () => {
    const pure = material('p', [part('Phenoxyethanol', '100', { purpose: 'preservative' })]);
    expect(headroom(formula([WATER, pure], [line('w', '99.5 g'), line('p', '0.5 g')]))[1]).toEqual({ line: 1, max: '1', limitedBy: 'eu/annex-v/29' });
  });

  test('a share that does not end is cut, never rounded up', () => {
    const blend = material('p', [part('Phenoxyethanol', '90', { purpose: 'preservative' }), part('Aqua', '10')]);
    expect(headroom(formula([WATER, blend], [line('w', '99.5 g'), line('p', '0.5 g')]))[1]).toEqual({ line: 1, max: '1.111111111111', limitedBy: 'eu/annex-v/29' });
  });

  test('a substance that other lines bring too counts with them', () => {
    const pure = material('p', [part('Phenoxyethanol', '100', { purpose: 'preservative' })]);
    const blend = material('b', [part('Phenoxyethanol', '1', { purpose: 'preservative' }), part('Aqua', '99')]);
    // t + (100 − t) × 0.5/100 = 1, so t = 50/99.5 = 0.502512562814…
    expect(headroom(formula([blend, pure, WATER], [line('b', '50 g'), line('p', '0 g'), line('w', '50 g')]))[1]).toEqual({ line: 1, max: '0.502512562814', limitedBy: 'eu/annex-v/29' });
  });

  test('a range that comes to straddle 1 % bounds just below it, where exactly 1 % is in the ordered part', () => {
    const gum = material('g', [part('Xanthan Gum', '40-50-60'), part('Aqua', '40-50-60')]);
    const document = formula([WATER, gum], [line('w', '99 g'), line('g', '1 g')]);
    // 0.6 t reaches 1 at 1.666…: cut. In the US exactly 1 % is still free.
    expect(headroom(document)[1]).toEqual({ line: 1, max: '1.666666666666', limitedBy: 'zone-proved' });
    const half = formula([WATER, material('g', [part('Xanthan Gum', '30-40-50'), part('Aqua', '50-60-70')])], [line('w', '99 g'), line('g', '1 g')]);
    expect(headroom(half)[1]).toEqual({ line: 1, max: '1.999999999999', limitedBy: 'zone-proved' });
    expect(headroom(half, { markets: ['US'] })[1]).toEqual({ line: 1, max: '2', limitedBy: 'zone-proved' });
  });

  test('an order that comes into doubt bounds a line', () => {
    const glycerin = material('g', [part('Glycerin', '80-90-100'), part('Aqua', '0-10-20')]);
    const betaine = material('b', [part('Betaine', '100')]);
    const found = headroom(formula([WATER, glycerin, betaine], [line('w', '80 g'), line('g', '5 g'), line('b', '15 g')]))[1]!;
    // Today 5 % against 15 %. At its greatest the glycerin passes the betaine where t = 15/95 × (100 − t).
    expect(found).toEqual({ line: 1, max: '13.636363636363', limitedBy: 'order-proved' });
  });

  test('an allergen to come bounds a line before its day, not after it', () => {
    const oil = material('o', [part('Citrus Limon Peel Oil', '100')], { constituents: [inside('Citral', '2'), inside('Geraniol', '0.5')] });
    const document = formula([WATER, oil], [line('w', '99.99 g'), line('o', '0.01 g')]);
    for (const options of [{}, { placedOnMarket: '2026-06-01' as never, availableOn: '2026-06-01' as never }]) for (const one of headroom(document, options)) expectTrue(document, one, options);
  });

  test('a line of no weight is bounded at 0 by a name that nobody knows', () => {
    const odd = material('x', [part('Nonexistium', '100')]);
    expect(headroom(formula([WATER, odd], [line('w', '100 g'), line('x', '0 g')]))[1]).toEqual({ line: 1, max: '0', limitedBy: 'name-known' });
  });

  test('nothing bounds water, and nothing the only line', () => {
    const glycerin = material('g', [part('Glycerin', '100')]);
    expect(headroom(formula([WATER, glycerin], [line('w', '90 g'), line('g', '10 g')])).map(({ max }) => max)).toEqual([null, null]);
    expect(headroom(formula([WATER], [line('w', '90 g')]))).toEqual([{ line: 0, max: null, limitedBy: null }]);
  });
});

/** What must always hold, whatever the formula (fast-check), and the edges of the zones and thresholds. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { DocumentLine, FormulaDocument } from '#shared/contracts/formula-document.ts';
import { formula, inside, judge, line, material, part, present } from '#tests/support/engine.ts';

const NAMES = ['Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Phenoxyethanol', 'Xanthan Gum', 'Sodium Chloride', 'Tocopherol', 'Citric Acid'] as const;

/** Pairs of parts around a point that sums to 100, in whole percents. */
const someMaterial = (id: string): fc.Arbitrary<FormulaDocument['materials'][number]> =>
  fc.record({ a: fc.nat(7), b: fc.nat(7), point: fc.integer({ min: 0, max: 100 }), spread: fc.nat(20) }).map(({ a, b, point, spread }) =>
    material(id, [
      part(NAMES[a]!, `${Math.max(0, point - spread)}-${Math.min(100, point + spread)}`),
      part(NAMES[b]!, `${Math.max(0, 100 - point - spread)}-${Math.min(100, 100 - point + spread)}`),
    ]),
  );
const someFormula = fc
  .record({ materials: fc.tuple(someMaterial('m0'), someMaterial('m1'), someMaterial('m2')), grams: fc.array(fc.integer({ min: 1, max: 9999 }), { minLength: 3, maxLength: 3 }) })
  .map(({ materials, grams }) => formula(materials, materials.map(({ id }, index) => line(id, `${grams[index]} g`))));

const seen = (document: FormulaDocument): unknown =>
  present(document, { markets: ['EU', 'US'] }).results.map(({ declaration, allergens, findings }) => ({
    text: declaration.text,
    shares: declaration.entries.map(({ inci, share, zone }) => [inci, share, zone]),
    allergens: allergens.map(({ name, total, disclose }) => [name, total, disclose]),
    findings: findings.map(({ kind, subject, members }) => [kind, subject, members ?? []].join('|')).sort(),
  }));
const withLines = (document: FormulaDocument, lines: readonly DocumentLine[]): FormulaDocument => ({ ...document, formula: { lines } });

describe('for any formula', () => {
  test('scaling the batch changes nothing', () => {
    fc.assert(fc.property(someFormula, fc.integer({ min: 2, max: 977 }), (document, factor) => {
      const scaled = document.formula.lines.map((one) => ({ ...one, amount: `${BigInt(one.amount) * BigInt(factor)}` }));
      expect(seen(withLines(document, scaled))).toEqual(seen(document));
    }), { numRuns: 60 });
  });

  test('reordering the lines changes nothing', () => {
    fc.assert(fc.property(someFormula, (document) => {
      expect(seen(withLines(document, [...document.formula.lines].reverse()))).toEqual(seen(document));
    }), { numRuns: 60 });
  });

  test('splitting a line in two changes nothing', () => {
    fc.assert(fc.property(someFormula, fc.nat(2), (document, at) => {
      const whole = document.formula.lines[at]!;
      const rest = document.formula.lines.filter((one) => one !== whole);
      const split = [{ ...whole, amount: '0.25' }, { ...whole, amount: `${BigInt(whole.amount) - 1n}.75` }];
      expect(seen(withLines(document, [...split, ...rest]))).toEqual(seen(document));
    }), { numRuns: 60 });
  });

  test('a fixed material bought as two halves changes nothing', () => {
    fc.assert(fc.property(someFormula, fc.integer({ min: 1, max: 99 }), (document, share) => {
      const blend = material('blend', [part('Glycerin', `${share}`), part('Aqua', `${100 - share}`)]);
      const one = { ...document, materials: [...document.materials, blend], formula: { lines: [...document.formula.lines, line('blend', '30 g')] } };
      const two = {
        ...document,
        materials: [...document.materials, blend, { ...blend, id: 'other half' }],
        formula: { lines: [...document.formula.lines, line('blend', '13 g'), line('other half', '17 g')] },
      };
      expect(seen(two)).toEqual(seen(one));
    }), { numRuns: 40 });
  });

  test('raising the amount of a pure ingredient never lowers its place', () => {
    fc.assert(fc.property(someFormula, fc.integer({ min: 1, max: 5000 }), fc.integer({ min: 1, max: 5000 }), (document, grams, more) => {
      const place = (amount: number): number => {
        const pure = { ...document, materials: [...document.materials, material('pure', [part('Panthenol', '100')])], formula: { lines: [...document.formula.lines, line('pure', `${amount} g`)] } };
        return judge(pure).results[0]!.declaration.entries.findIndex(({ inci }) => inci === 'Panthenol');
      };
      expect(place(grams + more)).toBeLessThanOrEqual(place(grams));
    }), { numRuns: 60 });
  });

  test('the usual share lies within its bounds and the usual shares add up to 100 %', () => {
    fc.assert(fc.property(someFormula, (document) => {
      const { blend } = judge(document);
      let sum = 0n;
      for (const { as } of blend.substances) {
        const { min, typical, max } = as.ingredient!;
        expect(min.n <= typical.n && typical.n <= max.n).toBe(true);
        sum += typical.n;
      }
      expect(sum).toBe(100n * blend.den);
    }), { numRuns: 100 });
  });
});

describe('the 1 % line', () => {
  const zoneAt = (share: string, market: 'EU' | 'US'): string => {
    const document = formula([material('w', [part('Aqua', '100')]), material('g', [part('Glycerin', '100')])], [line('w', 'qs'), line('g', `${share} %`)]);
    return present(document, { markets: [market] }).results[0]!.declaration.entries.find(({ inci }) => inci === 'Glycerin')!.zone;
  };
  test.each([
    ['0.9999999999999999', 'free', 'free'],
    ['1', 'ordered', 'free'],
    ['1.0000000000000001', 'ordered', 'ordered'],
  ])('at %s %% the zone is %s in the EU and %s in the US', (share, eu, us) => {
    expect([zoneAt(share, 'EU'), zoneAt(share, 'US')]).toEqual([eu, us]);
  });
});

describe('the dates of the allergen list', () => {
  const oil = material('o', [part('Rosa Damascena Flower Oil', '100')]);
  const named = (market: 'EU' | 'UK' | 'CA', placed: string, available: string): string[] => {
    const document = formula([material('w', [part('Aqua', '100')]), oil], [line('w', 'qs'), line('o', '0.5 %')], { product: { placedOnMarket: placed, availableOn: available } });
    return present(document, { markets: [market] }).results[0]!.declaration.entries.map(({ name }) => name);
  };
  test.each([
    ['EU', '2026-07-31', '2028-07-31', 'Rosa Damascena Flower Oil'],
    ['EU', '2026-08-01', '2026-08-01', 'Rose Flower Oil/Extract'],
    ['EU', '2026-07-31', '2028-08-01', 'Rose Flower Oil/Extract'],
    ['UK', '2027-01-01', '2029-01-01', 'Rosa Damascena Flower Oil'],
    ['CA', '2027-01-01', '2029-01-01', 'Rosa Damascena Flower Oil'],
  ] as const)('%s, placed %s, available %s: printed as %s', (market, placed, available, name) => {
    expect(named(market, placed, available)).toEqual(['Aqua', name]);
  });

  test('a group to come is told as upcoming', () => {
    const document = formula([material('w', [part('Aqua', '100')]), oil], [line('w', 'qs'), line('o', '0.5 %')], { product: { placedOnMarket: '2026-07-31', availableOn: '2026-07-31' } });
    const upcoming = present(document).results[0]!.findings.filter(({ kind, subject }) => kind === 'upcoming' && subject === 'Rose Flower Oil/Extract');
    expect(upcoming.map(({ effective, severity }) => [effective, severity])).toEqual([[{ from: '2026-08-01' }, 'note']]);
  });
});

describe('names', () => {
  test('a perfume is one entry and its parts stay hidden', () => {
    const scent = material('s', [part('Linalool', '10'), part('Dipropylene Glycol', '90')], { declareAs: 'parfum' });
    const document = formula([material('w', [part('Aqua', '100')]), scent], [line('w', '99 %'), line('s', '1 %')]);
    const { declaration, allergens } = present(document).results[0]!;
    expect(declaration.entries.map(({ name, zone }) => `${name} ${zone}`)).toEqual(['Aqua ordered', 'Parfum ordered', 'Linalool allergen']);
    expect(allergens[0]!.total.typical).toBe('0.1');
  });

  test('an incidental part is never listed', () => {
    const document = formula([material('w', [part('Aqua', '99'), part('Sodium Chloride', '1', { role: 'incidental' })])], [line('w', '100 g')]);
    expect(present(document).results[0]!.declaration.text).toBe('Ingredients: Aqua');
  });

  test('a nanomaterial is marked in the EU and not in the US', () => {
    const document = formula([material('w', [part('Aqua', '80'), part('Titanium Dioxide', '20', { nano: true, purpose: 'uv-filter' })])], [line('w', '100 g')]);
    const texts = present(document, { markets: ['EU', 'US'] }).results.map(({ declaration }) => declaration.text);
    expect(texts).toEqual(['Ingredients: Aqua, Titanium Dioxide (nano)', 'Ingredients: Water, Titanium Dioxide']);
  });

  test('an unlisted name is unknown and gets up to five suggestions', () => {
    const document = formula([material('w', [part('Aqua', '99'), part('Glycerrin', '1')])], [line('w', '100 g')]);
    const [finding] = present(document).results[0]!.findings.filter(({ kind }) => kind === 'unknown-ingredient');
    expect(finding!.subject).toBe('Glycerrin');
    expect(finding!.suggestions).toContain('Glycerin');
    expect(finding!.suggestions!.length).toBeLessThanOrEqual(5);
  });

  test('a constituent outside the dictionary is never an unknown ingredient', () => {
    const oil = material('o', [part('Pinus Sylvestris Leaf Oil', '100')], { constituents: [inside('Nonexistium', '3')] });
    expect(present(formula([oil], [line('o', '1 g')])).results[0]!.findings.filter(({ kind }) => kind === 'unknown-ingredient')).toEqual([]);
  });

  test('an order chosen inside the free zone is kept, names that are not there are passed over, new ones follow', () => {
    const pure = ['Aqua', 'Glycerin', 'Xanthan Gum', 'Citric Acid', 'Tocopherol'].map((name) => material(name, [part(name, '100')]));
    const document = formula(pure, [line('Aqua', 'qs'), line('Glycerin', '2 %'), line('Xanthan Gum', '0.5 %'), line('Citric Acid', '0.3 %'), line('Tocopherol', '0.2 %')], {
      declaration: { freeOrder: { EU: ['Tocopherol', 'Glycerin', 'Panthenol', 'Xanthan Gum'] } },
    });
    expect(present(document).results[0]!.declaration.text).toBe('Ingredients: Aqua, Glycerin, Tocopherol, Xanthan Gum, Citric Acid');
  });

  test.each([
    ['2026-07-31', 'Lavandula Oil/Extract', 'Lavandula Angustifolia Oil'],
    ['2026-08-01', 'Lavandula Angustifolia Oil', 'Lavandula Oil/Extract'],
  ])('an order chosen under one date outlives the change of a printed name: on %s', (placedOnMarket, chosen, printed) => {
    const pure = ['Aqua', 'Xanthan Gum', 'Citric Acid', 'Lavandula Angustifolia Oil'].map((name) => material(name, [part(name, '100')]));
    const document = formula(pure, [line('Aqua', 'qs'), line('Xanthan Gum', '0.5 %'), line('Citric Acid', '0.3 %'), line('Lavandula Angustifolia Oil', '0.2 %')], {
      product: { placedOnMarket, availableOn: placedOnMarket },
      declaration: { freeOrder: { EU: [chosen, 'Citric Acid'] } },
    });
    expect(present(document).results[0]!.declaration.text).toBe(`Ingredients: Aqua, ${printed}, Citric Acid, Xanthan Gum`);
  });
});

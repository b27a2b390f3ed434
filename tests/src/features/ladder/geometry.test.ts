import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { findLoupeSpot, ladderTicks, layLadder, leaderPath, placeAt, spread, type LawLine, type Rung } from '#src/features/ladder/geometry.ts';

const EU: LawLine[] = [
  { id: 'zone', at: 1, weight: 'zone', caption: 'below 1 %' },
  { id: 'rinse-off', at: 0.01, weight: 'binding', caption: 'allergens are named above 0.01 %' },
  { id: 'leave-on', at: 0.001, weight: 'idle', caption: 'not this product' },
];

function rung(key: string, typical: number, over: Partial<Rung> = {}): Rung {
  const isOrdered = typical >= 1;
  return { key, name: key, zone: isOrdered ? 'ordered' : 'free', min: typical, typical, max: typical, parts: [], isInside: false, isUnsure: false, isFree: !isOrdered, ...over };
}

/** Worked by hand for a body wash: masses over 500 g. */
const WASH = [
  rung('Aqua', 78), rung('Decyl Glucoside', 9.36), rung('Cocamidopropyl Betaine', 4.62, { min: 4.35, max: 4.8, isUnsure: true }), rung('Glycerin', 4.5, { isUnsure: true }),
  rung('Xanthan Gum', 1), rung('Phenoxyethanol', 0.9), rung('Sodium Chloride', 0.87, { min: 0.6, max: 1.05 }), rung('Citric Acid', 0.25), rung('Linalool', 0.0945, { isInside: true, zone: 'allergen' }),
  rung('Limonene', 0.0015, { min: 0, max: 0.003, isInside: true, zone: 'unnamed', isFree: false }),
];

describe('the scale', () => {
  test('equal ratios are equal distances', () => {
    const { yOf } = layLadder(WASH, EU, 560);
    const decade = yOf(10) - yOf(100);
    for (const value of [10, 1, 0.1, 0.01, 0.001]) expect((yOf(value / 10) - yOf(value)).toFixed(6)).toBe(decade.toFixed(6));
  });
  test('rungs stand at their value, whatever their rows do', () => {
    const geometry = layLadder(WASH, EU, 560);
    for (const placed of geometry.rungs) expect(placed.y).toBe(geometry.yOf(placed.rung.typical));
  });
  test('a range that ends below the foot is cut and says so', () => {
    const limonene = layLadder(WASH, EU, 560).rungs.at(-1)!;
    expect(limonene.isCut).toBe(true);
    expect(limonene.yMin).toBe(layLadder(WASH, EU, 560).yOf(0.0001));
  });
  test('ticks name the powers of ten from 100 % to 0.0001', () => {
    const labels = ladderTicks(layLadder(WASH, EU, 560).yOf).flatMap((tick) => tick.label ?? []);
    expect(labels).toEqual(['100 %', '10', '1', '0.1', '0.01', '0.001', '0.0001']);
  });
});

describe('the rows', () => {
  const shares = fc.array(fc.double({ min: 0.0002, max: 60, noNaN: true }), { minLength: 1, maxLength: 70 });
  const widths = fc.integer({ min: 326, max: 720 });

  test('never overlap, never change places, and stay on the drawing', () => {
    fc.assert(
      fc.property(shares, widths, (values, width) => {
        const sorted = values.toSorted((a, b) => b - a).map((value, i) => rung(`r${i}`, value));
        const geometry = layLadder(sorted, EU, width);
        const rows = geometry.rungs.map((placed) => placed.row);
        rows.slice(1).forEach((row, i) => expect(row - rows[i]!).toBeGreaterThan(geometry.gap - 0.001));
        expect(Math.min(...rows)).toBeGreaterThanOrEqual(0);
        expect(Math.max(...rows) + 11).toBeLessThanOrEqual(geometry.keyTop);
        expect(geometry.keyTop).toBeLessThan(geometry.height);
      }),
      { numRuns: 200 },
    );
  });
  test('ordered rows end above the line, free rows begin below it', () => {
    fc.assert(
      fc.property(shares, widths, (values, width) => {
        const sorted = values.toSorted((a, b) => b - a).map((value, i) => rung(`r${i}`, value));
        const geometry = layLadder(sorted, EU, width);
        const line = geometry.lines.find((each) => each.line.id === 'zone')!.yRight;
        for (const placed of geometry.rungs) {
          if (placed.rung.zone === 'ordered') expect(placed.row).toBeLessThan(line);
          else expect(placed.row).toBeGreaterThan(line);
        }
      }),
    );
  });
  test('lanes keep at least five units between them and stay left of the rows', () => {
    fc.assert(
      fc.property(shares, widths, (values, width) => {
        const geometry = layLadder(values.map((value, i) => rung(`r${i}`, value)), EU, width);
        expect(geometry.step).toBeGreaterThanOrEqual(5);
        for (const placed of geometry.rungs) expect(placed.x + placed.half).toBeLessThan(geometry.rowLeft - 13);
      }),
    );
  });
  test('where room is plenty the line of the zone runs straight', () => {
    const zone = layLadder(WASH, EU, 560).lines[0]!;
    expect(zone.yRight).toBe(zone.y);
  });
});

test('leaders of ordered rows do not cross', () => {
  const geometry = layLadder(WASH, EU, 560);
  const ordered = geometry.rungs.filter((placed) => placed.rung.zone === 'ordered');
  ordered.slice(1).forEach((placed, i) => {
    expect(placed.y).toBeGreaterThan(ordered[i]!.y);
    expect(placed.row).toBeGreaterThan(ordered[i]!.row);
  });
  expect(leaderPath(geometry, ordered[0]!)).toMatch(/^M\d+(\.\d)? \d+\.\dH\d+\.\dL\d+ -?\d+\.\dh4$/);
});

test('spread pushes down by what is above and lifts where the foot leaves no room', () => {
  const item = (want: number) => ({ want, above: 5, below: 5 });
  expect(spread([item(0), item(0), item(90)], 0, 100)).toEqual([5, 15, 90]);
  expect(spread([item(99), item(99)], 0, 100)).toEqual([85, 95]);
});

test('a row dragged takes the nearest free place and no ordered one', () => {
  const geometry = layLadder(WASH, EU, 560);
  const free = geometry.rungs.filter((placed) => placed.rung.isFree);
  expect(placeAt(geometry, -500)).toBe(0);
  expect(placeAt(geometry, 5000)).toBe(free.length - 1);
  expect(placeAt(geometry, free[2]!.row + 3)).toBe(2);
});

test('the doubtful pair is drawn larger where the rows leave room, else elsewhere', () => {
  expect(findLoupeSpot(layLadder(WASH, EU, 560))).not.toBeNull();
  const crowded = Array.from({ length: 30 }, (_, i) => rung(`r${i}`, 60 - i * 2));
  expect(findLoupeSpot(layLadder(crowded, EU, 560))).toBeNull();
});

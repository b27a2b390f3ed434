import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { firstUncovered, isBefore, isSooner, minus, rootOf, WAY, whereAllHold, type Beginning, type Course, type Demand, type Stretch } from '#shared/engine/line-course.ts';
import { compare, type Rational } from '#shared/kernel/rational.ts';

const at = (n: bigint, d: bigint, holds = true): Beginning => ({ s: { n, d }, holds });
const course = (now: bigint, end: bigint): Course => ({ now, end });

/** The figure at a place, by the definition of a straight course; the denominator is positive, so its sign is the figure's. */
const valueAt = ({ now, end }: Course, { n, d }: Rational): bigint => now * (d - n) + end * n;
const isMet = ({ course: one, orZero }: Demand, s: Rational): boolean => valueAt(one, s) > 0n || (orZero && valueAt(one, s) === 0n);

/** Whether a point lies in a stretch: `from.holds` takes the first point in, `to.holds` leaves the last one out. */
function lies({ from, to }: Stretch, s: Rational): boolean {
  const low = compare(from.s, s);
  const high = compare(s, to.s);
  return (low < 0 || (low === 0 && from.holds)) && (high < 0 || (high === 0 && !to.holds));
}

const anyFigure = fc.bigInt({ min: -30n, max: 30n });
const anyCourse = fc.record({ now: anyFigure, end: anyFigure });
const anyDemand = fc.record({ course: anyCourse, orZero: fc.boolean() });
/** Strictly between today and the whole. */
const anyPlace = fc.bigInt({ min: 1n, max: 119n }).map((n): Rational => ({ n, d: 120n }));

describe('a course', () => {
  test('is subtracted at both ends', () => {
    expect(minus(course(5n, 9n), course(2n, 10n))).toEqual(course(3n, -1n));
  });

  test('crosses zero a quarter of the way from one below to three above', () => {
    expect(rootOf(course(-1n, 3n))).toEqual({ n: 1n, d: 4n });
  });

  test.each([[1n, 3n], [-1n, -3n], [2n, 2n], [0n, 0n]])('from %s to %s crosses nowhere', (now, end) => {
    expect(rootOf(course(now, end))).toBeUndefined();
  });

  test('is exactly zero at its root, whatever it is', () => {
    fc.assert(fc.property(anyCourse, (one) => {
      const root = rootOf(one);
      if (root) expect(valueAt(one, root)).toBe(0n);
      else expect(one.now === one.end || one.now * one.end > 0n).toBe(true);
    }));
  });
});

describe('order on the way', () => {
  test('a third comes before a half and nothing before itself', () => {
    expect(isBefore({ n: 1n, d: 3n }, { n: 1n, d: 2n })).toBe(true);
    expect(isBefore({ n: 2n, d: 4n }, { n: 1n, d: 2n })).toBe(false);
  });

  test('a point comes before what is just behind it', () => {
    expect(isSooner(at(1n, 2n, true), at(2n, 4n, false))).toBe(true);
    expect(isSooner(at(1n, 2n, false), at(2n, 4n, true))).toBe(false);
    expect(isSooner(at(1n, 2n, true), at(1n, 2n, true))).toBe(false);
  });
});

describe('where demands hold', () => {
  test('nothing asked holds all the way', () => {
    expect(whereAllHold([])).toEqual(WAY);
  });

  test('a strict demand begins just behind its root, the other one at it', () => {
    expect(whereAllHold([{ course: course(-1n, 1n), orZero: false }])?.from).toEqual(at(1n, 2n, false));
    expect(whereAllHold([{ course: course(-1n, 1n), orZero: true }])?.from).toEqual(at(1n, 2n, true));
  });

  test('a course that is zero all the way holds only where zero is enough', () => {
    expect(whereAllHold([{ course: course(0n, 0n), orZero: true }])).toEqual(WAY);
    expect(whereAllHold([{ course: course(0n, 0n), orZero: false }])).toBeUndefined();
  });

  test('two demands that meet in one point hold there and nowhere else', () => {
    const both = (orZero: boolean): Stretch | undefined => whereAllHold([{ course: course(-1n, 1n), orZero: true }, { course: course(1n, -1n), orZero }]);
    expect(both(true)).toEqual({ from: at(1n, 2n, true), to: at(1n, 2n, false) });
    expect(both(false)).toBeUndefined();
  });

  test('the stretch holds exactly the points that meet every demand', () => {
    fc.assert(fc.property(fc.array(anyDemand, { maxLength: 4 }), anyPlace, (demands, s) => {
      const stretch = whereAllHold(demands);
      expect(stretch !== undefined && lies(stretch, s)).toBe(demands.every((one) => isMet(one, s)));
    }), { numRuns: 500 });
  });
});

describe('what is left uncovered', () => {
  const stretch = (from: Beginning, to: Beginning): Stretch => ({ from, to });

  test('covers that join leave what is behind the last of them', () => {
    const covers = [stretch(at(1n, 3n), at(2n, 3n)), stretch(at(0n, 1n, false), at(1n, 3n))];
    expect(firstUncovered(WAY, covers)).toEqual(at(2n, 3n));
  });

  test('a point between two covers is found', () => {
    const covers = [stretch(at(0n, 1n, false), at(1n, 2n)), stretch(at(1n, 2n, false), at(1n, 1n))];
    expect(firstUncovered(WAY, covers)).toEqual(at(1n, 2n));
  });

  test('covers without a gap leave nothing', () => {
    expect(firstUncovered(WAY, [stretch(at(0n, 1n, false), at(1n, 2n)), stretch(at(1n, 3n), at(1n, 1n))])).toBeUndefined();
  });

  test('the place found is covered by none, and every point before it by some', () => {
    const anyStretch = fc.array(anyDemand, { maxLength: 2 }).map((demands) => whereAllHold(demands)).filter((one) => one !== undefined);
    fc.assert(fc.property(fc.array(anyStretch, { maxLength: 4 }), anyPlace, (covers, s) => {
      const found = firstUncovered(WAY, covers);
      const isBeforeFound = found === undefined || isSooner({ s, holds: true }, found);
      if (isBeforeFound) expect(covers.some((one) => lies(one, s))).toBe(true);
      if (found?.holds) expect(covers.some((one) => lies(one, found.s))).toBe(false);
    }), { numRuns: 300 });
  });
});

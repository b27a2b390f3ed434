/**
 * Exact bounds against an independent linear-programme solver (HiGHS, from npm): one programme
 * for each place where the free part may begin, the widest answer of all. The solver works in
 * binary floating point, so figures are compared within 1e-7 of a percent.
 */
import { default as loadHighs } from 'highs';
import { describe, expect, test } from 'vitest';
import { decimal, toDecimal } from '#shared/kernel/rational.ts';
import { boundShares, type Place } from '#shared/reading/bound-shares.ts';

const NEAR = 1e-7;
const LISTS = 120;

function numbers(seed: number): (below: number) => number {
  let state = seed * 2 + 1;
  return (below) => {
    state = (state * 48271) % 2147483647;
    return state % below;
  };
}

const CAPS = ['0.1', '0.3', '0.5', '1', '1', '2', '2.95', '5', '10', '25', '40'];

function randomPlaces(next: (below: number) => number): Place[] {
  const count = 1 + next(9);
  return Array.from({ length: count }, (_, index): Place => ({
    kind: index > 0 && next(5) === 0 ? 'loose' : 'ordered',
    ...(next(3) === 0 && { cap: decimal(CAPS[next(CAPS.length)]!) }),
    ...(next(8) === 0 && { isPartOfOther: true }),
  }));
}

/** The programme of one cut: `x` the share itself, `y` what it adds to the sum. */
function programme(places: readonly Place[], cut: number, goal: number, sense: 'Minimize' | 'Maximize'): string {
  const ordered = places.flatMap((place, index) => (place.kind === 'ordered' ? [index] : []));
  const rows = [` sum: ${places.map((_, index) => `y${index}`).join(' + ')} = 100`];
  const bounds: string[] = [];
  places.forEach((place, index) => {
    const at = ordered.indexOf(index);
    const cap = place.cap ? Number(toDecimal(place.cap)) : 100;
    const isHead = at >= 0 && at < cut;
    bounds.push(` ${isHead ? 1 : 0} <= x${index} <= ${at >= cut ? Math.min(1, cap) : cap}`);
    bounds.push(` 0 <= y${index} <= 100`);
    rows.push(place.isPartOfOther ? ` p${index}: x${index} - y${index} >= 0` : ` p${index}: x${index} - y${index} = 0`);
    if (isHead && at > 0) rows.push(` o${index}: x${ordered[at - 1]} - x${index} >= 0`);
  });
  return `${sense}\n obj: x${goal}\nSubject To\n${rows.join('\n')}\nBounds\n${bounds.join('\n')}\nEnd`;
}

const show = (places: readonly Place[]): string[] | undefined => boundShares(places)?.map(({ min, max }) => `${toDecimal(min)} to ${toDecimal(max)}`);
const free: Place = { kind: 'ordered' };
const capped = (cap: string): Place => ({ kind: 'ordered', cap: decimal(cap) });

describe('bounds worked by hand', () => {
  test.each<[string, Place[], string[]]>([
    ['one name is the whole', [free], ['100 to 100']],
    ['two names share in order', [free, free], ['50 to 100', '0 to 50']],
    ['three names', [free, free, free], ['33.333333333333 to 100', '0 to 50', '0 to 33.333333333333']],
    ['what follows one capped at 1 is at most 1', [free, free, capped('1'), free], ['49 to 100', '0 to 50', '0 to 1', '0 to 1']],
    ['a cap above 1 bounds what follows it', [free, capped('5'), free], ['90 to 100', '0 to 5', '0 to 5']],
    // Below 1 % the order is free: the second may be 0.4 and the third 1.
    ['a cap below 1 frees what follows up to 1', [free, capped('0.4'), free], ['98.6 to 100', '0 to 0.4', '0 to 1']],
    ['a closing colourant has no order', [free, free, { kind: 'loose' }], ['0 to 100', '0 to 50', '0 to 100']],
    ['an allergen inside a perfume adds nothing of its own', [free, free, { kind: 'ordered', isPartOfOther: true }], ['33.333333333333 to 100', '0 to 50', '0 to 50']],
  ])('%s', (_, places, expected) => {
    expect(show(places)).toEqual(expected);
  });

  test.each<[string, Place[]]>([
    ['the first is capped at 1', [capped('1'), free]],
    ['all are capped', [capped('40'), capped('30'), capped('20')]],
  ])('no composition fits where %s', (_, places) => {
    expect(show(places)).toBeUndefined();
  });
});

test(`${LISTS} random lists have the bounds of the linear programme`, async () => {
  const highs = await loadHighs();
  const next = numbers(20261);
  let compared = 0;
  let impossible = 0;
  for (let index = 0; index < LISTS; index += 1) {
    const places = randomPlaces(next);
    const cuts = places.filter(({ kind }) => kind === 'ordered').length;
    const ours = boundShares(places);
    for (let goal = 0; goal < places.length; goal += 1) {
      let [min, max] = [Infinity, -Infinity];
      for (let cut = 0; cut <= cuts; cut += 1) {
        for (const sense of ['Minimize', 'Maximize'] as const) {
          const solved = highs.solve(programme(places, cut, goal, sense), { primal_feasibility_tolerance: 1e-9, dual_feasibility_tolerance: 1e-9, presolve: 'off' });
          if (solved.Status !== 'Optimal') continue;
          min = Math.min(min, solved.ObjectiveValue);
          max = Math.max(max, solved.ObjectiveValue);
        }
      }
      if (min === Infinity) {
        expect(ours, JSON.stringify(index)).toBeUndefined();
        impossible += 1;
        continue;
      }
      const bounds = ours?.[goal];
      expect(bounds, `list ${index}`).toBeDefined();
      expect(Math.abs(Number(toDecimal(bounds!.min)) - min), `list ${index}, least of ${goal}`).toBeLessThan(NEAR);
      expect(Math.abs(Number(toDecimal(bounds!.max)) - max), `list ${index}, most of ${goal}`).toBeLessThan(NEAR);
      compared += 1;
    }
  }
  expect(compared).toBeGreaterThan(300);
  expect(impossible).toBeGreaterThan(5);
}, 120_000);

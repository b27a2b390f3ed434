import { rational, type Rational } from '#shared/kernel/rational.ts';

/**
 * A figure while one line's share runs from today's (`s = 0`) to the whole product (`s = 1`),
 * the other lines in proportion: every share, and every least or greatest sum of shares, is
 * linear in that share. Both ends are whole numbers over one denominator.
 */
export interface Course {
  readonly now: bigint;
  readonly end: bigint;
}

/** `course` above 0, or at 0 and above. */
export interface Demand {
  readonly course: Course;
  readonly orZero: boolean;
}

/** Where something begins on the way; `holds` says whether it does at that very place. */
export interface Beginning {
  readonly s: Rational;
  readonly holds: boolean;
}

export function minus(a: Course, b: Course): Course {
  return { now: a.now - b.now, end: a.end - b.end };
}

/** The place where the course is 0, where it crosses at all after today and before the whole. */
export function rootOf({ now, end }: Course): Rational | undefined {
  if (now === end || (now > 0n && end > 0n) || (now < 0n && end < 0n)) return undefined;
  return rational(now, now - end);
}

export function isBefore(a: Rational, b: Rational): boolean {
  return a.n * b.d < b.n * a.d;
}

/** Whether all demands hold at `s`. */
export function holdsAt(demands: readonly Demand[], s: Rational): boolean {
  return demands.every(({ course, orZero }) => {
    const value = course.now * (s.d - s.n) + course.end * s.n;
    return value > 0n || (orZero && value === 0n);
  });
}

export function middle(a: Rational, b: Rational): Rational {
  return { n: a.n * b.d + b.n * a.d, d: a.d * b.d * 2n };
}

const START: Rational = { n: 0n, d: 1n };
const WHOLE: Rational = { n: 1n, d: 1n };

/**
 * Where on the way from today to the whole all demands first hold together, `extra` being
 * further places where `when` may change its answer; `undefined` where they never do.
 */
export function firstHolding(demands: readonly Demand[], when?: { readonly holds: (s: Rational) => boolean; readonly places: readonly Rational[] }): Beginning | undefined {
  // Demands that fail at both ends fail all the way.
  if (demands.some(({ course }) => course.now < 0n && course.end < 0n)) return undefined;
  const places = [START, ...demands.flatMap(({ course }) => rootOf(course) ?? []), ...(when?.places ?? []), WHOLE].sort((a, b) => (isBefore(a, b) ? -1 : isBefore(b, a) ? 1 : 0));
  const isTrue = (s: Rational): boolean => holdsAt(demands, s) && (when?.holds(s) ?? true);
  for (let index = 0; index < places.length; index += 1) {
    const here = places[index]!;
    if (here.n > 0n && isBefore(here, WHOLE) && isTrue(here)) return { s: here, holds: true };
    const next = places[index + 1];
    if (next && isBefore(here, next) && isTrue(middle(here, next))) return { s: here, holds: false };
  }
  return undefined;
}

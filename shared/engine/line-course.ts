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

/** A part of the way, from one place up to and without another; `holds` says whether a place is the point itself or just behind it. */
export interface Stretch {
  readonly from: Beginning;
  readonly to: Beginning;
}

/** All of the way between today and the whole, without either. */
export const WAY: Stretch = { from: { s: { n: 0n, d: 1n }, holds: false }, to: { s: { n: 1n, d: 1n }, holds: true } };

/** Whether `a` comes sooner on the way: a point comes before what is just behind it. */
export function isSooner(a: Beginning, b: Beginning): boolean {
  const left = a.s.n * b.s.d;
  const right = b.s.n * a.s.d;
  return left < right || (left === right && a.holds && !b.holds);
}

/**
 * Where on a stretch all demands hold together: a demand of something linear holds on one side of
 * its root, so that is a stretch again, or nothing.
 */
export function whereAllHold(demands: readonly Demand[], { from, to }: Stretch = WAY): Stretch | undefined {
  for (const { course, orZero } of demands) {
    const { now, end } = course;
    if (now > 0n && end > 0n) continue;
    if (now < 0n && end < 0n) return undefined;
    if (now === end) {
      if (!orZero) return undefined;
    } else if (end > now) {
      const place: Beginning = { s: { n: -now, d: end - now }, holds: orZero };
      if (isSooner(from, place)) from = place;
    } else {
      const place: Beginning = { s: { n: now, d: now - end }, holds: !orZero };
      if (isSooner(place, to)) to = place;
    }
  }
  return isSooner(from, to) ? { from, to } : undefined;
}

/** The first place of a stretch that none of the others covers. */
export function firstUncovered({ from, to }: Stretch, covers: readonly Stretch[]): Beginning | undefined {
  let place = from;
  for (let isCovered = true; isCovered;) {
    isCovered = false;
    for (const cover of covers) {
      if (isSooner(place, cover.from) || !isSooner(place, cover.to)) continue;
      place = cover.to;
      if (!isSooner(place, to)) return undefined;
      isCovered = true;
    }
  }
  return place;
}

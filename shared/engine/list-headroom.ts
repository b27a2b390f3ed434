import { toBig } from '#shared/kernel/figure.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Market } from '#shared/law/types.ts';
import type { Blend } from './blend.ts';
import { ListedEntry } from './entry.ts';
import type { Declaration } from './assessment.ts';
import { firstHolding, isBefore, minus, rootOf, type Beginning, type Course, type Demand } from './line-course.ts';
import { LIST_LAW } from './list-law.ts';

/** Where a finding that is not there today begins. */
export interface NewFinding extends Beginning {
  readonly rule: string;
}

interface Entry {
  readonly listed: ListedEntry;
  readonly keys: readonly string[];
  readonly lo: Course;
  readonly typ: Course;
  readonly hi: Course;
}

/** The list of today, of the line's material alone, and the denominator both are brought to. */
interface Way {
  readonly now: Blend;
  readonly end: Blend;
  readonly market: Market;
  readonly one: Course;
}

/**
 * The first uncertainty of place or order that a line brings on its way up. Every pair and every
 * entry is asked where its own conditions first hold together; nothing is tried out.
 */
export function findListFinding(now: Blend, end: Blend, declaration: Declaration, market: Market): NewFinding | undefined {
  const den = now.den * end.den;
  const way: Way = { now, end, market, one: { now: den, end: den } };
  const entries = declaration.entries.flatMap((listed) => (listed instanceof ListedEntry && listed.zone !== 'colourant' ? [coursesOf(listed, way)] : []));
  let first: NewFinding | undefined;
  const take = (found: Beginning | undefined, rule: string): void => {
    if (found && (!first || isBefore(found.s, first.s) || (found.holds && !first.holds && !isBefore(first.s, found.s)))) first = { ...found, rule };
  };
  for (const entry of entries) take(findStraddle(entry, way), 'zone-proved');
  const today = new Set(declaration.uncertainPairs.map(({ first: a, second: b }) => `${a.inci}|${b.inci}`));
  const ordered = entries.filter(({ typ }) => typ.now >= den || typ.end >= den);
  for (const a of ordered) {
    for (const b of ordered) {
      if (a !== b && canTurn(a, b) && !today.has(`${a.listed.inci}|${b.listed.inci}`)) take(findTurn(a, b, ordered, way), 'order-proved');
    }
  }
  return first;
}

function coursesOf(listed: ListedEntry, { now, end }: Way): Entry {
  const { share, keys } = listed;
  const last = keys.some((key) => end.find(key)?.as.ingredient) ? end.ingredientShare(keys) : { lo: 0n, typ: 0n, hi: 0n };
  const course = (a: bigint | number, b: bigint | number): Course => ({ now: toBig(a) * end.den, end: toBig(b) * now.den });
  return { listed, keys, lo: course(share.lo, last.lo), typ: course(share.typ, last.typ), hi: course(share.hi, last.hi) };
}

/** On both sides of the 1 % line. */
function findStraddle({ listed, lo, hi }: Entry, { market, one }: Way): Beginning | undefined {
  if (listed.straddles || (lo.now === hi.now && lo.end === hi.end)) return undefined;
  const { ordersOne } = LIST_LAW[market];
  return firstHolding([{ course: minus(hi, one), orZero: ordersOne }, { course: minus(one, lo), orZero: !ordersOne }]);
}

/** False where `a` is never below `b`: their ranges stay apart all the way. */
function canTurn(a: Entry, b: Entry): boolean {
  return a.lo.now < b.hi.now || a.lo.end < b.hi.end;
}

function findTurn(a: Entry, b: Entry, ordered: readonly Entry[], way: Way): Beginning | undefined {
  const leads: Demand = { course: minus(a.typ, b.typ), orZero: a.listed.name < b.listed.name };
  if (leads.course.now < 0n && leads.course.end < 0n) return undefined;
  const { ordersOne } = LIST_LAW[way.market];
  const turns: Demand = { course: negative(leadOf(a, b, way)), orZero: false };
  const demands = [leads, turns, { course: minus(b.typ, way.one), orZero: ordersOne }];
  if (!firstHolding(demands)) return undefined;
  const others = ordered.filter((one) => one !== a && one !== b);
  const places = others.flatMap(({ typ }) => [minus(typ, a.typ), minus(typ, b.typ)]).flatMap((course) => rootOf(course) ?? []);
  return firstHolding(demands, { places, holds: (s) => !others.some((one) => isAhead(a, one, s) && isAhead(one, b, s)) });
}

function isAhead(a: Entry, b: Entry, s: Rational): boolean {
  const { now, end } = minus(a.typ, b.typ);
  const value = now * (s.d - s.n) + end * s.n;
  return value > 0n || (value === 0n && a.listed.name < b.listed.name);
}

function negative({ now, end }: Course): Course {
  return { now: -now, end: -end };
}

/** The least that the first can lead the second by, today and at the end. */
function leadOf(a: Entry, b: Entry, { now, end }: Way): Course {
  return { now: now.leastLead(a.keys, b.keys).n * end.den, end: end.leastLead(a.keys, b.keys).n * now.den };
}

import { toBig } from '#shared/kernel/figure.ts';
import type { Market } from '#shared/law/types.ts';
import type { Blend } from './blend.ts';
import { ListedEntry } from './entry.ts';
import type { Declaration } from './assessment.ts';
import { firstUncovered, isSooner, minus, WAY, whereAllHold, type Beginning, type Course, type Demand, type Stretch } from './line-course.ts';
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
  /** Today and at the end its share is one figure. */
  readonly isFixed: boolean;
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
 * entry is asked where its own conditions first hold together; nothing is tried out, and nothing
 * is asked that could only begin behind what is found already.
 */
export function findListFinding(now: Blend, end: Blend, declaration: Declaration, market: Market): NewFinding | undefined {
  const den = now.den * end.den;
  const way: Way = { now, end, market, one: { now: den, end: den } };
  const entries = declaration.entries.flatMap((listed) => (listed instanceof ListedEntry && listed.zone !== 'colourant' ? [coursesOf(listed, way)] : []));
  let first: NewFinding | undefined;
  for (const entry of entries) {
    const found = findStraddle(entry, way);
    if (found && (!first || isSooner(found, first))) first = { ...found, rule: 'zone-proved' };
  }
  const today = new Set(declaration.uncertainPairs.map(({ first: a, second: b }) => `${a.inci}|${b.inci}`));
  const ordered = entries.filter(({ typ }) => typ.now >= den || typ.end >= den);
  for (const a of ordered) {
    for (const b of ordered) {
      // What is sure of both is never turned round.
      if (a === b || (a.isFixed && b.isFixed) || isLess(a.typ, b.typ) || !canTurn(a, b) || today.has(`${a.listed.inci}|${b.listed.inci}`)) continue;
      const found = findTurn(a, b, ordered, way, first ?? WAY.to);
      if (found) first = { ...found, rule: 'order-proved' };
    }
  }
  return first;
}

function coursesOf(listed: ListedEntry, { now, end }: Way): Entry {
  const { share, keys } = listed;
  const last = keys.some((key) => end.find(key)?.as.ingredient) ? end.ingredientShare(keys) : { lo: 0n, typ: 0n, hi: 0n };
  const course = (a: bigint | number, b: bigint | number): Course => ({ now: toBig(a) * end.den, end: toBig(b) * now.den });
  const isFixed = share.lo === share.hi && share.typ === share.hi && last.lo === last.hi && last.typ === last.hi;
  const typ = course(share.typ, last.typ);
  return isFixed ? { listed, keys, lo: typ, typ, hi: typ, isFixed } : { listed, keys, lo: course(share.lo, last.lo), typ, hi: course(share.hi, last.hi), isFixed };
}

/** On both sides of the 1 % line. */
function findStraddle({ listed, lo, hi }: Entry, { market, one }: Way): Beginning | undefined {
  if (listed.straddles || (lo.now === hi.now && lo.end === hi.end)) return undefined;
  const { ordersOne } = LIST_LAW[market];
  return whereAllHold([{ course: minus(hi, one), orZero: ordersOne }, { course: minus(one, lo), orZero: !ordersOne }])?.from;
}

/** Less all the way. */
function isLess(a: Course, b: Course): boolean {
  return a.now < b.now && a.end < b.end;
}

/** False where `a` is never below `b`: their ranges stay apart all the way. */
function canTurn(a: Entry, b: Entry): boolean {
  return a.lo.now < b.hi.now || a.lo.end < b.hi.end;
}

/** Where `a` first stands right before `b` and some composition puts them the other way round; only what begins before `until`. */
function findTurn(a: Entry, b: Entry, ordered: readonly Entry[], way: Way, until: Beginning): Beginning | undefined {
  const { ordersOne } = LIST_LAW[way.market];
  // The lead needs a proof of its own, which costs more than what it needs besides.
  const leads = whereAllHold([leadsBy(a, b), { course: minus(b.typ, way.one), orZero: ordersOne }, { course: minus(b.hi, a.lo), orZero: false }], { from: WAY.from, to: until });
  const turns = leads && whereAllHold([{ course: negative(leadOf(a, b, way)), orZero: false }], leads);
  if (!turns) return undefined;
  const between = (one: Entry): Stretch[] => {
    const stretch = one === a || one === b || isLess(a.typ, one.typ) || isLess(one.typ, b.typ) ? undefined : whereAllHold([leadsBy(a, one), leadsBy(one, b)], turns);
    return stretch ? [stretch] : [];
  };
  return firstUncovered(turns, ordered.flatMap(between));
}

/** `a` stands before `b`: more of it, or as much and an earlier name. */
function leadsBy(a: Entry, b: Entry): Demand {
  return { course: minus(a.typ, b.typ), orZero: a.listed.name < b.listed.name };
}

function negative({ now, end }: Course): Course {
  return { now: -now, end: -end };
}

/** The least that the first can lead the second by, today and at the end. */
function leadOf(a: Entry, b: Entry, { now, end }: Way): Course {
  return { now: now.leastLead(a.keys, b.keys).n * end.den, end: end.leastLead(a.keys, b.keys).n * now.den };
}

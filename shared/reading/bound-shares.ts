import { add, compare, HUNDRED, larger, ONE, rational, smaller, subtract, ZERO, type Rational } from '#shared/kernel/rational.ts';

/** One name of a list as its place and the law bound it. Shares in percent of the product. */
export interface Place {
  /** `ordered`: descending down to the free part; `loose`: no order at all (closing colourants, shades). */
  readonly kind: 'ordered' | 'loose';
  /** The most the law allows; absent: 100. */
  readonly cap?: Rational;
  /** May be part of another name's mass (an allergen of a perfume), or absent (a shade): need not add to the sum. */
  readonly isPartOfOther?: boolean;
}

export interface Bounds {
  readonly min: Rational;
  readonly max: Rational;
}

/** What the cut of the list at one place gives: the first `count` ordered names hold 1 % or more, the rest 1 % or less. */
interface Cut {
  readonly count: number;
  /** Greatest share of each ordered name. */
  readonly tops: readonly Rational[];
  readonly loose: readonly Rational[];
  /** Least that all names together can be, and most. */
  readonly least: Rational;
  readonly most: Rational;
}

/**
 * Exact bounds on each share: names stand in descending order down to 1 %, below it in any
 * order; none exceeds its cap; all together are 100. Where the free part begins is not
 * printed, so each cut is solved and the widest answer taken. All bounds are closed ("at most
 * 1" where the law says "less than 1"). `undefined` where no composition fits at all.
 *
 * For one cut the programme has a closed form: the chain's tops are the running least of its
 * caps, and a share's bounds follow from the least and the most that all others can add.
 */
export function boundShares(places: readonly Place[]): readonly Bounds[] | undefined {
  const ordered = places.filter((place) => place.kind === 'ordered');
  const loose = places.filter((place) => place.kind === 'loose');
  let widest: (Bounds | undefined)[] = [];
  for (let count = 0; count <= ordered.length; count += 1) {
    const cut = makeCut(ordered, loose, count);
    if (!cut) break;
    if (compare(cut.least, HUNDRED) > 0 || compare(cut.most, HUNDRED) < 0) continue;
    const chain = ordered.map((_, index) => (index < count ? boundOrdered(ordered, cut, index) : boundFree(ordered[index]!, cut.tops[index]!, cut)));
    const rest = loose.map((place, index) => boundFree(place, cut.loose[index]!, cut));
    widest = [...chain, ...rest].map((bounds, index) => widen(widest[index], bounds));
  }
  if (widest.length === 0) return undefined;
  let nextOrdered = 0;
  let nextLoose = ordered.length;
  return places.map((place) => widest[place.kind === 'ordered' ? nextOrdered++ : nextLoose++]!);
}

function widen(known: Bounds | undefined, more: Bounds): Bounds {
  return known ? { min: smaller(known.min, more.min), max: larger(known.max, more.max) } : more;
}

function makeCut(ordered: readonly Place[], loose: readonly Place[], count: number): Cut | undefined {
  const tops: Rational[] = [];
  let top = HUNDRED;
  let least = ZERO;
  for (const [index, place] of ordered.entries()) {
    if (index < count) {
      top = smaller(top, place.cap ?? HUNDRED);
      if (compare(top, ONE) < 0) return undefined;
      tops.push(top);
      if (!place.isPartOfOther) least = add(least, ONE);
    } else tops.push(smaller(ONE, place.cap ?? HUNDRED));
  }
  const looseTops = loose.map((place) => smaller(HUNDRED, place.cap ?? HUNDRED));
  const most = [...tops, ...looseTops].reduce(add, ZERO);
  return { count, tops, loose: looseTops, least, most };
}

/** A share without order: what the others leave to it, and what they leave open. */
function boundFree(place: Place, top: Rational, cut: Cut): Bounds {
  const max = place.isPartOfOther ? top : smaller(top, subtract(HUNDRED, cut.least));
  const othersMost = subtract(cut.most, top);
  return { min: larger(ZERO, subtract(HUNDRED, othersMost)), max };
}

/** A share of the chain: at most what those before it (as large or larger) leave, at least what those after it (as small or smaller) need. */
function boundOrdered(ordered: readonly Place[], cut: Cut, index: number): Bounds {
  let heads = 0n;
  let tails = 0n;
  for (let at = 0; at < cut.count; at += 1) {
    if (ordered[at]!.isPartOfOther) continue;
    if (at <= index) heads += 1n;
    else tails += 1n;
  }
  const top = cut.tops[index]!;
  const max = heads === 0n ? top : smaller(top, rational(100n - tails, heads));
  return { min: leastOrdered(cut, index), max };
}

/** The least share with which the sum can still reach 100: everything before it at its top, everything after it no larger than it. */
function leastOrdered(cut: Cut, index: number): Rational {
  const chain = cut.tops.slice(index, cut.count);
  let missing = subtract(HUNDRED, subtract(cut.most, chain.reduce(add, ZERO)));
  // Those with a smaller top than the answer are full; the tops never rise, so they close the chain.
  for (let last = chain.length; last >= 1; last -= 1) {
    const each = { n: missing.n, d: missing.d * BigInt(last) };
    const next = chain[last];
    if (compare(each, chain[last - 1]!) <= 0 && (next === undefined || compare(each, next) >= 0)) return larger(ONE, each);
    missing = subtract(missing, chain[last - 1]!);
  }
  return ONE;
}

import { compare, reduce, type Rational } from '#shared/kernel/rational.ts';
import type { HeadroomLine } from './assessment.ts';
import { blendAlone, type Blend } from './blend.ts';
import { isBefore, rootOf, type Course } from './line-course.ts';
import type { NewFinding } from './list-headroom.ts';
import type { PreparedMaterial } from './prepare-material.ts';
import type { Finding, Interval } from './types.ts';

/** How headroom asks about the product with a line at another share, all other lines in proportion. */
export interface HeadroomInput {
  readonly blend: Blend;
  readonly today: readonly Finding[];
  /** The material of a line. */
  materialOf(line: number): PreparedMaterial | undefined;
  /** The product mixed so. */
  mixAt(line: number, share: Rational): Blend;
  /** Findings that rest on amounts and are not on the list's order: law and allergens to come. */
  judge(blend: Blend): readonly Finding[];
  /** As `judge`, with the findings on the list and its order. */
  judgeWide(blend: Blend): readonly Finding[];
  /** Every finding: for the few lines whose materials take no part today. */
  judgeAll(blend: Blend): readonly Finding[];
  /** Weighted sums and what they are compared with, in percent. */
  readonly thresholds: readonly Comparison[];
  /** The first uncertainty of the list on the way to the line's material alone. */
  findListFinding(end: Blend): NewFinding | undefined;
  /** The same questions about a product where a line of no weight has some. */
  withBlend(blend: Blend): HeadroomInput;
}

export interface Comparison {
  readonly limit: Rational;
  /** Substances that the sum counts. */
  readonly keys: readonly string[];
  /** Where crossing it changes the list itself. */
  readonly changesList: boolean;
  /** A least share, promised by a claim: falling below it is found too. */
  readonly isLeast?: boolean;
  weigh(blend: Blend): Interval;
}

const START: Rational = { n: 0n, d: 1n };
const WHOLE: Rational = { n: 1n, d: 1n };
const PLACES = 10n ** 12n;

/** A share that no printed figure tells from 0, in percent. */
const TRACE: Rational = { n: 1n, d: 10n ** 15n };

/**
 * For each line the largest share up to which no finding appears that is not there today: the
 * first place where one begins, worked out exactly. Between two neighbouring thresholds nothing
 * changes, so the law is asked once between each two, from today upwards.
 */
export function findHeadroom(input: HeadroomInput): HeadroomLine[] {
  const { weighed } = input.blend;
  const known = new Set(input.today.map(identity));
  const fresh: Fresh = (findings) => findings.find((finding) => !known.has(identity(finding)));
  const reach = reachOf(input);
  return weighed.masses.map((mass, line): HeadroomLine => {
    const none = { line, max: null, limitedBy: null };
    const material = input.materialOf(line);
    if (weighed.total === 0n || mass === weighed.total || !material) return none;
    if (mass > 0n) return { line, ...(reach.isBound(material) ? findBound(input, reach.today, { line, material, fresh }) : UNBOUND) };
    // Its materials may take no part today: whatever they bring begins at once.
    const other = input.withBlend(input.mixAt(line, TRACE));
    const found = fresh(other.judgeAll(other.blend));
    return found ? { line, max: '0', limitedBy: found.rule } : { line, ...findBound(other, reachOf(other).today, { line, material, fresh }) };
  });
}

const UNBOUND = { max: null, limitedBy: null };

type Fresh = (findings: readonly Finding[]) => Finding | undefined;

/** Today's sums, and which materials any threshold or range has to do with. */
function reachOf({ thresholds, blend }: HeadroomInput): { readonly today: readonly Interval[]; isBound(material: PreparedMaterial): boolean } {
  const today = thresholds.map((one) => one.weigh(blend));
  const isWide = blend.plan.hasRanges || thresholds.some(({ isLeast }) => isLeast) || today.some(({ min, max }) => compare(min, max) !== 0);
  const touched = new Set<PreparedMaterial>();
  if (!isWide) {
    for (const { keys } of thresholds) for (const key of keys) for (const { at } of blend.find(key)?.occurrences ?? []) touched.add(blend.materials[at]!.prepared);
  }
  return { today, isBound: (material) => isWide || touched.has(material) };
}

interface Line {
  readonly line: number;
  readonly material: PreparedMaterial;
  readonly fresh: Fresh;
}

function findBound(input: HeadroomInput, today: readonly Interval[], { line, material, fresh }: Line): Omit<HeadroomLine, 'line'> {
  const { masses, total } = input.blend.weighed;
  const now: Rational = { n: masses[line]! * 100n, d: total };
  const shareAt = (s: Rational): Rational => reduce({ n: now.n * (s.d - s.n) + 100n * now.d * s.n, d: now.d * s.d });
  const end = blendAlone(material);
  const onList = input.blend.plan.hasRanges ? input.findListFinding(end) : undefined;
  const freshAt = (share: Rational, isWide: boolean): Finding | undefined => fresh((isWide ? input.judgeWide : input.judge)(input.mixAt(line, share)));
  const ofLaw = findLawFinding(input, today, end, {
    until: onList?.s ?? WHOLE,
    freshAt: (s, isWide) => freshAt(shareAt(s), isWide),
    freshBetween: (a, b, isWide) => freshAt(shortestBetween(shareAt(a), shareAt(b)), isWide),
  });
  const first = ofLaw ?? onList;
  return first ? { max: largestBelow(shareAt(first.s), first.holds), limitedBy: first.rule } : UNBOUND;
}

/**
 * What makes a finding the same one: its kind, its rule and what it is about. A sum is about its
 * members, whichever of them is the greatest; a text that is due is the same text.
 */
export function identity({ kind, rule, subject, members }: Finding): string {
  const isWording = kind === 'wording-required' || kind === 'wording-missing';
  return [kind, rule, ...(isWording ? [] : (members ?? [subject]))].join('|');
}

interface Asking {
  readonly until: Rational;
  freshAt(s: Rational, isWide: boolean): Finding | undefined;
  freshBetween(a: Rational, b: Rational, isWide: boolean): Finding | undefined;
}

function findLawFinding({ thresholds }: HeadroomInput, today: readonly Interval[], end: Blend, { until, freshAt, freshBetween }: Asking): NewFinding | undefined {
  const places = new Map<string, { s: Rational; isWide: boolean }>();
  thresholds.forEach((threshold, index) => {
    const now = today[index]!;
    const last = threshold.keys.some((key) => end.find(key)) ? threshold.weigh(end) : undefined;
    // What dilutes can only turn one finding into another where there is a range.
    if (!last && !threshold.isLeast && compare(now.min, now.max) === 0) return;
    const isFixed = compare(now.min, now.max) === 0 && (!last || compare(last.min, last.max) === 0);
    for (const side of isFixed ? (['max'] as const) : (['min', 'max'] as const)) {
      const course = courseOf(now[side], last?.[side], threshold.limit);
      if (isFixed && !threshold.isLeast && course.end <= 0n) continue;
      const s = rootOf(course);
      if (s && isBefore(s, until)) places.set(keyOf(s), { s, isWide: threshold.changesList || (places.get(keyOf(s))?.isWide ?? false) });
    }
  });
  const sorted = [...places.values()].sort((a, b) => (isBefore(a.s, b.s) ? -1 : 1));
  for (let index = 0; index < sorted.length; index += 1) {
    const { s, isWide } = sorted[index]!;
    const beyond = freshBetween(s, sorted[index + 1]?.s ?? until, isWide);
    if (!beyond) continue;
    const there = s.n > START.n ? freshAt(s, isWide) : undefined;
    return { s, holds: there !== undefined, rule: (there ?? beyond).rule };
  }
  return undefined;
}

/** Lowest terms are not needed: the same root of the same courses, or near enough to be sorted beside it. */
function keyOf({ n, d }: Rational): string {
  return `${n}/${d}`;
}

/** A sum less its limit, today and at the end, over one denominator. */
function courseOf(now: Rational, last: Rational | undefined, limit: Rational): Course {
  const at = last ?? START;
  const a = (now.n * limit.d - limit.n * now.d) * at.d;
  const b = (at.n * limit.d - limit.n * at.d) * now.d;
  return { now: a, end: b };
}

/**
 * The decimal with the fewest places strictly between two shares, or the share where both are one. Between neighbouring thresholds
 * every share is judged alike, and short figures are weighed much faster than long ones.
 */
function shortestBetween(a: Rational, b: Rational): Rational {
  // Two thresholds may be crossed at one and the same share.
  if (!isBefore(a, b)) return a;
  for (let d = 1n; ; d *= 10n) {
    const n = (a.n * d) / a.d + 1n;
    if (n * b.d < b.n * d) return { n, d };
  }
}

/** The share itself, cut to 12 places; the next lower figure where the finding is there at the share itself. */
function largestBelow({ n, d }: Rational, isTaken: boolean): string {
  const scaled = n * PLACES;
  const floor = scaled / d;
  const value = isTaken && floor * d === scaled ? floor - 1n : floor;
  if (value <= 0n) return '0';
  const digits = value.toString().padStart(13, '0');
  const fraction = digits.slice(-12).replace(/0+$/, '');
  return fraction === '' ? digits.slice(0, -12) : `${digits.slice(0, -12)}.${fraction}`;
}

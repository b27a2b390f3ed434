import { compare, HUNDRED, parseDecimal, reduce, toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { HeadroomLine } from './assessment.ts';
import type { Finding } from './types.ts';
import type { WeighedLines } from './weigh-lines.ts';

/** Findings of the product with a line at another share, all other lines in proportion. */
export type FindingsAt = (line: number, share: Rational) => readonly Finding[];

/** Steps of halving that narrow 100 % to well under the 12th decimal. */
const HALVINGS = 60;

/**
 * For each line the largest share up to which no finding appears that is not there today.
 * Every measured value is linear in the line's share, so a rule that a line breaks on its way
 * up stays broken to 100 %: asking there finds the lines that have a bound at all. `isBound`
 * leaves out lines whose materials no row of law speaks of.
 */
export function findHeadroom(weighed: WeighedLines, today: readonly Finding[], findingsAt: FindingsAt, isBound: (line: number) => boolean): HeadroomLine[] {
  const known = new Set(today.map(identity));
  return weighed.masses.map((mass, line): HeadroomLine => {
    const now: Rational = { n: mass * 100n, d: weighed.total === 0n ? 1n : weighed.total };
    if (weighed.total === 0n || mass === weighed.total || !isBound(line)) return { line, max: null, limitedBy: null };
    const fresh = (share: Rational): readonly Finding[] => findingsAt(line, share).filter((finding) => !known.has(identity(finding)));
    const atMost = fresh(HUNDRED);
    if (atMost.length === 0) return { line, max: null, limitedBy: null };
    return { line, ...findBound(now, atMost, fresh) };
  });
}

function identity({ kind, rule, subject, members }: Finding): string {
  return [kind, rule, subject, ...(members ?? [])].join('|');
}

function findBound(now: Rational, atMost: readonly Finding[], fresh: (share: Rational) => readonly Finding[]): { max: string; limitedBy: string } {
  const guess = guessCrossing(now, atMost, fresh);
  if (guess) return guess;
  let least = now;
  let most = HUNDRED;
  let breaks = atMost;
  for (let step = 0; step < HALVINGS; step += 1) {
    const middle = reduce({ n: least.n * most.d + most.n * least.d, d: least.d * most.d * 2n });
    const found = fresh(middle);
    if (found.length === 0) least = middle;
    else {
      most = middle;
      breaks = found;
    }
  }
  return { max: toDecimal(most), limitedBy: breaks[0]!.rule };
}

/**
 * The share where the first measured value meets its limit, from the reading at 100 %. The
 * answer is taken only when nothing new is found just below it and something is just above.
 */
function guessCrossing(now: Rational, atMost: readonly Finding[], fresh: (share: Rational) => readonly Finding[]): { max: string; limitedBy: string } | undefined {
  const measured = atMost.filter((finding) => finding.limit !== undefined && finding.measured !== undefined);
  if (measured.length === 0) return undefined;
  let best: Rational | undefined;
  for (const finding of measured) {
    const crossing = crossingOf(finding);
    if (crossing && (!best || compare(crossing, best) < 0)) best = crossing;
  }
  if (!best || compare(best, now) < 0) return undefined;
  const rounded = parseDecimal(toDecimal(best))!;
  const step: Rational = { n: 2n, d: 10n ** 12n };
  const below = { n: rounded.n * step.d - step.n * rounded.d, d: rounded.d * step.d };
  const above = { n: rounded.n * step.d + step.n * rounded.d, d: rounded.d * step.d };
  if (compare(below, now) > 0 && fresh(below).length > 0) return undefined;
  const found = fresh(above);
  return found.length > 0 ? { max: toDecimal(best), limitedBy: found[0]!.rule } : undefined;
}

/** Where the measured value meets its limit, where no other line brings the substance. */
function crossingOf(finding: Finding): Rational | undefined {
  const limit = parseDecimal(finding.limit!);
  const top = parseDecimal(finding.measuredRange?.max ?? finding.measured!);
  if (!limit || !top || top.n <= 0n) return undefined;
  // The line alone brings its part: with nothing of it in the other lines, value = share × top / 100.
  return { n: limit.n * 100n * top.d, d: limit.d * top.n };
}

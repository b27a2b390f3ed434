import { add, compare, decimal, divide, multiply, parseDecimal, ZERO } from '#shared/kernel/rational.ts';
import { isInForce } from '#shared/law/as-at.ts';
import type { Dates } from '#shared/law/types.ts';
import type { Interval, Mixture, ProductFacts, Substance } from '#shared/engine/types.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Context } from '../context.ts';
import { spokenOf } from '../substances/spoken-of.ts';
import type { DueWording } from '../wording/require-wording.ts';

/** The releasers of Annex V that the product holds, with the weight of formaldehyde each percent could set free. */
function findReleasers(mixture: Mixture, law: LawBook): { readonly substance: Substance; readonly times: string; readonly over: string }[] {
  return spokenOf(mixture, law).releasers.map(({ at, factor }) => ({ substance: mixture.substances[at]!, ...factor }));
}

/**
 * Formaldehyde that all releasers together could set free by molar mass, in percent of the
 * ready-for-use product; `undefined` where there is no releaser. A ceiling, not a measurement.
 */
export function theoreticalFormaldehyde(mixture: Mixture, law: LawBook, facts: ProductFacts): Interval | undefined {
  const releasers = findReleasers(mixture, law);
  if (releasers.length === 0) return undefined;
  let min = ZERO;
  let typical = ZERO;
  let max = ZERO;
  for (const { substance, times, over } of releasers) {
    const weight = multiply(divide(decimal(times), decimal(over)), facts.readyForUse);
    min = add(min, multiply(substance.total.min, weight));
    typical = add(typical, multiply(substance.total.typical, weight));
    max = add(max, multiply(substance.total.max, weight));
  }
  return { min, typical, max };
}

/**
 * "Releases formaldehyde": due where the measured release exceeds the threshold. Without a
 * measurement it stays possible wherever the theoretical release exceeds it.
 */
export function judgeFormaldehyde(context: Context): DueWording[] {
  const releasers = findReleasers(context.mixture, context.law);
  if (releasers.length === 0) return [];
  const given = context.facts.facts['releasedFormaldehyde'];
  const measured = typeof given === 'string' ? parseDecimal(given) : null;
  const due: DueWording[] = [];
  for (const rule of context.law.formaldehyde.rules) {
    if (rule.market !== context.facts.market || !isInForce(rule as { from?: Dates; until?: Dates }, context.days)) continue;
    const threshold = decimal(rule.threshold);
    const released = measured ?? context.theoreticalFormaldehyde!.max;
    if (compare(released, threshold) <= 0) continue;
    due.push({
      wordingId: rule.wording,
      rule: rule.id,
      subject: releasers[0]!.substance.name,
      citation: rule.citation,
      certainty: measured ? 'certain' : 'possible',
      needs: measured ? [] : ['releasedFormaldehyde'],
      ...(rule.market === 'EU' ? {} : { sourcing: 'secondary' as const }),
      reading: 'Which preservatives release formaldehyde is from memory; the ceiling is computed by molar mass.',
      ...(rule.from ? { from: rule.from } : {}),
    });
  }
  return due;
}

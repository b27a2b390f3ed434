import { decimal, divide, multiply, ONE, type Rational } from '#shared/kernel/rational.ts';
import type { Mixture, ProductFacts } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Condition, LawRow, Provision } from '#shared/law/types.ts';
import { findColours } from './colours/us-colours.ts';
import type { Part } from './outcome.ts';
import { gatherRows } from './substances/gather.ts';
import { weightOf } from './substances/judge-row.ts';
import { spokenOf } from './substances/spoken-of.ts';

/** A weighted sum of substances and a figure that some rule compares it with, in percent. */
export interface Threshold {
  readonly terms: readonly { readonly key: string; readonly weight: Rational }[];
  readonly limit: Rational;
}

/**
 * Every threshold of the market's law that these substances are compared with, on any day and in
 * any reading: between two of them no amount changes what the law says. More are named than bind.
 */
export function findThresholds(facts: ProductFacts, mixture: Mixture, law: LawBook): Threshold[] {
  const found: Threshold[] = [];
  const releasers = spokenOf(mixture, law).releasers.map(({ at, factor }) => ({ key: mixture.substances[at]!.key, weight: multiply(divide(decimal(factor.times), decimal(factor.over)), facts.readyForUse) }));
  for (const [row, parts] of gatherRows(mixture, law, facts.market)) {
    for (const provision of row.provisions) addProvision(row, provision, parts, { facts, releasers, found });
  }
  if (releasers.length > 0) {
    for (const rule of law.formaldehyde.rules) if (rule.market === facts.market) found.push({ terms: releasers, limit: decimal(rule.threshold) });
  }
  if (facts.market === 'US') addColours(facts, mixture, law, found);
  return found;
}

interface Adding {
  readonly facts: ProductFacts;
  readonly releasers: Threshold['terms'];
  readonly found: Threshold[];
}

function addProvision(row: LawRow, provision: Provision, parts: readonly Part[], { facts, releasers, found }: Adding): void {
  const only = provision.only?.map(foldName);
  const counted = only ? parts.filter(({ member }) => only.includes(foldName(member.name))) : parts;
  const together = provision.together ?? row.together;
  const term = ({ substance, member }: Part, over: Rational): Threshold['terms'][number] => ({ key: substance.key, weight: multiply(weightOf(member, facts.readyForUse), over) });
  const limits = [provision.max, ...(provision.wording ?? []).map(({ above }) => above)].filter((one) => one !== undefined);
  for (const text of limits) {
    const limit = decimal(text);
    if (together !== 'each' && counted.length > 1) found.push({ terms: counted.map((part) => term(part, ONE)), limit });
    for (const part of counted) found.push({ terms: [term(part, ONE)], limit });
  }
  if (together === 'ratios') {
    const bounded = counted.filter(({ member }) => (member.max ?? provision.max) !== undefined);
    const ratios = bounded.map((part) => term(part, divide(ONE, decimal(part.member.max ?? provision.max!))));
    if (ratios.length > 0) found.push({ terms: ratios, limit: ONE });
    for (const one of ratios) found.push({ terms: [one], limit: ONE });
  }
  if (releasers.length === 0) return;
  for (const condition of [provision.where, ...(provision.requires ?? []).map(({ that }) => that), ...(provision.wording ?? []).map(({ where }) => where)]) {
    if (condition) for (const text of formaldehydeLimits(condition)) found.push({ terms: releasers, limit: decimal(text) });
  }
}

/** Figures that a condition compares the theoretical release of formaldehyde with. */
function formaldehydeLimits(condition: Condition): string[] {
  if ('all' in condition) return condition.all.flatMap(formaldehydeLimits);
  if ('any' in condition) return condition.any.flatMap(formaldehydeLimits);
  if ('not' in condition) return formaldehydeLimits(condition.not);
  if (!('fact' in condition) || condition.fact !== 'theoreticalFormaldehyde') return [];
  return [condition.least, condition.most, condition.above, condition.below].filter((one) => one !== undefined);
}

function addColours(facts: ProductFacts, mixture: Mixture, law: LawBook, found: Threshold[]): void {
  for (const { key, name } of mixture.substances) {
    for (const colour of findColours(name, undefined, { law, days: facts })) {
      for (const text of [colour.max, colour.lipMax]) if (text !== undefined) found.push({ terms: [{ key, weight: facts.readyForUse }], limit: decimal(text) });
    }
  }
}

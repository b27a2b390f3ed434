import type { Mixture } from '#shared/engine/types.ts';
import { compare, decimal, HUNDRED, multiply, rational, ZERO, type Rational } from '#shared/kernel/rational.ts';
import { judgeLaw } from '#shared/rules/judge-law.ts';
import { asDocument, asMixture, asSubstance, factsOf, type ListName, type ReadingOptions } from './list-facts.ts';

/** The most of one ingredient that is lawful here, with the rule that says so. */
export interface Cap {
  readonly share: Rational;
  readonly rule: string;
  readonly citation: string;
  /** As the law writes it, on its own basis. */
  readonly limit: string;
  readonly basis?: string;
}

/** A hair above a share: far less than any figure of the tables tells apart. */
const JUST_ABOVE = rational(1_000_000_001n, 1_000_000_000n);

/**
 * The greatest lawful share of one name of the list in this market and kind of product,
 * counted as the law counts it (as acid, as zinc …), whatever it is there for; `undefined`
 * where nothing bounds it. The rules themselves are asked just above each figure that the
 * tables give, so this cannot say anything else than a check of the formula would.
 */
export function findCap(one: ListName, names: readonly ListName[], options: ReadingOptions): Cap | undefined {
  const candidates = findFigures(one, options);
  if (candidates.length === 0) return undefined;
  const document = asDocument(names, options);
  const facts = factsOf(options);
  const ask = (share: Rational) => {
    const found = judgeLaw(facts, mixtureWith(one, share, names), document, options.law).findings;
    return found.find((finding) => finding.kind === 'limit-exceeded' && isAbout(finding, one.name));
  };
  if (!ask(HUNDRED)) return undefined;
  for (const share of candidates) {
    const finding = ask(multiply(share, JUST_ABOVE));
    if (finding) return { share, rule: finding.rule, citation: finding.citation, limit: finding.limit ?? '', ...(finding.basis ? { basis: finding.basis } : {}) };
  }
  return undefined;
}

function isAbout(finding: { readonly subject: string; readonly members?: readonly string[] }, name: string): boolean {
  return finding.subject === name || (finding.members?.includes(name) ?? false);
}

/** Every maximum that a row of this market gives for the substance, as shares of the substance itself, ascending. */
function findFigures({ name, entry, written }: ListName, { market, law }: ReadingOptions): Rational[] {
  const cas = asSubstance({ name, written, ...(entry && { entry }) }, { min: ZERO, typical: ZERO, max: ZERO }).cas;
  const figures: Rational[] = [];
  for (const { row, member } of law.rowsFor({ name, cas })) {
    if (!row.markets.includes(market)) continue;
    for (const { max } of row.provisions) {
      if (max === undefined) continue;
      const limit = decimal(max);
      const factor = member.factor;
      figures.push(factor ? multiply(limit, rational(decimal(factor.over).n * decimal(factor.times).d, decimal(factor.over).d * decimal(factor.times).n)) : limit);
    }
  }
  if (market === 'US') {
    for (const { max, lipMax } of law.usColours) figures.push(...[max, lipMax].flatMap((text) => (text === undefined ? [] : [decimal(text)])));
  }
  return figures.filter((figure) => compare(figure, HUNDRED) < 0).sort(compare);
}

/** The list with one name at a share and the others merely present: conditions on company hold as they will. */
function mixtureWith(one: ListName, share: Rational, names: readonly ListName[]): Mixture {
  const none = { min: ZERO, typical: ZERO, max: ZERO };
  const at = { min: share, typical: share, max: share };
  const seen = new Set<string>([one.name]);
  const others = names.filter((other) => other.block !== 'may-contain' && !seen.has(other.name) && seen.add(other.name));
  return asMixture([asSubstance(one, at), ...others.map((other) => asSubstance(other, none))]);
}

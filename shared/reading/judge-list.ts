import type { Finding, FindingKind, Interval } from '#shared/engine/types.ts';
import { LIST_LAW } from '#shared/engine/list-law.ts';
import { toDecimal, type Rational } from '#shared/kernel/rational.ts';
import { foldName } from '#shared/law/fold.ts';
import { judgeLaw } from '#shared/rules/judge-law.ts';
import type { Bounds } from './bound-shares.ts';
import type { Cap } from './find-cap.ts';
import { asDocument, asMixture, asSubstance, carriesScent, factsOf, isAllergen, type ListName, type ReadingOptions } from './list-facts.ts';

/** What a list alone can settle; limits that only perhaps are exceeded say nothing without the formula. */
const SETTLED: readonly FindingKind[] = ['prohibited', 'not-for-this-use', 'use-not-listed', 'wording-required', 'may-contain-misplaced', 'limit-exceeded'];

/** The market's rules, as far as names, places and bounds go. */
export function judgeList(names: readonly ListName[], boundsOf: ReadonlyMap<ListName, Bounds>, options: ReadingOptions): Finding[] {
  const substances = new Map(
    names.filter((one) => one.block !== 'may-contain').map((one) => {
      const { min, max } = boundsOf.get(one)!;
      const share: Interval = { min, typical: min, max };
      return [one.name, asSubstance(one, share)];
    }),
  );
  const { findings } = judgeLaw(factsOf(options), asMixture([...substances.values()]), asDocument(names, options), options.law);
  const settled = findings.filter((one) => SETTLED.includes(one.kind) || (one.kind === 'upcoming' && one.certainty === 'certain'));
  return settled.flatMap((one) => (one.kind === 'use-not-listed' ? judgeShade(one, names, options) : [one]));
}

/** After `+/-` stand colourants: a word that is none is out of place there, and one that is not known proves nothing. */
function judgeShade(finding: Finding, names: readonly ListName[], { market }: ReadingOptions): Finding[] {
  const one = names.find(({ name }) => name === finding.subject);
  if (!one || one.isColourant || one.block !== 'may-contain') return [finding];
  if (!one.entry) return [];
  return [{
    kind: 'may-contain-misplaced', severity: 'decide', rule: 'may-contain', subject: one.name, citation: LIST_LAW[market].citation, certainty: 'certain',
    message: `${one.name} stands after +/-, where only the colourants of shades belong.`, remedy: `Put ${one.name} into the list itself, or name it by the colourant it is.`,
  }];
}

/** Names that are unknown, former, or ambiguous colours. */
export function judgeNames(names: readonly ListName[], { market, law }: ReadingOptions): Finding[] {
  const { citation } = LIST_LAW[market];
  return names.flatMap((one): Finding[] => {
    const { entry, suggestions, written } = one;
    if (!entry) {
      const numbers = market === 'US' ? law.usColours.find(({ name }) => foldName(name) === foldName(written))?.ci ?? [] : [];
      if (numbers.length > 1) {
        return [{
          kind: 'name-ambiguous', severity: 'decide', rule: 'name-known', subject: written, citation, suggestions: numbers.map((number) => `CI ${number}`),
          message: `${written} is the US name of several colourants: ${numbers.map((number) => `CI ${number}`).join(', ')}.`, remedy: 'Ask the maker of the product which of them it is.',
        }];
      }
      const isInLaw = law.rowsFor({ name: written, cas: [] }).some(({ row }) => row.markets.includes(market));
      return [{
        kind: 'unknown-ingredient', severity: 'decide', rule: 'name-known', subject: written, citation, suggestions,
        message: isInLaw
          ? `${written} is not in the dictionary; the rules of law that name it were checked.`
          : `${written} is not in the dictionary, so neither its name nor the rules on it could be checked.`,
        remedy: suggestions.length > 0 ? `Check the spelling; likely names are ${suggestions.join(', ')}.` : 'Ask the maker of the product what it is.',
      }];
    }
    if (entry.supersededBy === undefined) return [];
    return [{
      kind: 'name-superseded', severity: 'note', rule: 'name-current', subject: entry.inci, citation, suggestions: [entry.supersededBy],
      message: `${entry.inci} is a former name. It is now called ${entry.supersededBy}.`, remedy: `Print ${entry.supersededBy}.`,
    }];
  });
}

/** Names that stand where the order of the list cannot have them. */
export function judgePlaces(names: readonly ListName[], options: ReadingOptions): Finding[] {
  const { citation } = LIST_LAW[options.market];
  const list = names.filter((one) => one.block === 'list' && !one.isInside);
  const last = list.findLastIndex((one) => !one.isColourant);
  const isHairDye = options.category.tags.includes('hair-dye');
  return list.flatMap((one, index): Finding[] => {
    const carrier = isAllergen(one) && !list.slice(0, index).some(carriesScent) ? list.slice(index + 1).find(carriesScent) : undefined;
    if (carrier) {
      return [{
        kind: 'order-uncertain', severity: 'decide', rule: 'list-order', subject: one.name, members: [one.name, carrier.name], citation, certainty: 'possible',
        message: `${one.name} stands before ${carrier.name}, which brings it. That is right only where both are in the part of the list without order.`,
        remedy: 'Check its share, or put it after the ordered part of the list.',
      }];
    }
    if (one.isColourant && !isHairDye && index < last && !names.some((other) => other.block === 'active')) {
      const after = list.slice(index + 1).find((other) => !other.isColourant)!;
      return [{
        kind: 'order-uncertain', severity: 'decide', rule: 'list-order', subject: one.name, members: [one.name, after.name], citation, certainty: 'possible',
        message: `${one.name} is a colourant and stands before ${after.name}. That is right only in its own place by weight.`,
        remedy: 'Check its share, or let colourants close the list.',
      }];
    }
    return [];
  });
}

/** No composition fits the list: each name without whose maximum one would. */
export function judgeImpossible(culprits: readonly { readonly name: ListName; readonly cap: Cap; readonly min: Rational }[], options: ReadingOptions): Finding[] {
  const { citation } = LIST_LAW[options.market];
  if (culprits.length === 0) {
    return [{ kind: 'order-uncertain', severity: 'decide', rule: 'list-order', subject: 'list', citation, certainty: 'certain', message: 'No composition fits this list: in this order, and within what the law allows, the shares cannot come to 100 %.', remedy: 'Check the order of the list and whether names are missing.' }];
  }
  return culprits.map(({ name, cap, min }) => ({
    kind: 'limit-exceeded', severity: 'stop', rule: cap.rule, subject: name.name, measured: toDecimal(min), limit: cap.limit, unit: '%', citation: cap.citation, certainty: 'certain',
    ...(cap.basis ? { basis: cap.basis } : {}),
    message: `By its place ${name.name} is at least ${toDecimal(min, 2)} % of the product; ${cap.limit} % is the most that is allowed here${cap.basis ? `, counted ${cap.basis}` : ''}.`,
    remedy: 'Either it is over its limit or the list is out of order; both need to be put right.',
    arithmetic: [
      { step: 'at least, by the descending order of the list', figure: `${toDecimal(min)} %` },
      { step: 'the most of this ingredient that the rule allows', figure: `${toDecimal(cap.share)} %` },
    ],
  }));
}

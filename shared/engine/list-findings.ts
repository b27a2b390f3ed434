import type { Dictionary } from '#shared/dictionary/types.ts';
import type { Market } from '#shared/law/types.ts';
import { isZero, toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Declaration, DeclarationEntry } from './assessment.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import type { Ambiguity } from './declare.ts';
import { FigureInterval } from './figure-interval.ts';
import { LIST_LAW } from './list-law.ts';
import type { MixingPlan } from './mixing-plan.ts';
import type { Finding, Interval } from './types.ts';

/** An interval as decimal texts. */
export function rangeText(interval: Interval): { min: string; typical: string; max: string } {
  if (interval instanceof FigureInterval) return interval.text;
  const { min, typical, max } = interval;
  const text = toDecimal(typical);
  // Most shares are fixed: one text serves all three.
  return { min: isSame(min, typical) ? text : toDecimal(min), typical: text, max: isSame(max, typical) ? text : toDecimal(max) };
}

function isSame(a: Rational, b: Rational): boolean {
  return a.n === b.n && a.d === b.d;
}

function sourcing(market: Market): Pick<Finding, 'sourcing'> {
  const { sourcing: firmness } = LIST_LAW[market];
  return firmness ? { sourcing: firmness } : {};
}

/** `composition-incomplete`: a material whose parts do not add up to 100 %. */
export function judgeCompositions(blend: Blend, citation: string): Finding[] {
  return blend.materials.flatMap(({ prepared }): Finding[] => {
    if (prepared.state !== 'incomplete') return [];
    const sum = toDecimal(prepared.typicalSum);
    const { tradeName, id } = prepared.material;
    return [{
      kind: 'composition-incomplete',
      severity: 'decide',
      rule: 'composition-adds-up',
      subject: tradeName || id,
      measured: sum,
      limit: '100',
      unit: '%',
      citation,
      message: `The composition of ${tradeName || id} adds up to ${sum} % with its usual figures, not to 100 %. The figures are used as written.`,
      remedy: `Complete the composition of ${tradeName || id} from the supplier's sheet.`,
      arithmetic: [
        { step: 'Sum of the usual shares', figure: `${sum} %`, from: id },
        { step: 'Allowed', figure: '99.5 % to 100.5 %' },
      ],
    }];
  });
}

/** `unknown-ingredient` and `name-superseded`, for every name that would be listed. */
export function judgeNames(blend: Blend, dictionary: Dictionary, market: Market): Finding[] {
  const { citation } = LIST_LAW[market];
  return spokenNames(blend.plan).flatMap((at): Finding[] => {
    const substance = blend.substances[at]!;
    if (!substance.as.ingredient || isZero(substance.as.ingredient.max)) return [];
    const { entry } = substance.first;
    if (!entry) return [unknownFinding(substance, dictionary, citation)];
    if (entry.supersededBy === undefined) return [];
    return [{
      kind: 'name-superseded',
      severity: 'note',
      rule: 'name-current',
      subject: substance.name,
      citation,
      message: `${substance.name} is a former name. It is now called ${entry.supersededBy}.`,
      remedy: `Use ${entry.supersededBy} in the material's composition.`,
      suggestions: [entry.supersededBy],
    }];
  });
}

const spoken = new WeakMap<MixingPlan, readonly number[]>();

/** Names that have something to be said of: unknown ones and former ones. */
function spokenNames(plan: MixingPlan): readonly number[] {
  let found = spoken.get(plan);
  if (!found) {
    found = plan.substances.filter(({ first, slots }) => slots.ingredient !== undefined && (!first.entry || first.entry.supersededBy !== undefined)).map(({ at }) => at);
    spoken.set(plan, found);
  }
  return found;
}

function unknownFinding(substance: BlendedSubstance, dictionary: Dictionary, citation: string): Finding {
  const { written } = substance.first;
  const suggestions = [...new Set(suggest(dictionary, written, substance.cas))].slice(0, 5);
  return {
    kind: 'unknown-ingredient',
    severity: 'decide',
    rule: 'name-known',
    subject: substance.name,
    citation,
    message: `${substance.name} is not in the dictionary, so neither its name nor the rules on it could be checked by name.`,
    remedy: suggestions.length > 0 ? `Check the spelling; likely names are ${suggestions.join(', ')}.` : "Check the name against the supplier's sheet.",
    suggestions,
  };
}

const suggested = new WeakMap<Dictionary, Map<string, readonly string[]>>();

/** Likely names are remembered: the search is far dearer than everything else, and the name stands while she types on. */
function suggest(dictionary: Dictionary, written: string, cas: readonly string[]): readonly string[] {
  let known = suggested.get(dictionary);
  if (!known) suggested.set(dictionary, (known = new Map()));
  const id = `${written}|${cas.join('|')}`;
  let names = known.get(id);
  if (!names) {
    const byNumber = cas.flatMap((number) => dictionary.resolve(number)?.entry.inci ?? []);
    const respelt = dictionary.resolve(written)?.entry.inci;
    names = [...(respelt === undefined ? [] : [respelt]), ...byNumber, ...dictionary.suggest(written, 5).map(({ inci }) => inci)];
    // A bound keeps a long run of documents flat.
    if (known.size > 2000) known.clear();
    known.set(id, names);
  }
  return names;
}

/** `name-ambiguous`: one Colour Index number with several US names. */
export function judgeAmbiguities(ambiguities: readonly Ambiguity[], market: Market): Finding[] {
  return ambiguities.map(({ inci, names }): Finding => ({
    kind: 'name-ambiguous',
    severity: 'decide',
    rule: 'colour-name-chosen',
    subject: inci,
    citation: LIST_LAW[market].citation,
    message: `${inci} has several US names: ${names.join(', ')}. Nothing given says which one it is.`,
    remedy: `Choose the US name of ${inci} in the material's composition.`,
    suggestions: names,
    ...sourcing(market),
  }));
}

/** `order-uncertain` and `zone-uncertain`. */
export function judgeOrder(declaration: Declaration, market: Market): Finding[] {
  const { citation } = LIST_LAW[market];
  const pairs = declaration.uncertainPairs.map(({ first, second, byAtMost }): Finding => ({
    kind: 'order-uncertain',
    severity: 'decide',
    rule: 'order-proved',
    subject: first.inci,
    members: [first.inci, second.inci],
    citation,
    message: `${first.name} stands before ${second.name}, but the ranges of the materials also allow the other order.`,
    remedy: `Ask the supplier for narrower figures of ${first.name} or ${second.name}, or confirm this order.`,
    arithmetic: [
      { step: `${first.name}, least to greatest`, figure: `${toDecimal(first.share.min)} % to ${toDecimal(first.share.max)} %` },
      { step: `${second.name}, least to greatest`, figure: `${toDecimal(second.share.min)} % to ${toDecimal(second.share.max)} %` },
      { step: `${second.name} can lead by`, figure: `${toDecimal(byAtMost)} %` },
    ],
    ...sourcing(market),
  }));
  return [...pairs, ...declaration.entries.filter(({ straddles }) => straddles).map((entry) => zoneFinding(entry, declaration, market))];
}

function zoneFinding(entry: DeclarationEntry, declaration: Declaration, market: Market): Finding {
  const range = rangeText(entry.share);
  return {
    kind: 'zone-uncertain',
    severity: 'decide',
    rule: 'zone-proved',
    subject: entry.inci,
    measured: range.typical,
    measuredRange: range,
    limit: '1',
    unit: '%',
    citation: declaration.citation,
    message: `${entry.name} is placed at ${range.typical} %, but may be anywhere from ${range.min} % to ${range.max} %, on both sides of the 1 % line.`,
    remedy: `Ask the supplier for narrower figures of ${entry.name}, or keep it in descending order.`,
    arithmetic: [
      { step: 'Least', figure: `${range.min} %` },
      { step: 'Usual', figure: `${range.typical} %` },
      { step: 'Greatest', figure: `${range.max} %` },
      { step: 'Any order is allowed', figure: declaration.freeLine },
    ],
    ...sourcing(market),
  };
}

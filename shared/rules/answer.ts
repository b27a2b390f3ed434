import { isMaterialFact } from '#shared/law/material-facts.ts';
import { assertNever } from '#shared/kernel/errors.ts';
import { compare, parseDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { ProductFacts, Substance } from '#shared/engine/types.ts';
import type { Condition } from '#shared/law/types.ts';

/** True, false, or `undefined` for "cannot tell". */
export type Answer = boolean | undefined;

/** What a condition is asked about: the product, and the substance where one is meant. */
export interface Question {
  readonly facts: ProductFacts;
  readonly substance?: Substance;
  /** Formaldehyde that all releasers together could set free, in percent: least and greatest. */
  readonly theoreticalFormaldehyde?: { readonly min: Rational; readonly max: Rational };
  /** Collects the keys of what is missing where an answer is "cannot tell". */
  readonly needs: Set<string>;
}

/** Kinds of product that nobody would use on a small child. Common practice, no source. */
const ADULT_TAGS = ['fragrance', 'make-up', 'deodorant', 'hair-dye', 'hair-bleach', 'depilatory', 'nail', 'self-tan', 'tanning', 'shaving', 'beard', 'lash-dye', 'lash-waving', 'hair-waving', 'artificial-nail', 'callosity', 'antidandruff'];

/** Answers a condition of the law; an empty `all` is true. */
export function answer(condition: Condition, question: Question): Answer {
  if ('all' in condition) return answerAll(condition.all, question);
  if ('any' in condition) return answerAny(condition.any, question);
  if ('not' in condition) {
    const inner = answer(condition.not, question);
    return inner === undefined ? undefined : !inner;
  }
  if ('exposure' in condition) return question.facts.category.exposure === condition.exposure;
  if ('category' in condition) return condition.category.includes(question.facts.category.slug);
  if ('tag' in condition) return condition.tag.some((tag) => question.facts.category.tags.includes(tag));
  if ('flag' in condition) return question.facts.flags[condition.flag];
  if ('purpose' in condition) return answerPurpose(condition.purpose, question);
  if ('nano' in condition) return (question.substance?.nano ?? false) === condition.nano;
  if ('fact' in condition) return answerFact(condition, question);
  return assertNever(condition);
}

function answerAll(conditions: readonly Condition[], question: Question): Answer {
  let result: Answer = true;
  for (const one of conditions) {
    const value = answer(one, question);
    if (value === false) return false;
    if (value === undefined) result = undefined;
  }
  return result;
}

function answerAny(conditions: readonly Condition[], question: Question): Answer {
  let result: Answer = false;
  for (const one of conditions) {
    const value = answer(one, question);
    if (value === true) return true;
    if (value === undefined) result = undefined;
  }
  return result;
}

function answerPurpose(purposes: readonly string[], question: Question): Answer {
  const substance = question.substance;
  if (!substance) return undefined;
  if (substance.purposes.length > 0) return substance.purposes.some((one) => purposes.includes(one));
  // A constituent of a perfume or an oil is there as part of a scent, not to preserve or to colour.
  if (!substance.as.ingredient && substance.as.hidden) return purposes.includes('fragrance');
  question.needs.add('purpose');
  return undefined;
}

type FactCondition = Extract<Condition, { fact: string }>;

function answerFact(condition: FactCondition, question: Question): Answer {
  if (condition.fact === 'theoreticalFormaldehyde' && question.theoreticalFormaldehyde) {
    const { min, max } = question.theoreticalFormaldehyde;
    const least = isWithin(condition, min);
    return least === isWithin(condition, max) ? least : undefined;
  }
  const asMaterial = answerMaterials(condition, question);
  if (asMaterial !== 'not-asked') return asMaterial;
  return judgeFact(condition, readFact(condition.fact, question), question);
}

/**
 * A fact about the material is asked of every material that brings the substance: what the law
 * bounds from above must hold in each, what it warns of is there where one has it. Materials
 * without an answer take the product's.
 */
function answerMaterials(condition: FactCondition, question: Question): Answer | 'not-asked' {
  const { materialFacts, facts } = question.facts;
  if (!materialFacts || !question.substance || !isMaterialFact(condition.fact)) return 'not-asked';
  const ids = new Set(question.substance.sources.map(({ materialId }) => materialId));
  const answers = [...ids].map((id) => judgeFact(condition, materialFacts.get(id)?.[condition.fact] ?? facts[condition.fact], question));
  if (isWarning(condition)) return answers.includes(true) ? true : answers.includes(undefined) ? undefined : false;
  return answers.includes(false) ? false : answers.includes(undefined) ? undefined : true;
}

/** A condition that speaks of what is wrong with a material: too much of something, or a missing proof. */
function isWarning({ above, least, is }: FactCondition): boolean {
  return above !== undefined || least !== undefined || (is?.includes(false) ?? false);
}

function judgeFact(condition: FactCondition, fact: string | boolean | undefined, question: Question): Answer {
  if (fact === undefined) {
    question.needs.add(condition.fact);
    return undefined;
  }
  if (condition.is) return condition.is.includes(fact);
  const value = typeof fact === 'string' ? parseDecimal(fact) : null;
  if (!value) {
    question.needs.add(condition.fact);
    return undefined;
  }
  return isWithin(condition, value);
}

function isWithin(condition: FactCondition, value: Rational): boolean {
  const { least, most, above, below } = condition;
  return (
    (least === undefined || compare(value, parseDecimal(least)!) >= 0) &&
    (most === undefined || compare(value, parseDecimal(most)!) <= 0) &&
    (above === undefined || compare(value, parseDecimal(above)!) > 0) &&
    (below === undefined || compare(value, parseDecimal(below)!) < 0)
  );
}

/** A fact as given, or worked out where the product itself answers it. */
function readFact(key: string, question: Question): string | boolean | undefined {
  const { facts, category, flags } = question.facts;
  const given = facts[key] ?? category.facts?.[key];
  if (given !== undefined) return given;
  switch (key) {
    case 'inhalable':
      // A spray can be breathed in; of a powder it depends on its grain.
      if (flags.spray) return true;
      return (facts['physicalForm'] ?? category.facts?.['physicalForm']) === 'powder' ? undefined : false;
    case 'mightBeUsedUnder3':
      if (flags.under3) return true;
      if (flags.professionalUseOnly) return false;
      return ADULT_TAGS.some((tag) => category.tags.includes(tag)) ? false : undefined;
    case 'adultsOnly':
      // A label that does not say so is for everybody.
      return false;
    case 'addedAsSuch':
      return question.substance?.as.ingredient !== undefined;
    case 'fromAge':
      // A product made for small children is for ages from birth; of others the age stays open.
      return flags.under3 ? '0' : category.tags.includes('children') ? undefined : '18';
    default:
      return undefined;
  }
}

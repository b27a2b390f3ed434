import { compare, decimal, divide, multiply, ONE, type Rational } from '#shared/kernel/rational.ts';
import { isInForce } from '#shared/law/as-at.ts';
import { foldName } from '#shared/law/fold.ts';
import type { LawRow, Member, Provision } from '#shared/law/types.ts';
import type { Interval } from '#shared/engine/types.ts';
import { answer, type Answer } from '../answer.ts';
import type { Context } from '../context.ts';
import { bindsPurpose } from './binding.ts';
import type { NotChecked, Outcome, Part } from '../outcome.ts';

interface Applied {
  readonly part: Part;
  readonly applies: Answer;
  /** Whether the field of use fits, were the substance there for what the row lists. */
  readonly fits: Answer;
}

/** Everything one row says of the product on the context's days. */
export function judgeRow(row: LawRow, parts: readonly Part[], context: Context, notChecked: NotChecked[] = []): Outcome[] {
  if (!isInForce(row, context.days)) return [];
  const outcomes: Outcome[] = [];
  const uses: Answer[] = [];
  let speaks = false;
  for (const provision of row.provisions) {
    if (!isInForce(provision, context.days) || !(provision.markets?.includes(context.facts.market) ?? true)) continue;
    if (!isCompanyRight(provision, context)) continue;
    speaks = true;
    const needs = new Set<string>();
    const applied = applyProvision(row, provision, parts, context, needs);
    if (provision.use !== 'forbidden' && isUse(provision)) uses.push(strongest(applied.map((one) => one.fits)));
    const spoken = applied.filter((one) => one.applies !== false);
    if (spoken.length === 0) continue;
    judgeProvision({ row, provision, spoken, context, needs }, outcomes);
    if (provision.notComputable) {
      notChecked.push({ rule: row.id, subject: spoken[0]!.part.substance.name, citation: context.law.citation(row, context.facts.market), words: provision.notComputable });
    }
  }
  if (row.onlyListedUses && speaks) judgeListedUse(row, parts, context, uses, outcomes);
  return outcomes;
}

/** A provision that opens a field of use; one with wording alone does not. */
function isUse(provision: Provision): boolean {
  return provision.max !== undefined || provision.requires !== undefined || provision.wording === undefined || provision.where !== undefined;
}

function strongest(answers: readonly Answer[]): Answer {
  if (answers.includes(true)) return true;
  return answers.includes(undefined) ? undefined : false;
}

function applyProvision(row: LawRow, provision: Provision, parts: readonly Part[], context: Context, needs: Set<string>): Applied[] {
  const only = provision.only?.map(foldName);
  const applied: Applied[] = [];
  for (const part of parts) {
    if (only && !only.includes(foldName(part.member.name))) continue;
    const binds = bindsPurpose(row, part.substance, context.facts);
    if (binds === false) continue;
    if (binds === undefined) needs.add('purpose');
    const here = provision.where === undefined ? true : answer(provision.where, ask(part, context, needs));
    applied.push({ part, applies: here === false ? false : binds === undefined ? undefined : here, fits: here });
  }
  return applied;
}

function ask(part: Part, context: Context, needs: Set<string>) {
  const formaldehyde = context.theoreticalFormaldehyde;
  return { facts: context.facts, substance: part.substance, needs, ...(formaldehyde ? { theoreticalFormaldehyde: formaldehyde } : {}) };
}

/** Whether the substances that the provision presumes beside it are there, and those it excludes are not. */
function isCompanyRight(provision: Provision, context: Context): boolean {
  if (!provision.with && !provision.without) return true;
  const isPresent = (name: string): boolean => context.mixture.substances.some((one) => foldName(one.name) === foldName(name));
  return (provision.with?.some(isPresent) ?? true) && !(provision.without?.some(isPresent) ?? false);
}

interface Spoken {
  readonly row: LawRow;
  readonly provision: Provision;
  readonly spoken: readonly Applied[];
  readonly context: Context;
  readonly needs: ReadonlySet<string>;
}

function judgeProvision(spoken: Spoken, outcomes: Outcome[]): void {
  const { row, provision, context } = spoken;
  const groups = (provision.together ?? row.together) === 'each' ? spoken.spoken.map((one) => [one]) : [spoken.spoken];
  for (const group of groups) {
    const certainty = group.some((one) => one.applies === true) ? 'certain' : 'possible';
    const from = provision.from ?? row.from;
    const common = { row, provision, parts: group.map((one) => one.part), certainty, needs: [...spoken.needs], ...(from ? { from } : {}) } as const;
    if (provision.use === 'forbidden') {
      outcomes.push({ ...common, type: row.list === 'prohibited' ? 'prohibited' : 'forbidden', ...(provision.words ? { words: provision.words } : {}) });
      continue;
    }
    if (row.list === 'prohibited' && provision.max === undefined && provision.use !== 'allowed') outcomes.push({ ...common, type: 'prohibited' });
    if (isRatioOf(row, provision, common.parts)) judgeRatios(common, group, context, outcomes);
    else if (provision.max !== undefined) judgeLimit(common, group, context, outcomes);
    for (const required of provision.requires ?? []) judgeRequirement(common, required, context, outcomes);
    for (const wording of provision.wording ?? []) judgeWording(common, wording, context, outcomes);
  }
}

type Common = Omit<Outcome, 'type'>;

function judgeLimit(common: Common, group: readonly Applied[], context: Context, outcomes: Outcome[]): void {
  compareLimit(common, group, { limitText: common.provision.max!, weigh: (parts) => weighParts(parts, context) }, outcomes);
}

/** Whether the provision adds each member's share over that member's own maximum. */
function isRatioOf(row: LawRow, provision: Provision, parts: readonly Part[]): boolean {
  return (provision.together ?? row.together) === 'ratios' && parts.every(({ member }) => (member.max ?? provision.max) !== undefined);
}

/** The sum of the ratios may not exceed 1; one member alone is told as a plain limit. */
function judgeRatios(common: Common, group: readonly Applied[], context: Context, outcomes: Outcome[]): void {
  const { parts, provision } = common;
  if (parts.length === 1) {
    compareLimit(common, group, { limitText: parts[0]!.member.max ?? provision.max!, weigh: (some) => weighParts(some, context) }, outcomes);
    return;
  }
  const weigh = (some: readonly Part[]): Interval => weighParts(some, context, (part) => divide(ONE, decimal(part.member.max ?? provision.max!)));
  compareLimit({ ...common, isRatio: true }, group, { limitText: '1', weigh }, outcomes);
}

function compareLimit(common: Common, group: readonly Applied[], { limitText, weigh }: { readonly limitText: string; readonly weigh: (parts: readonly Part[]) => Interval }, outcomes: Outcome[]): void {
  const limit = decimal(limitText);
  const measured = weigh(common.parts);
  if (compare(measured.max, limit) <= 0) return;
  const certain = group.filter((one) => one.applies === true).map((one) => one.part);
  const least = certain.length === common.parts.length ? measured.min : certain.length > 0 ? weigh(certain).min : undefined;
  const isCertain = least !== undefined && compare(least, limit) > 0;
  // "possible" with nothing missing means: only the upper part of the range exceeds.
  const isRangeOnly = !isCertain && compare(measured.min, limit) <= 0;
  outcomes.push({ ...common, type: 'limit', certainty: isCertain ? 'certain' : 'possible', needs: isRangeOnly ? [] : common.needs, measured, limit, limitText });
}

function judgeRequirement(common: Common, required: NonNullable<Provision['requires']>[number], context: Context, outcomes: Outcome[]): void {
  const needs = new Set<string>(common.needs);
  const holds = answer(required.that, ask(common.parts[0]!, context, needs));
  if (holds === true) return;
  const certainty = holds === false && common.certainty === 'certain' ? 'certain' : 'possible';
  outcomes.push({ ...common, type: 'requires', certainty, needs: [...needs], words: required.words });
}

function judgeWording(common: Common, wording: NonNullable<Provision['wording']>[number], context: Context, outcomes: Outcome[]): void {
  const needs = new Set<string>(common.needs);
  const due = wording.where === undefined ? true : answer(wording.where, ask(common.parts[0]!, context, needs));
  if (due === false) return;
  let certainty: 'certain' | 'possible' = due === true ? common.certainty : 'possible';
  let measured: Interval | undefined;
  if (wording.above !== undefined || wording.least !== undefined) {
    measured = weighParts(common.parts, context);
    const isDueAt = (share: Rational): boolean => startsAt(wording, share);
    if (!isDueAt(measured.max)) return;
    if (!isDueAt(measured.min)) certainty = 'possible';
  }
  outcomes.push({ ...common, type: 'wording', certainty, needs: [...needs], wordingId: wording.id, ...(measured ? { measured } : {}) });
}

/** Whether a text that starts at a share is due at this one: strictly above `above`, from `least` on. */
function startsAt({ above, least }: NonNullable<Provision['wording']>[number], share: Rational): boolean {
  return (above === undefined || compare(share, decimal(above)) > 0) && (least === undefined || compare(share, decimal(least)) >= 0);
}

function judgeListedUse(row: LawRow, parts: readonly Part[], context: Context, uses: readonly Answer[], outcomes: Outcome[]): void {
  if (uses.includes(true)) return;
  const bound = parts.filter((part) => bindsPurpose(row, part.substance, context.facts) !== false);
  if (bound.length === 0) return;
  const needs = new Set<string>();
  if (bound.some((part) => bindsPurpose(row, part.substance, context.facts) === undefined)) needs.add('purpose');
  const certainty = uses.includes(undefined) || needs.size > 0 ? 'possible' : 'certain';
  const provision = row.provisions.find((one) => isInForce(one, context.days)) ?? row.provisions[0]!;
  for (const part of row.together === 'each' ? bound : bound.slice(0, 1)) {
    outcomes.push({ type: 'unlisted', row, provision, parts: row.together === 'each' ? [part] : bound, certainty, needs: [...needs], ...(row.from ? { from: row.from } : {}) });
  }
}

/** What one part weighs on the row's basis, per percent of the substance, after dilution to the ready-for-use mixture. */
export function weightOf(member: Member, readyForUse: Rational): Rational {
  const factor = member.factor ? divide(decimal(member.factor.times), decimal(member.factor.over)) : ONE;
  return multiply(factor, readyForUse);
}

/** The share of all parts together on the row's basis (each times `times`), exact over everything the ranges allow. */
export function weighParts(parts: readonly Part[], context: Context, times: (part: Part) => Rational = () => ONE): Interval {
  const ready = context.facts.readyForUse;
  if (parts.length === 1) {
    const { substance, member } = parts[0]!;
    const weight = multiply(weightOf(member, ready), times(parts[0]!));
    const { min, typical, max } = substance.total;
    return { min: multiply(min, weight), typical: multiply(typical, weight), max: multiply(max, weight) };
  }
  return context.mixture.weigh(parts.map((part) => ({ key: part.substance.key, weight: multiply(weightOf(part.member, ready), times(part)) })));
}

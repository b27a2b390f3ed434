import { compare, toDecimal, toDecimalApart, type Rational } from '#shared/kernel/rational.ts';
import type { Finding, FindingKind, Interval, Severity } from '#shared/engine/types.ts';
import type { Context } from '../context.ts';
import { weightOf } from './judge-row.ts';
import type { Outcome } from '../outcome.ts';

/** An outcome as a finding: what is wrong, by how much, where it stands, what to do. */
export function presentOutcome(outcome: Outcome, context: Context): Finding {
  const { row } = outcome;
  const { kind, severity } = classify(outcome);
  const subject = subjectOf(outcome);
  const members = outcome.parts.length > 1 ? outcome.parts.map((part) => part.substance.name) : undefined;
  const sourcing = context.law.sourcing(row, context.facts.market);
  const effective = effectiveOf(outcome);
  return {
    kind,
    severity,
    rule: ruleId(outcome),
    subject,
    ...(members ? { members } : {}),
    ...(outcome.measured ? measuredFields(outcome.measured) : {}),
    ...(outcome.limitText !== undefined ? { limit: outcome.limitText, ...(outcome.isRatio ? {} : { unit: '%' }) } : {}),
    ...(outcome.measured && basisOf(outcome) ? { basis: basisOf(outcome) } : {}),
    citation: context.law.citation(row, context.facts.market) + letterOf(outcome),
    ...(effective ? { effective } : {}),
    message: messageOf(outcome, kind, subject),
    remedy: remedyOf(outcome, kind, subject),
    ...(outcome.type === 'limit' ? { arithmetic: arithmeticOf(outcome, context) } : {}),
    ...(severity === 'decide' && outcome.needs.length > 0 ? { needs: outcome.needs } : {}),
    certainty: outcome.certainty,
    ...(sourcing !== 'official' ? { sourcing } : {}),
    ...(outcome.provision.reading ? { reading: outcome.provision.reading } : {}),
  };
}

/** What the measured figure is expressed as. */
function basisOf({ provision, isRatio }: Outcome): string | undefined {
  if (!isRatio) return provision.basis;
  return `sum of shares${provision.basis ? ` ${provision.basis}` : ''} over each one's own maximum`;
}

export function ruleId(outcome: Outcome): string {
  return outcome.provision.letter ? `${outcome.row.id}/${outcome.provision.letter.replaceAll(', ', '-')}` : outcome.row.id;
}

export function subjectOf(outcome: Outcome): string {
  const greatest = outcome.parts.reduce((kept, part) => (compare(part.substance.total.typical, kept.substance.total.typical) > 0 ? part : kept));
  return greatest.substance.name;
}

function classify(outcome: Outcome): { kind: FindingKind; severity: Severity } {
  if (outcome.certainty === 'possible') return { kind: 'limit-uncertain', severity: 'decide' };
  switch (outcome.type) {
    case 'prohibited':
      return { kind: 'prohibited', severity: 'stop' };
    case 'limit':
      return { kind: 'limit-exceeded', severity: 'stop' };
    case 'unlisted':
      return { kind: 'not-for-this-use', severity: 'stop' };
    default:
      return { kind: 'not-for-this-use', severity: 'stop' };
  }
}

function letterOf(outcome: Outcome): string {
  const letter = outcome.provision.letter;
  return /^[a-z]$/.test(letter) ? `, letter (${letter})` : '';
}

/** The range and its ordering figure; `measured` is what the finding rests on. */
export function measuredFields(measured: Interval): Pick<Finding, 'measured' | 'measuredRange'> {
  const min = toDecimal(measured.min);
  const typical = toDecimal(measured.typical);
  const max = toDecimal(measured.max);
  return min === max ? { measured: typical } : { measured: max, measuredRange: { min, typical, max } };
}

function effectiveOf(outcome: Outcome): Finding['effective'] {
  const from = outcome.from;
  if (!from) return undefined;
  const until = outcome.provision.until ?? outcome.row.until;
  return { from: from.placed ?? from.available, ...(until ? { to: until.placed ?? until.available } : {}) };
}

/** A share for the eye: six places, and more where it would otherwise read as the limit it is held against. */
function plain(interval: Interval, unit = ' %', limit?: Rational): string {
  const say = (figure: Rational): string => (limit ? toDecimalApart(figure, limit, 6) : toDecimal(figure, 6));
  const min = say(interval.min);
  const max = say(interval.max);
  return min === max ? `${max}${unit}` : `${min} to ${max}${unit}`;
}

function messageOf(outcome: Outcome, kind: FindingKind, subject: string): string {
  const basis = outcome.provision.basis ? ` ${outcome.provision.basis}` : '';
  if (outcome.isRatio) return ratioMessage(outcome, kind);
  if (outcome.type === 'limit') {
    const who = outcome.parts.length > 1 ? `${outcome.parts.map((part) => part.substance.name).join(', ')} together` : subject;
    const what = `${who}: ${plain(outcome.measured!, ' %', outcome.limit)}${basis}, and ${outcome.limitText} % is the most`;
    if (kind === 'limit-exceeded') return `${what}.`;
    return outcome.needs.includes('purpose') ? `${what} for this purpose; for another use it may be lawful.` : outcome.needs.length > 0 ? `${what} where the open question is answered so.` : `${what}; only part of the range is above it.`;
  }
  const open = outcome.certainty === 'possible' ? ' It cannot be told yet whether this applies.' : '';
  if (outcome.type === 'prohibited') return `${subject} is prohibited in ${outcome.provision.where ? 'this kind of product' : 'cosmetic products'}. ${outcome.words ?? ''}`.trim() + open;
  if (outcome.type === 'unlisted') return `${subject} has no listed use in this kind of product.${open}`;
  return `${subject}: ${outcome.words ?? 'not for this use.'}${open}`;
}

function ratioMessage(outcome: Outcome, kind: FindingKind): string {
  const names = outcome.parts.map((part) => part.substance.name).join(', ');
  const what = `${names}: each share over its own maximum adds up to ${plain(outcome.measured!, '', outcome.limit)}, and 1 is the most`;
  if (kind === 'limit-exceeded') return `${what}.`;
  return outcome.needs.length > 0 ? `${what} where the open question is answered so.` : `${what}; only part of the range is above it.`;
}

function remedyOf(outcome: Outcome, kind: FindingKind, subject: string): string {
  if (outcome.certainty === 'possible') {
    if (outcome.needs.includes('purpose')) return `State what ${subject} is there for.`;
    return outcome.needs.length > 0 ? `Answer what is open: ${outcome.needs.join(', ')}.` : 'Ask the supplier for a narrower range.';
  }
  if (kind === 'limit-exceeded' && outcome.isRatio) return 'Lower one of them until the ratios add up to 1 or less.';
  if (kind === 'limit-exceeded') return `Bring ${subject} to ${outcome.limitText} % or less${outcome.provision.basis ? `, counted ${outcome.provision.basis}` : ''}.`;
  if (outcome.type === 'requires') return 'Change the product so that the condition holds.';
  if (outcome.type === 'prohibited' && !outcome.provision.where) return `Take ${subject} out: no use of it is allowed.`;
  return `Take ${subject} out, or choose a product kind that the rule allows.`;
}

/** Steps from materials to the figure compared, in order. */
function arithmeticOf(outcome: Outcome, context: Context): NonNullable<Finding['arithmetic']> {
  const steps: NonNullable<Finding['arithmetic']>[number][] = [];
  for (const { substance, member } of outcome.parts) {
    for (const source of substance.sources) {
      steps.push({ step: `${substance.name} from line ${lineNumber(source.line)}`, figure: plain(source.share), from: source.materialId });
    }
    if (substance.sources.length > 1) steps.push({ step: `${substance.name} in all`, figure: plain(substance.total) });
    if (outcome.isRatio) steps.push({ step: `${substance.name}, over its own maximum of`, figure: `${member.max ?? outcome.provision.max} %` });
    if (member.factor) {
      steps.push({ step: `times ${member.factor.times} over ${member.factor.over} (${outcome.provision.basis ?? 'converted'})`, figure: toDecimal(weightOf(member, { n: 1n, d: 1n }), 9) });
    }
  }
  if (context.facts.readyForUse.n !== context.facts.readyForUse.d) steps.push({ step: 'times the share of the product in the ready-for-use mixture', figure: toDecimal(context.facts.readyForUse, 9) });
  steps.push({ step: outcome.parts.length > 1 ? 'together, compared' : 'compared', figure: plain(outcome.measured!, outcome.isRatio ? '' : ' %', outcome.limit) });
  steps.push({ step: 'the most the rule allows', figure: outcome.isRatio ? outcome.limitText! : `${outcome.limitText} %` });
  return steps;
}

function lineNumber(line: number): string {
  return String(line + 1);
}

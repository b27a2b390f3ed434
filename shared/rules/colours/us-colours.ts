import { compare, decimal, multiply } from '#shared/kernel/rational.ts';
import { hasBegun } from '#shared/law/as-at.ts';
import { foldName } from '#shared/law/fold.ts';
import type { UsColourJson } from '#shared/law/tables.types.ts';
import type { Finding, Substance } from '#shared/engine/types.ts';
import type { Context } from '../context.ts';
import { isColourIndexName } from '../substances/binding.ts';
import { measuredFields } from '../substances/present.ts';

const UNLISTED = '21 CFR parts 73, 74 and 82; 21 USC 361(e)';

/** A colour's verdict in this product: where it fails, why. */
type Fault = { readonly kind: 'use-not-listed' | 'not-for-this-use'; readonly why: string } | { readonly kind: 'limit-exceeded' | 'limit-uncertain'; readonly limit: string };

/**
 * Every colour of a US cosmetic must be listed for its area of use: eye area, generally
 * (including lips), or externally applied (21 CFR parts 73, 74, 82). Hair dyes are left out:
 * coal-tar dyes with the legend of 21 USC 361(a) are exempt. Reading: where one CI number has
 * several US colours and none is named, a fault is certain only if each of them has it.
 */
export function judgeUsColours(context: Context): Finding[] {
  if (context.facts.market !== 'US' || context.facts.category.tags.includes('hair-dye')) return [];
  const named = usNames(context);
  const findings: Finding[] = [];
  for (const substance of context.mixture.substances) {
    if (!substance.as.ingredient) continue;
    const candidates = findColours(substance.name, named.get(foldName(substance.name)), context);
    if (candidates.length === 0) {
      if (isColour(substance)) findings.push(present(substance.name, { kind: 'use-not-listed', why: 'it is not listed as a colour additive for cosmetics' }, UNLISTED, undefined, substance));
      continue;
    }
    if (!isBound(substance, candidates)) continue;
    findings.push(...judgeCandidates(substance, candidates, context));
  }
  return [...findings, ...judgeShades(context)];
}

function isColour(substance: Substance): boolean {
  return substance.purposes.length > 0 ? substance.purposes.includes('colourant') : isColourIndexName(substance.name);
}

/** A substance that also does other work (silver nitrate, henna extract) is a colour only where its purpose says so. */
function isBound(substance: Substance, candidates: readonly UsColourJson[]): boolean {
  if (substance.purposes.length > 0) return substance.purposes.includes('colourant');
  return isColourIndexName(substance.name) || candidates.some((one) => one.only === undefined);
}

/** US colour names that the document gives for an ingredient. */
function usNames(context: Context): ReadonlyMap<string, string> {
  const names = new Map<string, string>();
  for (const material of context.document.materials) {
    for (const part of material.composition) if (part.usName) names.set(foldName(part.inci), part.usName);
  }
  for (const shade of context.document.product.mayContain) if (shade.usName) names.set(foldName(shade.inci), shade.usName);
  return names;
}

/** The listed colours that a name can mean. */
export function findColours(name: string, usName: string | undefined, context: Pick<Context, 'law' | 'days'>): readonly UsColourJson[] {
  const isLive = (one: UsColourJson): boolean => !one.from || hasBegun({ available: one.from.available as never }, context.days);
  const byName = (indexOf(context.law.usColours).get(foldName(usName ?? name).replace(/lake$/, '')) ?? []).filter(isLive);
  if (byName.length > 0) return byName;
  const ci = /\d{5}/.exec(isColourIndexName(name) ? name : '')?.[0];
  return ci ? context.law.usColours.filter((one) => one.ci.includes(ci) && isLive(one)) : [];
}

const indexes = new WeakMap<readonly UsColourJson[], ReadonlyMap<string, readonly UsColourJson[]>>();

/** The colours under each of their folded names. */
function indexOf(colours: readonly UsColourJson[]): ReadonlyMap<string, readonly UsColourJson[]> {
  const known = indexes.get(colours);
  if (known) return known;
  const made = new Map<string, UsColourJson[]>();
  for (const colour of colours) {
    for (const key of new Set([colour.name, colour.fullName, ...(colour.otherNames ?? [])].map(foldName))) made.set(key, [...(made.get(key) ?? []), colour]);
  }
  indexes.set(colours, made);
  return made;
}

function judgeCandidates(substance: Substance, candidates: readonly UsColourJson[], context: Context): Finding[] {
  const verdicts = candidates.map((colour) => ({ colour, fault: findFault(colour, substance, context) }));
  if (verdicts.some((one) => !one.fault)) return [];
  const { colour, fault } = verdicts[0]!;
  return [present(substance.name, fault!, `21 CFR ${colour.cfr}`, colour, substance)];
}

function findFault(colour: UsColourJson, substance: Substance, context: Context): Fault | undefined {
  const { tags } = context.facts.category;
  if (colour.permitted === false) return { kind: 'use-not-listed', why: 'it is not permitted in cosmetics' };
  const listed = colour.only?.some((tag) => tags.includes(tag)) ?? true;
  if (colour.only && !listed) return { kind: 'not-for-this-use', why: colour.words ?? 'it is listed for other products only' };
  const area = tags.includes('eye') ? colour.eye : tags.includes('lip') || tags.includes('mucous') ? colour.lips : colour.external;
  if (area === 'no' || (area === 'listed' && !colour.only)) {
    return { kind: 'not-for-this-use', why: tags.includes('eye') ? 'it is not listed for the area of the eye' : tags.includes('lip') || tags.includes('mucous') ? 'it is for external use only, not for lips or mucous membranes' : 'it is not listed for this use' };
  }
  const limit = tags.includes('lip') ? (colour.lipMax ?? colour.max) : colour.max;
  if (limit === undefined) return undefined;
  const max = multiply(substance.total.max, context.facts.readyForUse);
  const min = multiply(substance.total.min, context.facts.readyForUse);
  if (compare(max, decimal(limit)) <= 0) return undefined;
  return { kind: compare(min, decimal(limit)) > 0 ? 'limit-exceeded' : 'limit-uncertain', limit };
}

function present(subject: string, fault: Fault, citation: string, colour: UsColourJson | undefined, substance: Substance | undefined): Finding {
  const common = {
    rule: colour ? `us/colour/${foldName(colour.name)}` : 'us/colour/unlisted',
    subject,
    citation,
    ...(colour && colour.sourcing !== 'official' ? { sourcing: colour.sourcing } : {}),
    certainty: fault.kind === 'limit-uncertain' ? ('possible' as const) : ('certain' as const),
    ...(colour?.certified ? { reading: 'Every batch of this colour must be certified by FDA; that is not checked here.' } : {}),
  };
  const name = colour ? `${subject} (${colour.name})` : subject;
  if ('limit' in fault) {
    return { ...common, kind: fault.kind, severity: fault.kind === 'limit-exceeded' ? 'stop' : 'decide', ...measuredFields(substance!.total), limit: fault.limit, unit: '%', message: `${name}: ${fault.limit} % is the most in this product.`, remedy: `Bring it to ${fault.limit} % or less.` };
  }
  return { ...common, kind: fault.kind, severity: 'stop', message: `${name}: ${fault.why}.`, remedy: 'Choose a colour additive listed for this use.' };
}

/** Shades' colourants are judged by name and area alone. */
function judgeShades(context: Context): Finding[] {
  const named = usNames(context);
  const zero = { n: 0n, d: 1n };
  const none = { min: zero, typical: zero, max: zero };
  return context.document.product.mayContain.flatMap(({ inci }) => {
    const substance: Substance = { key: foldName(inci), name: inci, cas: [], purposes: ['colourant'], nano: false, as: { ingredient: none }, total: none, sources: [] };
    const candidates = findColours(inci, named.get(foldName(inci)), context);
    if (candidates.length === 0) return [present(inci, { kind: 'use-not-listed', why: 'it is not listed as a colour additive for cosmetics' }, UNLISTED, undefined, undefined)];
    return judgeCandidates(substance, candidates, context);
  });
}

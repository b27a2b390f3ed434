import { hasBegun, isToCome, type Days } from '#shared/law/as-at.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { AllergenGroup, Exposure, Market } from '#shared/law/types.ts';
import { compare, decimal, ONE, toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import type { EntrySource, SourceShare } from './assessment.ts';
import type { MixingPlan, PlannedSubstance } from './mixing-plan.ts';
import type { PreparedPart } from './prepare-material.ts';
import { sharesOf, sourcesOf } from './sources.ts';
import type { Finding, Interval } from './types.ts';

/** One allergen group of a market, judged for the product. */
export interface AllergenVerdict {
  readonly group: AllergenGroup;
  readonly name: string;
  readonly total: Interval;
  readonly threshold: string;
  readonly disclose: boolean;
  readonly certainty?: 'certain' | 'possible';
  readonly citation: string;
  readonly substances: readonly BlendedSubstance[];
  readonly sources: readonly EntrySource[];
  /** The same in short, as texts. */
  readonly shares: readonly SourceShare[];
}

const ONCE: Rational = ONE;

const groupings = new WeakMap<LawBook, WeakMap<MixingPlan, ReadonlyMap<AllergenGroup, readonly number[]>>>();

/** Which groups the product's substances belong to; the same for every market and every amount. */
export function groupAllergens(blend: Blend, law: LawBook): ReadonlyMap<AllergenGroup, readonly BlendedSubstance[]> {
  let known = groupings.get(law);
  if (!known) groupings.set(law, (known = new WeakMap()));
  let places = known.get(blend.plan);
  if (!places) known.set(blend.plan, (places = groupPlan(blend.plan, law)));
  return new Map([...places].map(([group, list]) => [group, list.map((at) => blend.substances[at]!)]));
}

function groupPlan(plan: MixingPlan, law: LawBook): ReadonlyMap<AllergenGroup, readonly number[]> {
  const found = new Map<AllergenGroup, number[]>();
  for (const substance of plan.substances) {
    // One substance, one group: its own name decides before a shared number.
    const group = groupOf(substance, law);
    if (!group) continue;
    const list = found.get(group);
    if (list) list.push(substance.at);
    else found.set(group, [substance.at]);
  }
  return found;
}

const groups = new WeakMap<LawBook, WeakMap<PreparedPart, AllergenGroup | null>>();

function groupOf(substance: PlannedSubstance, law: LawBook): AllergenGroup | undefined {
  let known = groups.get(law);
  if (!known) groups.set(law, (known = new WeakMap()));
  for (const { group } of substance.occurrences) {
    for (const part of group.parts) {
      let found = known.get(part);
      if (found === undefined) known.set(part, (found = groupOfPart(part, law) ?? null));
      if (found) return found;
    }
  }
  return undefined;
}

function groupOfPart({ inci, written, cas }: PreparedPart, law: LawBook): AllergenGroup | undefined {
  return law.allergenGroupsFor({ name: inci, cas })[0] ?? law.allergenGroupsFor({ name: written, cas: [] })[0];
}

/** Totals of every group that binds in the market, strictly compared at the greatest that the ranges allow. */
export function judgeAllergens(
  blend: Blend,
  grouped: ReadonlyMap<AllergenGroup, readonly BlendedSubstance[]>,
  at: Days & { readonly market: Market; readonly exposure: Exposure },
): { verdicts: AllergenVerdict[]; upcoming: Finding[] } {
  const verdicts: AllergenVerdict[] = [];
  const upcoming: Finding[] = [];
  for (const [group, substances] of grouped) {
    const rule = group.markets.find((one) => one.market === at.market);
    if (!rule) continue;
    const binds = hasBegun(rule.from, at);
    if (!binds && !isToCome({ from: rule.from }, at)) continue;
    const threshold = at.exposure === 'leave-on' ? group.leaveOn : group.rinseOff;
    const limit = decimal(threshold);
    const total = substances.length === 1 ? substances[0]!.total : blend.weigh(substances.map(({ key }) => ({ key, weight: ONCE })));
    if (total.max.n === 0n) continue;
    const disclose = compare(total.max, limit) > 0;
    if (!binds) {
      if (disclose) upcoming.push(upcomingFinding(group, rule, total, threshold, at.exposure));
      continue;
    }
    const isCertain = disclose && compare(total.min, limit) > 0;
    verdicts.push({
      group,
      name: group.label,
      total,
      threshold,
      disclose,
      citation: rule.citation,
      substances,
      ...(disclose && { certainty: isCertain ? ('certain' as const) : ('possible' as const) }),
      get sources() {
        return sourcesOf(blend, substances, 'all');
      },
      get shares() {
        return sharesOf(blend, substances, 'all');
      },
    });
  }
  return { verdicts, upcoming };
}

function upcomingFinding(group: AllergenGroup, rule: AllergenGroup['markets'][number], total: Interval, threshold: string, exposure: Exposure): Finding {
  const max = toDecimal(total.max);
  const { placed, available } = rule.from;
  return {
    kind: 'upcoming',
    severity: 'note',
    rule: `${group.id}/allergen-to-come`,
    subject: group.label,
    measured: max,
    limit: threshold,
    unit: '%',
    citation: rule.citation,
    effective: { from: placed ?? available },
    message: `${group.label} will have to be named: it reaches ${max} %, over ${threshold} % in a ${exposure} product. ${
      placed ? `This binds new batches from ${placed} and everything still sold from ${available}.` : `This binds from ${available}.`
    }`,
    remedy: `Add ${group.label} to the ingredient list before then.`,
    arithmetic: [
      { step: 'Greatest total over every source', figure: `${max} %` },
      { step: `Threshold, ${exposure}`, figure: `${threshold} %` },
    ],
    ...(rule.sourcing !== 'official' && { sourcing: rule.sourcing }),
  };
}

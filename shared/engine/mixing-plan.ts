import { SAFE_BELOW, toSafe } from '#shared/kernel/figure.ts';
import type { Purpose } from '#shared/law/types.ts';
import { gcd, type PreparedGroup, type PreparedMaterial, type PreparedPart, type Way } from './prepare-material.ts';

/** Where a substance comes from: one group of one material. */
export interface Occurrence {
  readonly at: number;
  readonly group: PreparedGroup;
}

/** One substance of a mixture of certain materials, whatever their amounts. */
export interface PlannedSubstance {
  readonly at: number;
  readonly key: string;
  readonly name: string;
  readonly nano: boolean;
  readonly cas: readonly string[];
  readonly purposes: readonly Purpose[];
  readonly first: PreparedPart;
  readonly occurrences: readonly Occurrence[];
  /** Which slot holds its figures in each way; absent where it is not there in that way. */
  readonly slots: Readonly<Partial<Record<Way, number>>>;
}

/** What one group of a material adds to one slot. */
export interface Share {
  readonly at: number;
  readonly slot: number;
  readonly group: PreparedGroup;
}

/** The same groups as doubles, present where all of them are exact. */
export interface SafeShares {
  readonly at: Int32Array;
  readonly slot: Int32Array;
  readonly lo: Float64Array;
  readonly typ: Float64Array;
  readonly hi: Float64Array;
}

/**
 * Everything of a mixture that does not depend on amounts: which substances there are, where they
 * come from, and the common denominator. Remembered for the same materials, so that a keystroke
 * in one amount only weighs again. What further depends on the substances alone (law rows,
 * printed names) is remembered with the plan by those who find it.
 */
export interface MixingPlan {
  readonly materials: readonly PreparedMaterial[];
  readonly common: bigint;
  /** Times a mass, over `common`: the weight of a material's figures. */
  readonly scales: readonly bigint[];
  readonly substances: readonly PlannedSubstance[];
  readonly byKey: ReadonlyMap<string, number>;
  readonly slotCount: number;
  readonly shares: readonly Share[];
  readonly safe: SafeShares | undefined;
  /** All of a material's greatest figures together: no sum over it can be larger. */
  readonly most: readonly bigint[];
  /** Whether any ingredient's share of any material is a range. */
  readonly hasRanges: boolean;
}

const plans = new WeakMap<PreparedMaterial, MixingPlan[]>();
/** Formulas that begin with the same material and are being worked on at the same time. */
const KEPT = 6;

/** The plan for these materials, in this order. */
export function planMixing(materials: readonly PreparedMaterial[]): MixingPlan {
  const first = materials[0];
  if (!first) return makePlan(materials);
  let known = plans.get(first);
  if (!known) plans.set(first, (known = []));
  for (const plan of known) if (isSame(plan.materials, materials)) return plan;
  const made = makePlan(materials);
  known.unshift(made);
  if (known.length > KEPT) known.pop();
  return made;
}

function isSame(a: readonly PreparedMaterial[], b: readonly PreparedMaterial[]): boolean {
  if (a.length !== b.length) return false;
  for (let index = 0; index < a.length; index += 1) if (a[index] !== b[index]) return false;
  return true;
}

interface Gathering {
  key: string;
  occurrences: Occurrence[];
  slots: Partial<Record<Way, number>>;
}

function makePlan(materials: readonly PreparedMaterial[]): MixingPlan {
  const found = new Map<string, Gathering>();
  const shares: Share[] = [];
  let slotCount = 0;
  let hasRanges = false;
  let common = 1n;
  for (const { den } of materials) common = lcm(common, den);
  const most = materials.map(({ groups }, at) => {
    let sum = 0n;
    for (const group of groups) {
      sum += group.hi;
      let gathering = found.get(group.key);
      if (!gathering) found.set(group.key, (gathering = { key: group.key, occurrences: [], slots: {} }));
      gathering.occurrences.push({ at, group });
      const slot = (gathering.slots[group.way] ??= slotCount++);
      shares.push({ at, slot, group });
      if (group.way === 'ingredient' && group.lo !== group.hi) hasRanges = true;
    }
    return sum;
  });
  const substances = [...found.values()].map(planSubstance);
  const byKey = new Map(substances.map(({ key, at }) => [key, at]));
  return { materials, common, scales: materials.map(({ den }) => common / den), substances, byKey, slotCount, shares, safe: toSafeShares(shares, most), most, hasRanges };
}

export function lcm(a: bigint, b: bigint): bigint {
  if (a === b || a % b === 0n) return a;
  return (a / gcd(a, b)) * b;
}

function planSubstance({ key, occurrences, slots }: Gathering, at: number): PlannedSubstance {
  const first = occurrences[0]!.group.parts[0]!;
  return { at, key, name: first.inci, nano: first.isNano, cas: uniq(occurrences, (part) => part.cas), purposes: uniq(occurrences, (part) => (part.purpose ? [part.purpose] : [])), first, occurrences, slots };
}

function uniq<T>(occurrences: readonly Occurrence[], of: (part: PreparedPart) => readonly T[]): readonly T[] {
  const { parts } = occurrences[0]!.group;
  if (occurrences.length === 1 && parts.length === 1) return of(parts[0]!);
  const found = new Set<T>();
  for (const { group } of occurrences) for (const part of group.parts) for (const one of of(part)) found.add(one);
  return [...found];
}

function toSafeShares(shares: readonly Share[], most: readonly bigint[]): SafeShares | undefined {
  if (most.some((sum) => sum >= SAFE_BELOW)) return undefined;
  const count = shares.length;
  const safe = { at: new Int32Array(count), slot: new Int32Array(count), lo: new Float64Array(count), typ: new Float64Array(count), hi: new Float64Array(count) };
  shares.forEach(({ at, slot, group }, index) => {
    safe.at[index] = at;
    safe.slot[index] = slot;
    const hi = (safe.hi[index] = toSafe(group.hi));
    safe.lo[index] = group.lo === group.hi ? hi : toSafe(group.lo);
    safe.typ[index] = group.typ === group.hi ? hi : toSafe(group.typ);
  });
  return safe;
}

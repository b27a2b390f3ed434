import type { DocumentMaterial, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { SAFE_BELOW, toSafe, type Figure } from '#shared/kernel/figure.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Purpose } from '#shared/law/types.ts';
import { FigureInterval } from './figure-interval.ts';
import { lcm, planMixing, type MixingPlan, type Occurrence, type PlannedSubstance } from './mixing-plan.ts';
import { leastOf, rangeOf, type Goal } from './optimum.ts';
import { prepareMaterial, type Figures, type PreparedMaterial, type PreparedPart, type Way } from './prepare-material.ts';
import { slotFigures, type Slots } from './slot-figures.ts';
import type { Interval, Mixture, Source, Substance } from './types.ts';
import { weighLines, type WeighedLines } from './weigh-lines.ts';

/** A material in the product: one composition, whatever the number of its lines. */
export interface BlendedMaterial {
  readonly prepared: PreparedMaterial;
  /** Indices of its lines. */
  readonly lines: readonly number[];
  readonly mass: bigint;
  /** A figure of the material times this is a share of the product over the blend's denominator. */
  readonly weight: bigint;
}

/** One substance, merged over all materials. */
export interface BlendedSubstance extends Substance {
  /** Its place among the blend's substances, and in the plan. */
  readonly at: number;
  readonly occurrences: readonly Occurrence[];
  readonly first: PreparedPart;
}

/**
 * The product as a mixture, in whole numbers over one denominator (`percent = figure / den`).
 * Shares are as added: the sum of the lines is the product.
 */
export interface Blend extends Mixture {
  readonly plan: MixingPlan;
  readonly weighed: WeighedLines;
  readonly den: bigint;
  /** The same denominator as the figures of intervals have it. */
  readonly figureDen: Figure;
  readonly materials: readonly BlendedMaterial[];
  readonly substances: readonly BlendedSubstance[];
  find(key: string): BlendedSubstance | undefined;
  /** Bounds of one substance's share as an ingredient; `undefined` where it is none. */
  asIngredient(at: number): FigureInterval | undefined;
  /** Bounds of what these substances add up to as ingredients. */
  ingredientShare(keys: readonly string[]): FigureInterval;
  /** The least that `first` minus `second` can be, both as ingredients: negative where some composition turns them round. */
  leastLead(first: readonly string[], second: readonly string[]): Rational;
  share(figure: bigint): Rational;
  /** A share of a material's figure as text: `figure` over the material's own denominator. */
  weightOf(at: number): Figure;
}

/**
 * Mixes the formula's lines (or the same lines with other masses). Materials that no line
 * uses, or that weigh nothing, take no part.
 */
export function blendFormula(document: FormulaDocument, dictionary: Dictionary, weighed: WeighedLines = weighLines(document)): Blend {
  const used = new Map<DocumentMaterial, { lines: number[]; mass: bigint }>();
  const byId = materialsById(document.materials);
  document.formula.lines.forEach((line, index) => {
    const mass = weighed.masses[index]!;
    const material = mass === 0n ? undefined : byId.get(line.material);
    if (!material) return;
    const entry = used.get(material);
    if (entry) {
      entry.lines.push(index);
      entry.mass += mass;
    } else used.set(material, { lines: [index], mass });
  });
  const prepared: PreparedMaterial[] = [];
  for (const material of used.keys()) prepared.push(prepareMaterial(material, dictionary));
  const plan = planMixing(prepared);
  const materials = [...used.values()].map(({ lines, mass }, at): BlendedMaterial => ({ prepared: prepared[at]!, lines, mass, weight: mass * plan.scales[at]! }));
  return new ExactBlend(plan, weighed, materials);
}

const alone = new WeakMap<PreparedMaterial, Blend>();

/** A product of one material and nothing else. */
export function blendAlone(prepared: PreparedMaterial): Blend {
  let found = alone.get(prepared);
  if (!found) {
    const plan = planMixing([prepared]);
    const weighed: WeighedLines = { den: 1n, masses: [1n], total: 1n, batch: 1n, hasBatchSize: false };
    alone.set(prepared, (found = new ExactBlend(plan, weighed, [{ prepared, lines: [0], mass: 1n, weight: plan.scales[0]! }])));
  }
  return found;
}

const byIds = new WeakMap<readonly DocumentMaterial[], ReadonlyMap<string, DocumentMaterial>>();

export function materialsById(materials: readonly DocumentMaterial[]): ReadonlyMap<string, DocumentMaterial> {
  let found = byIds.get(materials);
  if (!found) byIds.set(materials, (found = new Map(materials.map((material) => [material.id, material]))));
  return found;
}

class ExactBlend implements Blend {
  readonly plan: MixingPlan;
  readonly shape: object;
  readonly weighed: WeighedLines;
  readonly den: bigint;
  readonly figureDen: Figure;
  readonly materials: readonly BlendedMaterial[];
  readonly #weights: readonly Figure[];
  readonly #slots: Slots;
  readonly #intervals: (FigureInterval | undefined)[];
  #substances: readonly MixedSubstance[] | undefined;

  constructor(plan: MixingPlan, weighed: WeighedLines, materials: readonly BlendedMaterial[]) {
    this.plan = plan;
    this.shape = plan;
    this.weighed = weighed;
    this.materials = materials;
    const den = weighed.total * plan.common;
    this.den = den === 0n ? 1n : den;
    // No figure of the product is larger than all greatest figures of all materials together.
    let most = this.den;
    materials.forEach(({ weight }, at) => (most += weight * plan.most[at]!));
    const isSafe = plan.safe !== undefined && most < SAFE_BELOW;
    this.figureDen = isSafe ? toSafe(this.den) : this.den;
    this.#weights = materials.map(({ weight }) => (isSafe ? toSafe(weight) : weight));
    this.#slots = slotFigures(plan, this.#weights, isSafe);
    this.#intervals = [];
  }

  get substances(): readonly MixedSubstance[] {
    return (this.#substances ??= this.plan.substances.map((planned) => new MixedSubstance(this, planned)));
  }

  find(key: string): BlendedSubstance | undefined {
    const at = this.plan.byKey.get(key);
    return at === undefined ? undefined : this.substances[at];
  }

  share(figure: bigint): Rational {
    return { n: figure, d: this.den };
  }

  weightOf(at: number): Figure {
    return this.#weights[at]!;
  }

  /** The interval of a slot of the plan. */
  slot(slot: number): FigureInterval {
    return (this.#intervals[slot] ??= new FigureInterval(this.#slots.at(slot), this.figureDen));
  }

  asIngredient(at: number): FigureInterval | undefined {
    const slot = this.plan.substances[at]!.slots.ingredient;
    return slot === undefined ? undefined : this.slot(slot);
  }

  weigh(terms: readonly { readonly key: string; readonly weight: Rational }[]): Interval {
    let den = 1n;
    for (const { weight } of terms) den = lcm(den, weight.d);
    const weights = new Map<string, bigint>();
    for (const { key, weight } of terms) weights.set(key, (weights.get(key) ?? 0n) + weight.n * (den / weight.d));
    return new FigureInterval(this.#total(weights, 'all', rangeOf), this.den * den);
  }

  ingredientShare(keys: readonly string[]): FigureInterval {
    if (keys.length === 1) {
      const at = this.plan.byKey.get(keys[0]!);
      const only = at === undefined ? undefined : this.asIngredient(at);
      if (only) return only;
    }
    return new FigureInterval(this.#total(new Map(keys.map((key) => [key, 1n])), 'ingredient', rangeOf), this.den);
  }

  leastLead(first: readonly string[], second: readonly string[]): Rational {
    const weights = new Map(first.map((key) => [key, 1n]));
    for (const key of second) weights.set(key, -1n);
    return this.share(this.#total(weights, 'ingredient', leastOf).lo);
  }

  /** Adds the optimum over each material that holds any of the substances: materials vary independently. */
  #total(weights: ReadonlyMap<string, bigint>, ways: Goal['ways'], optimum: typeof rangeOf): Figures {
    const touched = new Set<number>();
    for (const key of weights.keys()) {
      const at = this.plan.byKey.get(key);
      if (at !== undefined) for (const one of this.plan.substances[at]!.occurrences) touched.add(one.at);
    }
    let lo = 0n;
    let typ = 0n;
    let hi = 0n;
    for (const at of touched) {
      const { prepared, weight } = this.materials[at]!;
      const best = optimum(prepared, { weights, ways });
      lo += weight * best.lo;
      typ += weight * best.typ;
      hi += weight * best.hi;
    }
    return { lo, typ, hi };
  }
}

const WAYS: readonly Way[] = ['ingredient', 'hidden', 'incidental'];

class MixedSubstance implements BlendedSubstance {
  readonly at: number;
  readonly key: string;
  readonly name: string;
  readonly #blend: ExactBlend;
  readonly #planned: PlannedSubstance;
  #total: Interval | undefined;
  #as: Substance['as'] | undefined;

  constructor(blend: ExactBlend, planned: PlannedSubstance) {
    this.#blend = blend;
    this.#planned = planned;
    this.at = planned.at;
    this.key = planned.key;
    this.name = planned.name;
  }

  get nano(): boolean {
    return this.#planned.nano;
  }
  get cas(): readonly string[] {
    return this.#planned.cas;
  }
  get purposes(): readonly Purpose[] {
    return this.#planned.purposes;
  }
  get first(): PreparedPart {
    return this.#planned.first;
  }
  get properties(): readonly string[] | undefined {
    return this.#planned.first.entry?.properties;
  }
  get occurrences(): readonly Occurrence[] {
    return this.#planned.occurrences;
  }
  get as(): Substance['as'] {
    return (this.#as ??= this.#findWays());
  }
  get total(): Interval {
    return (this.#total ??= this.#findTotal());
  }
  get sources(): readonly Source[] {
    const { materials, weighed, den } = this.#blend;
    return this.occurrences.flatMap(({ at, group }) => {
      const { prepared, lines, mass, weight } = materials[at]!;
      return lines.map((line): Source => {
        // A line holds its part of the material's mass.
        const part = (figure: bigint): Rational => ({ n: weight * figure * weighed.masses[line]!, d: den * mass });
        return { materialId: prepared.material.id, line, share: { min: part(group.lo), typical: part(group.typ), max: part(group.hi) } };
      });
    });
  }

  #findWays(): Substance['as'] {
    const as: Partial<Record<Way, Interval>> = {};
    for (const way of WAYS) {
      const slot = this.#planned.slots[way];
      if (slot !== undefined) as[way] = this.#blend.slot(slot);
    }
    return as;
  }

  #findTotal(): Interval {
    const { ingredient, hidden, incidental } = this.#planned.slots;
    const only = ingredient ?? hidden ?? incidental!;
    const isOne = (ingredient === undefined ? 0 : 1) + (hidden === undefined ? 0 : 1) + (incidental === undefined ? 0 : 1) === 1;
    return isOne ? this.#blend.slot(only) : this.#blend.weigh([{ key: this.key, weight: { n: 1n, d: 1n } }]);
  }
}

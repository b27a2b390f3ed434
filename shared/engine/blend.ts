import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import type { Purpose } from '#shared/law/types.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import { leastOf, rangeOf, type Goal } from './optimum.ts';
import { gcd, prepareMaterial, type Figures, type PreparedGroup, type PreparedMaterial, type PreparedPart, type Way } from './prepare-material.ts';
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

/** Where a substance comes from: one group of one material. */
export interface Occurrence {
  readonly at: number;
  readonly group: PreparedGroup;
}

/** One substance, merged over all materials. */
export interface BlendedSubstance extends Substance {
  readonly occurrences: readonly Occurrence[];
  readonly first: PreparedPart;
}

/**
 * The product as a mixture, in whole numbers over one denominator (`percent = figure / den`).
 * Shares are as added: the sum of the lines is the product.
 */
export interface Blend extends Mixture {
  readonly weighed: WeighedLines;
  readonly den: bigint;
  readonly materials: readonly BlendedMaterial[];
  readonly substances: readonly BlendedSubstance[];
  find(key: string): BlendedSubstance | undefined;
  /** Bounds of what these substances add up to as ingredients. */
  ingredientShare(keys: readonly string[]): Interval;
  /** The least that `first` minus `second` can be, both as ingredients: negative where some composition turns them round. */
  leastLead(first: readonly string[], second: readonly string[]): Rational;
  share(figure: bigint): Rational;
}

interface Gathering {
  key: string;
  first: PreparedPart;
  ways: Partial<Record<Way, { lo: bigint; typ: bigint; hi: bigint }>>;
  occurrences: Occurrence[];
}

/**
 * Mixes the formula's lines (or the same lines with other masses). Materials that no line
 * uses, or that weigh nothing, take no part.
 */
export function blendFormula(document: FormulaDocument, dictionary: Dictionary, weighed: WeighedLines = weighLines(document)): Blend {
  const materials = blendMaterials(document, dictionary, weighed);
  const common = materials.reduce((least, one) => lcm(least, one.prepared.den), 1n);
  const den = weighed.total * common;
  const weighted = materials.map((one): BlendedMaterial => ({ ...one, weight: one.mass * (common / one.prepared.den) }));
  return new ExactBlend(weighed, den, weighted);
}

function blendMaterials(document: FormulaDocument, dictionary: Dictionary, weighed: WeighedLines): Omit<BlendedMaterial, 'weight'>[] {
  const byId = new Map(document.materials.map((material) => [material.id, material]));
  const used = new Map<string, { lines: number[]; mass: bigint }>();
  document.formula.lines.forEach((line, index) => {
    const mass = weighed.masses[index]!;
    if (mass === 0n) return;
    const entry = used.get(line.material);
    if (entry) {
      entry.lines.push(index);
      entry.mass += mass;
    } else used.set(line.material, { lines: [index], mass });
  });
  return [...used].flatMap(([id, { lines, mass }]) => {
    const material = byId.get(id);
    return material ? [{ prepared: prepareMaterial(material, dictionary), lines, mass }] : [];
  });
}

function lcm(a: bigint, b: bigint): bigint {
  if (a % b === 0n) return a;
  return (a / gcd(a, b)) * b;
}

class ExactBlend implements Blend {
  readonly weighed: WeighedLines;
  readonly den: bigint;
  readonly materials: readonly BlendedMaterial[];
  readonly substances: readonly BlendedSubstance[];
  readonly #byKey = new Map<string, BlendedSubstance>();

  constructor(weighed: WeighedLines, den: bigint, materials: readonly BlendedMaterial[]) {
    this.weighed = weighed;
    this.den = den === 0n ? 1n : den;
    this.materials = materials;
    const substances: BlendedSubstance[] = [];
    for (const gathering of gather(materials).values()) {
      const substance = new MixedSubstance(this, gathering);
      substances.push(substance);
      this.#byKey.set(substance.key, substance);
    }
    this.substances = substances;
  }

  find(key: string): BlendedSubstance | undefined {
    return this.#byKey.get(key);
  }

  share(figure: bigint): Rational {
    return { n: figure, d: this.den };
  }

  interval(figures: Figures): Interval {
    return { min: this.share(figures.lo), typical: this.share(figures.typ), max: this.share(figures.hi) };
  }

  weigh(terms: readonly { readonly key: string; readonly weight: Rational }[]): Interval {
    let den = 1n;
    for (const { weight } of terms) den = lcm(den, weight.d);
    const weights = new Map<string, bigint>();
    for (const { key, weight } of terms) weights.set(key, (weights.get(key) ?? 0n) + weight.n * (den / weight.d));
    const sum = this.#total(weights, 'all', rangeOf);
    const all = this.den * den;
    return { min: { n: sum.lo, d: all }, typical: { n: sum.typ, d: all }, max: { n: sum.hi, d: all } };
  }

  ingredientShare(keys: readonly string[]): Interval {
    const only = keys.length === 1 ? this.find(keys[0]!)?.as.ingredient : undefined;
    if (only) return only;
    return this.interval(this.#total(new Map(keys.map((key) => [key, 1n])), 'ingredient', rangeOf));
  }

  leastLead(first: readonly string[], second: readonly string[]): Rational {
    const weights = new Map(first.map((key) => [key, 1n]));
    for (const key of second) weights.set(key, -1n);
    return this.share(this.#total(weights, 'ingredient', leastOf).lo);
  }

  /** Adds the optimum over each material that holds any of the substances: materials vary independently. */
  #total(weights: ReadonlyMap<string, bigint>, ways: Goal['ways'], optimum: typeof rangeOf): Figures {
    const touched = new Set<number>();
    for (const key of weights.keys()) for (const { at } of this.find(key)?.occurrences ?? []) touched.add(at);
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

function gather(materials: readonly BlendedMaterial[]): Map<string, Gathering> {
  const found = new Map<string, Gathering>();
  materials.forEach(({ prepared, weight }, at) => {
    for (const group of prepared.groups) {
      let gathering = found.get(group.key);
      if (!gathering) found.set(group.key, (gathering = { key: group.key, first: group.parts[0]!, ways: {}, occurrences: [] }));
      gathering.occurrences.push({ at, group });
      const way = gathering.ways[group.way];
      if (way) {
        way.lo += weight * group.lo;
        way.typ += weight * group.typ;
        way.hi += weight * group.hi;
      } else gathering.ways[group.way] = { lo: weight * group.lo, typ: weight * group.typ, hi: weight * group.hi };
    }
  });
  return found;
}

class MixedSubstance implements BlendedSubstance {
  readonly key: string;
  readonly first: PreparedPart;
  readonly occurrences: readonly Occurrence[];
  readonly as: Substance['as'];
  readonly #blend: ExactBlend;
  #total: Interval | undefined;
  #cas: readonly string[] | undefined;
  #purposes: readonly Purpose[] | undefined;

  constructor(blend: ExactBlend, { key, first, ways, occurrences }: Gathering) {
    this.#blend = blend;
    this.key = key;
    this.first = first;
    this.occurrences = occurrences;
    this.as = {
      ...(ways.ingredient && { ingredient: blend.interval(ways.ingredient) }),
      ...(ways.hidden && { hidden: blend.interval(ways.hidden) }),
      ...(ways.incidental && { incidental: blend.interval(ways.incidental) }),
    };
  }

  get name(): string {
    return this.first.inci;
  }
  get nano(): boolean {
    return this.first.isNano;
  }
  get cas(): readonly string[] {
    return (this.#cas ??= uniq(this.occurrences, (part) => part.cas));
  }
  get purposes(): readonly Purpose[] {
    return (this.#purposes ??= uniq(this.occurrences, (part) => (part.purpose ? [part.purpose] : [])));
  }
  get total(): Interval {
    return (this.#total ??= this.#findTotal());
  }
  get sources(): readonly Source[] {
    const { materials, weighed } = this.#blend;
    return this.occurrences.flatMap(({ at, group }) => {
      const { prepared, lines, mass, weight } = materials[at]!;
      return lines.map((line): Source => {
        // A line holds its part of the material's mass.
        const part = (figure: bigint): Rational => ({ n: weight * figure * weighed.masses[line]!, d: this.#blend.den * mass });
        return { materialId: prepared.material.id, line, share: { min: part(group.lo), typical: part(group.typ), max: part(group.hi) } };
      });
    });
  }

  #findTotal(): Interval {
    const ways = [this.as.ingredient, this.as.hidden, this.as.incidental].filter((one) => one !== undefined);
    if (ways.length === 1) return ways[0]!;
    return this.#blend.weigh([{ key: this.key, weight: { n: 1n, d: 1n } }]);
  }
}

function uniq<T>(occurrences: readonly Occurrence[], of: (part: PreparedPart) => readonly T[]): readonly T[] {
  const found = new Set<T>();
  for (const { group } of occurrences) for (const part of group.parts) for (const one of of(part)) found.add(one);
  return [...found];
}

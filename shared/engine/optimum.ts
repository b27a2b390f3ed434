import type { Figures, PreparedMaterial, PreparedPart, Way } from './prepare-material.ts';

/** A weighted sum of substances, asked of one material. */
export interface Goal {
  readonly weights: ReadonlyMap<string, bigint>;
  /** `ingredient`: only what is declared in its own right; `all`: every way of being present. */
  readonly ways: 'ingredient' | 'all';
}

/**
 * Exact least and greatest of a weighted sum over every composition that a material's ranges
 * allow. The ranges are boxes cut by one plane (the sum to 100 %), so filling the parts in the
 * order of their weights reaches the optimum of the linear programme. Constituents vary freely
 * within their ranges.
 */
export function rangeOf(material: PreparedMaterial, goal: Goal): Figures {
  const parts = weighted(material, goal);
  let typ = 0n;
  for (const { part, weight } of parts) typ += weight * part.typ;
  let { lo, hi } = wholeShare(material, goal);
  typ += lo;
  for (const part of material.constituents) {
    const weight = goal.ways === 'all' ? (goal.weights.get(part.key) ?? 0n) : 0n;
    if (weight === 0n) continue;
    typ += weight * part.typ;
    lo += weight * (weight > 0n ? part.lo : part.hi);
    hi += weight * (weight > 0n ? part.hi : part.lo);
  }
  if (!material.isTied) {
    for (const { part, weight } of parts) {
      lo += weight * (weight > 0n ? part.lo : part.hi);
      hi += weight * (weight > 0n ? part.hi : part.lo);
    }
    return { lo, typ, hi };
  }
  return { lo: lo + fill(material, parts, -1), typ, hi: hi + fill(material, parts, 1) };
}

/** Only the least, for proofs of order: the other figures are 0. */
export function leastOf(material: PreparedMaterial, goal: Goal): Figures {
  if (!material.isTied || goal.ways === 'all') return rangeOf(material, goal);
  const { lo } = wholeShare(material, goal);
  return { lo: lo + fill(material, weighted(material, goal), -1), typ: 0n, hi: 0n };
}

interface Weighted {
  readonly part: PreparedPart;
  readonly weight: bigint;
}

function isMeant(way: Way, ways: Goal['ways']): boolean {
  return ways === 'all' || way === 'ingredient';
}

function weighted(material: PreparedMaterial, goal: Goal): Weighted[] {
  return material.parts.map((part) => ({ part, weight: isMeant(part.way, goal.ways) ? (goal.weights.get(part.key) ?? 0n) : 0n }));
}

/** The perfume or aroma entry that stands for a whole material. */
function wholeShare(material: PreparedMaterial, goal: Goal): { lo: bigint; hi: bigint } {
  if (material.material.declareAs === 'ingredients') return { lo: 0n, hi: 0n };
  const share = (goal.weights.get(material.groups[0]!.key) ?? 0n) * material.whole;
  return { lo: share, hi: share };
}

/** Starts every part at its least and gives the rest of the 100 % out by weight: dearest first (1) or cheapest first (-1). */
function fill(material: PreparedMaterial, parts: readonly Weighted[], direction: 1 | -1): bigint {
  let value = 0n;
  let rest = material.whole;
  for (const { part, weight } of parts) {
    value += weight * part.lo;
    rest -= part.lo;
  }
  if (rest === 0n) return value;
  const order = [...parts].sort((a, b) => (a.weight === b.weight ? 0 : a.weight < b.weight ? -direction : direction) * -1);
  for (const { part, weight } of order) {
    const room = part.hi - part.lo;
    const given = room < rest ? room : rest;
    value += weight * given;
    rest -= given;
    if (rest === 0n) break;
  }
  return value;
}

import type { Rational } from '#shared/kernel/rational.ts';
import { figureToDecimal, toSafe, type Figure } from '#shared/kernel/figure.ts';
import type { EntrySource, SourceShare } from './assessment.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import type { PreparedGroup, Way } from './prepare-material.ts';

/** Where a set of substances comes from, one row for each material, largest share first. */
export function sourcesOf(blend: Blend, substances: readonly BlendedSubstance[], ways: 'ingredient' | 'all'): EntrySource[] {
  const found = new Map<number, { lo: bigint; typ: bigint; hi: bigint; names: string[]; ways: Set<Way> }>();
  for (const { occurrences, name } of substances) {
    for (const { at, group } of occurrences) {
      if (ways === 'ingredient' && group.way !== 'ingredient') continue;
      let source = found.get(at);
      if (!source) found.set(at, (source = { lo: 0n, typ: 0n, hi: 0n, names: [], ways: new Set() }));
      source.lo += group.lo;
      source.typ += group.typ;
      source.hi += group.hi;
      source.ways.add(group.way);
      if (!source.names.includes(name)) source.names.push(name);
    }
  }
  const rows = [...found].map(([at, { lo, typ, hi, names, ways: present }]): EntrySource => {
    const { prepared, weight, lines, mass } = blend.materials[at]!;
    const ofMaterial = (figure: bigint): Rational => ({ n: figure, d: prepared.den });
    return {
      materialId: prepared.material.id,
      tradeName: prepared.material.tradeName,
      lines,
      mass: { n: mass, d: blend.weighed.den },
      materialShare: { n: mass * 100n, d: blend.weighed.total },
      ofMaterial: { min: ofMaterial(lo), typical: ofMaterial(typ), max: ofMaterial(hi) },
      share: { min: blend.share(weight * lo), typical: blend.share(weight * typ), max: blend.share(weight * hi) },
      names,
      ways: [...present],
    };
  });
  return rows.sort((a, b) => (a.share.typical.n > b.share.typical.n ? -1 : a.share.typical.n < b.share.typical.n ? 1 : 0));
}

const usual = new WeakMap<PreparedGroup, number>();

/** A group's usual figure as a double; asked for only where the blend keeps its figures so. */
function safeUsual(group: PreparedGroup): number {
  let found = usual.get(group);
  if (found === undefined) usual.set(group, (found = toSafe(group.typ)));
  return found;
}

/** What each material brings, as text, largest first: the short form of {@link sourcesOf}. */
export function sharesOf(blend: Blend, substances: readonly BlendedSubstance[], ways: 'ingredient' | 'all'): SourceShare[] {
  const rows: { at: number; figure: Figure }[] = [];
  for (const { occurrences } of substances) {
    for (const { at, group } of occurrences) {
      if (ways === 'ingredient' && group.way !== 'ingredient') continue;
      const weight = blend.weightOf(at);
      const figure: Figure = typeof weight === 'bigint' ? weight * group.typ : weight * safeUsual(group);
      // One substance's occurrences come material by material: another of the same material is the one before.
      const before = rows.at(-1);
      const known = substances.length === 1 ? (before?.at === at ? before : undefined) : rows.find((row) => row.at === at);
      if (known) known.figure = typeof figure === 'bigint' ? (known.figure as bigint) + figure : (known.figure as number) + figure;
      else rows.push({ at, figure });
    }
  }
  if (rows.length > 1) rows.sort((a, b) => (a.figure > b.figure ? -1 : a.figure < b.figure ? 1 : 0));
  return rows.map(({ at, figure }) => ({ material: blend.materials[at]!.prepared.material.id, share: figureToDecimal(figure, blend.figureDen) }));
}

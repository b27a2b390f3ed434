import type { Mixture, Substance } from '#shared/engine/types.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { RowHit } from '#shared/law/row-index.ts';
import type { Member } from '#shared/law/types.ts';
import { isColourIndexName } from './binding.ts';

/** What the law says of a mixture's substances, whatever their amounts. Places are into `mixture.substances`. */
export interface SpokenOf {
  /** Substances that any row of any market speaks of. */
  readonly hits: readonly { readonly at: number; readonly hits: readonly RowHit[] }[];
  readonly releasers: readonly { readonly at: number; readonly factor: NonNullable<Member['factor']> }[];
  /** Substances whose purpose is stated, or shown by a Colour Index number. */
  readonly purposeful: readonly number[];
}

const remembered = new WeakMap<LawBook, WeakMap<object, SpokenOf>>();

/** Looked up once for each shape of mixture: an amount that changes asks for no name again. */
export function spokenOf(mixture: Mixture, law: LawBook): SpokenOf {
  if (!mixture.shape) return lookUp(mixture.substances, law);
  let known = remembered.get(law);
  if (!known) remembered.set(law, (known = new WeakMap()));
  let found = known.get(mixture.shape);
  if (!found) known.set(mixture.shape, (found = lookUp(mixture.substances, law)));
  return found;
}

function lookUp(substances: readonly Substance[], law: LawBook): SpokenOf {
  const hits: SpokenOf['hits'][number][] = [];
  const releasers: SpokenOf['releasers'][number][] = [];
  const purposeful: number[] = [];
  substances.forEach((substance, at) => {
    const found = law.rowsFor(substance);
    if (found.length > 0) hits.push({ at, hits: found });
    const factor = law.releaserFor(substance)?.factor;
    if (factor) releasers.push({ at, factor });
    if (substance.purposes.length > 0 || isColourIndexName(substance.name)) purposeful.push(at);
  });
  return { hits, releasers, purposeful };
}

import type { AllergenVerdict } from './allergens.ts';
import type { DeclarationEntry, EntrySource, SourceShare, Zone } from './assessment.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import type { FigureInterval } from './figure-interval.ts';
import type { ListLaw } from './list-law.ts';
import { sharesOf, sourcesOf } from './sources.ts';

/** A name of the list before its place is known: what does not depend on amounts. */
export interface Named {
  readonly name: string;
  readonly inci: string;
  readonly why: string;
  readonly verdict?: AllergenVerdict;
}

/** One printed name of the list; reasons and sums are made when somebody opens it. */
export class ListedEntry implements DeclarationEntry {
  readonly name: string;
  readonly inci: string;
  readonly zone: Zone;
  readonly share: FigureInterval;
  readonly straddles: boolean;
  readonly substances: readonly BlendedSubstance[];
  readonly #named: Named;
  readonly #law: ListLaw;
  readonly #blend: Blend;

  constructor(blend: Blend, law: ListLaw, named: Named, placed: { readonly zone: Zone; readonly share: FigureInterval; readonly substances: readonly BlendedSubstance[] }) {
    const { zone, share } = placed;
    this.name = named.name;
    this.inci = named.inci;
    this.zone = zone;
    this.share = share;
    this.substances = placed.substances;
    this.straddles = zone === 'ordered' ? !law.isOrdered(share.lo, share.den) : zone === 'free' && law.isOrdered(share.hi, share.den);
    this.#named = named;
    this.#law = law;
    this.#blend = blend;
  }

  get sources(): readonly EntrySource[] {
    return sourcesOf(this.#blend, this.substances, 'ingredient');
  }
  get shares(): readonly SourceShare[] {
    return sharesOf(this.#blend, this.substances, 'ingredient');
  }
  get certainty(): 'certain' | 'possible' | undefined {
    return this.#named.verdict?.certainty;
  }
  get members(): readonly string[] | undefined {
    if (!this.#named.verdict && this.substances.length < 2) return undefined;
    return [...new Set(this.substances.map(({ name }) => name))];
  }
  get why(): readonly string[] {
    return [this.#named.why, placeReason(this.zone, this.#law)];
  }
  get citation(): string {
    return this.#named.verdict?.citation ?? this.#law.citation;
  }
  get keys(): readonly string[] {
    return this.substances.map(({ key }) => key);
  }
}

/** Why an entry stands where it stands, a sentence. */
export function placeReason(zone: Zone, law: ListLaw): string {
  switch (zone) {
    case 'ordered':
      return 'It stands in descending order of its share.';
    case 'free':
      return `It is ${law.line}, so it may stand in any order after the others.`;
    case 'colourant':
      return 'Colourants may close the list, whatever their share.';
    case 'allergen':
      return 'It is not an ingredient of its own: it comes inside other materials and has to be named.';
    case 'may-contain':
      return 'A colourant of other shades of the range.';
  }
}

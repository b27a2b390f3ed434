import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import type { Interval, Mixture, ProductFacts, Substance } from '#shared/engine/types.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import { add, multiply, ONE, ZERO, type Rational } from '#shared/kernel/rational.ts';
import { foldName } from '#shared/law/fold.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Category, Market } from '#shared/law/types.ts';
import type { MatchedName } from './match-name.ts';
import type { WrittenName } from './split-list.ts';

/** Where and when a pasted list is read, and the tables it is read with. */
export interface ReadingOptions {
  readonly market: Market;
  readonly category: Category;
  readonly placedOnMarket: PlainDate;
  readonly availableOn: PlainDate;
  readonly law: LawBook;
  readonly dictionary: Dictionary;
}

/** One name of the list, recognised. */
export interface ListName extends WrittenName, MatchedName {
  /** The INCI name, or the name as written where it is not known. */
  readonly name: string;
  readonly isColourant: boolean;
}

/**
 * Whether a name stands in the list as a colourant. A substance with a colour index number of its
 * own is one under that number; under its other name (`Titanium Dioxide`) it has another use,
 * except in the US, where colours go by name.
 */
export function isColourant(entry: DictionaryEntry | undefined, written: string, market: Market): boolean {
  if (/^c\.?\s?i\.?\s?\d{5}/i.test(entry?.inci ?? written)) return true;
  if (!entry) return market === 'US' && /^iron oxides?$/i.test(written);
  const isDouble = entry.properties.some((property) => property.startsWith('same-substance:'));
  return (market === 'US' && isDouble) || (entry.properties.includes('colourant') && !isDouble);
}

/** Words for a scent or a flavour, which Canada lets close the list. */
const SCENT = ['parfum', 'aroma', 'fragrance', 'flavor'];
export const isScent = (one: Pick<ListName, 'name'>): boolean => SCENT.includes(foldName(one.name));
/** A fragrance allergen named on its own, not an oil or extract. */
export const isAllergen = (one: ListName): boolean => one.entry !== undefined && one.entry.properties.includes('fragrance-allergen') && !one.entry.properties.includes('botanical');
/** What can bring fragrance allergens: a perfume, a flavour, anything of a plant. */
export const carriesScent = (one: ListName): boolean => isScent(one) || (one.entry?.properties.includes('botanical') ?? false);

/** What rules know of a product of which only the list is known: its category's own answers. */
export function factsOf({ market, category, placedOnMarket, availableOn }: ReadingOptions): ProductFacts {
  const flags = category.flags;
  return {
    market,
    placedOnMarket,
    availableOn,
    category,
    flags: {
      under3: flags.under3 ?? false,
      professionalUseOnly: flags.professionalUseOnly ?? false,
      aerosol: flags.aerosol ?? false,
      spray: flags.spray ?? flags.aerosol ?? false,
      intimateHygiene: flags.intimateHygiene ?? false,
    },
    facts: category.facts ?? {},
    readyForUse: ONE,
  };
}

/** A substance of the list at a share between two bounds. */
export function asSubstance(one: Pick<ListName, 'name' | 'entry' | 'written'>, share: Interval): Substance {
  const { entry } = one;
  return {
    key: foldName(one.name) || one.name,
    name: one.name,
    // Oils, extracts and waters of one plant share numbers: there a number decides nothing.
    cas: entry && !entry.properties.includes('botanical') ? entry.cas : [],
    purposes: [],
    nano: /\bnano\b/i.test(one.written),
    as: { ingredient: share },
    total: share,
    sources: [],
  };
}

/** The list as a mixture; sums are taken over separate bounds. */
export function asMixture(substances: readonly Substance[]): Mixture {
  const byKey = new Map(substances.map((one) => [one.key, one]));
  return {
    substances,
    find: (key) => byKey.get(key),
    weigh(terms) {
      const side = (end: keyof Interval): Rational => terms.reduce((total, { key, weight }) => add(total, multiply(byKey.get(key)?.total[end] ?? ZERO, weight)), ZERO);
      return { min: side('min'), typical: side('typical'), max: side('max') };
    },
  };
}

/** The document that rules look into beside the mixture: the names, no amounts, no particulars. */
export function asDocument(names: readonly ListName[], { market, category }: ReadingOptions): FormulaDocument {
  const usNameOf = ({ entry, written }: ListName): string | undefined => {
    const colours = entry?.names.usColours ?? [];
    return colours.length > 1 && colours.some((colour) => foldName(colour) === foldName(written)) ? written : undefined;
  };
  const listed = names.filter((one) => one.block !== 'may-contain');
  const shades = names.filter((one) => one.block === 'may-contain');
  return {
    document: 'formula/1',
    product: {
      name: '', brand: '', category: category.slug, markets: [market], flags: {}, facts: {}, claims: [],
      mayContain: shades.map((one) => ({ inci: one.name, ...(usNameOf(one) && { usName: usNameOf(one)! }) })),
    },
    materials: [{
      id: 'list', tradeName: 'list', declareAs: 'ingredients', constituents: [],
      composition: listed.map((one) => ({ inci: one.name, role: 'ingredient', ...(usNameOf(one) && { usName: usNameOf(one)! }) })),
    }],
    formula: { lines: [] },
  };
}

import type { Market, Sourcing } from '#shared/law/types.ts';
import { compare, ONE, type Rational } from '#shared/kernel/rational.ts';

/** What each market says on how the list is set out. */
export interface ListLaw {
  readonly heading: string;
  readonly citation: string;
  readonly sourcing?: Exclude<Sourcing, 'official'>;
  /** The words for the line between the ordered and the free part. */
  readonly line: string;
  readonly isOrdered: (share: Rational) => boolean;
  readonly usesGroupNames: boolean;
  readonly marksNano: boolean;
  readonly mayContain: (names: string) => string;
}

const isAtLeastOne = (share: Rational): boolean => compare(share, ONE) >= 0;
const isOverOne = (share: Rational): boolean => compare(share, ONE) > 0;
const bracketed = (names: string): string => `, [+/- ${names}]`;

export const LIST_LAW: Readonly<Record<Market, ListLaw>> = {
  EU: {
    heading: 'Ingredients',
    citation: 'Regulation (EC) No 1223/2009, Article 19(1)(g)',
    line: 'below 1 %',
    isOrdered: isAtLeastOne,
    usesGroupNames: true,
    marksNano: true,
    mayContain: bracketed,
  },
  UK: {
    heading: 'Ingredients',
    citation: 'Regulation (EC) No 1223/2009 as assimilated in Great Britain, Article 19(1)(g)',
    sourcing: 'secondary',
    line: 'below 1 %',
    isOrdered: isAtLeastOne,
    usesGroupNames: true,
    marksNano: true,
    mayContain: bracketed,
  },
  US: {
    heading: 'Ingredients',
    citation: '21 CFR 701.3(a) and (f)',
    // The opening paragraph was read in the text itself, the grouping option in secondary sources.
    sourcing: 'secondary',
    line: '1 % or less',
    isOrdered: isOverOne,
    usesGroupNames: false,
    marksNano: false,
    mayContain: (names) => `. May contain: ${names}`,
  },
  CA: {
    heading: 'Ingredients/Ingrédients',
    citation: 'Cosmetic Regulations, C.R.C., c. 869, s. 21.4',
    line: '1 % or less',
    isOrdered: isOverOne,
    usesGroupNames: false,
    marksNano: false,
    mayContain: bracketed,
  },
};

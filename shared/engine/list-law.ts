import type { Market, Sourcing } from '#shared/law/types.ts';
import type { Figure } from '#shared/kernel/figure.ts';

/** What each market says on how the list is set out. */
export interface ListLaw {
  readonly heading: string;
  readonly citation: string;
  readonly sourcing?: Exclude<Sourcing, 'official'>;
  /** The words for the line between the ordered and the free part. */
  readonly line: string;
  /** Whether a share of `n / d` percent stands in the ordered part. */
  readonly isOrdered: (n: Figure, d: Figure) => boolean;
  /** Whether exactly 1 % is in the ordered part. */
  readonly ordersOne: boolean;
  readonly usesGroupNames: boolean;
  readonly marksNano: boolean;
  readonly mayContain: (names: string) => string;
}

const isAtLeastOne = (n: Figure, d: Figure): boolean => n >= d;
const isOverOne = (n: Figure, d: Figure): boolean => n > d;
const bracketed = (names: string): string => `, [+/- ${names}]`;

export const LIST_LAW: Readonly<Record<Market, ListLaw>> = {
  EU: {
    heading: 'Ingredients',
    citation: 'Regulation (EC) No 1223/2009, Article 19(1)(g)',
    line: 'below 1 %',
    isOrdered: isAtLeastOne,
    ordersOne: true,
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
    ordersOne: true,
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
    ordersOne: false,
    usesGroupNames: false,
    marksNano: false,
    mayContain: (names) => `. May contain: ${names}`,
  },
  CA: {
    heading: 'Ingredients/Ingrédients',
    citation: 'Cosmetic Regulations, C.R.C., c. 869, s. 21.4',
    line: '1 % or less',
    isOrdered: isOverOne,
    ordersOne: false,
    usesGroupNames: false,
    marksNano: false,
    mayContain: bracketed,
  },
};

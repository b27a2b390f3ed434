import type { PlainDate } from '#shared/kernel/plain-date.ts';

/** `UK` is Great Britain; Northern Ireland follows the EU. */
export type Market = 'EU' | 'UK' | 'US' | 'CA';
export const MARKETS: readonly Market[] = ['EU', 'UK', 'US', 'CA'];

export type Exposure = 'leave-on' | 'rinse-off';
export type Purpose = 'preservative' | 'fragrance' | 'colourant' | 'uv-filter' | 'other';
export type ProductFlag = 'under3' | 'professionalUseOnly' | 'aerosol' | 'spray' | 'intimateHygiene';

/**
 * The first days on which a rule binds. With one date (`available`) it binds once
 * `availableOn` reaches it; with two it binds when `placedOnMarket` reaches `placed`
 * or `availableOn` reaches `available`.
 */
export interface Dates {
  readonly placed?: PlainDate;
  readonly available: PlainDate;
}

/**
 * A condition of the law over the product and the substance's part in it, answered
 * true, false or "cannot tell" (a fact or purpose is not known). An empty `all` is true.
 */
export type Condition =
  | { readonly all: readonly Condition[] }
  | { readonly any: readonly Condition[] }
  | { readonly not: Condition }
  | { readonly exposure: Exposure }
  | { readonly category: readonly string[] }
  /** Any of the tags of the product's category: `hair`, `oral`, `lip`, `eye`, `spray` … (data/parameters/categories.json). */
  | { readonly tag: readonly string[] }
  | { readonly flag: ProductFlag }
  | { readonly purpose: readonly Purpose[] }
  | { readonly nano: boolean }
  /** A fact equal to one of `is`, or a decimal within `[least, most]`, or strictly `above` / `below`. */
  | {
      readonly fact: string;
      readonly is?: readonly (string | boolean)[];
      readonly least?: string;
      readonly most?: string;
      readonly above?: string;
      readonly below?: string;
    };

/** How firmly a row is sourced; shown on screen and in the report where it is not `official`. */
export type Sourcing = 'official' | 'secondary' | 'memory';

/** One substance that a row of law speaks of. Matched by INCI name, by CAS, or both. */
export interface Member {
  /** The INCI or chemical name as matched (case and punctuation folded). */
  readonly name: string;
  readonly otherNames?: readonly string[];
  readonly cas?: readonly string[];
  /** False where the number is shared with other substances and cannot decide alone. */
  readonly casDecides?: boolean;
  /** Further numbers of the entry that other preparations share: kept for the record, never decisive. */
  readonly sharedCas?: readonly string[];
  /** Multiplies a share to express it on the row's basis ("as acid"): exact ratio of molar masses as two decimals. */
  readonly factor?: { readonly times: string; readonly over: string };
  /** Its own maximum, in percent on the row's basis, where ratios are summed; absent = the provision's. */
  readonly max?: string;
}

/** What a row demands in one field of application. */
export interface Provision {
  /** The letter the law gives it: `a`, `b-ii`; empty for the only one. */
  readonly letter: string;
  readonly markets?: readonly Market[];
  /** Where it speaks; absent = everywhere. */
  readonly where?: Condition;
  /** Greatest share in the ready-for-use product, in percent, on the row's basis. */
  readonly max?: string;
  /** `as acid`, `as Zn`, `as retinol equivalents` … */
  readonly basis?: string;
  /** Further conditions that must hold (pH, purity, pack). */
  readonly requires?: readonly { readonly that: Condition; readonly words: string }[];
  /** Ids into the wording table: what the label must then say; `above` or `least` where it starts above, or at, a share only. */
  readonly wording?: readonly { readonly id: string; readonly above?: string; readonly least?: string; readonly where?: Condition }[];
  readonly from?: Dates;
  /** It ends when these dates bind (its successor's). */
  readonly until?: Dates;
  /** Interpretation chosen, in plain words. */
  readonly reading?: string;
  /** `forbidden`: present in this field at all is a breach. `allowed` opens a field in a row of prohibited substances; elsewhere it is the default. */
  readonly use?: 'allowed' | 'forbidden';
  /** Why it is forbidden here, in our words. */
  readonly words?: string;
  /** Only these members (by name) are counted here; absent = all. */
  readonly only?: readonly string[];
  /** Speaks only where one of these members is present in the product. */
  readonly with?: readonly string[];
  /** Speaks only where none of these substances is present in the product. */
  readonly without?: readonly string[];
  /** Counts each member alone although the row sums, or the other way round. */
  readonly together?: 'each' | 'sum' | 'ratios';
  /** Condition of the law that cannot be computed from what the product knows, in our words. */
  readonly notComputable?: string;
}

export type RowList = 'prohibited' | 'restricted' | 'colourant' | 'preservative' | 'uv-filter';

/** One entry of a list of substances in one instrument. */
export interface LawRow {
  /** Permanent: `eu/annex-v/29`. */
  readonly id: string;
  readonly list: RowList;
  readonly instrument: string;
  readonly entry: string;
  /** As printed: `Regulation (EC) No 1223/2009, Annex V, entry 29`. */
  readonly citation: string;
  readonly markets: readonly Market[];
  readonly title: string;
  readonly members: readonly Member[];
  /** `each` member alone, their `sum`, or the sum of `ratios` to each one's own maximum. */
  readonly together: 'each' | 'sum' | 'ratios';
  readonly provisions: readonly Provision[];
  /** True where a use outside every provision is itself forbidden. */
  readonly onlyListedUses: boolean;
  readonly from?: Dates;
  readonly until?: Dates;
  readonly sourcing: Sourcing;
  /** Uses other than the list's own are lawful and stand elsewhere; without a stated purpose the limit is then uncertain. */
  readonly otherUses?: boolean;
  /** Which form the entry covers; absent = the form that is not nano. */
  readonly covers?: 'nano' | 'both';
}

/** A group of fragrance allergens that a market wants named. */
export interface AllergenGroup {
  readonly id: string;
  readonly entry: string;
  readonly citation: string;
  /** The name to print. */
  readonly label: string;
  /** False where the law gives several names and prescribes none: the names present are kept. */
  readonly prescribesName: boolean;
  readonly members: readonly Member[];
  readonly markets: readonly { readonly market: Market; readonly from: Dates; readonly sourcing: Sourcing; readonly citation: string }[];
  readonly leaveOn: string;
  readonly rinseOff: string;
  /** Interpretation chosen, in plain words. */
  readonly reading?: string;
}

/** One product category of the category table. */
export interface Category {
  readonly slug: string;
  readonly title: string;
  readonly exposure: Exposure;
  readonly tags: readonly string[];
  readonly flags: Partial<Record<ProductFlag, boolean>>;
  readonly decorative: boolean;
  /** Facts that follow from the category, such as its physical form. */
  readonly facts?: Readonly<Record<string, string | boolean>>;
}

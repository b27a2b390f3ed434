import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Category, Market, ProductFlag, Purpose } from '#shared/law/types.ts';

/** An exact interval with the figure used for ordering; all in percent of the finished product. */
export interface Interval {
  readonly min: Rational;
  readonly typical: Rational;
  readonly max: Rational;
}

/** What the rules know of the product in one market on the day asked. */
export interface ProductFacts {
  readonly market: Market;
  readonly placedOnMarket: PlainDate;
  readonly availableOn: PlainDate;
  readonly category: Category;
  readonly flags: Readonly<Record<ProductFlag, boolean>>;
  /** Answers given by the maker; absent keys are "cannot tell". Decimals as text. */
  readonly facts: Readonly<Record<string, string | boolean>>;
  /** Answers given for a material, by the material's id; absent where none has any. */
  readonly materialFacts?: ReadonlyMap<string, Readonly<Record<string, string | boolean>>>;
  /** Share of the product in the ready-for-use mixture: 1 when it is not diluted. */
  readonly readyForUse: Rational;
}

/** Where a substance's share comes from. */
export interface Source {
  readonly materialId: string;
  /** Index into `/formula/lines`. */
  readonly line: number;
  readonly share: Interval;
}

/**
 * One substance in the product, merged over all materials by folded name.
 * `ingredient`: declared in its own right; `hidden`: inside a material declared as parfum or
 * aroma, or a constituent inside an ingredient's mass; `incidental`: never listed.
 * A substance can be present in several ways at once; each way keeps its own interval.
 */
export interface Substance {
  readonly key: string;
  readonly name: string;
  readonly cas: readonly string[];
  readonly purposes: readonly Purpose[];
  readonly nano: boolean;
  /** The dictionary's properties of it; absent where the dictionary does not hold the name. */
  readonly properties?: readonly string[] | undefined;
  readonly as: { readonly ingredient?: Interval; readonly hidden?: Interval; readonly incidental?: Interval };
  readonly total: Interval;
  readonly sources: readonly Source[];
}

/** The product as a mixture of substances: what rules ask. */
export interface Mixture {
  /** The same object for mixtures of the same substances in the same order: what depends on these alone is remembered with it. */
  readonly shape?: object;
  readonly substances: readonly Substance[];
  find(key: string): Substance | undefined;
  /**
   * Exact bounds of a weighted sum of substances over every composition that the ranges
   * allow, all materials at once (tighter than adding separate intervals).
   */
  weigh(terms: readonly { readonly key: string; readonly weight: Rational }[]): Interval;
}

export type Severity = 'stop' | 'decide' | 'note';

/** The closed list of finding kinds of result documents. */
export type FindingKind =
  | 'sum-mismatch'
  | 'composition-incomplete'
  | 'unknown-ingredient'
  | 'order-uncertain'
  | 'zone-uncertain'
  | 'name-ambiguous'
  | 'name-superseded'
  | 'prohibited'
  | 'limit-exceeded'
  | 'limit-uncertain'
  | 'not-for-this-use'
  | 'use-not-listed'
  | 'wording-required'
  | 'wording-missing'
  | 'particular-missing'
  | 'particular-uncertain'
  | 'claim-medicinal'
  | 'claim-contradicted'
  | 'claim-evidence'
  | 'may-contain-misplaced'
  | 'handling-limit'
  | 'date-not-covered'
  | 'upcoming';

/** One point a verdict rests on, as it stands in the result document (decimals as text). */
export interface Finding {
  readonly kind: FindingKind;
  readonly severity: Severity;
  /** Permanent rule id. */
  readonly rule: string;
  readonly subject: string;
  /** The other names a finding is about: both of an uncertain pair, all members of a sum. */
  readonly members?: readonly string[];
  readonly measured?: string;
  /** Present where the measured value is a range. */
  readonly measuredRange?: { readonly min: string; readonly typical: string; readonly max: string };
  readonly limit?: string;
  readonly unit?: string;
  readonly basis?: string;
  readonly citation: string;
  readonly effective?: { readonly from: string; readonly to?: string };
  /** Why, in a sentence. */
  readonly message: string;
  /** What to do, an imperative sentence. */
  readonly remedy?: string;
  /** The steps of the sum, in order, for screen and report. */
  readonly arithmetic?: readonly { readonly step: string; readonly figure: string; readonly from?: string }[];
  /** Fact keys that would settle a `decide` finding. */
  readonly needs?: readonly string[];
  readonly suggestions?: readonly string[];
  readonly suspects?: readonly Suspect[];
  readonly certainty?: 'certain' | 'possible';
  readonly sourcing?: 'secondary' | 'memory';
  readonly reading?: string;
}

/** A slip of the hand that would close a batch's gap. */
export interface Suspect {
  readonly line: number;
  readonly written: string;
  readonly perhaps: string;
  readonly slip: 'digits-exchanged' | 'point-shifted';
}

export interface RequiredWording {
  readonly text: string;
  readonly lang: string;
  readonly citation: string;
  readonly subject: string;
  readonly certainty?: 'certain' | 'possible';
  /** Where the law asks for a place or size of its own. */
  readonly place?: 'principal-panel' | 'label';
  /** False where the words are a pointer to the official wording, not the wording itself. */
  readonly isOfficialText?: boolean;
  readonly rule: string;
}

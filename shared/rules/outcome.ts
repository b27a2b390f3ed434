import type { Interval, Substance } from '#shared/engine/types.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Dates, LawRow, Member, Provision } from '#shared/law/types.ts';

/** A substance of the product that a row speaks of. */
export interface Part {
  readonly substance: Substance;
  readonly member: Member;
}

/**
 * One thing a row says of the product. `limit`: more than its maximum; `forbidden`: not in this
 * use; `prohibited`: not at all; `unlisted`: no listed use fits; `requires`: a further condition
 * fails; `wording`: a text is due.
 */
export interface Outcome {
  readonly type: 'limit' | 'forbidden' | 'prohibited' | 'unlisted' | 'requires' | 'wording';
  readonly row: LawRow;
  readonly provision: Provision;
  readonly parts: readonly Part[];
  readonly certainty: 'certain' | 'possible';
  /** Depends on what the substance is there for. */
  readonly needs: readonly string[];
  readonly measured?: Interval;
  readonly limit?: Rational;
  readonly limitText?: string;
  /** Measured and limit are sums of shares over each one's own maximum, not percents. */
  readonly isRatio?: boolean;
  readonly words?: string;
  readonly wordingId?: string;
  /** The dates of what it rests on, where it is dated. */
  readonly from?: Dates;
}

/** A condition that the product's data cannot decide: shown as not checked, never as met. */
export interface NotChecked {
  readonly rule: string;
  readonly subject: string;
  readonly citation: string;
  readonly words: string;
}

import type { Interval, Mixture, ProductFacts } from '#shared/engine/types.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Days } from '#shared/law/as-at.ts';
import type { LawBook } from '#shared/law/law-book.ts';

/** Everything a rule may look at; nothing else is looked up. */
export interface Context {
  readonly facts: ProductFacts;
  readonly mixture: Mixture;
  readonly document: FormulaDocument;
  readonly law: LawBook;
  /** The days judged for: the product's own, or later ones when asking what is to come. */
  readonly days: Days;
  /** Formaldehyde that all releasers together could set free, in percent of the ready-for-use product. */
  readonly theoreticalFormaldehyde?: Interval;
}

import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Interval, Mixture } from '#shared/engine/types.ts';
import { decimal, type Rational } from '#shared/kernel/rational.ts';
import { analyseClaim } from './analyse-claim.ts';
import { namedIngredients, shareOf } from './composition.ts';

/** A share that a claim or the name promises: the sum of these substances must not fall below it. */
export interface ClaimedShare {
  readonly keys: readonly string[];
  readonly limit: Rational;
  weigh(mixture: Mixture): Interval;
}

/** Every "with 10 % glycerin" of a product whose ingredient is in it. */
export function claimedShares({ product }: FormulaDocument, mixture: Mixture): ClaimedShare[] {
  const texts = [...product.claims, ...(product.name === '' ? [] : [{ text: product.name, lang: 'en' }])];
  return texts.flatMap(({ text, lang }) => (analyseClaim(text, lang)?.named ?? []).flatMap(({ percent, starts }): ClaimedShare[] => {
    if (percent === undefined) return [];
    const keys = namedIngredients(starts, mixture).map(({ key }) => key);
    return keys.length === 0 ? [] : [{ keys, limit: decimal(percent), weigh: (mixed) => weigh(starts, mixed) }];
  }));
}

function weigh(starts: readonly string[], mixture: Mixture): Interval {
  const { min, max } = shareOf(namedIngredients(starts, mixture), mixture);
  return { min, typical: min, max };
}

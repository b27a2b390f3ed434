import type { Category, Market } from '#shared/law/types.ts';
import { add, compare, decimal, divide, HUNDRED, isZero, larger, multiply, rational, smaller, subtract, toDecimal, ZERO, type Rational } from '#shared/kernel/rational.ts';
import { isColourant } from './list-facts.ts';
import type { ReadName } from './read-list.ts';

/** What closes a list in any order, or is part of another name's mass, is taken to be little. Common practice, no source. */
const LITTLE = decimal('0.05');
const PLACES = 6;

/** One name with the share it might have, in percent of the product. */
export interface Estimate {
  readonly read: ReadName;
  readonly share: string;
}

/**
 * Shares that fit a list: each within its bounds, in its order, 100 % in all. One of very many
 * that would fit: a beginning to be weighed against what one knows, never a finding. Names
 * in order go the same part of the way from their least to their most; what the list does not
 * order is taken to be little. `undefined` where no such shares exist.
 */
export function estimateShares(names: readonly ReadName[]): readonly Estimate[] | undefined {
  const once = names.filter(({ one }, index) => one.block !== 'may-contain' && names.findIndex((other) => other.one.name === one.name) === index);
  const isLittle = ({ place }: ReadName): boolean => place.kind === 'loose' || place.isPartOfOther === true;
  const rest = once.filter((read) => !isLittle(read));
  if (rest.length === 0) return spread(once, () => false);
  return spread(once, isLittle);
}

function spread(names: readonly ReadName[], isLittle: (read: ReadName) => boolean): readonly Estimate[] | undefined {
  const little = (read: ReadName): Rational => larger(read.bounds.min, smaller(read.bounds.max, LITTLE));
  const main = names.filter((read) => !isLittle(read));
  const left = names.filter(isLittle).reduce((sum, read) => subtract(sum, little(read)), HUNDRED);
  const least = main.reduce((sum, { bounds }) => add(sum, bounds.min), ZERO);
  const room = main.reduce((sum, { bounds }) => add(sum, subtract(bounds.max, bounds.min)), ZERO);
  const missing = subtract(left, least);
  if (compare(missing, ZERO) < 0 || compare(missing, room) > 0) return undefined;
  const part = isZero(room) ? ZERO : divide(missing, room);
  const shares = names.map((read) => (isLittle(read) ? little(read) : add(read.bounds.min, multiply(part, subtract(read.bounds.max, read.bounds.min)))));
  return settle(names, shares, names.indexOf(main[0]!));
}

/** Cuts shares to a few places; the first name in order takes the rest, so that all come to 100. */
function settle(names: readonly ReadName[], shares: readonly Rational[], first: number): readonly Estimate[] {
  const cut = shares.map(floor);
  const others = cut.reduce((sum, share, index) => (index === first ? sum : add(sum, share)), ZERO);
  return names.map((read, index) => ({ read, share: toDecimal(index === first ? subtract(HUNDRED, others) : cut[index]!, PLACES) }));
}

function floor({ n, d }: Rational): Rational {
  const scale = 10n ** BigInt(PLACES);
  return rational((n * scale) / d, scale);
}

/** Where the estimate stands in the product that is begun from it. */
export const ESTIMATE_PHASE = 'Estimated from an ingredient list';

/**
 * A formula document of the estimate: each name a material of its own, its share a line. The
 * phase's name says that the shares are estimated; they are to be replaced by real ones.
 */
export function estimateDocument(estimates: readonly Estimate[], names: readonly ReadName[], product: { readonly name: string; readonly market: Market; readonly category: Category }): unknown {
  const { market, category } = product;
  const shades = names.filter(({ one }) => one.block === 'may-contain' && isColourant(one.entry, one.written, market));
  return {
    document: 'formula/1',
    product: {
      name: product.name, category: category.slug, markets: [market],
      ...(category.decorative && shades.length > 0 ? { mayContain: shades.map(({ one }) => ({ inci: one.name })) } : {}),
    },
    materials: estimates.map(({ read: { one } }, index) => ({ id: `m${index + 1}`, tradeName: one.name, ...materialOf(one.name, /\bnano\b/i.test(one.written)) })),
    formula: {
      batchSize: { value: '100', unit: 'g' },
      lines: estimates.map(({ share }, index) => ({ material: `m${index + 1}`, phase: ESTIMATE_PHASE, amount: share, unit: '%' })),
    },
  };
}

function materialOf(name: string, nano: boolean): object {
  if (name === 'Parfum') return { declareAs: 'parfum', composition: [] };
  if (name === 'Aroma') return { declareAs: 'aroma', composition: [] };
  return { composition: [{ inci: name, percent: '100', ...(nano ? { nano: true } : {}) }] };
}

import { factWords, tagWords } from './readings.ts';
import type { Condition, ProductFlag } from './types.ts';

const FLAGS: Readonly<Record<ProductFlag, string>> = {
  under3: 'products for children under 3', professionalUseOnly: 'products for professional use only', aerosol: 'aerosols', spray: 'sprays', intimateHygiene: 'products for intimate hygiene',
};
const spaced = (key: string): string => key.replace(/([a-z])([A-Z])/g, '$1 $2').replaceAll('-', ' ').toLowerCase();
const factOf = (key: string): string => factWords[key] ?? spaced(key);
const tagOf = (tag: string): string => tagWords[tag] ?? spaced(tag);

/** A condition of the law in words, to stand after "for": `rinse-off products, not sprays`. */
export function sayCondition(condition: Condition): string {
  if ('all' in condition) return condition.all.length === 0 ? 'every product' : condition.all.map(sayCondition).join(', ');
  if ('any' in condition) return condition.any.map(sayCondition).join(' or ');
  if ('not' in condition) return `not ${sayCondition(condition.not)}`;
  if ('exposure' in condition) return `${condition.exposure} products`;
  if ('category' in condition) return condition.category.map(spaced).join(' or ');
  if ('tag' in condition) return condition.tag.map(tagOf).join(' or ');
  if ('flag' in condition) return FLAGS[condition.flag];
  if ('purpose' in condition) return `use as ${condition.purpose.map((one) => (one === 'uv-filter' ? 'UV filter' : one === 'other' ? 'anything else' : one)).join(' or ')}`;
  if ('nano' in condition) return condition.nano ? 'the nano form' : 'the form that is not nano';
  return sayFact(condition);
}

function sayFact({ fact, is, least, most, above, below }: Extract<Condition, { fact: string }>): string {
  const name = factOf(fact);
  if (is) return is.every((one) => one === true) ? name : is.every((one) => one === false) ? `no ${name}` : `${name} ${is.join(' or ')}`;
  const ends = [
    ...(least === undefined ? [] : [`at least ${least}`]),
    ...(above === undefined ? [] : [`above ${above}`]),
    ...(most === undefined ? [] : [`at most ${most}`]),
    ...(below === undefined ? [] : [`below ${below}`]),
  ];
  return `${name} ${ends.join(' and ')}`;
}

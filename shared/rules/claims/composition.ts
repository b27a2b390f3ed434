import { add, ZERO, type Rational } from '#shared/kernel/rational.ts';
import type { Mixture, Substance } from '#shared/engine/types.ts';
import type { ClaimClass } from './claim-tables.ts';
import { foldWord } from './match-words.ts';

/** Ingredients of the product that belong to a class: surely, perhaps, or who can tell. */
export interface Members {
  readonly sure: readonly string[];
  readonly perhaps: readonly string[];
  /** Their composition is not known: a perfume, or a name that the dictionary does not hold. */
  readonly unknown: readonly string[];
}

const remembered = new WeakMap<object, Map<ClaimClass, Members>>();

/** Which ingredients of the product contradict that a class is absent; remembered while the substances stay the same. */
export function findMembers(claimClass: ClaimClass, mixture: Mixture): Members {
  if (!mixture.shape) return sortMembers(claimClass, mixture);
  let ofShape = remembered.get(mixture.shape);
  if (!ofShape) remembered.set(mixture.shape, (ofShape = new Map()));
  let members = ofShape.get(claimClass);
  if (!members) ofShape.set(claimClass, (members = sortMembers(claimClass, mixture)));
  return members;
}

function sortMembers(claimClass: ClaimClass, mixture: Mixture): Members {
  const members = { sure: [] as string[], perhaps: [] as string[], unknown: [] as string[] };
  for (const substance of mixture.substances) {
    if (!substance.as.ingredient && !(substance.as.hidden && claimClass.id === 'allergen')) continue;
    const standing = standingOf(claimClass, substance);
    if (standing) members[standing].push(substance.name);
  }
  return members;
}

function standingOf(claimClass: ClaimClass, substance: Substance): keyof Members | undefined {
  const { properties } = substance;
  const words = plainWords(substance.name);
  const has = (all: readonly string[] | undefined): boolean => all?.some((one) => properties?.includes(one)) ?? false;
  const isNamed = (all: readonly string[] | undefined): boolean => all?.some((name) => fitsName(name, words)) ?? false;
  if (isNamed(claimClass.names) || has(claimClass.properties) || (claimClass.id === 'nano' && substance.nano)) return isOtherwiseUsed(claimClass, substance) ? 'perhaps' : 'sure';
  if ((has(claimClass.perhaps) || isNamed(claimClass.perhapsNames)) && !isStatedOther(claimClass, substance)) return 'perhaps';
  if (claimClass.inPerfume && isPerfume(words, properties)) return 'unknown';
  return properties === undefined && claimClass.properties && !isPerfume(words, properties) ? 'unknown' : undefined;
}

const PERFUMES = new Set(['parfum', 'aroma', 'fragrance', 'perfume', 'flavor', 'flavour']);
const isPerfume = (words: string, properties: readonly string[] | undefined): boolean => PERFUMES.has(words) || (properties?.includes('perfume') ?? false);

/** What also serves as something else: only its stated purpose makes it a preservative. */
function isOtherwiseUsed(claimClass: ClaimClass, { purposes, properties }: Substance): boolean {
  if (claimClass.id !== 'preservative' || purposes.includes('preservative')) return false;
  return purposes.length > 0 || (properties?.some((one) => one === 'fragrance-substance' || one === 'fragrance-allergen' || one === 'beta-hydroxy-acid') ?? false);
}

function isStatedOther(claimClass: ClaimClass, { purposes }: Substance): boolean {
  return claimClass.id === 'fragrance' && purposes.length > 0 && !purposes.includes('fragrance');
}

const plainWords = (name: string): string => foldWord(name).replace(/[^\p{L}\p{N}]+/gu, ' ').trim();

/** `*paraben` ends so, `ci *` begins so, `*milk*` holds it; without a star it is the whole name. */
function fitsName(pattern: string, words: string): boolean {
  const core = pattern.replaceAll('*', '');
  if (pattern.startsWith('*') && pattern.endsWith('*')) return words.includes(core);
  if (pattern.startsWith('*')) return words.endsWith(core);
  if (pattern.endsWith('*')) return words.startsWith(core);
  return words === core;
}

/** Ingredients whose name begins in one of these ways. */
export function namedIngredients(starts: readonly string[], mixture: Mixture): readonly Substance[] {
  return mixture.substances.filter((substance) => begins(starts, substance) && substance.as.ingredient);
}

/** Whether any ingredient, or any constituent of one, has a name that begins so. */
export function holdsNamed(starts: readonly string[], mixture: Mixture): boolean {
  return mixture.substances.some((substance) => begins(starts, substance) && (substance.as.ingredient ?? substance.as.hidden) !== undefined);
}

function begins(starts: readonly string[], { key }: Substance): boolean {
  return starts.some((start) => key.startsWith(start));
}

/** Words of INCI names that say nothing of what the substance is. */
const COMMON = new Set(['water', 'extract', 'seed', 'fruit', 'flower', 'leaf', 'kernel', 'butter', 'sodium', 'potassium', 'magnesium', 'calcium', 'chloride', 'powder', 'hydrolyzed', 'glyceryl', 'oleate', 'stearate', 'common', 'natural', 'family']);

/** Ingredients with this word in their name: "dimethicone-free" where Dimethicone is in it. */
export function withWord(word: string, mixture: Mixture): readonly string[] {
  if (COMMON.has(word)) return [];
  const singular = word.replace(/s$/, '');
  return mixture.substances.filter(({ as, name }) => as.ingredient && plainWords(name).split(' ').some((one) => one === word || one === singular)).map(({ name }) => name);
}

/** The exact bounds of what these ingredients are together, in percent of the product. */
export function shareOf(substances: readonly Substance[], mixture: Mixture): { readonly min: Rational; readonly max: Rational } {
  if (substances.every(({ as }) => as.hidden === undefined && as.incidental === undefined)) return mixture.weigh(substances.map(({ key }) => ({ key, weight: { n: 1n, d: 1n } })));
  const of = (side: 'min' | 'max'): Rational => substances.reduce((sum, { as }) => add(sum, as.ingredient![side]), ZERO);
  return { min: of('min'), max: of('max') };
}

import type { ReadingDocument } from '#shared/contracts/reading-document.ts';
import { judgeDays } from '#shared/engine/date-findings.ts';
import type { Finding, Severity } from '#shared/engine/types.ts';
import { add, HUNDRED, smaller, toDecimal, ZERO } from '#shared/kernel/rational.ts';
import { boundShares, type Bounds, type Place } from './bound-shares.ts';
import { findCap, type Cap } from './find-cap.ts';
import { judgeImpossible, judgeList, judgeNames, judgePlaces } from './judge-list.ts';
import { carriesScent, isAllergen, isColourant, isScent, type ListName, type ReadingOptions } from './list-facts.ts';
import { findWritten, matchName, type MatchedName } from './match-name.ts';
import { splitList, type WrittenName } from './split-list.ts';

/** Longest text and longest list that are read; both far beyond any label. */
export const LONGEST_TEXT = 200_000;
export const MOST_NAMES = 500;
/** Control characters other than tabs and the ends of lines and pages. */
const NO_TEXT = /[\u0000-\u0008\u000E-\u001F\u007F\uFFFD]/;

/** What was found of one name: where order put it, its bounds, and the law's maximum. */
export interface ReadName {
  readonly one: ListName;
  readonly place: Place;
  readonly bounds: Bounds;
  readonly cap?: Cap;
}
/** A pasted list, read: or why it cannot be. */
export type Reading = { readonly document: ReadingDocument; readonly names: readonly ReadName[]; readonly findings: readonly Finding[] } | { readonly mistake: string };

/**
 * Reads a pasted ingredient list: its names, the exact bounds on each one's share, and what
 * the market's rules say as far as a list goes. Pure; shares in percent as exact decimals.
 */
export function readList(text: string, options: ReadingOptions): Reading {
  if (text.length > LONGEST_TEXT) return { mistake: `The text is longer than ${LONGEST_TEXT} letters.` };
  if (NO_TEXT.test(text)) return { mistake: 'This is not a text: it holds characters that no list is written with.' };
  const { dictionary } = options;
  const written = splitList(text, (name) => findWritten(name, dictionary)?.entry.inci);
  if (written.length === 0) return { mistake: 'The text holds no ingredient names.' };
  if (written.length > MOST_NAMES) return { mistake: `The text holds more than ${MOST_NAMES} names.` };
  const names = recognise(written, options);
  const { boundsOf, impossible, caps } = findBounds(names, options);
  const found = [...judgeDays(options, options.law), ...impossible, ...judgeList(names, boundsOf, options), ...judgePlaces(names, options), ...judgeNames(names, options)];
  const places = placesOf(names, caps, options);
  const findings = byWeight(distinct(found));
  return {
    names: names.map((one, index) => ({ one, place: places[index]!, bounds: boundsOf.get(one)!, ...(caps.has(one) && { cap: caps.get(one)! }) })),
    findings,
    document: {
      document: 'reading/1',
      dataRelease: `law ${options.law.release}, dictionary ${options.dictionary.release}`,
      market: options.market,
      category: options.category.slug,
      entries: names.map(({ written, entry, match, suggestions }) => ({ written, inci: entry?.inci ?? null, match, suggestions: [...suggestions] })),
      bounds: presentBounds(names, boundsOf, impossible.length > 0 ? new Map() : caps),
      findings: findings.map((one) => ({ ...one })),
    },
  };
}

function recognise(written: readonly WrittenName[], { dictionary, market }: ReadingOptions): ListName[] {
  const known = new Map<string, MatchedName>();
  const match = (name: string): MatchedName => {
    let found = known.get(name);
    if (!found) known.set(name, (found = matchName(name, dictionary)));
    return found;
  };
  return written.map((one) => {
    const matched = match(one.written);
    return { ...one, ...matched, name: matched.entry?.inci ?? one.written, isColourant: isColourant(matched.entry, one.written, market) };
  });
}

/** Where order binds: what closes the list by right does not take part in it. */
function placesOf(names: readonly ListName[], caps: ReadonlyMap<ListName, Cap>, { market, category }: ReadingOptions): Place[] {
  const isHairDye = category.tags.includes('hair-dye');
  const hasCarrier = names.some(carriesScent);
  const list = names.filter((one) => one.block === 'list' && !one.isInside);
  let end = list.length;
  while (end > 0 && !isHairDye && list[end - 1]!.isColourant) end -= 1;
  const closing = new Set(list.slice(end));
  // A list of colourants alone is in order like any other.
  if (closing.size === list.length) closing.clear();
  if (market === 'CA') for (let at = end - 1; at > 0 && (isScent(list[at]!) || isAllergen(list[at]!)); at -= 1) if (isScent(list[at]!)) closing.add(list[at]!);
  return names.map((one) => {
    const cap = caps.get(one)?.share;
    const isLoose = one.block !== 'list' || one.isInside || closing.has(one);
    const isPartOfOther = one.isInside || one.block === 'may-contain' || (hasCarrier && isAllergen(one));
    return { kind: isLoose ? 'loose' : 'ordered', ...(cap && { cap }), ...(isPartOfOther && { isPartOfOther }) };
  });
}

interface Found {
  readonly boundsOf: ReadonlyMap<ListName, Bounds>;
  readonly impossible: readonly Finding[];
  readonly caps: ReadonlyMap<ListName, Cap>;
}

function findBounds(names: readonly ListName[], options: ReadingOptions): Found {
  const caps = new Map<ListName, Cap>();
  for (const one of names) {
    const cap = one.block === 'may-contain' ? undefined : findCap(one, names, options);
    if (cap) caps.set(one, cap);
  }
  const asMap = (bounds: readonly Bounds[]): Map<ListName, Bounds> => new Map(names.map((one, index) => [one, bounds[index]!]));
  const bounds = boundShares(placesOf(names, caps, options));
  if (bounds) return { boundsOf: asMap(bounds), impossible: [], caps };
  const culprits = [...caps].flatMap(([name, cap]) => {
    const without = new Map([...caps].filter(([other]) => other !== name));
    const min = boundShares(placesOf(names, without, options))?.[names.indexOf(name)]?.min;
    return min ? [{ name, cap, min }] : [];
  });
  // What remains without the caps is the order alone; a list of nothing but shades has not even that.
  const plain = boundShares(placesOf(names, new Map(), options)) ?? names.map(() => ({ min: ZERO, max: HUNDRED }));
  return { boundsOf: asMap(plain), impossible: judgeImpossible(culprits, options), caps };
}

/** One line for each ingredient: a name that stands twice adds up, and its cap holds for both together. */
function presentBounds(names: readonly ListName[], boundsOf: ReadonlyMap<ListName, Bounds>, caps: ReadonlyMap<ListName, Cap>): ReadingDocument['bounds'] {
  const byName = new Map<string, Bounds>();
  for (const one of names) {
    const bounds = boundsOf.get(one)!;
    const known = byName.get(one.name);
    byName.set(one.name, known ? { min: add(known.min, bounds.min), max: smaller(caps.get(one)?.share ?? HUNDRED, add(known.max, bounds.max)) } : bounds);
  }
  return [...byName].map(([inci, { min, max }]) => ({ inci, min: toDecimal(min), max: toDecimal(max) }));
}

/** One finding of a kind for each subject and rule, as an ingredient may stand twice. */
function distinct(findings: readonly Finding[]): Finding[] {
  const seen = new Set<string>();
  return findings.filter((one) => {
    const id = `${one.kind} ${one.rule} ${one.subject}`;
    return !seen.has(id) && seen.add(id);
  });
}

const WEIGHTS: readonly Severity[] = ['stop', 'decide', 'note'];
function byWeight(findings: readonly Finding[]): Finding[] {
  return WEIGHTS.flatMap((severity) => findings.filter((finding) => finding.severity === severity));
}

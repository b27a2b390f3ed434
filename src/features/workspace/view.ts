import type { Assessment, DeclarationEntry, EntrySource, MarketAssessment } from '#shared/engine/assessment.ts';
import type { Finding, Interval } from '#shared/engine/types.ts';
import { toDecimal } from '#shared/kernel/rational.ts';
import { foldName } from '#shared/law/fold.ts';
import { toNumber } from '#src/lib/figures.ts';

/** One name of the list as the screens show it. Figures without text are for drawing only. */
export interface EntryView {
  /** Stable while the formula is typed: what the chosen order remembers. */
  readonly key: string;
  readonly name: string;
  readonly inci: string;
  readonly zone: DeclarationEntry['zone'] | 'unnamed';
  readonly min: number;
  readonly typical: number;
  readonly max: number;
  readonly exact: { readonly min: string; readonly typical: string; readonly max: string };
  readonly parts: readonly { readonly line: number; readonly share: number }[];
  readonly sources: readonly SourceView[];
  readonly isInside: boolean;
  readonly isUnsure: boolean;
  readonly isFree: boolean;
  readonly certainty?: 'certain' | 'possible';
  readonly members: readonly string[];
  readonly why: readonly string[];
  readonly citation: string;
}

/** One material's part of an entry, as decimal texts. */
export interface SourceView {
  readonly materialId: string;
  readonly name: string;
  readonly lines: readonly number[];
  readonly grams: string;
  readonly materialShare: string;
  readonly ofMaterial: { readonly min: string; readonly typical: string; readonly max: string };
  readonly share: { readonly min: string; readonly typical: string; readonly max: string };
  readonly isInside: boolean;
}

/** Everything the product page shows for one market on two days. */
export interface MarketView {
  readonly result: MarketAssessment;
  readonly entries: readonly EntryView[];
  /** Allergens that stay below their threshold: on the ladder, not in the list. */
  readonly unnamed: readonly EntryView[];
  readonly pairs: readonly (readonly [string, string])[];
  readonly totalGrams: string;
  readonly lines: readonly { readonly id: string; readonly at: number; readonly weight: 'zone' | 'binding' | 'idle'; readonly caption: string }[];
}

const PLACES = 6;
const texts = ({ min, typical, max }: Interval, places = 12) => ({ min: toDecimal(min, places), typical: toDecimal(typical, places), max: toDecimal(max, places) });

function presentSource(source: EntrySource): SourceView {
  return {
    materialId: source.materialId,
    name: source.tradeName,
    lines: source.lines,
    grams: toDecimal(source.mass, PLACES),
    materialShare: toDecimal(source.materialShare, PLACES),
    ofMaterial: texts(source.ofMaterial, PLACES),
    share: texts(source.share, PLACES),
    isInside: source.ways.length > 0 && source.ways.every((way) => way !== 'ingredient'),
  };
}

/** A material that stands in several lines gives each its part by mass. */
function partsOf(sources: readonly EntrySource[], masses: readonly number[]): { line: number; share: number }[] {
  return sources.flatMap((source) => {
    const whole = source.lines.reduce((sum, line) => sum + (masses[line] ?? 0), 0);
    const share = toNumber(source.share.typical);
    return source.lines.map((line) => ({ line, share: whole > 0 ? (share * (masses[line] ?? 0)) / whole : 0 }));
  });
}

/** Worked out when first asked for: most figures are never looked at between two keystrokes. */
function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}

/** Shapes one market's assessment for the screens. */
export function presentView(assessment: Assessment, result: MarketAssessment): MarketView {
  const masses = assessment.lines.map((line) => toNumber(line.mass));
  const keys = new Map<DeclarationEntry, string>();
  const taken = new Set<string>();
  for (const entry of result.declaration.entries) {
    const key = taken.has(entry.inci) ? entry.name : entry.inci;
    taken.add(key);
    keys.set(entry, key);
  }
  const pairs = result.declaration.uncertainPairs.map(({ first, second }) => [keys.get(first)!, keys.get(second)!] as const);
  const doubtful = new Set(pairs.flat());
  const entries = result.declaration.entries.map((entry): EntryView => {
    const key = keys.get(entry)!;
    const exact = once(() => texts(entry.share));
    const sources = once(() => entry.sources.map(presentSource));
    return {
      key,
      name: entry.name,
      inci: entry.inci,
      zone: entry.zone,
      min: toNumber(entry.share.min),
      typical: toNumber(entry.share.typical),
      max: toNumber(entry.share.max),
      get exact() {
        return exact();
      },
      parts: partsOf(entry.sources, masses),
      get sources() {
        return sources();
      },
      isInside: entry.zone === 'allergen',
      isUnsure: entry.straddles || doubtful.has(key),
      isFree: entry.zone === 'free' || entry.zone === 'allergen',
      certainty: entry.certainty,
      members: entry.members ?? [],
      why: entry.why,
      citation: entry.citation,
    };
  });
  return { result, entries, unnamed: unnamedOf(result, entries, masses), pairs, totalGrams: toDecimal(assessment.totalMass, PLACES), lines: linesOf(result) };
}

function unnamedOf(result: MarketAssessment, entries: readonly EntryView[], masses: readonly number[]): EntryView[] {
  const listed = new Set(entries.flatMap((entry) => [entry.inci, entry.name, ...entry.members].map(foldName)));
  return result.allergens
    .filter((allergen) => !allergen.disclose && allergen.total.max.n > 0n && ![allergen.name, ...allergen.substances.map((each) => each.name)].some((name) => listed.has(foldName(name))))
    .map((allergen): EntryView => ({
      key: allergen.name,
      name: allergen.name,
      inci: allergen.name,
      zone: 'unnamed',
      min: toNumber(allergen.total.min),
      typical: toNumber(allergen.total.typical),
      max: toNumber(allergen.total.max),
      exact: texts(allergen.total),
      parts: partsOf(allergen.sources, masses),
      sources: allergen.sources.map(presentSource),
      isInside: true,
      isUnsure: false,
      isFree: false,
      members: [],
      why: [`At most ${toDecimal(allergen.total.max, PLACES)} %; it is named above ${allergen.threshold} %.`],
      citation: allergen.citation,
    }))
    .toSorted((a, b) => b.typical - a.typical);
}

function linesOf(result: MarketAssessment): MarketView['lines'] {
  const zone = { id: 'zone', at: 1, weight: 'zone' as const, caption: result.declaration.freeLine };
  if (result.allergens.length === 0) return [zone];
  const threshold = result.allergens[0]!.threshold;
  const binding = { id: 'allergens', at: Number(threshold), weight: 'binding' as const, caption: `allergens are named above ${threshold} %, ${result.exposure}` };
  const idle = { id: 'idle', at: 0.001, weight: 'idle' as const, caption: '0.001 %, leave-on: not this product' };
  return result.exposure === 'rinse-off' ? [zone, binding, idle] : [zone, binding];
}

/** The entries that a finding speaks of, as keys. */
export function keysOfFinding(finding: Finding, entries: readonly EntryView[]): string[] {
  const index = indexOf(entries);
  return [...new Set([finding.subject, ...(finding.members ?? [])].flatMap((name) => index.get(foldName(name)) ?? []))];
}

const indices = new WeakMap<readonly EntryView[], ReadonlyMap<string, readonly string[]>>();

/** Entries by every name they answer to, made once for a list. */
function indexOf(entries: readonly EntryView[]): ReadonlyMap<string, readonly string[]> {
  let index = indices.get(entries);
  if (!index) {
    const made = new Map<string, string[]>();
    for (const entry of entries) {
      for (const name of new Set([entry.inci, entry.name, ...entry.members].map(foldName))) made.set(name, [...(made.get(name) ?? []), entry.key]);
    }
    indices.set(entries, (index = made));
  }
  return index;
}

import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { Category, Market } from '#shared/law/types.ts';
import { larger, smaller, ZERO, compare } from '#shared/kernel/rational.ts';
import type { AllergenVerdict } from './allergens.ts';
import type { Declaration, DeclarationEntry, UncertainPair, Zone } from './assessment.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import { LIST_LAW, type ListLaw } from './list-law.ts';
import { isColourant, printedName, type PrintedName } from './market-names.ts';
import type { PreparedPart } from './prepare-material.ts';
import { settleName } from './resolve-name.ts';
import { sourcesOf } from './sources.ts';
import type { Interval } from './types.ts';

export interface DeclareInput {
  readonly document: FormulaDocument;
  readonly blend: Blend;
  readonly dictionary: Dictionary;
  readonly market: Market;
  readonly category: Category;
  readonly allergens: readonly AllergenVerdict[];
}

/** An entry in the making. */
interface Draft {
  name: string;
  inci: string;
  substances: BlendedSubstance[];
  isColourant: boolean;
  verdict?: AllergenVerdict;
  why: string[];
}

/** A declared name that could be several, for a finding. */
export interface Ambiguity {
  readonly inci: string;
  readonly names: readonly string[];
}

/** Sets the ingredient list of one market: names, order, zones, allergens, colourants and shades. */
export function declare(input: DeclareInput): { declaration: Declaration; ambiguities: readonly Ambiguity[] } {
  const law = LIST_LAW[input.market];
  const ambiguities: Ambiguity[] = [];
  const drafts = draftEntries(input, law, ambiguities);
  const zones: Record<'ordered' | 'free' | 'colourant', DeclarationEntry[]> = { ordered: [], free: [], colourant: [] };
  for (const draft of drafts) {
    const share = input.blend.ingredientShare(draft.substances.map(({ key }) => key));
    const zone = draft.isColourant ? 'colourant' : law.isOrdered(share.typical) ? 'ordered' : 'free';
    zones[zone].push(makeEntry(input.blend, law, draft, zone, share));
  }
  const allergens = allergenEntries(input, law);
  for (const list of [zones.ordered, zones.free, zones.colourant, allergens]) list.sort(byShare);
  const chosen = input.document.declaration?.freeOrder?.[input.market] ?? [];
  const free = arrange([...zones.free, ...allergens], chosen);
  const colourants = arrange(zones.colourant, chosen);
  const shades = shadeEntries(input, law, [...zones.ordered, ...free, ...colourants], ambiguities);
  const listed = [...zones.ordered, ...free, ...colourants];
  const shadeText = shades.length > 0 ? law.mayContain(shades.map(({ name }) => name).join(', ')) : '';
  return {
    declaration: {
      heading: law.heading,
      text: `${law.heading}: ${listed.map(({ name }) => name).join(', ')}${listed.length === 0 ? shadeText.replace(/^[,.] /, '') : shadeText}`,
      entries: [...listed, ...shades],
      uncertainPairs: findUncertainPairs(input.blend, zones.ordered),
      freeLine: law.line,
      citation: law.citation,
    },
    ambiguities,
  };
}

function draftEntries({ blend, market, document, category, allergens }: DeclareInput, law: ListLaw, ambiguities: Ambiguity[]): Draft[] {
  const joined = document.declaration?.joinedNames ?? false;
  const groupOf = law.usesGroupNames ? prescribedGroups(allergens) : new Map<BlendedSubstance, AllergenVerdict>();
  const areHairColours = category.tags.includes('hair-dye');
  const byName = new Map<string, Draft>();
  for (const substance of blend.substances) {
    const share = substance.as.ingredient;
    if (!share || share.max.n <= 0n) continue;
    const verdict = groupOf.get(substance);
    const printed: PrintedName = verdict
      ? { name: verdict.name, why: `The name that ${verdict.citation} prescribes for the group.` }
      : nameFor(substance, market, joined);
    if (printed.ambiguous) ambiguities.push({ inci: substance.name, names: printed.ambiguous });
    const draft: Draft = {
      name: printed.name,
      inci: verdict ? verdict.name : substance.name,
      substances: [substance],
      isColourant: !areHairColours && isColourant(ingredientPurposes(substance), substance.first, hasPlainUse(substance)),
      why: [printed.why],
      ...(verdict && { verdict }),
    };
    // The same printed name stands once: nano and plain forms in the US, several numbers under one US colour name.
    const before = byName.get(printed.name);
    if (!before) byName.set(printed.name, draft);
    else {
      before.substances.push(substance);
      before.isColourant &&= draft.isColourant;
    }
  }
  return [...byName.values()];
}

const names = new WeakMap<PreparedPart, Map<string, PrintedName>>();

/** The printed name, remembered with the part that a material brings. */
function nameFor(substance: BlendedSubstance, market: Market, joined: boolean): PrintedName {
  const { usName } = usNameOf(substance);
  let known = names.get(substance.first);
  if (!known) names.set(substance.first, (known = new Map()));
  const id = `${market}${joined ? '+' : ''}${usName ?? ''}`;
  let found = known.get(id);
  if (!found) known.set(id, (found = printedName({ ...naming(substance), ...(usName !== undefined && { usName }) }, market, joined)));
  return found;
}

function naming(substance: BlendedSubstance): { inci: string; written: string; isNano: boolean; entry?: NonNullable<BlendedSubstance['first']['entry']>; usName?: string } {
  const { inci, written, entry, usName } = substance.first;
  return { inci, written, isNano: substance.nano, ...(entry && { entry }), ...(usName !== undefined && { usName }) };
}

/** A US colour name given with any of the materials. */
function usNameOf(substance: BlendedSubstance): { usName?: string } {
  for (const { group } of substance.occurrences) {
    for (const { usName } of group.parts) if (usName !== undefined) return { usName };
  }
  return {};
}

function ingredientPurposes(substance: BlendedSubstance): string[] {
  const found = new Set<string>();
  for (const { group } of substance.occurrences) {
    if (group.way === 'ingredient') for (const { purpose } of group.parts) if (purpose) found.add(purpose);
  }
  return [...found];
}

/** Some of it is there without being said to colour. */
function hasPlainUse(substance: BlendedSubstance): boolean {
  if (/^CI \d/i.test(substance.name)) return false;
  return substance.occurrences.some(({ group }) => group.way === 'ingredient' && group.parts.some(({ purpose }) => purpose === undefined));
}

/** Ingredients that are printed under their allergen group's prescribed name. */
function prescribedGroups(allergens: readonly AllergenVerdict[]): Map<BlendedSubstance, AllergenVerdict> {
  const found = new Map<BlendedSubstance, AllergenVerdict>();
  for (const verdict of allergens) {
    if (!verdict.disclose || !verdict.group.prescribesName) continue;
    for (const substance of verdict.substances) if (isListed(substance)) found.set(substance, verdict);
  }
  return found;
}

function isListed(substance: BlendedSubstance): boolean {
  return substance.as.ingredient !== undefined && substance.as.ingredient.max.n > 0n;
}

function makeEntry(blend: Blend, law: ListLaw, draft: Draft, zone: Zone, share: Interval): DeclarationEntry {
  const { substances, verdict } = draft;
  const isOrdered = zone === 'ordered';
  const straddles = zone !== 'colourant' && (isOrdered ? !law.isOrdered(share.min) : law.isOrdered(share.max));
  const members = substances.map(({ name }) => name);
  return {
    name: draft.name,
    inci: draft.inci,
    zone,
    share,
    get sources() {
      return sourcesOf(blend, substances, 'ingredient');
    },
    ...(verdict?.certainty && { certainty: verdict.certainty }),
    ...((verdict || members.length > 1) && { members: [...new Set(members)] }),
    why: [...draft.why, placeReason(zone, law)],
    citation: verdict?.citation ?? law.citation,
    straddles,
    keys: substances.map(({ key }) => key),
  };
}

function placeReason(zone: Zone, law: ListLaw): string {
  switch (zone) {
    case 'ordered':
      return 'It stands in descending order of its share.';
    case 'free':
      return `It is ${law.line}, so it may stand in any order after the others.`;
    case 'colourant':
      return 'Colourants may close the list, whatever their share.';
    case 'allergen':
      return 'It is not an ingredient of its own: it comes inside other materials and has to be named.';
    case 'may-contain':
      return 'A colourant of other shades of the range.';
  }
}

/** Disclosed allergens that are no ingredients of their own. */
function allergenEntries({ blend, allergens }: DeclareInput, law: ListLaw): DeclarationEntry[] {
  return allergens.filter(({ disclose }) => disclose).flatMap((verdict) => {
    const { group, substances } = verdict;
    if (group.prescribesName) return substances.some(isListed) ? [] : [allergenEntry(blend, law, verdict, verdict.name, substances, verdict.total)];
    // Several names and none prescribed: each name present is named, the ingredients already are.
    return substances.filter((one) => !isListed(one)).map((one) => allergenEntry(blend, law, verdict, one.name, [one], one.total));
  });
}

function allergenEntry(blend: Blend, law: ListLaw, verdict: AllergenVerdict, name: string, substances: readonly BlendedSubstance[], share: Interval): DeclarationEntry {
  const members = substances.map((one) => one.name);
  return {
    name,
    inci: name,
    zone: 'allergen',
    share,
    get sources() {
      return sourcesOf(blend, substances, 'all');
    },
    certainty: verdict.certainty ?? 'possible',
    ...((members.length > 1 || members[0] !== name) && { members }),
    why: [`It has to be named above ${verdict.threshold} % of the product.`, placeReason('allergen', law)],
    citation: verdict.citation,
    straddles: false,
    keys: substances.map(({ key }) => key),
  };
}

function shadeEntries({ document, dictionary, market }: DeclareInput, law: ListLaw, listed: readonly DeclarationEntry[], ambiguities: Ambiguity[]): DeclarationEntry[] {
  const seen = new Set(listed.map(({ name }) => name));
  const none: Interval = { min: ZERO, typical: ZERO, max: ZERO };
  return document.product.mayContain.flatMap((shade): DeclarationEntry[] => {
    const settled = settleName(dictionary, shade.inci);
    const printed = printedName(
      { inci: settled.inci, written: shade.inci, isNano: settled.isNano, ...(settled.entry && { entry: settled.entry }), ...(shade.usName !== undefined && { usName: shade.usName }) },
      market,
      document.declaration?.joinedNames ?? false,
    );
    if (seen.has(printed.name)) return [];
    seen.add(printed.name);
    if (printed.ambiguous) ambiguities.push({ inci: settled.inci, names: printed.ambiguous });
    return [{ name: printed.name, inci: settled.inci, zone: 'may-contain', share: none, sources: [], why: [printed.why, placeReason('may-contain', law)], citation: law.citation, straddles: false, keys: [] }];
  });
}

/** Descending typical share, equal shares by label name. */
function byShare(a: DeclarationEntry, b: DeclarationEntry): number {
  const order = compare(b.share.typical, a.share.typical);
  if (order !== 0) return order;
  return a.name < b.name ? -1 : a.name > b.name ? 1 : 0;
}

/** Applies a chosen order: names that are not there are passed over, the rest follows as it was. */
function arrange(entries: readonly DeclarationEntry[], chosen: readonly string[]): DeclarationEntry[] {
  if (chosen.length === 0) return [...entries];
  const left = new Set(entries);
  const first: DeclarationEntry[] = [];
  for (const name of chosen) {
    const key = foldName(name);
    for (const entry of left) {
      if (foldName(entry.name) !== key && foldName(entry.inci) !== key) continue;
      first.push(entry);
      left.delete(entry);
      break;
    }
  }
  return [...first, ...left];
}

/** Neighbours of the ordered part that some allowed composition puts the other way round. */
function findUncertainPairs(blend: Blend, ordered: readonly DeclarationEntry[]): UncertainPair[] {
  return ordered.slice(1).flatMap((second, index) => {
    const first = ordered[index]!;
    // Ranges that do not overlap need no proof.
    if (compare(first.share.min, second.share.max) >= 0) return [];
    const lead = blend.leastLead(first.keys, second.keys);
    if (lead.n >= 0n) return [];
    const overlap = { min: larger(first.share.min, second.share.min), max: smaller(first.share.max, second.share.max) };
    return [{ first, second, overlap, byAtMost: { n: -lead.n, d: lead.d } }];
  });
}

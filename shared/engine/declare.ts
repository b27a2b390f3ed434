import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { AllergenGroup, Category, Market } from '#shared/law/types.ts';
import { larger, smaller, ZERO, compare } from '#shared/kernel/rational.ts';
import type { AllergenVerdict } from './allergens.ts';
import type { Declaration, DeclarationEntry, UncertainPair } from './assessment.ts';
import type { Blend, BlendedSubstance } from './blend.ts';
import { LIST_LAW, type ListLaw } from './list-law.ts';
import { isColourant, printedName, type PrintedName } from './market-names.ts';
import { ListedEntry, placeReason, type Named } from './entry.ts';
import type { MixingPlan, PlannedSubstance } from './mixing-plan.ts';
import { settleName } from './resolve-name.ts';
import { sharesOf, sourcesOf } from './sources.ts';
import type { Interval } from './types.ts';

export interface DeclareInput {
  readonly document: FormulaDocument;
  readonly blend: Blend;
  readonly dictionary: Dictionary;
  readonly lawBook: LawBook;
  readonly market: Market;
  readonly category: Category;
  readonly allergens: readonly AllergenVerdict[];
  /** Which of the product's substances belong to which allergen group, whether it binds yet or not. */
  readonly grouped: ReadonlyMap<AllergenGroup, readonly BlendedSubstance[]>;
}

/** An entry in the making. */
interface Draft extends Named {
  substances: BlendedSubstance[];
  isColourant: boolean;
}

/** A declared name that could be several, for a finding. */
export interface Ambiguity {
  readonly inci: string;
  readonly names: readonly string[];
}

/** Sets the ingredient list of one market: names, order, zones, allergens, colourants and shades. */
export function declare(input: DeclareInput): { declaration: Declaration; ambiguities: readonly Ambiguity[] } {
  const { blend, document, market } = input;
  const law = LIST_LAW[market];
  const ambiguities: Ambiguity[] = [];
  const ordered: ListedEntry[] = [];
  const free: ListedEntry[] = [];
  const colourants: ListedEntry[] = [];
  for (const draft of draftEntries(input, law, ambiguities)) {
    const { substances } = draft;
    const share = substances.length === 1 ? blend.asIngredient(substances[0]!.at)! : blend.ingredientShare(substances.map(({ key }) => key));
    const zone = draft.isColourant ? 'colourant' : law.isOrdered(share.typ, share.den) ? 'ordered' : 'free';
    const entry = new ListedEntry(blend, law, draft, { zone, share, substances });
    (zone === 'colourant' ? colourants : zone === 'ordered' ? ordered : free).push(entry);
  }
  const allergens = allergenEntries(input, law);
  for (const list of [ordered, free, colourants]) list.sort(byShare);
  allergens.sort(byExactShare);
  const chosen = document.declaration?.freeOrder?.[market] ?? [];
  const listed = chosen.length === 0 ? [...ordered, ...free, ...allergens, ...colourants] : arrangeList({ ordered, free: [...free, ...allergens], colourants }, chosen, input.grouped);
  const shades = document.product.mayContain.length === 0 ? [] : shadeEntries(input, law, listed, ambiguities);
  const shadeText = shades.length > 0 ? law.mayContain(shades.map(({ name }) => name).join(', ')) : '';
  return {
    declaration: {
      heading: law.heading,
      text: `${law.heading}: ${listed.map(({ name }) => name).join(', ')}${listed.length === 0 ? shadeText.replace(/^[,.] /, '') : shadeText}`,
      entries: [...listed, ...shades],
      uncertainPairs: findUncertainPairs(blend, ordered),
      freeLine: law.line,
      citation: law.citation,
    },
    ambiguities,
  };
}

function draftEntries({ blend, market, document, category, allergens, lawBook }: DeclareInput, law: ListLaw, ambiguities: Ambiguity[]): Iterable<Draft> {
  const names = namesFor(blend.plan, lawBook, { market, joined: document.declaration?.joinedNames ?? false, areHairColours: category.tags.includes('hair-dye') });
  const groupOf = law.usesGroupNames ? prescribedGroups(allergens) : NO_GROUPS;
  const byName = new Map<string, Draft>();
  const { substances } = blend;
  for (let at = 0; at < substances.length; at += 1) {
    const share = blend.asIngredient(at);
    if (!share || share.hi <= 0) continue;
    const substance = substances[at]!;
    const verdict = groupOf.get(substance);
    const own = names[at]!;
    if (own.ambiguous && !verdict) ambiguities.push({ inci: substance.name, names: own.ambiguous });
    const name = verdict?.name ?? own.name;
    // The same printed name stands once: nano and plain forms in the US, several numbers under one US colour name.
    const before = byName.get(name);
    if (before) {
      before.substances.push(substance);
      before.isColourant &&= own.isColourant;
    } else if (verdict) {
      byName.set(name, { name, inci: name, substances: [substance], isColourant: own.isColourant, why: `The name that ${verdict.citation} prescribes for the group.`, verdict });
    } else byName.set(name, { name, inci: substance.name, substances: [substance], isColourant: own.isColourant, why: own.why });
  }
  return byName.values();
}

const NO_GROUPS: ReadonlyMap<BlendedSubstance, AllergenVerdict> = new Map();

interface NameChoice {
  readonly market: Market;
  readonly joined: boolean;
  readonly areHairColours: boolean;
}

type PlannedName = PrintedName & { readonly isColourant: boolean };

const planned = new WeakMap<MixingPlan, Map<string, readonly PlannedName[]>>();

/** The printed names of all substances, remembered with the plan: they do not depend on amounts. */
function namesFor(plan: MixingPlan, law: LawBook, { market, joined, areHairColours }: NameChoice): readonly PlannedName[] {
  let known = planned.get(plan);
  if (!known) planned.set(plan, (known = new Map()));
  const id = `${market} ${joined} ${areHairColours}`;
  let found = known.get(id);
  if (!found) {
    found = plan.substances.map((substance) => ({
      ...printedName(naming(substance, law), market, joined),
      isColourant: !areHairColours && isColourant(ingredientPurposes(substance), substance.first, hasPlainUse(substance)),
    }));
    known.set(id, found);
  }
  return found;
}

function naming(substance: PlannedSubstance, law: LawBook): Parameters<typeof printedName>[0] {
  const { inci, written, entry } = substance.first;
  const usName = usNameOf(substance);
  const schedule = entry?.names.ca === undefined ? undefined : law.canadianName(written);
  return { inci, written, isNano: substance.nano, ...(entry && { entry }), ...(usName !== undefined && { usName }), ...(schedule && { schedule }) };
}

/** A US colour name given with any of the materials. */
function usNameOf(substance: PlannedSubstance): string | undefined {
  for (const { group } of substance.occurrences) {
    for (const { usName } of group.parts) if (usName !== undefined) return usName;
  }
  return undefined;
}

function ingredientPurposes(substance: PlannedSubstance): string[] {
  const found = new Set<string>();
  for (const { group } of substance.occurrences) {
    if (group.way === 'ingredient') for (const { purpose } of group.parts) if (purpose) found.add(purpose);
  }
  return [...found];
}

/** Some of it is there without being said to colour. */
function hasPlainUse(substance: PlannedSubstance): boolean {
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
    get shares() {
      return sharesOf(blend, substances, 'all');
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
    return [{ name: printed.name, inci: settled.inci, zone: 'may-contain', share: none, sources: [], shares: [], why: [printed.why, placeReason('may-contain', law)], citation: law.citation, straddles: false, keys: [] }];
  });
}

/** Descending typical share, equal shares by label name; all over one denominator. */
function byShare(a: ListedEntry, b: ListedEntry): number {
  if (a.share.typ > b.share.typ) return -1;
  if (a.share.typ < b.share.typ) return 1;
  return byName(a, b);
}

function byExactShare(a: DeclarationEntry, b: DeclarationEntry): number {
  return compare(b.share.typical, a.share.typical) || byName(a, b);
}

function byName(a: DeclarationEntry, b: DeclarationEntry): number {
  return a.name < b.name ? -1 : a.name > b.name ? 1 : 0;
}

interface Parts {
  readonly ordered: readonly DeclarationEntry[];
  readonly free: readonly DeclarationEntry[];
  readonly colourants: readonly DeclarationEntry[];
}

/**
 * The list with the chosen order in its free parts. A choice outlives a change of printed name:
 * an entry answers to its own names, to its members' and to its allergen group's.
 */
function arrangeList({ ordered, free, colourants }: Parts, chosen: readonly string[], grouped: DeclareInput['grouped']): DeclarationEntry[] {
  const labels = new Map<string, string>();
  for (const [group, substances] of grouped) for (const { key } of substances) labels.set(key, group.label);
  const namesOf = (entry: DeclarationEntry): readonly (readonly string[])[] => [
    [entry.name, entry.inci],
    [...(entry.members ?? []), ...entry.keys.flatMap((key) => labels.get(key) ?? [])],
  ];
  return [...ordered, ...arrange(free, chosen, namesOf), ...arrange(colourants, chosen, namesOf)];
}

/** Applies a chosen order: names that are not there are passed over, the rest follows as it was. */
function arrange(entries: readonly DeclarationEntry[], chosen: readonly string[], namesOf: (entry: DeclarationEntry) => readonly (readonly string[])[]): readonly DeclarationEntry[] {
  const left = new Map(entries.map((entry) => [entry, namesOf(entry).map((names) => new Set(names.map(foldName)))]));
  const first: DeclarationEntry[] = [];
  for (const name of chosen) {
    const key = foldName(name);
    // The name as printed before any other that the entry answers to.
    const found = [0, 1].flatMap((tier) => [...left].find(([, names]) => names[tier]!.has(key))?.[0] ?? [])[0];
    if (!found) continue;
    first.push(found);
    left.delete(found);
  }
  return [...first, ...left.keys()];
}

/** Neighbours of the ordered part that some allowed composition puts the other way round. */
function findUncertainPairs(blend: Blend, ordered: readonly ListedEntry[]): UncertainPair[] {
  const pairs: UncertainPair[] = [];
  for (let index = 1; index < ordered.length; index += 1) {
    const first = ordered[index - 1]!;
    const second = ordered[index]!;
    // Ranges that do not overlap need no proof.
    if (first.share.lo >= second.share.hi) continue;
    const lead = blend.leastLead(first.keys, second.keys);
    if (lead.n >= 0n) continue;
    const overlap = { min: larger(first.share.min, second.share.min), max: smaller(first.share.max, second.share.max) };
    pairs.push({ first, second, overlap, byAtMost: { n: -lead.n, d: lead.d } });
  }
  return pairs;
}

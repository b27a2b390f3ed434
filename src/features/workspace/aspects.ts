import { sayDay, sayList } from '#src/lib/say.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';

/** One part of a draft that two people can change apart from each other. */
export interface Aspect {
  readonly id: string;
  readonly title: string;
  readonly read: (draft: ProductDraft) => unknown;
  readonly write: (draft: ProductDraft, value: unknown) => ProductDraft;
  readonly say: (value: unknown) => string;
}

const NOTHING = 'nothing';
const orNothing = (text: string) => (text.trim() === '' ? NOTHING : text);

function field<K extends keyof ProductDraft>(key: K, title: string, say: (value: ProductDraft[K]) => string): Aspect {
  return {
    id: key,
    title,
    read: (draft) => draft[key],
    write: (draft, value) => ({ ...draft, [key]: value as ProductDraft[K] }),
    say: (value) => say(value as ProductDraft[K]),
  };
}

function particular<K extends keyof ProductDraft['particulars']>(key: K, title: string, say: (value: ProductDraft['particulars'][K]) => string): Aspect {
  return {
    id: `particulars.${key}`,
    title,
    read: (draft) => draft.particulars[key],
    write: (draft, value) => ({ ...draft, particulars: { ...draft.particulars, [key]: value as ProductDraft['particulars'][K] } }),
    say: (value) => say(value as ProductDraft['particulars'][K]),
  };
}

function sayFacts(facts: ProductDraft['facts']): string {
  return orNothing(sayList(Object.entries(facts).map(([key, value]) => `${key} ${value === true ? 'yes' : value === false ? 'no' : value}`)));
}
function sayFlags(flags: ProductDraft['flags']): string {
  return orNothing(sayList(Object.entries(flags).map(([key, value]) => `${FLAG_WORDS[key] ?? key}: ${value ? 'yes' : 'no'}`)));
}
export const FLAG_WORDS: Readonly<Record<string, string>> = {
  under3: 'for children under 3',
  professionalUseOnly: 'professional use only',
  aerosol: 'pressurised pack',
  spray: 'spray',
  intimateHygiene: 'intimate hygiene',
};
const sayDayOrToday = (day: string | null) => (day === null ? 'today' : sayDay(day));
const sayText = (text: string) => orNothing(text);

/** The aspects outside the formula. */
export const PLAIN_ASPECTS: readonly Aspect[] = [
  field('name', 'Name', sayText),
  field('brand', 'Brand', sayText),
  field('category', 'Kind of product', (slug) => slug.replaceAll('-', ' ')),
  field('markets', 'Markets', (markets) => sayList(markets)),
  field('placedOnMarket', 'First sold on', sayDayOrToday),
  field('availableOn', 'Still on the shelf on', sayDayOrToday),
  field('flags', 'Use', sayFlags),
  field('facts', 'Answers for the law', sayFacts),
  field('readyForUse', 'Dilution before use', (mix) => (mix ? `${mix.productParts} to ${mix.otherParts}` : 'none')),
  field('netContent', 'Net content', (content) => (content ? `${content.value} ${content.unit}` : NOTHING)),
  field('durability', 'Durability', (kept) => (!kept ? NOTHING : kept.kind === 'pao' ? `${kept.months} months after opening` : `best before ${kept.date}`)),
  field('claims', 'Claims', (claims) => orNothing(claims.map((claim) => `“${claim.text}”`).join(', '))),
  field('mayContain', 'May contain', (shades) => orNothing(sayList(shades.map((shade) => shade.inci)))),
  field('label', 'Label', (label) => `${label.template}, ${label.container.shape}, ${label.market}`),
  particular('responsiblePerson', 'Responsible person', (parties) =>
    orNothing(Object.entries(parties).map(([market, party]) => `${market}: ${party?.name ?? ''}, ${party?.address ?? ''}`).join('; ')),
  ),
  particular('usContact', 'Contact for the US', sayText),
  particular('canadaContact', 'Contact for Canada', sayText),
  particular('countryOfOrigin', 'Country of origin', sayText),
  particular('batchCode', 'Batch code', sayText),
  particular('function', 'Function', sayText),
  particular('directions', 'Directions', sayText),
  particular('warnings', 'Warnings', (warnings) => orNothing(warnings.map((warning) => `“${warning.text}”`).join(', '))),
  {
    id: 'batchSize',
    title: 'Batch size',
    read: (draft) => draft.formula.batchSize,
    write: (draft, value) => ({ ...draft, formula: { ...draft.formula, batchSize: value as ProductDraft['formula']['batchSize'] } }),
    say: (value) => (value ? `${(value as { value: string }).value} g` : NOTHING),
  },
  {
    id: 'declaration',
    title: 'Chosen order of the declaration',
    read: (draft) => draft.declaration,
    write: (draft, value) => ({ ...draft, declaration: value as ProductDraft['declaration'] }),
    say: (value) => {
      const { freeOrder, joinedNames } = value as ProductDraft['declaration'];
      const chosen = Object.entries(freeOrder).map(([market, order]) => `${market}: ${(order ?? []).join(', ')}`);
      return `${chosen.length > 0 ? chosen.join('; ') : 'the default order'}${joinedNames ? ', joined names' : ''}`;
    },
  },
];

import { expect, test } from 'vitest';
import type { Mixture, Substance } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import { compare, decimal, ONE } from '#shared/kernel/rational.ts';
import type { ClaimClass } from '#shared/rules/claims/claim-tables.ts';
import { findMembers, holdsNamed, namedIngredients, shareOf, withWord } from '#shared/rules/claims/composition.ts';

const one = { min: ONE, typical: ONE, max: ONE };
const substance = (name: string, more: Partial<Substance> = {}): Substance => ({ key: foldName(name), name, cas: [], purposes: [], nano: false, as: { ingredient: one }, total: one, sources: [], properties: [], ...more });
function mixture(...substances: readonly Substance[]): Mixture {
  return { substances, find: (key) => substances.find((each) => each.key === key), weigh: (terms) => ({ ...one, max: decimal(String(terms.length)) }) };
}
const SILICONE: ClaimClass = { id: 'silicone', title: 'silicones', properties: ['silicone'], names: ['*methicone', 'ci *'], source: '' } as ClaimClass;
const PRESERVATIVE: ClaimClass = { id: 'preservative', title: 'preservatives', properties: ['preservative'] } as ClaimClass;
const NUT: ClaimClass = { id: 'nut', title: 'nuts', properties: ['tree-nut'], perhapsNames: ['avena*'], inPerfume: true } as ClaimClass;

test('members are found by property and by name', () => {
  const { sure } = findMembers(SILICONE, mixture(substance('Silica', { properties: ['silicone'] }), substance('Dimethicone'), substance('CI 77491'), substance('Aqua')));
  expect(sure).toEqual(['Silica', 'Dimethicone', 'CI 77491']);
});

test('a constituent or an incidental substance is no ingredient', () => {
  expect(findMembers(SILICONE, mixture(substance('Dimethicone', { as: { hidden: one } }), substance('Amodimethicone', { as: { incidental: one } })))).toEqual({ sure: [], perhaps: [], unknown: [] });
});

test('what serves as something else is a preservative only by its stated purpose', () => {
  const of = (more: Partial<Substance>): string => (findMembers(PRESERVATIVE, mixture(substance('Benzyl Alcohol', { properties: ['preservative', 'fragrance-allergen'], ...more }))).sure.length > 0 ? 'sure' : 'perhaps');
  expect([of({ purposes: ['preservative'] }), of({ purposes: ['fragrance'] }), of({})]).toEqual(['sure', 'perhaps', 'perhaps']);
});

test('origin and unknown composition leave a class open', () => {
  expect(findMembers(NUT, mixture(substance('Avena Sativa Kernel Extract'), substance('Parfum'), substance('Secretum', { properties: undefined })))).toEqual({ sure: [], perhaps: ['Avena Sativa Kernel Extract'], unknown: ['Parfum', 'Secretum'] });
  expect(findMembers(SILICONE, mixture(substance('Parfum'))).unknown).toEqual([]);
});

test('a named ingredient may be a constituent, a share counts ingredients alone', () => {
  const rose = mixture(substance('Rosa Canina Fruit Oil', { as: { hidden: one } }));
  expect([holdsNamed(['rosa'], rose), namedIngredients(['rosa'], rose)]).toEqual([true, []]);
});

test('the share of several is weighed together', () => {
  const both = [substance('Avena Sativa Kernel Extract'), substance('Avena Sativa Kernel Flour')];
  expect(compare(shareOf(both, mixture(...both)).max, decimal('2'))).toBe(0);
  const split = [substance('Avena Sativa Kernel Extract', { as: { ingredient: one, hidden: one } })];
  expect(compare(shareOf(split, mixture(...split)).max, ONE)).toBe(0);
});

test('a word of an INCI name finds its ingredients, a common word none', () => {
  const both = mixture(substance('Cocamide MEA'), substance('Helianthus Annuus Seed Oil'));
  expect([withWord('cocamide', both), withWord('seed', both), withWord('sunflower', both)]).toEqual([['Cocamide MEA'], [], []]);
});

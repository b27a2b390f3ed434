import { expect, test } from 'vitest';
import { claimTables } from '#shared/rules/claims/claim-tables.ts';
import type { ClaimLanguage } from '#shared/rules/claims/languages.ts';
import { tokenise } from '#shared/rules/claims/match-words.ts';
import { findNamed } from '#shared/rules/claims/named.ts';

const named = (text: string, lang: ClaimLanguage = 'en') => findNamed(text, tokenise(text, lang), claimTables(lang), []);
const said = (text: string, lang: ClaimLanguage = 'en'): string[] => named(text, lang).map(({ word, isContained, isPart, percent }) => [word, isContained ? 'contained' : '', isPart ? 'part' : '', percent ?? ''].filter(Boolean).join(' '));

test.each([
  ['With oat and honey', ['oat contained', 'honey contained']],
  ['Argan oil wash', ['argan oil part']],
  ['Rose', ['rose']],
  ['10 % glycerin', ['glycerin contained 10']],
  ['2,5 % pure shea butter', ['shea butter contained part 2.5']],
  ['With 100 % natural shea butter', ['shea butter contained part']],
  ['Sweet almonds', ['sweet almond']],
])('%s', (text, expected) => expect(said(text)).toEqual(expected));

test.each(['Soft as silk', 'Feels like silk', 'Rose scent', 'Cedar and vetiver notes', 'The scent of vanilla and cedar', 'Scented with lavender', 'Fragrance inspired by cedar', 'Lavender-free', 'Peach-coloured box', 'No honey'])('%s names nothing that is in it', (text) => {
  expect(said(text)).toEqual([]);
});

test('after a comma a scent is spoken of no more', () => {
  expect(said('Fragrance-free, with rose')).toEqual(['rose contained']);
});

test('German and French call some ingredients their own way', () => {
  expect(said('Mit Haferextrakt', 'de')).toEqual(['oat contained']);
  expect(said('Au beurre de karité', 'fr')).toEqual(['shea butter contained']);
});

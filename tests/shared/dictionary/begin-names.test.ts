import { expect, test } from 'vitest';
import { createNameBeginner } from '#shared/dictionary/begin-names.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';

const entry = (inci: string, more: Partial<DictionaryEntry> = {}): DictionaryEntry => ({ id: inci, inci, cas: [], ec: [], functions: [], names: {}, synonyms: [], commonNames: [], properties: [], source: 'test', ...more });
const begin = createNameBeginner([
  entry('Sodium Benzoate', { cas: ['532-32-1'] }), entry('Benzyl Alcohol'), entry('Benzoic Acid'), entry('Benzyl Benzoate'), entry('Glycerin', { commonNames: ['vegetable glycerine'], cas: ['56-81-5'] }), entry('Aqua', { synonyms: ['Water'] }),
]);
const names = (typed: string) => begin(typed, 5).map((found) => found.entry.inci);

test('what begins so stands before what holds a word that does, the nearer first', () => {
  expect(names('benz')).toEqual(['Benzoic Acid', 'Benzyl Alcohol', 'Benzyl Benzoate', 'Sodium Benzoate']);
  expect(names('benzyl')).toEqual(['Benzyl Alcohol', 'Benzyl Benzoate']);
  expect(names('Benzoic acid')).toEqual(['Benzoic Acid']);
});

test('common names, synonyms and CAS numbers lead to their entry, and say so', () => {
  expect(begin('vegetable gly', 5)).toEqual([expect.objectContaining({ matched: 'vegetable glycerine', by: 'common-name' })]);
  expect(begin('wat', 5)).toEqual([expect.objectContaining({ matched: 'Water', by: 'synonym' })]);
  expect(names('56-81')).toEqual(['Glycerin']);
  expect(names('532')).toEqual(['Sodium Benzoate']);
});

test('no more than asked for, and nothing for nothing', () => {
  expect(begin('b', 2)).toHaveLength(2);
  expect(begin('  ', 5)).toEqual([]);
  expect(begin('zeolite', 5)).toEqual([]);
});

import { expect, test } from 'vitest';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { isCasNumber, isEcNumber } from '#shared/dictionary/registry-numbers.ts';
import { letterChanges } from '#shared/dictionary/suggest.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';

const entry = (inci: string, more: Partial<DictionaryEntry> = {}): DictionaryEntry => ({
  id: inci, inci, cas: [], ec: [], functions: [], names: {}, synonyms: [], commonNames: [], properties: [], source: 'test', ...more,
});
const dictionary = createDictionary([
  entry('Aqua', { cas: ['7732-18-5'], names: { us: 'Water', fr: 'Eau' } }),
  entry('Tocopherol', { commonNames: ['vitamin E'], misspellings: ['tocoferol'] }),
  entry('Sodium Laureth Sulfate'),
  entry('CI 15850', { names: { usColours: ['Red 6', 'Red 7'] } }),
  entry('CI 77491', { names: { us: 'Iron Oxides' } }),
  entry('CI 77492', { names: { us: 'Iron Oxides' } }),
  entry('Rosa Damascena Flower Oil', { cas: ['8007-01-0'], properties: ['botanical'] }),
  entry('Acrylates/VA Copolymer'),
], 'r1');
const found = (name: string, cas?: string) => {
  const match = dictionary.resolve(name, cas);
  return match && [match.entry.inci, match.match];
};

test.each([
  ['AQUA', 'Aqua', 'exact'], ['Water', 'Aqua', 'synonym'], ['Aqua/Water/Eau', 'Aqua', 'synonym'], ['Water (Aqua)', 'Aqua', 'synonym'], ['Tocopherol (Vitamin E)', 'Tocopherol', 'synonym'],
  ['tocoferol', 'Tocopherol', 'respelt'], ['Sodium Laureth Sulphate', 'Sodium Laureth Sulfate', 'respelt'], ['15850', 'CI 15850', 'synonym'], ['CI 15850:1', 'CI 15850', 'synonym'],
  ['Red 7', 'CI 15850', 'synonym'], ['Acrylates/VA Copolymer', 'Acrylates/VA Copolymer', 'exact'], ['CI 77491 (nano)', 'CI 77491', 'exact'], ['7732-18-5', 'Aqua', 'synonym'],
])('%s is %s by %s', (name, inci, match) => expect(found(name)).toEqual([inci, match]));

test.each(['', 'Iron Oxides', 'Water (Tocopherol)', 'Aqua/Tocopherol', 'Mystery (Aqua)', '8007-01-0', 'Tocopheril'])('"%s" is never guessed', (name) => expect(found(name)).toBeUndefined());
test('a number decides for an unknown name, but not among the products of a plant', () => {
  expect(found('unknown', '7732-18-5')).toEqual(['Aqua', 'synonym']);
  expect(found('unknown', '8007-01-0')).toBeUndefined();
});
test('suggestions come best first and none is made for noise', () => {
  expect(dictionary.suggest('Sodum Laurth Sulfate')[0]?.inci).toBe('Sodium Laureth Sulfate');
  expect(dictionary.suggest('zzzqqq')).toEqual([]);
});
test('letters to change are counted with exchanges as one', () => {
  expect(letterChanges('glycerin', 'glyecrin')).toBe(1);
  expect(letterChanges('', 'abc')).toBe(3);
});
// Water 7732-18-5 / 231-791-2: numbers of its own record in the EU inventory.
test('check digits of registry numbers are verified', () => {
  expect([isCasNumber('7732-18-5'), isCasNumber('7732-18-4'), isEcNumber('231-791-2'), isEcNumber('231-791-3')]).toEqual([true, false, true, false]);
});

test('a name that an entry and its successor both bear leads to the successor, in either order', () => {
  const former = entry('Candelilla Cera', { names: { us: 'Candelilla Wax' }, supersededBy: 'Euphorbia Cerifera Cera' });
  const present = entry('Euphorbia Cerifera Cera', { names: { us: 'Candelilla Wax' } });
  for (const entries of [[former, present], [present, former]]) expect(createDictionary(entries, 'r').resolve('candelilla wax')?.entry).toBe(present);
});

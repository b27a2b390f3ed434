import { expect, test } from 'vitest';
import { matchName } from '#shared/reading/match-name.ts';
import { dictionary } from '#tests/support/engine.ts';

const match = (written: string): string => {
  const { match: how, entry } = matchName(written, dictionary);
  return `${how} ${entry?.inci ?? '-'}`;
};

test.each([
  ['Aqua', 'exact Aqua'],
  ['AQUA', 'exact Aqua'],
  ['sodium laureth sulfate', 'exact Sodium Laureth Sulfate'],
  ['Water', 'synonym Aqua'],
  ['Aqua (Water)', 'synonym Aqua'],
  ['Aqua (Water, Eau)', 'synonym Aqua'],
  ['Aqua/Water/Eau', 'synonym Aqua'],
  ['Parfum (Fragrance)', 'synonym Parfum'],
  ['Butyrospermum Parkii (Shea) Butter', 'synonym Butyrospermum Parkii Butter'],
  ['Titanium Dioxide [nano]', 'exact Titanium Dioxide'],
  ['CI77891', 'exact CI 77891'],
  ['C.I. 77891', 'exact CI 77891'],
  ['77891', 'synonym CI 77891'],
  ['Titanium Dioxide (CI 77891)', 'synonym CI 77891'],
  ['CI 77891 (Titanium Dioxide)', 'synonym CI 77891'],
  ['CI 77891/Titanium Dioxide', 'synonym CI 77891'],
  ['Heather Red (CI 16035)', 'synonym CI 16035'],
  // Mica is no colourant of the EU's list: the word counts, not the number.
  ['Mica (CI 77019)', 'synonym Mica'],
  ['FD&C Blue No. 1 (CI 42090)', 'synonym CI 42090'],
  ['PEG−100 Stearate', 'exact PEG-100 Stearate'],
  ['Glycérine', 'synonym Glycerin'],
  ['Phenoxyetanol', 'respelt Phenoxyethanol'],
  ['Cocamidopropyl Betane', 'respelt Cocamidopropyl Betaine'],
  ['Sodium Laurth Sulfate', 'respelt Sodium Laureth Sulfate'],
])('%s is %s', (written, expected) => {
  expect(match(written)).toBe(expected);
});

test.each(['Ceteareth-21', 'Stardust Complex', 'PEG-41 Hydrogenated Castor Oil', 'Oil', 'Wax', 'Glycerin (CI 77891)', 'CI 99999', 'CI 77491, CI 77492'])('%s is not guessed', (written) => {
  expect(matchName(written, dictionary).match).toBe('unknown');
});

test('an unknown name comes with at most five suggestions', () => {
  const { suggestions } = matchName('Sodium Lauryl Something Sulfate', dictionary);
  expect(suggestions.length).toBeGreaterThan(0);
  expect(suggestions.length).toBeLessThanOrEqual(5);
});

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
  ['Phenoxyetanol', 'respelt Phenoxyethanol'],
  ['Cocamidopropyl Betane', 'respelt Cocamidopropyl Betaine'],
  ['Sodium Laurth Sulfate', 'respelt Sodium Laureth Sulfate'],
])('%s is %s', (written, expected) => {
  expect(match(written)).toBe(expected);
});

test.each(['Ceteareth-21', 'Stardust Complex', 'PEG-41 Hydrogenated Castor Oil', 'Oil', 'Wax'])('%s is not guessed', (written) => {
  expect(matchName(written, dictionary).match).toBe('unknown');
});

test('an unknown name comes with at most five suggestions', () => {
  const { suggestions } = matchName('Sodium Lauryl Something Sulfate', dictionary);
  expect(suggestions.length).toBeGreaterThan(0);
  expect(suggestions.length).toBeLessThanOrEqual(5);
});

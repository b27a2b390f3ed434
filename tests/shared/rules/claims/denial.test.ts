import { expect, test } from 'vitest';
import { claimTables } from '#shared/rules/claims/claim-tables.ts';
import { isDenied } from '#shared/rules/claims/denial.ts';
import { tokenise } from '#shared/rules/claims/match-words.ts';

const { frame } = claimTables('en');

test.each([
  ['does not cure', 'cure', true],
  ['cannot cure', 'cure', true],
  ['not only soothes but cures', 'cures', false],
  ['no more eczema', 'eczema', false],
  ['no parabens, cures', 'cures', false],
  ['not greasy: cures', 'cures', false],
  ['Not mild. It cures', 'cures', false],
  ['not intended to diagnose, treat, cure', 'cure', true],
  ['not one of the many things that would cure', 'cure', false],
  ['cures', 'cures', false],
])('%s: is "%s" denied? %s', (text, word, expected) => {
  const tokens = tokenise(text, 'en');
  expect(isDenied(tokens, tokens.findIndex((token) => token.word === word), frame)).toBe(expected);
});

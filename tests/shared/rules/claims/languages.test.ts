import { expect, test } from 'vitest';
import { judgedIn } from '#shared/rules/claims/languages.ts';

test.each([['en', 'en'], ['EN', 'en'], ['en-GB', 'en'], ['de_AT', 'de'], ['fr-CA', 'fr'], ['nl', undefined], ['', undefined], ['eng', undefined]])('%s is judged in %s', (lang, expected) => {
  expect(judgedIn(lang)).toBe(expected);
});

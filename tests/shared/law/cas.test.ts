import { expect, test } from 'vitest';
import { isCasNumber } from '#shared/law/cas.ts';

// Water and caffeine: the textbook examples of the CAS check digit.
test.each(['7732-18-5', '58-08-2', '122-99-6'])('%s is a CAS number', (cas) => {
  expect(isCasNumber(cas)).toBe(true);
});

test.each(['7732-18-4', '58-80-2', '122-99', '', '1234567-89-0-1'])('"%s" is none', (cas) => {
  expect(isCasNumber(cas)).toBe(false);
});

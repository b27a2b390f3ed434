import { expect, test } from 'vitest';
import { analyseClaim } from '#shared/rules/claims/analyse-claim.ts';

const rows = (text: string, lang = 'en'): string[] => analyseClaim(text, lang)!.rows.map(({ row, words, isSoftened }) => `${row.id} “${words}”${isSoftened ? ' softened' : ''}`);

test.each([
  ['Treats eczema', 'disease “Treats eczema”'],
  ['Healthy skin', undefined],
  ['We acknowledge you', undefined],
  ['Reduces wrinkles', 'wrinkles-removed “Reduces wrinkles”'],
  ['Reduces the look of wrinkles', 'wrinkles-removed “Reduces the look of wrinkles” softened'],
  ['Anti-ageing look', 'anti-ageing “Anti-ageing” softened'],
  ['If irritation occurs, stop use', undefined],
  ['Does not treat eczema', undefined],
])('"%s" meets %s', (text, expected) => expect(rows(text)[0]).toBe(expected));

test('a companion must stand within seven words of the same sentence', () => {
  expect(rows('Treats you well. Our founder once had eczema').filter((row) => row.startsWith('disease “'))).toEqual([]);
  expect(rows('It treats one two three four five six eczema').some((row) => row.startsWith('disease “'))).toBe(true);
  expect(rows('It treats one two three four five six seven eczema').some((row) => row.startsWith('disease “'))).toBe(false);
});

test('a claim is read once for each language, and not in one without tables', () => {
  expect(analyseClaim('Soft', 'en')).toBe(analyseClaim('Soft', 'en-GB'));
  expect(analyseClaim('Soft', 'en')).not.toBe(analyseClaim('Soft', 'de'));
  expect(analyseClaim('Zacht', 'nl')).toBeUndefined();
});

test('a very long claim is read in time', () => {
  const start = performance.now();
  analyseClaim('free from parabens and silicones, '.repeat(300), 'en');
  expect(performance.now() - start).toBeLessThan(2000);
});

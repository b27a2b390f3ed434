import { expect, test } from 'vitest';
import { cleanTexts } from '#server/http/text-hygiene.ts';

const pointers = (value: unknown) => cleanTexts(value).issues.map(({ pointer }) => pointer);

test('texts are stored composed (NFC), however deep they stand', () => {
  expect(cleanTexts({ a: [{ b: 'e\u0301' }] }).value).toEqual({ a: [{ b: '\u00e9' }] });
  expect(cleanTexts('e\u0301').value).toBe('\u00e9');
});

// C0 and C1 controls, direction marks, overrides and isolates, the byte-order mark, halves of a pair (Unicode 15.1, chapter 23).
test.each(['\u0000', '\u0007', '\u001b', '\u007f', '\u0085', '\u200e', '\u200f', '\u202a', '\u202e', '\u2066', '\u2069', '\ufeff', '\ud800', '\udfff'])(
  'a text with %j is refused at its place',
  (sign) => {
    expect(pointers({ list: ['fine', `a${sign}b`] })).toEqual(['/list/1']);
    expect(pointers({ [`a${sign}b`]: 'x' })).toEqual(['']);
  },
);

test.each(['two\nlines', 'a\ttab', '😀', 'ℓ', 'ﬁ', '日本', '\u00ad', '\u2005', '\u200d'])('%j is text like any other', (text) => {
  expect(pointers({ text })).toEqual([]);
});

test('pointers escape slash and tilde (RFC 6901)', () => {
  expect(pointers({ 'a/b': { 'c~d': '\u0000' } })).toEqual(['/a~1b/c~0d']);
});

test('a field that would reach the prototype is refused', () => {
  expect(pointers(JSON.parse('{"__proto__": {"admin": true}}'))).toEqual(['']);
});

test('depth is counted, not climbed', () => {
  const nested = (depth: number) => JSON.parse('['.repeat(depth) + ']'.repeat(depth)) as unknown;
  expect(pointers(nested(40))).toEqual([]);
  expect(cleanTexts(nested(100_000)).issues).toHaveLength(1);
});

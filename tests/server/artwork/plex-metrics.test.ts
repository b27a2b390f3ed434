import fc from 'fast-check';
import { expect, test } from 'vitest';
import { loadFont, WEIGHTS } from '#server/artwork/fonts.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { textsOf } from '#shared/artwork/content.ts';
import { bodyWash, listOf } from '#tests/shared/artwork/samples.ts';

const LETTERS = 'abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789 .,/-()&’ÆØłößéàçΩж℮';
const shaped = (text: string, weight: (typeof WEIGHTS)[number]): number[] => {
  const { positions } = loadFont(weight).font.layout(text, { liga: false, dlig: false, calt: false });
  let at = 0;
  return positions.map(({ xAdvance }) => (at += xAdvance));
};
const measured = (text: string, weight: (typeof WEIGHTS)[number]): number[] => {
  const { offsets, advance } = plexMetrics.face(weight).run(text);
  return [...offsets.slice(1), advance];
};

test.each(WEIGHTS)('the tables of weight %i agree with the font, kerning included', (weight) => {
  fc.assert(
    fc.property(fc.array(fc.constantFrom(...LETTERS), { minLength: 1, maxLength: 24 }), (letters) => {
      expect(measured(letters.join(''), weight)).toEqual(shaped(letters.join(''), weight));
    }),
    { numRuns: 120 },
  );
});

test('the words of a label measure as the font shapes them', () => {
  for (const text of [...textsOf(bodyWash).map((part) => part.text), listOf(60), 'AVATAR Wave To Ty']) expect(measured(text, 400)).toEqual(shaped(text, 400));
});

test('kerning draws AVATAR together', () => {
  // Measured on the font itself: 3744 units unkerned, 3532 kerned, in Regular.
  const plain = [...'AVATAR'].reduce((total, char) => total + plexMetrics.face(400).advance(char), 0);
  expect([plain, plexMetrics.face(400).run('AVATAR').advance]).toEqual([3744, 3532]);
});

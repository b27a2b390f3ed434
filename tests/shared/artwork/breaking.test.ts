import fc from 'fast-check';
import { expect, test } from 'vitest';
import { breakParagraph, ingredientWords, plainWords } from '#shared/artwork/breaking.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { listOf } from './samples.ts';

const set = (body: string, width: number, few = false): string[] => breakParagraph(ingredientWords(body, 400), 3077, width, plexMetrics, few).lines.map((line) => line.map((word) => word.text).join(' '));

test.each([
  ['Titanium Dioxide, CI 77891, Mica, CI 19140', /CI$/], ['Aqua, Zinc Oxide (nano), Titanium Dioxide (nano)', /(Oxide|Dioxide)$/],
  ['Water, FD&C Yellow No. 5, Red 33, Blue 1', /(No\.|Red|Blue)$/], ['Aqua, [+/- CI 77491, CI 77492]', /(\+\/-|CI)$/],
])('"%s" is never broken where it is bound', (body, end) => {
  for (let width = 22_000; width <= 60_000; width += 500) {
    for (const line of set(body, width)) expect(line).not.toMatch(end);
  }
});

test('text is the same before and after breaking, at every measure', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 60 }), fc.integer({ min: 40_000, max: 120_000 }), fc.boolean(), (count, width, few) => {
      expect(set(listOf(count), width, few).join(' ')).toBe(listOf(count));
    }),
    { numRuns: 60 },
  );
});

test('no line is longer than its measure', () => {
  for (let width = 46_000; width < 100_000; width += 1700) {
    for (const line of set(listOf(40), width)) expect(plexMetrics.face(400).run(line).advance * 3077).toBeLessThanOrEqual(width * 1000);
  }
});

test('hyphens, strokes and figures inside a name are no places to break', () => {
  const lines = set('Polyglyceryl-3 Dicitrate/Stearate, 1,2-Hexanediol, Coco-Glucoside', 40_000);
  for (const word of ['Polyglyceryl-3', 'Dicitrate/Stearate,', '1,2-Hexanediol,', 'Coco-Glucoside']) expect(lines.some((line) => line.split(' ').includes(word))).toBe(true);
});

test('a word wider than the measure is a fault that says by how much', () => {
  const { tooWide } = breakParagraph(ingredientWords('Aqua, Butyrospermum Parkii Butter', 400), 3077, 20_000, plexMetrics);
  const needed = Math.ceil((plexMetrics.face(400).run('Butyrospermum').advance * 3077) / 1000);
  expect(tooWide).toEqual({ text: 'Butyrospermum', by: needed - 20_000 });
});

test('the fewest lines are found where they are asked for', () => {
  expect(set(listOf(30), 50_000, true).length).toBeLessThanOrEqual(set(listOf(30), 50_000).length);
});

test('a figure keeps its unit', () => {
  const words = plainWords('Spray from 20 cm, hold for 5 min.', 400);
  expect(words.filter((word) => word.before === 'never').map((word) => word.text)).toEqual(['cm,', 'min.']);
});

import { expect, test } from 'vitest';
import type { Sheet } from '#shared/artwork/container.ts';
import { minimumsFor, panelArea, sizeForHeight } from '#shared/artwork/heights.ts';

/** A face whose area, with 6 mm allowed around the label, is the one given in millimetres. */
const face = (width: number, height: number): Sheet => ({ shape: 'flat', width: width - 6000, height: height - 6000, overlap: 0, round: width, diameter: 0 });

test.each([
  // 21 CFR 701.13(i), square inches of panel and sixteenths of an inch (secondary; last two from memory)
  ['5 square inches exactly', 25400 * 2, 25400 * 2.5, 1_587_500],
  ['a little over 5', 25400 * 2, 25400 * 2.5 + 1, 3_175_000],
  ['25 exactly', 25400 * 5, 25400 * 5, 3_175_000],
  ['a little over 25', 25400 * 5, 25400 * 5 + 1, 4_762_500],
  ['100 exactly', 25400 * 10, 25400 * 10, 4_762_500],
  ['a little over 100', 25400 * 10, 25400 * 10 + 1, 6_350_000],
  ['400 exactly', 25400 * 20, 25400 * 20, 6_350_000],
  ['a little over 400', 25400 * 20, 25400 * 20 + 1, 12_700_000],
])('US net contents on %s', (_, width, height, least) => {
  expect(minimumsFor('US', face(width, height), 250n).netContent).toMatchObject({ height: least, of: 'small o' });
});

test.each([
  // C.R.C. c. 417, s. 14
  ['32 cm²', 40000, 80000, 1_600_000],
  ['over 32 cm²', 40000, 80001, 3_200_000],
  ['258 cm²', 100000, 258000, 3_200_000],
  ['over 258 cm²', 100000, 258001, 6_400_000],
  ['over 645 cm²', 250000, 258001, 9_500_000],
  ['over 2580 cm²', 500000, 516001, 12_700_000],
])('Canadian figures on %s', (_, width, height, least) => {
  expect(minimumsFor('CA', face(width, height), 250n).netContent).toMatchObject({ height: least, of: 'figures' });
});

test.each([
  // Directive 76/211/EEC, Annex I, 3.1: over 1000, over 200, over 50, 50 and less
  [50n, 2_000_000], [51n, 3_000_000], [200n, 3_000_000], [201n, 4_000_000], [1000n, 4_000_000], [1001n, 6_000_000],
] as const)('EU figures for %s g or ml', (quantity, least) => {
  expect(minimumsFor('EU', face(60000, 90000), quantity).netContent.height).toBe(least);
  expect(minimumsFor('UK', face(60000, 90000), quantity).netContent.height).toBe(least);
});

test('a cylinder counts two fifths of height and round', () => {
  const sheet: Sheet = { shape: 'cylinder', width: 1, height: 100_000, overlap: 0, round: 182_000, diameter: 58_000 };
  // 0.4 × (100 + 15) mm × 182 mm = 8372 mm²
  expect(panelArea(sheet)).toBe(8_372_000_000n);
});

test('the lower 30 % rule ends at 5 square inches', () => {
  expect(minimumsFor('US', face(50800, 63500), 1n).netContentZone).toBe(0);
  expect(minimumsFor('US', face(50800, 63501), 1n).netContentZone).toBe(300);
});

test('a height becomes the smallest em that keeps it', () => {
  // 1.5875 mm over a small o of 0.516 em is 3.0766 mm
  expect(sizeForHeight(1_587_500, 516)).toBe(3077);
  expect(3077 * 516).toBeGreaterThanOrEqual(1_587_500);
  expect(3076 * 516).toBeLessThan(1_587_500);
});

// 21 CFR 701.3 (secondary): less than 12 square inches to label, 1/32 inch; two faces are counted.
test.each([
  ['under 12 square inches', 25400 * 2, 25400 * 3 - 1, 793_750],
  ['12 square inches exactly', 25400 * 2, 25400 * 3, 1_587_500],
])('US letters on %s', (_, width, height, least) => {
  expect(minimumsFor('US', face(width, height), 1n, false).text.height).toBe(least);
});

test('a label with warnings keeps 1/16 inch on the smallest pack', () => {
  expect(minimumsFor('US', face(25400, 25400), 1n, true).text.height).toBe(1_587_500);
});

import { expect, test } from 'vitest';
import { judge, said } from '../judging.ts';

const shades = [{ inci: 'CI 77491' }, { inci: 'CI 77891' }];

test.each(['EU', 'UK', 'US', 'CA'] as const)('other shades follow the list of a lipstick in %s, not of a body wash', (market) => {
  expect(said(judge([], { market, category: 'lipstick', mayContain: shades }), 'may-contain-misplaced')).toEqual([]);
  expect(said(judge([], { market, category: 'nail-polish', mayContain: shades }), 'may-contain-misplaced')).toEqual([]);
  expect(said(judge([], { market, category: 'body-wash', mayContain: shades }), 'may-contain-misplaced')).toHaveLength(1);
});

test('a product without shades is not asked', () => {
  expect(said(judge([], { category: 'body-wash' }), 'may-contain-misplaced')).toEqual([]);
});

import { expect, test } from 'vitest';
import { judge, said } from './judging.ts';

test('Great Britain does not follow what the EU changed after it left', () => {
  const retinol = [{ name: 'Retinol', percent: '1' }];
  expect(said(judge(retinol, { market: 'UK', category: 'face-cream' }))).toEqual([]);
  expect(said(judge(retinol, { market: 'EU', category: 'face-cream' }))).toContain('limit-exceeded Retinol eu/annex-iii/376/b');
});

test.each([
  ['2025-09-29', '2025-09-29', []],
  ['2025-09-30', '2025-09-30', ['limit-exceeded Methyl Salicylate uk/annex-iii/324/a']],
  ['2025-09-29', '2026-04-01', ['limit-exceeded Methyl Salicylate uk/annex-iii/324/a']],
])('methyl salicylate in Great Britain, placed %s and available %s', (placed, available, expected) => {
  expect(said(judge([{ name: 'Methyl Salicylate', percent: '0.1' }], { market: 'UK', category: 'body-lotion', placed, available }), 'limit-exceeded')).toEqual(expected);
});

test('the same input gives the same answer', () => {
  const given = [{ name: 'Phenoxyethanol', percent: '1.2' }, { name: 'Salicylic Acid', percent: '1' }];
  expect(judge(given)).toEqual(judge(given));
});

test('conditions that cannot be computed are listed as not checked', () => {
  expect(judge([{ name: 'Triethanolamine', percent: '1' }], { category: 'body-lotion' }).notChecked.map((one) => one.rule)).toEqual(['eu/annex-iii/62']);
});

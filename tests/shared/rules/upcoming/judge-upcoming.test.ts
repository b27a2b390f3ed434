import { describe, expect, test } from 'vitest';
import { judge, said } from '../judging.ts';

describe('what is to come', () => {
  test('citral above its coming limit is a note with its day', () => {
    const found = judge([{ name: 'Citral', percent: '0.2', as: 'hidden' }], { category: 'face-cream' }).findings;
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ kind: 'upcoming', severity: 'note', rule: 'eu/annex-iii/70/e', effective: { from: '2027-01-01' }, limit: '0.15' });
  });

  test('a product that keeps the coming limit hears nothing', () => {
    expect(said(judge([{ name: 'Citral', percent: '0.15', as: 'hidden' }], { category: 'face-cream' }))).toEqual([]);
  });

  test('once it binds it is no longer upcoming', () => {
    const lines = said(judge([{ name: 'Citral', percent: '0.2', as: 'hidden' }], { category: 'face-cream', placed: '2027-01-01' }));
    expect(lines).toEqual(['limit-exceeded Citral eu/annex-iii/70/e']);
  });

  test.each<[string, string, string[]]>([
    ['Citral', '2028-06-30', ['upcoming Citral eu/annex-iii/70/e']],
    ['Citral', '2028-07-01', ['limit-exceeded Citral eu/annex-iii/70/e']],
    ['Geranial', '2028-07-31', ['upcoming Geranial eu/annex-iii/70/e']],
    ['Geranial', '2028-08-01', ['limit-exceeded Geranial eu/annex-iii/70/e']],
  ])('%s in stock placed before 2027, still sold on %s', (name, available, expected) => {
    expect(said(judge([{ name, percent: '0.2', as: 'hidden' }], { category: 'face-cream', placed: '2026-12-31', available }))).toEqual(expected);
  });

  test('zinc in mouthwash keeps today\'s limit and is told of the next', () => {
    expect(said(judge([{ name: 'Zinc Chloride', percent: '1' }], { category: 'mouthwash' }))).toEqual(['upcoming Zinc Chloride eu/annex-iii/24/c']);
  });

  test('a warning to come is told where the label does not say it yet', () => {
    const asked = { category: 'face-cream', placed: '2025-10-01', available: '2026-01-01' };
    expect(said(judge([{ name: 'Retinol', percent: '0.1' }], asked))).toEqual(['upcoming Retinol eu/annex-iii/376']);
    const says = { ...asked, particulars: { warnings: [{ text: 'Contains Vitamin A. Consider your daily intake before use' }] } };
    expect(said(judge([{ name: 'Retinol', percent: '0.1' }], says), 'upcoming')).toEqual([]);
  });
});

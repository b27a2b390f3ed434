import { describe, expect, test } from 'vitest';
import { judge, said, type Given } from '../judging.ts';

const eu = (given: Given, category = 'body-lotion'): string[] => said(judge([given], { category }));

describe('outside the positive list', () => {
  test.each<[string, Given, string]>([
    ['a preservative', { name: 'Leuconostoc/Radish Root Ferment Filtrate', percent: '2', purpose: 'preservative' }, 'eu/article-14/preservative'],
    ['a UV filter', { name: 'Ethylhexyl Methoxycrylene', percent: '2', purpose: 'uv-filter' }, 'eu/article-14/uv-filter'],
    ['a colourant', { name: 'Curcuma Longa Root Extract', percent: '2', purpose: 'colourant' }, 'eu/article-14/colourant'],
    ['a CI number with no purpose stated', { name: 'CI 45425', percent: '2' }, 'eu/article-14/colourant'],
  ])('%s stops sale', (_, given, rule) => {
    expect(eu(given)).toEqual([`use-not-listed ${given.name} ${rule}`]);
  });

  test('the same substance for another purpose says nothing', () => {
    expect(eu({ name: 'Ethylhexyl Methoxycrylene', percent: '2', purpose: 'other' })).toEqual([]);
  });

  test('a nano form that the list does not name is not on it', () => {
    expect(eu({ name: 'Octocrylene', percent: '2', purpose: 'uv-filter', nano: true })).toEqual(['use-not-listed Octocrylene eu/article-14/uv-filter']);
  });

  test('hair dyes are left to Annex III', () => {
    expect(eu({ name: 'CI 45425', percent: '2' }, 'hair-dye-non-oxidative')).not.toContain('use-not-listed CI 45425 eu/article-14/colourant');
  });

  test('a UV filter struck off is told once, as prohibited', () => {
    expect(eu({ name: '4-Methylbenzylidene Camphor', percent: '2', purpose: 'uv-filter' })).toEqual(['prohibited 4-Methylbenzylidene Camphor eu/annex-ii/1730']);
  });

  test('the United States keep no such list of preservatives', () => {
    expect(said(judge([{ name: 'Leuconostoc/Radish Root Ferment Filtrate', percent: '2', purpose: 'preservative' }], { market: 'US' }))).toEqual([]);
  });
});

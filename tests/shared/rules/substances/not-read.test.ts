import { describe, expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const open = (name: string, asked: Asked): string[] => judge([{ name, percent: '0.5' }], asked).notChecked.filter(({ rule }) => rule.endsWith('/not-read')).map(({ rule, citation }) => `${rule} ${citation}`);
const GB: Asked = { market: 'UK', category: 'face-cream' };

describe('entries of the Union whose text in force in Great Britain was not read', () => {
  test('are named with the place to look, and judged in the Union alone', () => {
    expect(open('Retinol', GB)).toEqual(['eu/annex-iii/376/not-read Regulation (EC) No 1223/2009 as assimilated in Great Britain, Annex III, entry 376']);
    expect(said(judge([{ name: 'Retinol', percent: '0.5' }], GB))).toEqual([]);
    expect(said(judge([{ name: 'Retinol', percent: '0.5' }], { category: 'face-cream' }))).toEqual(['limit-exceeded Retinol eu/annex-iii/376/b']);
    expect(open('Retinol', { category: 'face-cream' })).toEqual([]);
  });

  test('say nothing where Great Britain has a row of its own', () => {
    for (const name of ['BHT', 'Kojic Acid', 'Methyl Salicylate', 'Methyl N-Methylanthranilate', '4-Methylbenzylidene Camphor', 'Zinc Pyrithione', 'Benzophenone']) expect(open(name, GB), name).toEqual([]);
  });

  test('say nothing where the row does not speak of this kind of product', () => {
    // Salicylic acid: what the Union alone forbids is oral use and what can be breathed in.
    const acid = (category: string): string[] => judge([{ name: 'Salicylic Acid', percent: '0.4', purpose: 'other' }], { market: 'UK', category }).notChecked.map(({ rule }) => rule).filter((rule) => rule.endsWith('/not-read'));
    expect([acid('face-cream'), acid('mouthwash')]).toEqual([[], ['eu/annex-iii/98/not-read']]);
    expect(open('Octocrylene', { ...GB, category: 'sunscreen-spray' })).toEqual(['eu/annex-vi/10/not-read Regulation (EC) No 1223/2009 as assimilated in Great Britain, Annex VI, entry 10']);
  });

  test('are told once for a substance that both markets list alike', () => {
    expect(open('Phenoxyethanol', GB)).toEqual([]);
  });
});

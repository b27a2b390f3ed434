import { describe, expect, test } from 'vitest';
import { bindsPurpose, isColourIndexName } from '#shared/rules/substances/binding.ts';
import { judge, law, said } from '../judging.ts';

test.each([
  ['CI 77491', true],
  ['C.I. 77491', true],
  ['Cica', false],
  ['Citric Acid', false],
])('%s as a colour index name: %s', (name, expected) => {
  expect(isColourIndexName(name)).toBe(expected);
});

describe('bindsPurpose', () => {
  test('a preservative used for something else is not bound by Annex V', () => {
    expect(said(judge([{ name: 'Phenoxyethanol', percent: '2', purpose: 'other' }]))).toEqual([]);
  });

  test('with no purpose stated Annex V binds what has no other lawful use', () => {
    expect(said(judge([{ name: 'Phenoxyethanol', percent: '2' }]))).toEqual(['limit-exceeded Phenoxyethanol eu/annex-v/29']);
  });

  test('a constituent of a perfume is no preservative', () => {
    expect(said(judge([{ name: 'Benzyl Alcohol', percent: '2', as: 'hidden' }]))).toEqual([]);
  });

  test('a list that does not speak of the nano form does not cover it', () => {
    const zinc = { key: 'x', name: 'CI 10006', cas: [], purposes: [], nano: true, as: {}, total: { min: { n: 0n, d: 1n }, typical: { n: 0n, d: 1n }, max: { n: 0n, d: 1n } }, sources: [] };
    const facts = { category: law.categories.get('body-wash')! } as never;
    expect(bindsPurpose(law.row('eu/annex-iv/1'), zinc, facts)).toBe(false);
  });
});

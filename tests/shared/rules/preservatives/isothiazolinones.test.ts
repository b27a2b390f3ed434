import { expect, test } from 'vitest';
import { judge, said } from '../judging.ts';

const both = (second: string) => judge([{ name: 'Methylchloroisothiazolinone', percent: '0.0011', material: 'blend' }, { name: 'Methylisothiazolinone', percent: '0.0004', material: second }]);

test('the mixture from one material is lawful up to 0.0015 %', () => {
  expect(said(both('blend'))).toEqual([]);
});

test('methylisothiazolinone from a second material is its use alone, which excludes the mixture', () => {
  expect(said(both('other'))).toEqual(['not-for-this-use Methylisothiazolinone eu/annex-v/39-57']);
});

test('one of them alone is not this rule\'s business', () => {
  expect(said(judge([{ name: 'Methylisothiazolinone', percent: '0.001' }]))).toEqual([]);
});

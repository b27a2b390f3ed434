import { expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const WHITENING: Asked = { market: 'CA', category: 'tooth-whitening' };
const at = (pH: string): string[] => said(judge([], { ...WHITENING, facts: { pH } }), 'not-for-this-use', 'limit-uncertain');

// Cosmetic Regulations, C.R.C., c. 869, s. 13: no more acidic than pH 4.
test('in Canada what takes stains off teeth stops below pH 4, not at it', () => {
  expect(at('4.0000001')).toEqual([]);
  expect(at('4')).toEqual([]);
  expect(at('3.9999999')).toEqual(['not-for-this-use acidity ca/cr-13']);
});

test('an open pH asks for it', () => {
  const [open] = judge([], WHITENING).findings.filter(({ rule }) => rule === 'ca/cr-13');
  expect(open).toMatchObject({ kind: 'limit-uncertain', severity: 'decide', needs: ['pH'] });
});

test('it binds no other product and no other market', () => {
  const acid: Asked = { facts: { pH: '3' } };
  for (const asked of [{ ...acid, market: 'CA', category: 'toothpaste' }, { ...acid, market: 'US', category: 'tooth-whitening' }, { ...acid, market: 'EU', category: 'tooth-whitening' }] as const) {
    expect(judge([], asked).findings.filter(({ rule }) => rule === 'ca/cr-13')).toEqual([]);
  }
});

import { expect, test } from 'vitest';
import { formula, judge, line, material, part } from '#tests/support/engine.ts';

const headroomOf = (claim: string, glycerin: string, water: string) =>
  judge(formula([material('w', [part('Aqua', '100')]), material('g', [part('Glycerin', '100')]), material('o', [part('Cera Alba', '100')])], [line('w', `${water} g`), line('g', `${glycerin} g`), line('o', '0.0001 g')], { product: { claims: claim === '' ? [] : [{ text: claim, lang: 'en' }] } })).results[0]!.headroom();

test('a line has room until what it dilutes falls below the share that a claim promises', () => {
  // Of 120 g, which 6 g of glycerin are 5 % of, 6.0001 g are not water: 100 − 600.01 / 120 % is.
  const [water, glycerin] = headroomOf('With 5 % glycerin', '6', '93.9999');
  expect(water).toEqual({ line: 0, max: '94.999916666666', limitedBy: 'claims/share' });
  expect(glycerin!.limitedBy).not.toBe('claims/share');
});

test('a share that is promised exactly leaves no room at all', () => {
  const [water] = headroomOf('With 5 % glycerin', '5', '94.9999');
  expect(water).toEqual({ line: 0, max: '94.9999', limitedBy: 'claims/share' });
});

test('a claim that is broken today binds nothing, nor does one without a share', () => {
  expect(headroomOf('With 10 % glycerin', '6', '93.9999')[0]!.limitedBy).not.toBe('claims/share');
  expect(headroomOf('With glycerin', '6', '93.9999')).toEqual(headroomOf('', '6', '93.9999'));
});

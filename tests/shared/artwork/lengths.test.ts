import { expect, test } from 'vitest';
import { decimal, ZERO } from '#shared/kernel/rational.ts';
import { exactMillimetres, inMillimetres, micrometresOf, readMillimetres, roundLength } from '#shared/artwork/lengths.ts';

test('π times a length is rounded to the nearest micrometre', () => {
  // 58.06 π = 182.4008695… and 58 π = 182.2123739… (π to 20 places, worked by hand)
  expect(roundLength(decimal('58.06'), ZERO)).toBe(182401);
  expect(roundLength(decimal('58'), ZERO)).toBe(182212);
  expect(roundLength(decimal('58.06'), decimal('5'))).toBe(187401);
});

test('millimetres are read to the nearest micrometre, halves upwards', () => {
  expect(micrometresOf(decimal('0.0005'))).toBe(1);
  expect(micrometresOf(decimal('0.0004999'))).toBe(0);
  expect(readMillimetres('90')).toBe(90000);
  expect(readMillimetres('9o')).toBeNull();
});

test('what is missing is rounded up, what is exact is not rounded', () => {
  expect(inMillimetres(12341)).toBe('12.35');
  expect(inMillimetres(12340)).toBe('12.34');
  expect(exactMillimetres(187401)).toBe('187.401');
});

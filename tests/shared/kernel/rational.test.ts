import { expect, test } from 'vitest';
import { decimal, rational, toDecimalApart } from '#shared/kernel/rational.ts';

test.each([
  ['0.5', '0.5', '0.5'],
  ['0.6', '0.5', '0.6'],
  ['0.5000000001', '0.5', '0.5000000001'],
  ['0.49999999995', '0.5', '0.49999999995'],
  ['0.50000000000000000001', '0.5', '0.50000000000000000001'],
])('%s beside %s reads %s', (figure, other, expected) => {
  expect(toDecimalApart(decimal(figure), decimal(other), 6)).toBe(expected);
});

test('what sixty places cannot tell apart is told in words', () => {
  const half = rational(1n, 2n);
  const hair = 10n ** 80n;
  expect(toDecimalApart(rational(hair + 1n, 2n * hair), half, 6)).toBe('just over 0.5');
  expect(toDecimalApart(rational(hair - 1n, 2n * hair), half, 6)).toBe('just under 0.5');
});

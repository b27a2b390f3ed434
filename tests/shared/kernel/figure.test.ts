import fc from 'fast-check';
import { expect, test } from 'vitest';
import { figureToDecimal, SAFE_BELOW, toSafe } from '#shared/kernel/figure.ts';
import { toDecimal } from '#shared/kernel/rational.ts';

/** The rounding of whole numbers held as doubles is that of BigInts, digit for digit. */
test('a quotient of safe whole numbers is printed as the exact fraction is', () => {
  const safe = fc.integer({ min: 0, max: Number.MAX_SAFE_INTEGER });
  const divisor = fc.oneof(fc.integer({ min: 1, max: 9_000_000_000 }), fc.integer({ min: 1, max: Number.MAX_SAFE_INTEGER }), fc.constantFrom(1, 3, 7, 8, 16, 9_000_000_000, 90_000_000_000_000));
  fc.assert(fc.property(safe, divisor, (n, d) => {
    expect(figureToDecimal(n, d)).toBe(toDecimal({ n: BigInt(n), d: BigInt(d) }));
  }), { numRuns: 5000 });
});

test.each<[number | bigint, number | bigint, string]>([
  [0, 7, '0'],
  [1, 8192, '0.000122070312'], // 0.0001220703125: a half, to the even digit below
  [3, 8192, '0.000366210938'], // 0.0003662109375: a half, to the even digit above
  [2_999_999_999_999, 3_000_000_000_000, '1'], // 0.9999999999996…: carries over the point
  [-1, 3, '-0.333333333333'],
  [10n ** 20n, 3, '33333333333333333333.333333333333'],
])('%s over %s is %s', (n, d, text) => {
  expect(figureToDecimal(n, d)).toBe(text);
});

test('what doubles cannot hold is refused', () => {
  expect(toSafe(SAFE_BELOW - 1n)).toBe(Number.MAX_SAFE_INTEGER);
  expect(() => toSafe(SAFE_BELOW)).toThrow(RangeError);
  expect(() => toSafe(-SAFE_BELOW)).toThrow(RangeError);
});

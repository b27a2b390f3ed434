import { describe, expect, test } from 'vitest';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { hasBegun, isInForce, isToCome } from '#shared/law/as-at.ts';

const days = (placed: string, available: string) => ({ placedOnMarket: plainDate(placed), availableOn: plainDate(available) });
const one = { available: plainDate('2026-05-01') };
const two = { placed: plainDate('2025-11-01'), available: plainDate('2027-05-01') };

describe('hasBegun', () => {
  test.each([
    ['2026-04-30', false],
    ['2026-05-01', true],
    ['2026-05-02', true],
  ])('with one date, on %s: %s', (day, expected) => {
    expect(hasBegun(one, days('2020-01-01', day))).toBe(expected);
  });

  test.each([
    ['2025-10-31', '2027-04-30', false],
    ['2025-11-01', '2025-11-01', true],
    ['2025-10-31', '2027-05-01', true],
  ])('with two dates, placed %s and available %s: %s', (placed, available, expected) => {
    expect(hasBegun(two, days(placed, available))).toBe(expected);
  });

  test('no dates bind always', () => {
    expect(hasBegun(undefined, days('2013-07-11', '2013-07-11'))).toBe(true);
  });
});

test('a span ends on the day its successor begins', () => {
  expect(isInForce({ until: one }, days('2020-01-01', '2026-04-30'))).toBe(true);
  expect(isInForce({ until: one }, days('2020-01-01', '2026-05-01'))).toBe(false);
});

test('only a dated beginning is to come', () => {
  expect(isToCome({}, days('2020-01-01', '2020-01-01'))).toBe(false);
  expect(isToCome({ from: two }, days('2020-01-01', '2020-01-01'))).toBe(true);
});

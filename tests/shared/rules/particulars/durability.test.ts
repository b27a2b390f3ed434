import { describe, expect, test } from 'vitest';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { judgeDurability, monthsUntil } from '#shared/rules/particulars/durability.ts';

const placed = plainDate('2026-12-01');
const PAO = { kind: 'pao', months: '12' } as const;
const until = (date: string) => ({ kind: 'best-before', date }) as const;
const met = (durability: Parameters<typeof judgeDurability>[0], known?: string, notRelevant = false) => judgeDurability(durability, { known, notRelevant, placed }, '30').met;

// Regulation (EC) No 1223/2009, Article 19(1)(c): the date is not mandatory above 30 months, and a period after opening then is.
describe('up to 30 months a date, above a period after opening', () => {
  test.each([
    ['29', false, true], ['30', false, true], ['30.1', true, false], ['31', true, false],
  ])('%s months: a period alone is enough %s, a date alone %s', (known, period, date) => {
    expect([met(PAO, known), met(until('2029-01'), known)]).toEqual([period, date]);
  });

  test.each([['2029-05', true], ['2029-06', true], ['2029-07', undefined]])('best before %s, first sold in December 2026: %s', (date, expected) => {
    expect(met(until(date))).toBe(expected);
  });

  test.each([['2029-05-31', true], ['2029-06-01', true], ['2029-06-02', undefined]])('best before %s, first sold on 1 December 2026: %s', (date, expected) => {
    expect(met(until(date))).toBe(expected);
  });

  test('where a period after opening has no meaning it is not asked for, but a date still is up to 30 months', () => {
    expect([met(undefined, undefined, true), met(undefined, '31', true), met(undefined, '30', true)]).toEqual([true, true, false]);
  });

  test('nothing given is missing, and says what would settle it', () => {
    expect(judgeDurability(undefined, { notRelevant: false, placed }, '30')).toEqual({ met: false, needs: ['minimumDurabilityMonths', 'durabilityNotRelevant'] });
  });
});

test.each([
  ['2024-02-29', '2024-03', 1n], ['2024-02-29', '2025-02-28', 11n], ['2024-01-31', '2024-02-29', 0n], ['2026-12-01', '2026-12-31', 0n], ['2026-12-15', '2027-12-15', 12n],
])('from %s to %s are %s whole months', (from, to, months) => {
  expect(monthsUntil(plainDate(from), to)).toBe(months);
});

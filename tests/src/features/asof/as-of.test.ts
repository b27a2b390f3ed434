import { describe, expect, test } from 'vitest';
import { readAsOf, writeAsOf, type AsOfDefaults } from '#src/features/asof/as-of.ts';
import { dayAt, dayNumber, ruleMarks, ruleSpan } from '#src/features/asof/rule-scale.ts';

const DEFAULTS: AsOfDefaults = { markets: ['EU', 'US'], placed: '2026-12-01', available: null, today: '2026-11-20' };
const read = (search: string) => readAsOf(new URLSearchParams(search), DEFAULTS);

describe('the address', () => {
  test('left alone, both days are the product’s own first day', () => {
    expect(read('')).toEqual({ market: 'EU', placed: '2026-12-01', available: '2026-12-01' });
  });
  test('one day moves both, two stand apart, and no shelf day lies before the first', () => {
    expect(read('placed=2026-06-01')).toMatchObject({ placed: '2026-06-01', available: '2026-06-01' });
    expect(read('placed=2026-06-01&available=2028-08-01')).toMatchObject({ available: '2028-08-01' });
    expect(read('available=2020-01-01')).toMatchObject({ available: '2026-12-01' });
  });
  test('what is no day or no market is passed over', () => {
    expect(read('market=FR&placed=2026-02-30')).toEqual(read(''));
  });
  test('what is written is read back', () => {
    for (const asOf of [{ market: 'CA', placed: '2026-06-01', available: '2026-06-01' }, { market: 'EU', placed: '2026-12-01', available: '2028-08-01' }, { market: 'US', placed: '2027-01-01', available: '2028-01-01' }] as const) {
      expect(readAsOf(writeAsOf(new URLSearchParams('tab=x'), asOf, DEFAULTS), DEFAULTS)).toEqual(asOf);
    }
    expect(writeAsOf(new URLSearchParams('market=US'), read(''), DEFAULTS).toString()).toBe('');
  });
});

describe('the rule of time', () => {
  test('spans whole years, three at least, and every day that is asked', () => {
    expect(ruleSpan(['2026-12-01'], '2026-11-20')).toEqual({ from: '2026-01-01', to: '2028-12-31' });
    expect(ruleSpan(['2024-02-01', '2030-01-01'], '2026-11-20')).toEqual({ from: '2024-01-01', to: '2030-12-31' });
  });
  test('days count over leap years', () => {
    expect(dayNumber('2028-03-01', '2028-01-01')).toBe(60);
    expect(dayAt(60, '2028-01-01')).toBe('2028-03-01');
  });
  test('words of neighbouring days never run into each other', () => {
    const days = [{ date: '2026-08-01', words: '81 allergens named on what is first sold' }, { date: '2026-10-01', words: 'another change' }, { date: '2028-08-01', words: 'and on all that is sold' }];
    for (const width of [360, 700, 1000]) {
      let free = -1;
      for (const { label, day } of ruleMarks(days, { from: '2026-01-01', to: '2028-12-31' }, width)) {
        if (!label) continue;
        const long = 78 + (label.hasWords ? day.words.length * 6.1 + 8 : 0);
        const left = label.align === 'start' ? label.at : label.at - long;
        expect(left).toBeGreaterThanOrEqual(free);
        free = left + long;
        expect(free).toBeLessThanOrEqual(width);
      }
    }
  });
});

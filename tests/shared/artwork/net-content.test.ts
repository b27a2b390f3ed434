import fc from 'fast-check';
import { expect, test } from 'vitest';
import { compare, decimal } from '#shared/kernel/rational.ts';
import { customaryInMetric, netStatement } from '#shared/artwork/net-content.ts';

test.each([
  // Cut to three figures so as not to overstate; factors 29.5735295625 ml and 28.349523125 g
  ['30', 'ml', '1.01 fl oz', '(30 ml)'], ['50', 'ml', '1.69 fl oz', '(50 ml)'], ['100', 'ml', '3.38 fl oz', '(100 ml)'],
  ['250', 'ml', '8.45 fl oz', '(250 ml)'], ['50', 'g', 'Net Wt 1.76 oz', '(50 g)'], ['100', 'g', 'Net Wt 3.52 oz', '(100 g)'],
  ['5', 'ml', '0.16 fl oz', '(5 ml)'], ['1000', 'ml', '33.8 fl oz', '(1000 ml)'], ['4000', 'ml', '135 fl oz', '(4000 ml)'],
] as const)('%s %s in the US', (value, unit, customary, metric) => {
  expect(netStatement({ value, unit }, 'US')!.parts).toEqual([customary, metric]);
});

test('EU, UK and Canada print the metric content', () => {
  expect(netStatement({ value: '250', unit: 'ml' }, 'EU')!.parts).toEqual(['250 ml']);
  expect(netStatement({ value: '1500', unit: 'ml' }, 'CA')!.parts).toEqual(['1.5 L']);
  expect(netStatement({ value: '999', unit: 'g' }, 'CA')!.parts).toEqual(['999 g']);
});

test('a content that is nothing is no statement', () => {
  expect(netStatement({ value: '0', unit: 'g' }, 'EU')).toBeNull();
  expect(netStatement({ value: 'much', unit: 'g' }, 'EU')).toBeNull();
});

test('the ℮ may stand from 5 to 10 000', () => {
  expect(netStatement({ value: '4.9', unit: 'ml' }, 'EU')!.mayCarryEMark).toBe(false);
  expect(netStatement({ value: '5', unit: 'ml' }, 'EU')!.mayCarryEMark).toBe(true);
  expect(netStatement({ value: '10001', unit: 'ml' }, 'EU')!.mayCarryEMark).toBe(false);
});

test('no US figure ever says more than is inside', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 400_000 }), fc.constantFrom('g' as const, 'ml' as const), (tenths, unit) => {
      const value = `${tenths / 10}`;
      const figure = /[\d.]+/.exec(netStatement({ value, unit }, 'US')!.parts[0]!)![0];
      expect(compare(customaryInMetric(figure, unit), decimal(value))).toBeLessThanOrEqual(0);
    }),
  );
});

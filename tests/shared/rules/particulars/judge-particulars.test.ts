import { describe, expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const person = { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' };
const whole: Asked = {
  particulars: { responsiblePerson: { EU: person, UK: person, US: person, CA: person }, usContact: 'hello@brackenmere.example', canadaContact: 'hello@brackenmere.example', batchCode: 'BW-0412', function: 'Body wash' },
  product: { netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: '12' } },
};
const missing = (asked: Asked): string[] => said(judge([], asked), 'particular-missing').map((line) => line.split(' ')[1]!);

describe('particulars', () => {
  test.each(['EU', 'UK', 'US', 'CA'] as const)('a whole label lacks nothing in %s', (market) => {
    expect(missing({ market, ...whole })).toEqual([]);
  });

  test.each([
    ['EU', ['responsiblePerson', 'netContent', 'durability', 'batchCode', 'function']],
    ['UK', ['responsiblePerson', 'netContent', 'durability', 'batchCode', 'function']],
    ['US', ['responsiblePerson', 'netContent', 'usContact']],
    ['CA', ['responsiblePerson', 'netContent', 'canadaContact']],
  ] as const)('an empty label in %s lacks %s', (market, expected) => {
    expect(missing({ market, particulars: {} })).toEqual(expected);
  });

  test('without particulars nothing is asked', () => {
    expect(missing({ market: 'EU' })).toEqual([]);
  });

  test.each([
    ['2027-12-31', []],
    ['2028-01-01', ['responsiblePerson']],
  ])('an EU responsible person satisfies Great Britain until the end of 2027: on %s it lacks %s', (available, expected) => {
    const { EU } = whole.particulars!.responsiblePerson!;
    expect(missing({ market: 'UK', available, placed: '2026-01-01', ...whole, particulars: { ...whole.particulars, responsiblePerson: { EU: EU! } } })).toEqual(expected);
  });

  test.each([
    ['2024-12-28', []],
    ['2024-12-29', ['usContact']],
  ])('the US contact is due from 29 December 2024: on %s it lacks %s', (available, expected) => {
    const { usContact: _, ...rest } = whole.particulars!;
    expect(missing({ market: 'US', available, ...whole, particulars: rest })).toEqual(expected);
  });

  test('a name without an address is no responsible person', () => {
    expect(missing({ ...whole, particulars: { ...whole.particulars, responsiblePerson: { EU: { name: 'Brackenmere Bathhouse', address: ' ' } } } })).toEqual(['responsiblePerson']);
  });

  test('an imported product names its country', () => {
    expect(missing({ ...whole, facts: { imported: true } })).toEqual(['countryOfOrigin']);
  });
});

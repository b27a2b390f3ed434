import { describe, expect, test } from 'vitest';
import { judge, said, type Asked, type Given } from '../judging.ts';

const us = (given: Given, asked: Asked): string[] => said(judge([given], { market: 'US', ...asked }));

/** Areas of use from 21 CFR parts 73, 74 and 82; see the table's own sourcing. */
describe('colour additives by area of use', () => {
  test.each<[string, string, string, string[]]>([
    ['Red 6 and 7 near the eye', 'CI 15850', 'eye-shadow', ['not-for-this-use CI 15850 us/colour/red6']],
    ['Red 6 and 7 on lips', 'CI 15850', 'lipstick', []],
    ['Red 40 near the eye', 'CI 16035', 'eye-shadow', []],
    ['ultramarines on lips', 'CI 77007', 'lipstick', ['not-for-this-use CI 77007 us/colour/ultramarines']],
    ['ultramarines near the eye', 'CI 77007', 'eye-shadow', []],
    ['iron oxides on lips', 'CI 77491', 'lipstick', []],
    ['curcumin anywhere', 'CI 75300', 'body-lotion', ['use-not-listed CI 75300 us/colour/unlisted']],
    ['Red 3, not permitted', 'CI 45430', 'lipstick', ['use-not-listed CI 45430 us/colour/fdcredno3']],
  ])('%s', (_, name, category, expected) => {
    expect(us({ name, percent: '0.5' }, { category })).toEqual(expected);
  });

  test.each<[string, string, string, string]>([
    ['Red 33', 'CI 17200', '3', '3.01'],
    ['Red 36', 'CI 12085', '3', '3.01'],
    ['Orange 5', 'CI 45370', '5', '5.01'],
  ])('%s has a limit on lips', (_, name, at, over) => {
    expect(us({ name, percent: at }, { category: 'lipstick' })).toEqual([]);
    expect(us({ name, percent: over }, { category: 'lipstick' })[0]).toMatch(/^limit-exceeded/);
    expect(us({ name, percent: over }, { category: 'body-wash' })).toEqual([]);
  });

  test('a US name decides between two colours of one CI number', () => {
    expect(us({ name: 'CI 42090', percent: '0.1' }, { category: 'lipstick' })).toEqual([]);
    expect(us({ name: 'CI 42090', percent: '0.1' }, { category: 'lipstick', usName: 'Blue 4' })).toEqual(['not-for-this-use CI 42090 us/colour/blue4']);
  });

  test('a plant juice named as a colour is unlisted; for another purpose it is an ingredient', () => {
    expect(us({ name: 'Beta Vulgaris Root Extract', percent: '1', purpose: 'colourant' }, {})).toHaveLength(1);
    expect(us({ name: 'Beta Vulgaris Root Extract', percent: '1', purpose: 'other' }, {})).toEqual([]);
  });

  test('colours of other shades are judged too', () => {
    expect(said(judge([], { market: 'US', category: 'lipstick', mayContain: [{ inci: 'CI 77491' }, { inci: 'CI 77288' }] }))).toEqual(['not-for-this-use CI 77288 us/colour/chromiumoxidegreens']);
  });

  test('other markets have their own lists', () => {
    expect(said(judge([{ name: 'CI 75300', percent: '1' }], { category: 'body-lotion' }))).toEqual([]);
  });
});

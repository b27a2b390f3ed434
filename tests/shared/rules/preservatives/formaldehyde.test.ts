import { describe, expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const releaser = [{ name: 'DMDM Hydantoin', percent: '0.3' }];
const due = (asked: Asked = {}) => judge(releaser, asked).findings.find((one) => one.kind === 'wording-required');

/** Annex V, preamble, point 2: above 0.001 % released. 0.3 % of DMDM hydantoin could set free 0.0957 % (molar masses 60.052 over 188.183). */
describe('"releases formaldehyde"', () => {
  test('without a measurement it is possible and asks for one', () => {
    expect(due()).toMatchObject({ severity: 'decide', certainty: 'possible', needs: ['releasedFormaldehyde'] });
    expect(judge(releaser).requiredWording.find((one) => one.lang === 'en')).toMatchObject({ text: 'releases formaldehyde', certainty: 'possible' });
  });

  test('at 0.001 % measured nothing is due, above it is', () => {
    expect(due({ facts: { releasedFormaldehyde: '0.001' } })).toBeUndefined();
    expect(due({ facts: { releasedFormaldehyde: '0.0010001' } })).toMatchObject({ severity: 'note', certainty: 'certain' });
  });

  test('a ceiling below the threshold needs no measurement', () => {
    expect(judge([{ name: 'DMDM Hydantoin', percent: '0.003' }]).findings).toEqual([]);
  });

  test('several releasers count together', () => {
    const two = [{ name: 'DMDM Hydantoin', percent: '0.002' }, { name: 'Diazolidinyl Urea', percent: '0.002' }];
    expect(judge(two).findings.some((one) => one.kind === 'wording-required')).toBe(true);
  });

  test.each([
    ['2024-07-31', '2026-07-31', 'contains formaldehyde'],
    ['2024-08-01', '2024-08-01', 'releases formaldehyde'],
    ['2024-07-31', '2026-08-01', 'releases formaldehyde'],
  ])('placed %s and available %s: %s', (placed, available, text) => {
    expect(judge(releaser, { placed, available }).requiredWording[0]!.text).toBe(text);
  });

  test.each([
    ['2026-07-14', '2026-07-14', 'contains formaldehyde'],
    ['2026-07-15', '2026-07-15', 'releases formaldehyde'],
    ['2026-07-14', '2027-01-15', 'releases formaldehyde'],
  ])('in Great Britain, placed %s and available %s: %s', (placed, available, text) => {
    expect(judge(releaser, { market: 'UK', placed, available }).requiredWording[0]!.text).toBe(text);
  });
});

test('sodium hydroxymethylglycinate is prohibited where the ceiling reaches 0.1 % (30.026 over 127.075)', () => {
  // 0.1 % of formaldehyde is 0.42321654… % of it
  expect(said(judge([{ name: 'Sodium Hydroxymethylglycinate', percent: '0.4232' }]))).toEqual([]);
  expect(said(judge([{ name: 'Sodium Hydroxymethylglycinate', percent: '0.4233' }]))).toEqual(['prohibited Sodium Hydroxymethylglycinate eu/annex-ii/1669']);
});

import { expect, test } from 'vitest';
import { judge } from '../judging.ts';

test('a finding carries its figures, its paragraph, what to do and the sum behind it', () => {
  const found = judge([{ name: 'Sodium Benzoate', percent: '0.6', material: 'm1' }], { category: 'face-cream' }).findings[0]!;
  expect(found).toMatchObject({ kind: 'limit-exceeded', severity: 'stop', rule: 'eu/annex-v/1/c', subject: 'Sodium Benzoate', citation: 'Regulation (EC) No 1223/2009, Annex V, entry 1, letter (c)', certainty: 'certain' });
  expect(found.remedy).toMatch(/^Bring /);
  expect(found.arithmetic!.map((step) => step.figure)).toEqual(['0.6 %', '0.84745845', '0.508475 %', '0.5 %']);
  expect(found.arithmetic![0]!.from).toBe('m1');
});

test('a range is told with both ends', () => {
  const found = judge([{ name: 'Phenoxyethanol', min: '0.9', max: '1.2' }]).findings[0]!;
  expect(found.measuredRange).toEqual({ min: '0.9', typical: '0.9', max: '1.2' });
  expect(found.measured).toBe('1.2');
});

test('what is second hand or from memory says so', () => {
  expect(judge([{ name: 'Phenoxyethanol', percent: '2' }], { market: 'UK' }).findings[0]!.sourcing).toBe('secondary');
  expect(judge([{ name: 'Methyl Salicylate', percent: '3' }], { market: 'CA' }).findings[0]!.sourcing).toBe('memory');
  expect(judge([{ name: 'Phenoxyethanol', percent: '2' }]).findings[0]!.sourcing).toBeUndefined();
});

test('a share a hair above its limit is written with as many places as tell the two apart', () => {
  // Annex V entry 1: 0.5 % as acid; 0.59 % of sodium benzoate is 0.50000000...% of the acid.
  const found = judge([{ name: 'Sodium Benzoate', percent: '0.58999942681' }], { category: 'face-cream' }).findings.find(({ kind }) => kind === 'limit-exceeded');
  const [measured, limit] = /: (\S+) % as acid, and (\S+) % is the most/.exec(found!.message)!.slice(1);
  expect(limit).toBe('0.5');
  expect(measured).toMatch(/^0\.50{7,}\d+$/);
  expect(found!.arithmetic!.at(-2)!.figure).toBe(`${measured} %`);
});

import { describe, expect, test } from 'vitest';
import { slipsOf } from '#shared/engine/slips.ts';
import { formula, line, material, part, present } from '#tests/support/engine.ts';

const WATER = material('w', [part('Aqua', '100')]);
const GLYCERIN = material('g', [part('Glycerin', '100')]);

function mismatch(lines: readonly string[], batchSize?: string): { suspects: string[] } | undefined {
  const document = formula([WATER, GLYCERIN], lines.map((amount, index) => line(index === 0 ? 'w' : 'g', amount)), batchSize === undefined ? {} : { batchSize });
  const finding = present(document).results[0]!.findings.find(({ kind }) => kind === 'sum-mismatch');
  return finding && { suspects: (finding.suspects ?? []).map(({ line: at, written, perhaps, slip }) => `${at}: ${written} -> ${perhaps} ${slip}`) };
}

describe('the sum', () => {
  test.each<[readonly string[], string | undefined, boolean]>([
    [['90 g', '10 g'], '100', false],
    [['90 g', '10.1 g'], '100', false],
    [['90 g', '10.1000001 g'], '100', true],
    [['90 g', '9.9 g'], '100', false],
    [['90 g', '9.8999 g'], '100', true],
    [['90 g', '20 g'], undefined, false],
    [['90 %', '10.01 %'], undefined, false],
    [['90 %', '10.010001 %'], undefined, true],
    [['90 %', '9.99 %'], '250', false],
    [['90 %', '9.98 %'], '250', true],
    [['qs', '99 g'], '100', false],
    [['qs', '100 g'], '100', false],
    [['qs', '100.0000001 g'], '100', true],
    [['qs', '101 %'], undefined, true],
    [['0 g', '0 g'], undefined, true],
  ])('%j of %s: mismatch %s', (lines, batchSize, isOff) => {
    expect(mismatch(lines, batchSize) !== undefined).toBe(isOff);
  });
});

describe('slips that would close the gap', () => {
  test('two digits exchanged', () => expect(mismatch(['34.6 g', '56.4 g'], '100')).toEqual({ suspects: ['0: 34.6 -> 43.6 digits-exchanged', '1: 56.4 -> 65.4 digits-exchanged'] }));
  test('a point shifted', () => expect(mismatch(['95 g', '50 g'], '100')).toEqual({ suspects: ['1: 50 -> 5 digits-exchanged', '1: 50 -> 5 point-shifted'] }));
  test('shares in percent', () => expect(mismatch(['19 %', '9 %'])).toEqual({ suspects: ['0: 19 -> 91 digits-exchanged'] }));
  test('none where no slip explains it', () => expect(mismatch(['90 g', '7 g'], '100')).toEqual({ suspects: [] }));
});

test('a figure and what it may have been', () => {
  expect(slipsOf('0.5')).toEqual([{ perhaps: '5', slip: 'point-shifted' }, { perhaps: '0.05', slip: 'point-shifted' }]);
  expect(slipsOf('11')).toEqual([{ perhaps: '110', slip: 'point-shifted' }, { perhaps: '1.1', slip: 'point-shifted' }]);
  expect(slipsOf('0')).toEqual([]);
});

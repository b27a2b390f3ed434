import { describe, expect, test } from 'vitest';
import { judge, said } from '../judging.ts';

/** Salicylic acid: 0.5 % as a preservative (V/3), 2 % otherwise (III/98 b). */
describe('a limit that depends on the purpose', () => {
  test('below both is silent', () => {
    expect(said(judge([{ name: 'Salicylic Acid', percent: '0.5' }], { category: 'face-cream' }))).toEqual([]);
  });

  test('between them is uncertain and asks for the purpose', () => {
    const found = judge([{ name: 'Salicylic Acid', percent: '1' }], { category: 'face-cream' }).findings.filter((one) => one.kind !== 'wording-required');
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ kind: 'limit-uncertain', severity: 'decide', needs: ['purpose'], limit: '0.5' });
  });

  test('above both is certain, by the more lenient limit', () => {
    const found = judge([{ name: 'Salicylic Acid', percent: '2.01' }], { category: 'face-cream' }).findings.filter((one) => one.kind !== 'wording-required');
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ kind: 'limit-exceeded', severity: 'stop', limit: '2' });
  });

  test('stated as a preservative only its own limit counts', () => {
    expect(said(judge([{ name: 'Salicylic Acid', percent: '1', purpose: 'preservative' }], { category: 'face-cream' }))).toEqual(['limit-exceeded Salicylic Acid eu/annex-v/3']);
  });

  test('a substance with a free use stays uncertain however much there is', () => {
    expect(said(judge([{ name: 'Benzyl Alcohol', percent: '5' }]))).toEqual(['limit-uncertain Benzyl Alcohol eu/annex-v/34']);
  });
});

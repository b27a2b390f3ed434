import { expect, test } from 'vitest';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { gramsToPercent, percentToGrams, scaleBatch } from '#shared/product/scale.ts';

type Formula = ProductDraft['formula'];

function formulaOf(batch: string | null, ...lines: [string, 'g' | '%' | 'qs'][]): Formula {
  return {
    batchSize: batch === null ? null : { value: batch, unit: 'g' },
    phases: [{ id: 'p', name: 'A', steps: [], lines: lines.map(([amount, unit], index) => ({ id: `l${index}`, materialId: 'm', amount, unit })) }],
  };
}
const amounts = (formula: Formula | null): string[] | undefined => formula?.phases[0]!.lines.map(({ amount }) => amount);

test('grams and percent turn into each other', () => {
  expect(gramsToPercent('1.25', '500')).toBe('0.25');
  expect(gramsToPercent('1', '3')).toBe('33.333333333333');
  expect(percentToGrams('0.25', '500')).toBe('1.25');
  expect(gramsToPercent('1', '0')).toBeNull();
  expect(percentToGrams('', '500')).toBeNull();
});

test('another batch size scales the grams and leaves shares and the making-up line', () => {
  expect(amounts(scaleBatch(formulaOf('500', ['1.25', 'g'], ['2', '%'], ['', 'qs']), '1200'))).toEqual(['3', '2', '']);
});

test('without a batch size the sum of the grams is what is scaled', () => {
  expect(amounts(scaleBatch(formulaOf(null, ['30', 'g'], ['10', 'g']), '100'))).toEqual(['75', '25']);
});

test('nothing to scale from gives nothing', () => {
  expect(scaleBatch(formulaOf(null, ['2', '%']), '100')).toBeNull();
  expect(scaleBatch(formulaOf('100', ['2', 'g']), '0')).toBeNull();
});

import { expect, test } from 'vitest';
import { readFormulaBlock } from '#shared/dictionary/read-sheet.ts';

const bare = (text: string) => readFormulaBlock(text).lines.map(({ row: _row, ...line }) => line);

test('grams and percent columns under a heading, phases between', () => {
  expect(bare('Material\tg\t%\nPhase A\nWater\t347,5\t69.5\nGlycerin\t150\t30\nPhase B: Oils\nShea butter\t2,5\t0,5\nTotal\t500\t100')).toEqual([
    { name: 'Water', phase: 'A', grams: '347.5', percent: '69.5' },
    { name: 'Glycerin', phase: 'A', grams: '150', percent: '30' },
    { name: 'Shea butter', phase: 'B', grams: '2.5', percent: '0.5' },
  ]);
});
test('a phase column keeps its letter for the lines below', () => {
  expect(bare('Phase\tIngredient\t%\nA\tWater\t70\n\tGlycerin\t5\nB\tOlive oil\t25')).toEqual([
    { name: 'Water', phase: 'A', percent: '70' }, { name: 'Glycerin', phase: 'A', percent: '5' }, { name: 'Olive oil', phase: 'B', percent: '25' },
  ]);
});
test('units in the cells decide, to the gram', () => {
  expect(bare('Glycerin 5 g\nWater: 1.2 kg\nVitamin E - 250 mg\nParfum 0,5 %')).toEqual([
    { name: 'Glycerin', phase: '', grams: '5' }, { name: 'Water', phase: '', grams: '1200' }, { name: 'Vitamin E', phase: '', grams: '0.25' }, { name: 'Parfum', phase: '', percent: '0.5' },
  ]);
});
test('one line makes up the batch, two are a problem', () => {
  expect(bare('Water\tq.s. to 100\nGlycerin\t5 %')[0]).toEqual({ name: 'Water', phase: '', qs: true });
  expect(readFormulaBlock('Water\tq.s.\nTea\tq.s.').problems).toEqual([{ row: 2, message: 'Two lines make up the batch. Only one can; give the other an amount.' }]);
});
test('what cannot be read is said at its row', () => {
  expect(readFormulaBlock('Material\tg\nWater\tlots\nGlycerin\n12').problems.map(({ row }) => row)).toEqual([2, 3, 4]);
  expect(readFormulaBlock('Glycerin\t-5').problems).toEqual([{ row: 1, message: 'Glycerin: an amount cannot be below zero.' }]);
});

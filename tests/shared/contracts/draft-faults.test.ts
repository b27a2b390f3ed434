import { expect, test } from 'vitest';
import { findDraftFaults, LINES_LIMIT } from '#shared/contracts/draft-faults.ts';
import type { FormulaLine, Phase } from '#shared/contracts/product-draft.ts';

const line = (id: string, more: Partial<FormulaLine> = {}): FormulaLine => ({ id, materialId: 'm', amount: '1', unit: 'g', ...more });
const phase = (id: string, lines: FormulaLine[]): Phase => ({ id, name: id, lines, steps: [] });
const judge = (...phases: Phase[]) => findDraftFaults({ formula: { batchSize: null, phases } }).map(({ pointer }) => pointer);

test('an unfinished formula has no fault', () => {
  expect(judge()).toEqual([]);
  expect(judge(phase('a', []), phase('b', [line('1', { amount: '' })]))).toEqual([]);
});

test('one line alone makes up the batch, and has no amount of its own', () => {
  const makesUp = { unit: 'qs', amount: '' } as const;
  expect(judge(phase('a', [line('1', makesUp)]), phase('b', [line('2', makesUp)]))).toEqual(['/formula/phases/1/lines/0/unit']);
  expect(judge(phase('a', [line('1', { unit: 'qs', amount: '3' })]))).toEqual(['/formula/phases/0/lines/0/amount']);
});

test('marks are given once', () => {
  expect(judge(phase('a', [line('1'), line('1')]))).toEqual(['/formula/phases/0/lines/1/id']);
  expect(judge(phase('a', []), phase('a', []))).toEqual(['/formula/phases/1/id']);
});

test('a formula holds 500 lines over all phases and not one more', () => {
  const lines = (count: number, from: number) => Array.from({ length: count }, (_, index) => line(`l${from + index}`));
  expect(judge(phase('a', lines(LINES_LIMIT - 1, 0)), phase('b', lines(1, 1000)))).toEqual([]);
  expect(judge(phase('a', lines(LINES_LIMIT, 0)), phase('b', lines(2, 1000)))).toEqual(['/formula/phases/1/lines/0']);
});

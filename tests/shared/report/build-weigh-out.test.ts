import { expect, test } from 'vitest';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { buildWeighOut } from '#shared/report/build-weigh-out.ts';
import { decimal } from '#shared/kernel/rational.ts';

const document: FormulaDocument = {
  document: 'formula/1',
  product: { name: 'Test Wash', brand: '', category: 'body-wash', markets: ['EU'], flags: {}, facts: {}, claims: [], mayContain: [] },
  materials: ['water', 'citric'].map((id) => ({ id, tradeName: id, declareAs: 'ingredients' as const, composition: [], constituents: [] })),
  formula: { batchSize: '500', lines: [{ material: 'water', phase: 'Water', amount: '', unit: 'qs' }, { material: 'citric', phase: 'Cool-down', amount: '1.25', unit: 'g' }] },
};
const input = { house: 'Brackenmere Bathhouse', document, steps: {}, handling: {}, dataRelease: '2026-12' };

test('each target stands between limits of one percent, never less than 0.02 g, rounded inwards', () => {
  const lines = buildWeighOut(input).phases.flatMap((phase) => phase.lines.map(({ target, from, to }) => [target, from, to]));
  expect(lines).toEqual([
    ['498.75', '493.77', '503.73'],
    ['1.25', '1.23', '1.27'],
  ]);
});

test('the make-up line shows its sum', () => {
  expect(buildWeighOut(input).makesUp).toBe('makes up: 500 − 1.25 = 498.75 g');
});

test('another batch size scales every target exactly', () => {
  const model = buildWeighOut({ ...input, batchGrams: decimal('1200') });
  expect(model.phases.map((phase) => phase.total)).toEqual(['1197.00', '3.00']);
  expect(model.sum).toBe('1200.00');
});

test('a target below the least limit never asks for less than nothing', () => {
  const tiny = { ...document, formula: { lines: [{ material: 'citric', phase: 'A', amount: '0.01', unit: 'g' as const }] } };
  expect(buildWeighOut({ ...input, document: tiny }).phases[0]!.lines[0]).toMatchObject({ target: '0.01', from: '0.00', to: '0.03' });
});

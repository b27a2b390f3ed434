import { expect, test } from 'vitest';
import { findMaterialFaults } from '#shared/contracts/material-faults.ts';
import type { CompositionLine } from '#shared/contracts/materials.contract.ts';

const water: CompositionLine = { inci: 'Aqua', percent: '100' };
const judge = (composition: CompositionLine[], more: Partial<Parameters<typeof findMaterialFaults>[0]> = {}) =>
  findMaterialFaults({ composition, constituents: [], declareAs: 'ingredients', handling: {}, ...more }).map(({ pointer }) => pointer);

test('a whole composition has no fault', () => {
  expect(judge([water])).toEqual([]);
  expect(judge([{ inci: 'Aqua', min: '61', max: '65' }, { inci: 'Glycerin', min: '35', typical: '37', max: '39' }])).toEqual([]);
});

test('a line needs one figure or a range', () => {
  expect(judge([{ inci: 'Aqua' }])).toEqual(['/composition/0/percent']);
  expect(judge([{ inci: 'Aqua', percent: '5', min: '1', max: '9' }])).toEqual(['/composition/0/percent']);
  expect(judge([{ inci: 'Aqua', max: '9' }])).toEqual(['/composition/0/min']);
  expect(judge([{ inci: 'Aqua', min: '9' }])).toEqual(['/composition/0/max']);
});

test('a range runs upwards and holds its typical figure', () => {
  expect(judge([{ inci: 'Aqua', min: '9', max: '8.999' }])).toEqual(['/composition/0/max']);
  expect(judge([{ inci: 'Aqua', min: '9', max: '9' }])).toEqual([]);
  expect(judge([{ inci: 'Aqua', min: '5', typical: '9.01', max: '9' }])).toEqual(['/composition/0/typical']);
  expect(judge([{ inci: 'Aqua', min: '5', typical: '4.99', max: '9' }])).toEqual(['/composition/0/typical']);
});

test('parts may pass 100 % by the half percent of rounding, not by more', () => {
  expect(judge([water, { inci: 'Glycerin', percent: '0.5' }])).toEqual([]);
  expect(judge([water, { inci: 'Glycerin', percent: '0.500001' }])).toEqual(['/composition']);
  expect(judge([water, { inci: 'Glycerin', min: '0', max: '40' }])).toEqual([]);
});

test('a perfume needs no composition, anything else does', () => {
  expect(judge([], { declareAs: 'parfum' })).toEqual([]);
  expect(judge([])).toEqual(['/composition']);
});

test('constituents and the pH window are read the same way', () => {
  expect(judge([water], { constituents: [{ name: 'Linalool', min: '2', max: '1' }] })).toEqual(['/constituents/0/max']);
  expect(judge([water], { handling: { phFrom: '6', phTo: '5.9' } })).toEqual(['/handling/phTo']);
});

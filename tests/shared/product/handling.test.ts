import { expect, test } from 'vitest';
import type { Material } from '#shared/contracts/materials.contract.ts';
import type { Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import { judgeHandling, toCelsius, toFahrenheit } from '#shared/product/handling.ts';

const GUM = { id: 'gum', tradeName: 'Xanthan gum', handling: { heatLimitC: '50', phFrom: '4', phTo: '7', hydrateHours: '8', basis: 'common-practice' } } as unknown as Material;

function rules(step: Partial<Phase['steps'][number]>, pH?: string): string[] {
  const phase: Phase = { id: 'p', name: 'Water', lines: [{ id: 'l', materialId: 'gum', amount: '5', unit: 'g' }], steps: [{ id: 's', text: '', temperature: null, time: null, ...step }] };
  const draft = { facts: pH === undefined ? {} : { pH }, formula: { batchSize: null, phases: [phase] } } as unknown as ProductDraft;
  return judgeHandling(draft, [GUM]).map(({ rule, kind, severity }) => `${kind} ${severity} ${rule}`);
}

test.each([
  ['50', 'C', false],
  ['50.1', 'C', true],
  ['122', 'F', false],
  ['122.01', 'F', true],
  ['75', 'C', true],
] as const)('a step at %s °%s is over a limit of 50 °C: %s', (to, unit, isOver) => {
  expect(rules({ temperature: { to, unit } })).toEqual(isOver ? ['handling-limit decide handling-heat'] : []);
});

test.each([
  ['8', 'h', false],
  ['480', 'min', false],
  ['479', 'min', true],
  ['2', 'h', true],
] as const)('a hold of %s %s is too short for 8 h: %s', (value, unit, isShort) => {
  expect(rules({ time: { value, unit } })).toEqual(isShort ? ['handling-limit decide handling-hydration'] : []);
});

test.each([['4', false], ['7', false], ['7.1', true], ['3.99', true], [undefined, false]] as const)('pH %s is outside the window of 4 to 7: %s', (pH, isOutside) => {
  expect(rules({}, pH)).toEqual(isOutside ? ['handling-limit decide handling-ph'] : []);
});

test('degrees convert exactly', () => {
  expect(toFahrenheit('50')).toBe('122');
  expect(toFahrenheit('37.5')).toBe('99.5');
  expect(toCelsius('122')).toBe('50');
  expect(toCelsius('100')).toBe('37.777777777778');
  expect(toCelsius('warm')).toBeNull();
});

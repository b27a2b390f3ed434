import { describe, expect, test } from 'vitest';
import { addStep, moveStep, removeStep, writeStep } from '#src/features/process/recipes.ts';
import { readTemperature, readTime } from '#src/features/process/read-step.ts';
import { makeDraft } from '../fixtures.ts';

describe('a step as it is typed', () => {
  test.each([
    ['70', { from: '70', unit: 'C' }],
    ['70 to 75', { from: '70', to: '75', unit: 'C' }],
    ['158–167 °F', { from: '158', to: '167', unit: 'F' }],
    ['', null],
  ])('"%s" is a temperature', (typed, temperature) => expect(readTemperature(typed, 'C')).toEqual({ temperature }));
  test.each([
    ['hold 8 h', { value: '8', unit: 'h' }],
    ['20 min', { value: '20', unit: 'min' }],
    ['1,5 hours', { value: '1.5', unit: 'h' }],
    ['20', { value: '20', unit: 'min' }],
  ])('"%s" is a time', (typed, time) => expect(readTime(typed)).toEqual({ time }));
  test('what is neither says how to write it', () => {
    expect(readTemperature('warm', 'C')).toEqual({ fault: 'Write a temperature such as 70 or 70 to 75.' });
    expect(readTemperature('75 to 70', 'C')).toEqual({ fault: 'The second temperature is below the first.' });
    expect(readTime('overnight')).toEqual({ fault: 'Write a time such as 20 min or 8 h.' });
  });
});

test('steps are added, written, moved within their phase and removed', () => {
  const two = addStep('a', 's2')(writeStep('a', 's1', { text: 'Heat' })(addStep('a', 's1')(makeDraft())));
  const ids = (draft: typeof two) => draft.formula.phases[0]!.steps.map((step) => step.id);
  expect(ids(two)).toEqual(['s1', 's2']);
  expect(two.formula.phases[0]!.steps[0]!.text).toBe('Heat');
  expect(ids(moveStep('a', 's2', -1)(two))).toEqual(['s2', 's1']);
  expect(ids(moveStep('a', 's2', 1)(two))).toEqual(['s1', 's2']);
  expect(ids(removeStep('a', 's1')(two))).toEqual(['s2']);
});

import { describe, expect, test } from 'vitest';
import { addPasted, movePhase, previewScale, removePhase, scaleTo } from '#src/features/formula/phase-recipes.ts';
import { readNumber } from '#src/features/formula/read-number.ts';
import { fixMakeUp, keepGrams, makeUpWith, moveLine, setGrams, setPercent, stepLine, takePasted } from '#src/features/formula/recipes.ts';
import { totalWords } from '#src/features/formula/total-row.tsx';
import { contradictsPasted, slipOfPasted, weighFormula } from '#src/features/formula/weigh.ts';
import { toDecimal } from '#shared/kernel/rational.ts';
import { line, makeDraft } from '../fixtures.ts';

const order = (draft: ReturnType<typeof makeDraft>) => draft.formula.phases.map((phase) => phase.lines.map((each) => each.id).join(' '));
const find = (draft: ReturnType<typeof makeDraft>, id: string) => draft.formula.phases.flatMap((phase) => phase.lines).find((each) => each.id === id);

describe('a typed figure', () => {
  test.each([['12.5', '12.5'], ['12,5', '12.5'], ['.5', '0.5'], ['5.', '5'], ['1 250 g', '1250'], ['1.250,5', '1250.5'], ['007', '7'], ['', '']])('"%s" is read as %s', (typed, text) => {
    expect(readNumber(typed, 'g')).toMatchObject({ ok: true, text });
  });
  test('a comma is read as a point and says so', () => {
    expect(readNumber('12,5', 'g')).toEqual({ ok: true, text: '12.5', note: 'Read as 12.5.' });
  });
  test.each([['-4', 'negative'], ['abc', 'not a number'], ['1e5', 'not a number'], ['99999999999', 'thousand tonnes']])('"%s" is refused in plain words', (typed, words) => {
    const read = readNumber(typed, 'g');
    expect(read.ok ? '' : read.why).toContain(words);
  });
  test('a share over 100 is refused', () => {
    expect(readNumber('100.01', '%').ok).toBe(false);
    expect(readNumber('100', '%').ok).toBe(true);
  });
});

describe('grams and percent', () => {
  test('percent of a gram line is written as grams of the batch, exactly', () => {
    expect(find(setPercent('gum', '1.3')(makeDraft()), 'gum')).toMatchObject({ amount: '6.5', unit: 'g' });
  });
  test('grams of a percent line stay percent where that says the same, else become grams', () => {
    const draft = makeDraft();
    draft.formula.phases[0]!.lines[1] = line('gum', 2, '1', '%');
    expect(find(setGrams('gum', '6.5')(draft), 'gum')).toMatchObject({ amount: '1.3', unit: '%' });
    const thirds = { ...draft, formula: { ...draft.formula, batchSize: { value: '300', unit: 'g' as const } } };
    expect(find(setGrams('gum', '1')(thirds), 'gum')).toMatchObject({ amount: '1', unit: 'g' });
  });
  test('the make-up line takes what is left of the batch', () => {
    const { lines, total } = weighFormula(makeDraft().formula);
    expect(lines.get('water')!.grams).toBe('403.5');
    expect(toDecimal(total)).toBe('500');
  });
  test('another line makes up the batch and the former one keeps its grams', () => {
    const draft = makeUpWith('apg')(makeDraft());
    expect(find(draft, 'water')).toMatchObject({ amount: '403.5', unit: 'g' });
    expect(find(draft, 'apg')).toMatchObject({ amount: '', unit: 'qs' });
    expect(find(fixMakeUp('apg')(draft), 'apg')).toMatchObject({ amount: '90', unit: 'g' });
  });
  test('a batch that is exceeded says by how much', () => {
    const weighed = weighFormula(setGrams('apg', '900')(makeDraft()).formula);
    expect(weighed.isOff).toBe(true);
    expect(totalWords(weighed, 'Purified water')).toBe('406.5 g over the batch of 500 g: nothing is left for Purified water');
  });
  test('a gap of exactly 0.1 % of the batch is within tolerance, a hair more is not', () => {
    const of = (grams: string) => weighFormula({ batchSize: { value: '500', unit: 'g' }, phases: [{ id: 'a', name: 'A', steps: [], lines: [line('x', 2, grams)] }] }).isOff;
    expect(of('499.5')).toBe(false);
    expect(of('499.4999')).toBe(true);
  });
});

describe('a pasted percent against the grams', () => {
  const oil = () => weighFormula(makeDraft().formula).lines.get('oil')!;
  test('3 % beside 1.5 g in 500 g is questioned as a point one place off', () => {
    expect(contradictsPasted(oil())).toBe(true);
    expect(slipOfPasted(oil())).toBe('point-right');
  });
  test('keeping the grams settles it; taking 3 % writes 15 g', () => {
    expect(find(keepGrams('oil')(makeDraft()), 'oil')).toMatchObject({ amount: '1.5', pastedPercent: undefined });
    expect(find(takePasted('oil', '3')(makeDraft()), 'oil')).toMatchObject({ amount: '15', pastedPercent: undefined });
  });
  test('a percent that only was rounded is no contradiction', () => {
    const draft = makeDraft();
    draft.formula.phases[1]!.lines[1] = { ...line('oil', 4, '1.27'), pastedPercent: '0.3' };
    expect(contradictsPasted(weighFormula(draft.formula).lines.get('oil')!)).toBe(false);
  });
});

describe('order', () => {
  test('a line steps over the edge of its phase', () => {
    expect(order(stepLine('gum', 1)(makeDraft()))).toEqual(['water', 'gum apg oil']);
    expect(order(stepLine('apg', -1)(makeDraft()))).toEqual(['water gum apg', 'oil']);
    expect(order(stepLine('water', -1)(makeDraft()))).toEqual(['water gum', 'apg oil']);
  });
  test('a line is dropped at a place of another phase', () => {
    expect(order(moveLine('gum', 'b', 1)(makeDraft()))).toEqual(['water', 'apg gum oil']);
  });
  test('phases move, and a removed one leaves its lines to its neighbour', () => {
    expect(order(movePhase('b', -1)(makeDraft()))).toEqual(['apg oil', 'water gum']);
    expect(order(removePhase('b')(makeDraft()))).toEqual(['water gum apg oil']);
    expect(order(removePhase('a')(makeDraft()))).toEqual(['water gum apg oil']);
  });
  test('pasted lines join the phase of that name or make one', () => {
    const draft = addPasted([{ id: 'x', name: 'water', lines: [line('n1', 2, '1')] }, { id: 'y', name: 'Oil', lines: [line('n2', 4, '1')] }])(makeDraft());
    expect(draft.formula.phases.map((phase) => phase.name)).toEqual(['Water', 'Cool-down', 'Oil']);
    expect(order(draft)).toEqual(['water gum n1', 'apg oil', 'n2']);
  });
});

test('scaling writes every gram line in proportion and leaves the make-up line', () => {
  const draft = scaleTo('750')(makeDraft());
  expect(['water', 'gum', 'apg', 'oil'].map((id) => find(draft, id)!.amount)).toEqual(['', '7.5', '135', '2.25']);
  expect(draft.formula.batchSize?.value).toBe('750');
  expect(previewScale(makeDraft(), '0')).toBeNull();
});

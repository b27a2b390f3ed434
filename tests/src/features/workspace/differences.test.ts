import { describe, expect, test } from 'vitest';
import { setGrams, stepLine, addLine, removeLine } from '#src/features/formula/recipes.ts';
import { compareDrafts, mergeDrafts } from '#src/features/workspace/differences.ts';
import { line, makeDraft, nameOf } from '../fixtures.ts';

const base = makeDraft();
const titles = (mine = base, theirs = base) => compareDrafts(base, mine, theirs, nameOf).map((each) => `${each.title}: ${each.mine} | ${each.theirs} (${each.changedBy})`);
const amount = (draft: typeof base, id: string) => draft.formula.phases.flatMap((phase) => phase.lines).find((each) => each.id === id)?.amount;

test('equal drafts have no difference', () => {
  expect(titles()).toEqual([]);
});

test('each changed point is told in words, with who changed it', () => {
  const mine = setGrams('gum', '6')(base);
  const theirs = { ...setGrams('gum', '7')(base), netContent: { value: '300', unit: 'ml' as const } };
  expect(titles(mine, theirs)).toEqual(['Net content: 250 ml | 300 ml (theirs)', 'Xanthan gum: 6 g | 7 g (both)']);
});

describe('merging', () => {
  test('takes from each what only that one changed', () => {
    const mine = setGrams('gum', '6')(base);
    const theirs = { ...setGrams('apg', '80')(base), brand: 'Theirs' };
    const merged = mergeDrafts(mine, theirs, compareDrafts(base, mine, theirs, nameOf), {});
    expect([amount(merged, 'gum'), amount(merged, 'apg'), merged.brand]).toEqual(['6', '80', 'Theirs']);
  });
  test('where both changed a point the choice decides', () => {
    const mine = setGrams('gum', '6')(base);
    const theirs = setGrams('gum', '7')(base);
    const differences = compareDrafts(base, mine, theirs, nameOf);
    expect(amount(mergeDrafts(mine, theirs, differences, {}), 'gum')).toBe('6');
    expect(amount(mergeDrafts(mine, theirs, differences, { 'line.gum': 'theirs' }), 'gum')).toBe('7');
  });
  test('a line added by one and a line removed by the other both stand', () => {
    const mine = addLine('b', line('new', 2, '1'))(base);
    const theirs = removeLine('oil')(base);
    const merged = mergeDrafts(mine, theirs, compareDrafts(base, mine, theirs, nameOf), {});
    expect(merged.formula.phases.flatMap((phase) => phase.lines.map((each) => each.id))).toEqual(['water', 'gum', 'apg', 'new']);
  });
  test('an order changed by the other is kept beside amounts changed here', () => {
    const mine = setGrams('gum', '6')(base);
    const theirs = stepLine('gum', -1)(base);
    const merged = mergeDrafts(mine, theirs, compareDrafts(base, mine, theirs, nameOf), {});
    expect(merged.formula.phases[0]!.lines.map((each) => each.id)).toEqual(['gum', 'water']);
    expect(amount(merged, 'gum')).toBe('6');
  });
});

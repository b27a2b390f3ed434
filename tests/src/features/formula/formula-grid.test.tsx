// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useReducer } from 'react';
import { afterEach, expect, test, vi } from 'vitest';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { FormulaGrid, type FormulaGridProps } from '#src/features/formula/formula-grid.tsx';
import { beginHistory, historyReducer, type History, type HistoryAction } from '#src/features/workspace/history.ts';
import { makeDraft, nameOf } from '../fixtures.ts';

afterEach(cleanup);

function Desk({ suspects = [], onPastEnd = () => undefined }: Partial<Pick<FormulaGridProps, 'suspects' | 'onPastEnd'>>) {
  const [history, dispatch] = useReducer<History<ProductDraft>, ProductDraft, [HistoryAction<ProductDraft>]>(historyReducer, makeDraft(), beginHistory);
  return (
    <>
      <button type="button" onClick={() => dispatch({ type: 'undo' })}>Undo</button>
      <button type="button" onClick={() => dispatch({ type: 'redo' })}>Redo</button>
      <FormulaGrid
        draft={history.present}
        nameOf={nameOf}
        suspects={suspects}
        lit={new Map([[1, 'gives 1 %']])}
        onChange={(recipe, join) => dispatch({ type: 'change', recipe, join })}
        onSettle={() => dispatch({ type: 'settle' })}
        onLight={() => undefined}
        onNote={() => undefined}
        onOpenMaterial={() => undefined}
        onPastEnd={onPastEnd}
      />
    </>
  );
}
const field = (name: string) => screen.getByLabelText<HTMLInputElement>(name);
const rows = () => screen.getAllByRole('row').map((row) => row.textContent ?? '');

test('grams and percent change each other, and the make-up line follows', async () => {
  const user = userEvent.setup();
  render(<Desk />);
  await user.clear(field('Xanthan gum, grams'));
  await user.type(field('Xanthan gum, grams'), '10');
  expect(field('Xanthan gum, percent').value).toBe('2');
  expect(screen.getByText('398.5')).toBeTruthy();
  await user.clear(field('Xanthan gum, percent'));
  await user.type(field('Xanthan gum, percent'), '3');
  expect(field('Xanthan gum, grams').value).toBe('15');
});

test('Enter and the arrows walk the columns; after the last line Enter asks for the next material', async () => {
  const user = userEvent.setup();
  const onPastEnd = vi.fn();
  render(<Desk onPastEnd={onPastEnd} />);
  await user.click(field('Xanthan gum, grams'));
  await user.keyboard('{Enter}');
  expect(document.activeElement).toBe(field('Mild glucoside, grams'));
  await user.keyboard('{ArrowRight}');
  expect(document.activeElement).toBe(field('Mild glucoside, percent'));
  await user.keyboard('{ArrowDown}');
  expect(document.activeElement).toBe(field('Lavender oil, percent'));
  await user.keyboard('{Enter}');
  expect(onPastEnd).toHaveBeenCalledOnce();
});

test('what is no number is said at the field, kept there, and leaves the formula alone', async () => {
  const user = userEvent.setup();
  render(<Desk />);
  await user.clear(field('Xanthan gum, grams'));
  await user.type(field('Xanthan gum, grams'), '-4');
  expect(screen.getByRole('alert').textContent).toBe('An amount cannot be negative.');
  expect(field('Xanthan gum, grams').value).toBe('-4');
  await user.keyboard('{Escape}');
  expect(field('Xanthan gum, grams').value).toBe('5');
});

test('typing in one field is one step back, and can be done again', async () => {
  const user = userEvent.setup();
  render(<Desk />);
  await user.clear(field('Xanthan gum, grams'));
  await user.type(field('Xanthan gum, grams'), '12.5');
  await user.click(screen.getByText('Undo'));
  expect(field('Xanthan gum, grams').value).toBe('5');
  await user.click(screen.getByText('Redo'));
  expect(field('Xanthan gum, grams').value).toBe('12.5');
});

test('a pasted percent that contradicts the grams is a question with two answers', async () => {
  const user = userEvent.setup();
  render(<Desk />);
  expect(screen.getByText(/The pasted sheet says 3 % here; 1.5 g in 500 g is 0.3 %/)).toBeTruthy();
  await user.click(screen.getByText('Take 3 %'));
  expect(field('Lavender oil, grams').value).toBe('15');
  expect(screen.queryByText(/The pasted sheet says/)).toBeNull();
});

test('a slip that would close the gap is offered at its line and under the total', async () => {
  const user = userEvent.setup();
  render(<Desk suspects={[{ line: 2, written: '900', perhaps: '90', slip: 'point-shifted' }]} />);
  await user.clear(field('Mild glucoside, grams'));
  await user.type(field('Mild glucoside, grams'), '900');
  const foot = screen.getByText('Total').closest('tfoot')!;
  expect(within(foot).getByRole('status').textContent).toContain('406.5 g over the batch of 500 g');
  expect(within(foot).getByText('Mild glucoside: 900, take 90 g')).toBeTruthy();
  await user.click(screen.getByText('Take 90 g'));
  expect(field('Mild glucoside, grams').value).toBe('90');
  expect(within(foot).getByRole('status').textContent).toBe('Purified water makes up the rest');
});

test('Alt with an arrow moves a line, also into the next phase', async () => {
  const user = userEvent.setup();
  render(<Desk />);
  await user.click(field('Xanthan gum, grams'));
  await user.keyboard('{Alt>}{ArrowDown}{/Alt}');
  const told = rows();
  expect(told.findIndex((row) => row.includes('Xanthan gum'))).toBeGreaterThan(told.findIndex((row) => row.includes('Cool-down')));
});

test('a lit line says what it gives', () => {
  render(<Desk />);
  expect(screen.getByText('gives 1 %')).toBeTruthy();
});

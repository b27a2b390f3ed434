// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, test } from 'vitest';
import { EntryList } from '#src/features/declaration/entry-list.tsx';
import type { ListedEntry } from '#src/features/declaration/entry-sum.tsx';
import { chooseOrder, placeKey, resetOrder } from '#src/features/declaration/free-order.ts';
import { PrintedList } from '#src/features/declaration/printed-list.tsx';
import { makeDraft } from '../fixtures.ts';

afterEach(cleanup);

function entry(name: string, typical: string, zone: ListedEntry['zone'], over: Partial<ListedEntry> = {}): ListedEntry {
  const share = { min: typical, typical, max: typical };
  return {
    key: name, name, inci: name, zone, exact: share, isUnsure: false, isFree: zone === 'free' || zone === 'allergen', members: [], why: [`Why ${name}.`], citation: 'Article 19(1)(g)',
    sources: [{ materialId: 'm', name: 'A material', grams: '75', ofMaterial: share, share, isInside: false }], ...over,
  };
}
/** 75 g of a surfactant with 4 to 7 % salt in 500 g: 0.6 to 1.05 %, worked by hand. */
const SALT = entry('Sodium Chloride', '0.87', 'free', {
  isUnsure: true,
  exact: { min: '0.6', typical: '0.87', max: '1.05' },
  sources: [{ materialId: 'm', name: 'Amphoteric surfactant', grams: '75', ofMaterial: { min: '4', typical: '5.8', max: '7' }, share: { min: '0.6', typical: '0.87', max: '1.05' }, isInside: false }],
});
const ENTRIES = [entry('Aqua', '78', 'ordered'), entry('Phenoxyethanol', '0.9', 'free'), SALT, entry('Linalool', '0.0945', 'allergen')];

describe('the chosen order', () => {
  test('a key takes its place and the others close up', () => {
    expect(placeKey(['a', 'b', 'c'], 'c', 0)).toEqual(['c', 'a', 'b']);
    expect(placeKey(['a', 'b', 'c'], 'a', 9)).toEqual(['b', 'c', 'a']);
  });
  test('is kept per market and can be let go', () => {
    const chosen = chooseOrder('US', ['x'])(chooseOrder('EU', ['b', 'a'])(makeDraft()));
    expect(chosen.declaration.freeOrder).toEqual({ EU: ['b', 'a'], US: ['x'] });
    expect(resetOrder('EU')(chosen).declaration.freeOrder).toEqual({ US: ['x'] });
  });
});

function Moving() {
  const [order, setOrder] = useState(['Phenoxyethanol', 'Sodium Chloride', 'Linalool']);
  const entries = [ENTRIES[0]!, ...order.map((key) => ENTRIES.find((each) => each.key === key)!)];
  return <EntryList entries={entries} totalGrams="500" freeLine="below 1 %" lit={new Set()} onLight={() => undefined} onMove={(key, place) => setOrder(placeKey(order, key, place))} />;
}
const names = () => screen.getAllByRole('button', { expanded: false }).map((button) => button.textContent);

test('free entries move by button and by Alt with an arrow; ordered ones cannot', async () => {
  const user = userEvent.setup();
  render(<Moving />);
  await user.click(screen.getByLabelText('Linalool: earlier'));
  expect(names()).toEqual(['1Aqua', '2Phenoxyethanol', '3Linalool', '4Sodium Chloride']);
  screen.getByText('Linalool').closest('button')!.focus();
  await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
  expect(names()).toEqual(['1Aqua', '2Linalool', '3Phenoxyethanol', '4Sodium Chloride']);
  await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
  expect(names()[0]).toBe('1Aqua');
  expect(screen.queryByLabelText('Aqua: later')).toBeNull();
});

test('an entry opens to its arithmetic', async () => {
  const user = userEvent.setup();
  render(<Moving />);
  await user.click(screen.getByText('Sodium Chloride'));
  const table = screen.getByRole('table');
  expect(within(table).getByText('Amphoteric surfactant').closest('tr')!.textContent).toBe('Amphoteric surfactant75 g4 to 7 %0.6 to 1.05 %');
  expect(table.textContent).toContain('0.6 to 1.05 %, usually 0.87 %');
});

test('the printed list reads as it will be printed, dots doubtful names and walks by arrows', async () => {
  const user = userEvent.setup();
  render(<PrintedList heading="Ingredients" entries={ENTRIES} totalGrams="500" lit={new Set()} onLight={() => undefined} market="EU" label="Ingredients for EU" />);
  expect(screen.getByRole('group', { name: 'Ingredients for EU' }).textContent).toBe('64 mmIngredients: Aqua, Phenoxyethanol, Sodium Chloride, Linalool');
  expect(screen.getByRole('button', { name: 'Sodium Chloride' }).className).toContain('unsure');
  screen.getByRole('button', { name: 'Aqua' }).focus();
  await user.keyboard('{ArrowRight}');
  expect(document.activeElement?.textContent).toBe('Phenoxyethanol');
});

test.each([['EU', ', [+/- CI 77491]'], ['US', '. May contain: CI 77491']])('shades close the list as %s prints them', (market, words) => {
  render(<PrintedList heading="Ingredients" entries={[ENTRIES[0]!, entry('CI 77491', '0', 'may-contain')]} totalGrams="500" lit={new Set()} onLight={() => undefined} market={market} label="List" />);
  expect(screen.getByRole('group').textContent).toContain(`Aqua${words}`);
});

// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listPictures, type Picture } from '#shared/contracts/pictures.contract.ts';
import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import { LabelStudio } from '#src/features/labels/label-studio.tsx';
import { FakeServer } from '#tests/support/fake-server.ts';
import { uuid } from '../../fixtures.ts';
import { bodyWash, listOf } from '#tests/shared/artwork/samples.ts';

beforeEach(() => {
  vi.stubGlobal('CSS', { escape: (text: string) => text });
  new FakeServer().on(listPictures, () => ({ items: [SPRIG] }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

const label: LabelSettings = {
  container: { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' }, bleedMm: '3', languages: ['en'], market: 'EU',
  barcode: { symbology: 'EAN-13', digits: '9521234567899' }, press: { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' }, template: 'galley', ink: 'juniper',
};
const draft: ProductDraft = {
  name: bodyWash.name, brand: bodyWash.brand, category: 'body-wash', markets: ['EU'], placedOnMarket: null, availableOn: null, flags: {}, facts: {}, readyForUse: null,
  netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: 12 }, claims: [],
  particulars: { responsiblePerson: { EU: bodyWash.responsiblePerson! }, usContact: '', canadaContact: '', countryOfOrigin: '', batchCode: 'BW-0412', function: 'Body wash', directions: bodyWash.directions, warnings: [] },
  mayContain: [], formula: { batchSize: null, phases: [] }, declaration: { freeOrder: {}, joinedNames: false }, label,
};

const SPRIG: Picture = { id: uuid(7), name: 'Sprig', kind: 'drawing', width: 1000, height: 500, shapes: [{ steps: [['M', 0, 0], ['L', 1000, 0], ['L', 500, 500], ['Z']], cmyk: [90, 45, 70, 45], screen: '#084438' }], bytes: 900, addedAt: '2026-11-30T10:00:00.000Z', addedBy: 'Piet Lund' };

let now: LabelSettings;
const joins: (string | undefined)[] = [];
function Desk({ isLocked = false }: { isLocked?: boolean }) {
  const [current, setCurrent] = useState(draft);
  now = current.label;
  const result = { declaration: { heading: 'Ingredients', text: `Ingredients: ${listOf(10)}`, entries: [1] }, requiredWording: [] };
  return <LabelStudio draft={current} result={result} isLocked={isLocked} onChange={(next, join) => { joins.push(join); setCurrent({ ...current, label: next }); }} onPressFile={() => Promise.resolve()} />;
}

async function compose(isLocked = false) {
  joins.length = 0;
  const person = userEvent.setup();
  render(<QueryClientProvider client={new QueryClient()}><Desk isLocked={isLocked} /></QueryClientProvider>);
  await person.click(screen.getByRole('button', { name: 'Compose by hand' }));
  const list = within(screen.getByRole('list', { name: 'On the label' }));
  return { person, list, choose: (name: RegExp) => person.click(list.getByRole('button', { name })), board: screen.getByRole('region', { name: /Label, unrolled/ }) };
}

test('everything on the label stands in the list, as the template’s own', async () => {
  const { list } = await compose();
  expect(list.getAllByRole('button').map((button) => button.textContent)).toEqual(expect.arrayContaining(['Brandtemplate', 'Product nametemplate', 'Ingredientstemplate', 'Barcodetemplate']));
});

test('arrow keys on the label move what is chosen by a tenth of a millimetre, with Shift by one', async () => {
  const { person, choose, board, list } = await compose();
  await choose(/^Brand/);
  board.focus();
  await person.keyboard('{ArrowRight}');
  const from = now.byHand!.freed[0]!.frame;
  expect(now.byHand!.freed[0]!.element).toBe('brand');
  await person.keyboard('{ArrowRight}{Shift>}{ArrowDown}{/Shift}');
  expect(now.byHand!.freed[0]!.frame).toEqual({ ...from, x: from.x + 100, y: from.y + 1000 });
  expect(list.getByRole('button', { name: /^Brand/ }).textContent).toBe('Brandby hand');
  // One step of the history for the whole walk.
  expect(new Set(joins)).toEqual(new Set(['hand:move:brand']));
});

test('Alt with an arrow changes the size, Delete takes it back to the template', async () => {
  const { person, choose, board } = await compose();
  await choose(/^Ingredients/);
  board.focus();
  await person.keyboard('{Alt>}{ArrowDown}{/Alt}');
  const { height } = now.byHand!.freed[0]!.frame;
  await person.keyboard('{Alt>}{Shift>}{ArrowDown}{/Shift}{/Alt}');
  expect(now.byHand!.freed[0]!.frame.height).toBe(height + 1000);
  await person.keyboard('{Delete}');
  expect(now.byHand).toBeUndefined();
});

test('figures are typed in millimetres, and a wrong one is said at its field', async () => {
  const { person, choose } = await compose();
  await choose(/^Brand/);
  const left = screen.getByLabelText('From left, mm');
  await person.clear(left);
  await person.type(left, '12,5{Enter}');
  expect(now.byHand!.freed[0]!.frame.x).toBe(12_500);
  await person.clear(left);
  await person.type(left, '12 5');
  expect(screen.getByText('Write a figure like 12.5.')).toBeTruthy();
  await person.tab();
  expect(now.byHand!.freed[0]!.frame.x).toBe(12_500);
});

test('a locked thing keeps its place until it is unlocked', async () => {
  const { person, choose, board } = await compose();
  await choose(/^Brand/);
  await person.click(screen.getByRole('button', { name: 'Lock' }));
  const { frame } = now.byHand!.freed[0]!;
  board.focus();
  await person.keyboard('{ArrowRight}');
  expect(now.byHand!.freed[0]!.frame).toEqual(frame);
  await person.click(screen.getByRole('button', { name: 'Unlock' }));
  board.focus();
  await person.keyboard('{ArrowRight}');
  expect(now.byHand!.freed[0]!.frame.x).toBe(frame.x + 100);
});

test('two are lined up with each other and grouped, and move together then', async () => {
  const { person, choose, list, board } = await compose();
  await choose(/^Directions/);
  await person.keyboard('{Shift>}');
  await person.click(list.getByRole('button', { name: /^Name and address/ }));
  await person.keyboard('{/Shift}');
  await person.click(screen.getByRole('button', { name: 'Left' }));
  const [a, b] = now.byHand!.freed;
  expect(a!.frame.x).toBe(b!.frame.x);
  await person.click(screen.getByRole('button', { name: 'Group' }));
  board.focus();
  await person.keyboard('{Escape}');
  await choose(/^Directions/);
  board.focus();
  await person.keyboard('{Shift>}{ArrowRight}{/Shift}');
  expect(now.byHand!.freed.map(({ frame }) => frame.x)).toEqual([a!.frame.x + 1000, b!.frame.x + 1000]);
});

test('words of one’s own are added, written, copied and removed', async () => {
  const { person } = await compose();
  await person.click(screen.getByRole('button', { name: 'Text' }));
  const words = screen.getByLabelText('Words');
  await person.clear(words);
  await person.type(words, 'Stirred by hand');
  expect(now.byHand!.added).toMatchObject([{ kind: 'text', text: 'Stirred by hand' }]);
  await person.click(screen.getByRole('button', { name: 'Copy' }));
  expect(now.byHand!.added).toHaveLength(2);
  await person.click(screen.getByRole('button', { name: 'Remove' }));
  expect(now.byHand!.added).toHaveLength(1);
});

test('on a label that may not be changed nothing moves', async () => {
  const { person, choose, board } = await compose(true);
  await choose(/^Brand/);
  board.focus();
  await person.keyboard('{ArrowRight}{Delete}');
  expect(now.byHand).toBeUndefined();
  expect(screen.getByLabelText('From left, mm')).toHaveProperty('disabled', true);
});

test('a picture of the house is put on the label at a press, whole and in its proportions', async () => {
  const { person } = await compose();
  await person.click(await screen.findByRole('button', { name: 'Sprig' }));
  const [added] = now.byHand!.added;
  expect(added).toMatchObject({ kind: 'picture', picture: SPRIG.id });
  expect(added!.frame.width).toBe(2 * added!.frame.height);
});

test('the figures of what stands in the template are shown, and an emptied size fills the frame', async () => {
  const { person, choose } = await compose();
  await choose(/^Product name/);
  const size = screen.getByLabelText<HTMLInputElement>('Size, pt');
  expect(Number(size.value)).toBeGreaterThan(8);
  await person.clear(size);
  await person.type(size, '{Enter}');
  expect(now.byHand!.freed[0]).toMatchObject({ element: 'name' });
  expect(now.byHand!.freed[0]!.style.size).toBeUndefined();
});

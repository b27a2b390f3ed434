// @vitest-environment jsdom
import { cleanup, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listDictionary } from '#shared/contracts/dictionary.contract.ts';
import { getInventory, removeInventory, type InventoryState } from '#shared/contracts/inventory.contract.ts';
import { FakeServer, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';

const LAST: NonNullable<InventoryState['last']> = {
  fileName: 'export.tsv', startedAt: '2026-12-01T09:00:00.000Z', startedBy: 'Maud Pellow', isRunning: false,
  total: 5, done: 5, added: 2, updated: 1, unchanged: 0, joined: 2, skipped: [{ line: 9, reason: 'It has no name.' }], remarks: [],
};
const ENTRY = { id: 'x', inci: 'FENWORT OIL', cas: [], ec: [], functions: ['emollient'], names: {}, synonyms: [], commonNames: [], properties: [], source: '', origin: 'inventory' as const };

let server: FakeServer;
beforeEach(() => {
  server = new FakeServer().on(listDictionary, ({ query }) => ({ items: query.get('from') === 'inventory' ? [ENTRY] : [], total: 1, page: 1, pageSize: 50, functions: [] }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('an owner reads what was taken over and which lines were left out, and removes it again', async () => {
  signedIn(server, ['owner']).on(getInventory, () => ({ names: 3, last: LAST })).on(removeInventory, () => ({ names: 0, last: null }));
  openRoom('/dictionary');
  expect(await screen.findByText(/3 names from the inventory/)).toBeTruthy();
  expect(screen.getByText('Line 9: It has no name.')).toBeTruthy();
  await userEvent.click(screen.getByRole('button', { name: 'Remove the names' }));
  await userEvent.click(await screen.findByRole('button', { name: 'Take away' }));
  expect(await screen.findByText('Take over an export')).toBeTruthy();
});

test('progress is shown while the work runs, and no second export can be sent', async () => {
  signedIn(server, ['owner']).on(getInventory, () => ({ names: 2, last: { ...LAST, isRunning: true, done: 2 } }));
  openRoom('/dictionary');
  expect((await screen.findByRole('progressbar')).getAttribute('aria-valuenow')).toBe('2');
  expect(screen.queryByText('Take over a newer export')).toBeNull();
});

test('who is no owner is offered nothing to take over', async () => {
  signedIn(server, ['formulator']).on(getInventory, () => ({ names: 3, last: LAST }));
  openRoom('/dictionary');
  expect(await screen.findByText(/3 names from the inventory/)).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Remove the names' })).toBeNull();
  expect(screen.queryByText('Take over a newer export')).toBeNull();
});

test('names from the inventory are marked as not curated', async () => {
  signedIn(server).on(getInventory, () => ({ names: 1, last: LAST }));
  openRoom('/dictionary?from=inventory');
  expect(await screen.findByText('FENWORT OIL')).toBeTruthy();
  expect(screen.getAllByText('from the inventory, not curated').length).toBeGreaterThan(1);
});

// @vitest-environment jsdom
import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { getHouse, updateHouse, type House } from '#shared/contracts/house.contract.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';
import { uuid } from '../fixtures.ts';

const HOUSE: House = {
  id: uuid(70), version: 3, name: 'Brackenmere Bathhouse', brand: 'Brackenmere',
  responsiblePerson: { EU: { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' } },
  usContact: '', canadaContact: '', countryOfOrigin: 'Exampleland', temperatureUnit: 'C',
  members: [{ personId: uuid(71), name: 'Maud Pellow', email: 'maud@brackenmere.example', roles: ['owner', 'formulator'] }],
};

let server: FakeServer;
beforeEach(() => {
  server = new FakeServer().on(getHouse, () => HOUSE);
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('an owner changes what the house prints, and empty parties are not sent', async () => {
  signedIn(server, ['owner']).on(updateHouse, ({ body }) => ({ ...HOUSE, ...(body as object), version: 4 }));
  openRoom('/house');
  const brand = await screen.findByLabelText('Brand, as printed');
  const save = screen.getByRole('button', { name: 'Save' });
  expect(save).toHaveProperty('disabled', true);
  await userEvent.clear(brand);
  await userEvent.type(brand, 'Brackenmere & Daughters');
  await userEvent.click(save);
  expect(await screen.findByText('The house is saved.')).toBeTruthy();
  expect(server.sent(updateHouse)).toEqual([expect.objectContaining({ brand: 'Brackenmere & Daughters', version: 3, responsiblePerson: HOUSE.responsiblePerson })]);
});

test('a name left empty is refused at its field and nothing is sent', async () => {
  signedIn(server, ['owner']);
  openRoom('/house');
  const name = await screen.findByLabelText('Name of the house');
  await userEvent.clear(name);
  await userEvent.click(screen.getByRole('button', { name: 'Save' }));
  expect(name.getAttribute('aria-invalid')).toBe('true');
  expect(document.getElementById(name.getAttribute('aria-describedby')!.split(' ').at(-1)!)!.textContent).not.toBe('');
  expect(server.sent(updateHouse)).toEqual([]);
});

test('a house that someone else has saved is not overwritten, and what was typed stays', async () => {
  signedIn(server, ['owner']).on(updateHouse, () => new Refusal(409, 'stale', { current: { ...HOUSE, version: 9 } }));
  openRoom('/house');
  const brand = await screen.findByLabelText('Brand, as printed');
  await userEvent.type(brand, ' new');
  await userEvent.click(screen.getByRole('button', { name: 'Save' }));
  expect(await screen.findByText(/Someone else has saved the house since/)).toBeTruthy();
  expect(brand).toHaveProperty('value', 'Brackenmere new');
});

test('whoever may not change the house reads it', async () => {
  signedIn(server, ['seller']);
  openRoom('/house');
  expect(await screen.findByText('An owner may change these.')).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Save' })).toBeNull();
  expect(screen.getByLabelText('Brand, as printed').closest('fieldset:disabled')).not.toBeNull();
});

test('members are named with their roles', async () => {
  signedIn(server);
  openRoom('/house');
  const maud = (await screen.findByText('Maud Pellow')).closest('tr, li')!;
  expect(within(maud as HTMLElement).getByText(/owner/i)).toBeTruthy();
});

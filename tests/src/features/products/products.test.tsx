// @vitest-environment jsdom
import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listCategories } from '#shared/contracts/law.contract.ts';
import { createProduct, listProducts } from '#shared/contracts/products.contract.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';
import { makeSummary } from '../fixtures.ts';

const SHELF = [
  makeSummary(1, 'Sluice Wash', { stop: 0, decide: 2, note: 1 }),
  makeSummary(2, 'Heron Lotion', { stop: 1, decide: 0, note: 0 }, { markets: ['EU', 'US'], headline: 'Bring Phenoxyethanol to 1 % or less.' }),
  makeSummary(3, 'Reed Balm', { stop: 0, decide: 0, note: 0 }),
];

let server: FakeServer;
beforeEach(() => {
  server = signedIn(new FakeServer())
    .on(listCategories, () => ({ release: 'test', items: [{ slug: 'body-wash', title: 'Body wash', exposure: 'rinse-off' as const, decorative: false }, { slug: 'body-lotion', title: 'Body lotion', exposure: 'leave-on' as const, decorative: false }] }))
    .on(listProducts, ({ query }) => {
      const items = SHELF.filter((one) => one.name.toLowerCase().includes((query.get('find') ?? '').toLowerCase()) && (!query.get('market') || (one.markets as string[]).includes(query.get('market')!)));
      return { items, total: items.length, page: 1, pageSize: 50 };
    });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('the weightiest product comes first, each with its standing in words', async () => {
  openRoom('/products');
  const table = await screen.findByRole('table', { name: 'Products' });
  const rows = within(table).getAllByRole('row').slice(1);
  expect(rows.map((one) => within(one).getByRole('link').textContent)).toEqual(['Heron Lotion', 'Sluice Wash', 'Reed Balm']);
  expect(rows[0]!.textContent).toContain('1 stops sale');
  expect(rows[0]!.textContent).toContain('Bring Phenoxyethanol to 1 % or less.');
  expect(rows[1]!.textContent).toContain('2 need a decision');
  expect(rows[2]!.textContent).toContain('no rule broken');
});

test('the list is narrowed by market and by name, and says when nothing fits', async () => {
  const { router } = openRoom('/products');
  await screen.findByRole('table', { name: 'Products' });
  await userEvent.click(screen.getByRole('button', { name: 'US' }));
  await waitFor(() => expect(screen.getAllByRole('row')).toHaveLength(2));
  await userEvent.type(screen.getByLabelText('Find by name'), 'sluice');
  expect(await screen.findByText('No product fits.')).toBeTruthy();
  expect(router.state.location.search).toBe('?market=US&find=sluice');
  await userEvent.click(screen.getByRole('button', { name: 'Show all products' }));
  await waitFor(() => expect(screen.getAllByRole('row')).toHaveLength(4));
});

test('an empty house is told what comes next', async () => {
  server.on(listProducts, () => ({ items: [], total: 0, page: 1, pageSize: 50 }));
  openRoom('/products');
  expect(await screen.findByText('No products yet.')).toBeTruthy();
  expect(screen.getAllByRole('link', { name: 'New product' })).not.toHaveLength(0);
});

test('a new product needs a name, a kind and a market, each said at its field', async () => {
  openRoom('/products/new');
  const name = await screen.findByLabelText('Name');
  const form = name.closest('form')!;
  await userEvent.click(within(form).getByLabelText('EU, European Union'));
  await userEvent.click(within(form).getByRole('button'));
  expect(await within(form).findByText('Choose what the product is.')).toBeTruthy();
  expect(name.getAttribute('aria-invalid')).toBe('true');
  expect(server.sent(createProduct)).toEqual([]);
});

test('a refusal of the server is shown and the form keeps what was typed', async () => {
  server.on(createProduct, () => new Refusal(503, 'unavailable'));
  openRoom('/products/new');
  const name = await screen.findByLabelText('Name');
  const form = name.closest('form')!;
  await userEvent.type(name, 'Tern Wash');
  await userEvent.selectOptions(within(form).getByLabelText(/What it is/), 'body-wash');
  await userEvent.click(within(form).getByRole('button'));
  expect(await within(form).findByText('Not created.')).toBeTruthy();
  expect(name).toHaveProperty('value', 'Tern Wash');
  expect(server.sent(createProduct)).toEqual([{ name: 'Tern Wash', category: 'body-wash', markets: ['EU'] }]);
});

test('a seller sees the products and no way to make one', async () => {
  signedIn(server, ['seller']);
  openRoom('/products');
  await screen.findByRole('table', { name: 'Products' });
  expect(screen.queryByRole('link', { name: 'New product' })).toBeNull();
});

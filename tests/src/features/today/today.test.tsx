// @vitest-environment jsdom
import { cleanup, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { cropToFront } from '#shared/artwork/crop-to-front.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { getLaw } from '#shared/contracts/law.contract.ts';
import { listMaterials } from '#shared/contracts/materials.contract.ts';
import { getProductFront, listProducts, type ProductSummary } from '#shared/contracts/products.contract.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';
import { bodyWash } from '#tests/shared/artwork/samples.ts';
import { makeSummary, uuid } from '../fixtures.ts';

let server: FakeServer;
let shelf: ProductSummary[];
beforeEach(() => {
  shelf = [makeSummary(1, 'Sluice Wash', { stop: 0, decide: 2, note: 1 }, { headline: 'Ask for narrower figures.' }), makeSummary(2, 'Heron Lotion', { stop: 1, decide: 3, note: 0 }, { headline: 'Bring it to 1 %.' }), makeSummary(3, 'Reed Balm', { stop: 0, decide: 0, note: 4 })];
  server = signedIn(new FakeServer())
    .on(listMaterials, () => ({ items: [], total: 26, page: 1, pageSize: 50 }))
    .on(listProducts, () => ({ items: shelf, total: shelf.length, page: 1, pageSize: 50 }))
    .on(getProductFront, () => ({ front: null }))
    .on(getLaw, () => ({ release: 'test', tables: { changes: [] } }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('what stops sale stands before what needs a decision, each product once', async () => {
  openRoom('/');
  const stops = await screen.findByRole('region', { name: 'Stops sale' });
  expect(within(stops).getByRole('heading', { level: 3 }).textContent).toBe('Heron Lotion');
  const decides = screen.getByRole('region', { name: 'Needs a decision' });
  expect(within(decides).getAllByRole('heading', { level: 3 }).map((one) => one.textContent)).toEqual(['Sluice Wash']);
  expect(within(decides).getByRole('link', { name: 'Decide: Sluice Wash' }).getAttribute('href')).toBe(`/products/${uuid(1)}/verdicts`);
  expect(screen.getByText('2 products need you')).toBeTruthy();
});

test('a house that nothing holds up is told so, without a certificate', async () => {
  shelf = [makeSummary(3, 'Reed Balm', { stop: 0, decide: 0, note: 4 })];
  openRoom('/');
  expect(await screen.findByText('No product of yours is held up by a rule that this data release holds.')).toBeTruthy();
});

test('an empty house begins with a formula it has', async () => {
  shelf = [];
  openRoom('/');
  expect(await screen.findByText('No products yet.')).toBeTruthy();
  expect(screen.getAllByRole('link', { name: 'Start from a spreadsheet' })).not.toHaveLength(0);
});

test('the shelf shows each label by its front, and a plain slip where there is none', async () => {
  const front = cropToFront(layOutLabel(bodyWash, plexMetrics).scene!);
  server.on(getProductFront, ({ params }) => (params['id'] === uuid(1) ? { front } : { front: null }));
  openRoom('/');
  const drawn = await waitFor(() => {
    const found = document.querySelector(`.shelf a[href="/products/${uuid(1)}"] svg .label-art`);
    expect(found).not.toBeNull();
    return found!;
  }, { timeout: 5000 });
  expect(drawn.textContent).toContain('Brackenmere Bathhouse');
  expect(document.querySelector(`.shelf a[href="/products/${uuid(3)}"] .slip`)!.textContent).toContain('Reed');
});

test('a front that cannot be fetched leaves the slip and the rest of the page', async () => {
  server.on(getProductFront, () => new Refusal(500, 'internal'));
  openRoom('/');
  await screen.findByRole('region', { name: 'Stops sale' });
  await waitFor(() => expect(server.sent(getProductFront)).toHaveLength(3));
  expect(document.querySelectorAll('.shelf .slip')).toHaveLength(3);
});

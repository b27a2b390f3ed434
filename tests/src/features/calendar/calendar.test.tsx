// @vitest-environment jsdom
import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { getHouse } from '#shared/contracts/house.contract.ts';
import type { Material } from '#shared/contracts/materials.contract.ts';
import { getProduct, listProducts, type ProductSummary } from '#shared/contracts/products.contract.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { dictionary } from '#tests/support/engine.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';
import { line, makeDraft, makeProduct, uuid } from '../fixtures.ts';

const material = (n: number, tradeName: string, composition: Material['composition'], constituents: Material['constituents'] = []): Material => ({
  id: uuid(n), version: 1, savedAt: '2026-12-01T09:00:00.000Z', savedBy: 'Ida Fenn', archived: false, documents: [], usedIn: [],
  tradeName, supplier: '', declareAs: 'ingredients', composition, constituents, pricePerKg: null, currency: 'EUR', notes: '', handling: {},
});
const known = (name: string): DictionaryEntry => dictionary.resolve(name)!.entry;
const entries = ['Aqua', 'Lavandula Angustifolia Oil', 'Linalyl Acetate'].map(known).map(({ misspellings: _none, ...entry }) => ({ ...entry, cas: [...entry.cas], ec: [...entry.ec], functions: [...entry.functions], names: { ...entry.names, usColours: undefined }, synonyms: [...entry.synonyms], commonNames: [...entry.commonNames], properties: [...entry.properties] }));
const draft = makeDraft({
  category: 'body-lotion', markets: ['EU'], placedOnMarket: null, availableOn: null,
  formula: { batchSize: { value: '100', unit: 'g' }, phases: [{ id: 'a', name: 'A', lines: [line('water', 1, '', 'qs'), line('oil', 4, '0.3')], steps: [] }] },
});
const summary: ProductSummary = { id: uuid(90), version: 7, name: 'Sluice Lotion', brand: '', category: 'body-lotion', markets: ['EU'], netContent: '', savedAt: '2026-12-01T09:00:00.000Z', savedBy: 'Ida Fenn', archived: false, counts: { stop: 0, decide: 0, note: 0 }, headline: '' };

let server: FakeServer;
beforeEach(() => {
  vi.useFakeTimers({ now: new Date('2026-06-15T12:00:00Z'), toFake: ['Date'] });
  server = signedIn(new FakeServer())
    .on(getHouse, () => ({ id: uuid(50), version: 1, name: 'Brackenmere Bathhouse', brand: 'Brackenmere', responsiblePerson: {}, usContact: '', canadaContact: '', countryOfOrigin: '', temperatureUnit: 'C' as const, members: [] }))
    .on(listProducts, () => ({ items: [summary], total: 1, page: 1, pageSize: 50 }))
    .on(getProduct, () => ({
      product: makeProduct(draft), entries, unknown: [], dictionaryRelease: 'test',
      materials: [material(1, 'Purified water', [{ inci: 'Aqua', percent: '100' }]), material(4, 'Lavender oil', [{ inci: 'Lavandula Angustifolia Oil', percent: '100' }], [{ name: 'Linalyl Acetate', percent: '30' }])],
    }));
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

const step = (name: RegExp) => screen.findByRole('article', { name }, { timeout: 10_000 });

test('each date ahead says what it is, and what it does to a product of the house', async () => {
  openRoom('/calendar');
  const first = await step(/1 Aug 2026, EU: 81 fragrance allergens/);
  const own = await within(first).findByText('Sluice Lotion', {}, { timeout: 10_000 });
  fireEvent.click(own);
  expect(first.textContent).toContain('it then names');
  expect(first.textContent).toContain('Linalyl Acetate');
  expect(within(first).getByRole('link', { name: 'Its verdicts on that day', hidden: true }).getAttribute('href')).toBe(`/products/${uuid(90)}/verdicts?market=EU&placed=2026-08-01&available=2026-08-01`);
  expect(within(first).getByRole('link', { name: 'official text' }).getAttribute('href')).toBe('https://eur-lex.europa.eu/eli/reg/2023/1545/oj');
  expect(await screen.findByText(/dates? touch/)).toBeTruthy();
}, 30_000);

test('the calendar is narrowed by market, by what touches the house, and reaches back to 2013', async () => {
  openRoom('/calendar');
  await step(/1 Aug 2026, EU: 81 fragrance allergens/);
  expect(screen.queryByRole('article', { name: /11 Jul 2013/ })).toBeNull();
  fireEvent.click(screen.getByRole('button', { name: 'Since 2013' }));
  await step(/11 Jul 2013, EU/);
  fireEvent.click(screen.getByRole('button', { name: 'CA' }));
  await waitFor(() => expect(screen.queryAllByRole('article', { name: /, EU:/ })).toEqual([]), { timeout: 15_000 });
  expect((await screen.findAllByText('Nothing of yours is sold here.')).length).toBeGreaterThan(1);
  fireEvent.click(screen.getByRole('button', { name: 'Only those that touch us' }));
  expect(await screen.findByText('No date fits.', {}, { timeout: 10_000 })).toBeTruthy();
}, 30_000);

test('every mark on the scale has its entry on the page', async () => {
  openRoom('/calendar?since=beginning');
  const scale = await screen.findByRole('img', { name: /dates of the law from 2013/ }, { timeout: 10_000 });
  const marks = [...scale.querySelectorAll('[data-step]')].map((mark) => mark.getAttribute('data-step')!);
  expect(marks.length).toBeGreaterThan(50);
  expect(marks.filter((step) => document.getElementById(step) === null)).toEqual([]);
}, 30_000);

test('a product that cannot be read leaves the calendar standing and is counted', async () => {
  server.on(getProduct, () => new Refusal(404, 'not-found'));
  openRoom('/calendar');
  expect(await screen.findByText(/1 product could not be judged/, {}, { timeout: 10_000 })).toBeTruthy();
}, 30_000);

// @vitest-environment jsdom
import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listDictionaryNames, resolveNames, searchDictionary } from '#shared/contracts/dictionary.contract.ts';
import { getHouse } from '#shared/contracts/house.contract.ts';
import { createMaterial, getMaterial, listMaterials, updateMaterial, type Material, type MaterialFields } from '#shared/contracts/materials.contract.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';
import { uuid } from '../fixtures.ts';

const entry = (inci: string, cas: string) => ({ id: inci.toLowerCase(), inci, cas: [cas], ec: [], functions: ['humectant'], names: {}, synonyms: [], commonNames: [], properties: [], source: 'test' });
const GLYCERIN = entry('Glycerin', '56-81-5');
const AQUA = entry('Aqua', '7732-18-5');
const OAT: Material = {
  id: uuid(50), version: 4, savedAt: '2026-11-30T10:00:00.000Z', savedBy: 'Ines Tarrow', archived: false, documents: [], usedIn: [{ productId: uuid(90), name: 'Sluice Wash' }],
  tradeName: 'Oat extract', supplier: 'Tarn Botanicals', declareAs: 'ingredients', constituents: [], pricePerKg: '14', currency: 'EUR', notes: '', handling: {},
  composition: [{ inci: 'Aqua', percent: '60' }, { inci: 'Glycerin', percent: '40' }],
};
const saved = (body: unknown, version: number): Material => ({ ...OAT, ...(body as MaterialFields), id: uuid(50), version });

let server: FakeServer;
beforeEach(() => {
  localStorage.clear();
  const summary = { id: OAT.id, version: 4, tradeName: OAT.tradeName, supplier: OAT.supplier, declareAs: 'ingredients', parts: 2, constituents: 0, inci: ['Aqua', 'Glycerin'] };
  server = signedIn(new FakeServer())
    .on(getHouse, () => ({ id: uuid(70), version: 1, name: 'Brackenmere Bathhouse', brand: 'Brackenmere', responsiblePerson: {}, usContact: '', canadaContact: '', countryOfOrigin: '', temperatureUnit: 'C' as const, members: [] }))
    .on(listMaterials, ({ query }) => {
      const items = !query.get('find') || 'oat extract'.includes(query.get('find')!) ? [summary] : [];
      return { items, total: items.length, page: 1, pageSize: 50 };
    })
    .on(getMaterial, () => OAT)
    .on(listDictionaryNames, () => ({ release: 'test', entries: [GLYCERIN, AQUA] }))
    .on(searchDictionary, ({ query }) => ({ items: 'glycerin'.startsWith(query.get('q')!.toLowerCase()) ? [{ entry: GLYCERIN, matched: 'Glycerin', by: 'inci' as const }] : [] }))
    .on(resolveNames, ({ body }) => ({
      release: 'test',
      items: (body as { names: { name: string }[] }).names.map(({ name }) => {
        const known = [GLYCERIN, AQUA].find((one) => one.inci.toLowerCase() === name.toLowerCase());
        return { name, entry: known ?? null, match: known ? ('exact' as const) : ('unknown' as const), suggestions: known ? [] : [GLYCERIN] };
      }),
    }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const cell = (label: string) => screen.getByLabelText(label);
const type = async (label: string, text: string) => {
  await userEvent.clear(cell(label));
  await userEvent.type(cell(label), text);
};
const save = () => userEvent.click(screen.getByRole('button', { name: 'Save' }));

test('a new material is found by name as it is typed, judged and saved', async () => {
  server.on(createMaterial, ({ body }) => saved(body, 1));
  const { router } = openRoom('/materials/new');
  await userEvent.type(await screen.findByLabelText('Name, as you call it', {}, { timeout: 10_000 }), 'Vegetable glycerine');
  await userEvent.type(cell('Ingredient 1'), 'glyc');
  await userEvent.click(await screen.findByRole('option', { name: /Glycerin/ }));
  await type('Share or least of ingredient 1, percent', '100');
  await save();
  await waitFor(() => expect(router.state.location.pathname).toBe(`/materials/${uuid(50)}`));
  expect(server.sent(createMaterial)).toEqual([expect.objectContaining({ tradeName: 'Vegetable glycerine', composition: [expect.objectContaining({ inci: 'Glycerin', cas: '56-81-5', percent: '100' })] })]);
});

test('what begins as typed is offered before the server has answered', async () => {
  let release = (): void => undefined;
  server.on(searchDictionary, async () => {
    await new Promise<void>((done) => { release = done; });
    return { items: [] };
  });
  openRoom('/materials/new');
  const field = await screen.findByLabelText('Ingredient 1');
  await waitFor(() => expect(server.sent(listDictionaryNames)).toHaveLength(1));
  await userEvent.type(field, 'gly');
  expect(await screen.findByRole('option', { name: /Glycerin/ })).toBeTruthy();
  release();
});

test('a composition over 100 % is said at once, and refused on saving at its place', async () => {
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Share or least of ingredient 2, percent', '50');
  const table = screen.getByRole('table', { name: 'Composition' });
  expect(within(table).getAllByText('110')).not.toHaveLength(0);
  await save();
  expect(await screen.findByText('Not saved yet.')).toBeTruthy();
  expect(server.sent(updateMaterial)).toEqual([]);
});

test.each(['-3', 'abc', '140', '1e9'])('a share of %s is refused at its field in words', async (share) => {
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Share or least of ingredient 2, percent', share);
  await save();
  const field = cell('Share or least of ingredient 2, percent');
  await waitFor(() => expect(field.getAttribute('aria-invalid')).toBe('true'));
  expect(document.getElementById(field.getAttribute('aria-describedby')!)!.textContent).toMatch(/\w+ \w+/);
  expect(server.sent(updateMaterial)).toEqual([]);
});

test('a name that nobody knows is offered the likely ones and takes the one chosen', async () => {
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Ingredient 2', 'Glycerrin');
  await userEvent.tab();
  expect(await screen.findByText('Not a known INCI name. Perhaps')).toBeTruthy();
  await userEvent.click(screen.getByRole('button', { name: 'Glycerin' }));
  expect(cell('Ingredient 2')).toHaveProperty('value', 'Glycerin');
});

test('a range typed into one field becomes a least and a most', async () => {
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Share or least of ingredient 1, percent', '58-62');
  await userEvent.tab();
  expect(cell('Share or least of ingredient 1, percent')).toHaveProperty('value', '58');
  expect(cell('Most of ingredient 1, percent')).toHaveProperty('value', '62');
});

test("a supplier's line fills the composition", async () => {
  openRoom('/materials/new?paste=yes');
  await userEvent.type(await screen.findByLabelText(/A supplier’s line/), 'Aqua (and) Glycerin');
  await userEvent.click(screen.getByRole('button', { name: 'Fill in' }));
  expect(cell('Ingredient 1')).toHaveProperty('value', 'Aqua');
  expect(cell('Ingredient 2')).toHaveProperty('value', 'Glycerin');
});

test('what was typed survives a reload, and can be set aside', async () => {
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' }, { timeout: 10_000 });
  await type('Supplier', 'Fell Supplies');
  await waitFor(() => expect(screen.getByText('Not saved; kept on this computer')).toBeTruthy());
  // Slow typing keeps a part first; the reload comes once the whole is kept.
  await waitFor(() => expect(JSON.stringify({ ...localStorage })).toContain('Fell Supplies'));
  cleanup();
  openRoom(`/materials/${OAT.id}`);
  expect(await screen.findByText(/is back\.$/)).toBeTruthy();
  expect(cell('Supplier')).toHaveProperty('value', 'Fell Supplies');
  await userEvent.click(screen.getByRole('button', { name: 'Set it aside' }));
  expect(cell('Supplier')).toHaveProperty('value', 'Tarn Botanicals');
});

test('a lost connection keeps what was typed and saves when it is back', async () => {
  server.on(updateMaterial, ({ body }) => saved(body, 5));
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Supplier', 'Fell Supplies');
  server.isReachable = false;
  await save();
  expect(await screen.findByText('Not saved.')).toBeTruthy();
  expect(cell('Supplier')).toHaveProperty('value', 'Fell Supplies');
  server.isReachable = true;
  await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByText(/^Saved .* by Ines Tarrow$/)).toBeTruthy();
});

test('two people saving one material: the second sees both versions and chooses part by part', async () => {
  const theirs = { ...OAT, version: 5, savedBy: 'Maud Pellow', pricePerKg: '16' };
  server.on(updateMaterial, ({ body }) => ((body as { version: number }).version === 5 ? saved(body, 6) : new Refusal(409, 'stale', { current: theirs })));
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' });
  await type('Supplier', 'Fell Supplies');
  await save();
  const dialog = await screen.findByRole('alertdialog', { name: /Maud Pellow saved this material before you/ });
  expect(within(dialog).getByText(/Fell Supplies/)).toBeTruthy();
  await userEvent.click(within(dialog).getByRole('button', { name: 'Save what is chosen' }));
  await waitFor(() => expect(server.sent(updateMaterial)).toHaveLength(2));
  expect(server.sent(updateMaterial)[1]).toMatchObject({ version: 5, supplier: 'Fell Supplies', pricePerKg: '16' });
});

test('whoever may not change materials reads them', async () => {
  signedIn(server, ['artworker']);
  openRoom(`/materials/${OAT.id}`);
  expect(await screen.findByText('You may read materials, not change them')).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Save' })).toBeNull();
  expect(screen.queryByRole('link', { name: 'New material' })).toBeNull();
});

test('the list says when nothing is found', async () => {
  openRoom('/materials?find=zeolite');
  expect(await screen.findByText('No material has “zeolite” in its name or composition.')).toBeTruthy();
});

test('what a certificate says is asked for what the material holds, and kept with it', async () => {
  server.on(getMaterial, () => ({ ...OAT, composition: [{ inci: 'Triticum Vulgare Germ Oil', percent: '100' }] }));
  const kept = vi.fn();
  server.on(updateMaterial, ({ body }) => { kept((body as MaterialFields).facts); return saved(body, 5); });
  openRoom(`/materials/${OAT.id}`);
  await screen.findByRole('form', { name: 'Oat extract' }, { timeout: 10_000 });
  expect(screen.queryByLabelText('Peanut protein')).toBeNull();
  await userEvent.type(cell('Average size of the wheat protein’s peptides'), '3,5');
  await userEvent.selectOptions(cell('A certificate of its purity was seen'), 'yes');
  await save();
  await waitFor(() => expect(kept).toHaveBeenCalledWith({ certificateSeen: true, wheatPeptideKilodalton: '3.5' }));
});

test('a verdict’s question leads to its field', async () => {
  openRoom(`/materials/${OAT.id}#fact-peanutProteinPpm`);
  await screen.findByRole('form', { name: 'Oat extract' }, { timeout: 10_000 });
  await waitFor(() => expect(document.activeElement).toBe(cell('Peanut protein')));
});

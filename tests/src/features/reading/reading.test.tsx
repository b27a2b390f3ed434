// @vitest-environment jsdom
import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listDictionaryNames } from '#shared/contracts/dictionary.contract.ts';
import { importFormulaDocument } from '#shared/contracts/products.contract.ts';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import { readFileSync, readdirSync } from 'node:fs';
import { ESTIMATE_PHASE } from '#shared/reading/estimate.ts';
import { FakeServer, Refusal, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';

const TABLES = join(import.meta.dirname, '../../../../data/dictionary');
const entries = readdirSync(TABLES).map((file) => readFileSync(join(TABLES, file), 'utf8')).filter((table) => table.startsWith('id,inci,')).flatMap(parseEntries);

let server: FakeServer;
beforeEach(() => {
  localStorage.clear();
  server = signedIn(new FakeServer()).on(listDictionaryNames, () => ({ release: 'test', entries }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const box = () => screen.findByLabelText('The list, as it stands on the pack', {}, { timeout: 10_000 });
const paste = async (text: string) => fireEvent.change(await box(), { target: { value: text } });
const rows = async () => within(await screen.findByRole('table', { name: 'Names and their bounds' })).getAllByRole('row').slice(1).map((row) => row.textContent ?? '');

test('an empty room says what would stand there', async () => {
  openRoom('/read');
  expect(await screen.findByText('Nothing pasted yet.', {}, { timeout: 10_000 })).toBeTruthy();
}, 20_000);

test('a pasted list is read with bounds, the law’s maximum and its paragraph, and asks the server nothing', async () => {
  openRoom('/read');
  await paste('Aqua, Glycerin, Phenoxyethanol, Xanthan Gum');
  const [aqua, , phenoxyethanol, gum] = await rows();
  expect(aqua).toContain('49 to 100');
  expect(phenoxyethanol).toContain('the law allows 1 %: Regulation (EC) No 1223/2009, Annex V, entry 29');
  expect(gum).toContain('at most 1');
  const asked = server.asked.length;
  await paste('Aqua, Glycerin');
  await waitFor(async () => expect(await rows()).toHaveLength(2));
  expect(server.asked).toHaveLength(asked);
}, 20_000);

test('an unknown name is put right by the name chosen for it', async () => {
  openRoom('/read');
  await paste('Aqua, Sodium Lauryl Something Sulfate, Glycerin');
  fireEvent.click(await screen.findByRole('button', { name: 'Take Sodium Lauryl Sulfate for Sodium Lauryl Something Sulfate' }));
  expect((await box() as HTMLTextAreaElement).value).toBe('Aqua, Sodium Lauryl Sulfate, Glycerin');
  await waitFor(() => expect(screen.queryByText('not known')).toBeNull());
}, 20_000);

test('a prohibited name stops sale with its citation, in the market that prohibits it', async () => {
  openRoom('/read?market=EU');
  await paste('Aqua, Butylphenyl Methylpropional');
  expect(await screen.findByText('Not to be sold as it stands in the EU.')).toBeTruthy();
  expect(screen.getAllByText(/Annex II, entry 1666/)).not.toHaveLength(0);
  fireEvent.click(screen.getByRole('button', { name: 'US' }));
  await waitFor(() => expect(screen.queryByText(/Not to be sold/)).toBeNull());
}, 20_000);

test('the text is still there after a reload, and gone once cleared', async () => {
  openRoom('/read');
  await paste('Aqua, Glycerin');
  cleanup();
  openRoom('/read');
  await waitFor(async () => expect((await box() as HTMLTextAreaElement).value).toBe('Aqua, Glycerin'));
  fireEvent.click(screen.getByRole('button', { name: 'Clear' }));
  cleanup();
  openRoom('/read');
  expect((await box() as HTMLTextAreaElement).value).toBe('');
}, 20_000);

test('a text that is no list is refused in a sentence', async () => {
  openRoom('/read');
  await paste(' ,;. •');
  expect(await screen.findByText('The text holds no ingredient names.')).toBeTruthy();
}, 20_000);

test('a product is begun in one click, its shares marked as estimated', async () => {
  server.on(importFormulaDocument, () => new Refusal(403, 'not-allowed'));
  openRoom('/read?market=UK&category=shampoo');
  await paste('Aqua, Glycerin, Parfum');
  fireEvent.click(await screen.findByRole('button', { name: 'Start a product from it' }));
  await waitFor(() => expect(server.sent(importFormulaDocument)).toHaveLength(1));
  const { document } = server.sent(importFormulaDocument)[0] as { document: { product: { markets: string[]; category: string }; formula: { lines: { phase: string }[] } } };
  expect([document.product.markets, document.product.category]).toEqual([['UK'], 'shampoo']);
  expect(document.formula.lines.map(({ phase }) => phase)).toEqual([ESTIMATE_PHASE, ESTIMATE_PHASE, ESTIMATE_PHASE]);
  expect(await screen.findByText('Not created.')).toBeTruthy();
}, 20_000);

test('a day beyond the tables is answered at its field', async () => {
  openRoom('/read?on=2040-01-01');
  expect(await screen.findByText(/what comes later is not guessed/, {}, { timeout: 10_000 })).toBeTruthy();
}, 20_000);

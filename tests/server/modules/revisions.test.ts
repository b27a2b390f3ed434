import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import type { Revision, RevisionLine } from '#shared/contracts/revisions.contract.ts';
import { BRAM, INES } from '#server/local/demo-people.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 60_000 });
let stage: TestApp;
let ines: Client;
beforeAll(async () => {
  stage = await openTestApp();
  ines = await stage.as(INES);
}, 120_000);
afterAll(() => stage.close());

test('every saved state is kept, newest first, and read as it was', async () => {
  const { id, draft } = (await ines.post('/products', { name: 'Reed wash', category: 'body-wash', markets: ['EU'] }).expect(200)).body as { id: string; draft: Revision['draft'] };
  await ines.put(`/products/${id}`, { version: 1, draft: { ...draft, name: 'Reed and rush wash' } }).expect(200);
  const { items } = (await ines.get(`/products/${id}/revisions`).expect(200)).body as { items: RevisionLine[] };
  expect(items.map(({ version, savedBy }) => [version, savedBy])).toEqual([[2, 'Ines Tarrow'], [1, 'Ines Tarrow']]);
  const names = await Promise.all([1, 2].map(async (version) => ((await ines.get(`/products/${id}/revisions/${version}`).expect(200)).body as Revision).draft.name));
  expect(names).toEqual(['Reed wash', 'Reed and rush wash']);
});

test('a state that is not there, and one of another house, answer alike', async () => {
  const { id } = (await ines.post('/products', { name: 'Private wash', category: 'body-wash', markets: ['EU'] }).expect(200)).body as { id: string };
  const bram = await stage.as(BRAM);
  const answers = [await ines.get(`/products/${id}/revisions/9`), await bram.get(`/products/${id}/revisions/1`), await bram.get(`/products/${id}/revisions`)];
  expect(answers.map(({ status }) => status)).toEqual([404, 404, 404]);
});

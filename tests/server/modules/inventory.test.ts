import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest';
import type { InventoryState } from '#shared/contracts/inventory.contract.ts';
import { inHouse } from '#server/db/in-house.ts';
import { BRAM, INES, MAUD, RHEA } from '#server/local/demo-people.ts';
import { beginImport, inventoryStateOf, readExport, takeOverChunk } from '#server/modules/dictionary/inventory.service.ts';
import { mergeFound } from '#server/modules/dictionary/inventory-search.ts';
import { openTestApp, testDictionary, type Client, type TestApp } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 120_000 });

let stage: TestApp;
let maud: Client;
let bram: Client;
let ines: Client;
beforeAll(async () => {
  stage = await openTestApp();
  [maud, bram, ines] = [await stage.as(MAUD), await stage.as(BRAM), await stage.as(INES)];
}, 120_000);
afterAll(() => stage.close());
beforeEach(() => expect(stage.faults).toEqual([]));
afterEach(async () => {
  await maud.delete('/dictionary/inventory');
});

const HEAD = 'INCI name\tCAS No\tEC No\tFunction\n';
// Invented names; glycerin's number is its own.
const SMALL = `${HEAD}GLYCERIN\t56-81-5\t\tHUMECTANT\nFENWORT ROOT EXTRACT\t\t\tSKIN CONDITIONING\nMARSHBELL OIL\t\t\tEMOLLIENT\n\t\t\tNOTHING\n`;
const send = (who: Client, text: string | Buffer, name = 'export.tsv') => who.post('/dictionary/inventory').attach('file', Buffer.from(text as string), name);
const settle = async (who: Client): Promise<InventoryState> => {
  for (;;) {
    const state = (await who.get('/dictionary/inventory')).body as InventoryState;
    if (!state.last?.isRunning) return state;
    await new Promise((done) => setTimeout(done, 20));
  }
};
const found = async (who: Client, q: string) => ((await who.get(`/dictionary/search?q=${encodeURIComponent(q)}`)).body.items as { entry: { inci: string; origin?: string } }[]).map(({ entry }) => [entry.inci, entry.origin]);

test('an owner takes an export over: what is curated is joined, the rest added, faults told by line', async () => {
  expect((await send(maud, SMALL)).status).toBe(200);
  const state = await settle(maud);
  expect(state).toMatchObject({ names: 2, last: { fileName: 'export.tsv', startedBy: 'Maud Pellow', total: 3, done: 3, added: 2, updated: 0, unchanged: 0, joined: 1, skipped: [{ line: 5, reason: 'It has no name.' }] } });
});

test('running it again changes nothing, and a newer export updates', async () => {
  await send(maud, SMALL);
  await settle(maud);
  await send(maud, SMALL);
  expect((await settle(maud)).last).toMatchObject({ added: 0, updated: 0, unchanged: 2, joined: 1 });
  await send(maud, SMALL.replace('EMOLLIENT', 'EMOLLIENT, PERFUMING') + 'REEDMINT WATER\t\t\tPERFUMING\n');
  expect(await settle(maud)).toMatchObject({ names: 3, last: { added: 1, updated: 1, unchanged: 1, joined: 1 } });
});

test('its names are found as typed and misspelt, marked, and by no other house', async () => {
  await send(maud, SMALL);
  await settle(maud);
  expect((await found(maud, 'fenwort'))[0]).toEqual(['FENWORT ROOT EXTRACT', 'inventory']);
  expect((await found(maud, 'marshbel oyl'))[0]).toEqual(['MARSHBELL OIL', 'inventory']);
  expect((await found(ines, 'fenwort'))[0]).toEqual(['FENWORT ROOT EXTRACT', 'inventory']);
  expect((await found(bram, 'fenwort root')).map(([name]) => name)).not.toContain('FENWORT ROOT EXTRACT');
  expect((await bram.get('/dictionary?from=inventory')).body).toMatchObject({ total: 0, items: [] });
  expect((await bram.get('/dictionary/inventory')).body).toEqual({ names: 0, last: null });
  expect((await maud.get('/dictionary?from=inventory&find=bell')).body).toMatchObject({ total: 1, items: [{ inci: 'MARSHBELL OIL', origin: 'inventory' }], functions: ['emollient', 'skin conditioning'] });
});

test('removing the import takes its names and its report out again', async () => {
  await send(maud, SMALL);
  await settle(maud);
  expect((await maud.delete('/dictionary/inventory')).body).toEqual({ names: 0, last: null });
  expect((await found(maud, 'fenwort')).map(([name]) => name)).not.toContain('FENWORT ROOT EXTRACT');
});

test('only an owner may take over or remove', async () => {
  for (const who of [ines, await stage.as(RHEA)]) {
    expect((await send(who, SMALL)).status).toBe(403);
    expect((await who.delete('/dictionary/inventory')).status).toBe(403);
  }
});

test('what a killed server left is taken up at the next question, each name once', async () => {
  const text = HEAD + Array.from({ length: 2500 }, (_, at) => `FENWORT NUMBER ${at} EXTRACT\t\t\tPERFUMING\n`).join('');
  const own = { personId: MAUD.id, name: MAUD.name, houseId: MAUD.houseId!, roles: MAUD.roles };
  await inHouse(stage.orm.em, own.houseId, (em) => beginImport(em, own, { reading: readExport(Buffer.from(text)), fileName: 'long.tsv', now: new Date('2026-12-01T09:00:00Z') }));
  await inHouse(stage.orm.em, own.houseId, (em) => takeOverChunk(em, own, testDictionary().dictionary));
  // The server dies within the second piece: its transaction is undone as a whole.
  const broken = inHouse(stage.orm.em, own.houseId, async (em) => {
    await takeOverChunk(em, own, testDictionary().dictionary);
    throw new Error('killed');
  });
  await expect(broken).rejects.toThrow('killed');
  expect(await inHouse(stage.orm.em, own.houseId, (em) => inventoryStateOf(em, own))).toMatchObject({ names: 1000, last: { done: 1000, total: 2500, isRunning: true } });
  expect((await send(maud, SMALL)).status).toBe(409);
  expect(await settle(maud)).toMatchObject({ names: 2500, last: { done: 2500, added: 2500, updated: 0, unchanged: 0, isRunning: false } });
});

test('a file that is no export is refused and what stood before stands', async () => {
  await send(maud, SMALL);
  await settle(maud);
  for (const [bytes, words] of [
    [Buffer.from([0x50, 0x4b, 3, 4, 0, 0, 0]), 'not a text file'],
    [Buffer.from('name\tnumber\nx\t1\n'), 'No column is headed'],
    [Buffer.from(`${HEAD}"AQUA\t\t\t\n`), 'never closed'],
  ] as const) {
    const answer = await send(maud, bytes);
    expect(answer.status).toBe(415);
    expect(answer.body.detail).toContain(words);
  }
  expect((await settle(maud)).names).toBe(2);
});

test('UTF-16 and the Western code page are read as well', async () => {
  const text = `${HEAD}FENWÖRT WATER\t\t\tPERFUMING\n`;
  for (const bytes of [Buffer.from(`\uFEFF${text}`, 'utf16le'), Buffer.from(text, 'latin1'), Buffer.from(text)]) {
    expect(readExport(bytes).names.map(({ inci }) => inci)).toEqual(['FENWÖRT WATER']);
  }
});

test('of two names as near the curated one goes first, and a nearer name goes before a farther', () => {
  const entry = (inci: string) => ({ ...testDictionary().tables.entries[0]!, id: inci, inci });
  const one = (inci: string) => ({ entry: entry(inci), matched: inci, by: 'inci' as const });
  const merged = mergeFound([one('Fenwort Oil'), one('Bog Fenwort Root Wax')], [one('FENWORT OIL'), one('FENWORT OILS')], 'fenwort oil');
  expect(merged.map(({ entry: { inci } }) => inci)).toEqual(['Fenwort Oil', 'FENWORT OIL', 'FENWORT OILS', 'Bog Fenwort Root Wax']);
});

const REAL = resolve('../shared/reference/eu/inci-inventory.tsv');
// Every step of it is tried above on small files.
test.skipIf(!existsSync(REAL))('the whole export of 2021 is taken over, and found in', async () => {
  await send(maud, readFileSync(REAL));
  const { names, last } = await settle(maud);
  expect(last).toMatchObject({ isRunning: false, updated: 0, unchanged: 0 });
  expect(last!.added + last!.joined).toBe(last!.total);
  expect([names, last!.total + last!.skipped.length]).toEqual([last!.added, 30_082]);
  expect((await found(maud, 'barley sh polypeptide 17'))[0]).toEqual(['BARLEY SH-POLYPEPTIDE-17', 'inventory']);
});

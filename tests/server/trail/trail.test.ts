import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import type { TrailLine } from '#shared/contracts/trail.contract.ts';
import { inHouse } from '#server/db/in-house.ts';
import { BRACKENMERE, BRAM, INES, MAUD, OTTERBY } from '#server/local/demo-people.ts';
import { TrailVerifier, type TrailEntry } from '#server/trail/chain.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';
import { openOrm } from '#server/db/orm.ts';

vi.setConfig({ testTimeout: 60_000 });
let stage: TestApp;
let ines: Client;
beforeAll(async () => {
  stage = await openTestApp();
  ines = await stage.as(INES);
}, 120_000);
afterAll(() => stage.close());

const trail = async (client: Client, query = ''): Promise<TrailLine[]> => ((await client.get(`/trail${query}`).expect(200)).body as { items: TrailLine[] }).items;
const begin = async (name: string): Promise<{ id: string; version: number; draft: { particulars: { batchCode: string } } }> =>
  (await ines.post('/products', { name, category: 'body-wash', markets: ['EU'] }).expect(200)).body as never;

test('H-01 a product’s beginning, change and putting away each stand once, with who, when and what', async () => {
  const { id, version, draft } = await begin('Trail wash');
  await ines.put(`/products/${id}`, { version, draft: { ...draft, particulars: { ...draft.particulars, batchCode: 'T-1' } } }).expect(200);
  await ines.post(`/products/${id}/archive`, { version: version + 1, archived: true }).expect(200);
  const lines = await trail(ines, `?product=${id}`);
  expect(lines.map(({ act, subject, actor }) => `${actor} ${act} ${subject}`)).toEqual(['Ines Tarrow put away Trail wash', 'Ines Tarrow saved Trail wash', 'Ines Tarrow added Trail wash']);
  expect(lines[1]!.changes).toEqual([{ where: 'Label, batch code', before: 'nothing', after: 'T-1' }]);
  expect(lines[0]!.at).toMatch(/^2026-12-01T09:00:00\.000Z$/);
});

test('H-01 a change that is refused leaves no entry', async () => {
  const { id, draft } = await begin('Refused wash');
  const before = (await trail(ines)).length;
  const head = (await trail(ines))[0]!.place;
  await ines.put(`/products/${id}`, { version: 99, draft }).expect(409);
  await ines.post('/products', { name: '', category: 'body-wash', markets: ['EU'] }).expect(422);
  expect((await trail(ines))[0]!.place).toBe(head);
  expect(before).toBeGreaterThan(0);
});

test('H-01 work that fails after its writes leaves neither the change nor the entry', async () => {
  const head = (await trail(ines))[0]!.place;
  const broken = inHouse(stage.orm.em, BRACKENMERE.id, async (em) => {
    await em.execute("update house set brand = 'Broken' where id = ?", [BRACKENMERE.id]);
    throw new Error('cut off');
  }, { actor: { personId: null, name: 'Nobody' }, now: () => new Date() });
  await expect(broken).rejects.toThrow('cut off');
  expect((await trail(ines))[0]!.place).toBe(head);
});

test('whoever takes a file away is noted with the file’s own hash', async () => {
  const { id } = ((await ines.get('/products?find=juniper').expect(200)).body as { items: { id: string }[] }).items[0]!;
  await ines.get(`/products/${id}/report.pdf`).expect(200);
  const [line] = await trail(ines, `?product=${id}`);
  expect(line).toMatchObject({ act: 'took away', subjectKind: 'file', actor: 'Ines Tarrow', productId: id });
});

test.each(["update trail_entry set actor = 'Someone else'", 'delete from trail_entry', 'truncate trail_entry'])('H-02 nobody may %s, the owner of the tables included', async (statement) => {
  await expect(inHouse(stage.orm.em, BRACKENMERE.id, (em) => em.execute(statement))).rejects.toThrow(/permission denied|only ever added/);
  const owner = await openOrm(stage.database.ownerUrl, { max: 1 });
  try {
    await expect(inHouse(owner.em, BRACKENMERE.id, (em) => em.execute(statement))).rejects.toThrow('only ever added');
  } finally {
    await owner.close(true);
  }
});

test('H-04 sixteen people writing at once leave one chain without a gap', async () => {
  const write = async (who: number): Promise<void> => {
    for (let i = 0; i < 12; i += 1) await ines.post('/materials', { tradeName: `Writer ${who}.${i}`, supplier: '', declareAs: 'ingredients', composition: [{ inci: 'Aqua', percent: '100' }], constituents: [], pricePerKg: null, currency: 'EUR', notes: '', handling: {} }).expect(200);
  };
  await Promise.all(Array.from({ length: 16 }, (_, who) => write(who)));
  expect((await ines.get('/trail/verify').expect(200)).body).toMatchObject({ isWhole: true });
});

test('H-07 the export alone is enough to verify the chain, and holds every entry', async () => {
  const answer = await ines.get('/trail/export').buffer(true).parse((res, done) => {
    const parts: Buffer[] = [];
    res.on('data', (part: Buffer) => parts.push(part));
    res.on('end', () => done(null, Buffer.concat(parts).toString()));
  }).expect(200);
  const entries = (answer.body as string).trim().split('\n').map((line) => JSON.parse(line) as TrailEntry);
  const verifier = new TrailVerifier(BRACKENMERE.id);
  entries.forEach((entry) => verifier.take(entry));
  expect(verifier.finish()).toMatchObject({ isWhole: true, entries: entries.length });
  // The taking away of the export itself is the next entry.
  expect((await trail(ines))[0]).toMatchObject({ place: entries.length + 1, act: 'took away' });
});

test('a foreign house sees nothing of it', async () => {
  const bram = await stage.as(BRAM);
  const subjects = (await trail(bram)).map(({ subject }) => subject);
  expect(subjects.some((subject) => /Writer|wash/.test(subject))).toBe(false);
  const { id } = await begin('Private wash');
  expect(await trail(bram, `?product=${id}`)).toEqual([]);
  expect(OTTERBY.id).not.toBe(BRACKENMERE.id);
});

test('pages follow each other to the beginning', async () => {
  const maud = await stage.as(MAUD);
  const seen: number[] = [];
  for (let before: number | undefined; ; ) {
    const { items, next } = (await maud.get(`/trail${before ? `?before=${before}` : ''}`).expect(200)).body as { items: TrailLine[]; next?: number };
    seen.push(...items.map(({ place }) => place));
    if (next === undefined) break;
    before = next;
  }
  expect(seen).toEqual(Array.from({ length: seen.length }, (_, i) => seen.length - i));
});

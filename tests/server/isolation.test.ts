import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { randomUUID } from 'node:crypto';
import { BRACKENMERE, BRAM, INES, MAUD, OTTERBY } from '#server/local/demo-people.ts';
import { demoId } from '#server/db/demo/demo-id.ts';
import { demoMaterialId } from '#server/db/demo/draft-parts.ts';
import { inHouse } from '#server/db/in-house.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';
import { queryOnce } from '#tests/support/database.ts';
import { callRoute, nameOf } from '#tests/support/route-calls.ts';

vi.setConfig({ testTimeout: 60_000 });

let stage: TestApp;
let bram: Client;
let maud: Client;
beforeAll(async () => {
  stage = await openTestApp();
  [bram, maud] = [await stage.as(BRAM), await stage.as(MAUD)];
}, 120_000);
afterAll(() => stage.close());

const PRODUCT = demoId('product Juniper & Oat Body Wash');
const MATERIAL = demoMaterialId('lavender');
const HOUSE_TABLES = ['material', 'material_document', 'product', 'product_evidence', 'product_material', 'product_revision', 'trail_entry', 'house_picture', 'inventory_import', 'inventory_chunk', 'inventory_name', 'membership', 'house'];

describe('D-03 another house', () => {
  test('its things answer exactly as things that do not exist, on every route that takes an id', async () => {
    const draft = (await maud.get(`/products/${PRODUCT}`)).body.product.draft as unknown;
    const { id: _id, version, savedAt: _at, savedBy: _by, archived: _archived, documents: _documents, usedIn: _usedIn, ...fields } = (await maud.get(`/materials/${MATERIAL}`)).body;
    const bodies: Readonly<Record<string, unknown>> = {
      'PUT /materials/:id': { ...fields, version },
      'POST /materials/:id/archive': { archived: true, version },
      'PUT /products/:id': { version: 1, draft },
      'POST /products/:id/copy': { name: 'Copy' },
      'POST /products/:id/archive': { archived: true, version: 1 },
    };
    const withIds = stage.routes.filter(({ endpoint }) => endpoint.path.includes(':id'));
    expect(withIds.length).toBeGreaterThanOrEqual(13);
    for (const one of withIds) {
      const known = one.endpoint.path.startsWith('/materials') ? MATERIAL : PRODUCT;
      const answers = [];
      for (const id of [known, randomUUID(), 'no-id']) {
        const { status, body, headers } = await callRoute(bram, one, { id, documentId: randomUUID() }, bodies[nameOf(one)]);
        const { requestId: _request, ...problem } = body as Record<string, unknown>;
        const { 'x-request-id': _own, date: _date, ...shown } = headers as Record<string, string>;
        answers.push({ status, problem, shown });
      }
      expect(answers[0]?.status, nameOf(one)).toBe(404);
      expect(answers[0], nameOf(one)).toEqual(answers[1]);
      expect(answers[0], nameOf(one)).toEqual(answers[2]);
    }
  });

  test('a product cannot be saved with a material of another house', async () => {
    const own = (await bram.get('/products')).body.items[0] as { id: string };
    const { product } = (await bram.get(`/products/${own.id}`)).body;
    product.draft.formula.phases[0].lines[0].materialId = MATERIAL;
    const answer = await bram.put(`/products/${own.id}`, { version: product.version, draft: product.draft });
    expect([answer.status, answer.body.issues]).toEqual([422, [{ pointer: '/draft/formula/phases/0/lines/0/materialId', message: 'This material is not in your house. Choose another or add it first.' }]]);
  });

  test('a person cannot choose a house that is not theirs', async () => {
    expect((await bram.put('/session/house', { houseId: BRACKENMERE.id })).status).toBe(404);
    expect((await bram.put('/session/house', { houseId: OTTERBY.id })).body.house.name).toBe('Otterby Still Room');
  });
});

describe('D-04 the second wall', () => {
  test('every table with a house column forces row-level security, with rules for reading and writing', async () => {
    const tables = await queryOnce<{ name: string; forced: boolean; using: boolean; check: boolean }>(
      stage.database.adminUrl,
      `select c.relname as name, c.relrowsecurity and c.relforcerowsecurity as forced,
              coalesce(bool_or(p.polqual is not null), false) as using, coalesce(bool_or(p.polwithcheck is not null), false) as check
       from pg_class c left join pg_policy p on p.polrelid = c.oid
       where c.relnamespace = 'public'::regnamespace and c.relkind = 'r'
         and (c.relname = 'house' or exists (select 1 from pg_attribute a where a.attrelid = c.oid and a.attname = 'house_id'))
         and c.relname <> 'session'
       group by c.oid order by 1`,
    );
    expect(tables.map(({ name }) => name)).toEqual([...HOUSE_TABLES, 'dictionary_entry'].sort());
    expect(tables.filter(({ forced, using, check }) => !(forced && using && check))).toEqual([]);
  });

  test('the tables hold rows, and the app sees none of them while no house is set', async () => {
    for (const table of HOUSE_TABLES) {
      const [all] = await queryOnce<{ count: string }>(stage.database.adminUrl, `select count(*) from ${table}`);
      const [seen] = await queryOnce<{ count: string }>(stage.database.url, `select count(*) from ${table}`);
      expect([table, seen?.count]).toEqual([table, '0']);
      if (table !== 'material_document' && table !== 'product_evidence' && table !== 'house_picture' && !table.startsWith('inventory_')) expect(Number(all?.count), table).toBeGreaterThan(0);
    }
  });

  test('without a filter in the query, a house still sees its own rows alone', async () => {
    const houses = await inHouse(stage.orm.em, OTTERBY.id, (em) => em.execute<{ house_id: string }[]>('select distinct house_id from product union select distinct house_id from material'));
    expect(houses).toEqual([{ house_id: OTTERBY.id }]);
  });

  test('a row cannot be written into, moved to or taken from another house', async () => {
    const insert = inHouse(stage.orm.em, OTTERBY.id, (em) =>
      em.execute('insert into product_material (product_id, material_id, house_id) values (?, ?, ?)', [PRODUCT, MATERIAL, BRACKENMERE.id]),
    );
    await expect(insert).rejects.toThrow('row-level security');
    const move = inHouse(stage.orm.em, BRACKENMERE.id, (em) => em.execute('update product set house_id = ? where id = ?', [OTTERBY.id, PRODUCT]));
    await expect(move).rejects.toThrow('row-level security');
    const taken = await inHouse(stage.orm.em, OTTERBY.id, (em) => em.execute<{ affectedRows: number }>('delete from product where id = ?', [PRODUCT], 'run'));
    expect(taken.affectedRows).toBe(0);
  });

  test('a saved revision cannot be changed by the app, nor by the owner of the tables', async () => {
    const change = 'update product_revision set version = 99';
    await expect(inHouse(stage.orm.em, BRACKENMERE.id, (em) => em.execute(change))).rejects.toThrow('permission denied');
    await expect(queryOnce(stage.database.adminUrl, change)).rejects.toThrow('only ever added');
    await expect(queryOnce(stage.database.adminUrl, 'delete from product_revision')).rejects.toThrow('only ever added');
    await expect(queryOnce(stage.database.adminUrl, 'truncate product_revision')).rejects.toThrow('only ever added');
  });

  test('the dictionary and the migrations are read by the app and not written', async () => {
    for (const table of ['dictionary_entry', 'dictionary_term', 'migration']) {
      await expect(queryOnce(stage.database.url, `delete from ${table}`)).rejects.toThrow('permission denied');
    }
  });
});

test('D-05 two houses at once on four connections never see each other', async () => {
  const ines = await stage.as(INES);
  const call = async (index: number) => {
    const [client, own] = index % 2 === 0 ? ([ines, 6] as const) : ([bram, 1] as const);
    if (index % 3 !== 0) return [(await client.get('/products')).body.total, own];
    return [(await client.get('/materials')).body.total > 1, own > 1];
  };
  for (let round = 0; round < 10; round += 1) {
    const answers = await Promise.all(Array.from({ length: 12 }, (_, index) => call(round * 12 + index)));
    expect(answers.filter(([seen, own]) => seen !== own)).toEqual([]);
  }
  expect(stage.faults).toEqual([]);
});

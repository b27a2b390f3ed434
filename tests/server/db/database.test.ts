import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import type { MikroORM } from '@mikro-orm/postgresql';
import { migrate } from '#server/db/migrate.ts';
import { openOrm } from '#server/db/orm.ts';
import { seedDemo } from '#server/db/demo/seed-demo.ts';
import { seedDictionary } from '#server/modules/dictionary/seed-dictionary.ts';
import { runQuery } from '#server/db/run-query.ts';
import { queryOnce, testDatabase, type TestDatabase } from '#tests/support/database.ts';
import { testDictionary } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 120_000 });

let database: TestDatabase;
let orm: MikroORM;
beforeAll(async () => {
  database = await testDatabase('migrated');
  orm = await openOrm(database.url, { max: 2 });
}, 120_000);
afterAll(async () => {
  await orm.close(true);
  await database.drop();
});

const rights = () => queryOnce(database.adminUrl, "select table_name, privilege_type from information_schema.role_table_grants where grantee = 'colophon_app' order by 1, 2");

test('migrating again changes nothing', async () => {
  const before = [await rights(), await queryOnce(database.adminUrl, 'select name from migration order by id')];
  await migrate(database.ownerUrl, new URL(database.url).username);
  expect([await rights(), await queryOnce(database.adminUrl, 'select name from migration order by id')]).toEqual(before);
});

test('every column of the mapper stands in the tables, with the same type of emptiness', async () => {
  const columns = await queryOnce<{ name: string; empty: boolean }>(database.adminUrl, "select table_name || '.' || column_name as name, is_nullable = 'YES' as empty from information_schema.columns where table_schema = 'public'");
  const standing = new Map(columns.map(({ name, empty }) => [name, empty]));
  const mapped = Object.values(orm.getMetadata().getAll()).flatMap((meta) => Object.values(meta.properties).map((property) => [`${meta.tableName}.${property.fieldNames[0]}`, property.nullable === true] as const));
  expect(mapped.length).toBeGreaterThan(50);
  expect(mapped.filter(([name, empty]) => standing.get(name) !== empty)).toEqual([]);
});

test('seeding twice gives the same rows, and work done in between stays', async () => {
  const now = new Date('2026-12-01T09:00:00Z');
  await seedDemo(orm.em, 'http://one.example', now);
  await queryOnce(database.adminUrl, "update product set name = 'Reworked' where name = 'Reed Lip Balm'");
  const rows = () => queryOnce(database.adminUrl, 'select id, name, version, saved_at from product order by id');
  const before = await rows();
  await seedDemo(orm.em, 'http://two.example', new Date('2027-01-01T00:00:00Z'));
  expect(await rows()).toEqual(before);
  expect(await queryOnce(database.adminUrl, 'select distinct issuer from person')).toEqual([{ issuer: 'http://two.example' }]);
});

test('the owner fills the dictionary through its wall, and the app may not', async () => {
  const entries = testDictionary().tables.entries.slice(0, 20);
  const owner = await openOrm(database.ownerUrl, { max: 1 });
  expect(await seedDictionary(runQuery(owner), entries, { release: 'test' })).toEqual({ added: 20, changed: 0, removed: 0 });
  expect(await seedDictionary(runQuery(owner), entries, { release: 'test' })).toEqual({ added: 0, changed: 0, removed: 0 });
  await owner.close(true);
  await expect(seedDictionary(runQuery(orm), entries.slice(0, 10), { release: 'test' })).rejects.toThrow('permission denied');
});

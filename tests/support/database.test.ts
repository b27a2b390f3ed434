import { afterAll, beforeAll, expect, test } from 'vitest';
import { queryOnce, testDatabase, type TestDatabase } from './database.ts';

let [first, second]: TestDatabase[] = [];

beforeAll(async () => {
  [first, second] = await Promise.all([testDatabase('bare'), testDatabase('bare')]);
}, 120_000);
afterAll(async () => {
  await first?.drop();
  await second?.drop();
});

test('two databases of one run share nothing', async () => {
  await queryOnce(first!.ownerUrl, 'CREATE TABLE only_here (id int)');
  expect(await queryOnce(second!.ownerUrl, "SELECT 1 FROM pg_tables WHERE tablename = 'only_here'")).toEqual([]);
});

test('the product is given a role without any special right', async () => {
  const [role] = await queryOnce(first!.url, 'SELECT rolsuper, rolbypassrls, rolcreatedb, rolcreaterole FROM pg_roles WHERE rolname = current_user');
  expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreatedb: false, rolcreaterole: false });
});

test('the product\'s role may not make tables', async () => {
  await expect(queryOnce(first!.url, 'CREATE TABLE mine (id int)')).rejects.toThrow('permission denied for schema public');
});

test('misspelled names can be compared', async () => {
  const rows = await queryOnce<{ near: boolean }>(first!.url, "SELECT similarity('glycerin', 'glycerine') > 0.6 AS near");
  expect(rows).toEqual([{ near: true }]);
});

import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { openCluster, stopServer, type Cluster } from '#server/boot/cluster.mjs';
import { queryOnce } from '#tests/support/database.ts';
import { makeHome, removeHome } from '#tests/support/product.ts';

// Making a cluster waits for the disk; a busy machine needs many seconds.
vi.setConfig({ testTimeout: 90_000, hookTimeout: 60_000 });

let home: string;
const open: Cluster[] = [];
const said: string[] = [];

beforeEach(() => {
  home = makeHome();
  said.length = 0;
});
afterEach(async () => {
  for (const cluster of open.splice(0)) await cluster.stop();
  removeHome(home);
});

async function start(port?: number): Promise<Cluster> {
  const cluster = await openCluster({ home, say: (line) => said.push(line), ...(port === undefined ? {} : { port }) });
  open.push(cluster);
  return cluster;
}

test('a new cluster is durable, checks its pages and is closed to all but loopback', async () => {
  const cluster = await start();
  const settings = await queryOnce<{ name: string; setting: string }>(
    // Some of these are shown to the superuser alone.
    cluster.adminUrl,
    "select name, setting from pg_settings where name in ('fsync', 'full_page_writes', 'synchronous_commit', 'data_checksums', 'listen_addresses', 'unix_socket_directories', 'password_encryption', 'lc_collate') order by name",
  );
  expect(Object.fromEntries(settings.map(({ name, setting }) => [name, setting]))).toEqual({
    data_checksums: 'on',
    fsync: 'on',
    full_page_writes: 'on',
    lc_collate: 'C.UTF-8',
    listen_addresses: '127.0.0.1',
    password_encryption: 'scram-sha-256',
    synchronous_commit: 'on',
    unix_socket_directories: '',
  });
  expect(statSync(join(home, 'cluster.json')).mode & 0o777).toBe(0o600);
});

test('no password, and a wrong one, are refused', async () => {
  const cluster = await start();
  const address = new URL(cluster.appUrl);
  address.password = 'wrong';
  await expect(queryOnce(address.href, 'select 1')).rejects.toThrow('password authentication failed');
});

test('the second start finds the rows of the first, on the same port', async () => {
  const first = await start();
  await queryOnce(first.ownerUrl, 'create table kept (id int)');
  await first.stop();
  const second = await start();
  expect(second.port).toBe(first.port);
  expect(await queryOnce(second.ownerUrl, 'select count(*)::int as rows from kept')).toEqual([{ rows: 0 }]);
});

test('a start that was cut off while making the cluster is made again', async () => {
  const making = join(home, 'postgres.making');
  mkdirSync(join(making, 'base'), { recursive: true });
  writeFileSync(join(making, 'PG_VERSION'), '15\n');
  const cluster = await start();
  expect(await queryOnce(cluster.appUrl, 'select 1 as one')).toEqual([{ one: 1 }]);
  expect(existsSync(making)).toBe(false);
  expect(said.join(' ')).toContain('cut off');
});

test('data without its password file is put aside, never thrown away', async () => {
  const first = await start();
  await first.stop();
  rmSync(join(home, 'cluster.json'));
  const second = await start();
  expect(await queryOnce(second.appUrl, 'select 1 as one')).toEqual([{ one: 1 }]);
  const aside = readdirSync(home).filter((name) => name.startsWith('postgres.aside-'));
  expect(aside).toHaveLength(1);
  expect(existsSync(join(home, aside[0]!, 'PG_VERSION'))).toBe(true);
});

test('a password file that was cut off half-way counts as none', async () => {
  const first = await start();
  await first.stop();
  writeFileSync(join(home, 'cluster.json'), '{"colophon_admin": "x');
  expect(await queryOnce((await start()).appUrl, 'select 1 as one')).toEqual([{ one: 1 }]);
});

test('a server that a killed start left running is stopped and started again', async () => {
  const first = await start();
  await queryOnce(first.ownerUrl, 'create table kept (id int); insert into kept values (7)');
  const second = await start();
  expect(second.pid).not.toBe(first.pid);
  expect(await queryOnce(second.ownerUrl, 'select id from kept')).toEqual([{ id: 7 }]);
  expect(said.join(' ')).toContain('still running');
});

test('rows outlive a server that is killed without warning', async () => {
  const first = await start();
  await queryOnce(first.ownerUrl, 'create table kept (id int); insert into kept values (7)');
  process.kill(first.pid, 'SIGKILL');
  await first.ended;
  const second = await start();
  expect(await queryOnce(second.ownerUrl, 'select id from kept')).toEqual([{ id: 7 }]);
});

test('a mark that names another program\'s process does not stop the start', async () => {
  const first = await start();
  await first.stop();
  const other = spawn('sleep', ['60']);
  const mark = join(first.data, 'postmaster.pid');
  writeFileSync(mark, `${String(other.pid)}\n${first.data}\n1\n${String(first.port)}\n\n127.0.0.1\n\nready   \n`);
  const second = await start();
  expect(await queryOnce(second.appUrl, 'select 1 as one')).toEqual([{ one: 1 }]);
  expect(other.exitCode).toBeNull();
  other.kill();
});

test('a port that another program has taken is left to it', async () => {
  const first = await start();
  await first.stop();
  const other = createServer();
  await new Promise<void>((resolve) => other.listen(first.port, '127.0.0.1', resolve));
  const second = await start();
  other.close();
  expect(second.port).not.toBe(first.port);
  expect(said.join(' ')).toContain(`Port ${String(first.port)} is taken`);
});

test('data of another release is named in a sentence', async () => {
  const first = await start();
  await first.stop();
  writeFileSync(join(first.data, 'PG_VERSION'), '9\n');
  await expect(start()).rejects.toThrow('was made by PostgreSQL 9');
});

test('a broken setting ends in a sentence with the reason', async () => {
  const first = await start();
  await first.stop();
  writeFileSync(join(first.data, 'colophon.conf'), 'shared_buffers = many\n');
  await expect(start()).rejects.toThrow(/The database did not start: FATAL:.*colophon\.conf/);
  expect(readFileSync(join(home, 'postgres.log'), 'utf8')).toContain('shared_buffers');
});

test('stopping a server that has ended already does nothing', async () => {
  const first = await start();
  await first.stop();
  await expect(stopServer(first.pid)).resolves.toBeUndefined();
});

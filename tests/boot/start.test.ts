import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync, readdirSync, readlinkSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { openCluster } from '#server/boot/cluster.mjs';
import { checkout } from '#tests/support/cluster.ts';
import { makeHome, removeHome, startProduct, type RunningProduct } from '#tests/support/product.ts';

// The first start of a checkout also builds it.
vi.setConfig({ testTimeout: 120_000, hookTimeout: 300_000 });

let home: string;
let running: RunningProduct | undefined;
beforeAll(async () => {
  home = makeHome();
  await start();
  await stop();
});
afterAll(async () => {
  await stop();
  removeHome(home);
});

async function start(env: Readonly<Record<string, string>> = {}): Promise<RunningProduct> {
  running = await startProduct(home, env);
  return running;
}

async function stop(): Promise<number | null | undefined> {
  const status = await running?.stop();
  running = undefined;
  return status;
}

/** Runs the starter to its end: for starts that are refused. */
function refused(env: Readonly<Record<string, string>> = {}): { status: number | null; words: string } {
  const { status, stdout, stderr } = spawnSync(process.execPath, [join(checkout, 'server/boot/start.mjs')], {
    cwd: checkout,
    env: { PATH: process.env['PATH'], HOME: process.env['HOME'], COLOPHON_DATA: home, ...env },
    encoding: 'utf8',
    timeout: 60_000,
  });
  return { status, words: `${stdout}${stderr}` };
}

/** Processes that belong to a home folder: its database, those whose settings name it, and those that write their words there. */
function processesOf(folder: string): number[] {
  return readdirSync('/proc').filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid).flatMap((name) => {
    const read = (file: string) => {
      try {
        return readFileSync(`/proc/${name}/${file}`, 'utf8');
      } catch {
        return '';
      }
    };
    const writesThere = (): boolean => {
      try {
        return readlinkSync(`/proc/${name}/fd/1`).startsWith(`${folder}/`);
      } catch {
        return false;
      }
    };
    const isOurs = writesThere() || read('cmdline').includes(`\0${folder}/`) || read('environ').includes(`COLOPHON_DATA=${folder}\0`);
    return isOurs && !/^State:\s+[ZX]/m.test(read('status')) ? [Number(name)] : [];
  });
}

async function allGone(): Promise<void> {
  await vi.waitFor(() => expect(processesOf(home)).toEqual([]), { timeout: 10_000, interval: 50 });
}

test('Ctrl-C stops everything within ten seconds and leaves no process', async () => {
  await start();
  // The starter, the database, the stand-ins and the server, at the least.
  expect(processesOf(home).length).toBeGreaterThanOrEqual(4);
  const began = Date.now();
  expect(await stop()).toBe(0);
  expect(Date.now() - began).toBeLessThan(10_000);
  await allGone();
});

test.each([50, 400, 1000, 1800])('a stop %i ms into a start ends it cleanly', async (ms) => {
  const child = spawn(process.execPath, [join(checkout, 'server/boot/start.mjs')], {
    cwd: checkout,
    env: { PATH: process.env['PATH'], HOME: process.env['HOME'], COLOPHON_DATA: home },
    stdio: 'ignore',
  });
  const ended = new Promise<number | NodeJS.Signals | null>((resolve) => child.once('exit', (status, signal) => resolve(status ?? signal)));
  await pause(ms);
  const began = Date.now();
  child.kill('SIGTERM');
  // In its first moments the program has not yet taken the signal into its own hands, and has begun nothing.
  expect([0, 'SIGTERM']).toContain(await ended);
  expect(Date.now() - began).toBeLessThan(10_000);
  await allGone();
});

test('a starter that is killed takes all it started with it, and the next start is clean', async () => {
  const { child } = await start();
  child.kill('SIGKILL');
  running = undefined;
  await allGone();
  const { words } = await start();
  expect(words()).not.toContain('still running');
  await stop();
});

test('a killed database ends the product in one sentence, and the next start keeps the data', async () => {
  const product = await start();
  const mark = join(home, 'postgres/postmaster.pid');
  const ended = new Promise<number | null>((resolve) => product.child.once('exit', resolve));
  process.kill(Number(readFileSync(mark, 'utf8').split('\n')[0]), 'SIGKILL');
  expect(await ended).toBe(1);
  running = undefined;
  expect(product.words()).toMatch(/The (database|server) ended by itself\. Start again;/);
  await allGone();
  await start();
  await stop();
});

test('a second start at the same time is told where the first one is', async () => {
  const { address } = await start();
  const second = refused();
  expect(second.status).toBe(1);
  expect(second.words).toContain(`already runs from this folder`);
  expect(second.words).toContain(address);
  expect((await fetch(`${address}/healthz`)).status).toBe(200);
  await stop();
});

test('a port that was asked for and is taken is named; one not asked for is stepped over', async () => {
  const other = createServer();
  const { app } = JSON.parse(readFileSync(join(home, 'ports.json'), 'utf8')) as { app: number };
  await new Promise<void>((resolve) => other.listen(app, '127.0.0.1', resolve));
  const asked = refused({ PORT: String(app) });
  expect([asked.status, asked.words]).toEqual([1, expect.stringContaining(`Port ${String(app)} is taken by another program`)]);
  const { address, words } = await start();
  expect(address).not.toBe(`http://127.0.0.1:${String(app)}`);
  expect(words()).toContain(`Port ${String(app)} is taken by another program; using `);
  await stop();
  other.close();
});

test('marks of a start that is gone do not stand in the way', async () => {
  writeFileSync(join(home, 'running.json'), JSON.stringify({ pid: process.pid, born: '1' }));
  await start();
  await stop();
  expect(existsSync(join(home, 'running.json'))).toBe(false);
  expect(readdirSync(home).filter((name) => /\.(mine|stale|half)$/.test(name))).toEqual([]);
});

test('A-08 A-09 J-04 production without its services is refused, every fault at once', () => {
  const { status, words } = refused({ NODE_ENV: 'production', OIDC_ISSUER: 'http://127.0.0.1:9' });
  expect(status).toBe(1);
  for (const name of ['OIDC_ISSUER: use https', 'OIDC_CLIENT_ID', 'S3_ENDPOINT', 'SMTP_URL', 'APP_URL']) expect(words).toContain(`  ${name}`);
  expect(words).not.toMatch(/\n {4}at /);
});

test('a database from outside is used, none is made, and I-03 one that forgets is refused', async () => {
  const elsewhere = makeHome();
  const own = makeHome();
  const sure = await openCluster({ home: elsewhere });
  const given = { COLOPHON_DATA: own, DATABASE_URL: sure.appUrl, DATABASE_OWNER_URL: sure.ownerUrl, COLOPHON_ANNOUNCE: join(home, 'announce.json') };
  try {
    const { address } = await start(given);
    expect((await fetch(`${address}/healthz`)).status).toBe(200);
    await stop();
    expect(existsSync(join(own, 'postgres'))).toBe(false);
  } finally {
    await sure.stop();
  }
  const away = refused(given);
  expect([away.status, away.words]).toEqual([1, expect.stringContaining('The database of DATABASE_URL was not reached')]);
  const forgetful = await openCluster({ home: elsewhere, port: sure.port, settings: { fsync: 'off' } });
  try {
    const { status, words } = refused(given);
    expect(status).toBe(1);
    expect(words).toContain('The database does not keep what it has confirmed; fsync is off');
    expect(words).not.toMatch(/\n {4}at /);
  } finally {
    await forgetful.stop();
    removeHome(elsewhere);
    rmSync(own, { recursive: true, force: true });
  }
});

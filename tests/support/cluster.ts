/** The one cluster of a test run: started by the first test that asks, gone when the run has ended. */
import { spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';

export const checkout = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

export interface TestCluster {
  /** Superuser, database `postgres`. */
  readonly adminUrl: string;
  readonly ownerUrl: string;
  readonly appUrl: string;
  /** Process that keeps it; absent when the cluster was given from outside. */
  readonly keeper?: number;
}

/** The test run's main process: the runner sets it; in a worker of a run without our set-up it is the parent. */
const runner = (): number => Number(process.env['COLOPHON_TEST_RUN'] ?? process.ppid);

/** Where the run's cluster lives. The database's account must reach it, so never in the checkout. */
export const clusterHome = (pid = runner()): string => join(tmpdir(), `colophon-test-${pid}`);

/**
 * The run's cluster, started on the first call. `TEST_DATABASE_ADMIN_URL` with
 * `TEST_DATABASE_OWNER_URL` and `TEST_DATABASE_APP_URL` name another one to use.
 */
export async function testCluster(): Promise<TestCluster> {
  const given = process.env['TEST_DATABASE_ADMIN_URL'];
  if (given !== undefined) {
    const [ownerUrl, appUrl] = [process.env['TEST_DATABASE_OWNER_URL'], process.env['TEST_DATABASE_APP_URL']];
    if (ownerUrl === undefined || appUrl === undefined) throw new Error('TEST_DATABASE_ADMIN_URL also needs TEST_DATABASE_OWNER_URL and TEST_DATABASE_APP_URL');
    return { adminUrl: given, ownerUrl, appUrl };
  }
  const home = clusterHome();
  if (!existsSync(home)) begin(home);
  const until = Date.now() + 60_000;
  for (;;) {
    const ready = read(join(home, 'ready.json'));
    if (ready !== undefined) return ready as unknown as TestCluster;
    const failed = read(join(home, 'failed.json'));
    if (failed !== undefined) throw new Error(`the test database did not start: ${String(failed['reason'])}`);
    if (Date.now() > until) throw new Error('the test database did not start within a minute');
    await pause(40);
  }
}

/** Making the folder decides which worker starts the cluster: only one can. */
function begin(home: string): void {
  try {
    mkdirSync(home);
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'EEXIST') return;
    throw error;
  }
  chmodSync(home, 0o755);
  const keeper = spawn(process.execPath, [join(checkout, 'server/boot/keep-cluster.mjs'), home, String(runner())], {
    detached: true,
    stdio: 'ignore',
    env: { PATH: process.env['PATH'] },
  });
  keeper.unref();
}

function read(file: string): Record<string, unknown> | undefined {
  return existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as Record<string, unknown>) : undefined;
}

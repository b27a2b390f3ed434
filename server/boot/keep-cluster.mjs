/**
 * Keeps a throwaway cluster for as long as one process lives: the test run
 * that asked for it. `node keep-cluster.mjs <home> <pid>`; writes
 * `<home>/ready.json` when the cluster can be used, and removes the whole
 * home when the process is gone, however it went.
 */
import { existsSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { openCluster } from './cluster.mjs';
import { writeJson } from './home.mjs';
import { isAlive, pause, startedAt } from './run.mjs';

const [home = '', watched = ''] = process.argv.slice(2);
const pid = Number(watched);
const born = startedAt(pid);
let asked = false;
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => (asked = true));

try {
  // Nothing here outlives the run, so nothing has to reach the disk.
  const cluster = await openCluster({ home, settings: { fsync: 'off', full_page_writes: 'off', synchronous_commit: 'off', max_connections: '200', autovacuum: 'off' } });
  let ended = false;
  void cluster.ended.then(() => (ended = true));
  writeJson(join(home, 'ready.json'), { adminUrl: cluster.adminUrl, ownerUrl: cluster.ownerUrl, appUrl: cluster.appUrl, keeper: process.pid });
  while (!asked && !ended && isAlive(pid) && startedAt(pid) === born) await pause(200);
  await cluster.stop();
} catch (error) {
  if (existsSync(home)) writeJson(join(home, 'failed.json'), { reason: error instanceof Error ? error.message : String(error) });
  await pause(5000);
} finally {
  rmSync(home, { recursive: true, force: true });
}

/** Runs once around a whole test run: names the run for its workers and waits until its cluster is gone. */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { clusterHome } from './cluster.ts';

export function setup(): () => Promise<void> {
  process.env['COLOPHON_TEST_RUN'] = String(process.pid);
  return async () => {
    const home = clusterHome(process.pid);
    const ready = join(home, 'ready.json');
    if (!existsSync(ready)) return;
    const { keeper } = JSON.parse(readFileSync(ready, 'utf8')) as { keeper: number };
    try {
      process.kill(keeper, 'SIGTERM');
    } catch {
      return;
    }
    for (let waited = 0; existsSync(home) && waited < 10_000; waited += 50) await pause(50);
  };
}

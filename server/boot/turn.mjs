/** One start at a time in a home folder. */
import { closeSync, openSync, rmSync, writeSync } from 'node:fs';
import { join } from 'node:path';
import { readJson, writeJson } from './home.mjs';
import { isAlive, startedAt } from './run.mjs';
import { Stop } from './say.mjs';

/** Takes the turn; a mark left by a killed start is taken over.
 * @param {string} home
 * @returns {{ announce: (address: string) => void, release: () => void }} */
export function takeTurn(home) {
  const file = join(home, 'running.json');
  const mine = { pid: process.pid, born: startedAt(process.pid) };
  for (let attempt = 0; ; attempt += 1) {
    try {
      const handle = openSync(file, 'wx', 0o600);
      writeSync(handle, JSON.stringify(mine));
      closeSync(handle);
      break;
    } catch (error) {
      if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST') || attempt > 3) throw error;
      const other = readJson(file);
      const pid = Number(other?.['pid']);
      if (Number.isInteger(pid) && pid > 0 && pid !== process.pid && isAlive(pid) && startedAt(pid) === other?.['born']) {
        const where = typeof other['address'] === 'string' ? `at ${other['address']}` : 'and is still starting';
        throw new Stop(`Colophon already runs from this folder (process ${pid}) ${where}. Open that, or stop it with Ctrl-C first.`);
      }
      rmSync(file, { force: true });
    }
  }
  return {
    announce: (address) => writeJson(file, { ...mine, address }),
    release: () => rmSync(file, { force: true }),
  };
}

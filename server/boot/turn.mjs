/** One start at a time in a home folder; one at a time that installs or builds in a checkout. */
import { linkSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { readJson, writeJson } from './home.mjs';
import { isAlive, pause, startedAt } from './run.mjs';
import { Stop } from './say.mjs';

/** @typedef {{ pid: number, born: string, address?: string }} Holder */

/** Takes the turn in a home folder; a mark left by a killed start is taken over.
 * @param {string} home
 * @returns {{ announce: (address: string) => void, release: () => void }} */
export function takeTurn(home) {
  const file = join(home, 'running.json');
  const holder = take(file);
  if (holder) {
    const where = holder.address ? `at ${holder.address}` : 'and is still starting';
    throw new Stop(`Colophon already runs from this folder (process ${holder.pid}) ${where}. Open that, or stop it with Ctrl-C first.`);
  }
  return {
    announce: (address) => writeJson(file, { ...self(), address }),
    release: () => rmSync(file, { force: true }),
  };
}

/** Does work in a checkout while nobody else installs or builds there.
 * @template T
 * @param {string} checkout @param {(line: string) => void} say @param {() => Promise<T>} work
 * @param {AbortSignal} [signal] gives up waiting
 * @returns {Promise<T>} */
export async function inCheckout(checkout, say, work, signal) {
  const folder = join(checkout, '.local');
  const file = join(folder, 'preparing.json');
  let hasSaid = false;
  for (let holder = begin(); holder; holder = begin()) {
    if (!hasSaid) say(`Another start (process ${holder.pid}) is preparing this folder; waiting for it.`);
    hasSaid = true;
    await pause(200);
    signal?.throwIfAborted();
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }

  function begin() {
    try {
      mkdirSync(folder, { recursive: true });
      return take(file);
    } catch (error) {
      const code = error instanceof Error && 'code' in error ? error.code : undefined;
      // On a read-only disk a folder that cannot be made is told as one that is not there.
      if (code !== 'EROFS' && code !== 'EACCES' && code !== 'EPERM' && code !== 'ENOENT') throw error;
      throw new Stop(`Packages or programs have to be made in ${checkout}, and nothing can be written there. Start as the owner of that folder, or copy it to a place of your own and start there.`);
    }
  }
}

/** @returns {Holder} */
function self() {
  return { pid: process.pid, born: startedAt(process.pid) };
}

/** Puts our mark, whole or not at all.
 * @param {string} file
 * @returns {Holder | undefined} who holds the turn instead of us */
function take(file) {
  const mine = `${file}.${process.pid}.mine`;
  const stale = `${file}.${process.pid}.stale`;
  writeFileSync(mine, JSON.stringify(self()), { mode: 0o600 });
  try {
    for (;;) {
      if (tryTo(() => linkSync(mine, file), 'EEXIST')) return undefined;
      const holder = living(file);
      if (holder) return holder;
      // Of two starts that find the same stale mark only one can move it; the other looks again.
      if (!tryTo(() => renameSync(file, stale), 'ENOENT')) continue;
      const moved = living(stale);
      // Another start was quicker, and what we moved was its fresh mark: it gets it back.
      if (moved) tryTo(() => linkSync(stale, file), 'EEXIST');
      rmSync(stale, { force: true });
      if (moved) return moved;
    }
  } finally {
    rmSync(mine, { force: true });
  }
}

/** Whose mark it is, when that process still runs.
 * @param {string} file @returns {Holder | undefined} */
function living(file) {
  const mark = readJson(file);
  const pid = Number(mark?.['pid']);
  if (!mark || !Number.isInteger(pid) || pid <= 0 || !isAlive(pid) || startedAt(pid) !== mark['born']) return undefined;
  return { pid, born: String(mark['born']), ...(typeof mark['address'] === 'string' ? { address: mark['address'] } : {}) };
}

/** @param {() => void} work @param {string} expected fault that means no
 * @returns {boolean} */
function tryTo(work, expected) {
  try {
    work();
    return true;
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === expected) return false;
    throw error;
  }
}

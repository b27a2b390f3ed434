/** The product's own processes: the server, and the stand-ins for services that are not given. */
import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { endProcess, pause } from './run.mjs';
import { Stop } from './say.mjs';

/** @typedef {{ pid: number, ended: Promise<number | null>, child: import('node:child_process').ChildProcess, words: () => string, stop: () => Promise<void> }} Running */

/** Starts one program in a group of its own, so that Ctrl-C reaches the starter alone. Its words go to a file.
 * @param {{ file: string, cwd: string, log: string, env: NodeJS.ProcessEnv }} options
 * @returns {Running} */
export function startProgram({ file, cwd, log, env }) {
  if (existsSync(log) && statSync(log).size > 4 * 1024 * 1024) renameSync(log, `${log}.1`);
  const from = existsSync(log) ? statSync(log).size : 0;
  const out = openSync(log, 'a', 0o600);
  const leash = fileURLToPath(new URL('./with-parent.mjs', import.meta.url));
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', leash, file], { cwd, env, detached: true, stdio: ['ignore', out, out, 'ipc'] });
  closeSync(out);
  const ended = new Promise((/** @type {(status: number | null) => void} */ resolve) => {
    child.once('error', () => resolve(null));
    child.once('exit', (status) => resolve(status));
  });
  return {
    pid: child.pid ?? 0,
    child,
    ended,
    words: () => readFileSync(log).subarray(from).toString('utf8').trim(),
    stop: async () => {
      if (child.pid !== undefined && child.exitCode === null && child.signalCode === null) await endProcess(child.pid, [['SIGTERM', 3500], ['SIGKILL', 500]]);
    },
  };
}

/** Starts the stand-ins that are wished for.
 * @param {{ file: string, checkout: string, home: string, wish: Record<string, unknown>, signal?: AbortSignal }} options
 * @returns {Promise<Running & { urls: { identity?: string, mail?: string, storage?: string } }>} */
export async function startLocalServices({ file, checkout, home, wish, signal }) {
  const running = startProgram({ file, cwd: checkout, log: join(home, 'services.log'), env: { PATH: process.env['PATH'], NODE_ENV: String(wish['mode']) } });
  running.child.send(wish);
  const answer = await Promise.race([
    new Promise((resolve) => running.child.once('message', resolve)),
    running.ended.then(() => ({ failed: running.words() })),
    answerless(signal),
  ]);
  if ('failed' in answer) {
    await running.stop();
    signal?.throwIfAborted();
    throw new Stop(`The local stand-ins for sign-in, mail and files did not start: ${answer.failed}`);
  }
  return { ...running, urls: answer };
}

/** @param {AbortSignal | undefined} signal
 * @returns {Promise<{ failed: string }>} */
function answerless(signal) {
  return new Promise((resolve) => {
    const timer = setTimeout(() => resolve({ failed: 'no answer within half a minute' }), 30_000);
    timer.unref();
    signal?.addEventListener('abort', () => resolve({ failed: 'stopped' }), { once: true });
  });
}

/** Waits until the server answers.
 * @param {Running} server @param {URL} address @param {AbortSignal} [signal] gives up waiting */
export async function waitForServer(server, address, signal) {
  const until = Date.now() + 60_000;
  let ended = false;
  let listens = false;
  void server.ended.then(() => (ended = true));
  // Its own word first: at its address another program might answer.
  server.child.once('message', () => (listens = true));
  while (!ended && Date.now() < until && !signal?.aborted) {
    await pause(20);
    if (!listens) continue;
    try {
      const answer = await fetch(new URL('/healthz', address), { signal: AbortSignal.timeout(2000) });
      if (answer.ok) return;
    } catch {
      // Its database is still waking up.
    }
  }
  await server.stop();
  signal?.throwIfAborted();
  throw whyNot(server.words());
}

/** Why a server that ended by itself did so, as a sentence. @param {Running} server @param {string} record its file of words */
export function whyEnded(server, record) {
  const words = server.words();
  if (/ENOSPC|No space left/.test(words)) return 'The server ended by itself: the disk is full. Free about 1 GB and start again; nothing that was saved is lost.';
  return `The server ended by itself. Start again; its last words are in ${record}.`;
}

/** The sentence in which a program of ours has told why it does not start. @param {string} words */
export function toldIn(words) {
  const told = /^Colophon cannot start: ([^]*)$/m.exec(words)?.[1]?.trim();
  return told && `${told.charAt(0).toUpperCase()}${told.slice(1)}`;
}

/** @param {string} words */
function whyNot(words) {
  if (/EADDRINUSE/.test(words)) return new Stop('The port was taken by another program just now. Start again, or set PORT to a free one.');
  // A fault that the server knows is told in its own sentence.
  const told = toldIn(words);
  if (told) return new Stop(told);
  if (/ENOSPC|No space left/.test(words)) return new Stop('The disk is full. Free about 1 GB and start again; nothing that was saved is lost.');
  return new Stop(`The server did not start. Its last words:\n${words.split('\n').slice(-30).join('\n')}`);
}

/** Running other programs and looking at processes, without a shell. */
import { spawn, spawnSync } from 'node:child_process';
import { readFileSync, readlinkSync } from 'node:fs';

/** Runs a program to its end and gives what it printed.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, uid?: number, gid?: number, input?: string, timeout?: number }} [options] */
export function run(command, args, options = {}) {
  const done = spawnSync(command, args, { encoding: 'utf8', maxBuffer: 64 * 1024 * 1024, stdio: ['pipe', 'pipe', 'pipe'], ...options });
  return {
    ok: done.status === 0,
    status: done.status,
    missing: done.error !== undefined && 'code' in done.error && done.error.code === 'ENOENT',
    out: done.stdout ?? '',
    err: (done.stderr ?? '') + (done.error ? String(done.error.message) : ''),
  };
}

/** Programs that follow() waits for at this moment.
 * @type {Set<import('node:child_process').ChildProcess>} */
const followed = new Set();

/** Asks every program that is being followed to end: the reader wants to stop. */
export function endFollowed() {
  for (const child of followed) child.kill('SIGTERM');
}

/** Runs a program with its output shown, line by line, behind a margin.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, show?: (line: string) => void }} [options]
 * @returns {Promise<{ status: number | null, tail: string }>} the last 4,000 characters it printed */
export function follow(command, args, { show, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    followed.add(child);
    let tail = '';
    let line = '';
    const take = (/** @type {Buffer} */ chunk) => {
      const text = chunk.toString('utf8');
      tail = (tail + text).slice(-4000);
      if (!show) return;
      line += text;
      const lines = line.split('\n');
      line = lines.pop() ?? '';
      for (const each of lines) show(each);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.on('error', (error) => {
      followed.delete(child);
      reject(error);
    });
    child.on('close', (status) => {
      followed.delete(child);
      resolve({ status, tail });
    });
  });
}

/** Is there a process of that number (ours or another's)?
 * @param {number} pid */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EPERM')) return false;
  }
  // A process that has ended but was not collected by its parent still has a number.
  return !/^State:\s+[ZX]/m.test(readProc(pid, 'status'));
}

/** When the process began, in kernel ticks since boot: tells two processes of one number apart.
 * @param {number} pid */
export function startedAt(pid) {
  const stat = readProc(pid, 'stat');
  return stat === '' ? '' : (stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? '');
}

/** The folder a process works in; empty when it cannot be seen.
 * @param {number} pid */
export function folderOf(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch {
    return '';
  }
}

/** @param {number} pid @param {string} file */
function readProc(pid, file) {
  try {
    return readFileSync(`/proc/${pid}/${file}`, 'utf8');
  } catch {
    return '';
  }
}

/** @param {number} ms */
export const pause = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/** Waits until a process has ended.
 * @param {number} pid @param {number} ms
 * @returns {Promise<boolean>} false when it still runs after that time */
export async function waitForEnd(pid, ms) {
  const until = Date.now() + ms;
  while (isAlive(pid)) {
    if (Date.now() > until) return false;
    await pause(25);
  }
  return true;
}

/** Asks a process to end, then insists.
 * @param {number} pid
 * @param {readonly (readonly [NodeJS.Signals, number])[]} steps signal and how long to wait after it, in ms */
export async function endProcess(pid, steps) {
  for (const [signal, ms] of steps) {
    try {
      process.kill(pid, signal);
    } catch {
      return;
    }
    if (await waitForEnd(pid, ms)) return;
  }
}

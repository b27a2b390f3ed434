/** The product as its reader starts it, in a home folder of its own. */
import { spawn, type ChildProcess } from 'node:child_process';
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { checkout } from './cluster.ts';

export interface RunningProduct {
  readonly address: string;
  readonly home: string;
  readonly child: ChildProcess;
  /** Everything it said so far. */
  words(): string;
  /** Stops it as Ctrl-C does. @returns its exit status */
  stop(): Promise<number | null>;
}

/** A folder the database's account can reach. The caller removes it. */
export function makeHome(): string {
  const home = mkdtempSync(join(tmpdir(), 'colophon-home-'));
  chmodSync(home, 0o755);
  return home;
}

export function removeHome(home: string): void {
  rmSync(home, { recursive: true, force: true });
}

/** Runs `npm start`'s program until it says that it is ready. @throws with its words when it ends before */
export async function startProduct(home: string, env: Readonly<Record<string, string>> = {}): Promise<RunningProduct> {
  const announce = join(home, 'announce.json');
  rmSync(announce, { force: true });
  const child = spawn(process.execPath, [join(checkout, 'server/boot/start.mjs')], {
    cwd: checkout,
    env: { PATH: process.env['PATH'], HOME: process.env['HOME'], COLOPHON_DATA: home, COLOPHON_ANNOUNCE: announce, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let words = '';
  child.stdout.on('data', (chunk: Buffer) => (words += chunk.toString('utf8')));
  child.stderr.on('data', (chunk: Buffer) => (words += chunk.toString('utf8')));
  const ended = new Promise<number | null>((resolve) => child.once('close', resolve));
  let isOver = false;
  void ended.then(() => (isOver = true));
  const until = Date.now() + 240_000;
  while (!existsSync(announce)) {
    if (isOver) throw new Error(words);
    if (Date.now() > until) {
      child.kill('SIGTERM');
      throw new Error(`not ready within four minutes: ${words}`);
    }
    await pause(50);
  }
  const { address } = JSON.parse(readFileSync(announce, 'utf8')) as { address: string };
  return {
    address,
    home,
    child,
    words: () => words,
    stop: () => {
      child.kill('SIGINT');
      return ended;
    },
  };
}

import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { formulaMix } from './formula-mix.ts';
import { median, type Row } from './report.ts';

const ROOT = join(import.meta.dirname, '../..');
const CLI = join(ROOT, 'server/cli/run.mjs');
/** GNU time, which tells a process's largest resident memory, its threads included. */
const TIME = '/usr/bin/time';
/** A longer file may take this much more memory than a shorter one and still be called flat. */
const FLAT = 1.15;
const LARGEST_ANSWER = 2 * 1024 * 1024 * 1024;

/** The command line's promises: its start, and JSON Lines by the thousand, of one formula and of many. */
export function runCliBench(): Row[] {
  const folder = mkdtempSync(join(tmpdir(), 'colophon-bench-'));
  try {
    const wash = JSON.stringify(JSON.parse(readFileSync(join(ROOT, 'tests/reference/fixtures/body-wash.json'), 'utf8')));
    const one = join(folder, 'one.json');
    writeFileSync(one, wash);
    const mix = formulaMix(1000).map((formula) => JSON.stringify(formula));
    return [
      startOf('schema', ['schema', 'formula']),
      startOf('check of one formula', ['check', one]),
      throughput('one body wash, again and again', (count) => Array.from({ length: count }, () => wash), { folder, counts: [1000, 10_000] }),
      throughput('1,000 different formulas', (count) => mix.slice(0, count), { folder, counts: [100, 500] }),
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The command line's own start, and beside it the same with npm in front, whose start is not ours. */
function startOf(name: string, words: readonly string[]): Row {
  const own = median(timesOf(process.execPath, [CLI, ...words]));
  const withNpm = median(timesOf('npm', ['run', '--silent', 'colophon', '--', ...words]));
  return { name: `command line: ${name}`, measured: `${Math.round(own)} ms; ${Math.round(withNpm)} ms with npm's own start`, promise: 'under 400 ms without npm', isKept: own < 400 };
}

function timesOf(program: string, words: readonly string[]): number[] {
  return Array.from({ length: 7 }, () => {
    const from = performance.now();
    spawnSync(program, words, { cwd: ROOT });
    return performance.now() - from;
  }).slice(1);
}

interface Runs {
  readonly folder: string;
  readonly counts: readonly [number, number];
}

/** Formulas a second from the second part of a run, since start-up is measured elsewhere; and the memory of the short and of the long run. */
function throughput(name: string, lines: (count: number) => readonly string[], { folder, counts }: Runs): Row {
  const [small, large] = counts.map((count) => {
    const file = join(folder, 'lines.jsonl');
    writeFileSync(file, lines(count).join('\n'));
    const from = performance.now();
    const { stderr } = spawnSync(TIME, ['-f', 'kilobytes %M', process.execPath, CLI, 'check', file], { encoding: 'utf8', maxBuffer: LARGEST_ANSWER, stdio: ['ignore', 'ignore', 'pipe'] });
    return { seconds: (performance.now() - from) / 1000, megabytes: parseInt(/kilobytes (\d+)/.exec(stderr)?.[1] ?? '0', 10) / 1024 };
  }) as [{ seconds: number; megabytes: number }, { seconds: number; megabytes: number }];
  const perSecond = (counts[1] - counts[0]) / (large.seconds - small.seconds);
  return {
    name: `check of JSON Lines, ${name}`,
    measured: `${Math.round(perSecond)} formulas/s; ${Math.round(small.megabytes)} MB at ${counts[0]} lines, ${Math.round(large.megabytes)} MB at ${counts[1]}`,
    promise: 'at least 1,000 formulas/s, memory within 15 %',
    isKept: perSecond >= 1000 && small.megabytes > 0 && large.megabytes < small.megabytes * FLAT,
  };
}

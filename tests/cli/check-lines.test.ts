import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterAll, expect, test } from 'vitest';
import { checkLines } from '#server/cli/check-lines.ts';
import type { Io } from '#server/cli/io.ts';
import { judgeLine } from '#server/cli/judge-line.ts';
import { LineWorkers } from '#server/cli/line-workers.ts';
import { openKnowledge } from '#server/cli/tables.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { formulaMix } from '#tests/bench/formula-mix.ts';

const ROOT = join(import.meta.dirname, '../..');
const folder = mkdtempSync(join(tmpdir(), 'colophon-lines-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const knows = openKnowledge(ROOT, plainDate('2026-12-01'));
const flags = { markets: [], placed: plainDate('2026-12-01'), available: plainDate('2026-12-01') };
const fixtures = ['body-wash', 'hand-cream-slip'].map((name) => JSON.stringify(JSON.parse(readFileSync(join(ROOT, `tests/reference/fixtures/${name}.json`), 'utf8'))));
const mixed = formulaMix(90, 7).map((one) => JSON.stringify(one));
/** Long enough for other threads to take part, with lines that are unusable in four ways. */
const lines = [...fixtures, ...mixed.slice(0, 40), '{"document":', ...fixtures, ...mixed.slice(40), '[[[[', '"text"', fixtures[0]!.replace('"amount":"5"', '"amount":"-5"')];

test('a long file shared among threads says of every line what the line says alone, in order', () => {
  const file = join(folder, 'long.jsonl');
  writeFileSync(file, lines.join('\n'));
  const { stdout, stderr, status } = spawnSync(process.execPath, [join(ROOT, 'server/cli/run.mjs'), 'check', file, '--placed', '2026-12-01', '--available', '2026-12-01'], { encoding: 'utf8', maxBuffer: 256 * 1024 * 1024 });
  const alone = lines.map((text, index) => judgeLine({ number: index + 1, text }, flags, knows));
  expect(stdout.split('\n').length).toBe(lines.length + 1);
  expect(stdout).toBe(alone.map(({ text }) => text).join(''));
  expect(stderr).toBe(alone.flatMap(({ tells }) => tells).map((words) => `${words}\n`).join(''));
  expect([status, alone.filter((one) => one.status === 2).length]).toEqual([2, 4]);
}, 120_000);

test('a thread that ends loses no line', async () => {
  const pool = new LineWorkers(2, { flags, knows, root: ROOT }, new URL('data:text/javascript,process.exit(7)'));
  const batches = [0, 1, 2, 3].map((at) => lines.slice(at * 2, at * 2 + 2).map((text, index) => ({ number: at * 2 + index + 1, text })));
  const judged = await Promise.all(batches.map((batch) => pool.judge(batch)));
  await pool.close();
  expect(judged).toEqual(batches.map((batch) => batch.map((line) => judgeLine(line, flags, knows))));
}, 60_000);

test('one answer is taken before the next is given', async () => {
  const file = join(folder, 'slow.jsonl');
  writeFileSync(file, `${fixtures[0]!}\n`.repeat(3));
  let open = 0;
  let most = 0;
  const io: Io = {
    stdin: Readable.from([]),
    tell: () => undefined,
    write: async () => {
      most = Math.max(most, (open += 1));
      await new Promise((resolve) => setTimeout(resolve, 5));
      open -= 1;
    },
  };
  expect(await checkLines({ command: 'check', file, ...flags }, knows, { io, root: ROOT, workers: 0 })).toBe(0);
  expect(most).toBe(1);
}, 60_000);

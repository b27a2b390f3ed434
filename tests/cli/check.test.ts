import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, test } from 'vitest';

const ROOT = join(import.meta.dirname, '../..');
const folder = mkdtempSync(join(tmpdir(), 'colophon-cli-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const fixture = (name: string): string => readFileSync(join(ROOT, 'tests/reference/fixtures', name), 'utf8');

function run(words: readonly string[], input?: string): { status: number | null; out: string; err: string } {
  const done = spawnSync(process.execPath, [join(ROOT, 'server/cli/run.mjs'), ...words], { encoding: 'utf8', ...(input !== undefined && { input }) });
  return { status: done.status, out: done.stdout, err: done.stderr };
}

describe('check', () => {
  test('answers a sound document with 0 and nothing but JSON', () => {
    const { status, out } = run(['check', '-', '--market', 'EU'], `\uFEFF${fixture('body-wash.json')}`);
    expect(status).toBe(0);
    expect((JSON.parse(out) as { results: { market: string }[] }).results.map(({ market }) => market)).toEqual(['EU']);
  }, 60_000);

  test('answers a document that stops sale with 1', () => {
    expect(run(['check', '-'], fixture('hand-cream-slip.json')).status).toBe(1);
  }, 60_000);

  test('refuses an unusable document with 2, its pointers on standard error and nothing on standard output', () => {
    const { status, out, err } = run(['check', '-'], fixture('body-wash.json').replace('"amount": "5"', '"amount": "-5"'));
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain('/formula/lines/1/amount: ');
  }, 60_000);

  test.each([[['check']], [['bake', 'x']], [['check', '-', '--market', 'FR']], [['check', '-', '--placed', 'soon']], [['check', 'no-such-file.json']]])('%j is refused with 2', (words) => {
    expect(run(words, '')).toMatchObject({ status: 2, out: '' });
  }, 60_000);

  test('goes on after an unusable line and ends with 2', () => {
    const file = join(folder, 'many.jsonl');
    const one = JSON.stringify(JSON.parse(fixture('body-wash.json')));
    writeFileSync(file, `${one}\n{"document":\n${one}\n`);
    const { status, out } = run(['check', file]);
    const lines = out.trimEnd().split('\n').map((text) => JSON.parse(text) as { document: string; line?: number });
    expect(status).toBe(2);
    expect(lines.map(({ document, line }) => [document, line])).toEqual([['result/1', undefined], ['error/1', 2], ['result/1', undefined]]);
  }, 60_000);
});

test.each(['formula', 'result', 'reading'])('the JSON Schema of %s is printed', (name) => {
  const { status, out } = run(['schema', name]);
  expect([status, (JSON.parse(out) as { type: string }).type]).toEqual([0, 'object']);
}, 60_000);

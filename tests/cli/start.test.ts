import { spawnSync } from 'node:child_process';
import { appendFileSync, cpSync, mkdtempSync, readFileSync, rmSync, statSync, symlinkSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';

const ROOT = join(import.meta.dirname, '../..');
const checkout = mkdtempSync(join(tmpdir(), 'colophon-start-'));
afterAll(() => rmSync(checkout, { recursive: true, force: true }));

const NAME = 'Brackenmere Moss Extract';
const DOCUMENT = JSON.stringify({
  document: 'formula/1',
  product: { name: 'Moss wash', brand: 'Brackenmere Bathhouse', category: 'body-wash', markets: ['EU'] },
  materials: [{ id: 'moss', tradeName: 'Moss', composition: [{ inci: NAME, percent: '100' }] }],
  formula: { batchSize: { value: '100', unit: 'g' }, lines: [{ material: 'moss', phase: 'A', unit: 'qs' }] },
});

function check(): { readonly release: string; readonly unknown: string[] } {
  const { stdout, stderr } = spawnSync(process.execPath, [join(checkout, 'server/cli/run.mjs'), 'check', '-'], { encoding: 'utf8', input: DOCUMENT });
  if (stdout === '') throw new Error(stderr);
  const result = JSON.parse(stdout) as { dataRelease: string; results: { findings: { kind: string; subject: string }[] }[] };
  return { release: result.dataRelease, unknown: result.results.flatMap(({ findings }) => findings.filter(({ kind }) => kind === 'unknown-ingredient').map(({ subject }) => subject)) };
}

/** Changes a file and gives it its old date back, as copying tools do. */
function changeQuietly(file: string, change: (path: string) => void): void {
  const path = join(checkout, file);
  const { atime, mtime } = statSync(path);
  change(path);
  utimesSync(path, atime, mtime);
}

test('a checkout without a build answers, and never from tables that have changed since', () => {
  for (const part of ['server/cli', 'server/artwork', 'shared', 'data', 'package.json', 'tsconfig.json']) cpSync(join(ROOT, part), join(checkout, part), { recursive: true });
  symlinkSync(join(ROOT, 'node_modules'), join(checkout, 'node_modules'));
  const before = check();
  expect(before.unknown).toEqual([NAME]);
  expect(check()).toEqual(before);

  changeQuietly('data/dictionary/extracts.csv', (path) => appendFileSync(path, `brackenmere-moss-extract,${NAME},,,,,,,,,,,,,made up for this test\n`));
  expect(check()).toEqual({ ...before, unknown: [] });

  changeQuietly('data/law/release.json', (path) => writeFileSync(path, readFileSync(path, 'utf8').replace('2026-12"', '2027-01"')));
  expect(check().release).toBe(before.release.replaceAll('2026-12', '2027-01'));
}, 120_000);

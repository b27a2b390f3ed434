import { readFileSync, readdirSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import { expect, test } from 'vitest';

/** The arrows of DEVELOPERS.md, checked apart from the linter so that a disabled lint still fails. */

const ROOT = resolve(import.meta.dirname, '..');
const CODE = /\.(ts|tsx|mjs|js)$/;

function filesBelow(folder: string): string[] {
  return readdirSync(join(ROOT, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && CODE.test(entry.name))
    .map((entry) => relative(ROOT, join(entry.parentPath, entry.name)));
}

function importsOf(file: string): string[] {
  const text = readFileSync(join(ROOT, file), 'utf8');
  const found = text.matchAll(/(?:from|import)\s*\(?\s*['"]([#.][^'"]+)['"]/g);
  return [...found].map((match) => {
    const target = match[1]!;
    return target.startsWith('#') ? target.slice(1) : relative(ROOT, resolve(ROOT, file, '..', target));
  });
}

const ROOMS = ['src', 'server', 'shared'].flatMap(filesBelow);

/** Each room and what it may never import. */
const FORBIDDEN: readonly (readonly [string, readonly string[]])[] = [
  ['shared/', ['src/', 'server/', 'tests/', 'migrations/']],
  ['shared/kernel/', ['shared/law/', 'shared/rules/', 'shared/engine/', 'shared/artwork/', 'shared/contracts/', 'shared/dictionary/', 'shared/product/', 'shared/report/', 'data/']],
  ['shared/law/', ['shared/rules/', 'shared/engine/', 'shared/artwork/', 'shared/product/', 'shared/report/']],
  ['src/', ['server/', 'data/', 'tests/']],
  ['server/', ['src/', 'tests/']],
  ['src/ui/', ['src/features/', 'src/routes/', 'src/app/']],
  ['src/lib/', ['src/features/', 'src/routes/', 'src/app/', 'src/ui/']],
  ['src/features/', ['src/routes/']],
];

test('the rooms hold code to check', () => {
  expect(ROOMS.length).toBeGreaterThan(100);
});

test('imports point one way: src to shared, server to shared, nothing back', () => {
  const breaches = ROOMS.flatMap((file) =>
    FORBIDDEN.filter(([room]) => file.startsWith(room)).flatMap(([, targets]) =>
      importsOf(file)
        .filter((target) => targets.some((prefix) => target.startsWith(prefix)))
        .map((target) => `${file} imports ${target}`),
    ),
  );
  expect(breaches).toEqual([]);
});

test('every rule of law has a test of its own name', () => {
  const rules = filesBelow('shared/rules').filter((file) => file.split('/').length > 3);
  const missing = rules
    .map((file) => `tests/${file.replace(/\.ts$/, '.test.ts')}`)
    .filter((file) => !filesBelow('tests').includes(file));
  expect(missing).toEqual([]);
});

test('no file is longer than 300 lines of code', () => {
  const long = ROOMS.map((file) => {
    const lines = readFileSync(join(ROOT, file), 'utf8').split('\n');
    return [file, lines.filter((line) => line.trim() !== '' && !/^\s*(\/\/|\/\*|\*)/.test(line)).length] as const;
  }).filter(([, lines]) => lines > 300);
  expect(long).toEqual([]);
});

test('only one file reads the environment', () => {
  const readers = filesBelow('server').filter(
    (file) => !file.startsWith('server/boot/') && file !== 'server/env.ts' && /process\.env/.test(readFileSync(join(ROOT, file), 'utf8')),
  );
  expect(readers).toEqual([]);
});

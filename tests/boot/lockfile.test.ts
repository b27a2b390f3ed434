import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { checkout } from '#tests/support/cluster.ts';

interface Locked {
  readonly version?: string;
  readonly integrity?: string;
  readonly resolved?: string;
  readonly inBundle?: boolean;
  readonly hasInstallScript?: boolean;
}

const read = (file: string): unknown => JSON.parse(readFileSync(join(checkout, file), 'utf8'));
const listed = read('package.json') as Readonly<Record<'dependencies' | 'devDependencies', Readonly<Record<string, string>>>>;
const { packages } = read('package-lock.json') as { readonly packages: Readonly<Record<string, Locked>> };
const locked = Object.entries(packages).filter(([path]) => path !== '');

test('J-01 every package we ask for is named by one exact version, and that version is locked', () => {
  const asked = Object.entries({ ...listed.dependencies, ...listed.devDependencies });
  expect(asked.length).toBeGreaterThan(50);
  expect(asked.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  expect(asked.filter(([name, version]) => packages[`node_modules/${name}`]?.version !== version)).toEqual([]);
});

test('J-01 every locked package carries the hash of its content', () => {
  // A package that comes inside another is covered by the hash of that one.
  const fetched = locked.filter(([, each]) => each.inBundle !== true);
  expect(fetched.length).toBeGreaterThan(300);
  expect(fetched.filter(([, each]) => !/^sha512-[A-Za-z0-9+/]{86}==$/.test(each.integrity ?? '')).map(([path]) => path)).toEqual([]);
});

test('the lockfile holds no download address', () => {
  expect(locked.filter(([, each]) => each.resolved !== undefined).map(([path]) => path)).toEqual([]);
});

test('J-01 only packages known to have one bring an install script, and none of those is run', () => {
  // esbuild: only checks its binary, which comes as a package of its own. fsevents: for another system.
  // @ibm/plex-sans: reports the installation to its maker; we use its font files alone.
  const known = ['node_modules/esbuild', 'node_modules/fsevents', 'node_modules/@ibm/plex-sans'];
  const found = locked.filter(([, each]) => each.hasInstallScript === true).map(([path]) => path);
  expect(found.filter((path) => !known.includes(path))).toEqual([]);
  expect(readFileSync(join(checkout, '.npmrc'), 'utf8')).toMatch(/^ignore-scripts=true$/m);
});

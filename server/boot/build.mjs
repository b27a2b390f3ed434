/** Builds the server's programs with esbuild and the pages with vite, each only when its sources have changed. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, rmSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';
import { readJson, writeJson } from './home.mjs';
import { follow } from './run.mjs';
import { Stop } from './say.mjs';
import { inCheckout } from './turn.mjs';

/** Each program and its source. */
const PROGRAMS = {
  main: 'server/main.ts',
  prepare: 'server/db/prepare-main.ts',
  local: 'server/local/main.ts',
  env: 'server/env.ts',
};

/** @typedef {{ server: string, client: string }} Stamps */

/** Builds what is out of date.
 * @param {string} checkout @param {(line: string) => void} say @param {AbortSignal} [signal]
 * @returns {Promise<Stamps>} marks of the sources that the build was made from */
export async function build(checkout, say, signal) {
  const stamps = stampsOf(checkout);
  if (isBuilt(checkout, 'server', stamps) && isBuilt(checkout, 'client', stamps)) return stamps;
  return inCheckout(checkout, say, () => buildParts(checkout, say, signal), signal);
}

/** @param {string} checkout @param {(line: string) => void} say @param {AbortSignal} [signal] */
async function buildParts(checkout, say, signal) {
  const stamps = stampsOf(checkout);
  for (const part of /** @type {const} */ (['server', 'client'])) {
    // Another start may have built it while we waited for it.
    if (isBuilt(checkout, part, stamps)) continue;
    signal?.throwIfAborted();
    say(part === 'server' ? 'Building the server.' : 'Building the pages.');
    // Without its mark until it is whole: a build that is cut off is made again.
    keepStamp(checkout, part, undefined);
    await (part === 'server' ? buildServer(checkout) : buildClient(checkout));
    keepStamp(checkout, part, stamps[part]);
  }
  return stamps;
}

/** @param {string} checkout @returns {Stamps} */
function stampsOf(checkout) {
  return {
    // The starter itself is no part of what it builds.
    server: stampOf(checkout, ['server', 'shared', 'migrations', 'data', 'package-lock.json'], join(checkout, 'server/boot')),
    client: stampOf(checkout, ['src', 'shared', 'data', 'index.html', 'tailwind.config.ts', 'vite.config.ts', 'package-lock.json']),
  };
}

const RESULTS = { server: 'build/server/main.js', client: 'build/client/index.html' };

/** @param {string} checkout @param {keyof Stamps} part @param {Stamps} stamps */
function isBuilt(checkout, part, stamps) {
  return readJson(join(checkout, 'build/stamp.json'))?.[part] === stamps[part] && existsSync(join(checkout, RESULTS[part]));
}

/** @param {string} checkout @param {keyof Stamps} part @param {string | undefined} stamp */
function keepStamp(checkout, part, stamp) {
  const file = join(checkout, 'build/stamp.json');
  mkdirSync(join(checkout, 'build'), { recursive: true });
  writeJson(file, { ...(readJson(file) ?? {}), [part]: stamp });
}

/** Where a program of the build is. @param {string} checkout @param {keyof typeof PROGRAMS} name */
export function program(checkout, name) {
  return join(checkout, 'build/server', `${name}.js`);
}

/** @param {string} checkout */
async function buildServer(checkout) {
  const { build: bundle, stop } = await import('esbuild');
  rmSync(join(checkout, 'build/server'), { recursive: true, force: true });
  try {
    await bundle({
      absWorkingDir: checkout,
      entryPoints: Object.fromEntries(Object.entries(PROGRAMS)),
      outdir: 'build/server',
      bundle: true,
      packages: 'external',
      platform: 'node',
      target: 'node20.19',
      format: 'esm',
      sourcemap: true,
      // Entities are known by the names of their classes.
      keepNames: true,
      logLevel: 'silent',
      // `#server/…` is ours to bundle, though it is written like a package's own import.
      plugins: [{ name: 'rooms', setup: (/** @type {import('esbuild').PluginBuild} */ building) => rooms(building, checkout) }],
    });
  } catch (error) {
    const words = error instanceof Error ? error.message : String(error);
    if (/no space left|ENOSPC/i.test(words)) throw new Stop('The disk is full while building the server. Free about 500 MB and start again.');
    throw new Stop(`The server could not be built: ${words}`);
  } finally {
    // Else its helper process stays for as long as the product runs.
    await stop();
  }
}

/** @param {import('esbuild').PluginBuild} building @param {string} checkout */
function rooms(building, checkout) {
  building.onResolve({ filter: /^#(shared|server|data)\// }, ({ path }) => ({ path: join(checkout, path.slice(1)) }));
}

/** @param {string} checkout */
async function buildClient(checkout) {
  const { status, tail } = await follow(process.execPath, [join(checkout, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'], {
    cwd: checkout,
    env: { ...process.env, NODE_ENV: 'production' },
  });
  if (status === 0) return;
  if (/ENOSPC|no space left/i.test(tail)) throw new Stop('The disk is full while building the pages. Free about 500 MB and start again.');
  throw new Stop(`The pages could not be built:\n${tail.trim()}`);
}

/** A mark that changes with any file's name, size or time of writing.
 * @param {string} checkout @param {readonly string[]} places @param {string} [except] folder that does not count */
function stampOf(checkout, places, except) {
  const hash = createHash('sha256').update(process.version);
  for (const place of places) {
    for (const file of filesOf(join(checkout, place))) {
      if (except && file.startsWith(`${except}/`)) continue;
      const { size, mtimeMs } = statSync(file);
      // Within the checkout, which may have been moved.
      hash.update(`${relative(checkout, file)}\0${size}\0${mtimeMs}\n`);
    }
  }
  return hash.digest('hex');
}

/** @param {string} place @returns {string[]} */
function filesOf(place) {
  if (!existsSync(place)) return [];
  if (statSync(place).isFile()) return [place];
  return readdirSync(place, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name))
    .sort();
}

/** Builds the server's programs with esbuild and the pages with vite, each only when its sources have changed. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { readJson, writeJson } from './home.mjs';
import { follow } from './run.mjs';
import { Stop } from './say.mjs';

/** Each program and its source. */
const PROGRAMS = {
  main: 'server/main.ts',
  migrate: 'server/db/migrate-main.ts',
  seed: 'server/db/seed-main.ts',
  local: 'server/local/main.ts',
  env: 'server/env.ts',
};

/** @typedef {{ server: string, client: string }} Stamps */

/** Builds what is out of date.
 * @param {string} checkout @param {(line: string) => void} say
 * @returns {Promise<Stamps>} marks of the sources that the build was made from */
export async function build(checkout, say) {
  const server = stampOf(checkout, ['server', 'shared', 'migrations', 'data', 'package-lock.json']);
  const client = stampOf(checkout, ['src', 'shared', 'data', 'index.html', 'tailwind.config.ts', 'vite.config.ts', 'package-lock.json']);
  const file = join(checkout, 'build/stamp.json');
  const before = readJson(file) ?? {};
  mkdirSync(join(checkout, 'build'), { recursive: true });
  if (before['server'] !== server || !existsSync(join(checkout, 'build/server/main.js'))) {
    say('Building the server.');
    await buildServer(checkout);
    writeJson(file, { ...(readJson(file) ?? {}), server });
  }
  if (before['client'] !== client || !existsSync(join(checkout, 'build/client/index.html'))) {
    say('Building the pages.');
    await buildClient(checkout);
    writeJson(file, { ...(readJson(file) ?? {}), client });
  }
  return { server, client };
}

/** Where a program of the build is. @param {string} checkout @param {keyof typeof PROGRAMS} name */
export function program(checkout, name) {
  return join(checkout, 'build/server', `${name}.js`);
}

/** @param {string} checkout */
async function buildServer(checkout) {
  const { build: bundle } = await import('esbuild');
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
    throw new Stop(`The server could not be built: ${error instanceof Error ? error.message : String(error)}`);
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
  if (/ENOSPC/.test(tail)) throw new Stop('The disk is full while building the pages. Free about 500 MB and start again.');
  throw new Stop(`The pages could not be built:\n${tail.trim()}`);
}

/** A mark that changes with any file's name, size or time of writing.
 * @param {string} checkout @param {readonly string[]} places */
function stampOf(checkout, places) {
  const hash = createHash('sha256').update(process.version);
  for (const place of places) {
    for (const file of filesOf(join(checkout, place))) {
      const { size, mtimeMs } = statSync(file);
      hash.update(`${file}\0${size}\0${mtimeMs}\n`);
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

/**
 * `npm run colophon`: bundles the command line when its sources are newer than the last bundle
 * and runs it in this process. Needs the packages of `npm ci` and nothing else.
 */
import { existsSync, mkdirSync, readdirSync, renameSync, rmSync, statSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const ROOT = resolve(dirname(fileURLToPath(import.meta.url)), '../..');
const SOURCES = ['server/cli', 'server/artwork', 'shared', 'data/law', 'data/parameters'];
const BUNDLES = join(ROOT, 'build/cli');

/** The newest change below the folders, as text that names a bundle.
 * @param {readonly string[]} folders */
function stampOf(folders) {
  let newest = 0;
  let count = 0;
  const queue = folders.map((folder) => join(ROOT, folder));
  while (queue.length > 0) {
    const folder = /** @type {string} */ (queue.pop());
    for (const entry of readdirSync(folder, { withFileTypes: true })) {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) queue.push(path);
      else {
        count += 1;
        newest = Math.max(newest, statSync(path).mtimeMs);
      }
    }
  }
  return `${Math.round(newest * 1000)}-${count}`;
}

/** @param {string} stamp */
async function bundle(stamp) {
  const { build } = await import('esbuild');
  const making = join(BUNDLES, `making-${process.pid}`);
  mkdirSync(BUNDLES, { recursive: true });
  try {
    await build({
      absWorkingDir: ROOT,
      entryPoints: { colophon: 'server/cli/colophon.ts', 'line-worker': 'server/cli/line-worker.ts' },
      outdir: making,
      outExtension: { '.js': '.mjs' },
      bundle: true,
      splitting: true,
      format: 'esm',
      platform: 'node',
      target: 'node20',
      packages: 'external',
      logLevel: 'silent',
    });
    // Another run may have made the same bundle in the meantime: either will do.
    if (!existsSync(join(BUNDLES, stamp))) renameSync(making, join(BUNDLES, stamp));
  } finally {
    rmSync(making, { recursive: true, force: true });
  }
  sweep(stamp);
}

/** Removes bundles of older sources, unless a run may still be using them. @param {string} keep */
function sweep(keep) {
  const hour = 60 * 60 * 1000;
  for (const name of readdirSync(BUNDLES)) {
    const path = join(BUNDLES, name);
    if (name !== keep && Date.now() - statSync(path).mtimeMs > hour) rmSync(path, { recursive: true, force: true });
  }
}

process.stdout.on('error', (error) => {
  // A reader that has seen enough closes the pipe: no fault of ours.
  process.exit('code' in error && error.code === 'EPIPE' ? 0 : 2);
});

try {
  const stamp = stampOf(SOURCES);
  const entry = join(BUNDLES, stamp, 'colophon.mjs');
  if (!existsSync(entry)) await bundle(stamp);
  const { runColophon } = await import(pathToFileURL(entry).href);
  process.exitCode = await runColophon(process.argv.slice(2), ROOT);
} catch (error) {
  const isMissing = error instanceof Error && 'code' in error && error.code === 'ERR_MODULE_NOT_FOUND';
  process.stderr.write(isMissing ? `The packages are not installed. Run npm ci first.\n${error.message}\n` : `${error instanceof Error ? error.stack : String(error)}\n`);
  process.exitCode = 2;
}

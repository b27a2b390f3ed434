/**
 * `npm run colophon`: bundles the command line and its tables when any of their sources has changed
 * since the last bundle, and runs it in this process. Needs the packages of `npm ci` and nothing else.
 */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const ROOT = resolve(dirname(fileURLToPath(import.meta.url)), '../..');
const SOURCES = ['server/cli', 'server/artwork', 'shared', 'data/law', 'data/parameters', 'data/dictionary'];
const BUNDLES = join(ROOT, 'build/cli');

/**
 * What the files below the folders are, as text that names a bundle: each one's path, size and times.
 * The time of the last change of state is the system's own: a file that is put back with an older
 * date still counts as changed.
 * @param {readonly string[]} folders
 */
function stampOf(folders) {
  const hash = createHash('sha1');
  const queue = folders.map((folder) => join(ROOT, folder));
  while (queue.length > 0) {
    const folder = /** @type {string} */ (queue.pop());
    for (const entry of readdirSync(folder, { withFileTypes: true })) {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) queue.push(path);
      else {
        const { size, mtimeMs, ctimeMs } = statSync(path);
        hash.update(`${path}|${size}|${mtimeMs}|${ctimeMs}\n`);
      }
    }
  }
  return hash.digest('hex');
}

/**
 * A table of law as text that is parsed at the start: as program text it would take longer.
 * @type {import('esbuild').Plugin}
 */
const tablesAsText = {
  name: 'tables-as-text',
  setup({ onLoad }) {
    onLoad({ filter: /\.json$/ }, ({ path }) => ({ contents: `export default JSON.parse(${JSON.stringify(JSON.stringify(JSON.parse(readFileSync(path, 'utf8'))))})`, loader: 'js' }));
  },
};

/** @param {string} stamp @returns {Promise<string>} the name of the bundle made */
async function bundle(stamp) {
  const { build } = await import('esbuild');
  const making = join(BUNDLES, `making-${process.pid}`);
  mkdirSync(BUNDLES, { recursive: true });
  try {
    await build({
      absWorkingDir: ROOT,
      entryPoints: { colophon: 'server/cli/colophon.ts', 'line-worker': 'server/cli/line-worker.ts', pack: 'server/cli/pack.ts' },
      outdir: making,
      outExtension: { '.js': '.mjs' },
      bundle: true,
      splitting: true,
      format: 'esm',
      platform: 'node',
      target: 'node20',
      packages: 'external',
      plugins: [tablesAsText],
      logLevel: 'silent',
    });
    const { packDictionary } = await import(pathToFileURL(join(making, 'pack.mjs')).href);
    writeFileSync(join(making, 'dictionary.json'), packDictionary(ROOT));
    // What changed while the bundle was made is not in its name: the next run makes it again.
    if (stampOf(SOURCES) !== stamp) stamp = `of-${process.pid}`;
    // Another run may have made the same bundle in the meantime: either will do.
    if (!existsSync(join(BUNDLES, stamp))) renameSync(making, join(BUNDLES, stamp));
  } finally {
    rmSync(making, { recursive: true, force: true });
  }
  sweep(stamp);
  return stamp;
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
  const made = existsSync(join(BUNDLES, stamp, 'colophon.mjs')) ? stamp : await bundle(stamp);
  const { runColophon } = await import(pathToFileURL(join(BUNDLES, made, 'colophon.mjs')).href);
  process.exitCode = await runColophon(process.argv.slice(2), ROOT);
} catch (error) {
  const isMissing = error instanceof Error && 'code' in error && error.code === 'ERR_MODULE_NOT_FOUND';
  process.stderr.write(isMissing ? `The packages are not installed. Run npm ci first.\n${error.message}\n` : `${error instanceof Error ? error.stack : String(error)}\n`);
  process.exitCode = 2;
}

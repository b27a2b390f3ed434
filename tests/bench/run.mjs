/**
 * `npm run bench`: bundles the measurements as the product's own programs are bundled, then runs
 * them. Run from source they would measure the loader's wrappers around every inner function.
 */
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { build } from 'esbuild';

const root = join(import.meta.dirname, '../..');
const outfile = join(root, 'build/bench/main.mjs');

/** A bundle is one file; each source keeps the folder it speaks of. */
const ownFolder = {
  name: 'own-folder',
  setup({ onLoad }) {
    onLoad({ filter: /\.ts$/ }, ({ path }) => ({
      contents: readFileSync(path, 'utf8').replaceAll('import.meta.dirname', JSON.stringify(dirname(path))),
      loader: 'ts',
    }));
  },
};

await build({ entryPoints: [join(root, 'tests/bench/main.ts')], outfile, bundle: true, packages: 'external', platform: 'node', format: 'esm', target: 'node20', plugins: [ownFolder], logLevel: 'error' });
await import(outfile);

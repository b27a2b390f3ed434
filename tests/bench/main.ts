import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { runClaimsBench } from './claims.bench.ts';
import { runDictionaryBench } from './dictionary.bench.ts';
import { runEngineBench } from './engine.bench.ts';
import { runLabelBench } from './label.bench.ts';
import { runLiveBench } from './live.bench.ts';
import { asTable, type Row } from './report.ts';

/** `npm run bench`: the measured promises in one table; ends with 1 where one is not kept. */

const CLIENT = join(import.meta.dirname, '../../build/client');
const FIRST_PAGE_KB = 180;

interface Chunk {
  readonly file: string;
  readonly imports?: readonly string[];
  readonly isEntry?: boolean;
}

/** JavaScript that the browser must have before the first page stands: the entry and all it imports at once. */
function firstPage(): Row {
  const promise = `under ${FIRST_PAGE_KB} KB gzipped`;
  const name = 'JavaScript of the first page';
  let manifest: Record<string, Chunk>;
  try {
    manifest = JSON.parse(readFileSync(join(CLIENT, '.vite/manifest.json'), 'utf8')) as Record<string, Chunk>;
  } catch {
    return { name, measured: 'not run: npm run build first', promise, isKept: false };
  }
  const files = new Set<string>();
  const take = (key: string): void => {
    const chunk = manifest[key];
    if (!chunk || files.has(chunk.file)) return;
    files.add(chunk.file);
    chunk.imports?.forEach(take);
  };
  Object.keys(manifest).filter((key) => manifest[key]!.isEntry).forEach(take);
  const today = Object.keys(manifest).find((key) => key.endsWith('routes/today.tsx'));
  if (today) take(today);
  const size = [...files].filter((file) => file.endsWith('.js')).reduce((sum, file) => sum + gzipSync(readFileSync(join(CLIENT, file))).length, 0) / 1024;
  return { name, measured: `${size.toFixed(1)} KB`, promise, isKept: size < FIRST_PAGE_KB };
}

const label = (await runLabelBench()).map(({ name, figure, unit, most }): Row => ({ name, measured: `${figure.toFixed(1)} ${unit}`, promise: `under ${most} ${unit}`, isKept: figure <= most }));
const rows = [...(await runEngineBench()), ...label, ...(await runDictionaryBench()), ...(await runClaimsBench()), firstPage(), ...(await runLiveBench())];
console.log(asTable(rows));
process.exit(rows.every(({ isKept }) => isKept) ? 0 : 1);

/**
 * `npm test`: installs what is missing, then lints, checks types, runs every
 * test and the journeys in a real browser. The last line counts all of it.
 * `npm test -- --only lint,types,tests,build,journeys` narrows it down;
 * further words go to the test runner as a filter.
 */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { build } from './build.mjs';
import { requirePackages } from './debian.mjs';
import { CHECKOUT, readJson } from './home.mjs';
import { requirePostgres } from './launch.mjs';
import { requireNodePackages } from './node-packages.mjs';
import { follow } from './run.mjs';
import { explain, say } from './say.mjs';

/** Readers of PDFs and bar codes that the tests hold against the product's own output. */
const TOOLS = ['poppler-utils', 'zbar-tools', 'qpdf', 'ghostscript', 'mupdf-tools', 'chromium', 'fonts-dejavu-core'];
const STEPS = /** @type {const} */ (['lint', 'types', 'tests', 'build', 'journeys']);

/** @typedef {{ name: string, passed: number, failed: number, skipped: number, seconds: number, note?: string }} Outcome */

const { only, filters } = readArguments(process.argv.slice(2));
const scratch = mkdtempSync(join(tmpdir(), 'colophon-npm-test-'));
/** @type {Outcome[]} */
const outcomes = [];

try {
  await requireNodePackages(CHECKOUT, say);
  if (wants('tests') || wants('journeys')) {
    await requirePostgres(say);
    await requirePackages(TOOLS, 'the tools of the tests', say);
  }
  if (wants('lint')) await item('lint', tool('eslint/bin/eslint.js'), ['.', '--max-warnings', '0']);
  if (wants('types')) {
    await item('types', tool('typescript/bin/tsc'), ['-p', 'tsconfig.json', '--noEmit']);
    await item('types of shared', tool('typescript/bin/tsc'), ['-p', 'shared/tsconfig.json', '--noEmit']);
  }
  if (wants('tests')) await cases('tests', []);
  if (wants('build')) await timed('build', async () => {
    await build(CHECKOUT, say);
    return { passed: 1, failed: 0, skipped: 0 };
  });
  if (wants('journeys')) await cases('journeys', ['--config', 'tests/support/journeys.config.ts']);
} catch (error) {
  const told = explain(error, 'running the tests');
  process.stderr.write(`\n${told ? told.message : error instanceof Error ? error.stack : String(error)}\n`);
  outcomes.push({ name: 'set-up', passed: 0, failed: 1, skipped: 0, seconds: 0 });
} finally {
  rmSync(scratch, { recursive: true, force: true });
}
finish();

/** @param {typeof STEPS[number]} step */
function wants(step) {
  return only.length === 0 || only.includes(step);
}

/** @param {string} path */
function tool(path) {
  return join(CHECKOUT, 'node_modules', path);
}

/** One check that passes or fails as a whole.
 * @param {string} name @param {string} file @param {readonly string[]} args */
function item(name, file, args) {
  return timed(name, async () => {
    const { status } = await follow(process.execPath, [file, ...args], { cwd: CHECKOUT, show: say });
    return { passed: status === 0 ? 1 : 0, failed: status === 0 ? 0 : 1, skipped: 0 };
  });
}

/** Test cases, counted by the runner's own record.
 * @param {string} name @param {readonly string[]} args */
function cases(name, args) {
  return timed(name, async () => {
    const record = join(scratch, `${name}.json`);
    const { status } = await follow(
      process.execPath,
      [tool('vitest/vitest.mjs'), 'run', ...args, ...filters, '--reporter=default', '--reporter=json', `--outputFile.json=${record}`, '--no-color'],
      { cwd: CHECKOUT, env: { ...process.env, NODE_ENV: 'test' }, show: say },
    );
    const counted = readJson(record);
    const number = (/** @type {string} */ key) => (typeof counted?.[key] === 'number' ? counted[key] : 0);
    const passed = number('numPassedTests');
    const skipped = number('numPendingTests') + number('numTodoTests');
    const failed = number('numFailedTests');
    // A file that does not load, a set-up that fails or a runner that dies has no case of its own.
    const hidden = failed === 0 && (status !== 0 || passed === 0) ? 1 : 0;
    return { passed, failed: failed + hidden, skipped, ...(passed === 0 ? { note: 'no test ran' } : {}) };
  });
}

/** @param {string} name @param {() => Promise<{ passed: number, failed: number, skipped: number, note?: string }>} work */
async function timed(name, work) {
  say(`\n── ${name}`);
  const began = Date.now();
  /** @type {{ passed: number, failed: number, skipped: number, note?: string }} */
  let result = { passed: 0, failed: 1, skipped: 0 };
  try {
    result = await work();
  } catch (error) {
    const told = explain(error, name);
    say(told ? told.message : error instanceof Error ? (error.stack ?? error.message) : String(error));
  }
  outcomes.push({ name, ...result, seconds: (Date.now() - began) / 1000 });
}

function finish() {
  say('');
  for (const { name, passed, failed, skipped, seconds, note } of outcomes) {
    say(`${failed > 0 ? 'FAILED' : 'ok    '}  ${name.padEnd(16)} ${String(passed).padStart(6)} passed ${String(failed).padStart(4)} failed ${String(skipped).padStart(4)} skipped ${seconds.toFixed(0).padStart(5)} s${note ? `  (${note})` : ''}`);
  }
  // The registry's audit is not reached everywhere: it is never counted as passed.
  say('Audit not run: known weaknesses of packages were not looked up. The lockfile itself is checked by the tests.');
  const sum = (/** @type {'passed' | 'failed'} */ key) => outcomes.reduce((total, each) => total + each[key], 0);
  const failed = sum('failed') + (outcomes.length === 0 ? 1 : 0);
  say(`${sum('passed')} passed, ${failed} failed`);
  process.exitCode = failed === 0 ? 0 : 1;
}

/** @param {readonly string[]} args */
function readArguments(args) {
  const at = args.indexOf('--only');
  const only = at < 0 ? [] : (args[at + 1] ?? '').split(',');
  const unknown = only.filter((name) => !STEPS.some((step) => step === name));
  if (unknown.length > 0) {
    process.stderr.write(`Unknown step ${unknown.join(', ')}. The steps are ${STEPS.join(', ')}.\n`);
    process.exit(2);
  }
  return { only, filters: args.filter((_arg, index) => at < 0 || (index !== at && index !== at + 1)) };
}

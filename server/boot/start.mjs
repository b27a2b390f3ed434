/**
 * `npm start`: the whole product on a machine with Node.js 20 and nothing
 * else. Uses no package, so that it runs before any is installed.
 */
import { writeFileSync } from 'node:fs';
import { CHECKOUT } from './home.mjs';
import { launch } from './launch.mjs';
import { endFollowed } from './run.mjs';
import { explain, say } from './say.mjs';

/** People of the demonstration, as server/local/demo-people.ts seeds them. */
const PEOPLE = ['Ines Tarrow, formulator', 'Maud Pellow, owner and formulator', 'Dr Odile Marsh, safety assessor', 'Piet Lund, artworker', 'Rhea Colby, seller', 'Bram Otter, owner of another house, Otterby Still Room'];

requireNode();
const began = Date.now();
let isStopping = false;
const asked = new AbortController();
/** @type {Awaited<ReturnType<typeof launch>> | undefined} */
let running;

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    if (isStopping) return;
    isStopping = true;
    say('\nStopping.');
    asked.abort();
    endFollowed();
    if (running) void finish(0);
  });
}

try {
  running = await launch({ checkout: CHECKOUT, env: process.env, say: (line) => isStopping || say(line), signal: asked.signal });
  if (isStopping) await finish(0);
  show(running);
  const why = await running.ended;
  if (!isStopping) {
    isStopping = true;
    say(why);
    await finish(1);
  }
} catch (error) {
  const told = explain(error, 'starting Colophon');
  if (isStopping) await finish(0);
  process.stderr.write(`\n${told ? told.message : error instanceof Error ? error.stack : String(error)}\n`);
  process.exit(1);
}

/** @param {number} status */
async function finish(status) {
  await running?.stop();
  say('Stopped.');
  process.exit(status);
}

/** @param {{ address: string, home: string, hasDemo: boolean }} started */
function show({ address, home, hasDemo }) {
  const seconds = ((Date.now() - began) / 1000).toFixed(1);
  const lines = [`Colophon is ready (${seconds} s)`, '', `  ${address}`, ''];
  if (hasDemo) lines.push('Sign in as one of these; a click on the name is enough:', ...PEOPLE.map((person) => `  ${person}`), '');
  lines.push(`Data and records: ${home}`, 'Stop with Ctrl-C.');
  const width = Math.max(...lines.map((line) => line.length));
  say(['', '─'.repeat(width), ...lines, '─'.repeat(width)].join('\n'));
  // For programs that start the product, such as its own tests.
  const file = process.env['COLOPHON_ANNOUNCE'];
  if (file) writeFileSync(file, JSON.stringify({ address, home, pid: process.pid }), { mode: 0o600 });
}

function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  process.stderr.write(`Colophon needs Node.js 20.19 or later; this is ${process.version}. Install a newer one and start again.\n`);
  process.exit(1);
}


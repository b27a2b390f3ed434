/** Brings up everything the product needs, in order, and takes it down in the other order. */
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build, program } from './build.mjs';
import { openCluster } from './cluster.mjs';
import { requirePackages } from './debian.mjs';
import { openHome, readJson, requireRoom, writeJson } from './home.mjs';
import { requireNodePackages } from './node-packages.mjs';
import { freePort, isFree, nextFreePort } from './ports.mjs';
import { findPostgres } from './postgres.mjs';
import { follow } from './run.mjs';
import { Stop } from './say.mjs';
import { startLocalServices, startProgram, toldIn, waitForServer, whyEnded } from './services.mjs';
import { takeTurn } from './turn.mjs';

const USUAL_PORT = 4173;

/** PostgreSQL 15 or later, installed when it is missing. @param {(line: string) => void} say */
export async function requirePostgres(say) {
  if (!findPostgres()) await requirePackages(['postgresql'], 'PostgreSQL', say);
  if (!findPostgres()) throw new Stop('Debian offers no PostgreSQL 15 or later here. Install one and start again, or set DATABASE_URL to a server that is running.');
}

/** Starts the product.
 * @param {{ checkout: string, env: NodeJS.ProcessEnv, say: (line: string) => void, signal: AbortSignal }} options
 * @returns {Promise<{ address: string, home: string, hasDemo: boolean, ended: Promise<string>, stop: () => Promise<void> }>} */
export async function launch({ checkout, env, say, signal }) {
  /** @type {(() => Promise<void> | void)[]} */
  const undo = [];
  /** @type {import('./services.mjs').Running[]} */
  const programs = [];
  const stop = async () => {
    await Promise.all(programs.splice(0).map((each) => each.stop()));
    for (const step of undo.splice(0).reverse()) await step();
  };
  try {
    // First what may have to be said at once to an account that may not install it.
    if (!env['DATABASE_URL']) await requirePostgres(say);
    signal.throwIfAborted();
    await requireNodePackages(checkout, say, signal);
    signal.throwIfAborted();
    const home = openHome(checkout, env['COLOPHON_DATA']);
    requireRoom(home, 100);
    const turn = takeTurn(home);
    undo.push(turn.release);
    const stamps = await build(checkout, say, signal);
    // In production there is no stand-in: every fault is told before anything is made.
    if (env['NODE_ENV'] === 'production') await checkConfiguration(checkout, { ...env, DATABASE_URL: env['DATABASE_URL'] || 'postgres://127.0.0.1/own' });
    const ports = await choosePorts(home, env, say);
    const database = await openDatabase(home, env, { say, signal, undo });
    signal.throwIfAborted();
    const secrets = openSecrets(home);
    const appUrl = env['APP_URL'] || `http://127.0.0.1:${ports.app}`;
    const local = await openServices({ checkout, home, env, ports, secrets, appUrl, programs, signal });
    const hasDemo = local.issuer !== undefined;
    const serverEnv = { ...env, NODE_ENV: env['NODE_ENV'] || 'development', HOST: env['HOST'] || '127.0.0.1', PORT: String(ports.app), APP_URL: appUrl, ...database.env, ...local.env };
    await checkConfiguration(checkout, serverEnv);
    signal.throwIfAborted();
    await prepareDatabase({ checkout, home, env: { ...serverEnv, SEED_DEMO: hasDemo ? 'yes' : 'no' }, mark: `${stamps.server} ${serverEnv.OIDC_ISSUER} ${database.env.DATABASE_URL}`, isOwn: database.cluster !== undefined, say });
    signal.throwIfAborted();
    say('Starting the server.');
    // The server never learns the owner's password.
    const { DATABASE_OWNER_URL: _owner, ...appEnv } = serverEnv;
    const server = startProgram({ file: program(checkout, 'main'), cwd: checkout, log: join(home, 'server.log'), env: appEnv });
    programs.push(server);
    await waitForServer(server, new URL(`http://${reachable(serverEnv.HOST)}:${ports.app}`), signal);
    turn.announce(appUrl);
    const ended = Promise.race([
      server.ended.then(() => whyEnded(server, join(home, 'server.log'))),
      ...local.ended.map((each) => each.then(() => `The local stand-ins for sign-in, mail and files ended by themselves. Start again; their last words are in ${join(home, 'services.log')}.`)),
      ...(database.cluster ? [database.cluster.ended.then(database.cluster.why)] : []),
    ]);
    return { address: appUrl, home, hasDemo, ended, stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** @param {string} home @param {NodeJS.ProcessEnv} env @param {(line: string) => void} say */
async function choosePorts(home, env, say) {
  const file = join(home, 'ports.json');
  const kept = readJson(file) ?? {};
  const remembered = (/** @type {string} */ name) => (typeof kept[name] === 'number' ? kept[name] : undefined);
  let app;
  if (env['PORT']) {
    app = Number(env['PORT']);
    if (!Number.isInteger(app) || app < 1 || app > 65_535) throw new Stop('PORT is not a port. Give a number from 1 to 65535.');
    if (!(await isFree(app, env['HOST'] || undefined))) throw new Stop(`Port ${app} is taken by another program, or needs root. Set PORT to a free one and start again.`);
  } else {
    const usual = remembered('app') ?? USUAL_PORT;
    app = (await isFree(usual)) ? usual : await nextFreePort(USUAL_PORT);
    if (app !== usual) say(`Port ${usual} is taken by another program; using ${app}.`);
  }
  const chosen = { app, identity: await freePort(remembered('identity')), mail: await freePort(remembered('mail')), storage: await freePort(remembered('storage')) };
  writeJson(file, { ...kept, ...chosen });
  return chosen;
}

/** @param {string} home @param {NodeJS.ProcessEnv} env
 * @param {{ say: (line: string) => void, signal: AbortSignal, undo: (() => Promise<void> | void)[] }} options
 * @returns {Promise<{ env: { DATABASE_URL: string, DATABASE_OWNER_URL: string }, cluster?: import('./cluster.mjs').Cluster }>} */
async function openDatabase(home, env, { say, signal, undo }) {
  const given = env['DATABASE_URL'];
  if (given) return { env: { DATABASE_URL: given, DATABASE_OWNER_URL: env['DATABASE_OWNER_URL'] || given } };
  const cluster = await openCluster({ home, say, signal });
  undo.push(cluster.stop);
  return { env: { DATABASE_URL: cluster.appUrl, DATABASE_OWNER_URL: cluster.ownerUrl }, cluster };
}

/** Where this machine reaches a server that listens on `host`. @param {string} host */
function reachable(host) {
  if (host === '0.0.0.0') return '127.0.0.1';
  if (host === '::') return '[::1]';
  return host.includes(':') ? `[${host}]` : host;
}

/** Generated once: what the product and its stand-ins know each other by. @param {string} home */
function openSecrets(home) {
  const file = join(home, 'secrets.json');
  const kept = readJson(file) ?? {};
  const secret = (/** @type {string} */ name) => (typeof kept[name] === 'string' ? kept[name] : randomBytes(24).toString('base64url'));
  const all = { client: secret('client'), accessKey: secret('accessKey'), storage: secret('storage') };
  writeJson(file, all);
  return all;
}

/** Starts a stand-in for each service that is not given.
 * @param {{ checkout: string, home: string, env: NodeJS.ProcessEnv, ports: Record<string, number>, secrets: Record<string, string>, appUrl: string, programs: import('./services.mjs').Running[], signal: AbortSignal }} options */
async function openServices({ checkout, home, env, ports, secrets, appUrl, programs, signal }) {
  const client = { OIDC_CLIENT_ID: 'colophon', OIDC_CLIENT_SECRET: secrets['client'] };
  const wish = {
    ...(env['OIDC_ISSUER'] ? {} : { identity: { port: ports['identity'], publicUrl: appUrl, clientId: client.OIDC_CLIENT_ID, clientSecret: client.OIDC_CLIENT_SECRET } }),
    ...(env['SMTP_URL'] ? {} : { mail: { port: ports['mail'], folder: join(home, 'mail') } }),
    ...(env['S3_ENDPOINT'] ? {} : { storage: { port: ports['storage'], folder: join(home, 'files'), accessKeyId: secrets['accessKey'] } }),
  };
  if (env['NODE_ENV'] === 'production' || Object.keys(wish).length === 0) return { env: {}, issuer: undefined, ended: [] };
  const started = await startLocalServices({ file: program(checkout, 'local'), checkout, home, wish: { ...wish, mode: env['NODE_ENV'] === 'test' ? 'test' : 'development' }, signal });
  programs.push(started);
  const { identity, mail, storage } = started.urls;
  return {
    issuer: identity,
    ended: [started.ended],
    env: {
      ...(identity ? { OIDC_ISSUER: identity, ...client } : {}),
      ...(mail ? { SMTP_URL: mail, MAIL_FROM: env['MAIL_FROM'] || 'colophon@localhost.example' } : {}),
      ...(storage ? { S3_ENDPOINT: storage, S3_REGION: 'local', S3_BUCKET: 'colophon', S3_ACCESS_KEY_ID: secrets['accessKey'], S3_SECRET_ACCESS_KEY: secrets['storage'] } : {}),
    },
  };
}

/** Every fault of the configuration at once, before anything is started with it.
 * @param {string} checkout @param {NodeJS.ProcessEnv} env */
async function checkConfiguration(checkout, env) {
  const { readEnv } = await import(pathToFileURL(program(checkout, 'env')).href);
  try {
    readEnv(env);
  } catch (error) {
    throw error instanceof Error && error.name === 'ConfigurationError' ? new Stop(error.message) : error;
  }
}

/** Migrates and seeds when the product, the database or the issuer is not the one of the last time.
 * @param {{ checkout: string, home: string, env: NodeJS.ProcessEnv, mark: string, isOwn: boolean, say: (line: string) => void }} options */
async function prepareDatabase({ checkout, home, env, mark, isOwn, say }) {
  const file = join(home, 'prepared.json');
  // Nobody else empties our own; what has happened to one from outside is asked of it at each start.
  if (isOwn && readJson(file)?.['mark'] === mark) return;
  say('Bringing the tables up to date, and filling the dictionary.');
  const { status, tail } = await follow(process.execPath, ['--enable-source-maps', program(checkout, 'prepare')], { cwd: checkout, env });
  if (status !== 0) {
    const told = toldIn(tail);
    if (told) throw new Stop(told);
    if (/No space left|ENOSPC|53100/.test(tail)) throw new Stop('The disk is full while preparing the database. Free about 1 GB and start again; nothing that was saved is lost.');
    if (/ECONNREFUSED|ENOTFOUND|password authentication failed|no pg_hba/.test(tail)) throw new Stop(`The database of DATABASE_URL was not reached: ${tail.trim().split('\n')[0]}`);
    throw new Stop(`The database could not be prepared:\n${tail.trim()}`);
  }
  writeJson(file, { mark });
}

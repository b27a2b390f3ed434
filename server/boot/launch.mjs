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
import { startLocalServices, startProgram, waitForServer } from './services.mjs';
import { takeTurn } from './turn.mjs';

const USUAL_PORT = 4173;

/** PostgreSQL 15 or later, installed when it is missing. @param {(line: string) => void} say */
export async function requirePostgres(say) {
  if (!findPostgres()) await requirePackages(['postgresql'], 'PostgreSQL', say);
  if (!findPostgres()) throw new Stop('Debian offers no PostgreSQL 15 or later here. Install one and start again, or set DATABASE_URL to a server that is running.');
}

/** Starts the product.
 * @param {{ checkout: string, env: NodeJS.ProcessEnv, say: (line: string) => void }} options
 * @returns {Promise<{ address: string, home: string, hasDemo: boolean, ended: Promise<string>, stop: () => Promise<void> }>} */
export async function launch({ checkout, env, say }) {
  /** @type {(() => Promise<void> | void)[]} */
  const undo = [];
  const stop = async () => {
    for (const step of undo.splice(0).reverse()) await step();
  };
  try {
    const isProduction = env['NODE_ENV'] === 'production';
    if (isProduction && !env['OIDC_ISSUER']) throw new Stop('OIDC_ISSUER is not set. In production the built-in sign-in is refused: name your identity service with OIDC_ISSUER, OIDC_CLIENT_ID and OIDC_CLIENT_SECRET.');
    await requireNodePackages(checkout, say);
    if (!env['DATABASE_URL']) await requirePostgres(say);
    const home = openHome(checkout, env['COLOPHON_DATA']);
    requireRoom(home, 100);
    const turn = takeTurn(home);
    undo.push(turn.release);
    const stamps = await build(checkout, say);
    const ports = await choosePorts(home, env, say);
    const database = await openDatabase(home, env, say, undo);
    const secrets = openSecrets(home);
    const appUrl = env['APP_URL'] || `http://127.0.0.1:${ports.app}`;
    const local = await openServices({ checkout, home, env, ports, secrets, appUrl, undo });
    const hasDemo = local.issuer !== undefined;
    const serverEnv = { ...env, NODE_ENV: env['NODE_ENV'] || 'development', HOST: env['HOST'] || '127.0.0.1', PORT: String(ports.app), APP_URL: appUrl, ...database, ...local.env };
    await checkConfiguration(checkout, serverEnv);
    await prepareDatabase({ checkout, home, env: { ...serverEnv, SEED_DEMO: hasDemo ? 'yes' : 'no' }, mark: `${stamps.server} ${serverEnv.OIDC_ISSUER} ${database.DATABASE_URL}`, say });
    say('Starting the server.');
    // The server never learns the owner's password.
    const { DATABASE_OWNER_URL: _owner, ...appEnv } = serverEnv;
    const server = startProgram({ file: program(checkout, 'main'), cwd: checkout, log: join(home, 'server.log'), env: appEnv });
    undo.push(server.stop);
    await waitForServer(server, new URL(`http://${serverEnv.HOST === '0.0.0.0' ? '127.0.0.1' : serverEnv.HOST}:${ports.app}`));
    turn.announce(appUrl);
    const ended = Promise.race([
      server.ended.then(() => `The server ended by itself. Its last words are in ${join(home, 'server.log')}.`),
      ...local.ended.map((each) => each.then(() => `The local stand-ins ended by themselves. Their last words are in ${join(home, 'services.log')}.`)),
      ...(database.ended ? [database.ended.then(() => `The database ended by itself. Its last words are in ${join(home, 'postgres.log')}.`)] : []),
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
    if (!(await isFree(app))) throw new Stop(`Port ${app} is taken by another program, or needs root. Set PORT to a free one and start again.`);
  } else {
    const usual = remembered('app') ?? USUAL_PORT;
    app = (await isFree(usual)) ? usual : await nextFreePort(USUAL_PORT);
    if (app !== usual) say(`Port ${usual} is taken by another program; using ${app}.`);
  }
  const chosen = { app, identity: await freePort(remembered('identity')), mail: await freePort(remembered('mail')), storage: await freePort(remembered('storage')) };
  writeJson(file, { ...kept, ...chosen });
  return chosen;
}

/** @param {string} home @param {NodeJS.ProcessEnv} env @param {(line: string) => void} say @param {(() => Promise<void> | void)[]} undo
 * @returns {Promise<{ DATABASE_URL: string, DATABASE_OWNER_URL: string, ended?: Promise<void> }>} */
async function openDatabase(home, env, say, undo) {
  const given = env['DATABASE_URL'];
  if (given) return { DATABASE_URL: given, DATABASE_OWNER_URL: env['DATABASE_OWNER_URL'] || given };
  const cluster = await openCluster({ home, say });
  undo.push(cluster.stop);
  return Object.defineProperty({ DATABASE_URL: cluster.appUrl, DATABASE_OWNER_URL: cluster.ownerUrl }, 'ended', { value: cluster.ended, enumerable: false });
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
 * @param {{ checkout: string, home: string, env: NodeJS.ProcessEnv, ports: Record<string, number>, secrets: Record<string, string>, appUrl: string, undo: (() => Promise<void> | void)[] }} options */
async function openServices({ checkout, home, env, ports, secrets, appUrl, undo }) {
  const client = { OIDC_CLIENT_ID: 'colophon', OIDC_CLIENT_SECRET: secrets['client'] };
  const wish = {
    ...(env['OIDC_ISSUER'] ? {} : { identity: { port: ports['identity'], publicUrl: appUrl, clientId: client.OIDC_CLIENT_ID, clientSecret: client.OIDC_CLIENT_SECRET } }),
    ...(env['SMTP_URL'] ? {} : { mail: { port: ports['mail'], folder: join(home, 'mail') } }),
    ...(env['S3_ENDPOINT'] ? {} : { storage: { port: ports['storage'], folder: join(home, 'files'), accessKeyId: secrets['accessKey'] } }),
  };
  if (env['NODE_ENV'] === 'production' || Object.keys(wish).length === 0) return { env: {}, issuer: undefined, ended: [] };
  const started = await startLocalServices({ file: program(checkout, 'local'), checkout, home, wish: { ...wish, mode: env['NODE_ENV'] === 'test' ? 'test' : 'development' } });
  undo.push(started.stop);
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
 * @param {{ checkout: string, home: string, env: NodeJS.ProcessEnv, mark: string, say: (line: string) => void }} options */
async function prepareDatabase({ checkout, home, env, mark, say }) {
  const file = join(home, 'prepared.json');
  if (readJson(file)?.['mark'] === mark) return;
  for (const [name, words] of /** @type {const} */ ([['migrate', 'Bringing the tables up to date.'], ['seed', 'Filling the dictionary and the demonstration.']])) {
    say(words);
    const { status, tail } = await follow(process.execPath, ['--enable-source-maps', program(checkout, name)], { cwd: checkout, env });
    if (status === 0) continue;
    if (/No space left|ENOSPC|53100/.test(tail)) throw new Stop('The disk is full while preparing the database. Free about 1 GB and start again; nothing that was saved is lost.');
    if (/ECONNREFUSED|ENOTFOUND|password authentication failed|no pg_hba/.test(tail)) throw new Stop(`The database of DATABASE_URL was not reached: ${tail.trim().split('\n')[0]}`);
    throw new Stop(`The database could not be prepared:\n${tail.trim()}`);
  }
  writeJson(file, { mark });
}

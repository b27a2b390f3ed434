/** Fresh PostgreSQL databases for tests, cloned from a template made once a run. */
import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { Client } from 'pg';
import { checkout, testCluster, type TestCluster } from './cluster.ts';

/** `bare`: roles and pg_trgm only. `migrated`: all tables, no rows. `seeded`: with the demo houses and the dictionary. */
export type Contents = 'bare' | 'migrated' | 'seeded';

export interface TestDatabase {
  readonly name: string;
  /** The product's own role, under row-level security: what the server is given. */
  readonly url: string;
  /** The role that owns the tables; for arranging rows past row-level security only where a test says why. */
  readonly ownerUrl: string;
  /** Superuser; for looking at what no role may see. */
  readonly adminUrl: string;
  /** Removes it, ending connections that are still open. */
  drop(): Promise<void>;
}

/**
 * A database of the test's own, in about 50 ms once the template stands. Ask
 * in `beforeAll`, drop in `afterAll`; give `beforeAll` 120 s, since the first
 * asker of a run also starts the cluster and fills the template.
 */
export async function testDatabase(contents: Contents = 'migrated'): Promise<TestDatabase> {
  const cluster = await testCluster();
  const template = await requireTemplate(cluster, contents);
  const name = `test_${randomBytes(8).toString('hex')}`;
  await asAdmin(cluster, (admin) => clone(admin, name, template));
  return {
    name,
    url: within(cluster.appUrl, name),
    ownerUrl: within(cluster.ownerUrl, name),
    adminUrl: within(cluster.adminUrl, name),
    drop: () => asAdmin(cluster, async (admin) => void (await admin.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`))),
  };
}

/** Rows of one query, over a connection of its own. */
export async function queryOnce<Row extends object>(url: string, sql: string, params: readonly unknown[] = []): Promise<Row[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Row>(sql, [...params])).rows;
  } finally {
    await client.end();
  }
}

const order: readonly Contents[] = ['bare', 'migrated', 'seeded'];

/** Makes the template and those it rests on, once; workers wait for each other on a lock in the cluster. */
function requireTemplate(cluster: TestCluster, contents: Contents): Promise<string> {
  return asAdmin(cluster, async (admin) => {
    await admin.query("SELECT pg_advisory_lock(hashtext('colophon test templates'))");
    let below = 'template0';
    for (const each of order.slice(0, order.indexOf(contents) + 1)) {
      const name = `template_${each}`;
      const { rowCount } = await admin.query('SELECT 1 FROM pg_database WHERE datname = $1', [name]);
      if (rowCount === 0) await makeTemplate(cluster, admin, each, below);
      below = name;
    }
    return below;
  });
}

async function makeTemplate(cluster: TestCluster, admin: Client, contents: Contents, below: string): Promise<void> {
  const making = 'template_making';
  await admin.query(`DROP DATABASE IF EXISTS ${making} WITH (FORCE)`);
  await clone(admin, making, below);
  const ownerUrl = within(cluster.ownerUrl, making);
  const appUrl = within(cluster.appUrl, making);
  if (contents === 'bare') {
    await withClient(within(cluster.adminUrl, making), async (inside) => {
      await inside.query('CREATE EXTENSION IF NOT EXISTS pg_trgm');
      await inside.query(`ALTER SCHEMA public OWNER TO ${userOf(cluster.ownerUrl)}`);
      await inside.query(`GRANT USAGE ON SCHEMA public TO ${userOf(cluster.appUrl)}`);
    });
  } else {
    await script(contents === 'migrated' ? 'server/db/migrate-main.ts' : 'server/db/seed-main.ts', ownerUrl, appUrl);
  }
  await admin.query(`ALTER DATABASE ${making} RENAME TO template_${contents}`);
}

/** Runs a database script from its source, as the starter runs its bundle. */
function script(file: string, ownerUrl: string, appUrl: string): Promise<void> {
  const env = {
    PATH: process.env['PATH'],
    NODE_ENV: 'test',
    DATABASE_OWNER_URL: ownerUrl,
    DATABASE_URL: appUrl,
    OIDC_ISSUER: process.env['OIDC_ISSUER'] ?? 'http://127.0.0.1/test-issuer',
    SEED_DEMO: 'yes',
  };
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', join(checkout, file)], { cwd: checkout, env, stdio: ['ignore', 'pipe', 'pipe'] });
    let words = '';
    child.stdout.on('data', (chunk: Buffer) => (words += chunk.toString('utf8')));
    child.stderr.on('data', (chunk: Buffer) => (words += chunk.toString('utf8')));
    child.on('error', reject);
    child.on('close', (status) => (status === 0 ? resolve() : reject(new Error(`${file} ended with ${String(status)}: ${words.slice(-2000)}`))));
  });
}

function clone(admin: Client, name: string, template: string): Promise<unknown> {
  return admin.query(`CREATE DATABASE ${name} TEMPLATE ${template} ENCODING 'UTF8' LOCALE 'C.UTF-8'`);
}

function asAdmin<T>(cluster: TestCluster, work: (admin: Client) => Promise<T>): Promise<T> {
  return withClient(cluster.adminUrl, work);
}

async function withClient<T>(url: string, work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** The same server and role, another database. */
function within(url: string, database: string): string {
  const address = new URL(url);
  address.pathname = `/${database}`;
  return address.href;
}

function userOf(url: string): string {
  return `"${new URL(url).username}"`;
}

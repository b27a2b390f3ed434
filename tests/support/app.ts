import { join } from 'node:path';
import type { Express } from 'express';
import type { MikroORM } from '@mikro-orm/postgresql';
import request, { type Test } from 'supertest';
import type { AuthDeps } from '#server/auth/auth-deps.ts';
import { cookieName } from '#server/auth/cookies.ts';
import { csrfTokenOf } from '#server/auth/secret.ts';
import { beginSession } from '#server/auth/sessions.ts';
import { apiRoutes, createApp, type AppDeps } from '#server/app.ts';
import { seedDemo } from '#server/db/demo/seed-demo.ts';
import { readDictionaryTables, type DictionaryTables } from '#server/db/dictionary-tables.ts';
import { openOrm } from '#server/db/orm.ts';
import { membershipsOf, runQuery } from '#server/db/run-query.ts';
import type { Route } from '#server/http/route.ts';
import { DEMO_PEOPLE, type DemoPerson } from '#server/local/demo-people.ts';
import type { ObjectStore, StoredObject } from '#server/storage/object-store.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import { checkout } from './cluster.ts';
import { testDatabase, type TestDatabase } from './database.ts';

/** Where the test app believes to be reached. */
export const PUBLIC_URL = new URL('http://127.0.0.1:4173');
/** The day on which tests take place. */
export const TODAY = '2026-12-01';

/** The real app on a real database with the two invented houses. */
export interface TestApp {
  readonly app: Express;
  readonly routes: readonly Route[];
  readonly orm: MikroORM;
  readonly database: TestDatabase;
  readonly stored: Map<string, StoredObject>;
  /** What went to the fault log: empty while nothing unexpected happened. */
  readonly faults: unknown[];
  as(person: DemoPerson): Promise<Client>;
  readonly signedOut: Client;
  close(): Promise<void>;
}

/** Asks as a page of ours would, with cookie, origin and token. */
export interface Client {
  get(path: string): Test;
  post(path: string, body?: unknown): Test;
  put(path: string, body?: unknown): Test;
  delete(path: string): Test;
}

/** Opens it; give `beforeAll` 120 s. */
export async function openTestApp(options: { readonly now?: () => Date } = {}): Promise<TestApp> {
  const database = await testDatabase('migrated');
  const orm = await openOrm(database.url, { max: 4 });
  const now = options.now ?? (() => new Date(`${TODAY}T09:00:00Z`));
  const auth: AuthDeps = { query: runQuery(orm), now, publicUrl: PUBLIC_URL, identity: noIdentity(), membershipsOf: membershipsOf(orm) };
  const stored = new Map<string, StoredObject>();
  const faults: unknown[] = [];
  const deps: AppDeps = {
    orm,
    auth,
    law: { book: openLawBook(lawTables), tables: lawTables },
    dictionary: testDictionary().dictionary,
    oils: testDictionary().tables.oils,
    storage: memoryStore(stored),
    now,
    clientDir: join(checkout, 'tests/support/client'),
    log: (entry) => void faults.push(entry),
  };
  await seedDemo(orm.em, 'http://127.0.0.1/test-issuer', now());
  const app = createApp(deps);
  return {
    app,
    routes: apiRoutes(deps),
    orm,
    database,
    stored,
    faults,
    signedOut: client(app),
    async as(person) {
      const secret = await beginSession(auth.query, now(), { personId: person.id, houseId: person.houseId, authTime: now(), browser: 'test' });
      return client(app, secret);
    },
    async close() {
      await orm.close(true);
      await database.drop();
    },
  };
}

function client(app: Express, secret?: string): Client {
  const dress = (test: Test) => {
    void test.set('Origin', PUBLIC_URL.origin).set('Sec-Fetch-Site', 'same-origin');
    return secret === undefined ? test : test.set('Cookie', `${cookieName(PUBLIC_URL, 'session')}=${secret}`).set('X-Colophon-Token', csrfTokenOf(secret));
  };
  const send = (test: Test, body: unknown) => (body === undefined ? dress(test) : dress(test).set('Content-Type', 'application/json').send(JSON.stringify(body)));
  const at = (path: string) => `/api${path}`;
  return {
    get: (path) => dress(request(app).get(at(path))),
    post: (path, body) => send(request(app).post(at(path)), body),
    put: (path, body) => send(request(app).put(at(path)), body),
    delete: (path) => dress(request(app).delete(at(path))),
  };
}

/** A person of the demo with these roles. */
export function personWith(role: DemoPerson['roles'][number]): DemoPerson {
  const found = DEMO_PEOPLE.find((person) => person.roles.length === 1 && person.roles[0] === role);
  if (!found) throw new Error(`the demo has nobody who is only ${role}`);
  return found;
}

let tables: DictionaryTables | undefined;
let dictionary: AppDeps['dictionary'] | undefined;
/** The dictionary of data/, read once a worker. */
export function testDictionary(): { readonly tables: DictionaryTables; readonly dictionary: AppDeps['dictionary'] } {
  tables ??= readDictionaryTables(join(checkout, 'data/dictionary'));
  dictionary ??= createDictionary(tables.entries, lawTables.release.release);
  return { tables, dictionary };
}

function memoryStore(stored: Map<string, StoredObject>): ObjectStore {
  return {
    prepare: () => Promise.resolve(),
    putObject: (key, bytes, contentType) => Promise.resolve(void stored.set(key, { bytes, contentType })),
    getObject: (key) => Promise.resolve(stored.get(key)),
    deleteObject: (key) => Promise.resolve(void stored.delete(key)),
  };
}

function noIdentity(): AuthDeps['identity'] {
  const refuse = () => Promise.reject(new Error('these tests do not sign in'));
  return { newAttempt: () => ({ state: '', nonce: '', verifier: '' }), signInUrl: refuse, redeem: refuse, signOutUrl: refuse };
}

import { randomUUID } from 'node:crypto';
import { createServer } from 'node:http';
import express from 'express';
import { Pool } from 'pg';
import type { AuthDeps, AuthEvent } from '#server/auth/auth-deps.ts';
import { createAuthRouter, endSession } from '#server/auth/auth-router.ts';
import { createIdentityClient, type IdentityClient } from '#server/auth/identity-client.ts';
import { loadSession } from '#server/auth/load-session.ts';
import { requireCsrf } from '#server/auth/require-csrf.ts';
import type { HouseMembership } from '#server/auth/session.types.ts';
import { errorMiddleware } from '#server/http/problem.ts';
import { BRACKENMERE, DEMO_PEOPLE, INES, NEWCOMER, type DemoPerson } from '#server/local/demo-people.ts';
import { startIdentity } from '#server/local/identity.ts';
import { close, listen } from '#server/local/listen.ts';
import { createBrowserLike, type BrowserLike } from './browser-like.ts';
import { queryOnce, testDatabase } from './database.ts';

/** Sign-in with a real identity service and real tables, and a clock that the test moves. */
export interface SignInStage {
  readonly url: string;
  readonly issuer: string;
  readonly identity: IdentityClient;
  readonly events: AuthEvent[];
  readonly pool: Pool;
  readonly deps: AuthDeps;
  /** Moves the server's clock. */
  pass(seconds: number): void;
  /** Who is a member of what; tests change it. */
  memberships: (personEmail: string) => readonly HouseMembership[];
  /** Goes from sign-in to the provider's page and chooses a person. @returns the callback's address, not yet visited */
  upToCallback(browser: BrowserLike, person?: Pick<DemoPerson, 'id'>, next?: string): Promise<string>;
  signIn(person?: Pick<DemoPerson, 'id'>, next?: string): Promise<BrowserLike>;
  countSessions(): Promise<number>;
  stop(): Promise<void>;
}

const CLIENT = { clientId: 'colophon-test', clientSecret: 'a secret only for tests' };

export async function openSignInStage(): Promise<SignInStage> {
  const database = await testDatabase('migrated');
  const pool = new Pool({ connectionString: database.url, max: 4 });
  // Past the houses' wall: nobody is signed in yet who could add one.
  await queryOnce(database.adminUrl, "insert into house (id, name, brand, particulars, created_at) values ($1, $2, '', '{}', now())", [BRACKENMERE.id, BRACKENMERE.name]);
  let moved = 0;
  const events: AuthEvent[] = [];
  const server = createServer();
  const { port } = await listen(server, 0);
  const publicUrl = new URL(`http://127.0.0.1:${String(port)}`);
  const provider = await startIdentity({ port: 0, people: [...DEMO_PEOPLE, NEWCOMER], publicUrl, ...CLIENT });
  const identity = createIdentityClient({ issuer: new URL(provider.url), ...CLIENT, signingAlg: 'RS256', allowHttp: true, publicUrl });
  const emails = new Map<string, string>();
  const query: AuthDeps['query'] = async (sql, params) => {
    const { rows } = await pool.query(sql, [...params]);
    for (const row of rows as { id?: string; person_id?: string; email?: string }[]) if (row.email !== undefined) emails.set(row.person_id ?? row.id ?? '', row.email);
    return rows;
  };
  const deps: AuthDeps = {
    query,
    now: () => new Date(Date.now() + moved),
    publicUrl,
    identity,
    membershipsOf: (id) => Promise.resolve(stage.memberships(emails.get(id) ?? '')),
    onEvent: (event) => events.push(event),
  };
  server.on('request', createTestApp(deps));
  const stage: SignInStage = {
    url: publicUrl.origin,
    issuer: provider.url,
    identity,
    events,
    pool,
    deps,
    pass: (seconds) => void (moved += seconds * 1000),
    memberships: (email) => (email === NEWCOMER.email ? [] : [{ houseId: BRACKENMERE.id, houseName: BRACKENMERE.name, roles: ['formulator'] }]),
    async upToCallback(browser, person = INES, next = '/') {
      const { address } = await browser.follow(`${publicUrl.origin}/auth/sign-in?next=${encodeURIComponent(next)}`);
      const chosen = await browser.post(address, { person: person.id });
      const resumed = await browser.get(chosen.headers.get('Location') ?? '');
      return resumed.headers.get('Location') ?? '';
    },
    async signIn(person, next) {
      const browser = createBrowserLike();
      await browser.get(await stage.upToCallback(browser, person, next));
      return browser;
    },
    countSessions: async () => Number((await pool.query<{ count: string }>('select count(*) from session')).rows[0]?.count),
    async stop() {
      await close(server);
      await provider.stop();
      await pool.end();
      await database.drop();
    },
  };
  return stage;
}

/** The few addresses that the tests of sign-in need, with the product's own middleware. */
function createTestApp(deps: AuthDeps): express.Express {
  const app = express();
  app.use('/auth', createAuthRouter(deps));
  app.use('/api', loadSession(deps), requireCsrf({ publicUrl: deps.publicUrl, takesFile: (req) => req.path === '/upload' }));
  app.get('/api/session', (req, res) => void (req.session ? res.json(req.session) : res.status(401).json({})));
  app.delete('/api/session', async (req, res) => void res.json(req.session ? await endSession(deps, req.session, res) : {}));
  app.post(['/api/change', '/api/upload'], (_req, res) => void res.json({ changed: randomUUID() }));
  app.get('/{*page}', (_req, res) => void res.send('a page of the product'));
  app.use(errorMiddleware(() => {}));
  return app;
}

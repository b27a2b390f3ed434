import compression from 'compression';
import express, { Router, type Express } from 'express';
import type { MikroORM } from '@mikro-orm/postgresql';
import type { OilProfile } from '#shared/dictionary/oil-profiles.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { LawTables } from '#shared/law/tables.types.ts';
import type { AuthDeps } from '#server/auth/auth-deps.ts';
import { createAuthRouter } from '#server/auth/auth-router.ts';
import { loadSession } from '#server/auth/load-session.ts';
import { requireCsrf } from '#server/auth/require-csrf.ts';
import { AppError } from '#server/http/app-error.ts';
import { clientFiles } from '#server/http/client-files.ts';
import { errorMiddleware, type LogFault } from '#server/http/problem.ts';
import { requestId } from '#server/http/request-id.ts';
import { mountRoutes, type Route } from '#server/http/route.ts';
import { securityHeaders } from '#server/http/security.ts';
import { dictionaryRoutes } from '#server/modules/dictionary/dictionary.routes.ts';
import { inventoryRoutes } from '#server/modules/dictionary/inventory.routes.ts';
import { evidenceRoutes } from '#server/modules/evidence/evidence.routes.ts';
import { houseRoutes } from '#server/modules/house/house.routes.ts';
import { lawRoutes } from '#server/modules/law/law.routes.ts';
import { materialsRoutes } from '#server/modules/materials/materials.routes.ts';
import { picturesRoutes } from '#server/modules/pictures/pictures.routes.ts';
import { productsRoutes } from '#server/modules/products/products.routes.ts';
import { trailRoutes } from '#server/modules/trail/trail.routes.ts';
import { sessionRoutes } from '#server/modules/session/session.routes.ts';
import type { ObjectStore } from '#server/storage/object-store.ts';

/** Everything the app is made of that differs between a server and a test. */
export interface AppDeps {
  readonly orm: MikroORM;
  readonly auth: AuthDeps;
  readonly law: { readonly book: LawBook; readonly tables: LawTables };
  /** In memory: judging asks it for every name. */
  readonly dictionary: Dictionary;
  readonly oils: readonly OilProfile[];
  readonly storage: ObjectStore;
  readonly now: () => Date;
  /** The built browser app. */
  readonly clientDir: string;
  readonly log: LogFault;
}

/** Every endpoint below `/api` with its right. */
export function apiRoutes(deps: AppDeps): Route[] {
  return [
    ...sessionRoutes({ auth: deps.auth, dataRelease: deps.law.book.release }),
    ...houseRoutes(),
    ...lawRoutes(deps.law),
    ...inventoryRoutes(deps),
    ...dictionaryRoutes({ query: deps.auth.query, dictionary: deps.dictionary, oils: deps.oils }),
    ...materialsRoutes(deps),
    ...productsRoutes(deps),
    ...evidenceRoutes(deps),
    ...picturesRoutes(deps),
    ...trailRoutes(deps),
  ];
}

/** The whole server: every request passes these lines from top to bottom. */
export function createApp(deps: AppDeps): Express {
  const { auth, orm } = deps;
  const routes = apiRoutes(deps);
  const api = Router({ caseSensitive: true });
  mountRoutes(api, routes, orm.em, deps.now);

  const app = express();
  app.set('query parser', 'simple');
  app.set('etag', false);
  app.use(requestId);
  app.use(securityHeaders({ isSecure: auth.publicUrl.protocol === 'https:' }));
  app.get('/healthz', health(orm));
  app.use(compression());
  app.use('/auth', createAuthRouter(auth));
  app.use('/api', noStore, loadSession(auth), requireCsrf({ publicUrl: auth.publicUrl, takesFile: takesFile(routes) }), api, nothingHere);
  app.use(clientFiles(deps.clientDir));
  app.use(errorMiddleware(deps.log));
  return app;
}

/** Answers once the database does; says nothing else. */
function health(orm: MikroORM): express.RequestHandler {
  return async (_req, res) => {
    await orm.em.fork().execute('select 1');
    res.set('Cache-Control', 'no-store').json({ ok: true });
  };
}

const noStore: express.RequestHandler = (_req, res, next) => {
  res.set('Cache-Control', 'no-store');
  next();
};

const nothingHere: express.RequestHandler = () => {
  throw new AppError('not-found');
};

/** Whether a request's address is one of those that take a file. */
function takesFile(routes: readonly Route[]): (req: express.Request) => boolean {
  const addresses = routes
    .filter(({ endpoint }) => endpoint.accepts === 'multipart')
    .map(({ endpoint }) => ({ method: endpoint.method, path: new RegExp(`^${endpoint.path.replaceAll(/:[a-zA-Z]+/g, '[^/]+')}$`) }));
  return (req) => addresses.some(({ method, path }) => method === req.method && path.test(req.path));
}

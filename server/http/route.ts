import { createHash } from 'node:crypto';
import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { DomainError } from '#shared/kernel/errors.ts';
import { can, type Right } from '#shared/policies/can.ts';
import { inHouse } from '#server/db/in-house.ts';
import { noteAct, type TrailAct } from '#server/trail/trail-context.ts';
import { AppError } from './app-error.ts';
import { FileAnswer, sendFile } from './file-answer.ts';
import { plainWords, toIssues } from './issues.ts';
import { readUpload, type Upload } from './read-upload.ts';
import type { AppSession } from '#server/auth/session.types.ts';
import { actorOf, findSession, type Actor } from './session.ts';
import { cleanTexts } from './text-hygiene.ts';

/** What a route asks of its caller: a right of the policy table, a session alone, or nothing. */
export type May = Right | 'signed-in' | 'anyone';

interface Rule {
  readonly may: May;
  /** Bytes of a JSON body; 256 KB unless told. */
  readonly bodyLimit?: number;
}

/** What a handler is given: everything parsed, and the house's own database. */
export interface Call<Params, Query, Body> {
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly actor: Actor;
  readonly session: AppSession;
  readonly upload: Upload;
  readonly req: Request;
  readonly res: Response;
  /** Runs work in one transaction that sees the actor's house and no other. */
  inHouse<T>(work: (em: EntityManager) => Promise<T>): Promise<T>;
}

/** An endpoint with its right and its handler, not yet mounted. */
export interface Route {
  readonly endpoint: Endpoint;
  readonly rule: Rule;
  readonly handle: (call: Call<unknown, unknown, unknown>) => Promise<unknown>;
}

const KILOBYTE = 1024;
const BODY_LIMIT = 256 * KILOBYTE;
/** For formula documents, which carry their materials. */
export const DOCUMENT_LIMIT = 4 * KILOBYTE * KILOBYTE;

/** Ties a contract to its right and its handler; the handler sees only what the contract's schemas let through. */
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  rule: Rule,
  handle: (call: Call<z.output<P>, z.output<Q>, z.output<B>>) => Promise<z.input<R> | FileAnswer>,
): Route {
  return { endpoint, rule, handle: handle as Route['handle'] };
}

/**
 * Mounts routes below `/api`. @throws DomainError for a route without a declared right, and
 * for two routes on one address: neither may start.
 */
export function mountRoutes(router: Router, routes: readonly Route[], em: EntityManager, now: () => Date = () => new Date()): void {
  const taken = new Set<string>();
  for (const one of routes) {
    const { method, path } = one.endpoint;
    const address = `${method} ${path}`;
    if ((one.rule as Partial<Rule> | undefined)?.may === undefined) throw new DomainError(`route ${address} declares no right`);
    if (taken.has(address)) throw new DomainError(`route ${address} is mounted twice`);
    taken.add(address);
    const verb = method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    router[verb](path, requireRight(one.rule.may), ...bodyReaders(one), answer(one, em, now));
  }
}

function requireRight(may: May): RequestHandler {
  return (req, _res, next) => {
    if (may !== 'anyone') {
      const session = findSession(req);
      if (!session) throw new AppError('not-signed-in');
      if (may !== 'signed-in' && !can(session, may[0], may[1])) throw new AppError('not-allowed');
    }
    next();
  };
}

function bodyReaders({ endpoint, rule }: Route): RequestHandler[] {
  if (endpoint.body === undefined || endpoint.accepts === 'multipart') return [];
  // A packed body could unfold to any size, so only plain JSON is taken.
  return [express.json({ limit: rule.bodyLimit ?? BODY_LIMIT, inflate: false, strict: false, type: 'application/json' })];
}

function answer(one: Route, em: EntityManager, now: () => Date): RequestHandler {
  return async (req, res) => {
    const { endpoint } = one;
    const params = parseParams(endpoint, req);
    const query = parsePart(endpoint.query, req.query);
    const upload = endpoint.accepts === 'multipart' ? await readUpload(req) : undefined;
    const body = parsePart(endpoint.body, upload ? upload.fields : (req.body as unknown));
    const session = findSession(req);
    const within = <T>(work: (em: EntityManager) => Promise<T>) => {
      const { houseId, person } = session ?? refuse();
      return inHouse(em, houseId, work, { actor: { personId: person.id, name: person.name }, now });
    };
    const call = {
      params,
      query,
      body,
      req,
      res,
      get actor() {
        return actorOf(session ?? refuse());
      },
      get session() {
        return session ?? refuse();
      },
      get upload() {
        return upload ?? refuse();
      },
      inHouse: <T>(work: (em: EntityManager) => Promise<T>) => within(work),
    };
    const result = await one.handle(call);
    if (result instanceof FileAnswer) {
      // Who took a file is noted before it leaves the house.
      if (session && !result.isPreview) await within((own) => Promise.resolve(noteAct(own, takenAct(endpoint, params, result))));
      sendFile(res, result);
    } else if (!res.headersSent) res.json(endpoint.response.parse(result));
  };
}

/** A file that was taken, for the trail: the product it belongs to, where the address names one. */
function takenAct(endpoint: Endpoint, params: unknown, file: FileAnswer): TrailAct {
  const id = (params as { id?: unknown } | undefined)?.id;
  const productId = endpoint.path.startsWith('/products/') && typeof id === 'string' ? id : null;
  return { act: 'took away', subjectKind: 'file', subjectId: typeof id === 'string' ? id : null, subject: file.fileName, productId, changes: [], recordHash: createHash('sha256').update(file.bytes).digest('hex') };
}

function refuse(): never {
  throw new AppError('not-signed-in');
}

/** A malformed id names nothing, so it answers as an id that does not exist. */
function parseParams(endpoint: Endpoint, req: Request): unknown {
  if (!endpoint.params) return {};
  const parsed = endpoint.params.safeParse(req.params);
  if (!parsed.success) throw new AppError('not-found');
  return parsed.data;
}

function parsePart(schema: z.ZodType | undefined, input: unknown): unknown {
  if (!schema) return undefined;
  const cleaned = cleanTexts(input);
  if (cleaned.issues.length > 0) throw new AppError('invalid', { issues: cleaned.issues });
  const parsed = schema.safeParse(cleaned.value, { error: plainWords });
  if (!parsed.success) throw new AppError('invalid', { issues: toIssues(parsed.error.issues) });
  return parsed.data;
}

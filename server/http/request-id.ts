import { randomUUID } from 'node:crypto';
import type { Request, RequestHandler } from 'express';

const ids = new WeakMap<Request, string>();

/** Gives every request a number of ours; one sent by the client is not trusted. */
export const requestId: RequestHandler = (req, res, next) => {
  const id = randomUUID();
  ids.set(req, id);
  res.set('X-Request-Id', id);
  next();
};

export function requestIdOf(req: Request): string {
  return ids.get(req) ?? 'unnumbered';
}

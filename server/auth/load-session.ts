import type { RequestHandler } from 'express';
import type { AuthDeps } from './auth-deps.ts';
import { readCookie } from './cookies.ts';
import { csrfTokenOf } from './secret.ts';
import { moveSession, removeSession, touchSession } from './sessions.ts';
import type { AppSession } from './session.types.ts';

/**
 * Puts `req.session` on requests of signed-in people; others go on without.
 * Houses and roles are read anew each time, so that a change of rights holds
 * from the next request. Someone who has left every house is signed out.
 */
export function loadSession(deps: AuthDeps): RequestHandler {
  return async (req, _res, next) => {
    const secret = readCookie(req, deps.publicUrl, 'session');
    const session = secret === undefined ? undefined : await findSession(deps, secret);
    if (session) req.session = session;
    next();
  };
}

/** The session of a browser's secret, while it holds. */
export async function findSession(deps: AuthDeps, secret: string): Promise<AppSession | undefined> {
  const stored = await touchSession(deps.query, deps.now(), secret);
  if (!stored) return undefined;
  const houses = await deps.membershipsOf(stored.person.id);
  const house = houses.find((each) => each.houseId === stored.houseId) ?? houses[0];
  if (!house) {
    await removeSession(deps.query, stored.id);
    return undefined;
  }
  if (house.houseId !== stored.houseId) await moveSession(deps.query, stored.id, house.houseId);
  return {
    id: stored.id,
    person: stored.person,
    houseId: house.houseId,
    roles: house.roles,
    houses,
    csrfToken: csrfTokenOf(secret),
    authTime: stored.authTime,
  };
}

import type { Request } from 'express';
import type { AppSession } from '#server/auth/session.types.ts';
import type { Role } from '#shared/contracts/session.contract.ts';

/** Who acts, in which house: what every service takes. */
export interface Actor {
  readonly personId: string;
  readonly name: string;
  readonly houseId: string;
  readonly roles: readonly Role[];
}

export function findSession(req: Request): AppSession | undefined {
  return req.session;
}

export function actorOf(session: AppSession): Actor {
  return { personId: session.person.id, name: session.person.name, houseId: session.houseId, roles: session.roles };
}

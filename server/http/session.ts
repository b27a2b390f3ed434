import type { Request } from 'express';
import type { Role } from '#shared/contracts/session.contract.ts';

/** What a request knows of its signed-in person; set by the sign-in room's session middleware. */
export interface RequestSession {
  readonly id: string;
  readonly person: { readonly id: string; readonly name: string; readonly email: string };
  readonly houseId: string;
  readonly roles: readonly Role[];
  readonly csrfToken: string;
  readonly authTime: Date;
}

/** Who acts, in which house: what every service takes. */
export interface Actor {
  readonly personId: string;
  readonly name: string;
  readonly houseId: string;
  readonly roles: readonly Role[];
}

export function findSession(req: Request): RequestSession | undefined {
  return (req as Request & { session?: RequestSession }).session;
}

export function actorOf(session: RequestSession): Actor {
  return { personId: session.person.id, name: session.person.name, houseId: session.houseId, roles: session.roles };
}

import type { Role } from '#shared/contracts/session.contract.ts';

/** That a person works in a house, and in which roles. */
export interface HouseMembership {
  readonly houseId: string;
  readonly houseName: string;
  readonly roles: readonly Role[];
}

export interface SignedInPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

/** What `loadSession` puts on a request as `req.session`. */
export interface AppSession {
  /** Names the session's row; not the secret that the browser holds. */
  readonly id: string;
  readonly person: SignedInPerson;
  readonly houseId: string;
  /** Roles in that house, read anew for every request. */
  readonly roles: readonly Role[];
  /** Every house of the person, in the order of their names. */
  readonly houses: readonly HouseMembership[];
  /** Sent back in the header `X-Colophon-Token` of every change. */
  readonly csrfToken: string;
  /** When the person last proved who they are, as the identity service says. */
  readonly authTime: Date;
}

declare module 'express-serve-static-core' {
  interface Request {
    /** The signed-in person's session; absent when nobody is signed in. */
    session?: AppSession;
  }
}

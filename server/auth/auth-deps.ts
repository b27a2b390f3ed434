import type { IdentityClient } from './identity-client.ts';
import type { HouseMembership } from './session.types.ts';

/** Runs one statement with `$1` parameters and gives its rows. */
export type RunQuery = <Row extends object>(sql: string, params: readonly unknown[]) => Promise<Row[]>;

/** What happened at sign-in, for the record; holds no token and no secret. */
export interface AuthEvent {
  readonly kind: 'signed-in' | 'signed-out' | 'sign-in-refused';
  readonly at: Date;
  readonly personId?: string;
  /** Why a sign-in was refused, in our words. */
  readonly reason?: string;
}

/** All that sign-in and sessions need from the rest of the server. */
export interface AuthDeps {
  readonly query: RunQuery;
  /** The server's clock; tests give their own. */
  readonly now: () => Date;
  /** Where browsers reach the product; its scheme decides the cookies' form. */
  readonly publicUrl: URL;
  readonly identity: IdentityClient;
  /** The person's houses, by name; empty when they have none. */
  readonly membershipsOf: (personId: string) => Promise<readonly HouseMembership[]>;
  readonly onEvent?: (event: AuthEvent) => void;
}

import { randomUUID } from 'node:crypto';
import type { RunQuery } from './auth-deps.ts';
import type { Identity } from './identity-client.ts';
import { hashOf, newSecret } from './secret.ts';
import type { SignedInPerson } from './session.types.ts';

export const IDLE_SECONDS = 60 * 60;
export const ABSOLUTE_SECONDS = 12 * 60 * 60;

/** A session's row with its person. */
export interface StoredSession {
  readonly id: string;
  readonly person: SignedInPerson;
  readonly houseId: string;
  readonly authTime: Date;
}

/** The person of an identity, added at the first sign-in: known by issuer and subject, never by e-mail. */
export async function rememberPerson(query: RunQuery, now: Date, who: Identity): Promise<SignedInPerson> {
  const [person] = await query<SignedInPerson>(
    `insert into person (id, issuer, subject, name, email, created_at) values ($1, $2, $3, $4, $5, $6)
     on conflict (issuer, subject) do update set name = excluded.name, email = excluded.email
     returning id, name, email`,
    [randomUUID(), who.issuer, who.subject, who.name, who.email, now],
  );
  if (!person) throw new Error('the database gave no person back');
  return { id: person.id, name: person.name, email: person.email };
}

/** Begins a session and clears away those that have ended. @returns the secret for the browser's cookie */
export async function beginSession(
  query: RunQuery,
  now: Date,
  start: { readonly personId: string; readonly houseId: string; readonly authTime: Date; readonly browser: string },
): Promise<string> {
  const secret = newSecret();
  await query('delete from session where last_seen_at <= $1 or created_at <= $2', limits(now));
  await query(
    `insert into session (id, token_hash, person_id, house_id, created_at, last_seen_at, auth_time, browser)
     values ($1, $2, $3, $4, $5, $5, $6, $7)`,
    [randomUUID(), hashOf(secret), start.personId, start.houseId, now, start.authTime, start.browser.slice(0, 300)],
  );
  return secret;
}

/** Finds a session within its limits and marks it as used now, in one statement. */
export async function touchSession(query: RunQuery, now: Date, secret: string): Promise<StoredSession | undefined> {
  const [row] = await query<{ id: string; house_id: string; auth_time: Date | string; person_id: string; name: string; email: string }>(
    `update session s set last_seen_at = greatest(s.last_seen_at, $4) from person p
     where s.token_hash = $1 and s.last_seen_at > $2 and s.created_at > $3 and p.id = s.person_id
     returning s.id, s.house_id, s.auth_time, p.id as person_id, p.name, p.email`,
    [hashOf(secret), ...limits(now), now],
  );
  if (!row) return undefined;
  return { id: row.id, person: { id: row.person_id, name: row.name, email: row.email }, houseId: row.house_id, authTime: new Date(row.auth_time) };
}

/** Ends one session at once. */
export async function removeSession(query: RunQuery, sessionId: string): Promise<void> {
  await query('delete from session where id = $1', [sessionId]);
}

/** Ends whatever session a secret belongs to. */
export async function removeSessionOf(query: RunQuery, secret: string): Promise<void> {
  await query('delete from session where token_hash = $1', [hashOf(secret)]);
}

/** Moves a session to another house of its person; the caller has checked that it is one. */
export async function moveSession(query: RunQuery, sessionId: string, houseId: string): Promise<void> {
  await query('update session set house_id = $2 where id = $1', [sessionId, houseId]);
}

/** Before these a session is over: last use, and beginning. */
function limits(now: Date): [Date, Date] {
  return [new Date(now.getTime() - IDLE_SECONDS * 1000), new Date(now.getTime() - ABSOLUTE_SECONDS * 1000)];
}

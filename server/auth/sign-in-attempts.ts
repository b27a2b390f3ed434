import type { RunQuery } from './auth-deps.ts';
import type { AttemptSecrets } from './identity-client.ts';
import { hashOf } from './secret.ts';

/** How long a person may take at the identity service. */
export const ATTEMPT_SECONDS = 600;

export interface Attempt extends AttemptSecrets {
  readonly next: string;
}

/** Keeps what must fit when the browser with this secret comes back. */
export async function rememberAttempt(query: RunQuery, now: Date, browser: string, attempt: Attempt): Promise<void> {
  await query('delete from sign_in_attempt where created_at <= $1', [oldest(now)]);
  await query('insert into sign_in_attempt (browser_hash, state, nonce, verifier, next, created_at) values ($1, $2, $3, $4, $5, $6)', [
    hashOf(browser),
    attempt.state,
    attempt.nonce,
    attempt.verifier,
    attempt.next,
    now,
  ]);
}

/** Takes the attempt out: one callback, right or wrong, uses it up. */
export async function takeAttempt(query: RunQuery, now: Date, browser: string): Promise<Attempt | undefined> {
  const [found] = await query<Attempt & { created_at: Date | string }>(
    'delete from sign_in_attempt where browser_hash = $1 returning state, nonce, verifier, next, created_at',
    [hashOf(browser)],
  );
  if (!found || new Date(found.created_at) <= oldest(now)) return undefined;
  return { state: found.state, nonce: found.nonce, verifier: found.verifier, next: found.next };
}

function oldest(now: Date): Date {
  return new Date(now.getTime() - ATTEMPT_SECONDS * 1000);
}

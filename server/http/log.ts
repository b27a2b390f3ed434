import type { AuthEvent } from '#server/auth/auth-deps.ts';
import type { LogFault } from './problem.ts';

/** One JSON line each on stderr: a line break in a text cannot forge an entry. */
function write(entry: Record<string, unknown>): void {
  process.stderr.write(`${JSON.stringify({ at: new Date().toISOString(), ...entry })}\n`);
}

/** Notes an unexpected error under its request number. Bodies, cookies and tokens are never part of it. */
export const logFault: LogFault = ({ requestId, method, path, error }) => {
  write({ kind: 'fault', requestId, method, path, error: error instanceof Error ? (error.stack ?? error.message) : String(error) });
};

/** Notes sign-ins, sign-outs and refused sign-ins. */
export function logEvent({ kind, at, personId, reason }: AuthEvent): void {
  write({ kind, happenedAt: at.toISOString(), personId, reason });
}

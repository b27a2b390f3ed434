import type { RunQuery } from '#server/auth/auth-deps.ts';
import { StartFault } from '#server/start-fault.ts';

/**
 * What PostgreSQL must promise so that a save that was answered is still there after the power
 * has failed, and damage on the disk is seen (PostgreSQL manual, 20.5 Write Ahead Log, and
 * chapter 30, Reliability). Each with what to do where it is off.
 */
const PROMISES = {
  fsync: 'set fsync = on in postgresql.conf and reload PostgreSQL',
  full_page_writes: 'set full_page_writes = on in postgresql.conf and reload PostgreSQL',
  synchronous_commit: 'set synchronous_commit = on for the server, the database and the role, and reload PostgreSQL',
  data_checksums: 'stop PostgreSQL, run pg_checksums --enable on its data folder, and start it again',
} as const;

/** The promises that this database, as seen by this role, does not make: one sentence each. */
export async function brokenPromises(query: RunQuery): Promise<string[]> {
  const names = Object.keys(PROMISES) as (keyof typeof PROMISES)[];
  const rows = await query<{ name: keyof typeof PROMISES; setting: string }>('select name, setting from pg_settings where name = any(string_to_array($1, \',\'))', [names.join(',')]);
  const settings = new Map(rows.map(({ name, setting }) => [name, setting]));
  // A commit may also wait for standby servers ("remote_apply"); only "off" answers before the disk has it.
  return names.filter((name) => (settings.get(name) ?? 'off') === 'off').map((name) => `${name} is off: ${PROMISES[name]}.`);
}

/** @throws StartFault where a save that was answered could be lost */
export async function requireDurable(query: RunQuery): Promise<void> {
  const broken = await brokenPromises(query);
  if (broken.length > 0) throw new StartFault(`the database does not keep what it has confirmed; ${broken.join(' ')} Then start again.`);
}

import { openOrm } from './orm.ts';

/** Tables to which the app adds rows but which it never changes. */
const ONLY_ADDED = ['product_revision', 'trail_entry'];
/** Tables that only the owner writes. */
const ONLY_READ = ['migration', 'dictionary_entry', 'dictionary_term'];

/**
 * Brings a database up to date as its owner and gives the app's role what it needs, no
 * more: rows, never tables. Safe to run again.
 *
 * @param ownerUrl address with the role that owns the tables
 * @param appRole role that the server connects as; may be the owner where only one role exists
 */
export async function migrate(ownerUrl: string, appRole: string): Promise<void> {
  const orm = await openOrm(ownerUrl, { max: 2 });
  try {
    await orm.getMigrator().up();
    const knex = orm.em.getKnex();
    const role = knex.raw('??', [appRole]).toQuery();
    const own: { owner: boolean }[] = await orm.em.execute('select current_user = ? as owner', [appRole]);
    await knex.raw(`grant usage on schema public to ${role}`);
    await knex.raw(`grant select, insert, update, delete on all tables in schema public to ${role}`);
    await knex.raw(`grant usage, select on all sequences in schema public to ${role}`);
    // An owner who is also the app keeps its rights; the triggers and the wall still hold.
    if (own[0]?.owner === true) return;
    for (const table of ONLY_ADDED) await knex.raw(`revoke update, delete, truncate on ${table} from ${role}`);
    for (const table of ONLY_READ) await knex.raw(`revoke insert, update, delete, truncate on ${table} from ${role}`);
  } finally {
    await orm.close(true);
  }
}

import { defineConfig, MikroORM, type Options } from '@mikro-orm/postgresql';
import { Migrator } from '@mikro-orm/migrations';
import { TrailSubscriber } from '#server/trail/trail-subscriber.ts';
import { ENTITIES } from './entities.ts';
import { MIGRATIONS } from './migrations.ts';

/** The mapper's settings for one database address. */
export function ormOptions(clientUrl: string, pool: { readonly max: number } = { max: 10 }): Options {
  return defineConfig({
    clientUrl,
    entities: ENTITIES,
    subscribers: [new TrailSubscriber()],
    extensions: [Migrator],
    pool: { min: 0, max: pool.max, acquireTimeoutMillis: 5_000 },
    forceUtcTimezone: true,
    allowGlobalContext: false,
    migrations: { tableName: 'migration', migrationsList: MIGRATIONS, safe: true, transactional: true, allOrNothing: true, snapshot: false, silent: true },
  });
}

/** Opens the mapper. The caller closes it. */
export function openOrm(clientUrl: string, pool?: { readonly max: number }): Promise<MikroORM> {
  return MikroORM.init(ormOptions(clientUrl, pool));
}

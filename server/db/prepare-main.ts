import { resolve } from 'node:path';
import { lawTables } from '#shared/law/tables.ts';
import { readDatabaseEnv } from '#server/env.ts';
import { startOrTell } from '#server/start-fault.ts';
import { readDictionaryTables } from './dictionary-tables.ts';
import { migrate } from './migrate.ts';
import { openOrm } from './orm.ts';
import { requireDurable } from './require-durable.ts';
import { runQuery } from './run-query.ts';
import { seed } from './seed.ts';

/** Makes a database ready for a start: tables, rights, the dictionary and, where asked, the demo. Safe to run again. */
await startOrTell(async () => {
  const env = readDatabaseEnv();
  if (env.mode !== 'test') await check(env.ownerUrl);
  await migrate(env.ownerUrl, decodeURIComponent(new URL(env.url).username));
  const { entries } = readDictionaryTables(resolve('data/dictionary'));
  await seed(env.ownerUrl, { demoIssuer: env.wantsDemo ? env.issuer : undefined, dictionary: entries, release: lawTables.release.release });
});

/** Before anything is written to it. */
async function check(url: string): Promise<void> {
  const orm = await openOrm(url, { max: 1 });
  try {
    await requireDurable(runQuery(orm));
  } finally {
    await orm.close(true);
  }
}

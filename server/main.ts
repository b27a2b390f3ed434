import { createServer } from 'node:http';
import { resolve } from 'node:path';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import { createApp } from '#server/app.ts';
import { createIdentityClient } from '#server/auth/identity-client.ts';
import { readDictionaryTables } from '#server/db/dictionary-tables.ts';
import { openOrm } from '#server/db/orm.ts';
import { membershipsOf, runQuery } from '#server/db/run-query.ts';
import { requireDurable } from '#server/db/require-durable.ts';
import { readEnv } from '#server/env.ts';
import { StartFault, startOrTell } from '#server/start-fault.ts';
import { logEvent, logFault } from '#server/http/log.ts';
import { createObjectStore } from '#server/storage/object-store.ts';

await startOrTell(async () => {
  const env = readEnv();
  const now = () => new Date();
  const law = openLawBook(lawTables);
  const { entries, oils } = readDictionaryTables(resolve('data/dictionary'));
  const orm = await openOrm(env.database.url);
  // Tests run on a database that is thrown away.
  if (env.mode !== 'test') await requireDurable(runQuery(orm));
  const storage = createObjectStore(env.storage);
  await storage.prepare().catch((error: unknown) => {
    throw new StartFault(`the object storage of S3_ENDPOINT (${env.storage.endpoint.origin}) did not open the bucket ${env.storage.bucket}: ${error instanceof Error ? error.message : String(error)} Check S3_ENDPOINT, S3_BUCKET and the keys, and start again.`);
  });
  const app = createApp({
    orm,
    auth: {
      query: runQuery(orm),
      now,
      publicUrl: env.publicUrl,
      identity: createIdentityClient(env.identity),
      membershipsOf: membershipsOf(orm),
      onEvent: logEvent,
    },
    law: { book: law, tables: lawTables },
    dictionary: createDictionary(entries, law.release),
    oils,
    storage,
    now,
    clientDir: resolve('build/client'),
    log: logFault,
  });

  // Slow or broken clients do not hold a connection: headers in 15 s, a whole upload in 5 min.
  const server = createServer({ headersTimeout: 15_000, requestTimeout: 300_000, keepAliveTimeout: 5_000, maxHeaderSize: 16_384 }, app);
  server.once('error', (error) => {
    process.stderr.write(`Colophon cannot start: ${error.message}. Set PORT to a free port, HOST to an address of this machine, and start again.\n`);
    process.exit(1);
  });
  // Whoever started us is told by us: at our address another program might answer.
  server.listen(env.port, env.host, () => process.send?.('listening'));

  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.once(signal, () => {
      server.close(() => void orm.close(true).finally(() => process.exit(0)));
      server.closeIdleConnections();
      // Whoever is still being answered gets a moment, not for ever.
      setTimeout(() => process.exit(0), 2_500).unref();
    });
  }
});

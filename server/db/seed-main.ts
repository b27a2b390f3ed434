import { resolve } from 'node:path';
import { lawTables } from '#shared/law/tables.ts';
import { readDatabaseEnv } from '#server/env.ts';
import { readDictionaryTables } from './dictionary-tables.ts';
import { seed } from './seed.ts';

/** Fills the dictionary and, where asked, the invented houses. Safe to run again. */
const env = readDatabaseEnv();
const { entries } = readDictionaryTables(resolve('data/dictionary'));
await seed(env.ownerUrl, { demoIssuer: env.wantsDemo ? env.issuer : undefined, dictionary: entries, release: lawTables.release.release });

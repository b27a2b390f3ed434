import { readDatabaseEnv } from '#server/env.ts';
import { migrate } from './migrate.ts';

/** Brings the database up to date: run once before each start of a new version. */
const env = readDatabaseEnv();
await migrate(env.ownerUrl, decodeURIComponent(new URL(env.url).username));

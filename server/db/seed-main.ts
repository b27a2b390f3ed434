import { readDatabaseEnv } from '#server/env.ts';
import { seed } from './seed.ts';

/** Fills the dictionary and, where asked, the invented houses. Safe to run again. */
const env = readDatabaseEnv();
await seed(env.ownerUrl, { demoIssuer: env.wantsDemo ? env.issuer : undefined });

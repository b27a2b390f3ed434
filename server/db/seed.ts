import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { seedDictionary } from '#server/modules/dictionary/seed-dictionary.ts';
import { seedDemo } from './demo/seed-demo.ts';
import { openOrm } from './orm.ts';
import { runQuery } from './run-query.ts';

export interface SeedOptions {
  /** Who vouches for the demo people; without it no invented house is added. */
  readonly demoIssuer: string | undefined;
  /** The dictionary's tables. */
  readonly dictionary: readonly DictionaryEntry[];
  readonly release: string;
}

/**
 * Fills a migrated database with the dictionary and, where asked, the demo. Idempotent: what
 * stands is left as it is, so a demo that someone has worked in keeps that work.
 */
export async function seed(ownerUrl: string, { demoIssuer, dictionary, release }: SeedOptions): Promise<void> {
  const orm = await openOrm(ownerUrl, { max: 2 });
  try {
    await seedDictionary(runQuery(orm), dictionary, { release });
    if (demoIssuer !== undefined) await seedDemo(orm.em, demoIssuer);
  } finally {
    await orm.close(true);
  }
}

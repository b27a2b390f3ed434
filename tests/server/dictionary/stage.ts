import { join } from 'node:path';
import pg from 'pg';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import { readEntryTables } from '#server/modules/dictionary/read-tables.ts';
import { DICTIONARY_TABLES } from '#server/modules/dictionary/schema.sql.ts';
import { testDatabase } from '#tests/support/database.ts';

const folder = join(import.meta.dirname, '../../../data/dictionary');

/** Every curated entry, as the server reads them. */
export function curatedEntries(): DictionaryEntry[] {
  return readEntryTables(folder);
}

export interface DictionaryStage {
  readonly query: RunQuery;
  readonly close: () => Promise<void>;
}

/** A database of its own with only the dictionary's tables, empty. */
export async function dictionaryStage(): Promise<DictionaryStage> {
  const database = await testDatabase('bare');
  const pool = new pg.Pool({ connectionString: database.ownerUrl, max: 4 });
  await pool.query('create table house (id uuid primary key)');
  for (const statement of DICTIONARY_TABLES) await pool.query(statement);
  return {
    query: async <Row extends object>(sql: string, params: readonly unknown[]) => (await pool.query<Row>(sql, [...params])).rows,
    close: async () => {
      await pool.end();
      await database.drop();
    },
  };
}

import pg from 'pg';
import { expect, test, vi } from 'vitest';
import { listNames } from '#server/modules/dictionary/names.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { testDatabase } from '#tests/support/database.ts';
import { curatedEntries } from './stage.ts';

vi.setConfig({ testTimeout: 120_000 });

test('every curated name is sent once, with what a look-up asks for and no more', async () => {
  const database = await testDatabase('seeded');
  const pool = new pg.Pool({ connectionString: database.ownerUrl, max: 1 });
  const em = { execute: async (sql: string) => (await pool.query(sql)).rows } as unknown as Parameters<typeof listNames>[0];
  const { entries, release } = await listNames(em);
  await pool.end();
  await database.drop();

  const names = entries.map(({ inci }) => inci);
  expect(new Set(names).size).toBe(names.length);
  expect(curatedEntries().map(({ inci }) => inci).filter((inci) => !new Set(names).has(inci))).toEqual([]);
  expect(entries.some((entry) => 'source' in entry || 'ec' in entry)).toBe(false);
  const dictionary = createDictionary(entries as unknown as DictionaryEntry[], release);
  expect([dictionary.resolve('AQUA/WATER/EAU')?.entry.inci, dictionary.resolve('C.I. 77891')?.entry.inci]).toEqual(['Aqua', 'CI 77891']);
});

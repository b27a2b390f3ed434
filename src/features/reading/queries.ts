import { queryOptions } from '@tanstack/react-query';
import { listDictionaryNames } from '#shared/contracts/dictionary.contract.ts';
import { createNameBeginner } from '#shared/dictionary/begin-names.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import type { Dictionary, DictionaryEntry, NameEntry } from '#shared/dictionary/types.ts';
import { call } from '#src/lib/api/call.ts';

const fresh = { staleTime: 10 * 60_000, gcTime: 60 * 60_000, structuralSharing: false } as const;

/** Every name that the house sees, fetched once for all that follow. */
const entriesQuery = queryOptions({
  ...fresh,
  queryKey: ['dictionary', 'names', 'entries'] as const,
  queryFn: async ({ signal }): Promise<{ release: string; entries: readonly DictionaryEntry[] }> => {
    const { release, entries } = await call(listDictionaryNames, {}, signal);
    return { release, entries: (entries as NameEntry[]).map((entry) => ({ ...entry, ec: [], source: '' })) };
  },
});

/** Every name in the browser's own memory: from then on a list is read without the server. */
export const namesQuery = queryOptions({
  ...fresh,
  queryKey: ['dictionary', 'names'] as const,
  queryFn: async ({ client }): Promise<Dictionary> => {
    const { release, entries } = await client.ensureQueryData(entriesQuery);
    return createDictionary(entries, release);
  },
});

/** What begins as typed, answered in the same moment. */
export const beginningsQuery = queryOptions({
  ...fresh,
  queryKey: ['dictionary', 'names', 'beginnings'] as const,
  queryFn: async ({ client }) => ({ begin: createNameBeginner((await client.ensureQueryData(entriesQuery)).entries) }),
});

import { queryOptions } from '@tanstack/react-query';
import { listDictionaryNames } from '#shared/contracts/dictionary.contract.ts';
import { createDictionary } from '#shared/dictionary/create-dictionary.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import { call } from '#src/lib/api/call.ts';

/** An entry as it is sent: what names are told by. */
type NameEntry = Omit<DictionaryEntry, 'ec' | 'functions' | 'source'>;

/** Every name in the browser's own memory: from then on a list is read without the server. */
export const namesQuery = queryOptions({
  queryKey: ['dictionary', 'names'] as const,
  queryFn: async ({ signal }): Promise<Dictionary> => {
    const { release, entries } = await call(listDictionaryNames, {}, signal);
    return createDictionary((entries as NameEntry[]).map((entry) => ({ ...entry, ec: [], functions: [], source: '' })), release);
  },
  staleTime: 10 * 60_000,
  structuralSharing: false,
});

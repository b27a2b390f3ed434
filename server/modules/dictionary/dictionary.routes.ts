import * as contract from '#shared/contracts/dictionary.contract.ts';
import type { OilProfile } from '#shared/dictionary/oil-profiles.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import { route, type Route } from '#server/http/route.ts';
import { createInventorySearch, listInventory, mergeFound } from './inventory-search.ts';
import { listNames } from './names.ts';
import { listDictionary, resolveNames, searchDictionary } from './dictionary.service.ts';

export interface DictionaryDeps {
  readonly query: RunQuery;
  readonly dictionary: Dictionary;
  readonly oils: readonly OilProfile[];
}

/** Looking names up; everyone in a house may. */
export function dictionaryRoutes({ query, dictionary, oils }: DictionaryDeps): Route[] {
  const inventory = createInventorySearch();
  return [
    route(contract.searchDictionary, { may: ['read', 'materials'] }, async ({ query: asked, actor, inHouse }) => {
      const limit = asked.limit ?? 10;
      const [curated, own] = await Promise.all([searchDictionary(query, { q: asked.q, limit }), inHouse((em) => inventory.search(em, actor, { q: asked.q, limit }))]);
      return {
        items: mergeFound(curated, own, asked.q)
          .slice(0, limit)
          .map(({ entry, matched, by }) => ({ entry: { ...presentEntry(entry), ...(own.some((one) => one.entry === entry) ? { origin: 'inventory' as const } : {}) }, matched, by })),
      };
    }),
    route(contract.resolveNames, { may: ['read', 'materials'], bodyLimit: 1024 * 1024 }, ({ body }) => {
      const { release, items } = resolveNames(dictionary, body.names);
      return Promise.resolve({
        release,
        items: items.map((item) => ({
          name: item.name,
          match: item.match,
          entry: item.entry && presentEntry(item.entry),
          suggestions: item.suggestions.map(presentEntry),
        })),
      });
    }),
    route(contract.listDictionary, { may: ['read', 'materials'] }, async ({ query: asked, actor, inHouse }) => {
      if (asked.from === 'inventory') {
        const own = await inHouse((em) => listInventory(em, actor, asked));
        return { ...own, items: own.items.map((entry) => ({ ...presentEntry(entry), origin: 'inventory' as const })), functions: [...own.functions] };
      }
      const page = await listDictionary(query, asked);
      return { ...page, items: page.items.map(presentEntry), functions: [...page.functions] };
    }),
    route(contract.listDictionaryNames, { may: ['read', 'materials'] }, ({ inHouse }) => inHouse(listNames)),
    route(contract.listOilProfiles, { may: ['read', 'materials'] }, () =>
      Promise.resolve({ items: oils.map((oil) => ({ ...oil, constituents: oil.constituents.map((one) => ({ ...one })) })) }),
    ),
  ];
}

/** An entry as the contract shows it: lists copied, our own notes left out. */
function presentEntry(entry: DictionaryEntry) {
  const { us, ca, fr, usColours } = entry.names;
  return {
    id: entry.id,
    inci: entry.inci,
    cas: [...entry.cas],
    ec: [...entry.ec],
    functions: [...entry.functions],
    names: { ...(us ? { us } : {}), ...(ca ? { ca } : {}), ...(fr ? { fr } : {}), ...(usColours ? { usColours: [...usColours] } : {}) },
    synonyms: [...entry.synonyms],
    commonNames: [...entry.commonNames],
    ...(entry.supersededBy ? { supersededBy: entry.supersededBy } : {}),
    properties: [...entry.properties],
    source: entry.source,
  };
}

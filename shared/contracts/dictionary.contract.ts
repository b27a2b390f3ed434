import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';

export const dictionaryEntry = z.object({
  id: z.string(),
  inci: z.string(),
  cas: z.array(z.string()),
  ec: z.array(z.string()),
  functions: z.array(z.string()),
  names: z.object({
    us: z.string().optional(),
    ca: z.string().optional(),
    fr: z.string().optional(),
    usColours: z.array(z.string()).optional(),
  }),
  synonyms: z.array(z.string()),
  commonNames: z.array(z.string()),
  supersededBy: z.string().optional(),
  properties: z.array(z.string()),
  source: z.string(),
  /** Set where a name was taken over from the official inventory and nobody curated it. */
  origin: z.literal('inventory').optional(),
});

/** Ranked look-up as someone types: misspellings, synonyms, common names, CAS numbers. */
export const searchDictionary = endpoint({
  method: 'GET',
  path: '/dictionary/search',
  query: z.strictObject({ q: z.string().trim().min(1).max(255), limit: z.coerce.number().int().min(1).max(50).optional() }),
  response: z.object({
    items: z.array(z.object({ entry: dictionaryEntry, matched: z.string(), by: z.enum(['inci', 'synonym', 'common-name', 'cas', 'respelt']) })),
  }),
});
/** Exact resolution of many written names at once (a paste, a product's materials). */
export const resolveNames = endpoint({
  method: 'POST',
  path: '/dictionary/resolve',
  body: z.strictObject({ names: z.array(z.strictObject({ name: z.string().max(500), cas: z.string().max(20).optional() })).max(1000) }),
  response: z.object({
    release: z.string(),
    items: z.array(
      z.object({
        name: z.string(),
        entry: dictionaryEntry.nullable(),
        match: z.enum(['exact', 'synonym', 'respelt', 'unknown']),
        suggestions: z.array(dictionaryEntry),
      }),
    ),
  }),
});
export const listDictionary = endpoint({
  method: 'GET',
  path: '/dictionary',
  query: z.strictObject({
    find: z.string().max(255).optional(),
    function: z.string().max(80).optional(),
    /** `inventory` for the names taken over from the inventory alone; else the curated ones. */
    from: z.literal('inventory').optional(),
    page: z.coerce.number().int().min(1).optional(),
  }),
  response: z.object({ items: z.array(dictionaryEntry), total: z.int(), page: z.int(), pageSize: z.int(), functions: z.array(z.string()) }),
});
/** Every name that the house sees, for reading lists in the browser. Kept by the browser until the tables change. */
export const listDictionaryNames = endpoint({
  method: 'GET',
  path: '/dictionary/names',
  response: z.object({ release: z.string(), entries: z.unknown() }),
});
/** Published ranges of an essential oil's constituents, to pre-fill a material. */
export const listOilProfiles = endpoint({
  method: 'GET',
  path: '/dictionary/oils',
  response: z.object({
    items: z.array(
      z.object({
        id: z.string(),
        oil: z.string(),
        inci: z.string(),
        standard: z.string(),
        kind: z.string(),
        constituents: z.array(z.object({ name: z.string(), cas: z.string().optional(), min: z.string(), max: z.string(), sourcing: z.string() })),
      }),
    ),
  }),
});

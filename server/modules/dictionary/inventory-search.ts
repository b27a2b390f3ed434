import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { createNameBeginner } from '#shared/dictionary/begin-names.ts';
import { scoreTerm } from '#shared/dictionary/score-term.ts';
import { createNameSuggester } from '#shared/dictionary/suggest.ts';
import { toWords } from '#shared/dictionary/terms.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { DictionaryPage, FoundEntry } from './dictionary.service.ts';

/** Houses whose names are kept ready at once; the one asked longest ago is let go. */
const KEPT_HOUSES = 8;
const PAGE_SIZE = 50;

interface Row {
  readonly inci: string;
  readonly cas: string[];
  readonly ec: string[];
  readonly functions: string[];
}
interface Ready {
  readonly stamp: string;
  readonly begin: ReturnType<typeof createNameBeginner>;
  readonly suggest: ReturnType<typeof createNameSuggester>;
}
interface House {
  readonly houseId: string;
}

/** An imported name as an entry: what the inventory says of it and nothing more. */
function toEntry({ inci, cas, ec, functions }: Row): DictionaryEntry {
  const id = `inventory-${createHash('sha256').update(foldName(inci)).digest('hex').slice(0, 16)}`;
  return { id, inci, cas, ec, functions, names: {}, synonyms: [], commonNames: [], properties: [], source: 'from the inventory, not curated' };
}

/**
 * Search in the names that a house took over. Behind the house's wall the database may not use
 * its indexes of letter groups, so the names are kept in memory, a house at a time, and read
 * anew when the import has moved on.
 */
export function createInventorySearch() {
  const houses = new Map<string, Ready>();
  const ready = async (em: EntityManager, { houseId }: House): Promise<Ready | undefined> => {
    const [last] = await em.execute<{ stamp: string }[]>("select id::text || ' ' || done::text as stamp from inventory_import where house_id = ?", [houseId]);
    const kept = houses.get(houseId);
    houses.delete(houseId);
    if (!last) return undefined;
    const now = kept?.stamp === last.stamp ? kept : await read(em, houseId, last.stamp);
    houses.set(houseId, now);
    if (houses.size > KEPT_HOUSES) houses.delete(houses.keys().next().value!);
    return now;
  };
  return {
    async search(em: EntityManager, house: House, { q, limit }: { readonly q: string; readonly limit: number }): Promise<FoundEntry[]> {
      const names = await ready(em, house);
      if (!names) return [];
      const begun = names.begin(q, limit);
      if (begun.length >= limit) return begun;
      const met = new Set(begun.map(({ entry }) => entry));
      const near = names.suggest(q, limit).filter((entry) => !met.has(entry));
      return [...begun, ...near.map((entry) => ({ entry, matched: entry.inci, by: 'respelt' as const }))].slice(0, limit);
    },
  };
}

async function read(em: EntityManager, houseId: string, stamp: string): Promise<Ready> {
  const rows = await em.execute<Row[]>('select inci, cas, ec, functions from inventory_name where house_id = ?', [houseId]);
  const entries = rows.map(toEntry);
  return { stamp, begin: createNameBeginner(entries), suggest: createNameSuggester(entries) };
}

/** Two lists, each best first, as one: the nearer name goes first, a curated one where both are as near. */
export function mergeFound(curated: readonly FoundEntry[], own: readonly FoundEntry[], q: string): FoundEntry[] {
  if (own.length === 0) return [...curated];
  const asked = { words: toWords(q), folded: foldName(q) };
  const scored = (list: readonly FoundEntry[], isCurated: boolean) =>
    list.map((found) => ({ found, score: scoreTerm({ words: toWords(found.matched), folded: foldName(found.matched), kind: found.by, isCurated }, asked) }));
  const [left, right] = [scored(curated, true), scored(own, false)];
  const merged: FoundEntry[] = [];
  while (left.length > 0 || right.length > 0) {
    const isLeft = right.length === 0 || (left.length > 0 && left[0]!.score >= right[0]!.score);
    merged.push((isLeft ? left : right).shift()!.found);
  }
  return merged;
}

/** One page of the names that a house took over, narrowed as the dictionary is. */
export async function listInventory(
  em: EntityManager,
  { houseId }: House,
  { find, function: one, page = 1 }: { readonly find?: string | undefined; readonly function?: string | undefined; readonly page?: number | undefined },
): Promise<DictionaryPage> {
  const words = JSON.stringify(toWords(find ?? '').split(' ').filter(Boolean).slice(0, 8).map((word) => `%${word}%`));
  const where = "house_id = ? and (?::text = '' or functions @> array[?::text]) and search like all (array(select jsonb_array_elements_text(?::jsonb)))";
  const given = [houseId, one ?? '', one ?? '', words];
  const items = await em.execute<Row[]>(`select inci, cas, ec, functions from inventory_name where ${where} order by lower(inci), folded_md5 limit ? offset ?`, [...given, PAGE_SIZE, (page - 1) * PAGE_SIZE]);
  const [total] = await em.execute<{ total: number }[]>(`select count(*)::int as total from inventory_name where ${where}`, given);
  const functions = await em.execute<{ name: string }[]>('select distinct unnest(functions) as name from inventory_name where house_id = ? order by 1', [houseId]);
  return { items: items.map(toEntry), total: total?.total ?? 0, page, pageSize: PAGE_SIZE, functions: functions.map(({ name }) => name) };
}

import { createHash, randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { InventoryState } from '#shared/contracts/inventory.contract.ts';
import { readInventory, type InventoryName, type InventoryReading, type InventoryRemark } from '#shared/dictionary/read-inventory.ts';
import { toWords } from '#shared/dictionary/terms.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { DomainError } from '#shared/kernel/errors.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';

/** Names of one transaction: a second's work at most, so a killed server loses no more. */
const CHUNK = 1000;
/** Lines told of one by one; a file with more faults than these is another file. */
const TOLD = 1000;

/**
 * Reads an uploaded export.
 * @throws AppError `unsupported-file` with what is wrong with it.
 */
export function readExport(bytes: Buffer): InventoryReading {
  try {
    return readInventory(decode(bytes));
  } catch (error) {
    if (error instanceof DomainError) throw new AppError('unsupported-file', { message: error.message });
    throw error;
  }
}

/** UTF-8, or UTF-16 with its mark; anything else is read as the code page that spreadsheets in Western Europe write. */
function decode(bytes: Buffer): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes);
  if (bytes.includes(0)) throw new AppError('unsupported-file', { message: 'This is not a text file. Save the inventory as text with tabs or commas and send that.' });
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/** Lays an export ready to be taken over, in place of the report of the one before. */
export async function beginImport(em: EntityManager, actor: Actor, given: { readonly reading: InventoryReading; readonly fileName: string; readonly now: Date }): Promise<void> {
  const { names, skipped, remarks } = given.reading;
  const [before] = await em.execute<{ running: boolean }[]>('select done < total as running from inventory_import where house_id = ? for update', [actor.houseId]);
  if (before?.running) throw new AppError('in-use', { message: 'An export is being taken over already. Wait until it is done, or remove it first.' });
  await em.execute('delete from inventory_import where house_id = ?', [actor.houseId]);
  const id = randomUUID();
  await em.execute(
    'insert into inventory_import (id, house_id, file_name, started_at, started_by, total, skipped, remarks) values (?, ?, ?, ?, ?, ?, ?::jsonb, ?::jsonb)',
    [id, actor.houseId, given.fileName.slice(0, 255), given.now, actor.name, names.length, JSON.stringify(tell(skipped)), JSON.stringify(tell(remarks))],
  );
  for (let at = 0; at < names.length; at += CHUNK) {
    await em.execute('insert into inventory_chunk (import_id, house_id, at, names) values (?, ?, ?, ?::jsonb)', [id, actor.houseId, at, JSON.stringify(names.slice(at, at + CHUNK))]);
  }
}

function tell(remarks: readonly InventoryRemark[]): readonly InventoryRemark[] {
  if (remarks.length <= TOLD) return remarks;
  return [...remarks.slice(0, TOLD), { line: remarks[TOLD]!.line, reason: `From here on ${remarks.length - TOLD} further lines are like those above.` }];
}

/**
 * Takes over the next piece of the house's export, if any is left, within the caller's
 * transaction: its names and the count of them stand or fall together.
 */
export async function takeOverChunk(em: EntityManager, actor: Pick<Actor, 'houseId'>, dictionary: Dictionary): Promise<'more' | 'done'> {
  const [running] = await em.execute<{ id: string }[]>('select id from inventory_import where house_id = ? and done < total for update', [actor.houseId]);
  if (!running) return 'done';
  const [chunk] = await em.execute<{ at: number; names: InventoryName[] }[]>('select at, names from inventory_chunk where import_id = ? order by at limit 1', [running.id]);
  if (!chunk) return 'done';
  // Curated entries win: a name that one bears is not kept a second time. A number alone joins nothing.
  const own = chunk.names.filter(({ inci }) => !isCurated(dictionary, inci));
  const { added, updated } = await keepNames(em, actor.houseId, own);
  const joined = chunk.names.length - own.length;
  await em.execute('delete from inventory_chunk where import_id = ? and at = ?', [running.id, chunk.at]);
  await em.execute('update inventory_import set done = done + ?, added = added + ?, updated = updated + ?, unchanged = unchanged + ?, joined = joined + ? where id = ?', [
    chunk.names.length, added, updated, own.length - added - updated, joined, running.id,
  ]);
  return 'more';
}

function isCurated(dictionary: Dictionary, inci: string): boolean {
  const match = dictionary.resolve(inci)?.match;
  return match === 'exact' || match === 'synonym';
}

async function keepNames(em: EntityManager, houseId: string, names: readonly InventoryName[]): Promise<{ added: number; updated: number }> {
  if (names.length === 0) return { added: 0, updated: 0 };
  const records = names.map(({ inci, folded, cas, ec, functions }) => ({ inci, folded, cas, ec, functions, search: toWords([inci, ...cas, ...ec].join(' ')), hash: hashOf([inci, cas, ec, functions]) }));
  const [counts] = await em.execute<{ added: number; updated: number }[]>(
    `with given as (
       select * from jsonb_to_recordset(?::jsonb) as r (inci text, folded text, cas jsonb, ec jsonb, functions jsonb, search text, hash text)
     ), kept as (
       insert into inventory_name as n (house_id, folded, inci, cas, ec, functions, search, hash)
       select ?::uuid, folded, inci, array(select jsonb_array_elements_text(cas)), array(select jsonb_array_elements_text(ec)),
              array(select jsonb_array_elements_text(functions)), search, hash from given
       on conflict (house_id, folded_md5) do update
         set inci = excluded.inci, cas = excluded.cas, ec = excluded.ec, functions = excluded.functions, search = excluded.search, hash = excluded.hash
         where n.hash <> excluded.hash
       returning (xmax = 0) as fresh
     )
     select count(*) filter (where fresh)::int as added, count(*) filter (where not fresh)::int as updated from kept`,
    [JSON.stringify(records), houseId],
  );
  return counts ?? { added: 0, updated: 0 };
}

function hashOf(facts: unknown): string {
  return createHash('sha256').update(JSON.stringify(facts)).digest('base64url').slice(0, 22);
}

/** Takes the import back: its names, its report and what was still to do. */
export async function removeImport(em: EntityManager, actor: Actor): Promise<void> {
  await em.execute('delete from inventory_import where house_id = ?', [actor.houseId]);
  await em.execute('delete from inventory_name where house_id = ?', [actor.houseId]);
}

/** How the house's import stands. */
export async function inventoryStateOf(em: EntityManager, { houseId }: Pick<Actor, 'houseId'>): Promise<InventoryState> {
  const [last] = await em.execute<(Omit<NonNullable<InventoryState['last']>, 'startedAt'> & { startedAt: Date | string })[]>(
    `select file_name as "fileName", started_at as "startedAt", started_by as "startedBy", done < total as "isRunning",
            total, done, added, updated, unchanged, joined, skipped, remarks from inventory_import where house_id = ?`,
    [houseId],
  );
  // Counted after the report was read: work told of as done is counted in full.
  const [count] = await em.execute<{ names: number }[]>('select count(*)::int as names from inventory_name where house_id = ?', [houseId]);
  return { names: count?.names ?? 0, last: last ? { ...last, startedAt: new Date(last.startedAt).toISOString() } : null };
}

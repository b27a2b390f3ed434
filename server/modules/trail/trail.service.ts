import type { EntityManager } from '@mikro-orm/postgresql';
import type { Actor } from '#server/http/session.ts';
import { TrailVerifier, type TrailChange, type TrailEntry, type TrailVerdict } from '#server/trail/chain.ts';

/** Entries on one page of the trail. */
const PAGE = 50;
/** Entries read at a time when the whole chain is gone along: memory stays flat however long it is. */
const STRIDE = 2000;

interface Row {
  readonly house_id: string;
  readonly place: number;
  readonly at: Date | string;
  readonly actor_id: string | null;
  readonly actor: string;
  readonly act: string;
  readonly subject_kind: string;
  readonly subject_id: string | null;
  readonly subject: string;
  readonly product_id: string | null;
  readonly changes: readonly TrailChange[] | string;
  readonly record_hash: string | null;
  readonly hash_before: string;
  readonly hash: string;
}

function toEntry(row: Row): TrailEntry {
  return {
    houseId: row.house_id, place: row.place, at: new Date(row.at).toISOString(), actorId: row.actor_id, actor: row.actor, act: row.act,
    subjectKind: row.subject_kind, subjectId: row.subject_id, subject: row.subject, productId: row.product_id,
    changes: typeof row.changes === 'string' ? (JSON.parse(row.changes) as TrailChange[]) : row.changes, recordHash: row.record_hash, hashBefore: row.hash_before, hash: row.hash,
  };
}

/** A page of the trail, newest first. */
export async function listTrail(em: EntityManager, actor: Actor, query: { readonly product?: string | undefined; readonly subject?: string | undefined; readonly before?: number | undefined }): Promise<{ items: TrailEntry[]; next?: number }> {
  const rows: Row[] = await em.execute(
    `select t.* from trail_entry t where t.house_id = ? and t.place < ?
       and (?::uuid is null or t.product_id = ? or t.subject_id in (select u.material_id from product_material u where u.house_id = t.house_id and u.product_id = ?))
       and (?::uuid is null or t.subject_id = ?)
     order by t.place desc limit ?`,
    [actor.houseId, query.before ?? 2_147_483_647, query.product ?? null, query.product ?? null, query.product ?? null, query.subject ?? null, query.subject ?? null, PAGE + 1],
  );
  const items = rows.slice(0, PAGE).map(toEntry);
  return { items, ...(rows.length > PAGE && { next: items.at(-1)!.place }) };
}

/** Every entry of the house from the first, a stride at a time. */
export async function* walkTrail(em: EntityManager, houseId: string): AsyncGenerator<TrailEntry> {
  for (let after = 0; ; ) {
    const rows: Row[] = await em.execute('select * from trail_entry where house_id = ? and place > ? order by place limit ?', [houseId, after, STRIDE]);
    for (const row of rows) yield toEntry(row);
    if (rows.length < STRIDE) return;
    after = rows.at(-1)!.place;
  }
}

/** Goes along the whole chain and says where it breaks. */
export async function verifyTrail(em: EntityManager, houseId: string): Promise<TrailVerdict> {
  const verifier = new TrailVerifier(houseId);
  for await (const entry of walkTrail(em, houseId)) verifier.take(entry);
  return verifier.finish();
}

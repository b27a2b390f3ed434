import type { EntityManager } from '@mikro-orm/postgresql';
import { BEGINNING, seal } from './chain.ts';
import type { TrailAct, TrailActor } from './trail-context.ts';

interface Head {
  readonly place: number;
  readonly hash: string;
}

/**
 * Adds acts to the end of a house's chain, within the transaction they were done in: neither
 * stands without the other. The house's chain is held until the transaction ends, so that two
 * writers never continue it from one place.
 */
export async function appendTrail(em: EntityManager, houseId: string, actor: TrailActor, acts: readonly TrailAct[], now: Date): Promise<void> {
  if (acts.length === 0) return;
  await em.execute("select pg_advisory_xact_lock(hashtext('trail'), hashtext(?))", [houseId]);
  const [head]: Head[] = await em.execute('select place, hash from trail_entry where house_id = ? order by place desc limit 1', [houseId]);
  let [place, hash] = [head?.place ?? 0, head?.hash ?? BEGINNING];
  for (const act of acts) {
    place += 1;
    const entry = seal({ houseId, place, at: now.toISOString(), actorId: actor.personId, actor: actor.name, ...act, hashBefore: hash });
    hash = entry.hash;
    await em.execute(
      `insert into trail_entry (house_id, place, at, actor_id, actor, act, subject_kind, subject_id, subject, product_id, changes, record_hash, hash_before, hash)
       values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?::jsonb, ?, ?, ?)`,
      [houseId, place, entry.at, entry.actorId, entry.actor, entry.act, entry.subjectKind, entry.subjectId, entry.subject, entry.productId, JSON.stringify(entry.changes), entry.recordHash, entry.hashBefore, entry.hash],
    );
  }
}

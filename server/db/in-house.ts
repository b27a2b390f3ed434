import type { EntityManager } from '@mikro-orm/postgresql';
import { appendTrail } from '#server/trail/append-trail.ts';
import { openTrail, type TrailActor } from '#server/trail/trail-context.ts';

/** Who acts and when, for the house's trail. */
export interface Doing {
  readonly actor: TrailActor;
  readonly now: () => Date;
}

/**
 * Runs work in one transaction in which the database shows one house and no other. The
 * setting ends with the transaction, so a pooled connection never carries it on. With `doing`,
 * whatever is written is noted in the house's trail within the same transaction.
 */
export function inHouse<T>(em: EntityManager, houseId: string, work: (em: EntityManager) => Promise<T>, doing?: Doing): Promise<T> {
  return em.fork().transactional(async (own) => {
    await own.execute("select set_config('app.house', ?, true)", [houseId]);
    if (!doing) return work(own);
    const trail = openTrail(own, doing.actor);
    const result = await work(own);
    await own.flush();
    await appendTrail(own, houseId, trail.actor, trail.acts, doing.now());
    return result;
  });
}

/**
 * Runs work in one transaction that sees the houses and memberships of one person: for
 * sign-in and for choosing a house, before there is a house to work in.
 */
export function asPerson<T>(em: EntityManager, personId: string, work: (em: EntityManager) => Promise<T>): Promise<T> {
  return em.fork().transactional(async (own) => {
    await own.execute("select set_config('app.person', ?, true)", [personId]);
    return work(own);
  });
}

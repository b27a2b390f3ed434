import type { EntityManager } from '@mikro-orm/postgresql';

/**
 * Runs work in one transaction in which the database shows one house and no other. The
 * setting ends with the transaction, so a pooled connection never carries it on.
 */
export function inHouse<T>(em: EntityManager, houseId: string, work: (em: EntityManager) => Promise<T>): Promise<T> {
  return em.fork().transactional(async (own) => {
    await own.execute("select set_config('app.house', ?, true)", [houseId]);
    return work(own);
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

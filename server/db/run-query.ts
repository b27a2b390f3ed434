import type { MikroORM } from '@mikro-orm/postgresql';
import type { HouseMembership } from '#server/auth/session.types.ts';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import { asPerson } from './in-house.ts';

/** Runs single statements with `$1` parameters outside every house: for sign-in's own tables. */
export function runQuery(orm: MikroORM): RunQuery {
  return async <Row extends object>(sql: string, params: readonly unknown[]): Promise<Row[]> => {
    // The query builder counts its bindings itself, so each `$n` becomes its own `?`.
    const bindings: unknown[] = [];
    const text = sql.replaceAll(/\$(\d+)/g, (_sign, number: string) => {
      bindings.push(params[Number(number) - 1]);
      return '?';
    });
    const answer = (await orm.em.getKnex().raw(text, bindings as never[])) as { readonly rows: Row[] };
    return answer.rows;
  };
}

/** The houses of a person with the roles held there, by name. */
export function membershipsOf(orm: MikroORM): (personId: string) => Promise<readonly HouseMembership[]> {
  return (personId) =>
    asPerson(orm.em, personId, (em) =>
      em.execute<HouseMembership[]>(
        `select m.house_id as "houseId", h.name as "houseName", m.roles from membership m join house h on h.id = m.house_id
         where m.person_id = ? order by h.name, h.id`,
        [personId],
      ),
    );
}

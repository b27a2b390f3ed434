import type { EntityManager } from '@mikro-orm/postgresql';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { HousePicture } from './picture.entity.ts';

/** Pictures of one house. */
const MOST = 200;

/** Every picture of the house, by name. */
export function listPictures(em: EntityManager, actor: Actor): Promise<HousePicture[]> {
  return em.find(HousePicture, { houseId: actor.houseId }, { orderBy: { name: 'asc', id: 'asc' } });
}

/** @throws AppError `not-found` */
export async function getPicture(em: EntityManager, actor: Actor, id: string): Promise<HousePicture> {
  const picture = await em.findOne(HousePicture, { houseId: actor.houseId, id });
  if (!picture) throw new AppError('not-found');
  return picture;
}

/** The house's pictures of these ids; ids of nothing are left out. */
export function getPictures(em: EntityManager, actor: Actor, ids: readonly string[]): Promise<HousePicture[]> {
  return ids.length === 0 ? Promise.resolve([]) : em.find(HousePicture, { houseId: actor.houseId, id: { $in: [...ids] } });
}

export type NewPicture = Omit<HousePicture, 'id' | 'houseId' | 'addedAt' | 'addedById' | 'addedBy'>;

/** Notes a picture whose bytes already lie in the store. @throws AppError `invalid` when there are too many */
export async function addPicture(em: EntityManager, actor: Actor, picture: NewPicture, now: Date): Promise<HousePicture> {
  if ((await em.count(HousePicture, { houseId: actor.houseId })) >= MOST) throw new AppError('invalid', { issues: [{ pointer: '/file', message: `A house keeps at most ${MOST} pictures. Remove one first.` }] });
  const row = em.create(HousePicture, { ...picture, houseId: actor.houseId, addedAt: now, addedById: actor.personId, addedBy: actor.name });
  await em.flush();
  return row;
}

/** Takes a picture away; the caller removes its bytes afterwards. @throws AppError `in-use` while a label shows it, `not-found` */
export async function removePicture(em: EntityManager, actor: Actor, id: string): Promise<HousePicture> {
  const picture = await getPicture(em, actor, id);
  const uses: { name: string }[] = await em.execute(
    `select p.name from product p where p.house_id = ? and not p.archived
       and exists (select 1 from jsonb_array_elements(coalesce(p.draft #> '{label,byHand,added}', '[]'::jsonb)) one where one ->> 'picture' = ?) order by p.name limit 4`,
    [actor.houseId, id],
  );
  if (uses.length > 0) throw new AppError('in-use', { message: `Still on the label of ${uses.map((use) => use.name).join(', ')}. Take it off there first.` });
  em.remove(picture);
  await em.flush();
  return picture;
}

/** As it is answered. */
export function presentPicture({ id, name, kind, width, height, shapes, bytes, addedAt, addedBy }: HousePicture): Picture {
  return { id, name, kind, width, height, shapes, bytes, addedAt: addedAt.toISOString(), addedBy };
}

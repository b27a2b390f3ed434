import type { EntityManager } from '@mikro-orm/postgresql';
import { LockMode } from '@mikro-orm/core';
import type { z } from 'zod';
import type { updateHouse as updateHouseContract } from '#shared/contracts/house.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { House } from './house.entity.ts';
import { Membership } from './membership.entity.ts';
import { Person } from './person.entity.ts';
import { presentHouse } from './house.present.ts';

export type Member = Pick<Person, 'id' | 'name' | 'email'> & Pick<Membership, 'roles'>;

/** The actor's house. @throws AppError `not-found` */
export async function getHouse(em: EntityManager, actor: Actor): Promise<House> {
  const house = await em.findOne(House, { id: actor.houseId });
  if (!house) throw new AppError('not-found');
  return house;
}

/** Who works in the actor's house, by name. */
export async function listMembers(em: EntityManager, actor: Actor): Promise<Member[]> {
  const memberships = await em.find(Membership, { houseId: actor.houseId });
  const people = await em.find(Person, { id: { $in: memberships.map((one) => one.personId) } }, { orderBy: { name: 'asc', id: 'asc' } });
  const roles = new Map(memberships.map((one) => [one.personId, one.roles]));
  return people.map(({ id, name, email }) => ({ id, name, email, roles: roles.get(id) ?? [] }));
}

/** Saves what the house prints. @throws AppError `stale` when a newer version stands */
export async function updateHouse(em: EntityManager, actor: Actor, input: z.output<NonNullable<typeof updateHouseContract.body>>): Promise<House> {
  const house = await em.findOne(House, { id: actor.houseId }, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (!house) throw new AppError('not-found');
  if (house.version !== input.version) throw new AppError('stale', { current: presentHouse(house, await listMembers(em, actor)) });
  const { name, brand, version, ...particulars } = input;
  house.name = name;
  house.brand = brand;
  house.particulars = particulars;
  house.version = version + 1;
  await em.flush();
  return house;
}

import { getHouse as getHouseContract, updateHouse as updateHouseContract } from '#shared/contracts/house.contract.ts';
import { route, type Route } from '#server/http/route.ts';
import { presentHouse } from './house.present.ts';
import { getHouse, listMembers, updateHouse } from './house.service.ts';

export function houseRoutes(): Route[] {
  return [
    route(getHouseContract, { may: ['read', 'house'] }, ({ inHouse, actor }) =>
      inHouse(async (em) => presentHouse(await getHouse(em, actor), await listMembers(em, actor))),
    ),
    route(updateHouseContract, { may: ['edit', 'house'] }, ({ inHouse, actor, body }) =>
      inHouse(async (em) => presentHouse(await updateHouse(em, actor, body), await listMembers(em, actor))),
    ),
  ];
}

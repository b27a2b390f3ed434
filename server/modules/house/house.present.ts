import type { House as HouseShape } from '#shared/contracts/house.contract.ts';
import type { House } from './house.entity.ts';
import type { Member } from './house.service.ts';

/** A house as its contract shows it. */
export function presentHouse(house: House, members: readonly Member[]): HouseShape {
  return {
    id: house.id,
    version: house.version,
    name: house.name,
    brand: house.brand,
    ...house.particulars,
    members: members.map(({ id, name, email, roles }) => ({ personId: id, name, email, roles: [...roles] })),
  };
}

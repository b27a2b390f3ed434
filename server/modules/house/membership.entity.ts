import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { Role } from '#shared/contracts/session.contract.ts';

/** That a person works in a house, and in which roles. */
export const Membership = defineEntity({
  name: 'Membership',
  tableName: 'membership',
  properties: {
    houseId: p.uuid().primary(),
    personId: p.uuid().primary(),
    roles: p.array<Role>(),
  },
});
export type Membership = InferEntity<typeof Membership>;

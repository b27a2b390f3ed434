import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { House as HouseShape } from '#shared/contracts/house.contract.ts';

type Particulars = Pick<HouseShape, 'responsiblePerson' | 'usContact' | 'canadaContact' | 'countryOfOrigin' | 'temperatureUnit'>;

/** A small cosmetic house: the tenant that every other row belongs to. */
export const House = defineEntity({
  name: 'House',
  tableName: 'house',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    version: p.integer().default(1),
    name: p.text(),
    brand: p.text(),
    particulars: p.json<Particulars>(),
    createdAt: p.datetime().onCreate(() => new Date()),
  },
});
export type House = InferEntity<typeof House>;

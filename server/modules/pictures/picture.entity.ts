import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { PictureShape } from '#shared/contracts/pictures.contract.ts';

/** A logo or image of the house; a photo's bytes lie in the object store, a drawing is its shapes. */
export const HousePicture = defineEntity({
  name: 'HousePicture',
  tableName: 'house_picture',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    houseId: p.uuid(),
    name: p.text(),
    kind: p.text().$type<'photo' | 'drawing'>(),
    width: p.float(),
    height: p.float(),
    shapes: p.json<PictureShape[]>(),
    bytes: p.integer(),
    sha256: p.text(),
    previewKey: p.text(),
    platesKey: p.text(),
    addedAt: p.datetime(),
    addedById: p.uuid(),
    addedBy: p.text(),
  },
});
export type HousePicture = InferEntity<typeof HousePicture>;

import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { MaterialDocument as DocumentShape } from '#shared/contracts/materials.contract.ts';

/** A supplier's paper on a material; its bytes lie in the object store under our own key. */
export const MaterialDocument = defineEntity({
  name: 'MaterialDocument',
  tableName: 'material_document',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    houseId: p.uuid(),
    materialId: p.uuid(),
    kind: p.text().$type<DocumentShape['kind']>(),
    fileName: p.text(),
    mediaType: p.text(),
    bytes: p.integer(),
    sha256: p.text(),
    storageKey: p.text(),
    /** `YYYY-MM-DD`, as printed on the paper. */
    dated: p.text().nullable(),
    runsOut: p.text().nullable(),
    addedAt: p.datetime(),
    addedById: p.uuid(),
    addedBy: p.text(),
  },
});
export type MaterialDocument = InferEntity<typeof MaterialDocument>;

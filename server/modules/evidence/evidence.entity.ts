import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { ClaimEvidence as EvidenceShape } from '#shared/contracts/evidence.contract.ts';

/** A paper behind a claim; its bytes lie in the object store under our own key. */
export const ProductEvidence = defineEntity({
  name: 'ProductEvidence',
  tableName: 'product_evidence',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    houseId: p.uuid(),
    productId: p.uuid(),
    claim: p.text(),
    kind: p.text().$type<EvidenceShape['kind']>(),
    fileName: p.text(),
    mediaType: p.text(),
    bytes: p.integer(),
    sha256: p.text(),
    storageKey: p.text(),
    dated: p.text().nullable(),
    addedAt: p.datetime(),
    addedById: p.uuid(),
    addedBy: p.text(),
  },
});
export type ProductEvidence = InferEntity<typeof ProductEvidence>;

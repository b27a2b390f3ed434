import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { CompositionLine, ConstituentLine, MaterialFields } from '#shared/contracts/materials.contract.ts';

/** A bought material as its house describes it. */
export const Material = defineEntity({
  name: 'Material',
  tableName: 'material',
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    houseId: p.uuid(),
    version: p.integer().default(1),
    tradeName: p.text(),
    supplier: p.text(),
    declareAs: p.text().$type<MaterialFields['declareAs']>(),
    composition: p.json<CompositionLine[]>(),
    constituents: p.json<ConstituentLine[]>(),
    /** Money per kilogram, exact, in `currency`. */
    pricePerKg: p.decimal('string').columnType('numeric').nullable(),
    currency: p.text(),
    notes: p.text(),
    handling: p.json<MaterialFields['handling']>(),
    /** What its certificates say: figures as text, or yes and no. */
    facts: p.json<Record<string, string | boolean>>(),
    /** Lower-case trade name, supplier and INCI names, for the list's search. */
    searchText: p.text(),
    archived: p.boolean().default(false),
    savedAt: p.datetime(),
    savedById: p.uuid(),
    /** The name as it was when saved: the record keeps it even if the person is renamed. */
    savedBy: p.text(),
  },
});
export type Material = InferEntity<typeof Material>;

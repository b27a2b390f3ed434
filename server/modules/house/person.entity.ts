import { randomUUID } from 'node:crypto';
import { defineEntity, p, type InferEntity } from '@mikro-orm/core';

/** Someone who signs in, known by issuer and subject, never by e-mail. */
export const Person = defineEntity({
  name: 'Person',
  tableName: 'person',
  uniques: [{ name: 'person_issuer_subject', properties: ['issuer', 'subject'] }],
  properties: {
    id: p.uuid().primary().onCreate(() => randomUUID()),
    issuer: p.text(),
    subject: p.text(),
    name: p.text(),
    email: p.text(),
    createdAt: p.datetime().onCreate(() => new Date()),
  },
});
export type Person = InferEntity<typeof Person>;

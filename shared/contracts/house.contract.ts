import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';
import { idField, nameField, versionField } from './fields.ts';
import { role } from './session.contract.ts';

const party = z.strictObject({ name: z.string().max(255), address: z.string().max(500) });

/** What a house prints on its labels unless a product says otherwise. */
export const houseFields = z.strictObject({
  name: nameField,
  brand: nameField,
  responsiblePerson: z.strictObject({ EU: party.optional(), UK: party.optional(), US: party.optional(), CA: party.optional() }),
  usContact: z.string().max(255),
  canadaContact: z.string().max(255),
  countryOfOrigin: z.string().max(120),
  temperatureUnit: z.enum(['C', 'F']),
});
export const house = houseFields.extend({
  id: idField,
  version: versionField,
  members: z.array(z.object({ personId: idField, name: z.string(), email: z.string(), roles: z.array(role) })),
});
export type House = z.infer<typeof house>;

export const getHouse = endpoint({ method: 'GET', path: '/house', response: house });
export const updateHouse = endpoint({ method: 'PUT', path: '/house', body: houseFields.extend({ version: versionField }), response: house });

import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';
import { idField } from './fields.ts';

export const role = z.enum(['owner', 'formulator', 'assessor', 'artworker', 'seller']);
export type Role = z.infer<typeof role>;

export const session = z.object({
  person: z.object({ id: idField, name: z.string(), email: z.string() }),
  house: z.object({ id: idField, name: z.string(), roles: z.array(role) }),
  houses: z.array(z.object({ id: idField, name: z.string() })),
  /** Sent back in the `X-Colophon-Token` header of every change. */
  csrfToken: z.string(),
  dataRelease: z.string(),
});
export type Session = z.infer<typeof session>;

/** 401 `not-signed-in` when there is none. */
export const getSession = endpoint({ method: 'GET', path: '/session', response: session });
export const endSession = endpoint({ method: 'DELETE', path: '/session', response: z.object({ signedOut: z.literal(true), next: z.string() }) });
export const switchHouse = endpoint({ method: 'PUT', path: '/session/house', body: z.strictObject({ houseId: idField }), response: session });

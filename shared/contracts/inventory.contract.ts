import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';

const remark = z.object({ line: z.int(), reason: z.string() });

/** How taking over the official inventory stands in this house. Counts are of names. */
export const inventoryState = z.object({
  /** Names that the house now has from the inventory. */
  names: z.int(),
  last: z
    .object({
      fileName: z.string(),
      startedAt: z.string(),
      startedBy: z.string(),
      isRunning: z.boolean(),
      total: z.int(),
      done: z.int(),
      added: z.int(),
      updated: z.int(),
      unchanged: z.int(),
      /** Names that a curated entry bears already; that entry stands. */
      joined: z.int(),
      skipped: z.array(remark),
      remarks: z.array(remark),
    })
    .nullable(),
});
export type InventoryState = z.infer<typeof inventoryState>;

/** Asking also takes up work that was broken off. */
export const getInventory = endpoint({ method: 'GET', path: '/dictionary/inventory', response: inventoryState });
/** An export of the official inventory, as text. Refused while another is being taken over. */
export const importInventory = endpoint({ method: 'POST', path: '/dictionary/inventory', accepts: 'multipart', body: z.strictObject({}), response: inventoryState });
/** Takes every name from the inventory out of the house again; curated entries stay. */
export const removeInventory = endpoint({ method: 'DELETE', path: '/dictionary/inventory', response: inventoryState });

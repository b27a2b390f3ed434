import { z } from './zod.ts';
import { endpoint } from './endpoint.ts';

/** The law tables of the release in force here, for the engine in the browser. Kept by the browser until the release changes. */
export const getLaw = endpoint({
  method: 'GET',
  path: '/law',
  response: z.object({ release: z.string(), tables: z.unknown() }),
});

export const category = z.object({
  slug: z.string(),
  title: z.string(),
  exposure: z.enum(['leave-on', 'rinse-off']),
  decorative: z.boolean(),
});

/** The product categories to choose from, in the order of the table. */
export const listCategories = endpoint({
  method: 'GET',
  path: '/categories',
  response: z.object({ release: z.string(), items: z.array(category) }),
});

import { createHash } from 'node:crypto';
import type { Response } from 'express';
import { getLaw, listCategories } from '#shared/contracts/law.contract.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { LawTables } from '#shared/law/tables.types.ts';
import { route, type Route } from '#server/http/route.ts';

/** The law tables and the short list of categories: the same for every house, so a browser may keep them. */
export function lawRoutes({ book, tables }: { readonly book: LawBook; readonly tables: LawTables }): Route[] {
  const release = book.release;
  const hash = createHash('sha256').update(JSON.stringify(tables)).digest('base64url').slice(0, 22);
  const items = [...book.categories.values()].map(({ slug, title, exposure, decorative }) => ({ slug, title, exposure, decorative }));
  return [
    route(getLaw, { may: ['read', 'law'] }, ({ res }) => {
      keepable(res, `"law-${release}-${hash}"`);
      return Promise.resolve({ release, tables });
    }),
    route(listCategories, { may: ['read', 'law'] }, ({ res }) => {
      keepable(res, `"categories-${release}-${hash}"`);
      return Promise.resolve({ release, items });
    }),
  ];
}

/** Kept by the browser alone and asked for again by its tag: a new release shows at once. */
function keepable(res: Response, tag: string): void {
  res.set({ 'Cache-Control': 'private, no-cache', ETag: tag });
}

import { getRevision, listRevisions } from '#shared/contracts/revisions.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import { route, type Route } from '#server/http/route.ts';
import { ProductRevision } from './product-revision.entity.ts';
import { getProduct } from './products.service.ts';

/** States listed at most; older ones are still there to be asked for by number. */
const LISTED = 500;

/** What a product was at every saving: read, never written here. */
export function revisionRoutes(): Route[] {
  return [
    route(listRevisions, { may: ['read', 'products'] }, ({ inHouse, actor, params }) =>
      inHouse(async (em) => {
        const { id } = await getProduct(em, actor, params.id);
        const rows = await em.find(ProductRevision, { houseId: actor.houseId, productId: id }, { orderBy: { version: 'desc' }, limit: LISTED, fields: ['productId', 'version', 'savedAt', 'savedBy'] });
        return { items: rows.map(({ version, savedAt, savedBy }) => ({ version, savedAt: savedAt.toISOString(), savedBy })) };
      }),
    ),
    route(getRevision, { may: ['read', 'products'] }, ({ inHouse, actor, params }) =>
      inHouse(async (em) => {
        const row = await em.findOne(ProductRevision, { houseId: actor.houseId, productId: params.id, version: params.version });
        if (!row) throw new AppError('not-found');
        return { version: row.version, savedAt: row.savedAt.toISOString(), savedBy: row.savedBy, draft: row.draft };
      }),
    ),
  ];
}

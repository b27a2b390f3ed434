import {
  getFormulaDocument,
  getLabelPdf,
  getProductFront,
  getReportPdf,
  getResultDocument,
  getWeighOutPdf,
  importFormulaDocument as importContract,
} from '#shared/contracts/products.contract.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { toDocument, writeDocument } from '#shared/product/to-document.ts';
import { attachment } from '#server/http/file-answer.ts';
import { DOCUMENT_LIMIT, route, type Route } from '#server/http/route.ts';
import { getDossier, judge, type AsOf, type Knowledge } from './dossier.ts';
import { importFormulaDocument } from './import-document.ts';
import { createFronts } from './fronts.ts';
import { presentProduct } from './products.present.ts';
import type { SaveContext } from './products.service.ts';
import { photosFrom } from '#server/modules/pictures/photos-from.ts';
import type { ObjectStore } from '#server/storage/object-store.ts';
import { makeLabelPdf, makeReportPdf, makeWeighOutPdf } from './sheets.ts';

interface Deps {
  readonly storage: Pick<ObjectStore, 'getObject'>;
  readonly knows: () => Knowledge;
  readonly context: () => SaveContext;
}

/** Documents in and out of a product, and what is printed from it. The database is let go before anything is painted. */
export function documentRoutes({ storage, knows, context }: Deps): Route[] {
  const drawFront = createFronts();
  return [
    route(importContract, { may: ['edit', 'products'], bodyLimit: DOCUMENT_LIMIT }, ({ inHouse, actor, body }) =>
      inHouse(async (em) => presentProduct(await importFormulaDocument(em, actor, body.document, context()))),
    ),
    route(getFormulaDocument, { may: ['read', 'downloads'] }, async ({ inHouse, actor, params, res }) => {
      const { house, product, materials } = await inHouse((em) => getDossier(em, actor, params.id));
      res.set('Content-Disposition', attachment(`${product.draft.name}.json`));
      return writeDocument(toDocument(product.draft, materials, house));
    }),
    route(getResultDocument, { may: ['read', 'downloads'] }, async ({ inHouse, actor, params, query }) => {
      const dossier = await inHouse((em) => getDossier(em, actor, params.id));
      return judge(dossier, knows(), { ...asOf(query), ...(query.market ? { markets: [query.market] } : {}) }).result;
    }),
    route(getLabelPdf, { may: ['read', 'downloads'] }, async ({ inHouse, actor, params, query }) =>
      makeLabelPdf(await inHouse((em) => getDossier(em, actor, params.id)), knows(), { ...asOf(query), ...(query.market ? { market: query.market } : {}) }, photosFrom(storage)),
    ),
    route(getProductFront, { may: ['read', 'products'] }, async ({ inHouse, actor, params }) => drawFront(await inHouse((em) => getDossier(em, actor, params.id)), knows())),
    route(getReportPdf, { may: ['read', 'downloads'] }, async ({ inHouse, actor, params, query }) =>
      makeReportPdf(await inHouse((em) => getDossier(em, actor, params.id)), knows(), { ...asOf(query), ...(query.shares ? { shares: query.shares } : {}) }),
    ),
    route(getWeighOutPdf, { may: ['read', 'downloads'] }, async ({ inHouse, actor, params, query }) =>
      makeWeighOutPdf(await inHouse((em) => getDossier(em, actor, params.id)), knows(), query.batch === undefined ? {} : { batch: query.batch }),
    ),
  ];
}

function asOf({ placed, available }: { readonly placed?: string | undefined; readonly available?: string | undefined }): AsOf {
  return {
    ...(placed === undefined ? {} : { placedOnMarket: plainDate(placed) }),
    ...(available === undefined ? {} : { availableOn: plainDate(available) }),
  };
}

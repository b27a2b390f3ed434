import {
  archiveProduct as archiveProductContract,
  copyProduct as copyProductContract,
  createProduct as createProductContract,
  getProduct as getProductContract,
  listProducts as listProductsContract,
  updateProduct as updateProductContract,
} from '#shared/contracts/products.contract.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import { route, type Route } from '#server/http/route.ts';
import { getHouse } from '#server/modules/house/house.service.ts';
import type { ObjectStore } from '#server/storage/object-store.ts';
import { dayOf, getDossier, materialsOf, type Knowledge } from './dossier.ts';
import { documentRoutes } from './product-documents.routes.ts';
import { presentProduct } from './products.present.ts';
import { archiveProduct, copyProduct, createProduct, listProducts, updateProduct, type SaveContext } from './products.service.ts';
import { revisionRoutes } from './revisions.routes.ts';
import { createSummaries } from './summaries.ts';
import { presentWorkspace } from './workspace.ts';

interface Deps {
  readonly law: { readonly book: LawBook };
  readonly dictionary: Dictionary;
  readonly storage: Pick<ObjectStore, 'getObject'>;
  readonly now: () => Date;
}

export function productsRoutes({ law, dictionary, storage, now }: Deps): Route[] {
  const summarize = createSummaries();
  const knows = (): Knowledge => ({ law: law.book, dictionary, today: dayOf(now()) });
  const context = (): SaveContext => ({ now: now(), categories: law.book.categories });
  return [
    route(listProductsContract, { may: ['read', 'products'] }, async ({ inHouse, actor, query }) => {
      const { items, house, materials, ...paging } = await inHouse(async (em) => {
        const page = await listProducts(em, actor, query);
        return { ...page, house: await getHouse(em, actor), materials: await materialsOf(em, actor, page.items) };
      });
      // Judging takes the processor, not the database: its connection is free by now.
      const byId = new Map(materials.map((material) => [material.id, material]));
      return { items: items.map((product) => summarize(product, house, byId, knows())), ...paging };
    }),
    route(getProductContract, { may: ['read', 'products'] }, async ({ inHouse, actor, params }) =>
      presentWorkspace(await inHouse((em) => getDossier(em, actor, params.id)), dictionary),
    ),
    route(createProductContract, { may: ['edit', 'products'] }, ({ inHouse, actor, body }) =>
      inHouse(async (em) => presentProduct(await createProduct(em, actor, body, context()))),
    ),
    // The right to edit a label opens this route; the service holds such a person to the label part.
    route(updateProductContract, { may: ['edit', 'labels'] }, ({ inHouse, actor, params, body }) =>
      inHouse(async (em) => presentProduct(await updateProduct(em, actor, { ...params, ...body }, context()))),
    ),
    route(copyProductContract, { may: ['edit', 'products'] }, ({ inHouse, actor, params, body }) =>
      inHouse(async (em) => presentProduct(await copyProduct(em, actor, { ...params, ...body }, context()))),
    ),
    route(archiveProductContract, { may: ['edit', 'products'] }, ({ inHouse, actor, params, body }) =>
      inHouse(async (em) => presentProduct(await archiveProduct(em, actor, { ...params, ...body }, context()))),
    ),
    ...revisionRoutes(),
    ...documentRoutes({ storage, knows, context }),
  ];
}

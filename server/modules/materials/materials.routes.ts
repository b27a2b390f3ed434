import {
  addMaterialDocument,
  archiveMaterial as archiveMaterialContract,
  createMaterial as createMaterialContract,
  getMaterial as getMaterialContract,
  getMaterialDocument,
  listMaterials as listMaterialsContract,
  removeMaterialDocument,
  updateMaterial as updateMaterialContract,
} from '#shared/contracts/materials.contract.ts';
import { route, type Call, type Route } from '#server/http/route.ts';
import { dropPaper, fetchPaper, newPaperKey, storePaper, type PaperStore } from '#server/storage/papers.ts';
import { addDocument, getDocument, removeDocument } from './material-documents.service.ts';
import { presentMaterial, presentMaterialSummary } from './materials.present.ts';
import { archiveMaterial, createMaterial, getMaterial, listMaterials, updateMaterial } from './materials.service.ts';
import { readPaper } from '#server/storage/read-paper.ts';

interface Deps {
  readonly storage: PaperStore;
  readonly now: () => Date;
}

export function materialsRoutes(deps: Deps): Route[] {
  const { now } = deps;
  return [
    route(listMaterialsContract, { may: ['read', 'materials'] }, ({ inHouse, actor, query }) =>
      inHouse(async (em) => {
        const { items, ...paging } = await listMaterials(em, actor, query);
        return { items: items.map(presentMaterialSummary), ...paging };
      }),
    ),
    route(getMaterialContract, { may: ['read', 'materials'] }, ({ inHouse, actor, params }) =>
      inHouse(async (em) => presentMaterial(await getMaterial(em, actor, params.id))),
    ),
    route(createMaterialContract, { may: ['edit', 'materials'] }, ({ inHouse, actor, body }) =>
      inHouse(async (em) => presentMaterial(await createMaterial(em, actor, body, now()))),
    ),
    route(updateMaterialContract, { may: ['edit', 'materials'] }, ({ inHouse, actor, params, body }) => {
      const { version, ...fields } = body;
      return inHouse(async (em) => presentMaterial(await updateMaterial(em, actor, { id: params.id, version, fields, now: now() })));
    }),
    route(archiveMaterialContract, { may: ['edit', 'materials'] }, ({ inHouse, actor, params, body }) =>
      inHouse(async (em) => presentMaterial(await archiveMaterial(em, actor, { ...params, ...body, now: now() }))),
    ),
    ...documentRoutes(deps),
  ];
}

function documentRoutes(deps: Deps): Route[] {
  const { storage } = deps;
  return [
    route(addMaterialDocument, { may: ['edit', 'materials'] }, (call) => takePaper(deps, call)),
    route(getMaterialDocument, { may: ['read', 'materials'] }, async ({ inHouse, actor, params }) => {
      const document = await inHouse((em) => getDocument(em, actor, params));
      return fetchPaper(storage, document, 'This document is missing in the storage for files. Add it again.');
    }),
    route(removeMaterialDocument, { may: ['edit', 'materials'] }, async ({ inHouse, actor, params }) => {
      const { view, storageKey } = await inHouse((em) => removeDocument(em, actor, params));
      await dropPaper(storage, storageKey);
      return presentMaterial(view);
    }),
  ];
}

type Upload = Call<{ readonly id: string }, unknown, { readonly kind: 'safety-data-sheet' | 'composition-sheet' | 'allergen-sheet' | 'certificate-of-analysis' | 'other'; readonly dated?: string; readonly runsOut?: string }>;

async function takePaper({ storage, now }: Deps, { inHouse, actor, params, body, upload }: Upload) {
  await inHouse((em) => getMaterial(em, actor, params.id));
  const paper = await readPaper(upload.bytes, upload.fileName);
  const storageKey = newPaperKey(actor, 'materials');
  return storePaper(storage, paper, storageKey, () => inHouse(async (em) => presentMaterial(await addDocument(em, actor, { materialId: params.id, paper, storageKey, now: now(), ...body }))));
}

import {
  addEvidence as addContract,
  getEvidence as getContract,
  listEvidence as listContract,
  removeEvidence as removeContract,
  type ClaimEvidence,
} from '#shared/contracts/evidence.contract.ts';
import { route, type Call, type Route } from '#server/http/route.ts';
import { readPaper } from '#server/storage/read-paper.ts';
import { getProduct } from '#server/modules/products/products.service.ts';
import { dropPaper, fetchPaper, newPaperKey, storePaper, type PaperStore } from '#server/storage/papers.ts';
import { addEvidence, getEvidence, listEvidence, presentEvidence, removeEvidence } from './evidence.service.ts';

interface Deps {
  readonly storage: PaperStore;
  readonly now: () => Date;
}

/** Papers behind a product's claims. */
export function evidenceRoutes(deps: Deps): Route[] {
  const { storage } = deps;
  return [
    route(listContract, { may: ['read', 'products'] }, ({ inHouse, actor, params }) => inHouse(async (em) => presentEvidence(await listEvidence(em, actor, params.id)))),
    route(addContract, { may: ['edit', 'products'] }, (call) => takePaper(deps, call)),
    route(getContract, { may: ['read', 'products'] }, async ({ inHouse, actor, params }) => {
      const evidence = await inHouse((em) => getEvidence(em, actor, params));
      return fetchPaper(storage, evidence, 'This paper is missing in the storage for files. Add it again.');
    }),
    route(removeContract, { may: ['edit', 'products'] }, async ({ inHouse, actor, params }) => {
      const { left, storageKey } = await inHouse((em) => removeEvidence(em, actor, params));
      await dropPaper(storage, storageKey);
      return presentEvidence(left);
    }),
  ];
}

type Upload = Call<{ readonly id: string }, unknown, { readonly kind: ClaimEvidence['kind']; readonly claim?: string | undefined; readonly dated?: string | undefined }>;

async function takePaper({ storage, now }: Deps, { inHouse, actor, params, body, upload }: Upload) {
  await inHouse((em) => getProduct(em, actor, params.id));
  const paper = await readPaper(upload.bytes, upload.fileName);
  const storageKey = newPaperKey(actor, 'evidence');
  return storePaper(storage, paper, storageKey, () => inHouse(async (em) => presentEvidence(await addEvidence(em, actor, { productId: params.id, paper, storageKey, now: now(), ...body }))));
}

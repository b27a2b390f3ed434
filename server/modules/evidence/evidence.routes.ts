import {
  addEvidence as addContract,
  getEvidence as getContract,
  listEvidence as listContract,
  removeEvidence as removeContract,
  type ClaimEvidence,
} from '#shared/contracts/evidence.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import { FileAnswer } from '#server/http/file-answer.ts';
import { route, type Call, type Route } from '#server/http/route.ts';
import { readPaper } from '#server/modules/materials/read-paper.ts';
import { getProduct } from '#server/modules/products/products.service.ts';
import type { ObjectStore } from '#server/storage/object-store.ts';
import { addEvidence, getEvidence, listEvidence, newEvidenceKey, presentEvidence, removeEvidence } from './evidence.service.ts';

interface Deps {
  readonly storage: Pick<ObjectStore, 'putObject' | 'getObject' | 'deleteObject'>;
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
      const stored = await storage.getObject(evidence.storageKey);
      if (!stored) throw new AppError('unavailable', { message: 'This paper is missing in the storage for files. Add it again.' });
      return new FileAnswer({ bytes: stored.bytes, mediaType: evidence.mediaType, fileName: evidence.fileName });
    }),
    route(removeContract, { may: ['edit', 'products'] }, async ({ inHouse, actor, params }) => {
      const { left, storageKey } = await inHouse((em) => removeEvidence(em, actor, params));
      // The row is gone for good; bytes that stay behind because the store is away are reachable by nobody.
      await storage.deleteObject(storageKey).catch(() => undefined);
      return presentEvidence(left);
    }),
  ];
}

type Upload = Call<{ readonly id: string }, unknown, { readonly kind: ClaimEvidence['kind']; readonly claim?: string | undefined; readonly dated?: string | undefined }>;

/** Bytes first, then the row: a paper that is listed can always be fetched. */
async function takePaper({ storage, now }: Deps, { inHouse, actor, params, body, upload }: Upload) {
  await inHouse((em) => getProduct(em, actor, params.id));
  const paper = await readPaper(upload.bytes, upload.fileName);
  const storageKey = newEvidenceKey(actor);
  await storage.putObject(storageKey, paper.bytes, paper.mediaType);
  try {
    return await inHouse(async (em) => presentEvidence(await addEvidence(em, actor, { productId: params.id, paper, storageKey, now: now(), ...body })));
  } catch (error) {
    await storage.deleteObject(storageKey).catch(() => undefined);
    throw error;
  }
}

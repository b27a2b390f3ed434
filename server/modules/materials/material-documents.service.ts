import type { EntityManager } from '@mikro-orm/postgresql';
import type { MaterialDocument as DocumentShape } from '#shared/contracts/materials.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { noteOf } from '#server/storage/papers.ts';
import { MaterialDocument } from './material-document.entity.ts';
import { getMaterial, type MaterialView } from './materials.service.ts';
import type { Paper } from '#server/storage/read-paper.ts';

/** Papers of one material; a shelf, not an archive. */
const DOCUMENTS_LIMIT = 100;

/** Notes a paper whose bytes already lie in the store. @throws AppError `not-found`, `invalid` when the shelf is full */
export async function addDocument(
  em: EntityManager,
  actor: Actor,
  input: { readonly materialId: string; readonly paper: Paper; readonly storageKey: string; readonly now: Date } & Pick<DocumentShape, 'kind'> & {
      readonly dated?: string;
      readonly runsOut?: string;
    },
): Promise<MaterialView> {
  const view = await getMaterial(em, actor, input.materialId);
  if (view.documents.length >= DOCUMENTS_LIMIT) {
    throw new AppError('invalid', { issues: [{ pointer: '/file', message: `A material keeps at most ${DOCUMENTS_LIMIT} documents. Remove one first.` }] });
  }
  em.create(MaterialDocument, {
    houseId: actor.houseId,
    materialId: view.material.id,
    kind: input.kind,
    runsOut: input.runsOut ?? null,
    ...noteOf(input.paper, { ...input, actor }),
  });
  await em.flush();
  return getMaterial(em, actor, input.materialId);
}

/** One paper of one material of the house. @throws AppError `not-found` */
export async function getDocument(em: EntityManager, actor: Actor, ids: { readonly id: string; readonly documentId: string }): Promise<MaterialDocument> {
  const document = await em.findOne(MaterialDocument, { houseId: actor.houseId, materialId: ids.id, id: ids.documentId });
  if (!document) throw new AppError('not-found');
  return document;
}

/** Takes a paper off the shelf; the caller removes its bytes once this is committed. @throws AppError `not-found` */
export async function removeDocument(
  em: EntityManager,
  actor: Actor,
  ids: { readonly id: string; readonly documentId: string },
): Promise<{ readonly view: MaterialView; readonly storageKey: string }> {
  const document = await getDocument(em, actor, ids);
  em.remove(document);
  await em.flush();
  return { view: await getMaterial(em, actor, ids.id), storageKey: document.storageKey };
}

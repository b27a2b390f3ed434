import { randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { MaterialDocument as DocumentShape } from '#shared/contracts/materials.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { MaterialDocument } from './material-document.entity.ts';
import { getMaterial, type MaterialView } from './materials.service.ts';
import type { Paper } from './read-paper.ts';

/** Papers of one material; a shelf, not an archive. */
const DOCUMENTS_LIMIT = 100;

/** Our own key: nothing of the user's naming reaches the store. */
export function newStorageKey(actor: Actor): string {
  return `houses/${actor.houseId}/materials/${randomUUID()}`;
}

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
    fileName: input.paper.fileName,
    mediaType: input.paper.mediaType,
    bytes: input.paper.bytes.length,
    sha256: input.paper.sha256,
    storageKey: input.storageKey,
    dated: input.dated ?? null,
    runsOut: input.runsOut ?? null,
    addedAt: input.now,
    addedById: actor.personId,
    addedBy: actor.name,
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

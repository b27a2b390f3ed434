import type { EntityManager } from '@mikro-orm/postgresql';
import type { ClaimEvidence as EvidenceShape } from '#shared/contracts/evidence.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import type { Paper } from '#server/storage/read-paper.ts';
import { getProduct } from '#server/modules/products/products.service.ts';
import { noteOf } from '#server/storage/papers.ts';
import { ProductEvidence } from './evidence.entity.ts';

/** Papers of one product's claims. */
const EVIDENCE_LIMIT = 100;

/** The papers of a product, oldest first. @throws AppError `not-found` */
export async function listEvidence(em: EntityManager, actor: Actor, productId: string): Promise<ProductEvidence[]> {
  const product = await getProduct(em, actor, productId);
  return em.find(ProductEvidence, { houseId: actor.houseId, productId: product.id }, { orderBy: { addedAt: 'asc', id: 'asc' } });
}

interface NewEvidence extends Pick<EvidenceShape, 'kind'> {
  readonly productId: string;
  readonly paper: Paper;
  readonly storageKey: string;
  readonly now: Date;
  readonly claim?: string | undefined;
  readonly dated?: string | undefined;
}

/** Notes a paper whose bytes already lie in the store. @throws AppError `not-found`, `invalid` when there are too many */
export async function addEvidence(em: EntityManager, actor: Actor, input: NewEvidence): Promise<ProductEvidence[]> {
  const before = await listEvidence(em, actor, input.productId);
  if (before.length >= EVIDENCE_LIMIT) {
    throw new AppError('invalid', { issues: [{ pointer: '/file', message: `A product keeps at most ${EVIDENCE_LIMIT} papers for its claims. Remove one first.` }] });
  }
  em.create(ProductEvidence, {
    houseId: actor.houseId,
    productId: input.productId,
    claim: input.claim ?? '',
    kind: input.kind,
    ...noteOf(input.paper, { ...input, actor }),
  });
  await em.flush();
  return listEvidence(em, actor, input.productId);
}

interface PaperIds {
  readonly id: string;
  readonly documentId: string;
}

/** One paper of one product of the house. @throws AppError `not-found` */
export async function getEvidence(em: EntityManager, actor: Actor, ids: PaperIds): Promise<ProductEvidence> {
  const evidence = await em.findOne(ProductEvidence, { houseId: actor.houseId, productId: ids.id, id: ids.documentId });
  if (!evidence) throw new AppError('not-found');
  return evidence;
}

/** Takes a paper away; the caller removes its bytes once this is committed. @throws AppError `not-found` */
export async function removeEvidence(em: EntityManager, actor: Actor, ids: PaperIds): Promise<{ readonly left: ProductEvidence[]; readonly storageKey: string }> {
  const evidence = await getEvidence(em, actor, ids);
  em.remove(evidence);
  await em.flush();
  return { left: await listEvidence(em, actor, ids.id), storageKey: evidence.storageKey };
}

/** As it is answered: without the key. */
export function presentEvidence(rows: readonly ProductEvidence[]): { items: EvidenceShape[] } {
  return {
    items: rows.map(({ id, claim, kind, fileName, mediaType, bytes, sha256, dated, addedAt, addedBy }) => ({
      id, claim, kind, fileName, mediaType, bytes, sha256, dated: dated ?? null, addedAt: addedAt.toISOString(), addedBy,
    })),
  };
}

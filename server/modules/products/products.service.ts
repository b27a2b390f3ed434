import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { findDraftFaults } from '#shared/contracts/draft-faults.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Market } from '#shared/law/types.ts';
import { can } from '#shared/policies/can.ts';
import { AppError, type Issue } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { PAGE_SIZE, searchWords, toSearchText } from '#server/db/search-text.ts';
import { getHouse } from '#server/modules/house/house.service.ts';
import { presentHouse } from '#server/modules/house/house.present.ts';
import { getMaterials } from '#server/modules/materials/materials.service.ts';
import { keepRevision, keepUses, usedMaterialIds } from './keep-save.ts';
import { newDraft } from './new-draft.ts';
import { Product } from './product.entity.ts';
import { presentProduct } from './products.present.ts';

/** What saving needs to know from outside the database. */
export interface SaveContext {
  readonly now: Date;
  readonly categories: ReadonlyMap<string, unknown>;
}

interface Find {
  readonly find?: string;
  readonly market?: Market;
  readonly archived?: 'yes' | 'no';
  readonly page?: number;
}

/** One page of the house's products, last saved first. */
export async function listProducts(em: EntityManager, actor: Actor, query: Find) {
  const page = query.page ?? 1;
  const find = em.createQueryBuilder(Product, 'p').where({ houseId: actor.houseId, archived: query.archived === 'yes' });
  if (query.market) find.andWhere('? = any(p.markets)', [query.market]);
  for (const word of searchWords(query.find)) find.andWhere('strpos(p.search_text, ?) > 0', [word]);
  const [items, total] = await find
    .orderBy({ savedAt: 'desc', id: 'asc' })
    .limit(PAGE_SIZE, (page - 1) * PAGE_SIZE)
    .getResultAndCount();
  return { items, total, page, pageSize: PAGE_SIZE };
}

/** One product of the house. @throws AppError `not-found` */
export async function getProduct(em: EntityManager, actor: Actor, id: string): Promise<Product> {
  const product = await em.findOne(Product, { houseId: actor.houseId, id });
  if (!product) throw new AppError('not-found');
  return product;
}

/** Begins a product with what the house prints on all its labels. @throws AppError `invalid` for an unknown category */
export async function createProduct(
  em: EntityManager,
  actor: Actor,
  asked: { readonly name: string; readonly category: string; readonly markets: readonly Market[] },
  context: SaveContext,
): Promise<Product> {
  const house = presentHouse(await getHouse(em, actor), []);
  return addProduct(em, actor, newDraft(asked, house), context);
}

/** Adds a product with a whole draft. @throws AppError `invalid` with every fault, by pointer into the draft */
export async function addProduct(em: EntityManager, actor: Actor, draft: ProductDraft, context: SaveContext, at = ''): Promise<Product> {
  await requireSound(em, actor, draft, context, at);
  const product = em.create(Product, {
    houseId: actor.houseId,
    ...toProductColumns(draft),
    version: 1,
    savedAt: context.now,
    savedById: actor.personId,
    savedBy: actor.name,
  });
  await em.flush();
  await keepSave(em, product);
  return product;
}

/**
 * Saves a draft over the version it was made from. Someone who may edit only the label part
 * may change nothing else. @throws AppError `stale` with what stands now, `not-allowed`, `invalid`, `not-found`
 */
export async function updateProduct(
  em: EntityManager,
  actor: Actor,
  input: { readonly id: string; readonly version: number; readonly draft: ProductDraft },
  context: SaveContext,
): Promise<Product> {
  const product = await lockProduct(em, actor, input);
  if (!can(actor, 'edit', 'products')) requireLabelPartOnly(product.draft, input.draft);
  await requireSound(em, actor, input.draft, context, '/draft');
  Object.assign(product, toProductColumns(input.draft));
  return save(em, actor, product, context.now);
}

/** A new product with the same draft under another name. @throws AppError `not-found` */
export async function copyProduct(em: EntityManager, actor: Actor, input: { readonly id: string; readonly name: string }, context: SaveContext): Promise<Product> {
  const { draft } = await getProduct(em, actor, input.id);
  // A batch code and a barcode belong to one product alone.
  const copy: ProductDraft = {
    ...draft,
    name: input.name,
    particulars: { ...draft.particulars, batchCode: '' },
    label: { ...draft.label, barcode: null },
  };
  return addProduct(em, actor, copy, context);
}

/** Puts a product away or back. @throws AppError `stale`, `not-found` */
export async function archiveProduct(
  em: EntityManager,
  actor: Actor,
  input: { readonly id: string; readonly version: number; readonly archived: boolean },
  context: SaveContext,
): Promise<Product> {
  const product = await lockProduct(em, actor, input);
  product.archived = input.archived;
  return save(em, actor, product, context.now);
}

async function save(em: EntityManager, actor: Actor, product: Product, now: Date): Promise<Product> {
  product.version += 1;
  product.savedAt = now;
  product.savedById = actor.personId;
  product.savedBy = actor.name;
  await em.flush();
  await keepSave(em, product);
  return product;
}

async function keepSave(em: EntityManager, product: Product): Promise<void> {
  await keepUses(em, product);
  await keepRevision(em, product);
}

/** The row, held until the transaction ends, so that of two saves of one version one wins. */
async function lockProduct(em: EntityManager, actor: Actor, asked: { readonly id: string; readonly version: number }): Promise<Product> {
  const product = await em.findOne(Product, { houseId: actor.houseId, id: asked.id }, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (!product) throw new AppError('not-found');
  if (product.version !== asked.version) throw new AppError('stale', { current: presentProduct(product) });
  return product;
}

function requireLabelPartOnly(before: ProductDraft, after: ProductDraft): void {
  const { label: _before, ...rest } = before;
  const { label: _after, ...asked } = after;
  if (canonical(rest) !== canonical(asked)) {
    throw new AppError('not-allowed', { message: 'Your role changes the label only. Ask a formulator or the owner to change the rest.' });
  }
}

/** JSON text with sorted keys: the database does not keep their order. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'object' && part !== null && !Array.isArray(part) ? Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1))) : part,
  );
}

async function requireSound(em: EntityManager, actor: Actor, draft: ProductDraft, { categories }: SaveContext, at: string): Promise<void> {
  const issues: Issue[] = findDraftFaults(draft).map(({ pointer, message }) => ({ pointer: at + pointer, message }));
  if (!categories.has(draft.category)) issues.push({ pointer: `${at}/category`, message: 'Choose a category of the list.' });
  const known = new Set((await getMaterials(em, actor, usedMaterialIds(draft))).map(({ material }) => material.id));
  draft.formula.phases.forEach((phase, phaseAt) => {
    phase.lines.forEach((line, lineAt) => {
      if (known.has(line.materialId)) return;
      issues.push({ pointer: `${at}/formula/phases/${phaseAt}/lines/${lineAt}/materialId`, message: 'This material is not in your house. Choose another or add it first.' });
    });
  });
  if (issues.length > 0) throw new AppError('invalid', { issues });
}

/** The columns of a draft, with the text that the list searches. */
export function toProductColumns(draft: ProductDraft) {
  return { name: draft.name, markets: [...draft.markets], draft, searchText: toSearchText([draft.name, draft.brand, draft.category.replaceAll('-', ' ')]) };
}

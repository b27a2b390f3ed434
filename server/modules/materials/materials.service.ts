import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { findMaterialFaults } from '#shared/contracts/material-faults.ts';
import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import { AppError } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { PAGE_SIZE, searchWords, toSearchText } from '#server/db/search-text.ts';
import { MaterialDocument } from './material-document.entity.ts';
import { Material } from './material.entity.ts';
import { presentMaterial } from './materials.present.ts';

/** A material with all that its screen shows beside it. */
export interface MaterialView {
  readonly material: Material;
  readonly documents: readonly MaterialDocument[];
  readonly usedIn: readonly { readonly productId: string; readonly name: string }[];
}

/** One page of the house's materials in use, by trade name; `find` words must all occur. */
export async function listMaterials(em: EntityManager, actor: Actor, query: { readonly find?: string; readonly page?: number }) {
  const page = query.page ?? 1;
  const find = em.createQueryBuilder(Material, 'm').where({ houseId: actor.houseId, archived: false });
  for (const word of searchWords(query.find)) find.andWhere('strpos(m.search_text, ?) > 0', [word]);
  const [items, total] = await find
    .orderBy({ tradeName: 'asc', id: 'asc' })
    .limit(PAGE_SIZE, (page - 1) * PAGE_SIZE)
    .getResultAndCount();
  return { items, total, page, pageSize: PAGE_SIZE };
}

/** One material of the house. @throws AppError `not-found` */
export async function getMaterial(em: EntityManager, actor: Actor, id: string): Promise<MaterialView> {
  const [view] = await getMaterials(em, actor, [id]);
  if (!view) throw new AppError('not-found');
  return view;
}

/** The materials of these ids that the house has, archived ones too, in three queries however many they are. */
export async function getMaterials(em: EntityManager, actor: Actor, ids: readonly string[]): Promise<MaterialView[]> {
  if (ids.length === 0) return [];
  const materials = await em.find(Material, { houseId: actor.houseId, id: { $in: [...ids] } }, { orderBy: { tradeName: 'asc', id: 'asc' } });
  const own = { houseId: actor.houseId, materialId: { $in: materials.map((one) => one.id) } };
  const documents = await em.find(MaterialDocument, own, { orderBy: { addedAt: 'asc', id: 'asc' } });
  const uses: { material_id: string; product_id: string; name: string }[] = await em.execute(
    `select u.material_id, u.product_id, p.name from product_material u join product p on p.id = u.product_id
     where u.house_id = ? and u.material_id = any(?::uuid[]) and not p.archived order by p.name, p.id`,
    [actor.houseId, `{${ids.join(',')}}`],
  );
  return materials.map((material) => ({
    material,
    documents: documents.filter((one) => one.materialId === material.id),
    usedIn: uses.filter((one) => one.material_id === material.id).map((one) => ({ productId: one.product_id, name: one.name })),
  }));
}

/** The house's materials in use that bear one of these trade names. */
export function findMaterialsByName(em: EntityManager, actor: Actor, tradeNames: readonly string[]): Promise<Material[]> {
  return em.find(Material, { houseId: actor.houseId, archived: false, tradeName: { $in: [...tradeNames] } }, { orderBy: { savedAt: 'asc', id: 'asc' } });
}

/** Adds a material to the house. @throws AppError `invalid` with every fault of its figures */
export async function createMaterial(em: EntityManager, actor: Actor, fields: MaterialFields, now: Date): Promise<MaterialView> {
  requireSound(fields);
  return { material: await addMaterial(em, actor, fields, now), documents: [], usedIn: [] };
}

/** As {@link createMaterial}, for figures that come from a formula document and are judged with the product. */
export async function addMaterial(em: EntityManager, actor: Actor, fields: MaterialFields, now: Date): Promise<Material> {
  const material = em.create(Material, {
    houseId: actor.houseId,
    ...toMaterialColumns(fields),
    savedAt: now,
    savedById: actor.personId,
    savedBy: actor.name,
  });
  await em.flush();
  return material;
}

/** Saves a material. @throws AppError `stale` with what stands now, `invalid`, `not-found` */
export async function updateMaterial(
  em: EntityManager,
  actor: Actor,
  input: { readonly id: string; readonly version: number; readonly fields: MaterialFields; readonly now: Date },
): Promise<MaterialView> {
  requireSound(input.fields);
  const material = await lockMaterial(em, actor, input);
  Object.assign(material, toMaterialColumns(input.fields));
  return save(em, actor, material, input.now);
}

/** Puts a material away or back. @throws AppError `in-use` while a product in use holds it, `stale`, `not-found` */
export async function archiveMaterial(
  em: EntityManager,
  actor: Actor,
  input: { readonly id: string; readonly version: number; readonly archived: boolean; readonly now: Date },
): Promise<MaterialView> {
  const material = await lockMaterial(em, actor, input);
  if (input.archived) {
    const { usedIn } = await getMaterial(em, actor, input.id);
    if (usedIn.length > 0) {
      throw new AppError('in-use', { message: `Still used in ${usedIn.map((one) => one.name).join(', ')}. Take it out there first.` });
    }
  }
  material.archived = input.archived;
  return save(em, actor, material, input.now);
}

async function save(em: EntityManager, actor: Actor, material: Material, now: Date): Promise<MaterialView> {
  material.version += 1;
  material.savedAt = now;
  material.savedById = actor.personId;
  material.savedBy = actor.name;
  await em.flush();
  return getMaterial(em, actor, material.id);
}

/** The row, held until the transaction ends, so that of two saves of one version one wins. */
async function lockMaterial(em: EntityManager, actor: Actor, asked: { readonly id: string; readonly version: number }): Promise<Material> {
  const material = await em.findOne(Material, { houseId: actor.houseId, id: asked.id }, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (!material) throw new AppError('not-found');
  if (material.version !== asked.version) throw new AppError('stale', { current: presentMaterial(await getMaterial(em, actor, asked.id)) });
  return material;
}

function requireSound(fields: MaterialFields): void {
  const issues = findMaterialFaults(fields);
  if (issues.length > 0) throw new AppError('invalid', { issues });
}

/** The columns of a material's fields, with the text that the list searches. */
export function toMaterialColumns(fields: MaterialFields) {
  const { tradeName, supplier, declareAs, composition, constituents, pricePerKg, currency, notes, handling, facts = {} } = fields;
  const searchText = toSearchText([tradeName, supplier, ...composition.map((line) => line.inci)]);
  return { tradeName, supplier, declareAs, composition, constituents, pricePerKg, currency, notes, handling, facts, searchText };
}

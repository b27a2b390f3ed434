import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { materialFields, type MaterialFields } from '#shared/contracts/materials.contract.ts';
import { productDraft } from '#shared/contracts/product-draft.ts';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import { fromFormulaDocument, toMaterialFields } from '#shared/product/from-document.ts';
import { AppError } from '#server/http/app-error.ts';
import { plainWords, toIssues } from '#server/http/issues.ts';
import type { Actor } from '#server/http/session.ts';
import { getHouse } from '#server/modules/house/house.service.ts';
import { presentHouse } from '#server/modules/house/house.present.ts';
import { addMaterial, findMaterialsByName } from '#server/modules/materials/materials.service.ts';
import { newDraft } from './new-draft.ts';
import type { Product } from './product.entity.ts';
import { addProduct, type SaveContext } from './products.service.ts';
import { fingerprint } from './fingerprint.ts';

/**
 * Creates a product from a formula document. A material that the house already describes in
 * the same words and figures is used as it stands; the others are added.
 * @throws AppError `invalid` with every fault, by pointer below `/document`
 */
export async function importFormulaDocument(em: EntityManager, actor: Actor, value: unknown, context: SaveContext): Promise<Product> {
  const read = readFormulaDocument(value, { categories: context.categories });
  if ('faults' in read) throw new AppError('invalid', { issues: read.faults.map(({ pointer, message }) => ({ pointer: `/document${pointer}`, message })) });
  const { document } = read;
  const fields = document.materials.map((material, index) => parse(materialFields, toMaterialFields(material), `/document/materials/${index}`));
  const materialIds = await keepMaterials(em, actor, document, fields, context.now);
  const { category, markets, name } = document.product;
  const blank = newDraft({ name: name || 'Product without a name', category, markets }, presentHouse(await getHouse(em, actor), []));
  const draft = parse(productDraft, fromFormulaDocument(document, { blank, materialIds }), '/document');
  return addProduct(em, actor, draft, context, '/document');
}

async function keepMaterials(
  em: EntityManager,
  actor: Actor,
  { materials }: FormulaDocument,
  fields: readonly MaterialFields[],
  now: Date,
): Promise<ReadonlyMap<string, string>> {
  const standing = await findMaterialsByName(em, actor, fields.map((one) => one.tradeName));
  const known = new Map(standing.map((material) => [fingerprint(material), material.id]));
  const ids = new Map<string, string>();
  for (const [index, one] of fields.entries()) {
    const mark = fingerprint(one);
    const id = known.get(mark) ?? (await addMaterial(em, actor, one, now)).id;
    known.set(mark, id);
    ids.set(materials[index]?.id ?? '', id);
  }
  return ids;
}

/** Holds what a document says to the limits of the house's own screens. */
function parse<T extends z.ZodType>(schema: T, value: unknown, at: string): z.output<T> {
  const parsed = schema.safeParse(value, { error: plainWords });
  if (parsed.success) return parsed.data;
  throw new AppError('invalid', { issues: toIssues(parsed.error.issues).map(({ pointer, message }) => ({ pointer: at + pointer, message })) });
}

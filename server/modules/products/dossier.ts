import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Material as MaterialShape } from '#shared/contracts/materials.contract.ts';
import type { Product as ProductShape } from '#shared/contracts/products.contract.ts';
import type { MarketResult, ResultDocument } from '#shared/contracts/result-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { assess, type AssessOptions } from '#shared/engine/assess.ts';
import type { Assessment } from '#shared/engine/assessment.ts';
import { presentResult } from '#shared/engine/present-result.ts';
import { plainDate, type PlainDate } from '#shared/kernel/plain-date.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import { judgeHandling } from '#shared/product/handling.ts';
import { toDocument, type HouseDefaults } from '#shared/product/to-document.ts';
import { invalid } from '#server/http/app-error.ts';
import type { Actor } from '#server/http/session.ts';
import { getHouse } from '#server/modules/house/house.service.ts';
import { getMaterials } from '#server/modules/materials/materials.service.ts';
import type { HousePicture } from '#server/modules/pictures/picture.entity.ts';
import { getPictures } from '#server/modules/pictures/pictures.service.ts';
import { presentMaterial } from '#server/modules/materials/materials.present.ts';
import { usedMaterialIds } from './keep-save.ts';
import type { Product } from './product.entity.ts';
import { presentProduct } from './products.present.ts';
import { getProduct } from './products.service.ts';

/** What judging needs from outside the database. */
export interface Knowledge {
  readonly law: LawBook;
  readonly dictionary: Dictionary;
  readonly today: PlainDate;
}

/** A product with the materials it uses and what its house prints: all that a document or a sheet is made of. */
export interface Dossier {
  readonly house: HouseDefaults & { readonly name: string };
  readonly product: ProductShape;
  readonly materials: readonly MaterialShape[];
  /** Pictures that the label shows. */
  readonly pictures?: readonly HousePicture[];
}

/** Reads a product with everything it stands on. @throws AppError `not-found` */
export async function getDossier(em: EntityManager, actor: Actor, id: string): Promise<Dossier> {
  const product = await getProduct(em, actor, id);
  const house = await getHouse(em, actor);
  return { house: { name: house.name, ...house.particulars }, product: presentProduct(product), materials: await materialsOf(em, actor, [product]), pictures: await getPictures(em, actor, picturesOn(product.draft)) };
}

/** The pictures that a draft's label shows, each once. */
function picturesOn({ label }: Product['draft']): string[] {
  return [...new Set((label.byHand?.added ?? []).flatMap((one) => (one.kind === 'picture' ? [one.picture] : [])))];
}

/** The materials that these products use, each once. */
export async function materialsOf(em: EntityManager, actor: Actor, products: readonly Product[]): Promise<MaterialShape[]> {
  const ids = [...new Set(products.flatMap((product) => usedMaterialIds(product.draft)))];
  return (await getMaterials(em, actor, ids)).map(presentMaterial);
}

/** A product judged: the document as read, the exact figures and the result as it is answered. */
export interface Judged {
  readonly document: FormulaDocument;
  readonly assessment: Assessment;
  readonly result: ResultDocument;
}

export type AsOf = Partial<Pick<AssessOptions, 'markets' | 'placedOnMarket' | 'availableOn'>>;

/**
 * Judges a product as it was saved: by the law of its markets, and by what its materials bear
 * in the making. @throws AppError `invalid` while its formula has no line to judge
 */
export function judge({ house, product, materials }: Dossier, knows: Knowledge, asOf: AsOf = {}): Judged {
  if (!hasLines(product)) throw invalid({ pointer: '/formula', message: 'The formula has no lines yet. Add a material first.' });
  const document = toDocument(product.draft, materials, house);
  const assessment = assess(document, { ...knows, ...asOf });
  const handling = judgeHandling(product.draft, materials) as MarketResult['findings'];
  const result = presentResult(assessment);
  return { document, assessment, result: { ...result, results: result.results.map((one) => ({ ...one, findings: [...one.findings, ...handling] })) } };
}

export function hasLines(product: Pick<ProductShape, 'draft'>): boolean {
  return product.draft.formula.phases.some((phase) => phase.lines.length > 0);
}

/** SHA-256 over a document and its result: what a printed sheet can be held against. */
export function contentHash(content: unknown): string {
  return createHash('sha256').update(JSON.stringify(content)).digest('hex');
}

/** The calendar day of a moment, in UTC. */
export function dayOf(moment: Date): PlainDate {
  return plainDate(moment.toISOString().slice(0, 10));
}

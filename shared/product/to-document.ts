import type { FormulaDocument, DocumentConstituent, DocumentLabel, DocumentLine, DocumentMaterial, DocumentParticulars, DocumentPart, DocumentProduct, DocumentShare } from '#shared/contracts/formula-document.ts';
import type { Material, MaterialFields } from '#shared/contracts/materials.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { compare, parseDecimal } from '#shared/kernel/rational.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';

/** What a house prints unless the product says otherwise. */
export interface HouseDefaults {
  readonly responsiblePerson: Partial<Record<Market, { readonly name: string; readonly address: string } | undefined>>;
  readonly usContact: string;
  readonly canadaContact: string;
  readonly countryOfOrigin: string;
}

/**
 * The formula document of a product as it stands on screen, also while it is half typed: a line
 * without an amount weighs nothing, a part without a share is left out. Lines keep their order
 * over all phases, so a finding's line number points at the same line on screen. What the
 * product leaves empty is taken from the house, where one is given.
 */
export function toDocument(draft: ProductDraft, materials: readonly Material[], house?: HouseDefaults, today?: string): FormulaDocument {
  const used = new Set(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => line.materialId)));
  const { readyForUse, netContent, durability } = draft;
  return {
    document: 'formula/1',
    product: {
      name: draft.name,
      brand: draft.brand,
      category: draft.category,
      markets: draft.markets,
      ...dayOf('placedOnMarket', draft.placedOnMarket ?? today),
      ...dayOf('availableOn', draft.availableOn ?? today),
      flags: draft.flags,
      facts: draft.facts,
      ...(readyForUse && { readyForUse }),
      ...(netContent && { netContent }),
      ...(durability && { durability: durability.kind === 'pao' ? { kind: 'pao', months: `${durability.months}` } : durability }),
      claims: draft.claims,
      particulars: toParticulars(draft.particulars, house),
      mayContain: draft.mayContain,
    },
    materials: materials.filter((material) => used.has(material.id)).map(toDocumentMaterial),
    formula: {
      ...(draft.formula.batchSize && { batchSize: draft.formula.batchSize.value }),
      lines: toLines(draft),
    },
    declaration: draft.declaration,
    label: toLabel(draft.label),
  };
}

function dayOf(key: 'placedOnMarket' | 'availableOn', day: string | undefined): Partial<Record<typeof key, string>> {
  return day === undefined ? {} : { [key]: day };
}

function toLines(draft: ProductDraft): DocumentLine[] {
  let hasMakeUp = false;
  return draft.formula.phases.flatMap((phase) =>
    phase.lines.map((line): DocumentLine => {
      // Only one line can make up the batch; a second one, mid-edit, weighs nothing yet.
      const makesUp = line.unit === 'qs' && !hasMakeUp;
      hasMakeUp ||= makesUp;
      if (makesUp) return { material: line.materialId, phase: phase.name, amount: '', unit: 'qs' };
      return { material: line.materialId, phase: phase.name, amount: decimalOr(line.amount, '0'), unit: line.unit === '%' ? '%' : 'g' };
    }),
  );
}

function decimalOr(text: string | undefined, other: string): string {
  const trimmed = text?.trim() ?? '';
  return /^\d+(\.\d+)?$/.test(trimmed) ? trimmed : other;
}

const documents = new WeakMap<MaterialFields, DocumentMaterial>();

/** A material of the house as a material of a document; the same object for the same material, so that the engine's preparation is kept. */
export function toDocumentMaterial(material: MaterialFields & { readonly id: string }): DocumentMaterial {
  let found = documents.get(material);
  if (!found) {
    found = {
      id: material.id,
      tradeName: material.tradeName,
      ...(material.supplier !== '' && { supplier: material.supplier }),
      declareAs: material.declareAs,
      composition: material.composition.flatMap(toPart),
      constituents: material.constituents.flatMap(toConstituent),
      ...(material.facts && Object.keys(material.facts).length > 0 && { facts: material.facts }),
    };
    documents.set(material, found);
  }
  return found;
}

function toPart(line: MaterialFields['composition'][number]): DocumentPart[] {
  const share = toShare(line);
  if (!share || line.inci.trim() === '') return [];
  const { inci, cas, nano, purpose, usName, role } = line;
  return [{
    inci,
    ...(cas !== undefined && cas !== '' && { cas }),
    ...share,
    ...(nano !== undefined && { nano }),
    ...(purpose !== undefined && { purpose }),
    ...(usName !== undefined && usName !== '' && { usName }),
    role: role ?? 'ingredient',
  }];
}

function toConstituent(line: MaterialFields['constituents'][number]): DocumentConstituent[] {
  const share = toShare(line);
  if (!share || line.name.trim() === '') return [];
  return [{ name: line.name, ...(line.cas !== undefined && line.cas !== '' && { cas: line.cas }), ...share }];
}

/** One share, or a range the right way round; `undefined` while neither is given. */
function toShare(line: DocumentShare): DocumentShare | undefined {
  const percent = decimalOr(line.percent, '');
  if (percent !== '') return { percent };
  const min = decimalOr(line.min, '');
  const max = decimalOr(line.max, '');
  if (min === '' && max === '') return undefined;
  const [low, high] = ordered(min || '0', max || min);
  const typical = decimalOr(line.typical, '');
  return { min: low, max: high, ...(typical !== '' && isWithin(typical, low, high) && { typical }) };
}

function ordered(a: string, b: string): [string, string] {
  return compare(parseDecimal(a)!, parseDecimal(b)!) <= 0 ? [a, b] : [b, a];
}

function isWithin(value: string, low: string, high: string): boolean {
  const read = parseDecimal(value)!;
  return compare(read, parseDecimal(low)!) >= 0 && compare(read, parseDecimal(high)!) <= 0;
}

function toParticulars(own: ProductDraft['particulars'], house: HouseDefaults | undefined): DocumentParticulars {
  const responsiblePerson: Partial<Record<Market, { name: string; address: string }>> = {};
  for (const market of MARKETS) {
    const party = [own.responsiblePerson[market], house?.responsiblePerson[market]].find((one) => one && (one.name !== '' || one.address !== ''));
    if (party) responsiblePerson[market] = { name: party.name, address: party.address };
  }
  const texts = {
    usContact: own.usContact || (house?.usContact ?? ''),
    canadaContact: own.canadaContact || (house?.canadaContact ?? ''),
    countryOfOrigin: own.countryOfOrigin || (house?.countryOfOrigin ?? ''),
    batchCode: own.batchCode,
    function: own.function,
    directions: own.directions,
  };
  return { responsiblePerson, ...Object.fromEntries(Object.entries(texts).filter(([, text]) => text.trim() !== '')), warnings: own.warnings.filter(({ text }) => text.trim() !== '') };
}

function toLabel(label: ProductDraft['label']): DocumentLabel {
  const { container, bleedMm, languages, market, barcode, press, template, ink, byHand } = label;
  return { container, bleedMm, languages, market, press, template, ink, ...(byHand && { byHand }), ...(barcode && barcode.digits !== '' && { barcode }) };
}

/** A formula document in the form in which it is exchanged: what the reader reads back to the same document. */
export function writeDocument(document: FormulaDocument): Record<string, unknown> {
  const { product, formula, ...rest } = document;
  return {
    ...rest,
    document: document.document,
    product: writeProduct(product),
    formula: {
      ...(formula.batchSize !== undefined && { batchSize: { value: formula.batchSize, unit: 'g' } }),
      lines: formula.lines.map(({ material, phase, amount, unit }) => ({ material, phase, ...(unit !== 'qs' && { amount }), unit })),
    },
  };
}

function writeProduct({ flags, ...product }: DocumentProduct): Record<string, unknown> {
  return { ...product, ...flags };
}

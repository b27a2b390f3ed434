import { MARKETS, type Market } from '#shared/law/types.ts';
import { DocumentWalk, isAbsent, isOver, show } from './document-walk.ts';
import { readLabel } from './read-label.ts';
import { readFacts, readProduct } from './read-product.ts';
import type { DocumentConstituent, DocumentLine, DocumentMaterial, DocumentPart, DocumentShare, Fault, FormulaDocument } from './formula-document.ts';

const PURPOSES = ['preservative', 'fragrance', 'colourant', 'uv-filter', 'other'] as const;
const UNITS = ['g', '%', 'qs'] as const;

/** What the reader has to know of the law tables. */
export interface ReaderKnowledge {
  readonly categories: { has(slug: string): boolean };
  /** Markets given from outside (a flag): the document's own may then be missing. */
  readonly markets?: readonly Market[];
}

/**
 * Reads a formula document and reports every fault with its JSON Pointer.
 * Unknown extra fields are left alone; a field given as null counts as left out.
 */
export function readFormulaDocument(value: unknown, knows: ReaderKnowledge): { document: FormulaDocument } | { faults: readonly Fault[] } {
  const walk = new DocumentWalk();
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return { faults: [{ pointer: '', message: 'This is not a formula document: one group of named fields is expected.' }] };
  }
  const root = value as Record<string, unknown>;
  if (root['document'] !== 'formula/1') {
    walk.fault('/document', isAbsent(root['document']) ? 'The document does not say what it is: "formula/1" is read.' : `Not known: ${show(root['document'])}. "formula/1" is read.`);
  }
  const product = readProduct(walk, root['product'], knows);
  const materials = readMaterials(walk, root['materials']);
  const formula = readFormula(walk, root['formula'], new Set(materials.map((material) => material.id)));
  const label = readLabel(walk, root['label']);
  const declaration = readChoices(walk, root['declaration']);
  if (walk.faults.length > 0 || !product || !formula) return { faults: walk.faults };
  return { document: { document: 'formula/1', product, materials, formula, ...(label && { label }), ...(declaration && { declaration }) } };
}

function readMaterials(walk: DocumentWalk, value: unknown): DocumentMaterial[] {
  const seen = new Map<string, number>();
  return walk.list(value, '/materials', 2000, true).flatMap((item, index) => {
    const at = `/materials/${index}`;
    const object = walk.object(item, at, true);
    if (!object) return [];
    const id = walk.text(object['id'], `${at}/id`, { most: 200, isNeeded: true });
    if (id !== undefined) {
      const before = seen.get(id);
      if (before !== undefined) walk.fault(`${at}/id`, `The id ${show(id)} is already used by material ${before + 1}.`);
      else seen.set(id, index);
    }
    const composition = walk.list(object['composition'], `${at}/composition`, 1000).flatMap((part, place) => readPart(walk, part, `${at}/composition/${place}`));
    const constituents = walk.list(object['constituents'], `${at}/constituents`, 1000).flatMap((part, place) => readConstituent(walk, part, `${at}/constituents/${place}`));
    const facts = readFacts(walk, object['facts'], `${at}/facts`);
    const supplier = walk.text(object['supplier'], `${at}/supplier`, { most: 500 });
    return [{
      id: id ?? '',
      tradeName: walk.text(object['tradeName'], `${at}/tradeName`, { most: 500 }) ?? id ?? '',
      ...(supplier !== undefined && { supplier }),
      declareAs: walk.choice(object['declareAs'], `${at}/declareAs`, ['ingredients', 'parfum', 'aroma'] as const) ?? 'ingredients',
      composition,
      constituents,
      ...(Object.keys(facts).length > 0 && { facts }),
    }];
  });
}

function readPart(walk: DocumentWalk, value: unknown, at: string): DocumentPart[] {
  const object = walk.object(value, at, true);
  if (!object) return [];
  const inci = walk.text(object['inci'], `${at}/inci`, { most: 500, isNeeded: true });
  const cas = walk.text(object['cas'], `${at}/cas`, { most: 200 });
  const nano = walk.flag(object['nano'], `${at}/nano`);
  const purpose = walk.choice(object['purpose'], `${at}/purpose`, PURPOSES);
  const usName = walk.text(object['usName'], `${at}/usName`, { most: 500 });
  return [{
    inci: inci ?? '',
    ...(cas !== undefined && { cas }),
    ...readShare(walk, object, at),
    ...(nano !== undefined && { nano }),
    ...(purpose !== undefined && { purpose }),
    ...(usName !== undefined && usName !== '' && { usName }),
    role: walk.choice(object['role'], `${at}/role`, ['ingredient', 'incidental'] as const) ?? 'ingredient',
  }];
}

function readConstituent(walk: DocumentWalk, value: unknown, at: string): DocumentConstituent[] {
  const object = walk.object(value, at, true);
  if (!object) return [];
  const name = walk.text(object['name'], `${at}/name`, { most: 500, isNeeded: true });
  const cas = walk.text(object['cas'], `${at}/cas`, { most: 200 });
  return [{ name: name ?? '', ...(cas !== undefined && { cas }), ...readShare(walk, object, at) }];
}

function readShare(walk: DocumentWalk, object: Record<string, unknown>, at: string): DocumentShare {
  const has = (key: string): boolean => !isAbsent(object[key]);
  const read = (key: string): string | undefined => walk.decimal(object[key], `${at}/${key}`, { isShare: true });
  const percent = read('percent');
  const min = read('min');
  const typical = read('typical');
  const max = read('max');
  if (has('percent')) {
    if (has('min') || has('max') || has('typical')) walk.fault(`${at}/percent`, 'Give either one share or a range, not both.');
    return percent === undefined ? {} : { percent };
  }
  if (!has('min') || !has('max')) {
    walk.fault(has('min') ? `${at}/max` : has('max') ? `${at}/min` : `${at}/percent`, 'Give a share, or a range with its least and its greatest.');
    return {};
  }
  if (min !== undefined && max !== undefined && isOver(min, max)) walk.fault(`${at}/min`, `The least (${min}) is over the greatest (${max}).`);
  else if (typical !== undefined && ((min !== undefined && isOver(min, typical)) || (max !== undefined && isOver(typical, max)))) {
    walk.fault(`${at}/typical`, `The typical share (${typical}) lies outside its range.`);
  }
  return { ...(min !== undefined && { min }), ...(typical !== undefined && { typical }), ...(max !== undefined && { max }) };
}

function readFormula(walk: DocumentWalk, value: unknown, ids: ReadonlySet<string>): FormulaDocument['formula'] | undefined {
  const object = walk.object(value, '/formula', true);
  if (!object) return undefined;
  const batch = walk.object(object['batchSize'], '/formula/batchSize');
  const batchSize = batch && walk.decimal(batch['value'], '/formula/batchSize/value', { isPositive: true }, true);
  if (batch) walk.choice(batch['unit'], '/formula/batchSize/unit', ['g'] as const, true);
  const items = walk.list(object['lines'], '/formula/lines', 5000, true);
  if (Array.isArray(object['lines']) && object['lines'].length === 0) walk.fault('/formula/lines', 'The formula has no lines.');
  let makesUp: number | undefined;
  const lines: DocumentLine[] = [];
  items.forEach((item, index) => {
    const at = `/formula/lines/${index}`;
    const line = walk.object(item, at, true);
    if (!line) return;
    const material = walk.text(line['material'], `${at}/material`, { most: 200, isNeeded: true });
    if (material !== undefined && !ids.has(material)) walk.fault(`${at}/material`, `No material has the id ${show(material)}.`);
    const unit = walk.choice(line['unit'], `${at}/unit`, UNITS, true);
    let amount = '';
    if (unit === 'qs') {
      if (makesUp !== undefined) walk.fault(`${at}/unit`, `Only one line can make up the batch; line ${makesUp + 1} already does.`);
      makesUp ??= index;
      if (!isAbsent(line['amount']) && line['amount'] !== '') walk.fault(`${at}/amount`, 'The line that makes up the batch has no amount of its own.');
    } else amount = walk.decimal(line['amount'], `${at}/amount`, {}, true) ?? '';
    lines.push({ material: material ?? '', phase: walk.text(line['phase'], `${at}/phase`, { most: 500 }) ?? '', amount, unit: unit ?? 'g' });
  });
  return { ...(batchSize !== undefined && { batchSize }), lines };
}

function readChoices(walk: DocumentWalk, value: unknown): FormulaDocument['declaration'] | undefined {
  const object = walk.object(value, '/declaration');
  if (!object) return undefined;
  const joinedNames = walk.flag(object['joinedNames'], '/declaration/joinedNames');
  const orders = walk.object(object['freeOrder'], '/declaration/freeOrder');
  const freeOrder: Partial<Record<Market, string[]>> = {};
  for (const market of MARKETS) {
    const names = orders?.[market];
    if (isAbsent(names)) continue;
    const at = `/declaration/freeOrder/${market}`;
    freeOrder[market] = walk.list(names, at, 2000).flatMap((name, place) => walk.text(name, `${at}/${place}`, { most: 500 }) ?? []);
  }
  return { freeOrder, ...(joinedNames !== undefined && { joinedNames }) };
}


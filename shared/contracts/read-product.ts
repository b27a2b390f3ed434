import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import { MARKETS, type Market, type ProductFlag } from '#shared/law/types.ts';
import { decimalText, isAbsent, show, type DocumentWalk } from './document-walk.ts';
import type { DocumentParticulars, DocumentProduct } from './formula-document.ts';

const FLAGS: readonly ProductFlag[] = ['under3', 'professionalUseOnly', 'aerosol', 'spray', 'intimateHygiene'];
const LANG = /^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/;

/** Reads `/product`. */
export function readProduct(
  walk: DocumentWalk,
  value: unknown,
  knows: { categories: { has(slug: string): boolean }; markets?: readonly Market[] },
): DocumentProduct | undefined {
  const product = walk.object(value, '/product', true);
  if (!product) return undefined;
  const category = walk.text(product['category'], '/product/category', { most: 200, isNeeded: true });
  if (category !== undefined && !knows.categories.has(category)) walk.fault('/product/category', `No product category is called ${show(category)}.`);
  const placedOnMarket = readDay(walk, product['placedOnMarket'], '/product/placedOnMarket');
  const availableOn = readDay(walk, product['availableOn'], '/product/availableOn');
  const readyForUse = readDilution(walk, product['readyForUse']);
  const netContent = readNetContent(walk, product['netContent']);
  const durability = readDurability(walk, product['durability']);
  const particulars = readParticulars(walk, product['particulars']);
  return {
    name: walk.text(product['name'], '/product/name', { most: 500 }) ?? '',
    brand: walk.text(product['brand'], '/product/brand', { most: 500 }) ?? '',
    category: category ?? '',
    markets: readMarkets(walk, product['markets'], (knows.markets?.length ?? 0) > 0),
    ...(placedOnMarket !== undefined && { placedOnMarket }),
    ...(availableOn !== undefined && { availableOn }),
    flags: readFlags(walk, product),
    facts: readFacts(walk, product['facts'], '/product/facts'),
    ...(readyForUse && { readyForUse }),
    ...(netContent && { netContent }),
    ...(durability && { durability }),
    claims: readClaims(walk, product['claims']),
    ...(particulars && { particulars }),
    mayContain: readMayContain(walk, product['mayContain']),
  };
}

function readMarkets(walk: DocumentWalk, value: unknown, isOptional: boolean): Market[] {
  const items = walk.list(value, '/product/markets', 40, !isOptional);
  if (Array.isArray(value) && value.length === 0 && !isOptional) walk.fault('/product/markets', 'Name at least one market.');
  const read = items.flatMap((item, index) => walk.choice(item, `/product/markets/${index}`, MARKETS, true) ?? []);
  return [...new Set(read)];
}

function readDay(walk: DocumentWalk, value: unknown, pointer: string): string | undefined {
  const text = walk.text(value, pointer, { most: 200 });
  if (text === undefined) return undefined;
  return parsePlainDate(text) ?? walk.fault(pointer, `Not a day that exists: ${show(text)}. Write it as YYYY-MM-DD.`);
}

function readFlags(walk: DocumentWalk, product: Record<string, unknown>): DocumentProduct['flags'] {
  const flags: Partial<Record<ProductFlag, boolean>> = {};
  for (const name of FLAGS) {
    const flag = walk.flag(product[name], `/product/${name}`);
    if (flag !== undefined) flags[name] = flag;
  }
  return flags;
}

/** An open map: texts, yes or no, and figures (kept as plain decimals). */
export function readFacts(walk: DocumentWalk, value: unknown, pointer: string): DocumentProduct['facts'] {
  const facts = walk.object(value, pointer);
  if (!facts) return {};
  const entries = Object.entries(facts);
  if (entries.length > 500) walk.fault(pointer, 'These are too many facts: at most 500 are read.');
  const read: [string, string | boolean][] = [];
  for (const [key, fact] of entries.slice(0, 500)) {
    if (isAbsent(fact) || key === '__proto__') continue;
    const at = `${pointer}/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`;
    if (typeof fact === 'boolean') read.push([key, fact]);
    else if (typeof fact === 'number') {
      const text = decimalText(fact);
      if (text === null || text.length > 60) walk.fault(at, `Not a decimal number: ${show(fact)}.`);
      else read.push([key, text]);
    } else {
      const text = walk.text(fact, at, { most: 500 });
      if (text !== undefined) read.push([key, text]);
    }
  }
  return Object.fromEntries(read);
}

function readDilution(walk: DocumentWalk, value: unknown): DocumentProduct['readyForUse'] {
  const object = walk.object(value, '/product/readyForUse');
  if (!object) return undefined;
  const productParts = walk.decimal(object['productParts'], '/product/readyForUse/productParts', { isPositive: true }, true);
  const otherParts = walk.decimal(object['otherParts'], '/product/readyForUse/otherParts', {}, true);
  return productParts !== undefined && otherParts !== undefined ? { productParts, otherParts } : undefined;
}

function readNetContent(walk: DocumentWalk, value: unknown): DocumentProduct['netContent'] {
  const object = walk.object(value, '/product/netContent');
  if (!object) return undefined;
  const content = walk.decimal(object['value'], '/product/netContent/value', {}, true);
  const unit = walk.choice(object['unit'], '/product/netContent/unit', ['g', 'ml'] as const, true);
  return content !== undefined && unit !== undefined ? { value: content, unit } : undefined;
}

function readDurability(walk: DocumentWalk, value: unknown): DocumentProduct['durability'] {
  const object = walk.object(value, '/product/durability');
  if (!object) return undefined;
  const kind = walk.choice(object['kind'], '/product/durability/kind', ['pao', 'best-before'] as const, true);
  if (kind === 'pao') {
    const months = walk.decimal(object['months'], '/product/durability/months', { isPositive: true }, true);
    if (months === undefined) return undefined;
    if (!/^0*[1-9]\d{0,3}(\.0+)?$/.test(months)) return walk.fault('/product/durability/months', `Not a number of whole months: ${months}.`);
    return { kind, months: months.replace(/\..*$/, '').replace(/^0+/, '') };
  }
  if (kind === undefined) return undefined;
  const date = walk.text(object['date'], '/product/durability/date', { most: 200, isNeeded: true });
  if (date === undefined) return undefined;
  if (!parsePlainDate(date) && !parsePlainDate(`${date}-01`)) {
    return walk.fault('/product/durability/date', `Not a month or day that exists: ${show(date)}. Write it as YYYY-MM or YYYY-MM-DD.`);
  }
  return { kind, date };
}

function readLang(walk: DocumentWalk, value: unknown, pointer: string): string | undefined {
  const lang = walk.text(value, pointer, { most: 40 });
  if (lang === undefined) return undefined;
  return LANG.test(lang) ? lang : walk.fault(pointer, `Not a language code: ${show(lang)}. Write it like "en".`);
}

function readClaims(walk: DocumentWalk, value: unknown): DocumentProduct['claims'] {
  return walk.list(value, '/product/claims', 500).flatMap((item, index) => {
    const at = `/product/claims/${index}`;
    const claim = walk.object(item, at, true);
    const text = claim && walk.text(claim['text'], `${at}/text`, { isNeeded: true });
    return claim && text !== undefined ? [{ text, lang: readLang(walk, claim['lang'], `${at}/lang`) ?? 'en' }] : [];
  });
}

function readParticulars(walk: DocumentWalk, value: unknown): DocumentParticulars | undefined {
  const at = '/product/particulars';
  const object = walk.object(value, at);
  if (!object) return undefined;
  const text = (key: string): string | undefined => walk.text(object[key], `${at}/${key}`);
  const parties = walk.object(object['responsiblePerson'], `${at}/responsiblePerson`);
  const responsiblePerson: Partial<Record<Market, { name: string; address: string }>> = {};
  for (const market of MARKETS) {
    const where = `${at}/responsiblePerson/${market}`;
    const party = parties && walk.object(parties[market], where);
    if (party) responsiblePerson[market] = { name: walk.text(party['name'], `${where}/name`) ?? '', address: walk.text(party['address'], `${where}/address`) ?? '' };
  }
  const warnings = walk.list(object['warnings'], `${at}/warnings`, 200).flatMap((item, index) => {
    const where = `${at}/warnings/${index}`;
    if (typeof item === 'string') return [{ text: walk.text(item, where) ?? '' }];
    const warning = walk.object(item, where, true);
    const words = warning && walk.text(warning['text'], `${where}/text`, { isNeeded: true });
    const lang = warning && readLang(walk, warning['lang'], `${where}/lang`);
    return words === undefined ? [] : [{ text: words, ...(lang !== undefined && { lang }) }];
  });
  const optional: Record<string, string> = {};
  for (const key of ['usContact', 'canadaContact', 'countryOfOrigin', 'batchCode', 'function', 'directions']) {
    const words = text(key);
    if (words !== undefined) optional[key] = words;
  }
  return { responsiblePerson, ...optional, warnings };
}

function readMayContain(walk: DocumentWalk, value: unknown): DocumentProduct['mayContain'] {
  return walk.list(value, '/product/mayContain', 500).flatMap((item, index) => {
    const at = `/product/mayContain/${index}`;
    const shade = walk.object(item, at, true);
    const inci = shade && walk.text(shade['inci'], `${at}/inci`, { most: 500, isNeeded: true });
    const usName = shade && walk.text(shade['usName'], `${at}/usName`, { most: 500 });
    return inci === undefined ? [] : [{ inci, ...(usName !== undefined && { usName }) }];
  });
}

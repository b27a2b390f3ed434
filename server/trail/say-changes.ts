import type { TrailChange } from './chain.ts';

/** Keys in a maker's words; others are told by their own letters. */
const WORDS: Readonly<Record<string, string>> = {
  name: 'name', brand: 'brand', category: 'category', markets: 'markets', placedOnMarket: 'first sold on', availableOn: 'still on the shelf on', flags: 'use', facts: 'answer', readyForUse: 'ready-for-use ratio',
  netContent: 'net content', durability: 'durability', claims: 'claim', particulars: 'label', responsiblePerson: 'responsible person', usContact: 'US contact', canadaContact: 'Canadian contact', countryOfOrigin: 'country of origin',
  batchCode: 'batch code', function: 'function', directions: 'directions', warnings: 'precaution', mayContain: 'may contain', formula: 'formula', batchSize: 'batch size', phases: 'phase', lines: 'line', steps: 'step',
  materialId: 'material', amount: 'amount', unit: 'unit', note: 'note', declaration: 'declaration', freeOrder: 'order below 1 %', joinedNames: 'joined names', label: 'label', container: 'container', bleedMm: 'bleed',
  languages: 'languages', market: 'market', barcode: 'barcode', digits: 'figures', press: 'press', template: 'template', ink: 'ink', byHand: 'composing by hand', tradeName: 'trade name', supplier: 'supplier', declareAs: 'declared as',
  composition: 'composition', constituents: 'constituent', percent: 'percent', min: 'least', max: 'most', pricePerKg: 'price per kg', currency: 'currency', notes: 'notes', handling: 'handling', archived: 'put away', temperatureUnit: 'unit of temperature',
  fileName: 'file', kind: 'kind', dated: 'dated', runsOut: 'runs out', roles: 'roles', text: 'text', address: 'address', value: 'value', inci: 'ingredient', cas: 'CAS number',
};
/** What keeps house for the database and says nothing to a reader. */
const SILENT = new Set(['id', 'houseId', 'version', 'savedAt', 'savedById', 'savedBy', 'searchText', 'createdAt', 'storageKey', 'addedAt', 'addedById', 'addedBy', 'sha256', 'bytes', 'mediaType']);

/** Changes told one by one; a change of more is told by its number, and sealed whole by the record's hash. */
const MOST = 60;
const LONGEST = 300;
const NOTHING = 'nothing';

function wordOf(key: string): string {
  return WORDS[key] ?? key.replaceAll(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`);
}

/** A value in words, cut where it is longer than can be read in a line. */
export function sayValue(value: unknown): string {
  const text = sayWhole(value);
  return text.length > LONGEST ? `${text.slice(0, LONGEST - 1)}…` : text;
}

function sayWhole(value: unknown): string {
  if (value === null || value === undefined || value === '') return NOTHING;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number' || typeof value === 'string') return String(value);
  if (value instanceof Date) return value.toISOString();
  if (Array.isArray(value)) return value.length === 0 ? NOTHING : value.map(sayWhole).join(', ');
  const parts = Object.entries(value).filter(([key, part]) => !SILENT.has(key) && part !== '' && part !== null && part !== undefined);
  return parts.length === 0 ? NOTHING : parts.map(([key, part]) => (typeof part === 'string' || typeof part === 'number' ? `${wordOf(key)} ${part}` : `${wordOf(key)}: ${sayWhole(part)}`)).join(', ');
}

/** What names one of several: a phase by its name, an ingredient by its INCI name. */
function nameOf(value: unknown): string | null {
  if (typeof value !== 'object' || value === null) return null;
  const { name, tradeName, inci, element } = value as Readonly<Record<string, unknown>>;
  const found = [name, tradeName, inci, element].find((one) => typeof one === 'string' && one.trim() !== '');
  return typeof found === 'string' ? `“${found.length > 60 ? `${found.slice(0, 59)}…` : found}”` : null;
}

function idOf(value: unknown): string | null {
  const id = typeof value === 'object' && value !== null ? (value as { id?: unknown }).id : undefined;
  return typeof id === 'string' ? id : null;
}

function isPlain(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value) && !(value instanceof Date);
}

function compareLists(before: readonly unknown[], after: readonly unknown[], path: readonly string[], out: TrailChange[]): void {
  const isNamed = [...before, ...after].every((one) => idOf(one) !== null);
  if (!isNamed) {
    // Short plain lists are told whole; others by place.
    if ([...before, ...after].every((one) => typeof one !== 'object')) return tell(path, before, after, out);
    for (let at = 0; at < Math.max(before.length, after.length); at += 1) compare(before[at], after[at], [...path, nameOf(after[at] ?? before[at]) ?? String(at + 1)], out);
    return undefined;
  }
  const olds = new Map(before.map((one) => [idOf(one), one]));
  after.forEach((one, at) => {
    compare(olds.get(idOf(one)), one, [...path, nameOf(one) ?? String(at + 1)], out);
    olds.delete(idOf(one));
  });
  for (const [, one] of olds) compare(one, undefined, [...path, nameOf(one) ?? String(before.indexOf(one) + 1)], out);
  const kept = (list: readonly unknown[], other: readonly unknown[]): string => list.map(idOf).filter((id) => other.some((one) => idOf(one) === id)).join();
  if (kept(before, after) !== kept(after, before)) out.push({ where: say(path, 'order'), before: 'as it was', after: 'changed' });
}

function say(path: readonly string[], more = ''): string {
  const words = [...path, ...(more ? [more] : [])].join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function tell(path: readonly string[], before: unknown, after: unknown, out: TrailChange[]): void {
  const [was, is] = [sayValue(before), sayValue(after)];
  // Values that differ only beyond what is shown still differ.
  if (was === is && JSON.stringify(before) === JSON.stringify(after)) return;
  if (was !== is || sayWhole(before) !== sayWhole(after)) out.push({ where: say(path), before: was, after: is });
}

function compare(before: unknown, after: unknown, path: readonly string[], out: TrailChange[]): void {
  if (JSON.stringify(before) === JSON.stringify(after)) return;
  if (Array.isArray(before) && Array.isArray(after)) return compareLists(before, after, path, out);
  if (isPlain(before) && isPlain(after)) {
    for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) if (!SILENT.has(key)) compare(before[key], after[key], [...path, wordOf(key)], out);
    return;
  }
  tell(path, before, after, out);
}

/** What differs between two states of a record, in words; more than can be read is counted. */
export function sayChanges(before: Readonly<Record<string, unknown>>, after: Readonly<Record<string, unknown>>): TrailChange[] {
  const out: TrailChange[] = [];
  compare(before, after, [], out);
  return out.length <= MOST ? out : [...out.slice(0, MOST), { where: `${out.length - MOST} more changes`, before: 'as it was', after: 'changed' }];
}

import { DomainError } from '#shared/kernel/errors.ts';
import { plainDate, type PlainDate } from '#shared/kernel/plain-date.ts';
import { readAllergens, readDates, readRows } from './read-rows.ts';
import { foldName } from './fold.ts';
import { RowIndex, type Named, type RowHit } from './row-index.ts';
import type { DutyJson, FormaldehydeJson, InstrumentJson, LawTables, ProductConditionJson, ProductWarningJson, ScheduleNameJson, UsColourJson, WordingJson } from './tables.types.ts';
import type { AllergenGroup, Category, Dates, LawRow, Market, Member, Sourcing } from './types.ts';

/** One step of the law calendar. */
export interface LawChange {
  readonly id: string;
  readonly market: Market;
  readonly date: PlainDate;
  /** `placed`: for batches first supplied from this day; `available`: for everything still sold. */
  readonly kind: 'placed' | 'available';
  readonly title: string;
  readonly what: string;
  readonly citation: string;
  readonly rowIds: readonly string[];
}

/** A wording in one language. */
export interface WordingText {
  readonly text: string;
  readonly lang: string;
  readonly citation: string;
  readonly place?: 'principal-panel' | 'label';
  /** False where the words point at the official text instead of being it. */
  readonly isOfficialText: boolean;
  /** True where no text is held at all, so that a label cannot be compared with it. */
  readonly isPointer?: true;
}

export type ProductWarning = Omit<ProductWarningJson, 'from' | 'until'> & { readonly from?: Dates; readonly until?: Dates };

/** A duty that nothing entered decides. */
export type Duty = Omit<DutyJson, 'from'> & { readonly from?: Dates };

/** The law tables, checked and indexed. */
export interface LawBook {
  /** Of the tables: `2026-12`. */
  readonly release: string;
  readonly readOn: PlainDate;
  readonly coveredFrom: PlainDate;
  /** The last date the tables know of; beyond it they do not guess. */
  readonly coveredUntil: PlainDate;
  readonly categories: ReadonlyMap<string, Category>;
  readonly allergenGroups: readonly AllergenGroup[];
  readonly rows: readonly LawRow[];
  readonly instruments: ReadonlyMap<string, InstrumentJson>;
  readonly changes: readonly LawChange[];
  readonly warnings: readonly ProductWarning[];
  readonly usColours: readonly UsColourJson[];
  readonly formaldehyde: FormaldehydeJson;
  readonly duties: readonly Duty[];
  readonly productConditions: readonly ProductConditionJson[];
  /** The row of Canada's schedule that bears this INCI or French name: one EU name may have several. */
  canadianName(written: string): ScheduleNameJson | undefined;
  /** Rows of every list and market that speak of a substance, by name first, then by CAS number. */
  rowsFor(substance: Named): readonly RowHit[];
  /** The releaser of formaldehyde that a substance is, with its factor to formaldehyde. */
  releaserFor(substance: Named): Member | undefined;
  /** The row of this id. @throws DomainError when there is none. */
  row(id: string): LawRow;
  /** Allergen groups that a name or CAS number belongs to (usually one). */
  allergenGroupsFor(substance: Named): readonly AllergenGroup[];
  /** A wording in a language; where no official text is held, a pointer to it in that language or English. */
  wording(id: string, lang: string): WordingText;
  wordingLanguages(id: string): readonly string[];
  /** The citation of a row as one market cites it. */
  citation(row: LawRow, market: Market): string;
  /** How firmly the row is sourced in one market. */
  sourcing(row: LawRow, market: Market): Sourcing;
}

/** Checks and indexes the tables. @throws DomainError on any inconsistency in them. */
export function openLawBook(tables: LawTables): LawBook {
  const rows = tables.rows.flatMap(readRows);
  const byId = byKey(rows, (row) => row.id, 'row');
  const instruments = byKey(tables.instruments, (one) => one.id, 'instrument');
  const wordings = byKey(tables.wording, (one) => one.id, 'wording');
  const categories = byKey(tables.categories, (one) => one.slug, 'category');
  const allergenGroups = readAllergens(tables.allergens);
  const index = new RowIndex(rows);
  const allergens = new RowIndex(allergenGroups.map(asRow));
  const groupById = byKey(allergenGroups, (group) => group.id, 'allergen group');
  const releasers = new RowIndex([asRow({ id: 'formaldehyde', entry: '', citation: '', label: '', prescribesName: false, members: tables.formaldehyde.members, markets: [], leaveOn: '0', rinseOff: '0' })]);
  checkRows(rows, instruments, wordings);
  const changes = readChanges(tables, rows);
  const canadianNames = indexSchedule(tables.canadianNames.names);
  const coveredFrom = plainDate(tables.release.coveredFrom);

  return {
    release: tables.release.release,
    readOn: plainDate(tables.release.readOn),
    coveredFrom,
    coveredUntil: changes.reduce((last, change) => (change.date > last ? change.date : last), coveredFrom),
    categories,
    allergenGroups,
    rows,
    instruments,
    changes,
    warnings: tables.warnings.map(readWarning),
    usColours: tables.usColours,
    formaldehyde: tables.formaldehyde,
    duties: tables.duties.map(readDuty),
    productConditions: tables.productConditions,
    canadianName: (written) => canadianNames.get(foldName(written)),
    rowsFor: (substance) => index.find(substance),
    releaserFor: (substance) => releasers.find(substance)[0]?.member,
    row(id) {
      const row = byId.get(id);
      if (!row) throw new DomainError(`no row of law "${id}"`);
      return row;
    },
    allergenGroupsFor: (substance) => allergens.find(substance).map((hit) => groupById.get(hit.row.id)!),
    wording: (id, lang) => findWording(wordings, id, lang),
    wordingLanguages: (id) => Object.keys(getWording(wordings, id).text),
    citation(row, market) {
      const instrument = instruments.get(row.instrument)!;
      const elsewhere = instrument.elsewhere?.[market];
      return elsewhere ? row.citation.replace(instrument.short, elsewhere.short) : row.citation;
    },
    sourcing: (row, market) => weaker(row.sourcing, instruments.get(row.instrument)!.elsewhere?.[market]?.sourcing ?? 'official'),
  };
}

const FIRMNESS: readonly Sourcing[] = ['official', 'secondary', 'memory'];
function weaker(a: Sourcing, b: Sourcing): Sourcing {
  return FIRMNESS.indexOf(a) >= FIRMNESS.indexOf(b) ? a : b;
}

function byKey<T>(list: readonly T[], key: (one: T) => string, what: string): Map<string, T> {
  const map = new Map<string, T>();
  for (const one of list) {
    if (map.has(key(one))) throw new DomainError(`two of ${what} "${key(one)}"`);
    map.set(key(one), one);
  }
  return map;
}

function checkRows(rows: readonly LawRow[], instruments: ReadonlyMap<string, InstrumentJson>, wordings: ReadonlyMap<string, WordingJson>): void {
  for (const row of rows) {
    if (!instruments.has(row.instrument)) throw new DomainError(`${row.id}: no instrument "${row.instrument}"`);
    if (row.members.length === 0) throw new DomainError(`${row.id}: no members`);
    for (const provision of row.provisions) {
      for (const { id } of provision.wording ?? []) {
        if (!wordings.has(id)) throw new DomainError(`${row.id}: no wording "${id}"`);
      }
    }
  }
}

function asRow(group: AllergenGroup): LawRow {
  return { id: group.id, list: 'restricted', instrument: group.id, entry: group.entry, citation: group.citation, markets: [], title: group.label, members: group.members, together: 'sum', provisions: [], onlyListedUses: false, sourcing: 'official' };
}

function readWarning(json: ProductWarningJson): ProductWarning {
  const { from, until, ...rest } = json;
  const begins = readDates(from, json.id);
  const ends = readDates(until, json.id);
  return { ...rest, ...(begins ? { from: begins } : {}), ...(ends ? { until: ends } : {}) };
}

function readDuty(json: DutyJson): Duty {
  const { from, ...rest } = json;
  const begins = readDates(from, json.id);
  return { ...rest, ...(begins ? { from: begins } : {}) };
}

function indexSchedule(names: readonly ScheduleNameJson[]): ReadonlyMap<string, ScheduleNameJson> {
  const index = new Map<string, ScheduleNameJson>();
  for (const key of ['inci', 'fr'] as const) {
    for (const one of names) {
      const folded = foldName(one[key]);
      if (folded && !index.has(folded)) index.set(folded, one);
    }
  }
  return index;
}

function readChanges(tables: LawTables, rows: readonly LawRow[]): LawChange[] {
  const changes: LawChange[] = [];
  const dated = rows.filter((row) => row.from !== undefined || row.provisions.some((one) => one.from !== undefined));
  for (const json of tables.changes) {
    const dates = readDates({ available: json.available, ...(json.placed ? { placed: json.placed } : {}) }, json.id)!;
    const rowIds = dated.filter((row) => row.markets.includes(json.market) && beginsWith(row, dates, json.market)).map((row) => row.id);
    const common = { id: json.id, market: json.market, title: json.title, what: json.what, citation: json.citation, rowIds };
    if (dates.placed) changes.push({ ...common, date: dates.placed, kind: 'placed' });
    changes.push({ ...common, date: dates.available, kind: 'available' });
  }
  return changes.sort((a, b) => (a.date < b.date ? -1 : a.date > b.date ? 1 : a.id < b.id ? -1 : 1));
}

function beginsWith(row: LawRow, dates: Dates, market: Market): boolean {
  const isIt = (from: Dates | undefined): boolean => from?.available === dates.available && from?.placed === dates.placed;
  return isIt(row.from) || row.provisions.some((one) => isIt(one.from) && (one.markets?.includes(market) ?? true));
}

function getWording(wordings: ReadonlyMap<string, WordingJson>, id: string): WordingJson {
  const wording = wordings.get(id);
  if (!wording) throw new DomainError(`no wording "${id}"`);
  return wording;
}

/** What stands in for a text that the tables do not hold. */
const POINTER: Readonly<Record<string, (english: string, citation: string) => string>> = {
  en: (english, citation) => `${english} (${citation})`,
};

function findWording(wordings: ReadonlyMap<string, WordingJson>, id: string, lang: string): WordingText {
  const wording = getWording(wordings, id);
  const place = wording.place ? { place: wording.place } : {};
  const text = wording.text[lang];
  if (text !== undefined) {
    return { text, lang, citation: wording.citation, isOfficialText: !wording.pointer && !(wording.unchecked?.includes(lang) ?? false), ...(wording.pointer ? { isPointer: true as const } : {}), ...place };
  }
  const english = wording.text['en'];
  if (english === undefined) throw new DomainError(`wording "${id}" has no English text`);
  const pointer = POINTER[lang] ?? ((words: string, citation: string) => `Take the official wording in this language from ${citation}. In English: ${words}`);
  return { text: pointer(english, wording.citation), lang, citation: wording.citation, isOfficialText: false, ...place };
}

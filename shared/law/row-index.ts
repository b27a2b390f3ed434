import { foldName } from './fold.ts';
import type { LawRow, Member } from './types.ts';

/** A row that speaks of a substance, and as which of its members. */
export interface RowHit {
  readonly row: LawRow;
  readonly member: Member;
}

/** What is asked about: a substance's names and numbers. */
export interface Named {
  readonly name: string;
  readonly cas: readonly string[];
}

function put<T>(map: Map<string, T[]>, key: string, value: T): void {
  const list = map.get(key);
  if (list) list.push(value);
  else map.set(key, [value]);
}

/**
 * Look-up of rows by folded name and by CAS number. A name decides before a number: where a
 * list knows the substance by name, rows of that list that share only a number are left out,
 * because numbers are shared between substances that the law tells apart.
 */
export class RowIndex {
  readonly #byName = new Map<string, RowHit[]>();
  readonly #keys = new Map<string, string>();
  readonly #byCas = new Map<string, RowHit[]>();

  constructor(rows: readonly LawRow[]) {
    for (const row of rows) {
      for (const member of row.members) this.#add(row, member);
    }
  }

  #add(row: LawRow, member: Member): void {
    const hit = { row, member };
    const name = foldName(member.name);
    if (name) put(this.#byName, name, hit);
    if (member.otherNames && member.otherNames.length > 0) {
      for (const key of new Set(member.otherNames.map(foldName))) if (key && key !== name) put(this.#byName, key, hit);
    }
    if (member.casDecides === false) return;
    for (const cas of member.cas ?? []) put(this.#byCas, cas, hit);
  }

  /** Every row of every list and market that speaks of the substance; each row once. */
  find(substance: Named): readonly RowHit[] {
    const named = this.#byName.get(this.#keyOf(substance.name));
    let found: RowHit[] | undefined = named;
    for (const cas of substance.cas) {
      for (const hit of this.#byCas.get(cas) ?? []) {
        if (named?.some((known) => isSameList(known.row, hit.row))) continue;
        if (found?.some((known) => known.row === hit.row)) continue;
        found = found === named ? [...(named ?? []), hit] : [...found!, hit];
      }
    }
    return found ? dedupe(found, substance.cas) : [];
  }

  /** Folded once for each spelling: the same names come back at every keystroke. */
  #keyOf(name: string): string {
    const known = this.#keys.get(name);
    if (known !== undefined) return known;
    const key = foldName(name);
    // The bound keeps memory flat over long runs.
    if (this.#keys.size > 20_000) this.#keys.clear();
    this.#keys.set(name, key);
    return key;
  }
}

function isSameList(a: LawRow, b: LawRow): boolean {
  return a.list === b.list && a.instrument === b.instrument;
}

/**
 * Each row once. An INCI name may cover two members of a row (a dye and its hydrochloride bear
 * one name): the substance's own number then says which; without one the first, the stricter.
 */
function dedupe(hits: readonly RowHit[], cas: readonly string[]): readonly RowHit[] {
  if (hits.length < 2) return hits;
  const byRow = new Map<LawRow, RowHit>();
  for (const hit of hits) {
    const known = byRow.get(hit.row);
    if (!known || (!bears(known.member, cas) && bears(hit.member, cas))) byRow.set(hit.row, hit);
  }
  return [...byRow.values()];
}

function bears(member: Member, cas: readonly string[]): boolean {
  return member.cas?.some((one) => cas.includes(one)) ?? false;
}

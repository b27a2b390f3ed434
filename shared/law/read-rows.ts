import { DomainError } from '#shared/kernel/errors.ts';
import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import { parseDecimal } from '#shared/kernel/rational.ts';
import type { AllergenFileJson, DatesJson, RowFileJson, RowJson } from './tables.types.ts';
import type { AllergenGroup, Dates, LawRow, Member, Provision } from './types.ts';

/** Two days read from a table. @throws DomainError naming the row when a day does not exist or the order is wrong. */
export function readDates(json: DatesJson | undefined, where: string): Dates | undefined {
  if (!json) return undefined;
  const available = parsePlainDate(json.available);
  const placed = json.placed === undefined ? undefined : parsePlainDate(json.placed);
  if (!available || placed === null) throw new DomainError(`${where}: a date is none`);
  if (placed !== undefined && placed > available) throw new DomainError(`${where}: made available before it is placed`);
  return placed === undefined ? { available } : { placed, available };
}

function checkDecimal(text: string | undefined, where: string): void {
  if (text !== undefined && !parseDecimal(text)) throw new DomainError(`${where}: "${text}" is not a decimal`);
}

function checkMember(member: Member, where: string): Member {
  if (!member.name) throw new DomainError(`${where}: a member without a name`);
  checkDecimal(member.factor?.times, where);
  checkDecimal(member.factor?.over, where);
  checkDecimal(member.max, where);
  return member;
}

function readMembers(row: RowJson, where: string): readonly Member[] {
  if (row.members) return row.members.map((member) => checkMember(member, where));
  const [name = row.title, ...otherNames] = row.names ?? [];
  const member: Member = { name, otherNames, cas: row.cas ?? [], ...(row.sharedCas ? { sharedCas: row.sharedCas } : {}) };
  return [checkMember(member, where)];
}

function readProvisions(row: RowJson, where: string): readonly Provision[] {
  return (row.provisions ?? [{}]).map((json) => {
    checkDecimal(json.max, where);
    for (const wording of json.wording ?? []) {
      checkDecimal(wording.above, where);
      checkDecimal(wording.least, where);
    }
    const { from, until, ...rest } = json;
    const begins = readDates(from, where);
    const ends = readDates(until, where);
    return { ...rest, letter: json.letter ?? '', ...(begins ? { from: begins } : {}), ...(ends ? { until: ends } : {}) };
  });
}

/** Rows of one file with everything their head gives them. @throws DomainError on any inconsistency. */
export function readRows(file: RowFileJson): LawRow[] {
  return file.rows.map((row) => {
    const id = row.id ?? file.id.replace('{entry}', row.entry);
    const from = readDates(row.from, id);
    const until = readDates(row.until, id);
    return {
      id,
      list: file.list,
      instrument: file.instrument,
      entry: row.entry,
      citation: (row.citation ?? file.citation).replace('{entry}', row.entry),
      markets: row.markets ?? file.markets,
      title: row.title,
      members: readMembers(row, id),
      together: row.together ?? 'each',
      provisions: readProvisions(row, id),
      onlyListedUses: row.onlyListedUses ?? file.onlyListedUses ?? false,
      ...(from ? { from } : {}),
      ...(until ? { until } : {}),
      sourcing: row.sourcing ?? file.sourcing,
      ...(row.otherUses ? { otherUses: true } : {}),
      ...(row.covers ? { covers: row.covers } : {}),
    };
  });
}

/** The groups of fragrance allergens, each with the markets and dates from which it must be named. */
export function readAllergens(file: AllergenFileJson): AllergenGroup[] {
  checkDecimal(file.leaveOn, 'fragrance allergens');
  checkDecimal(file.rinseOff, 'fragrance allergens');
  return file.groups.map((group) => {
    const markets: AllergenGroup['markets'][number][] = [];
    for (const duty of file.markets) {
      const from = readDates(group.older ? duty.olderFrom : duty.newerFrom, group.id);
      if (from) markets.push({ market: duty.market, from, sourcing: duty.sourcing, citation: duty.citation.replace('{entry}', group.entry) });
    }
    return {
      id: group.id,
      entry: group.entry,
      citation: file.citation.replace('{entry}', group.entry),
      label: group.label,
      prescribesName: group.prescribesName,
      members: group.members.map((member) => checkMember(member, group.id)),
      markets,
      leaveOn: file.leaveOn,
      rinseOff: file.rinseOff,
      ...(group.reading ? { reading: group.reading } : {}),
    };
  });
}

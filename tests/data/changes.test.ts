import { describe, expect, test } from 'vitest';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Market } from '#shared/law/types.ts';

const law = openLawBook(lawTables);
interface Dated { readonly placed?: string; readonly available: string }
const idOf = (market: Market, { placed, available }: Dated): string => [market, placed ?? '-', available].join(' ');
const steps = new Set(lawTables.changes.map((change) => idOf(change.market, change)));

/** Every beginning and end that the tables know, with the market it binds in. */
function everyDate(): { readonly of: string; readonly step: string }[] {
  const found: { of: string; step: string }[] = [];
  const take = (of: string, market: Market, ...dates: (Dated | undefined)[]) => {
    for (const one of dates) if (one) found.push({ of, step: idOf(market, one) });
  };
  for (const row of law.rows) {
    for (const market of row.markets) {
      take(row.id, market, row.from, row.until);
      for (const one of row.provisions) if (one.markets?.includes(market) ?? true) take(`${row.id} ${one.letter}`, market, one.from, one.until);
    }
  }
  for (const group of law.allergenGroups) for (const { market, from } of group.markets) take(group.id, market, from);
  for (const one of law.warnings) take(one.id, one.market, one.from, one.until);
  for (const one of law.formaldehyde.rules) take(one.id, one.market, one.from, one.until);
  for (const one of law.usColours) take(one.name, 'US', one.from);
  return found;
}

describe('the law calendar', () => {
  test('has a step for every dated row of the tables', () => {
    const dates = everyDate();
    expect(dates.length).toBeGreaterThan(150);
    expect(dates.filter(({ step }) => !steps.has(step)).map(({ of, step }) => `${of}: ${step}`)).toEqual([]);
  });

  test('misses a row whose dates it does not hold', () => {
    expect(steps.has(idOf('EU', { available: '2027-03-03' }))).toBe(false);
  });

  test('says of each step what changes and where it stands', () => {
    for (const change of lawTables.changes) {
      expect([change.title, change.what, change.citation].every((text) => text.trim().length > 8), change.id).toBe(true);
      expect(change.placed === undefined || change.placed < change.available, change.id).toBe(true);
    }
    expect(new Set(lawTables.changes.map(({ id }) => id)).size).toBe(lawTables.changes.length);
  });

  test('reaches from the first day of the Regulation to the last date known', () => {
    const days = law.changes.map(({ date }) => date);
    expect([days[0], days.at(-1)]).toEqual([law.coveredFrom, law.coveredUntil]);
  });
});

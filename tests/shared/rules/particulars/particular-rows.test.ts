import { describe, expect, test } from 'vitest';
import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import { MARKETS } from '#shared/law/types.ts';
import { particularRows, places, rowsOfMarket, type ParticularCheck } from '#shared/rules/particulars/particular-rows.ts';

const KINDS = ['given', 'party', 'established', 'says', 'durability', 'measure', 'figures', 'content', 'heights', 'height', 'zone', 'languages', 'any', 'open'];
const kindsOf = (check: ParticularCheck): string[] => ('any' in check ? check.any.flatMap(kindsOf) : KINDS.filter((kind) => kind in check));

describe('the rows of particulars', () => {
  test('each has an id of its own market, a citation, a sourcing and one way to be looked for', () => {
    expect(new Set(particularRows.map(({ id }) => id)).size).toBe(particularRows.length);
    const faulty = particularRows.filter((row) => !row.id.startsWith(`${row.market.toLowerCase()}/particulars/`) || row.citation.length < 8 || !['official', 'secondary', 'memory'].includes(row.sourcing) || kindsOf(row.check).length === 0);
    expect(faulty.map(({ id }) => id)).toEqual([]);
  });
  test('what can be broken says what to do; what is open says why', () => {
    const faulty = particularRows.filter((row) => ('open' in row.check ? row.check.open.length < 15 : !row.remedy.endsWith('.')));
    expect(faulty.map(({ id }) => id)).toEqual([]);
  });
  test('dates are days that exist', () => {
    const days = particularRows.flatMap(({ from, until }) => [from?.available, until?.available]).filter((day) => day !== undefined);
    expect(days.length).toBeGreaterThan(4);
    expect(days.every((day) => parsePlainDate(day) !== null)).toBe(true);
  });
  test('heights rise with their bounds and end without one', () => {
    for (const { id, check } of particularRows) {
      if (!('heights' in check)) continue;
      const heights = check.heights.map(([, height]) => Number(height));
      expect(heights, id).toEqual(heights.toSorted((a, b) => a - b));
      expect(check.heights.map(([bound]) => bound === null), id).toEqual(check.heights.map((_, at) => at === check.heights.length - 1));
    }
  });
  test('every market has rows, in their order', () => {
    for (const market of MARKETS) expect(rowsOfMarket(market)).toEqual(particularRows.filter((row) => row.market === market));
    expect(MARKETS.every((market) => rowsOfMarket(market).length > 7)).toBe(true);
  });
  test('all 27 Member States have a language', () => {
    expect(Object.keys(places.languages)).toHaveLength(27);
    expect(Object.values(places.languages).every(({ all, any }) => (all ?? any ?? []).length > 0)).toBe(true);
  });
});

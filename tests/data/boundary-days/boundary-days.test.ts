/**
 * The day before, the day itself and the day after, for every dated rule of the annexes, in the
 * Union and in Great Britain. What is expected is written out in the files beside this one.
 */
import { describe, expect, test } from 'vitest';
import { judge, law } from '#tests/shared/rules/judging.ts';
import type { Market } from '#shared/law/types.ts';
import { dayAfter, speaks, type Boundary } from './boundary.ts';
import { PROHIBITED_GB, RESTRICTED_GB } from './great-britain.ts';
import { HAIR_DYES } from './hair-dyes.ts';
import { LISTED } from './positive-lists.ts';
import { PROHIBITED } from './prohibited.ts';
import { RESTRICTED } from './restricted.ts';

const ALL = [...HAIR_DYES, ...PROHIBITED, ...RESTRICTED, ...LISTED, ...PROHIBITED_GB, ...RESTRICTED_GB];
const NEAR = [-1, 0, 1];
const EARLY = '2013-07-11';

/** Placed and available days around each date, and whether the rule has begun: worked out here, apart from the product. */
function course({ placed, available }: Pick<Boundary, 'placed' | 'available'>): [string, string, boolean][] {
  if (placed === undefined) return NEAR.map((step) => [EARLY, dayAfter(available, step), step >= 0]);
  return [
    ...NEAR.map((step): [string, string, boolean] => [dayAfter(placed, step), dayAfter(placed, step), step >= 0]),
    ...NEAR.map((step): [string, string, boolean] => [dayAfter(placed, -1), dayAfter(available, step), step >= 0]),
  ];
}

const title = ({ market, rule, given, asked, available, ends }: Boundary): string => `${market} ${rule} ${ends ? 'ends' : 'begins'} ${available}: ${given[0]!.cas?.[0] ?? given[0]!.name}${asked.category ? ` in ${asked.category}` : ''}`;
const cases = (list: readonly Boundary[]): [string, Boundary][] => list.map((one) => [title(one), one]);

describe.each([['Annex II', PROHIBITED], ['Annex III', RESTRICTED], ['Annex III, hair dyes', HAIR_DYES], ['Annexes IV to VI', LISTED], ['Great Britain, Annex II', PROHIBITED_GB], ['Great Britain, Annex III', RESTRICTED_GB]] as const)('%s', (_, list) => {
  test.each(cases(list))('%s', (_title, one) => {
    const days = course(one);
    expect(days.map(([placed, available]) => [placed, available, speaks(one, placed, available)])).toEqual(days.map(([placed, available, begun]) => [placed, available, begun !== (one.ends ?? false)]));
  });

  const inForce = list.filter((one) => one.market === 'EU' && !ALL.some((other) => other.market === 'UK' && sameRule(other, one)) && !one.ends);
  if (inForce.length > 0) test.each(cases(inForce))('not in Great Britain: %s', (_title, one) => {
    const there: Boundary = { ...one, market: 'UK' };
    expect(course(one).map(([placed, available]) => speaks(there, placed, available)).filter(Boolean)).toEqual([]);
  });
});

function sameRule(a: Boundary, b: Boundary): boolean {
  return a.rule.replace(/^uk/, 'eu') === b.rule;
}

describe('what is dated is tried', () => {
  const key = (market: Market, rule: string, { placed, available }: Pick<Boundary, 'placed' | 'available'>): string => `${market} ${rule} ${placed ?? '-'} ${available}`;
  const tried = new Set(ALL.map((one) => key(one.market, one.rule, one)));

  test('every dated row and provision of the annexes, on its days', () => {
    const dated: string[] = [];
    for (const row of law.rows) {
      for (const market of row.markets.filter((one) => one === 'EU' || one === 'UK')) {
        for (const one of row.provisions.filter(({ markets }) => markets?.includes(market) ?? true)) {
          const rule = one.letter ? `${row.id}/${one.letter}` : row.id;
          // A provision that is only the successor of another on the same days is tried by its beginning.
          for (const dates of [one.from ?? row.from, one.until ?? row.until]) if (dates) dated.push(key(market, rule, dates));
        }
      }
    }
    for (const one of law.formaldehyde.rules) for (const dates of [one.from, one.until]) if (dates && one.market !== 'US' && one.market !== 'CA') dated.push(key(one.market, one.id, dates));
    expect(dated.length).toBeGreaterThan(200);
    expect([...new Set(dated)].filter((one) => !tried.has(one))).toEqual([]);
  });
});

test('silver zinc zeolite is no listed preservative before 18 May 2026', () => {
  const on = (available: string): string[] => judge([{ name: 'Ammonium Silver Zinc Aluminum Silicate', percent: '0.5', purpose: 'preservative' }], { category: 'deodorant-spray', available }).findings.map(({ kind }) => kind);
  expect(on('2026-05-17')).toContain('use-not-listed');
  expect(on('2026-05-18')).toEqual([]);
  expect(on('2026-05-19')).toEqual([]);
});

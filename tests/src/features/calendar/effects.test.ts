import { expect, test } from 'vitest';
import { assess } from '#shared/engine/assess.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { findEffects, stepOf, type Effect } from '#src/features/calendar/effects.ts';
import { dictionary, formula, inside, law, line, material, part, TODAY } from '#tests/support/engine.ts';

const judge: Parameters<typeof findEffects>[0] = (document, { markets, placed, available }) =>
  assess(document, { law, dictionary, markets, placedOnMarket: plainDate(placed), availableOn: plainDate(available), today: TODAY });

const find = (document: ReturnType<typeof formula>, since = '2013-07-11', until = '9999-12-31'): Promise<Effect[]> =>
  findEffects(judge, document, law, { since, until, today: TODAY, signal: new AbortController().signal });

/** A leave-on lotion with lavender oil: linalyl acetate, 0.09 % of it, is one of the 81 of Regulation (EU) 2023/1545. */
const lavender = (markets: readonly ('EU' | 'UK' | 'US' | 'CA')[] = ['EU']) =>
  formula(
    [material('base', [part('Aqua', '90'), part('Glycerin', '10')]), material('oil', [part('Lavandula Angustifolia Oil', '100')], { constituents: [inside('Linalyl Acetate', '30')] })],
    [line('base', '99.7 g'), line('oil', '0.3 g')],
    { product: { markets } },
  );

test('a longer list of allergens is another list from both of its days, in the market that has it', async () => {
  const effects = await find(lavender(), '2026-06-01');
  expect(effects.map(({ date, market, asOf }) => [date, market, asOf.placed, asOf.available])).toEqual([
    ['2026-08-01', 'EU', '2026-08-01', '2026-08-01'],
    // What was first sold before the change began may stay to the second day.
    ['2028-08-01', 'EU', '2026-07-31', '2028-08-01'],
  ]);
  expect(effects[0]!.list.added).toContain('Linalyl Acetate');
  expect(await find(lavender(['US']))).toEqual([]);
});

test('a ban adds what stops sale, with what to do and where it stands', async () => {
  // Regulation (EU) 2026/909 and its forerunners: 4-Methylbenzylidene Camphor, Annex II entry 1730, from 1 May 2025 and 1 May 2026.
  const sun = formula([material('all', [part('Aqua', '97'), part('4-Methylbenzylidene Camphor', '3', { purpose: 'uv-filter' })])], [line('all', '100 g')], { product: { category: 'sunscreen-lotion' } });
  const ban = (await find(sun)).find(({ date }) => date === '2025-05-01');
  const stop = ban?.added.find(({ kind }) => kind === 'prohibited');
  expect([stop?.severity, stop?.citation]).toEqual(['stop', 'Regulation (EC) No 1223/2009, Annex II, entry 1730']);
  expect(stop?.remedy).toMatch(/^Take /);
});

test('a formula that no date touches has no effects, and a lost interest ends the work', async () => {
  const plain = formula([material('water', [part('Aqua', '100')])], [line('water', '100 g')]);
  expect(await find(plain)).toEqual([]);
  const stop = new AbortController();
  stop.abort();
  await expect(findEffects(judge, plain, law, { since: '2013-07-11', until: '9999-12-31', today: TODAY, signal: stop.signal })).rejects.toThrow();
});

test('each dated change of a market is one step', () => {
  const steps = law.changes.map(stepOf);
  expect(new Set(steps).size).toBe(steps.length);
});

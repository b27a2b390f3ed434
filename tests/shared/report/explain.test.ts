import { describe, expect, test } from 'vitest';
import type { Finding, FindingKind } from '#shared/engine/types.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';
import { explainFinding } from '#shared/report/explain.ts';
import { formula, inside, judge, law, line, material, part } from '#tests/support/engine.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';

/** Every kind there is: a new one does not compile until it stands here. */
const KINDS: Readonly<Record<FindingKind, true>> = {
  'sum-mismatch': true, 'composition-incomplete': true, 'unknown-ingredient': true, 'order-uncertain': true, 'zone-uncertain': true, 'name-ambiguous': true, 'name-superseded': true,
  prohibited: true, 'limit-exceeded': true, 'limit-uncertain': true, 'not-for-this-use': true, 'use-not-listed': true, 'wording-required': true, 'wording-missing': true, 'particular-missing': true, 'particular-uncertain': true,
  'claim-medicinal': true, 'claim-contradicted': true, 'claim-evidence': true, 'may-contain-misplaced': true, 'handling-limit': true, 'date-not-covered': true, upcoming: true,
};
const plain = (kind: FindingKind): Finding => ({ kind, severity: 'note', rule: 'a-rule', subject: 'Aqua', citation: 'A text', message: 'A message.' });

describe('every kind of finding', () => {
  test.each(Object.keys(KINDS) as FindingKind[])('%s has its rule in words in every market', (kind) => {
    for (const market of MARKETS) expect(explainFinding(plain(kind), market, law).says[0]?.length ?? 0, market).toBeGreaterThan(30);
  });

  test.each(['limit-exceeded', 'limit-uncertain', 'prohibited', 'zone-uncertain', 'order-uncertain', 'sum-mismatch', 'name-superseded', 'composition-incomplete', 'claim-contradicted', 'claim-evidence', 'claim-medicinal', 'particular-missing', 'may-contain-misplaced'] as const)('%s says where the text leaves a choice, and why it was made so', (kind) => {
    const { readings } = explainFinding(plain(kind), 'EU', law);
    expect(readings.length).toBeGreaterThan(0);
    expect(readings.every(({ chosen, why }) => chosen.endsWith('.') && why.endsWith('.'))).toBe(true);
  });
});

const find = (document: ReturnType<typeof formula>, kind: FindingKind, market: Market, day = '2026-12-01'): Finding => {
  const { findings } = judge(document, { markets: [market], placedOnMarket: plainDate(day), availableOn: plainDate(day) }).results[0]!;
  return findings.find((one) => one.kind === kind)!;
};

test('a limit shows its entry, its field, its factor, its choices and the official text', () => {
  const cream = formula([material('all', [part('Aqua', '99.3'), part('Sodium Benzoate', '0.7')])], [line('all', '100 g')]);
  const shown = explainFinding(find(cream, 'limit-exceeded', 'EU'), 'EU', law);
  expect(shown.says.join(' ')).toContain('Annex V, entry 1');
  expect(shown.says.join(' ')).toContain('At most 0.5 % as acid');
  expect(shown.parameters).toContainEqual({ name: 'Maximum', value: '0.5 % as acid' });
  expect(shown.parameters.some(({ name }) => name === 'Factor of Sodium Benzoate')).toBe(true);
  expect(shown.readings.map(({ chosen }) => chosen)).toEqual(expect.arrayContaining(['Exactly the maximum is allowed.', 'The share is converted by molar mass before it is compared.']));
  expect(shown.source).toMatchObject({ link: 'https://eur-lex.europa.eu/eli/reg/2009/1223/oj' });
});

test('a limit of Great Britain says that no copy in force there was read', () => {
  const cream = formula([material('all', [part('Aqua', '98'), part('Phenoxyethanol', '2')])], [line('all', '100 g')]);
  expect(explainFinding(find(cream, 'limit-exceeded', 'UK'), 'UK', law).source?.state).toContain('No copy of the text in force in Great Britain was read');
});

test('a rule with two dates shows both', () => {
  // Regulation (EU) 2024/996: vitamin A, batches from 1 November 2025, all still sold from 1 May 2027.
  const cream = formula([material('all', [part('Aqua', '99'), part('Retinol', '1')])], [line('all', '100 g')], { product: { category: 'face-cream' } });
  const { dates } = explainFinding(find(cream, 'limit-exceeded', 'EU'), 'EU', law);
  expect(dates.slice(0, 2)).toEqual([{ words: 'Binds batches first sold from', day: '2025-11-01' }, { words: 'Binds everything still sold from', day: '2027-05-01' }]);
});

test('exactly 1 % is read as the market’s own text has it', () => {
  const chosen = (market: Market) => explainFinding(plain('zone-uncertain'), market, law).readings.map((one) => one.chosen);
  expect(chosen('EU')).toContain('Exactly 1 % stands in the ordered part.');
  expect(chosen('US')).toContain('Exactly 1 % stands in the free part.');
});

test('an allergen to come names the members of its group and why today’s are taken', () => {
  const lotion = formula([material('base', [part('Aqua', '100')]), material('oil', [part('Lavandula Angustifolia Oil', '100')], { constituents: [inside('Linalyl Acetate', '30')] })], [line('base', '99.7 g'), line('oil', '0.3 g')]);
  const finding = find(lotion, 'upcoming', 'EU', '2026-01-01');
  const shown = explainFinding(finding, 'EU', law);
  expect(shown.parameters.some(({ name, value }) => name === 'Members of the group' && value.length > 5)).toBe(true);
  expect(shown.readings.map(({ chosen }) => chosen)).toContain("The members of an allergen group are those of today's table, for every date.");
  expect(shown.dates.map(({ day }) => day)).toEqual(['2026-08-01', '2028-08-01']);
});

test('every finding of the tables’ own rows finds its row, and every official text has an address', () => {
  for (const row of law.rows) {
    const { says, source } = explainFinding({ ...plain('limit-exceeded'), rule: row.id }, row.markets[0]!, law);
    expect(says.length, row.id).toBeGreaterThan(1);
    expect(source?.link, row.id).toMatch(/^https:\/\//);
  }
});

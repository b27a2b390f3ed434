/**
 * Two documents with the declaration, shares, allergen totals, uncertain pairs and slips worked
 * out independently in exact fractions (the expected files beside them).
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import type { MarketResult } from '#shared/contracts/result-document.ts';
import { law, present } from '#tests/support/engine.ts';

interface Expected {
  readonly order: readonly string[];
  readonly shares: Readonly<Record<string, readonly string[]>>;
  readonly allergens: Readonly<Record<string, { readonly total: readonly string[]; readonly certainty: string }>>;
  readonly 'order-uncertain': readonly (readonly string[])[];
  readonly 'zone-uncertain': readonly string[];
  readonly 'sum-mismatch': boolean;
  readonly suspects: readonly { readonly line: number; readonly perhaps: string; readonly slip: string }[];
}

function open<T>(name: string): T {
  return JSON.parse(readFileSync(join(import.meta.dirname, 'fixtures', name), 'utf8')) as T;
}

function found(result: MarketResult): Expected {
  const range = (one: { min: string; typical: string; max: string }): string[] => [one.min, one.typical, one.max];
  const { entries } = result.declaration;
  const of = (kind: string): MarketResult['findings'] => result.findings.filter((finding) => finding.kind === kind);
  return {
    order: entries.map(({ inci }) => inci),
    shares: Object.fromEntries(entries.filter(({ zone }) => zone !== 'allergen').map(({ inci, share }) => [inci, range(share)])),
    allergens: Object.fromEntries(result.allergens.filter(({ disclose }) => disclose).map(({ name, total, certainty }) => [name, { total: range(total), certainty: certainty! }])),
    'order-uncertain': of('order-uncertain').map(({ members }) => [...members!].sort()),
    'zone-uncertain': of('zone-uncertain').map(({ subject }) => subject),
    'sum-mismatch': of('sum-mismatch').length > 0,
    suspects: of('sum-mismatch').flatMap(({ suspects }) => suspects ?? []).map(({ line, perhaps, slip }) => ({ line, perhaps, slip })),
  };
}

describe.each(['body-wash', 'hand-cream-slip'])('%s', (name) => {
  const read = readFormulaDocument(open(`${name}.json`), { categories: law.categories });
  if ('faults' in read) throw new Error(JSON.stringify(read.faults));
  const { results } = present(read.document);
  const expected = open<Readonly<Record<string, Expected>>>(`${name}.expected.json`);

  test.each(Object.keys(expected))('agrees with the figures worked out by hand for %s', (market) => {
    const result = results.find((one) => one.market === market)!;
    const wanted = { ...expected[market]!, 'order-uncertain': expected[market]!['order-uncertain'].map((pair) => [...pair].sort()) };
    expect(found(result)).toEqual(wanted);
  });

  test('judges exactly the markets of the document', () => {
    expect(results.map(({ market }) => market).sort()).toEqual(Object.keys(expected).sort());
  });
});

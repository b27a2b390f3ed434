import { expect, test } from 'vitest';
import type { Finding } from '#shared/engine/types.ts';
import { cellWords, countFindings, mergeFindings, summarise } from '#src/features/verdicts/merge.ts';

const finding = (over: Partial<Finding> = {}): Finding => ({ kind: 'limit-exceeded', severity: 'stop', rule: 'eu/annex-v/29', subject: 'Phenoxyethanol', measured: '1.08', limit: '1', unit: '%', citation: 'EU text', message: 'Too much.', ...over });

test('one point of two markets is one row with a column each and both citations', () => {
  const merged = mergeFindings([
    { market: 'EU', findings: [finding()] },
    { market: 'UK', findings: [finding({ rule: 'uk/annex-v/29', citation: 'UK text' })] },
  ]);
  expect(merged).toHaveLength(1);
  expect([...merged[0]!.markets.keys()]).toEqual(['EU', 'UK']);
  expect(merged[0]!.citations).toEqual(['EU text', 'UK text']);
});

test('the weightiest answer leads, and what stops sale comes first', () => {
  const merged = mergeFindings([
    { market: 'US', findings: [finding({ kind: 'name-superseded', severity: 'note', subject: 'Old' }), finding({ kind: 'zone-uncertain', severity: 'decide' })] },
    { market: 'EU', findings: [finding({ kind: 'zone-uncertain', severity: 'stop' })] },
  ]);
  expect(merged.map((each) => each.severity)).toEqual(['stop', 'note']);
});

test('two rows of law on one substance in one market stay two points', () => {
  expect(mergeFindings([{ market: 'EU', findings: [finding(), finding({ limit: '0.5' })] }])).toHaveLength(2);
  expect(mergeFindings([{ market: 'EU', findings: [finding({ kind: 'order-uncertain', members: ['A', 'B'] }), finding({ kind: 'order-uncertain', members: ['A', 'C'] })] }])).toHaveLength(2);
});

test('a column says the figure and what it is held against', () => {
  expect(cellWords(finding())).toEqual({ figure: '1.08 %', against: 'limit 1 %' });
  expect(cellWords(finding({ kind: 'zone-uncertain', measuredRange: { min: '0.6', typical: '0.87', max: '1.05' } })).figure).toBe('0.6 to 1.05 %');
});

test('the summary never calls anything compliant', () => {
  const counts = new Map([['EU', countFindings([finding()])], ['US', countFindings([finding({ severity: 'decide' })])]] as const);
  expect(summarise(counts, '2026-12')).toEqual({
    first: 'Not to be sold as it stands in the EU.',
    second: 'No rule in data release 2026-12 is broken in the US; one point waits for a decision.',
  });
});

test('a column never shows a measured figure as the limit it exceeds', () => {
  expect(cellWords(finding({ measured: '0.50000001', limit: '0.5' }))).toMatchObject({ figure: '0.50000001 %', against: 'limit 0.5 %' });
});

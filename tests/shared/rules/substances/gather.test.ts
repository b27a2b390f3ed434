import { expect, test } from 'vitest';
import { gatherRows } from '#shared/rules/substances/gather.ts';
import { law } from '../judging.ts';

test('a row is gathered once with every substance it speaks of, for the market asked', () => {
  const zero = { n: 0n, d: 1n };
  const none = { min: zero, typical: zero, max: zero };
  const named = (name: string) => ({ key: name, name, cas: [], purposes: [], nano: false, as: {}, total: none, sources: [] });
  const substances = [named('Methylparaben'), named('Ethylparaben'), named('Glycerin')];
  const mixture = { substances, find: () => undefined, weigh: () => none };
  const rows = [...gatherRows(mixture, law, 'EU')].map(([row, parts]) => [row.id, parts.length]);
  expect(rows).toEqual([['eu/annex-v/12', 2]]);
  expect([...gatherRows(mixture, law, 'US')]).toEqual([]);
});

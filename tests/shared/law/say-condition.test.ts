import { expect, test } from 'vitest';
import { openLawBook } from '#shared/law/law-book.ts';
import { sayCondition } from '#shared/law/say-condition.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Condition } from '#shared/law/types.ts';

test.each<[Condition, string]>([
  [{ exposure: 'rinse-off' }, 'rinse-off products'],
  [{ all: [{ tag: ['hair', 'oral'] }, { not: { flag: 'spray' } }] }, 'hair products or oral products, not sprays'],
  [{ any: [{ exposure: 'leave-on' }, { tag: ['nail'] }] }, 'leave-on products or nail products'],
  [{ all: [] }, 'every product'],
  [{ purpose: ['uv-filter'] }, 'use as UV filter'],
  [{ nano: true }, 'the nano form'],
  [{ fact: 'pH', least: '2', most: '3.5' }, 'the pH at least 2 and at most 3.5'],
  [{ fact: 'fromAge', below: '3' }, 'the age from which it is used below 3'],
  [{ fact: 'loosePowder', is: [true] }, 'loose powder'],
])('%j is %s', (condition, words) => {
  expect(sayCondition(condition)).toBe(words);
});

test('every condition of the tables has words', () => {
  const law = openLawBook(lawTables);
  for (const row of law.rows) for (const { where } of row.provisions) if (where) expect(sayCondition(where), row.id).toMatch(/\S/);
});

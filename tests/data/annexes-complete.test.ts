import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import without from '#data/law/entries-without-row.json' with { type: 'json' };
import { law } from '../shared/rules/judging.ts';

/**
 * Every entry number of Annexes II to VI to Regulation (EC) No 1223/2009 is a row, a fragrance
 * allergen, or a record that says why it is neither. The highest numbers and the counts are those of the
 * official exports of 18 June 2026 (Annex IV: 25 February 2024), counted by hand.
 */
const LAST: readonly (readonly [string, number])[] = [['II', 1767], ['III', 386], ['V', 61], ['VI', 34]];

const rowsOf = (annex: string) => law.rows.filter((row) => row.citation.startsWith('Regulation (EC) No 1223/2009') && row.citation.includes(`, Annex ${annex}, `) && row.markets.includes('EU'));
const heldOf = (annex: string): ReadonlySet<string> => new Set([...rowsOf(annex).map((row) => row.entry), ...(annex === 'III' ? law.allergenGroups.map((group) => group.entry) : [])]);
const recordsOf = (annex: string): readonly string[] => without.filter((one) => one.annex === annex).map((one) => one.entry);
/** The number of an entry without its letter; a row over a range of entries answers for both its ends. */
const numbersOf = (entries: Iterable<string>): ReadonlySet<number> => new Set([...entries].flatMap((entry) => entry.split('-').map((part) => parseInt(part, 10))));

describe.each(LAST)('Annex %s', (annex, last) => {
  test('each number up to the last is a row or has a record', () => {
    const known = numbersOf([...heldOf(annex), ...recordsOf(annex)]);
    expect(Array.from({ length: last }, (_, index) => index + 1).filter((number) => !known.has(number))).toEqual([]);
    expect(Math.max(...known)).toBe(last);
  });

  test('no record speaks of an entry that is a row', () => {
    const held = heldOf(annex);
    expect(recordsOf(annex).filter((entry) => held.has(entry))).toEqual([]);
  });
});

test('Annex IV, which numbers 1 to 153 with letters, has its 154 entries', () => {
  expect(heldOf('IV').size).toBe(154);
});

test('each record gives its reason and its citation, once', () => {
  expect(new Set(without.map((one) => one.citation)).size).toBe(without.length);
  for (const one of without) {
    expect(['absent', 'moved-or-deleted', 'not-computable']).toContain(one.what);
    expect(one.citation).toBe(`Regulation (EC) No 1223/2009, Annex ${one.annex}, entry ${one.entry}`);
    expect(one.why.length).toBeGreaterThan(20);
  }
});

/** In full: everything the row says is computed. In part: a limit or a ban is computed, more is asked. A question: nothing but the question. */
function depthOf(row: (typeof law.rows)[number]): 'full' | 'part' | 'question' {
  const open = row.provisions.filter((one) => one.notComputable);
  if (open.length === 0) return 'full';
  const decides = row.onlyListedUses || row.provisions.some((one) => one.max !== undefined || one.use === 'forbidden' || (one.requires ?? []).length > 0);
  return decides ? 'part' : 'question';
}

test('how far each annex is interpreted is printed', () => {
  const count = (annex: string) => {
    const depths = rowsOf(annex).map(depthOf);
    const of = (depth: string): number => depths.filter((one) => one === depth).length;
    return { annex, rows: depths.length, full: of('full'), part: of('part'), question: of('question') };
  };
  const counts = ['II', 'III', 'IV', 'V', 'VI'].map(count);
  console.info(counts.map((one) => `Annex ${one.annex}: ${String(one.rows)} rows, ${String(one.full)} in full, ${String(one.part)} in part, ${String(one.question)} only as a question`).join('\n'));
  for (const one of counts) expect(one.full + one.part + one.question, one.annex).toBe(one.rows);
  expect(counts[1]!.rows).toBeGreaterThan(300);
  expect(counts[1]!.question).toBeLessThan(counts[1]!.rows / 4);
});

const place = '../shared/reference/eu/annex-';
test.skipIf(!existsSync(`${place}ii.tsv`)).each([['II', 'ii'], ['III', 'iii'], ['IV', 'iv'], ['V', 'v'], ['VI', 'vi']])('each entry of Annex %s in the export is a row or has a record (its numbers are held to the tests above without it)', (annex, file) => {
  const lines = readFileSync(`${place}${file}.tsv`, 'utf8').split('\n').slice(1).filter(Boolean);
  // Annex III: the number of the law stands in the second column.
  const entries = new Set(lines.map((line) => line.split('\t')[annex === 'III' ? 1 : 0]!));
  const known = new Set([...heldOf(annex), ...recordsOf(annex), ...[...heldOf(annex)].flatMap((entry) => entry.split('-'))]);
  expect([...entries].filter((entry) => !known.has(entry))).toEqual([]);
});

import { afterAll, beforeAll, expect, test } from 'vitest';
import { foldName } from '#shared/law/fold.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { searchDictionary } from '#server/modules/dictionary/dictionary.service.ts';
import { seedDictionary } from '#server/modules/dictionary/seed-dictionary.ts';
import { curatedEntries, dictionaryStage, type DictionaryStage } from './stage.ts';
import { hash, SLIPS, withSlip } from './typos.ts';

let stage: DictionaryStage;
let entries: DictionaryEntry[];

beforeAll(async () => {
  stage = await dictionaryStage();
  entries = curatedEntries();
  await seedDictionary(stage.query, entries, { release: 'test' });
}, 120_000);
afterAll(() => stage?.close());

/** Asks every question, a few at a time, and returns those whose answer is not among the first five. */
async function missed(questions: readonly { q: string; right: (entry: DictionaryEntry) => boolean }[]): Promise<string[]> {
  const lost: string[] = [];
  const queue = [...questions];
  await Promise.all(
    [0, 1, 2, 3].map(async () => {
      for (let one = queue.pop(); one; one = queue.pop()) {
        const found = await searchDictionary(stage.query, { q: one.q, limit: 5 });
        if (!found.some(({ entry }) => one.right(entry))) lost.push(`${one.q} → ${found.map(({ entry }) => entry.inci).join('; ')}`);
      }
    }),
  );
  return lost;
}

test('one slip of any kind in an INCI name still finds it among the first five, 97 times in 100', async () => {
  const names = new Set(entries.map((entry) => foldName(entry.inci)));
  // Every fifth name, chosen by its own text: all kinds of slip occur, and a run stays short.
  const questions = entries.filter((entry) => hash(entry.inci) % 5 === 0).flatMap((entry) => {
    const slip = SLIPS[hash(entry.id) % SLIPS.length]!;
    const q = withSlip(entry.inci, slip);
    // A slip that happens to write another ingredient asks for that one.
    return q === undefined || names.has(foldName(q)) ? [] : [{ q, right: (found: DictionaryEntry) => found.id === entry.id }];
  });
  expect(questions.length).toBeGreaterThan(700);
  const lost = await missed(questions);
  expect(1 - lost.length / questions.length, lost.slice(0, 40).join('\n')).toBeGreaterThanOrEqual(0.97);
}, 300_000);

test('one slip in a common name still finds the ingredient among the first five, 97 times in 100', async () => {
  const questions = entries
    .flatMap((entry) => entry.commonNames.map((name) => ({ entry, name })))
    .filter(({ name }) => name.length >= 5 && hash(name) % 8 === 0)
    .flatMap(({ entry, name }) => {
      const q = withSlip(name, SLIPS[hash(name) % SLIPS.length]!);
      return q === undefined ? [] : [{ q, right: (found: DictionaryEntry) => found.id === entry.id }];
    });
  expect(questions.length).toBeGreaterThan(250);
  const lost = await missed(questions);
  expect(1 - lost.length / questions.length, lost.slice(0, 40).join('\n')).toBeGreaterThanOrEqual(0.97);
}, 300_000);

test('every CAS number leads to an ingredient that has it, first of all', async () => {
  const numbers = [...new Set(entries.flatMap((entry) => entry.cas))];
  expect(numbers.length).toBeGreaterThan(1500);
  const wrong: string[] = [];
  for (const cas of numbers.filter((number) => hash(number) % 3 === 0)) {
    const [first] = await searchDictionary(stage.query, { q: cas, limit: 5 });
    if (!first?.entry.cas.includes(cas)) wrong.push(cas);
  }
  expect(wrong).toEqual([]);
}, 300_000);

test.each([
  ['vitamin E', 'Tocopherol'],
  ['shea', 'Butyrospermum Parkii Butter'],
  ['coco betaine', 'Cocamidopropyl Betaine'],
  ['SLES', 'Sodium Laureth Sulfate'],
  ['xanthan', 'Xanthan Gum'],
  ['rose geranium oil', 'Pelargonium Graveolens Flower Oil'],
  ['lye', 'Sodium Hydroxide'],
  ['cornstarch', 'Zea Mays Starch'],
  ['glycerine', 'Glycerin'],
  ['water', 'Aqua'],
  ['fragrance', 'Parfum'],
  ['77891', 'CI 77891'],
  ['lavend', 'Lavandula Angustifolia Oil'],
  ['phenoxye', 'Phenoxyethanol'],
  ['cocoyl isethionate', 'Sodium Cocoyl Isethionate'],
  ['Red 40', 'CI 16035'],
  ['honey', 'Mel'],
  ['beeswx', 'Cera Alba'],
])('%s leads to %s among the first five', async (q, inci) => {
  const found = await searchDictionary(stage.query, { q, limit: 5 });
  expect(found.map(({ entry }) => entry.inci)).toContain(inci);
});

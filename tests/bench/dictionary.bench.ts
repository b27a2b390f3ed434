import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { searchDictionary } from '#server/modules/dictionary/dictionary.service.ts';
import { seedDictionary } from '#server/modules/dictionary/seed-dictionary.ts';
import type { RunQuery } from '#server/auth/auth-deps.ts';
import { curatedEntries, dictionaryStage } from '#tests/server/dictionary/stage.ts';
import { hash, SLIPS, withSlip } from '#tests/server/dictionary/typos.ts';
import { ms, quantile, type Row } from './report.ts';

const FULL = 30_000;
const QUERIES = 240;

/** Names of the official inventory's manner, made up by crossing curated names: only their number matters here. */
function filler(curated: readonly DictionaryEntry[]): DictionaryEntry[] {
  return Array.from({ length: FULL - curated.length }, (_, index) => {
    const [first, second] = [curated[(index * 7919) % curated.length]!, curated[(index * 104_729 + 13) % curated.length]!];
    const inci = `${first.inci.split(' ')[0]} ${second.inci} ${index}`;
    return { ...first, id: `filler-${index}`, inci, cas: [], ec: [], synonyms: [], commonNames: [], names: {}, properties: [], source: 'bench' };
  });
}

interface Measured {
  readonly p50: number;
  readonly p95: number;
  readonly recall: number;
}

/** One slip in every asked name; the right entry must be among the first five. */
async function measure(query: RunQuery, curated: readonly DictionaryEntry[]): Promise<Measured> {
  const asked = curated
    .filter(({ inci }) => inci.length >= 5 && hash(inci) % 23 === 0)
    .slice(0, QUERIES)
    .flatMap(({ id, inci }, index) => {
      const typed = withSlip(inci, SLIPS[index % SLIPS.length]!);
      return typed === undefined ? [] : [{ id, typed }];
    });
  for (const { typed } of asked.slice(0, 20)) await searchDictionary(query, { q: typed, limit: 5 });
  const times: number[] = [];
  let found = 0;
  for (const { id, typed } of asked) {
    const start = performance.now();
    const answer = await searchDictionary(query, { q: typed, limit: 5 });
    times.push(performance.now() - start);
    if (answer.some(({ entry }) => entry.id === id)) found += 1;
  }
  return { p50: quantile(times, 0.5), p95: quantile(times, 0.95), recall: (100 * found) / asked.length };
}

/** Search as someone types, server part, over the full dictionary and over a list as long as the official inventory. */
export async function runDictionaryBench(): Promise<Row[]> {
  const stage = await dictionaryStage();
  try {
    const curated = curatedEntries();
    await seedDictionary(stage.query, curated, { release: 'bench' });
    await stage.query('analyze', []);
    const small = await measure(stage.query, curated);
    const numbered = curated.filter(({ cas }) => cas.length > 0);
    let missed = 0;
    for (const { cas } of numbered.filter((_, index) => index % 5 === 0)) {
      const answer = await searchDictionary(stage.query, { q: cas[0]!, limit: 5 });
      if (!answer.some(({ entry }) => entry.cas.includes(cas[0]!))) missed += 1;
    }
    await seedDictionary(stage.query, [...curated, ...filler(curated)], { release: 'bench' });
    await stage.query('analyze', []);
    const large = await measure(stage.query, curated);
    const row = (name: string, { p50, p95 }: Measured): Row => ({ name, measured: `p50 ${ms(p50)}, p95 ${ms(p95)}`, promise: 'p95 under 30 ms', isKept: p95 < 30 });
    return [
      row(`dictionary search, ${curated.length} names`, small),
      row(`dictionary search, ${FULL} names`, large),
      { name: 'one-typo queries, right in the first five', measured: `${small.recall.toFixed(1)} %`, promise: 'at least 97 %', isKept: small.recall >= 97 },
      { name: 'CAS numbers not found', measured: String(missed), promise: 'none', isKept: missed === 0 },
    ];
  } finally {
    await stage.close();
  }
}

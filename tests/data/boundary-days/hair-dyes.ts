import type { Boundary } from './boundary.ts';

const NITRO = "N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine";
const TOLUENE = '2,6-Dihydroxyethylaminotoluene';
const HAIR = 'Hair colourants can cause severe allergic reactions.';
const LIMITS: readonly (readonly [string, string, string, string])[] = [
  ['8c/a', NITRO, 'hair-dye-oxidative', '1.1'],
  ['8c/b', NITRO, 'hair-dye-non-oxidative', '1.6'],
  ['9b', TOLUENE, 'hair-dye-oxidative', '1.1'],
];

/** Annex III, entries 8c and 9b: limits from 3 September 2017, words from 3 March 2018, in the Union and, as its law then was, in Great Britain. */
export const HAIR_DYES: readonly Boundary[] = (['EU', 'UK'] as const).flatMap((market) => LIMITS.flatMap(([entry, name, category, percent]): Boundary[] => {
  const common = { market, rule: `eu/annex-iii/${entry}`, given: [{ name, percent }], asked: { category } };
  const limit: Boundary = { ...common, says: 'limit-exceeded', available: '2017-09-03' };
  return entry === '8c/b' ? [limit] : [limit, { ...common, says: { words: HAIR }, available: '2018-03-03' }];
}));

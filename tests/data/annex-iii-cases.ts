import { expect, test } from 'vitest';
import { judge, law, said, type Asked, type Given } from '../shared/rules/judging.ts';

/** How entries of Annex III are tried, whatever their figures: those stand in the tests. */
export const DYE = 'hair-dye-oxidative';
export const RINSE = 'hair-dye-non-oxidative';
export const LASH = 'brow-and-lash-dye';

export const HAIR = 'Hair colourants can cause severe allergic reactions.';
export const EYELASH = 'Eyelashes shall not be coloured if the consumer:';
export const NONE = '';

/** The least bit more than a limit: a ten-millionth. */
export function justOver(limit: string): string {
  const [whole, part = ''] = limit.split('.');
  return `${whole!}.${part.padEnd(6, '0')}1`;
}

export const saidOf = (name: string, percent: string, asked: Asked): string[] => said(judge([{ name, percent }], asked));
export const wordsOf = (name: string, percent: string, asked: Asked): string =>
  judge([{ name, percent }], asked)
    .requiredWording.filter((one) => one.lang === 'en')
    .map((one) => one.text)
    .join(' ');
/** What of an entry is listed as not checked. */
export const notCheckedOf = (name: string, asked: Asked): string => judge([{ name, percent: '0.0001' }], asked).notChecked.map((one) => one.words).join(' ');

/** Rule, substance, category, greatest share, the words its label bears, and what else is asked. */
export type Limit = readonly [string, string, string, string, string, Asked?];

/** Limits as cases of a test. */
export function casesOf(limits: readonly Limit[]) {
  return limits.map(([rule, name, category, limit, words, more]) => ({ rule, name, category, limit, words, asked: { category, ...more } }));
}

/** Exactly the maximum is allowed and its words are printed; the least bit more is not. */
export function tryLimits(limits: readonly Limit[]): void {
  test.each(casesOf(limits))('III/$rule $name in $category: $limit %', ({ rule, name, limit, words, asked }) => {
    expect(saidOf(name, limit, asked)).toEqual([]);
    expect(saidOf(name, justOver(limit), asked)).toEqual([`limit-exceeded ${name} eu/annex-iii/${rule}`]);
    const printed = wordsOf(name, limit, asked);
    if (words === NONE) expect(printed).toBe('');
    else expect(printed).toContain(words);
  });
}

/** Two substances of one entry count together: rule, both names, the half of the limit, what is asked. */
export function tryTogether(pairs: readonly (readonly [string, string, string, string, Asked])[]): void {
  test.each(pairs)('III/%s: %s and %s, %s %% of each', (rule, first, second, half, asked) => {
    const pair = (share: string): Given[] => [{ name: first, percent: share }, { name: second, percent: half }];
    expect(said(judge(pair(half), asked))).toEqual([]);
    expect(said(judge(pair(justOver(half)), asked), 'limit-exceeded')).toEqual([`limit-exceeded ${first} eu/annex-iii/${rule}`]);
  });
}

/** Uses that an entry does not open: substance, category, rule. */
export function tryClosedUses(uses: readonly (readonly [string, string, string])[]): void {
  test.each(uses)('%s in %s', (name, category, rule) => {
    expect(saidOf(name, '0.0001', { category })).toEqual([`not-for-this-use ${name} eu/annex-iii/${rule}`]);
  });
}

/** Dyes that Annex IV lists as well are colourants elsewhere. */
export function tryColourants(names: readonly string[]): void {
  test('a dye that Annex IV lists too stays a colourant elsewhere', () => {
    for (const name of names) expect(said(judge([{ name, percent: '0.1', purpose: 'colourant' }], { category: 'body-wash' })), name).toEqual([]);
  });
}

/** The entries that are rows or fragrance allergens. */
export function heldEntries(): ReadonlySet<string> {
  return new Set([...law.rows.filter((row) => row.citation.includes(', Annex III, ')).map((row) => row.entry), ...law.allergenGroups.map((group) => group.entry)]);
}

/** The numbers of a range, both ends included, that {@link heldEntries} lacks. */
export function missingEntries(from: number, to: number): string[] {
  const held = heldEntries();
  return Array.from({ length: to - from + 1 }, (_, index) => String(from + index)).filter((entry) => !held.has(entry));
}

import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { foldName } from '#shared/law/fold.ts';
import { foldWord } from '#shared/rules/claims/match-words.ts';
import { curatedEntries } from '#tests/server/dictionary/stage.ts';

interface Row { readonly id: string; readonly phrases: readonly string[]; readonly near?: readonly string[]; readonly unless?: readonly string[]; readonly by?: string; readonly verdict: Readonly<Record<string, string>>; readonly why: string; readonly source: string }
interface Class { readonly id: string; readonly words: Readonly<Record<string, readonly string[]>>; readonly plain?: Readonly<Record<string, readonly string[]>>; readonly properties?: readonly string[]; readonly perhaps?: readonly string[]; readonly by?: string; readonly source: string }
interface Ingredient { readonly word: string; readonly starts: readonly string[]; readonly de?: readonly string[]; readonly fr?: readonly string[] }

const open = (name: string): unknown => JSON.parse(readFileSync(join(import.meta.dirname, '../../data/parameters', name), 'utf8'));
const rowsOf = (lang: string): readonly Row[] => (open(`claims-${lang}.json`) as { readonly rows: readonly Row[] }).rows;
const LANGUAGES = ['en', 'de', 'fr'] as const;
const { classes } = open('claims-classes.json') as { readonly classes: readonly Class[] };
const { ingredients } = open('claims-ingredients.json') as { readonly ingredients: readonly Ingredient[] };
const { criteria } = open('claims-criteria.json') as { readonly criteria: Readonly<Record<string, Readonly<Record<string, { readonly text: string; readonly sourcing: string }>>>> };
const rows = LANGUAGES.flatMap(rowsOf);
const phrases = [
  ...rows.flatMap((row) => [...row.phrases, ...(row.near ?? []), ...(row.unless ?? [])]),
  ...classes.flatMap(({ words, plain }) => [...Object.values(words), ...Object.values(plain ?? {})].flat()),
  ...ingredients.flatMap(({ word, de = [], fr = [] }) => [word, ...de, ...fr]),
];

describe('the tables of claims', () => {
  test('every row has its own id, a reason and a source', () => {
    expect(new Set(rows.map(({ id }) => id)).size).toBe(rows.length);
    expect(rows.filter(({ why, source }) => !why || !source).map(({ id }) => id)).toEqual([]);
    expect(classes.filter(({ source }) => !source).map(({ id }) => id)).toEqual([]);
    expect(new Set(classes.map(({ id }) => id)).size).toBe(classes.length);
  });
  test('every row is measured by a criterion that all four markets cite', () => {
    const used = new Set(['medicine', 'truthfulness', 'evidence', 'named', ...[...rows, ...classes].flatMap(({ by }) => (by === undefined ? [] : [by]))]);
    expect([...used].filter((by) => !criteria[by]).sort()).toEqual([]);
    expect(Object.entries(criteria).filter(([, cited]) => Object.keys(cited).sort().join() !== 'CA,EU,UK,US').map(([by]) => by)).toEqual([]);
    expect(Object.keys(criteria).filter((by) => !used.has(by))).toEqual([]);
  });
  test('phrases are written as claims are read: small, without marks, stems of three letters and more', () => {
    expect(phrases.filter((phrase) => phrase.split(' ').some((part) => part !== '%' && (foldWord(part.replace(/\*$/, '')) !== part.replace(/\*$/, '') || (part.endsWith('*') && part.length < 4))))).toEqual([]);
    expect(phrases.filter((phrase) => /[^\p{L}\p{N} %.*]/u.test(phrase) || phrase !== phrase.trim() || phrase.includes('  '))).toEqual([]);
  });
  test('classes ask for properties that the dictionary gives', () => {
    const given = new Set(curatedEntries().flatMap(({ properties }) => properties));
    expect([...new Set(classes.flatMap(({ properties = [], perhaps = [] }) => [...properties, ...perhaps]))].filter((one) => !given.has(one))).toEqual([]);
  });
  test('an ingredient that claims name is one that the dictionary holds', () => {
    const keys = curatedEntries().map(({ inci }) => foldName(inci));
    expect(ingredients.filter(({ starts }) => !starts.some((start) => keys.some((key) => key.startsWith(start.replaceAll(' ', ''))))).map(({ word }) => word)).toEqual([]);
    expect(new Set(ingredients.map(({ word }) => word)).size).toBe(ingredients.length);
  });
});

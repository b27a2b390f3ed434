import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { expect, test } from 'vitest';
import { readInventory } from '#shared/dictionary/read-inventory.ts';

const HEAD = 'ref\tINCI name\tCAS No\tEC No\tFunction\n';

test('names, numbers and functions are read with the line they stand in', () => {
  // CAS and EC numbers of glycerol and titanium dioxide: check digits by the registries' rules.
  const { names, skipped } = readInventory(`${HEAD}1\tGLYCERIN\t56-81-5\t200-289-5\tDENATURANT, HUMECTANT\n2\tCI 77891\t13463-67-7, 1317-70-0\t236-675-5 / 215-280-1\t\n`);
  expect(skipped).toEqual([]);
  expect(names).toEqual([
    { line: 2, inci: 'GLYCERIN', folded: 'glycerin', cas: ['56-81-5'], ec: ['200-289-5'], functions: ['denaturant', 'humectant'] },
    { line: 3, inci: 'CI 77891', folded: 'ci77891', cas: ['13463-67-7', '1317-70-0'], ec: ['236-675-5', '215-280-1'], functions: [] },
  ]);
});

test('commas, semicolons, quotes, a byte-order mark, CRLF and lines before the headings are taken', () => {
  const commas = '\uFEFFIngredients of the inventory\r\n\r\nINCI Name,CAS No,Function\r\n"1,2-HEXANEDIOL",6920-22-5,SOLVENT\r\n"A ""QUOTED""\r\nNAME",,\r\nAQUA,7732-18-5,SOLVENT\r\n';
  expect(readInventory(commas).names.map(({ line, inci }) => [line, inci])).toEqual([[4, '1,2-HEXANEDIOL'], [5, 'A "QUOTED" NAME'], [7, 'AQUA']]);
  expect(readInventory('INCI name;CAS;Function\nAQUA;7732-18-5;SOLVENT, "X"\n').names[0]).toMatchObject({ inci: 'AQUA', cas: ['7732-18-5'] });
});

test('a line without a name, with too many cells, or named before is left out with its reason', () => {
  const { names, skipped } = readInventory(`${HEAD}1\tAQUA\t\t\t\n2\t \t\t\t\n3\tGLYCERIN\t\t\t\tmore\n4\tAqua\t\t\t\n5\tPEN\uFFFDA\t\t\t\n6\t${'X'.repeat(2001)}\t\t\t\n`);
  expect(names.map(({ inci }) => inci)).toEqual(['AQUA']);
  expect(skipped).toEqual([
    { line: 3, reason: 'It has no name.' },
    { line: 4, reason: 'It has 6 cells where the headings have 5.' },
    { line: 5, reason: '"Aqua" stands in line 2 already.' },
    { line: 6, reason: '"PEN\uFFFDA" has letters that could not be read. Save the file as UTF-8.' },
    { line: 7, reason: 'The name has 2001 letters; at most 2000 are kept.' },
  ]);
});

test('a number with a wrong digit is left out and told of, and the name is kept', () => {
  const { names, remarks } = readInventory(`${HEAD}1\tGLYCERIN\t56-81-6, 56-81-5\t-\tHUMECTANT\n`);
  expect(names[0]).toMatchObject({ cas: ['56-81-5'], ec: [] });
  expect(remarks).toEqual([{ line: 2, reason: 'GLYCERIN: "56-81-6" is no CAS number and was left out.' }]);
});

test('a file cut within its last line loses that line alone', () => {
  const { names, skipped } = readInventory(`${HEAD}1\tAQUA\t\t\t\n2\tGLYC`);
  expect(names.map(({ inci }) => inci)).toEqual(['AQUA']);
  expect(skipped).toEqual([{ line: 3, reason: 'The file ends within this line: it has 2 of 5 cells.' }]);
});

test('what is no inventory export is refused in plain words', () => {
  for (const text of ['', 'name\tnumber\nAqua\t1\n', '\u0000\u0001']) expect(() => readInventory(text)).toThrow('No column is headed "INCI name"');
  expect(() => readInventory('INCI name\tprice\nAqua\t1\n')).toThrow('none of CAS numbers or functions');
  expect(() => readInventory(`${HEAD}1\t"AQUA\t\t\t\n`)).toThrow('Line 2 opens a quote that is never closed');
});

const REAL = resolve('../shared/reference/eu/inci-inventory.tsv');
// The kinds of lines in it are tried one by one above.
test.skipIf(!existsSync(REAL))('the whole export of 2021 is read, names of every length', () => {
  const { names, skipped } = readInventory(readFileSync(REAL, 'utf8'));
  expect(names.length + skipped.length).toBe(30_082);
  expect(skipped.every(({ reason }) => reason.includes('stands in line'))).toBe(true);
  expect(names.filter(({ inci }) => inci.length > 500).length).toBeGreaterThan(20);
  expect(names.find(({ folded }) => folded === 'glycerin')?.cas).toContain('56-81-5');
});

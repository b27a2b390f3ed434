import { describe, expect, test } from 'vitest';
import { readNumber, readShare } from '#shared/dictionary/read-amount.ts';
import { readComposition } from '#shared/dictionary/read-composition.ts';
import { splitNames } from '#shared/dictionary/split-names.ts';

const bare = (text: string) => readComposition(text).lines.map(({ row: _row, ...line }) => line);

describe('names in a line', () => {
  test.each([
    ['Aqua (and) Glycerin (and) Avena Sativa Kernel Extract', ['Aqua', 'Glycerin', 'Avena Sativa Kernel Extract']],
    ['Aqua, 1,2-Hexanediol, Glycerin.', ['Aqua', '1,2-Hexanediol', 'Glycerin']],
    ['Water (Aqua, Eau), Parfum', ['Water (Aqua, Eau)', 'Parfum']],
    ['Cetearyl Alcohol + Ceteareth-20', ['Cetearyl Alcohol', 'Ceteareth-20']],
    ['Acrylates/C10-30 Alkyl Acrylate Crosspolymer; Alcohol Denat.', ['Acrylates/C10-30 Alkyl Acrylate Crosspolymer', 'Alcohol Denat.']],
    ['Lavandula Angustifolia Oil*, Linalool**', ['Lavandula Angustifolia Oil', 'Linalool']],
    ['Phenoxyethanol & Ethylhexylglycerin', ['Phenoxyethanol', 'Ethylhexylglycerin']],
  ])('%s', (text, names) => expect(splitNames(text)).toEqual(names));
});

describe('shares', () => {
  test.each([
    ['25-38', { min: '25', max: '38' }], ['25 – 38 %', { min: '25', max: '38' }], ['<1', { min: '0', max: '1' }], ['≤ 5', { min: '0', max: '5' }],
    ['≥ 60', { min: '60', max: '100' }], ['0,5 %', { percent: '0.5' }], ['>= 1 - < 5', { min: '1', max: '5' }], ['max. 2,5', { min: '0', max: '2.5' }], ['100', { percent: '100' }],
  ])('%s', (text, share) => expect(readShare(text)).toEqual(share));
  test.each(['', 'q.s.', '-', 'abc', '5 g', '1-2-3'])('%s is no share', (text) => expect(readShare(text)).toBeUndefined());
  test.each([['1.234,5', '1234.5'], ['1,234.5', '1234.5'], ['1 234,5', '1234.5'], ['.5', '0.5'], ['007', '7'], ['1,2,3', undefined]])('%s reads as %s', (text, value) => expect(readNumber(text)).toBe(value));
});

describe('compositions', () => {
  test('a block of two columns with decimal commas and a heading', () => {
    expect(bare('INCI\t%\nAqua\t69,5\nGlycerin\t30\nSodium Benzoate\t0,5\nTotal\t100')).toEqual([
      { name: 'Aqua', percent: '69.5' }, { name: 'Glycerin', percent: '30' }, { name: 'Sodium Benzoate', percent: '0.5' },
    ]);
    expect(readComposition('INCI\t%\nAqua\t69,5\nGlycerin\t30\nSodium Benzoate\t0,5').total).toBe('100');
  });
  test('CAS and EC columns and ranges', () => {
    expect(bare('Linalool\t78-70-6\t201-134-4\t25 - 38\nLimonene\t5989-27-5\t227-813-5\t<1')).toEqual([
      { name: 'Linalool', cas: '78-70-6', ec: '201-134-4', min: '25', max: '38' },
      { name: 'Limonene', cas: '5989-27-5', ec: '227-813-5', min: '0', max: '1' },
    ]);
  });
  test('least and most in columns of their own become a range', () => {
    expect(bare('Name;Min;Max\nGlycerin;50;70')).toEqual([{ name: 'Glycerin', min: '50', max: '70' }]);
  });
  test('several spaces part the columns', () => {
    expect(bare('Aqua        60\nGlycerin    40 %')).toEqual([{ name: 'Aqua', percent: '60' }, { name: 'Glycerin', percent: '40' }]);
  });
  test('a figure behind each name of a line', () => {
    expect(bare('Aqua 60 %, Glycerin (40 %)')).toEqual([{ name: 'Aqua', percent: '60' }, { name: 'Glycerin', percent: '40' }]);
  });
  test('figures that belong to a name stay with it', () => {
    expect(bare('Polysorbate 20, PEG-7 Glyceryl Cocoate, CI 77891')).toEqual([{ name: 'Polysorbate 20' }, { name: 'PEG-7 Glyceryl Cocoate' }, { name: 'CI 77891' }]);
  });
  test('a wrong CAS digit is said and left out', () => {
    const paste = readComposition('Linalool\t78-70-5\t30');
    expect(paste.lines[0]).toEqual({ row: 1, name: 'Linalool', percent: '30' });
    expect(paste.problems).toEqual([{ row: 1, message: '78-70-5 is not a valid CAS or EC number: a digit is wrong. It was left out.' }]);
  });
  test('a range that runs backwards, a share above the whole and a figure without a name are each said', () => {
    expect(readComposition('Aqua\t38-25').problems).toHaveLength(1);
    expect(readComposition('Aqua\t120').problems).toHaveLength(1);
    expect(readComposition('\t12').problems).toHaveLength(1);
    expect(readComposition(' \n ').problems).toHaveLength(1);
  });
});

import { describe, expect, test } from 'vitest';
import { foldName } from '#shared/law/fold.ts';

describe('foldName', () => {
  test.each([
    ['PEG-7 Glyceryl Cocoate', 'peg 7 glyceryl  COCOATE'],
    ['CI 77891', 'C.I.77891'],
    ['1,2-Hexanediol', '1,2 hexanediol'],
    ['α-Pinene', 'alpha-Pinene'],
    ['Fuller’s Earth', "FULLER'S EARTH"],
    ['Œuf', 'oeuf'],
    ['Huile végétale', 'huile vegetale'],
    ['C12–15 Alkyl Benzoate', 'C12-15 ALKYL BENZOATE'],
  ])('%s and %s are one name', (a, b) => expect(foldName(a)).toBe(foldName(b)));

  test('names that differ in a letter or a digit stay apart', () => {
    expect(foldName('Steareth-2')).not.toBe(foldName('Steareth-21'));
    expect(foldName('CI 77491')).not.toBe(foldName('CI 77492'));
  });
  test('letters of other scripts are kept, so that no foreign name folds to nothing', () => {
    expect(foldName('Вода')).toBe('вода');
    expect(foldName('(+/-)')).toBe('');
  });
});

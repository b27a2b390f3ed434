import { describe, expect, test } from 'vitest';
import { foldWord, PhraseIndex, quote, readPhrase, standsAt, tokenise } from '#shared/rules/claims/match-words.ts';

const words = (text: string, lang = 'en'): string[] => tokenise(text, lang).map(({ word }) => word);

describe('words of a claim', () => {
  test.each([
    ['Athlete’s foot', ['athletes', 'foot']],
    ['PARABEN‑FREE', ['paraben', 'free']],
    ['2,5 % and 99.9%', ['2.5', '%', 'and', '99.9', '%']],
    ['24h SPF30', ['24h', 'spf30']],
    ['Crème brûlée', ['creme', 'brulee']],
    ['hypo\u00adallergenic', ['hypoallergenic']],
    ['Große Heilkraft', ['grosse', 'heilkraft']],
  ])('%s', (text, expected) => expect(words(text)).toEqual(expected));

  test('French elisions part, English apostrophes do not', () => {
    expect(words("l'eczéma d’hiver", 'fr')).toEqual(['l', 'eczema', 'd', 'hiver']);
    expect(words("won't", 'en')).toEqual(['wont']);
  });
  test('a full stop ends a sentence, a comma, a colon or a dash is a pause', () => {
    expect(tokenise('Soft, mild. Calm: kind – dear', 'en').map(({ clause, isAfterComma }) => [clause, isAfterComma])).toEqual([[0, false], [0, true], [1, false], [1, true], [1, true]]);
  });
  test('plain letters and all letters are read alike', () => {
    for (const text of ["don't rinse: 2,5 % SPF30.", 'Free from: parabens; (and) silicones']) expect(words(text)).toEqual(words(`${text} é`).slice(0, -1));
    expect(foldWord("Don't")).toBe(foldWord('Don’t'));
  });
});

describe('phrases', () => {
  const tokens = tokenise('Not tested on animals. Eczemas', 'en');
  test('a stem stands for every word that begins so, a word for itself alone', () => {
    expect(standsAt(readPhrase('eczema*'), tokens, 4)).toBe(true);
    expect(standsAt(readPhrase('eczema'), tokens, 4)).toBe(false);
  });
  test('a phrase does not reach over a full stop', () => {
    expect(standsAt(readPhrase('tested on animals'), tokens, 1)).toBe(true);
    expect(standsAt(readPhrase('animals eczemas'), tokens, 3)).toBe(false);
  });
  test('an index gives each item once, by its longest phrase', () => {
    const index = new PhraseIndex<string>();
    index.add('tested', 'test');
    index.add('tested on animals', 'test');
    index.add('test*', 'stem');
    expect(index.allAt(tokens, 1)).toEqual([{ item: 'test', span: { from: 1, to: 4 } }, { item: 'stem', span: { from: 1, to: 2 } }]);
    expect(index.longestAt(tokens, 1)?.item).toBe('test');
    expect(index.longestAt(tokens, 0)).toBeUndefined();
  });
  test('words of two letters are found too', () => {
    const index = new PhraseIndex<string>();
    index.add('no parabens', 'none');
    expect(index.longestAt(tokenise('No parabens', 'en'), 0)?.item).toBe('none');
  });
  test('a quotation keeps the claim’s own letters', () => {
    expect(quote('Not tested on animals. Eczemas', tokens, { from: 1, to: 4 })).toBe('tested on animals');
  });
});

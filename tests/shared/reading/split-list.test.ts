import { describe, expect, test } from 'vitest';
import { splitList, tidyName } from '#shared/reading/split-list.ts';
import { dictionary } from '#tests/support/engine.ts';

const knows = (name: string): string | undefined => dictionary.resolve(name)?.entry.inci;
const names = (text: string): string[] => splitList(text, knows).map(({ written }) => written);
const shades = (text: string): string[] => splitList(text, knows).filter(({ block }) => block === 'may-contain').map(({ written }) => written);

/** Lists as they stand on packs, in pastes and on photographs. Punctuation habits: common practice, no source. */
describe('a pasted list is split into its names', () => {
  test.each<[string, string, string[]]>([
    ['commas', 'Aqua, Glycerin, Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['a heading', 'Ingredients: Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a bilingual heading', 'INGREDIENTS/INGRÉDIENTS: AQUA, GLYCERIN', ['AQUA', 'GLYCERIN']],
    ['a spaced bilingual heading', 'Ingredients / Ingrédients : Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading with a bracket', 'Ingredients (INCI): Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading without a colon', 'INGREDIENTS Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading on its own line', 'Ingredients\nAqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading with a dash', 'Ingredients - Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a German heading', 'Inhaltsstoffe: Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['words before the heading', 'Juniper wash 250 ml. For all skin types.\nIngredients: Aqua, Glycerin.', ['Aqua', 'Glycerin']],
    ['a comma between place numbers', 'Aqua, 1,2-Hexanediol, Glycerin', ['Aqua', '1,2-Hexanediol', 'Glycerin']],
    ['a spaced comma between place numbers', 'Aqua, 1, 2-Hexanediol, Glycerin', ['Aqua', '1, 2-Hexanediol', 'Glycerin']],
    ['place numbers inside a name', 'Aqua, 2-Bromo-2-Nitropropane-1,3-Diol, Glycerin', ['Aqua', '2-Bromo-2-Nitropropane-1,3-Diol', 'Glycerin']],
    ['no space after a figure', 'Aqua,Polysorbate 20,1,2-Hexanediol,Glycerin', ['Aqua', 'Polysorbate 20', '1,2-Hexanediol', 'Glycerin']],
    ['letters as place numbers', "Aqua, N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine, Glycerin", ['Aqua', "N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", 'Glycerin']],
    ['a range in a name', 'Aqua, C12-15 Alkyl Benzoate, C12-\n15 Alkyl Benzoate', ['Aqua', 'C12-15 Alkyl Benzoate', 'C12-15 Alkyl Benzoate']],
    ['commas inside brackets', 'Aqua (Water, Eau), Glycerin', ['Aqua (Water, Eau)', 'Glycerin']],
    ['a bracket never closed', 'Aqua (Water, Glycerin, Parfum', ['Aqua (Water', 'Glycerin', 'Parfum']],
    ['constituents in brackets', 'Aqua, Parfum (Limonene, Linalool), Glycerin', ['Aqua', 'Parfum', 'Limonene', 'Linalool', 'Glycerin']],
    ['bullets', 'Aqua • Glycerin • Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['middle dots without spaces', 'Aqua·Glycerin·Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['bars', 'Aqua | Glycerin | Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['semicolons', 'Aqua; Glycerin; Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['one name a line', 'Aqua\nGlycerin\nCetearyl Alcohol', ['Aqua', 'Glycerin', 'Cetearyl Alcohol']],
    ['one name a line with commas at the ends', 'Aqua,\nGlycerin,\nCetearyl Alcohol', ['Aqua', 'Glycerin', 'Cetearyl Alcohol']],
    ['numbered lines', '1. Aqua\n2. Glycerin\n3) Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['dashed lines', '- Aqua\n- Glycerin\n- Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['a name over two lines', 'Aqua, Cetearyl\nAlcohol, Glycerin, Parfum', ['Aqua', 'Cetearyl Alcohol', 'Glycerin', 'Parfum']],
    ['a word broken at the end of a line', 'Aqua, Phenoxy-\nethanol, Glycerin', ['Aqua', 'Phenoxyethanol', 'Glycerin']],
    ['full stops', 'Aqua. Glycerin. Parfum.', ['Aqua', 'Glycerin', 'Parfum']],
    ['an abbreviation', 'Alcohol Denat., Aqua, Glycerin.', ['Alcohol Denat.', 'Aqua', 'Glycerin']],
    ['an abbreviation in the middle', 'Aqua, Alcohol denat. , Glycerin', ['Aqua', 'Alcohol denat.', 'Glycerin']],
    ['the joining word in brackets', 'Aqua (and) Glycerin (and) Xanthan Gum', ['Aqua', 'Glycerin', 'Xanthan Gum']],
    ['a last "and"', 'Aqua, Glycerin and Parfum.', ['Aqua', 'Glycerin', 'Parfum']],
    ['an ampersand', 'Aqua, Glycerin & Xanthan Gum', ['Aqua', 'Glycerin', 'Xanthan Gum']],
    ['slashed bilingual names', 'Aqua/Water/Eau, Parfum/Fragrance', ['Aqua/Water/Eau', 'Parfum/Fragrance']],
    ['slashes within one name', 'Aqua, Acrylates/C10-30 Alkyl Acrylate Crosspolymer', ['Aqua', 'Acrylates/C10-30 Alkyl Acrylate Crosspolymer']],
    ['slashes as the only mark', 'Aqua / Glycerin / Xanthan Gum', ['Aqua', 'Glycerin', 'Xanthan Gum']],
    ['percentages', 'Aqua 70 %, Glycerin (5%), Niacinamide 5,5 %, 2% Panthenol', ['Aqua', 'Glycerin', 'Niacinamide', 'Panthenol']],
    ['footnote signs', 'Aqua, Avena Sativa Kernel Oil*, Limonene**, Linalool†', ['Aqua', 'Avena Sativa Kernel Oil', 'Limonene', 'Linalool']],
    ['raised figures', 'Aqua, Avena Sativa Kernel Oil¹, Limonene²', ['Aqua', 'Avena Sativa Kernel Oil', 'Limonene']],
    ['footnotes after the list', 'Aqua, Glycerin*. *from organic farming, certified', ['Aqua', 'Glycerin']],
    ['a footnote on its own line', 'Aqua, Glycerin*, Limonene**\n*from organic farming\n**natural constituents of essential oils', ['Aqua', 'Glycerin', 'Limonene']],
    ['directions after the list', 'Aqua, Glycerin. Directions: apply daily, rinse.', ['Aqua', 'Glycerin']],
    ['a warning after the list', 'Aqua, Glycerin\nWarning: keep away from eyes, ears', ['Aqua', 'Glycerin']],
    ['a nano mark', 'Aqua, Titanium Dioxide [nano], Zinc Oxide (nano)', ['Aqua', 'Titanium Dioxide [nano]', 'Zinc Oxide (nano)']],
    ['odd spaces and wide commas', 'Aqua\u00A0，  Glycerin\u200B, \tParfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['empty places', 'Aqua,, , Glycerin,', ['Aqua', 'Glycerin']],
    ['a text in quotes', '“Aqua, Glycerin, Parfum”', ['Aqua', 'Glycerin', 'Parfum']],
    ['a list in brackets', '[Aqua, Glycerin, Parfum]', ['Aqua', 'Glycerin', 'Parfum']],
    ['nothing', ' \n ,. ', []],
  ])('%s', (_, text, expected) => {
    expect(names(text)).toEqual(expected);
  });
});

describe('what may be contained stands apart', () => {
  test.each<[string, string, string[], string[]]>([
    ['in square brackets', 'Mica, Talc [+/- CI 77491, CI 77492]', ['Mica', 'Talc'], ['CI 77491', 'CI 77492']],
    ['in round brackets', 'Mica, Talc, (+/-) CI 77491, CI 77492.', ['Mica', 'Talc'], ['CI 77491', 'CI 77492']],
    ['after the sign alone', 'Mica, Talc, +/- CI 77491, CI 77492', ['Mica', 'Talc'], ['CI 77491', 'CI 77492']],
    ['with a dash for minus', 'Mica, Talc [+/– CI 77491]', ['Mica', 'Talc'], ['CI 77491']],
    ['with one sign', 'Mica, Talc, ± CI 77491', ['Mica', 'Talc'], ['CI 77491']],
    ['in words', 'Mica, Talc. May contain: Iron Oxides, Mica', ['Mica', 'Talc'], ['Iron Oxides', 'Mica']],
    ['in words and signs', 'Mica, Talc, May Contain (+/-): CI 77491, CI 77492', ['Mica', 'Talc'], ['CI 77491', 'CI 77492']],
    ['in two languages', 'Mica, Talc, [may contain/peut contenir: CI 77491, CI 77492]', ['Mica', 'Talc'], ['CI 77491', 'CI 77492']],
    ['in two languages and signs', 'Mica, Talc. May contain/Peut contenir (+/-): CI 77491', ['Mica', 'Talc'], ['CI 77491']],
  ])('%s', (_, text, list, may) => {
    expect(shades(text)).toEqual(may);
    expect(names(text)).toEqual([...list, ...may]);
  });

  test('active ingredients are a block of their own', () => {
    const read = splitList('Active ingredient: Zinc Oxide 10%. Inactive ingredients: Water, Glycerin', knows);
    expect(read.map(({ written, block }) => `${block} ${written}`)).toEqual(['active Zinc Oxide', 'list Water', 'list Glycerin']);
  });
});

test.each([
  ['Glycerin (12%)', 'Glycerin'],
  ['  *Parfum ', 'Parfum'],
  ['Alcohol Denat.', 'Alcohol Denat.'],
  ['PEG-40 Hydrogenated Castor Oil.', 'PEG-40 Hydrogenated Castor Oil'],
  ['CI 77891)', 'CI 77891'],
  ['(CI 77891)', 'CI 77891'],
])('%s is tidied to %s', (raw, name) => {
  expect(tidyName(raw)).toBe(name);
});

import { describe, expect, test } from 'vitest';
import { findWritten } from '#shared/reading/match-name.ts';
import { splitList, tidyName } from '#shared/reading/split-list.ts';
import { dictionary } from '#tests/support/engine.ts';

const knows = (name: string): string | undefined => findWritten(name, dictionary)?.entry.inci;
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
    ['dashes between spaces', 'Aqua - Glycerin - C12-15 Alkyl Benzoate – Parfum', ['Aqua', 'Glycerin', 'C12-15 Alkyl Benzoate', 'Parfum']],
    ['triangles and stars', 'WATER ▲ GLYCERIN ★ PARFUM', ['WATER', 'GLYCERIN', 'PARFUM']],
    ['no marks at all', 'AQUA GLYCERIN CETEARYL ALCOHOL PARFUM', ['AQUA', 'GLYCERIN', 'CETEARYL ALCOHOL', 'PARFUM']],
    ['one name of several words', 'Butyrospermum Parkii Butter', ['Butyrospermum Parkii Butter']],
    ['counting figures in a row', '1. Aqua 2. Glycerin 3. Parfum', ['Aqua', 'Glycerin', 'Parfum']],
    ['counting figures before place numbers', '1) Aqua, 2) Glycerin, 3) 1,2-Hexanediol', ['Aqua', 'Glycerin', '1,2-Hexanediol']],
    ['backslashes', 'WATER\\AQUA\\EAU, GLYCERIN', ['WATER/AQUA/EAU', 'GLYCERIN']],
    ['commas at the ends of lines and a name over two of them', 'Aqua,\nGlycerin,\nCetearyl\nAlcohol,\nParfum', ['Aqua', 'Glycerin', 'Cetearyl Alcohol', 'Parfum']],
    ['a column of figures', 'Aqua\t70\nGlycerin\t5,5 %\nPolysorbate 20\t1', ['Aqua', 'Glycerin', 'Polysorbate 20']],
    ['figures after the names', 'Phase A\nAqua 70\nPolysorbate 20', ['Aqua', 'Polysorbate 20']],
    ['a Polish heading', 'Składniki: Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a Greek heading', 'Συστατικά: Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading in Han script', '全成分：Aqua、Glycerin', ['Aqua', 'Glycerin']],
    ['a heading that no table knows', 'Sammensetningen er: Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a heading with the word list', 'Ingredients (INGREDIENTS LIST): Aqua, Glycerin', ['Aqua', 'Glycerin']],
    ['soft hyphens', 'So\u00ADdium Lau\u00ADreth Sul\u00ADfate, Aqua', ['Sodium Laureth Sulfate', 'Aqua']],
    ['a Greek capital among Latin letters', 'Αqua, Glycerin', ['Aqua', 'Glycerin']],
    ['a Greek letter of its own', 'β-Carotene, Aqua', ['β-Carotene', 'Aqua']],
    ['constituents introduced by a word', 'Aqua, Lavandula Angustifolia (Lavender) Oil (contains Linalool*, Limonene*)', ['Aqua', 'Lavandula Angustifolia (Lavender) Oil', 'Linalool', 'Limonene']],
    ['allergens named after the list', 'Aqua, Parfum. Contains: Limonene, Linalool.', ['Aqua', 'Parfum', 'Limonene', 'Linalool']],
    ['colour index numbers after a word for them all', 'Talc, Iron Oxides (CI 77491, CI 77492)', ['Talc', 'CI 77491', 'CI 77492']],
    ['words of origin', 'Organic Cocos Nucifera Oil, Olea Europaea (Olive) Fruit Oil [organic]', ['Cocos Nucifera Oil', 'Olea Europaea (Olive) Fruit Oil']],
    ['what the product is free of', 'Aqua, Glycerin. Free from parabens, silicones and sulfates.', ['Aqua', 'Glycerin']],
    ['months and a batch', 'Aqua, Glycerin. 12M. Batch 4711.', ['Aqua', 'Glycerin']],
    ['a warning that begins with a substance', 'Sorbitol, Sodium Fluoride. Contains Sodium Fluoride 0.32% w/w (1450 ppm F-)', ['Sorbitol', 'Sodium Fluoride']],
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

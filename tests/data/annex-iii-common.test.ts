import { describe, expect, test } from 'vitest';
import { judge, said, type Asked, type Given } from '../shared/rules/judging.ts';
import { notCheckedOf, saidOf } from './annex-iii-cases.ts';

/**
 * The entries of Annex III to Regulation (EC) No 1223/2009 that makers meet most, as read against
 * the official export of 18 June 2026 and the texts of warnings. Figures are written out by hand.
 */
const LATER: Asked = { placed: '2027-01-01', available: '2028-07-01' };

const one = (name: string, percent: string): Given[] => [{ name, percent }];
const wordsOf = (given: readonly Given[], asked: Asked): string =>
  judge(given, asked)
    .requiredWording.filter((text) => text.lang === 'en')
    .map((text) => text.text)
    .join(' | ');

describe('thioglycolates', () => {
  const pH: Asked = { category: 'hair-lotion', facts: { pH: '8' } };
  const professional: Asked = { ...pH, flags: { professionalUseOnly: true } };

  test('a hair product that stays on bears the words of letter (a)', () => {
    expect(saidOf('Thioglycolic Acid', '8', pH)).toEqual([]);
    expect(saidOf('Thioglycolic Acid', '8.0000001', pH)).toEqual(['limit-exceeded Thioglycolic Acid eu/annex-iii/2a/a-i']);
    expect(wordsOf(one('Thioglycolic Acid', '8'), pH)).toBe('Avoid contact with eyes. Rinse eyes immediately if product comes into contact with them. | Wear suitable gloves | Contains thioglycolate. Follow the instructions. Keep out of reach of children.');
  });

  test('for professionals it may hold 11 %', () => {
    expect(saidOf('Thioglycolic Acid', '11', professional)).toEqual([]);
    expect(saidOf('Thioglycolic Acid', '11.0000001', professional)).toEqual(['limit-exceeded Thioglycolic Acid eu/annex-iii/2a/a-ii']);
    expect(wordsOf(one('Thioglycolic Acid', '11'), professional)).toContain('For professional use only. Contains thioglycolate. Follow the instructions.');
  });

  test('without its pH the limit is open', () => {
    expect(judge(one('Thioglycolic Acid', '1'), { category: 'hair-lotion' }).findings[0]).toMatchObject({ severity: 'decide', needs: ['pH'] });
  });

  test('esters for professionals are kept from children as well', () => {
    const asked: Asked = { category: 'hair-perm', facts: { pH: '8' }, flags: { professionalUseOnly: true } };
    expect(wordsOf(one('Glyceryl Thioglycolate', '1'), asked)).toContain('Contains thioglycolate. Follow the instructions. Keep out of reach of children. | For professional use only');
    const german = judge(one('Glyceryl Thioglycolate', '1'), asked).requiredWording.filter((text) => text.lang === 'de').map((text) => text.text).join(' ');
    expect(german).toContain('Enthält Ester der Thioglycolsäure.');
  });
});

describe('oxalic acid', () => {
  const hair: Asked = { category: 'hair-mask', flags: { professionalUseOnly: true } };
  test.each(['Dibutyl Oxalate', 'Diisobutyl Oxalate', 'Diisopropyl Oxalate', 'Dilithium Oxalate', 'Dipotassium Oxalate', 'Potassium Oxalate', 'Dipropyl Oxalate'])('%s is one of its esters and salts', (name) => {
    expect(saidOf(name, '5', hair)).toEqual([]);
    expect(saidOf(name, '5.0000001', hair)).toEqual([`limit-exceeded ${name} eu/annex-iii/3`]);
  });

  test('acid and ester count together', () => {
    expect(said(judge([{ name: 'Oxalic Acid', percent: '3' }, { name: 'Diethyl Oxalate', percent: '2' }], hair))).toEqual([]);
    expect(said(judge([{ name: 'Oxalic Acid', percent: '3' }, { name: 'Diethyl Oxalate', percent: '2.0000001' }], hair))).toEqual(['limit-exceeded Oxalic Acid eu/annex-iii/3']);
  });
});

describe('hydrogen peroxide', () => {
  test('on lashes it is for professionals alone', () => {
    expect(saidOf('Hydrogen Peroxide', '2', { category: 'brow-and-lash-dye' })).toEqual([]);
    expect(saidOf('Hydrogen Peroxide', '2.0000001', { category: 'brow-and-lash-dye' })).toEqual(['limit-exceeded Hydrogen Peroxide eu/annex-iii/12/f']);
    expect(said(judge(one('Hydrogen Peroxide', '1'), { category: 'mascara' }), 'not-for-this-use')).toHaveLength(1);
  });

  test('a tooth whitener states its share', () => {
    expect(notCheckedOf('Hydrogen Peroxide', { category: 'tooth-whitening' })).toContain('share of hydrogen peroxide in percent');
  });
});

describe('lyes', () => {
  test('potassium hydroxide softens callosities up to 1.5 % of sodium hydroxide: 2.10409… %', () => {
    // 1.5 × 56.105 / 39.997
    expect(saidOf('Potassium Hydroxide', '2.104', { category: 'callus-softener' })).toEqual([]);
    expect(saidOf('Potassium Hydroxide', '2.1041', { category: 'callus-softener' })).toEqual(['limit-exceeded Potassium Hydroxide eu/annex-iii/15d']);
    expect(wordsOf(one('Potassium Hydroxide', '1'), { category: 'callus-softener' })).toContain('Read directions for use carefully');
  });

  test('sodium hydroxide there is a pH adjuster as elsewhere', () => {
    expect(saidOf('Sodium Hydroxide', '0.5', { category: 'callus-softener', facts: { pH: '11' } })).toEqual([]);
    expect(saidOf('Sodium Hydroxide', '0.5', { category: 'callus-softener', facts: { pH: '11.1' } })).toEqual(['not-for-this-use Sodium Hydroxide eu/annex-iii/15a/d']);
  });

  test.each(['Lithium Hydroxide', 'Calcium Hydroxide'])('%s in a depilatory is called alkali', (name) => {
    expect(wordsOf(one(name, '1'), { category: 'depilatory', facts: { pH: '12' } })).toBe('Contains alkali. Keep out of reach of children. Avoid contact with eyes.');
    expect(said(judge(one(name, '1'), { category: 'depilatory', facts: { pH: '12.7' } }), 'not-for-this-use')).toHaveLength(1);
  });
});

test('quinine salts count as quinine', () => {
  // 0.5 × 360.882 / 324.424 = 0.55618…; 0.5 × 746.92 / 648.848 = 0.57557…
  expect(saidOf('Quinine Hydrochloride', '0.5561', { category: 'shampoo' })).toEqual([]);
  expect(saidOf('Quinine Hydrochloride', '0.5562', { category: 'shampoo' })).toEqual(['limit-exceeded Quinine Hydrochloride eu/annex-iii/21/a']);
  expect(saidOf('Quinine Sulfate', '0.5755', { category: 'shampoo' })).toEqual([]);
  expect(saidOf('Quinine Sulfate', '0.5756', { category: 'shampoo' })).toEqual(['limit-exceeded Quinine Sulfate eu/annex-iii/21/a']);
});

describe('resorcinol', () => {
  test('in an oxidative dye it bears its own words after those of all hair dyes', () => {
    expect(wordsOf(one('Resorcinol', '1.25'), { category: 'hair-dye-oxidative' })).toMatch(/^Hair colourants can cause .* Contains resorcinol\. Rinse hair well after application\. Rinse eyes immediately if product comes into contact with them\. Do not use to dye eyelashes\.$/s);
    expect(notCheckedOf('Resorcinol', { category: 'hair-dye-oxidative' })).toContain('mixing ratio');
  });

  test('in a lash dye its name stands after the professional use', () => {
    expect(wordsOf(one('Resorcinol', '1.25'), { category: 'brow-and-lash-dye' })).toMatch(/^For professional use only\. Contains resorcinol\. This product can cause severe allergic reactions\./);
  });
});

test('zinc phenolsulfonate is at home in astringent lotions too', () => {
  expect(saidOf('Zinc Phenolsulfonate', '6', { category: 'face-toner' })).toEqual([]);
  expect(saidOf('Zinc Phenolsulfonate', '6.0000001', { category: 'aftershave' })).toContain('limit-exceeded Zinc Phenolsulfonate eu/annex-iii/25');
  expect(said(judge(one('Zinc Phenolsulfonate', '1'), { category: 'face-cream' }), 'not-for-this-use')).toHaveLength(1);
});

/** Fluorine: 18.998 of 41.988 in sodium fluoride, 18.998 of 143.949 in the monofluorophosphate. */
describe('words for children on toothpaste with fluorine', () => {
  const paste: Asked = { category: 'toothpaste' };
  const CHILDREN = 'Children of 6 years and younger';

  test('are due from 0.1 % on', () => {
    // 0.1 × 41.988 / 18.998 = 0.22101273…
    expect(wordsOf(one('Sodium Fluoride', '0.2210127'), paste)).not.toContain(CHILDREN);
    expect(wordsOf(one('Sodium Fluoride', '0.2210128'), paste)).toContain(CHILDREN);
  });

  test('go by the fluorine of all compounds together', () => {
    const both: Given[] = [{ name: 'Sodium Fluoride', percent: '0.12' }, { name: 'Sodium Monofluorophosphate', percent: '0.4' }];
    expect(wordsOf(both, paste)).toContain(CHILDREN);
    expect(wordsOf([both[0]!], paste)).not.toContain(CHILDREN);
    expect(wordsOf([both[1]!], paste)).not.toContain(CHILDREN);
  });

  test('stay away from mouthwash, and from a paste for adults only', () => {
    expect(wordsOf(one('Sodium Fluoride', '0.3'), { category: 'mouthwash' })).toBe('Contains sodium fluoride');
    expect(wordsOf(one('Sodium Fluoride', '0.3'), { ...paste, facts: { adultsOnly: true } })).toBe('Contains sodium fluoride');
  });
});

describe('members of the classes', () => {
  test.each([
    ['Olivamide DEA', '60'],
    ['MEA-Lauryl Sulfate', '61'],
    ['Lauramine', '61'],
    ['TEA-Carbomer', '62'],
    ['Dimethyl Stearamine', '62'],
    ['Polyquaternium-7', '66'],
    ['Acrylates/Acrylamide Copolymer', '66'],
  ])('%s stands in entry %s', (name, entry) => {
    expect(judge(one(name, '0.1'), { category: 'body-lotion' }).notChecked.map((item) => item.rule)).toContain(`eu/annex-iii/${entry}`);
  });

  test('trialkylamines and their salts count together in what stays on', () => {
    const pair = (share: string): Given[] => [{ name: 'TEA-Stearate', percent: '1.5' }, { name: 'Dimethyl Stearamine', percent: share }];
    expect(said(judge(pair('1'), { category: 'body-lotion' }))).toEqual([]);
    expect(said(judge(pair('1.0000001'), { category: 'body-lotion' }))).toEqual(['limit-exceeded TEA-Stearate eu/annex-iii/62/a']);
  });

  test('a UV filter that is such a salt is left to Annex VI', () => {
    expect(said(judge([{ name: 'TEA-Phenylbenzimidazole Sulfonate', percent: '4', purpose: 'uv-filter' }], { category: 'sunscreen-lotion' })).filter((line) => line.includes('annex-iii/62'))).toEqual([]);
  });

  test('zinc glycinate counts as zinc: 3.26549… % holds 1 %', () => {
    // 213.498 / 65.38
    expect(said(judge(one('Zinc Glycinate', '3.2654'), { category: 'face-cream' }), 'limit-exceeded')).toEqual([]);
    expect(said(judge(one('Zinc Glycinate', '3.2655'), { category: 'face-cream' }), 'limit-exceeded')).toHaveLength(1);
  });
});

describe('fragrance substances in pressurised packs', () => {
  test('a mousse from an aerosol is judged as a spray on the hair', () => {
    expect(saidOf('Methyl Salicylate', '0.009', { category: 'hair-mousse' })).toEqual([]);
    expect(saidOf('Methyl Salicylate', '0.0090001', { category: 'hair-mousse' })).toEqual(['limit-exceeded Methyl Salicylate eu/annex-iii/324/d']);
    expect(saidOf('Methyl Salicylate', '0.06', { category: 'hair-gel' })).toEqual([]);
    expect(saidOf('Benzyl Salicylate', '0.5000001', { category: 'hair-mousse', ...LATER })).toEqual(['limit-exceeded Benzyl Salicylate eu/annex-iii/75/e']);
  });

  test('benzyl salicylate in an eye cream is a skin product that stays on', () => {
    expect(saidOf('Benzyl Salicylate', '0.5', { category: 'eye-cream', ...LATER })).toEqual([]);
    expect(saidOf('Benzyl Salicylate', '0.5000001', { category: 'eye-cream', ...LATER })).toEqual(['limit-exceeded Benzyl Salicylate eu/annex-iii/75/d']);
  });
});

test('conditions of the whole entry are listed for each of its letters', () => {
  expect(notCheckedOf('Alpha-Arbutin', { category: 'face-cream' })).toContain('Hydroquinone');
  expect(notCheckedOf('Alpha-Arbutin', { category: 'body-lotion' })).toContain('Hydroquinone');
  for (const category of ['eau-de-toilette', 'deodorant-stick', 'foundation', 'face-cream', 'body-wash']) {
    expect(notCheckedOf('Vetiveryl Acetate', { category, ...LATER }), category).toContain('alpha-tocopherol');
  }
  expect(judge([{ name: 'Benzalkonium Chloride', percent: '1', purpose: 'other' }], { category: 'shampoo' }).notChecked.map((item) => item.words).join(' ')).toContain('C14 or less');
  expect(judge([{ name: 'Triclocarban', percent: '1', purpose: 'other' }], { category: 'body-wash' }).notChecked.map((item) => item.words).join(' ')).toContain('tetrachloroazobenzene');
});

describe('citral by where it stays', () => {
  test.each<[string, string, string]>([
    ['lip-balm', '0.11', 'a'],
    ['deodorant-stick', '0.032', 'b'],
    ['intimate-deodorant-spray', '0.032', 'b'],
    ['foundation', '0.65', 'c'],
    ['eau-de-toilette', '0.6', 'd'],
    ['face-cream', '0.15', 'e'],
    ['wet-wipes', '0.15', 'e'],
    ['nail-oil', '0.15', 'e'],
    ['toothpaste', '0.35', 'f'],
    ['hair-gel', '1.2', 'g'],
    ['shampoo', '1.2', 'h'],
    ['baby-wipes', '0.063', 'i'],
    ['intimate-wipes', '0.063', 'i'],
  ])('%s: %s %% (%s)', (category, limit, letter) => {
    const asked: Asked = { category, placed: '2028-08-01', available: '2028-08-01' };
    const [whole, part = ''] = limit.split('.');
    expect(saidOf('Citral', limit, asked)).toEqual([]);
    expect(said(judge(one('Citral', `${whole!}.${part.padEnd(6, '0')}1`), asked), 'limit-exceeded')).toEqual([`limit-exceeded Citral eu/annex-iii/70/${letter}`]);
  });
});

test('dihydroxyacetone bears no warning: the entry has none', () => {
  expect(saidOf('Dihydroxyacetone', '6.25', { category: 'hair-dye-non-oxidative' })).toEqual([]);
  expect(saidOf('Dihydroxyacetone', '6.2500001', { category: 'hair-dye-non-oxidative' })).toEqual(['limit-exceeded Dihydroxyacetone eu/annex-iii/322/a']);
  expect(wordsOf(one('Dihydroxyacetone', '6.25'), { category: 'hair-dye-non-oxidative' })).toBe('');
  expect(saidOf('Dihydroxyacetone', '10.0000001', { category: 'self-tan' })).toEqual(['limit-exceeded Dihydroxyacetone eu/annex-iii/322/b']);
});

/** Limits read from the official export; each is met exactly and then passed by the least bit. */
describe('fragrance substances and others at their limits', () => {
  test.each<[string, string, string, string]>([
    ['324/a', 'Methyl Salicylate', 'body-lotion', '0.06'],
    ['324/a', 'Methyl Salicylate', 'hair-gel', '0.06'],
    ['324/b', 'Methyl Salicylate', 'foundation', '0.05'],
    ['324/c', 'Methyl Salicylate', 'mascara', '0.002'],
    ['324/d', 'Methyl Salicylate', 'hair-spray', '0.009'],
    ['324/e', 'Methyl Salicylate', 'deodorant-spray', '0.003'],
    ['324/g', 'Methyl Salicylate', 'body-wash', '0.06'],
    ['324/h', 'Methyl Salicylate', 'hand-wash', '0.6'],
    ['324/i', 'Methyl Salicylate', 'eau-de-toilette', '0.6'],
    ['324/j', 'Methyl Salicylate', 'lip-balm', '0.03'],
    ['324/k', 'Methyl Salicylate', 'toothpaste', '2.52'],
    ['324/m', 'Methyl Salicylate', 'mouthwash', '0.6'],
    ['324/n', 'Methyl Salicylate', 'mouth-spray', '0.65'],
    ['75/a', 'Benzyl Salicylate', 'eau-de-toilette', '4'],
    ['75/b', 'Benzyl Salicylate', 'shampoo', '0.5'],
    ['75/c', 'Benzyl Salicylate', 'shower-gel', '1.3'],
    ['75/d', 'Benzyl Salicylate', 'face-cream', '0.5'],
    ['75/e', 'Benzyl Salicylate', 'hair-spray', '0.5'],
    ['75/f', 'Benzyl Salicylate', 'body-lotion', '0.7'],
    ['75/g', 'Benzyl Salicylate', 'foundation', '0.2'],
    ['75/h', 'Benzyl Salicylate', 'toothpaste', '0.004'],
    ['75/i', 'Benzyl Salicylate', 'deodorant-spray', '0.91'],
    ['380/a', 'Hexyl Salicylate', 'eau-de-toilette', '2'],
    ['380/b', 'Hexyl Salicylate', 'body-wash', '0.5'],
    ['380/c', 'Hexyl Salicylate', 'face-cream', '0.3'],
    ['380/d', 'Hexyl Salicylate', 'toothpaste', '0.001'],
    ['380/e', 'Hexyl Salicylate', 'mouthwash', '0.001'],
    ['380/f', 'Hexyl Salicylate', 'baby-lotion', '0.1'],
    ['382/a', 'Vetiveryl Acetate', 'eau-de-toilette', '0.9'],
    ['382/b', 'Vetiveryl Acetate', 'deodorant-stick', '0.05'],
    ['382/c', 'Vetiveryl Acetate', 'foundation', '0.05'],
    ['382/d', 'Vetiveryl Acetate', 'face-cream', '0.1'],
    ['382/e', 'Vetiveryl Acetate', 'body-wash', '0.2'],
    ['102/a', 'Methyl Eugenol', 'eau-de-parfum', '0.01'],
    ['102/b', 'Methyl Eugenol', 'eau-de-toilette', '0.004'],
    ['102/c', 'Methyl Eugenol', 'fragrance-cream', '0.002'],
    ['102/d', 'Methyl Eugenol', 'face-cream', '0.0002'],
    ['102/d', 'Methyl Eugenol', 'toothpaste', '0.0002'],
    ['102/e', 'Methyl Eugenol', 'body-wash', '0.001'],
    ['96/a', 'Musk Xylene', 'eau-de-parfum', '1'],
    ['96/b', 'Musk Xylene', 'eau-de-toilette', '0.4'],
    ['96/c', 'Musk Xylene', 'face-cream', '0.03'],
    ['97/a', 'Musk Ketone', 'eau-de-parfum', '1.4'],
    ['97/b', 'Musk Ketone', 'eau-de-toilette', '0.56'],
    ['97/c', 'Musk Ketone', 'face-cream', '0.042'],
    ['72/b', 'Hydroxycitronellal', 'face-cream', '1'],
    ['73/b', 'trans-Isoeugenol', 'face-cream', '0.02'],
    ['89/b', 'Methyl 2-Octynoate', 'face-cream', '0.01'],
    ['154', 'Myroxylon Pereirae Oil', 'face-cream', '0.4'],
    ['157/b', 'Rose ketone 4', 'face-cream', '0.02'],
    ['185', 'Toluene', 'nail-polish', '25'],
    ['186', 'Diethylene Glycol', 'face-cream', '0.1'],
    ['196', 'Lippia Citriodora Absolute', 'face-cream', '0.2'],
    ['325/a', 'BHT', 'mouthwash', '0.001'],
    ['325/b', 'BHT', 'toothpaste', '0.1'],
    ['325/c', 'BHT', 'body-wash', '0.8'],
    ['373', 'Genistein', 'face-cream', '0.007'],
    ['374', 'Daidzein', 'face-cream', '0.02'],
    ['375', 'Kojic Acid', 'hand-cream', '1'],
    ['376/a', 'Retinol', 'body-lotion', '0.05'],
    ['376/b', 'Retinol', 'face-cream', '0.3'],
    ['377/a', 'Alpha-Arbutin', 'face-cream', '2'],
    ['377/b', 'Alpha-Arbutin', 'body-lotion', '0.5'],
    ['378', 'Arbutin', 'face-cream', '7'],
    ['22/c', 'Resorcinol', 'shampoo', '0.5'],
    ['4', 'Ammonia', 'hair-mask', '6'],
    ['17', 'Sodium Nitrite', 'shaving-foam', '0.2'],
    ['53/a', 'Etidronic Acid', 'shampoo', '1.5'],
    ['53/b', 'Etidronic Acid', 'soap-bar', '0.2'],
  ])('III/%s %s in %s: %s %%', (rule, name, category, limit) => {
    const asked: Asked = { category, placed: '2028-08-01', available: '2028-08-01' };
    const [whole, part = ''] = limit.split('.');
    expect(said(judge(one(name, limit), asked), 'limit-exceeded', 'not-for-this-use')).toEqual([]);
    expect(said(judge(one(name, `${whole!}.${part.padEnd(6, '0')}1`), asked), 'limit-exceeded')).toEqual([`limit-exceeded ${name} eu/annex-iii/${rule}`]);
  });

  /** Aluminium is 26.982 of 133.332 in the chloride. */
  test.each<[string, string, string, string]>([
    ['a', 'deodorant-stick', '38.197', '38.198'], // 7.73 % of aluminium
    ['b', 'antiperspirant-spray', '16.010', '16.011'], // 3.24 % of aluminium
    ['c', 'toothpaste', '15.714', '15.715'], // 3.18 % of aluminium
    ['d', 'lip-balm', '72.244', '72.245'], // 14.62 % of aluminium
    ['e', 'body-wash', '4.397', '4.398'], // 0.89 % of aluminium
    ['f', 'soap-bar', '19.766', '19.767'], // 4 % of aluminium
    ['g', 'shampoo', '35.282', '35.283'], // 7.14 % of aluminium
    ['h', 'hair-spray', '0.741', '0.742'], // 0.15 % of aluminium
    ['i', 'hair-gel', '33.108', '33.109'], // 6.7 % of aluminium
    ['j', 'foundation', '113.654', '113.655'], // 23 % of aluminium
    ['k', 'eyeliner', '77.878', '77.879'], // 15.76 % of aluminium
    ['m', 'nail-polish', '17.838', '17.839'], // 3.61 % of aluminium
    ['n', 'mascara', '15.466', '15.467'], // 3.13 % of aluminium
    ['o', 'face-cream', '52.330', '52.331'], // 10.59 % of aluminium
    ['p', 'hand-cream', '4.249', '4.250'], // 0.86 % of aluminium
    ['q', 'body-lotion', '18.827', '18.828'], // 3.81 % of aluminium
    ['r', 'body-powder', '9.883', '9.884'], // 2 % of aluminium
  ])('III/381 (%s) in %s: %s %% of aluminium chloride passes and %s %% does not', (letter, category, at, over) => {
    const asked: Asked = { category, ...LATER };
    expect(said(judge(one('Aluminum Chloride', at), asked), 'limit-exceeded')).toEqual([]);
    expect(said(judge(one('Aluminum Chloride', over), asked), 'limit-exceeded')).toEqual([`limit-exceeded Aluminum Chloride eu/annex-iii/381/${letter}`]);
  });
});

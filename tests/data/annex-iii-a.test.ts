import { describe, expect, test } from 'vitest';
import { judge, said, type Asked } from '../shared/rules/judging.ts';
import { DYE, RINSE, LASH, HAIR, EYELASH, NONE, justOver, missingEntries, notCheckedOf, saidOf, tryClosedUses, tryLimits, tryTogether, wordsOf, type Limit } from './annex-iii-cases.ts';

/**
 * Entries 1 to 130 of Annex III to Regulation (EC) No 1223/2009 that are not among the common ones.
 * Every figure here is written out by hand from the official export of 18 June 2026, not read out of the tables.
 */
const PRO: Asked = { flags: { professionalUseOnly: true } };
const HOME: Asked = { flags: { professionalUseOnly: false } };
const pH = (value: string): Asked => ({ facts: { pH: value } });
const NAILS = 'For professional use only. Avoid skin contact. Read directions for use carefully.';

const LIMITS: readonly Limit[] = [
  ['5', 'Chloramine T', 'body-wash', '0.2', NONE],
  ['6/a', 'Sodium Chlorate', 'toothpaste', '5', NONE],
  ['6/b', 'Potassium Chlorate', 'mouthwash', '3', NONE],
  ['8/a', 'N-Phenyl-p-Phenylenediamine', DYE, '3', 'Contains phenylenediamines. Do not use to dye eyelashes or eyebrows.', HOME],
  ['8/b', 'N-Phenyl-p-Phenylenediamine', DYE, '3', 'Contains phenylenediamines. Wear suitable gloves.', PRO],
  ['8a/a', 'p-Phenylenediamine', DYE, '2', 'Contains phenylenediamines. Do not use to dye eyelashes or eyebrows.', HOME],
  ['8a/b', 'p-Phenylenediamine', DYE, '2', 'Contains phenylenediamines. Wear suitable gloves.', PRO],
  ['8b', 'p-Phenylenediamine', LASH, '2', 'Contains phenylenediamines. Wear suitable gloves.', PRO],
  ['8b', 'p-Phenylenediamine', LASH, '2', EYELASH, PRO],
  ['8c/a', "N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", DYE, '1', HAIR],
  ['8c/b', "N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", RINSE, '1.5', NONE],
  ['9a/a-i', 'Toluene-2,5-Diamine', DYE, '2', 'Contains phenylenediamines (toluenediamines). Do not use to dye eyelashes.', HOME],
  ['9a/a-ii', 'Toluene-2,5-Diamine', DYE, '2', 'Wear suitable gloves. For professional use only.', PRO],
  ['9a/b', 'Toluene-2,5-Diamine', LASH, '2', EYELASH, PRO],
  ['9b', '2,6-Dihydroxyethylaminotoluene', DYE, '1', HAIR],
  ['11', 'Dichlorophene', 'body-wash', '0.5', 'Contains Dichlorophen'],
  ['14', 'Hydroquinone', 'artificial-nails', '0.02', NAILS, PRO],
  ['16', '1-Naphthol', DYE, '2', HAIR],
  ['18', 'Nitromethane', 'hair-spray', '0.3', NONE],
  ['44/a', 'Dimethylol Ethylene Thiourea', 'shampoo', '2', 'Contains Dimethylol ethylene thiourea'],
  ['44/b', 'Dimethylol Ethylene Thiourea', 'nail-hardener', '2', 'Contains Dimethylol ethylene thiourea', pH('3.9')],
  ['48', 'Silver Nitrate', LASH, '4', 'Contains silver nitrate'],
  ['49', 'Selenium Sulfide', 'antidandruff-shampoo', '1', 'Contains selenium disulphide'],
  ['50', 'Aluminum Zirconium Tetrachlorohydrex Gly', 'antiperspirant-stick', '20', 'Do not apply to irritated or damaged skin'],
  ['52', 'Methyl Alcohol', 'eau-de-toilette', '5', NONE],
  ['93', 'Diaminopyrimidine Oxide', 'scalp-tonic', '1.5', NONE],
  ['94', 'Benzoyl Peroxide', 'artificial-nails', '0.7', NAILS, PRO],
  ['95', 'p-Hydroxyanisole', 'artificial-nails', '0.02', NAILS, PRO],
];

describe('limits', () => tryLimits(LIMITS));

/** Limits on a basis that the substance is not: the share worked out by hand on either side of the limit, in percent. */
describe('limits of salts', () => {
  test.each<[string, string, string, string, string, Asked]>([
    // 2 % of base 108.144: 3.34849… % of the dihydrochloride 181.06, 3.81373… % of the sulfate 206.216
    ['8a/a', 'p-Phenylenediamine HCl', DYE, '3.3484', '3.3485', HOME],
    ['8a/b', 'p-Phenylenediamine Sulfate', DYE, '3.8137', '3.8138', PRO],
    ['8b', 'p-Phenylenediamine Sulfate', LASH, '3.8137', '3.8138', PRO],
    // 3 % of base 184.242: 3.59363… % of the hydrochloride 220.7
    ['8/a', 'N-Phenyl-p-Phenylenediamine HCl', DYE, '3.5936', '3.5937', HOME],
    // two bases of 184.242 in 466.556: 3.79845… %
    ['8/a', 'N-Phenyl-p-Phenylenediamine Sulfate', DYE, '3.7984', '3.7985', HOME],
    // 2 % of base 122.171: 3.60548… % of the sulfate 220.243
    ['9a/a-i', 'Toluene-2,5-Diamine Sulfate', DYE, '3.6054', '3.6055', HOME],
    ['9a/b', 'Toluene-2,5-Diamine Sulfate', LASH, '3.6054', '3.6055', PRO],
    // 2 % of sulfur 32.06: 4.86837… % of sodium sulfide 78.04; 6 %: 13.50056… % of calcium sulfide 72.138
    ['23/a', 'Sodium Sulfide', 'depilatory', '4.8683', '4.8684', pH('12.7')],
    ['23/b', 'Calcium Sulfide', 'depilatory', '13.5005', '13.5006', pH('12.7')],
    // 3.5 % of strontium 87.62: 6.33211… % of the chloride 158.52, 10.64977… % of its hexahydrate 266.61, 8.21702… % of the acetate 205.708
    ['strontium-total/a', 'Strontium Chloride', 'toothpaste', '6.3321', '6.3322', {}],
    ['strontium-total/a', 'Strontium Chloride Hexahydrate', 'toothpaste', '10.6497', '10.6498', {}],
    ['strontium-total/a', 'Strontium Acetate', 'toothpaste', '8.217', '8.2171', {}],
    // 2.1 % of strontium: 3.79926… % of the chloride
    ['strontium-total/b', 'Strontium Chloride', 'shampoo', '3.7992', '3.7993', {}],
    // 3.5 %: 4.85869… % of the hydroxide 121.634; 4.5 %: 6.14335… % of the peroxide 119.618
    ['63', 'Strontium Hydroxide', 'depilatory', '4.8586', '4.8587', pH('12.7')],
    ['64', 'Strontium Peroxide', 'hair-bleach', '6.1433', '6.1434', PRO],
  ])('III/%s %s in %s: %s %% but not %s %%', (rule, name, category, under, over, more) => {
    const asked = { category, ...more };
    expect(saidOf(name, under, asked)).toEqual([]);
    expect(saidOf(name, over, asked)).toEqual([`limit-exceeded ${name} eu/annex-iii/${rule}`]);
  });

  test('oxyquinoline sulfate beside hydrogen peroxide: 0.3 % as base rinsed off, 0.03 % left on', () => {
    // 0.3 % of base, twice 145.161 in 388.394: 0.401341… %
    const tried = (percent: string, category: string): string[] => said(judge([{ name: 'Oxyquinoline Sulfate', percent }, { name: 'Hydrogen Peroxide', percent: '1' }], { category, flags: { professionalUseOnly: false } }));
    expect(tried('0.4013', 'hair-bleach')).toEqual([]);
    expect(tried('0.4014', 'hair-bleach')).toEqual(['limit-exceeded Oxyquinoline Sulfate eu/annex-iii/51/a']);
    expect(tried('0.0401', 'hair-lotion')).toEqual([]);
    expect(tried('0.0402', 'hair-lotion')).toEqual(['limit-exceeded Oxyquinoline Sulfate eu/annex-iii/51/b']);
    expect(saidOf('Oxyquinoline Sulfate', '0.01', { category: 'hair-bleach' })).toHaveLength(1);
  });
});

describe('substances of one entry count together', () => {
  tryTogether([
    ['6/a', 'Potassium Chlorate', 'Sodium Chlorate', '2.5', { category: 'toothpaste' }],
    ['50', 'Aluminum Zirconium Trichlorohydrate', 'Aluminum Zirconium Tetrachlorohydrate', '10', { category: 'antiperspirant-stick' }],
  ]);

  test('the sulfides of the alkalis do not count with those of the alkaline earths', () => {
    // 2 % and 6 % as sulfur, each just below
    const both = [{ name: 'Sodium Sulfide', percent: '4.86' }, { name: 'Calcium Sulfide', percent: '13.5' }];
    expect(said(judge(both, { category: 'depilatory', ...pH('12') }))).toEqual([]);
    expect(said(judge([...both, { name: 'Potassium Sulfide', percent: '1' }], { category: 'depilatory', ...pH('12') }), 'limit-exceeded')).toHaveLength(1);
  });

  test('strontium of the chloride and the acetate counts together', () => {
    const pair = (percent: string) => said(judge([{ name: 'Strontium Chloride', percent: '3.1' }, { name: 'Strontium Acetate', percent }], { category: 'toothpaste' }), 'limit-exceeded');
    // 3.1 % of the chloride is 1.7134… % of strontium; 1.7865… % is left: 4.1942… % of the acetate
    expect(pair('4.194')).toEqual([]);
    expect(pair('4.195')).toEqual(['limit-exceeded Strontium Acetate eu/annex-iii/strontium-total/a']);
  });

  test('the compound of entry 38 joins the fluorine of the other entries', () => {
    const name = "N,N',N'-Tris(Polyoxyethylene)-N-Hexadecylpropylenediamine Dihydrofluoride";
    // 0.15 % of fluorine, two of 18.998 in 498.784 at most: 1.96909… %
    expect(saidOf(name, '1.969', { category: 'toothpaste' })).toEqual([]);
    expect(saidOf(name, '1.9692', { category: 'toothpaste' })).toHaveLength(1);
    expect(said(judge([{ name, percent: '1.2' }, { name: 'Sodium Fluoride', percent: '0.2' }], { category: 'toothpaste' }), 'limit-exceeded')).toHaveLength(1);
    expect(wordsOf(name, '0.1', { category: 'toothpaste' })).toContain('Contains N,N');
  });
});

describe('uses that an entry does not open', () => {
  tryClosedUses([
    ['p-Phenylenediamine', RINSE, '8a/a'],
    ['N-Phenyl-p-Phenylenediamine', 'shampoo', '8/a'],
    ["N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", 'shampoo', '8c/a'],
    ['Toluene-2,5-Diamine', RINSE, '9a/a-i'],
    ['2,6-Dihydroxyethylaminotoluene', RINSE, '9b'],
    ['1-Naphthol', RINSE, '16'],
    ['Sodium Sulfide', 'body-wash', '23/a'],
    ['Dimethylol Ethylene Thiourea', 'face-cream', '44/a'],
    ['Silver Nitrate', 'face-cream', '48'],
    ['Selenium Sulfide', 'shampoo', '49'],
    ['Aluminum Zirconium Trichlorohydrate', 'face-cream', '50'],
    ['Strontium Chloride', 'body-lotion', '57/a'],
    ['Strontium Acetate', 'shampoo', '58'],
    ['Strontium Hydroxide', 'shampoo', '63'],
    ['Strontium Peroxide', 'face-cream', '64'],
    ['Diaminopyrimidine Oxide', 'face-cream', '93'],
    ['Benzoyl Peroxide', 'face-cream', '94'],
    ['p-Hydroxyanisole', 'face-cream', '95'],
  ]);

  test('oxyquinoline sulfate elsewhere is what Annex II, entry 395, prohibits', () => {
    expect(saidOf('Oxyquinoline Sulfate', '0.0001', { category: 'face-cream' })).toEqual(expect.arrayContaining(['prohibited Oxyquinoline Sulfate eu/annex-ii/395', 'not-for-this-use Oxyquinoline Sulfate eu/annex-iii/51/a']));
  });

  test('hydroquinone elsewhere is what Annex II, entry 1339, prohibits', () => {
    expect(saidOf('Hydroquinone', '0.0001', { category: 'face-cream' })).toEqual(['prohibited Hydroquinone eu/annex-ii/1339', 'not-for-this-use Hydroquinone eu/annex-iii/14']);
  });

  test('what is for professionals stays with them', () => {
    for (const [name, category, rule] of [['Hydroquinone', 'artificial-nails', '14'], ['Benzoyl Peroxide', 'artificial-nails', '94'], ['p-Phenylenediamine', LASH, '8a/a'], ['Strontium Peroxide', 'hair-bleach', '64']] as const) {
      expect(saidOf(name, '0.01', { category, ...HOME }), name).toEqual([`not-for-this-use ${name} eu/annex-iii/${rule}`]);
    }
  });

  test('two are not for sprays', () => {
    const spray: Asked = { flags: { aerosol: true } };
    expect(saidOf('Dimethylol Ethylene Thiourea', '0.1', { category: 'hair-spray', ...spray })).toHaveLength(1);
    expect(saidOf('Aluminum Zirconium Trichlorohydrate', '0.1', { category: 'antiperspirant-spray', ...spray })).toHaveLength(1);
    expect(saidOf('Aluminum Zirconium Trichlorohydrate', '0.1', { category: 'antiperspirant-stick' })).toEqual([]);
  });
});

describe('pH', () => {
  test.each([
    ['Sodium Sulfide', 'depilatory', '12.7', '12.8'],
    ['Strontium Hydroxide', 'depilatory', '12.7', '12.8'],
    ['Dimethylol Ethylene Thiourea', 'nail-hardener', '3.99', '4'],
  ])('%s in %s: %s but not %s', (name, category, good, bad) => {
    expect(saidOf(name, '0.1', { category, ...pH(good) })).toEqual([]);
    expect(saidOf(name, '0.1', { category, ...pH(bad) })).toHaveLength(1);
  });
});

describe('days', () => {
  const dyes = [["N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", DYE, '1'], ["N,N'-Bis(2-Hydroxyethyl)-2-Nitro-p-Phenylenediamine", RINSE, '1.5'], ['2,6-Dihydroxyethylaminotoluene', DYE, '1']] as const;
  const on = (day: string, category: string): Asked => ({ category, placed: day, available: day });

  test.each(dyes)('%s in %s is limited from 3 September 2017', (name, category, limit) => {
    const broken = (day: string): string[] => saidOf(name, justOver(limit), on(day, category)).filter((one) => one.startsWith('limit-exceeded'));
    expect(saidOf(name, justOver(limit), on('2017-09-02', category)).filter((one) => !one.startsWith('upcoming '))).toEqual([]);
    expect(broken('2017-09-03')).toHaveLength(1);
    expect(broken('2017-09-04')).toHaveLength(1);
  });

  test.each(dyes.filter(([, category]) => category === DYE))('%s in %s bears its words from 3 March 2018', (name, category) => {
    expect(wordsOf(name, '0.1', on('2018-03-02', category))).toBe('');
    expect(wordsOf(name, '0.1', on('2018-03-03', category))).toContain(HAIR);
    expect(wordsOf(name, '0.1', on('2018-03-04', category))).toContain(HAIR);
  });
});

test.each([
  ['Strontium Chloride', 'toothpaste', 'Contains strontium chloride'],
  ['Strontium Acetate', 'toothpaste', 'Contains strontium acetate'],
  ['Strontium Hydroxide', 'depilatory', 'Avoid contact with the eyes'],
  ['Sodium Sulfide', 'depilatory', 'Keep out of reach of children'],
])('%s in %s bears its words', (name, category, words) => {
  expect(wordsOf(name, '0.1', { category })).toContain(words);
});

test.each([
  ['Abies Alba Needle Oil'], ['Abies Pectinata Oil'], ['Abies Sibirica Oil'], ['Abies Balsamea Needle Oil'], ['Pinus Mugo Pumilio Twig Leaf Oil'], ['Pinus Sylvestris Leaf Oil'],
  ['Pinus Nigra Twig Leaf Oil'], ['Pinus Palustris Oil'], ['Pinus Pinaster Twig Leaf Oil'], ['Pinus Species Twig Leaf Oil'], ['Pinus Cembra Twig Leaf Oil'],
  ['Pinus Cembra Twig Leaf Extract Acetylated'], ['Picea Mariana Leaf Oil'], ['Thuja Occidentalis Leaf Oil'], ['3-Carene'], ['Cupressus Sempervirens Leaf Oil'],
  ['Terpene Alcohols Acetates'], ['Terpene Hydrocarbons'], ['Terpenes and Terpenoids'], ['Terpenes and Terpenoids Sinpine'],
])('%s asks for a peroxide value below 10', (name) => {
  expect(notCheckedOf(name, { category: 'body-wash' })).toContain('Peroxide value of the substance below 10 mmol/L.');
});

test('what of an entry is not computed is listed', () => {
  expect(notCheckedOf('Methyl Alcohol', { category: 'eau-de-toilette' })).toContain('at most 5 % of these two together');
  expect(notCheckedOf('Aluminum Zirconium Trichlorohydrate', { category: 'antiperspirant-stick' })).toContain('5.4 % as zirconium');
  expect(notCheckedOf('Toluene-2,5-Diamine Sulfate', { category: DYE, ...HOME })).toContain('3.6 % of the sulfate');
});

test('no entry from 1 to 130 is missing but those that the Annex has no more, or only with a letter or in a group', () => {
  expect(missingEntries(101, 130)).toEqual(['101', '104', '120', '125', '126']);
  expect(missingEntries(1, 100)).toEqual(['1', '2', '7', '9', '10', '13', '15', '19', '20', '55', '68', '79', '83']);
});

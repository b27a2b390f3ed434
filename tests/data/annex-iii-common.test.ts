import { describe, expect, test } from 'vitest';
import { judge, said, type Asked, type Given } from '../shared/rules/judging.ts';

/**
 * The entries of Annex III to Regulation (EC) No 1223/2009 that makers meet most, as read against
 * the official export of 18 June 2026 and the texts of warnings. Figures are written out by hand.
 */
const LATER: Asked = { placed: '2027-01-01', available: '2028-07-01' };

const one = (name: string, percent: string): Given[] => [{ name, percent }];
const saidOf = (name: string, percent: string, asked: Asked): string[] => said(judge(one(name, percent), asked));
const wordsOf = (given: readonly Given[], asked: Asked): string =>
  judge(given, asked)
    .requiredWording.filter((text) => text.lang === 'en')
    .map((text) => text.text)
    .join(' | ');
const notChecked = (name: string, asked: Asked): string => judge(one(name, '0.0001'), asked).notChecked.map((item) => item.words).join(' ');

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
    expect(notChecked('Hydrogen Peroxide', { category: 'tooth-whitening' })).toContain('share of hydrogen peroxide in percent');
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
    expect(notChecked('Resorcinol', { category: 'hair-dye-oxidative' })).toContain('mixing ratio');
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
  expect(notChecked('Alpha-Arbutin', { category: 'face-cream' })).toContain('Hydroquinone');
  expect(notChecked('Alpha-Arbutin', { category: 'body-lotion' })).toContain('Hydroquinone');
  for (const category of ['eau-de-toilette', 'deodorant-stick', 'foundation', 'face-cream', 'body-wash']) {
    expect(notChecked('Vetiveryl Acetate', { category, ...LATER }), category).toContain('alpha-tocopherol');
  }
  expect(judge([{ name: 'Benzalkonium Chloride', percent: '1', purpose: 'other' }], { category: 'shampoo' }).notChecked.map((item) => item.words).join(' ')).toContain('C14 or less');
  expect(judge([{ name: 'Triclocarban', percent: '1', purpose: 'other' }], { category: 'body-wash' }).notChecked.map((item) => item.words).join(' ')).toContain('tetrachloroazobenzene');
});

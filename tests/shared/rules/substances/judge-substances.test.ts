import { describe, expect, test } from 'vitest';
import { judge, said } from '../judging.ts';

describe('prohibited substances', () => {
  test.each([
    ['Butylphenyl Methylpropional', 'eu/annex-ii/1666'],
    ['Hydroxyisohexyl 3-Cyclohexene Carboxaldehyde', 'eu/annex-ii/1380'],
    ['Cyclotetrasiloxane', 'eu/annex-ii/1388'],
    ['Zinc Pyrithione', 'eu/annex-ii/1670'],
    ['Isobutylparaben', 'eu/annex-ii/1375'],
    ['Sodium Perborate', 'eu/annex-ii/1397'],
  ])('%s stops sale', (name, rule) => {
    expect(said(judge([{ name, percent: '0.001' }]))).toContain(`prohibited ${name} ${rule}`);
  });

  test('inside a perfume it is prohibited all the same', () => {
    expect(said(judge([{ name: 'Butylphenyl Methylpropional', percent: '0.001', as: 'hidden' }]))).toHaveLength(1);
  });

  test('an impurity is left to the assessor and listed as not checked', () => {
    const verdict = judge([{ name: 'Acetaldehyde', percent: '0.0001', as: 'incidental' }]);
    expect(said(verdict)).toEqual([]);
    expect(verdict.notChecked.map((one) => one.rule)).toEqual(['eu/annex-ii/1391']);
  });

  test('what is prohibited in hair dyes colours a lotion lawfully', () => {
    expect(said(judge([{ name: 'CI 45430', percent: '0.1' }], { category: 'body-lotion' }))).toEqual([]);
    expect(said(judge([{ name: 'CI 45430', percent: '0.1' }], { category: 'hair-dye-oxidative' }))).toEqual(['prohibited CI 45430 eu/annex-ii/1337']);
  });

  test('safrole is lawful only as a natural constituent, up to 100 ppm', () => {
    expect(said(judge([{ name: 'Safrole', percent: '0.01', as: 'hidden' }]))).toEqual([]);
    expect(said(judge([{ name: 'Safrole', percent: '0.0101', as: 'hidden' }]))).toEqual(['limit-exceeded Safrole eu/annex-ii/360']);
    expect(said(judge([{ name: 'Safrole', percent: '0.0001' }]))).toEqual(['prohibited Safrole eu/annex-ii/360']);
  });

  test('gold is a colourant, nano gold is prohibited', () => {
    expect(said(judge([{ name: 'CI 77480', percent: '0.1' }], { category: 'lipstick' }))).toEqual([]);
    expect(said(judge([{ name: 'CI 77480', percent: '0.1', nano: true }], { category: 'lipstick' }))).toContain('prohibited CI 77480 eu/annex-ii/1728');
  });
});

test('ordinary ingredients say nothing', () => {
  const names = ['Aqua', 'Glycerin', 'Sodium Chloride', 'Cocamidopropyl Betaine', 'Decyl Glucoside', 'Xanthan Gum', 'Citric Acid', 'Tocopherol', 'Cetearyl Alcohol', 'Butyrospermum Parkii Butter', 'Parfum', 'Mica', 'Kaolin', 'Panthenol', 'Sodium Lauroyl Sarcosinate'];
  for (const market of ['EU', 'UK', 'US', 'CA'] as const) {
    expect(said(judge(names.map((name) => ({ name, percent: '5' })), { market, category: 'body-lotion' })), market).toEqual([]);
  }
});

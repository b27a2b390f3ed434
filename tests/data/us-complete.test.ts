/**
 * Every fact of the digest on the United States, and where it is held. Numbers are those of the
 * digest's items; figures, days and words are typed out here from 21 CFR parts 700, 701, 740, 73,
 * 74 and 82 and the Act, as far as they were read; what rests on memory says so in its row.
 */
import { describe, expect, test } from 'vitest';
import { lawTables } from '#shared/law/tables.ts';
import { judge, said, type Asked, type Given } from '#tests/shared/rules/judging.ts';
import { formula, line, material, part, present } from '#tests/support/engine.ts';
import { coverage, faultsOf, type Item } from './checklist.ts';
import { US_COLOURS } from './us-colours.ts';
import { US_NAMES } from './us-names.ts';

const US: Asked = { market: 'US' };
const found = (given: Given, asked: Asked = {}): string[] => said(judge([given], { ...US, ...asked }));
const claims = (text: string): string[] => judge([], { ...US, product: { claims: [{ text, lang: 'en' }] } }).findings.filter(({ kind }) => kind.startsWith('claim')).map(({ kind }) => kind);
const lacks = (field: string, asked: Asked = {}): boolean => said(judge([], { ...US, particulars: {}, ...asked }), 'particular-missing').some((one) => one.includes(` ${field} `));
const words = (rule: string, asked: Asked, given: readonly Given[] = []): string[] => judge([...given], { ...US, ...asked }).requiredWording.filter((one) => one.rule === rule).map(({ text }) => text);
const two = (a: string, b: string, share: string, rest: string, more: Parameters<typeof part>[2] = {}) => present(formula([material('m', [part(a, rest), part(b, share, more)])], [line('m', '100 g')], { product: { markets: ['US'] } }), { markets: ['US'] }).results[0]!.declaration;
const zoneOf = (share: string, rest: string, more: Parameters<typeof part>[2] = {}): string => two('Aqua', 'Glycerin', share, rest, more).entries.find(({ inci }) => inci === 'Glycerin')!.zone;
const printed = (name: string): string => present(formula([material('m', [part(name, '100')])], [line('m', '100 g')], { product: { markets: ['US'] } }), { markets: ['US'] }).results[0]!.declaration.entries.map((entry) => entry.name).join(' | ');
const shades = (category: string): string => present(formula([material('m', [part('Talc', '100')])], [line('m', '10 g')], { product: { category, markets: ['US'], mayContain: [{ inci: 'CI 77491' }] } }), { markets: ['US'] }).results[0]!.declaration.text;
const duty = (id: string) => ({ duty: `us/duty/${id}` }) as const;

const ITEMS: readonly Item[] = [
  ['A1–A8', 'the particulars', { shown: () => ['netContent', 'responsiblePerson'].every((field) => lacks(field)) }, duty('display-panel')],
  ['A5, F1', 'a contact for adverse events since 29 December 2024', { shown: () => !lacks('usContact', { placed: '2024-12-28', available: '2024-12-28' }) && lacks('usContact', { placed: '2024-12-29', available: '2024-12-29' }) && lacks('usContact', { placed: '2024-12-30', available: '2024-12-30' }) }],
  ['A10', 'what counts as labelling', duty('label-and-labelling')],
  ['A11', 'misbranding', duty('misbranding')],
  ['A12', 'a name that suggests an ingredient', { shown: () => present(formula([material('m', [part('Aqua', '100')])], [line('m', '100 g')], { product: { markets: ['US'], claims: [{ text: 'With real honey', lang: 'en' }] } }), { markets: ['US'] }).results[0]!.findings.some(({ kind }) => kind === 'claim-contradicted') }],
  ['A13', 'prominence', duty('prominence')],
  ['B1', 'descending order; fragrance as one word; kept from the public', { shown: () => two('Aqua', 'Parfum', '0.5', '99.5').text.includes('Fragrance') }, duty('undisclosed')],
  ['B2–B4, C', 'letters, panel, small packs', duty('display-panel')],
  ['B5, B6', 'precedence of names', duty('established-names')],
  ['B7', 'a product that is also a drug', duty('otc-order')],
  ['B8, B9', '1 % or less is free, colours in any order', { shown: () => zoneOf('1', '99') === 'free' && zoneOf('1.0000001', '98.9999999') === 'ordered' }, { shown: () => two('Aqua', 'CI 77491', '5', '95', { purpose: 'colourant' }).entries.at(-1)!.zone === 'colourant' }],
  ['B10', 'shades after “May contain”', { shown: () => /May contain/i.test(shades('eye-shadow')) && shades('eye-shadow').includes('Iron Oxides') }],
  ['B11', 'incidental ingredients', { shown: () => !two('Aqua', 'Sodium Chloride', '0.5', '99.5', { role: 'incidental' }).text.includes('Sodium Chloride') }],
  ['B12', 'substitutes', duty('may-also-contain')],
  ['B13, B14', 'lists beside the package, by mail', duty('off-package')],
  ['B15, F5', 'professional goods', duty('not-for-home-use'), { warning: 'us/609-c' }],
  ['B16', 'English names first', { shown: () => printed('Aqua') === 'Water' && two('Glycerin', 'Parfum', '0.5', '99.5').text.includes('Fragrance') }],
  ['B17', 'botanicals with their common name', { shown: () => US_NAMES.some(([, us]) => us.includes('(')) }],
  ['B18', 'short names of colours', duty('colour-letter'), { shown: () => printed('FD&C Yellow No. 5') === 'Yellow 5' && printed('Ext. D&C Violet No. 2') === 'Ext. Violet 2' && printed('D&C Red No. 6') === 'Red 6' }],
  ['D, E', 'name, place, quantity', { shown: () => lacks('netContent') }, duty('net-details')],
  ['F2, F3', 'fragrance allergens to come', duty('fragrance-allergens')],
  ['F6', 'adverse events', duty('adverse-events')],
  ['F7', 'practice, registration, listing', duty('good-manufacturing'), duty('registration')],
  ['F8', 'records that show safety', duty('safety-substantiation')],
  ['F9', 'small businesses', duty('small-business')],
  ['F10', 'laws of the states', duty('states')],
  ['G1', 'warnings wherever needed', duty('hazard-warnings')],
  ['G3', 'safety not determined', duty('safety-not-determined'), { wording: 'us-740-10', languages: ['en'] }],
  ['G4', 'aerosols', { warning: 'us/740.11-a' }, { warning: 'us/740.11-a-foam' }, { shown: () => words('us/740.11-a', { flags: { aerosol: true, spray: true } }).some((text) => text.startsWith('Warning—Avoid spraying in eyes.')) }],
  ['G5', 'propellants', { row: 'us/740.11-b' }],
  ['G6', 'intimate sprays', { warning: 'us/740.12' }],
  ['G7', 'foaming baths', { warning: 'us/740.17' }, { shown: () => words('us/740.17', { category: 'bubble-bath' }).some((text) => text.includes('Excessive use or prolonged exposure')) }],
  ['G8', 'coal-tar dyes found to cause cancer in animals', { row: 'us/740.18' }],
  ['G9', 'suntanning without a sunscreen', { warning: 'us/740.19' }],
  ['G10', 'the legend of coal-tar hair dyes', { warning: 'us/361-a' }],
  ['G11', 'alpha hydroxy acids', { row: 'us/guidance/aha' }],
  ['G12, 73.2190', 'henna', { row: 'us/73.2190' }],
  ['H1', 'bithionol', { row: 'us/700.11' }, { shown: () => found({ name: 'Bithionol', percent: '0.0001' }).some((one) => one.startsWith('prohibited')) }],
  ['H2', 'mercury', { row: 'us/700.13' }],
  ['H3', 'vinyl chloride', { row: 'us/700.14' }],
  ['H4', 'halogenated salicylanilides', { row: 'us/700.15' }],
  ['H5', 'zirconium in aerosols', { row: 'us/700.16' }],
  ['H6', 'chloroform', { row: 'us/700.18' }],
  ['H7', 'methylene chloride', { row: 'us/700.19' }],
  ['H8', 'chlorofluorocarbons', { row: 'us/700.23' }],
  ['H9', 'tamper-resistant packs', duty('tamper-resistant')],
  ['H10', 'cattle materials', { row: 'us/700.27' }, duty('cattle-materials')],
  ['H11', 'sunscreen terms make it a drug', { shown: () => claims('Sunscreen SPF 30').includes('claim-medicinal') }],
  ['H12', 'hexachlorophene', { row: 'us/250.250' }, { shown: () => found({ name: 'Hexachlorophene', percent: '0.1001', purpose: 'preservative' }).some((one) => one.startsWith('limit-exceeded')) && !found({ name: 'Hexachlorophene', percent: '0.1', purpose: 'preservative' }).some((one) => one.startsWith('limit-exceeded')) }],
  ['H13', 'microbeads', { row: 'us/331-ddd' }],
  ['H14', 'colours not listed', { shown: () => found({ name: 'CI 75300', percent: '1' }, { category: 'body-lotion' }).includes('use-not-listed CI 75300 us/colour/unlisted') }, duty('lots-of-colours')],
  ['I1', 'soap', duty('soap')],
  ['I2', 'the drug line', { shown: () => ['Treats acne', 'Reduces cellulite', 'Removes wrinkles', 'Restores hair growth', 'Boosts collagen production', 'Heals eczema'].every((text) => claims(text).includes('claim-medicinal')) }, { shown: () => !claims('Reduces the look of fine lines').includes('claim-medicinal') }],
  ['I3', 'always drugs', { shown: () => ['SPF 30', 'Antiperspirant', 'Fights dandruff', 'Prevents cavities', 'Bleaches the skin'].every((text) => claims(text).includes('claim-medicinal')) }],
];

test('every fact of the digest on the United States is held, or left open with a reason', () => {
  console.log(coverage('United States', ITEMS));
  expect(faultsOf(ITEMS)).toEqual([]);
});

describe('names that US labels print', () => {
  const several = new Set(US_NAMES.map(([eu]) => eu).filter((eu, i, all) => all.indexOf(eu) !== i));
  test.each(US_NAMES.map(([eu, us]) => [several.has(eu) ? us : eu, us] as const))('%s is printed as %s', (written, us) => {
    expect(printed(written).toLowerCase()).toBe(us.toLowerCase());
  });

  test('a specially denatured alcohol keeps its number', () => {
    expect(printed('SD Alcohol 40-B')).toBe('SD Alcohol 40-B');
  });
});

describe('colours by area of use', () => {
  const AREAS = [['eye', 'eye-shadow', 2], ['general', 'lipstick', 3], ['external', 'body-lotion', 4]] as const;
  const ciOf = (name: string): string => {
    const colour = lawTables.usColours.find((one) => one.name === name);
    const ci = colour?.ci[0];
    return ci ? `CI ${ci}` : name;
  };

  test('the table holds each of them, under its section', () => {
    for (const [name, section] of US_COLOURS) expect(lawTables.usColours.find((one) => one.name === name)?.cfr, name).toBe(section);
  });

  test.each(US_COLOURS.flatMap((row) => AREAS.flatMap(([area, category, at]) => (row[at] === 'some' ? [] : [[row[0], area, category, row[at]] as const]))))('%s, %s: in %s it is lawful: %s', (name, _area, category, lawful) => {
    const verdicts = found({ name: ciOf(name), percent: '0.001', purpose: 'colourant' }, { category, usName: name }).filter((one) => / us\/colour\//.test(one));
    expect(verdicts.length === 0 ? 'yes' : 'no').toBe(lawful);
  });

  test.each(['CI 45430', 'CI 73015', 'CI 12156'])('%s is not permitted in any US cosmetic', (name) => {
    for (const [, category] of AREAS) expect(found({ name, percent: '0.001', purpose: 'colourant' }, { category })[0]).toMatch(/^(use-not-listed|prohibited)/);
  });
});

/**
 * Every fact of the digest on Canada, and where it is held. Numbers are those of the digest's
 * items; figures, days and words are typed out here from the Cosmetic Regulations (C.R.C., c. 869)
 * and the Consumer Packaging and Labelling Regulations (C.R.C., c. 417), those of the hotlist from
 * pages that quote it and, where the row says so, from memory.
 */
import { describe, expect, test } from 'vitest';
import type { Exposure } from '#shared/law/types.ts';
import { minimumsFor } from '#shared/artwork/heights.ts';
import { netStatement } from '#shared/artwork/net-content.ts';
import { decimal } from '#shared/kernel/rational.ts';
import { shareAsBand } from '#shared/report/words.ts';
import { judge, law, said, type Asked, type Given } from '#tests/shared/rules/judging.ts';
import { dictionary, formula, inside, judge as assess, line, material, part, present } from '#tests/support/engine.ts';
import { dayAfter } from './boundary-days/boundary.ts';
import { NAMES } from './canada-names.ts';
import { coverage, faultsOf, type Item } from './checklist.ts';

const CA: Asked = { market: 'CA' };
const found = (given: Given, asked: Asked): string[] => said(judge([given], { ...CA, ...asked }));
const claims = (text: string, lang = 'en'): string[] => judge([], { ...CA, product: { claims: [{ text, lang }] } }).findings.filter(({ kind }) => kind.startsWith('claim')).map(({ kind }) => kind);
const lacks = (field: string, asked: Asked): boolean => said(judge([], { ...CA, particulars: {}, ...asked }), 'particular-missing').some((one) => one.includes(` ${field} `));
const words = (rule: string, asked: Asked): string[] => judge([], { ...CA, ...asked }).requiredWording.filter((one) => one.rule === rule).map(({ text }) => text);
const two = (a: string, b: string, share: string, rest: string, more: Parameters<typeof part>[2] = {}) => present(formula([material('m', [part(a, rest), part(b, share, more)])], [line('m', '100 g')], { product: { markets: ['CA'] } }), { markets: ['CA'] }).results[0]!.declaration;
const zoneOf = (share: string, rest: string, more: Parameters<typeof part>[2] = {}): string => two('Aqua', 'Glycerin', share, rest, more).entries.find(({ inci }) => inci === 'Glycerin')!.zone;
const sheet = (cm2: number): Parameters<typeof minimumsFor>[1] => ({ shape: 'flat', width: cm2 * 1000 - 6_000, height: 100_000 - 6_000 }) as unknown as Parameters<typeof minimumsFor>[1];
const figure = (cm2: number): number => minimumsFor('CA', sheet(cm2), 100n).netContent.height;
const shades = (category: string): string => present(formula([material('m', [part('Talc', '100')])], [line('m', '10 g')], { product: { category, markets: ['CA'], mayContain: [{ inci: 'CI 77491' }] } }), { markets: ['CA'] }).results[0]!.declaration.text;
const net = (value: string, unit: 'g' | 'ml'): string => netStatement({ value, unit }, 'CA')!.parts.join(' ').replaceAll('\u00a0', ' ');
const scented = (percent: string, category: string, name: string, placed = '2026-12-01', available = placed): string[] =>
  assess(formula([material('base', [part('Glycerin', '100')]), material('scent', [part('Glycerin', '100')], { declareAs: 'parfum', constituents: [inside(name, percent)] })], [line('base', '90 g'), line('scent', '10 g')], { product: { category, markets: ['CA'], placedOnMarket: placed, availableOn: available } }), { markets: ['CA'] }).results[0]!.allergens.filter(({ disclose }) => disclose).map((one) => one.name);

const ITEMS: readonly Item[] = [
  ['A1', 'manufacturer, importer, maker', { duty: 'ca/duty/who' }],
  ['A2', 'notification within 10 days', { duty: 'ca/duty/notification', firm: 'official' }],
  ['A3', 'thirteen bands', { shown: () => ['0.001', '0.0010001', '0.1', '0.3', '1', '3', '10', '20', '30', '40', '50', '65', '80', '80.1'].map((share) => shareAsBand(decimal(share))).join('; ') === 'up to 0.001; over 0.001 to 0.1; over 0.001 to 0.1; over 0.1 to 0.3; over 0.3 to 1; over 1 to 3; over 3 to 10; over 10 to 20; over 20 to 30; over 30 to 40; over 40 to 50; over 50 to 65; over 65 to 80; over 80 to 100' }],
  ['A4', 'no reference to the law, no hint of a prescription', { duty: 'ca/duty/reference-to-law' }, { duty: 'ca/duty/prescription' }, { shown: () => claims('Complies with the Cosmetic Regulations').includes('claim-contradicted') }, { shown: () => claims('Made to prescription').includes('claim-contradicted') }, { shown: () => claims('Conforme au Règlement sur les cosmétiques', 'fr').includes('claim-contradicted') }],
  ['B1', 'English and French, legible', { duty: 'ca/duty/two-languages' }, { duty: 'ca/duty/legible' }, { duty: 'ca/duty/one-label' }],
  ['B2', 'contact and identity since 9 October 2024', { change: 'ca-sor-2024-63-contact' }, { duty: 'ca/duty/identity' }, { shown: () => !lacks('canadaContact', { available: '2024-10-08' }) && lacks('canadaContact', { available: '2024-10-09' }) && lacks('canadaContact', { available: '2024-10-10' }) }],
  ['B3', 'the list by INCI name', { shown: () => two('Aqua', 'Sodium Benzoate', '0.5', '99.5').text.includes('Sodium Benzoate') }],
  ['B4', 'names of the schedule: 58 items, 64 rows', { instrument: 'ca-cr-869', sourcing: 'official' }, { shown: () => new Set(NAMES.map(([item]) => item)).size === 58 && NAMES.length === 64 }, { shown: () => two('Aqua', 'Glycerin', '5', '95').text.includes('Aqua') }],
  ['B5', 'plants by genus and species', { duty: 'ca/duty/botanicals' }, { shown: () => two('Aqua', 'Avena Sativa Kernel Extract', '5', '95').text.includes('Avena Sativa Kernel Extract') }],
  ['B6', 'chemical name where there is no INCI name', { duty: 'ca/duty/chemical-name' }],
  ['B7', 'descending, 1 % or less free, colouring agents free', { shown: () => zoneOf('1', '99') === 'free' && zoneOf('1.0000001', '98.9999999') === 'ordered' }, { shown: () => two('Aqua', 'CI 77491', '5', '95', { purpose: 'colourant' }).entries.at(-1)!.zone === 'colourant' }],
  ['B8', 'parfum and aroma may be last', { duty: 'ca/duty/parfum-last' }],
  ['B9', 'shades of make-up, nail polish and enamel after +/-', { shown: () => shades('eye-shadow').includes('[+/- CI 77491]') }, { shown: () => said(judge([], { ...CA, category: 'body-wash', mayContain: [{ inci: 'CI 77491' }] }), 'may-contain-misplaced').length === 1 }, { shown: () => said(judge([], { ...CA, category: 'nail-polish', mayContain: [{ inci: 'CI 77491' }] }), 'may-contain-misplaced').length === 0 }],
  ['B10', 'products under other regimes', { duty: 'ca/duty/other-regimes' }, { shown: () => ['SPF 30', 'Antiperspirant', 'Fights dandruff', 'Prevents cavities'].every((text) => claims(text).includes('claim-medicinal')) }],
  ['B11', 'incidental substances', { duty: 'ca/duty/incidental' }, { shown: () => !two('Aqua', 'Sodium Chloride', '0.5', '99.5', { role: 'incidental' }).text.includes('Sodium Chloride') }],
  ['C1', 'small packs', { duty: 'ca/duty/small-packs' }],
  ['C2', 'ornamental container', { duty: 'ca/duty/ornamental' }],
  ['C3', 'leaflet for bath bombs and bare soap', { duty: 'ca/duty/leaflet' }],
  ['C4', 'least heights of type', { duty: 'ca/duty/type-height' }, { shown: () => [32, 33, 258, 259, 645, 646, 2580, 2581].map(figure).join(' ') === '1600000 3200000 3200000 6400000 6400000 9500000 9500000 12700000' }, { shown: () => minimumsFor('CA', sheet(100), 100n).text.height === 1_600_000 }],
  ['C5', 'principal display surface', { duty: 'ca/duty/display-surface' }],
  ['D1', 'fragrance allergens of the Union’s Annex III', { shown: () => law.allergenGroups.filter(({ markets }) => markets.some(({ market }) => market === 'CA')).length === 81 }],
  ['D2', 'above 0.01 % and 0.001 %', { shown: () => law.allergenGroups.every(({ rinseOff, leaveOn }) => rinseOff === '0.01' && leaveOn === '0.001') }],
  ['D3', 'leave-on and rinse-off', { shown: () => (['leave-on', 'rinse-off'] satisfies Exposure[]).every((exposure) => [...law.categories.values()].some((one) => one.exposure === exposure)) }],
  ['D4', 'from 12 April 2026; the added ones from 1 August 2026 and 2028', { change: 'ca-sor-2024-63' }, { change: 'ca-allergens-81' }],
  ['D5', 'a year of promotion', { duty: 'ca/duty/compliance-promotion', firm: 'secondary' }],
  ['E1', 'avoidable hazard', { duty: 'ca/duty/avoidable-hazard' }],
  ['E2', 'coal-tar hair dye', { warning: 'ca/cr-22' }, { wording: 'ca-coal-tar', languages: ['en', 'fr'] }, { duty: 'ca/duty/patch-test' }],
  ['E3', 'genital deodorant under pressure', { warning: 'ca/cr-23-directions' }, { warning: 'ca/cr-23-caution' }, { wording: 'ca-genital-directions', languages: ['en', 'fr'] }, { wording: 'ca-genital-caution', languages: ['en', 'fr'] }],
  ['E4', 'mercury', { row: 'ca/cr-15.1', sourcing: 'official' }, { duty: 'ca/duty/mercury-label' }],
  ['E5', 'aerosol metal cans', { warning: 'ca/cr-25' }, { warning: 'ca/cr-25-other' }, { wording: 'ca-pressure', languages: ['en', 'fr'] }, { wording: 'ca-pressure-principal', languages: ['en', 'fr'] }],
  ['E6', 'flame projection', { warning: 'ca/cr-26' }, { warning: 'ca/cr-26-1' }, { warning: 'ca/cr-26-2' }, { warning: 'ca/cr-26-3' }, { wording: 'ca-flame', languages: ['en', 'fr'] }],
  ['E7', 'relief by size', { duty: 'ca/duty/pressure-symbol' }],
  ['E8', 'mouthwash, methyl alcohol, bromates', { duty: 'ca/duty/mouthwash-seal' }, { row: 'ca/cr-28.2' }, { row: 'ca/cr-28.3' }, { wording: 'ca-bromate', languages: ['en', 'fr'] }],
  ['E9', 'chloroform and estrogens prohibited', { row: 'ca/cr-15/chloroform', sourcing: 'official' }, { row: 'ca/cr-15/estrogens', sourcing: 'official' }, { shown: () => found({ name: 'Chloroform', percent: '0.01' }, {}).some((one) => one.startsWith('prohibited')) }],
  ['E9', 'coal-tar dyes near the eye, tooth-stain removers below pH 4', { row: 'ca/cr-14', sourcing: 'official' }, { condition: 'ca/cr-13' }, { duty: 'ca/duty/eye-colours' }],
  ['E10', 'claims on the chemistry of skin, hair and teeth, or that no injury is suffered', { shown: () => claims('Changes the skin chemistry').includes('claim-evidence') && claims('You will not suffer any irritation').includes('claim-evidence') }],
  ['F1', 'display panel and dealer', { duty: 'ca/duty/display-panel' }, { shown: () => lacks('responsiblePerson', {}) && lacks('netContent', {}) }],
  ['F2', 'volume or weight', { duty: 'ca/duty/volume-or-weight' }],
  ['F3', 'figures and units', { duty: 'ca/duty/figures' }, { shown: () => net('999', 'ml') === '999 ml' && net('1000', 'ml') === '1 L' && net('1000', 'g') === '1 kg' }],
  ['F4', 'imported goods', { duty: 'ca/duty/imported-by' }],
  ['F5', 'tolerance', { duty: 'ca/duty/tolerance' }],
  ['F6', 'narrow exemptions', { duty: 'ca/duty/bilingual-exemptions' }],
  ['F7', 'Quebec', { duty: 'ca/duty/quebec', firm: 'memory' }],
  ['G1', 'the hotlist is no regulation', { duty: 'ca/duty/hotlist' }, { instrument: 'ca-hotlist', sourcing: 'secondary' }],
  ['G2', 'alpha hydroxy acids', { row: 'ca/hotlist/alpha-hydroxy-acids', sourcing: 'memory' }],
  ['G2', 'salicylic acid', { row: 'ca/hotlist/salicylic-acid', sourcing: 'secondary' }],
  ['G2', 'hydroquinone', { row: 'ca/hotlist/hydroquinone', sourcing: 'memory' }],
  ['G2', 'retinol', { row: 'ca/hotlist/retinol', sourcing: 'secondary' }],
  ['G2', 'hydrogen peroxide', { row: 'ca/hotlist/hydrogen-peroxide', sourcing: 'memory' }],
  ['G2', 'boric acid', { row: 'ca/hotlist/boric-acid', sourcing: 'memory' }],
  ['G2', 'formaldehyde releasers, tea tree oil, thioglycolates: figures not read', { row: 'ca/hotlist/formaldehyde-releasers', sourcing: 'memory' }, { row: 'ca/hotlist/tea-tree-oil', sourcing: 'memory' }, { row: 'ca/hotlist/thioglycolic-acid', sourcing: 'memory' }, { shown: () => judge([{ name: 'Melaleuca Alternifolia Leaf Oil', percent: '5' }], CA).notChecked.some(({ rule }) => rule === 'ca/hotlist/tea-tree-oil') }],
  ['G2', 'methyl salicylate', { row: 'ca/hotlist/methyl-salicylate', sourcing: 'memory' }],
  ['G3', 'cautions in both languages', { duty: 'ca/duty/two-languages' }, { shown: () => new Set(judge([{ name: 'm-Cresol', percent: '0.05' }], { ...CA, category: 'body-lotion' }).requiredWording.map(({ lang }) => lang)).size === 2 }],
];

describe('the law of Canada', () => {
  test('holds every fact of the digest', () => {
    console.info(coverage('Canada', ITEMS));
    expect(ITEMS.length).toBeGreaterThan(45);
    expect(faultsOf(ITEMS)).toEqual([]);
  });
});

describe('the schedule of names', () => {
  const joined = (written: string): string => present(formula([material('m', [part(written, '100')])], [line('m', '10 g')], { product: { markets: ['CA'] }, declaration: { joinedNames: true } }), { markets: ['CA'] }).results[0]!.declaration.entries[0]!.name;
  const single = (written: string): string => present(formula([material('m', [part(written, '100')])], [line('m', '10 g')], { product: { markets: ['CA'] } }), { markets: ['CA'] }).results[0]!.declaration.entries[0]!.name;

  test.each(NAMES)('%s %s: %s, %s', (_item, eu, inci, fr) => {
    // Each of the three leads to one entry of the dictionary, and that entry to the EU name.
    const entries = [eu, inci, fr].map((name) => dictionary.resolve(name)?.entry.names.ca);
    expect(entries).toEqual([eu, eu, eu]);
    expect(single(inci)).toBe(eu);
    expect(joined(inci)).toBe([eu, inci, fr].join('/'));
    expect(joined(fr)).toBe([eu, inci, fr].join('/'));
  });

  test('a name outside the schedule is printed by its INCI name alone', () => {
    expect(joined('Glycerin')).toBe('Glycerin');
    expect(dictionary.resolve('Glycerin')?.entry.names.ca).toBeUndefined();
  });
});

/** Rule, substance, limit, product, and what the product says where more is known of it. */
const LIMITS: readonly (readonly [string, string, string, string, Asked?])[] = [
  ['ca/hotlist/alpha-hydroxy-acids', 'Glycolic Acid', '10', 'face-cream'],
  ['ca/hotlist/salicylic-acid', 'Salicylic Acid', '2', 'face-cream'],
  ['ca/hotlist/retinol/a', 'Retinol', '0.2', 'body-lotion'],
  ['ca/hotlist/retinol/b', 'Retinol', '1', 'face-cream'],
  ['ca/hotlist/retinol', 'Retinol', '1', 'body-lotion', { available: '2025-02-27' }],
  ['ca/hotlist/hydrogen-peroxide/a', 'Hydrogen Peroxide', '10', 'hair-bleach'],
  ['ca/hotlist/hydrogen-peroxide', 'Hydrogen Peroxide', '12', 'hair-bleach', { available: '2025-02-27' }],
  ['ca/hotlist/hydrogen-peroxide', 'Hydrogen Peroxide', '3', 'mouthwash'],
  ['ca/hotlist/hydrogen-peroxide', 'Hydrogen Peroxide', '3', 'face-cream'],
  ['ca/hotlist/hydrogen-peroxide/b', 'Hydrogen Peroxide', '10', 'brow-and-lash-dye'],
  ['ca/hotlist/boric-acid', 'Boric Acid', '5', 'body-powder'],
  ['ca/hotlist/methyl-salicylate', 'Methyl Salicylate', '1', 'body-lotion'],
  ['ca/hotlist/retinal/a', 'Retinal', '0.01', 'body-lotion'],
  ['ca/hotlist/retinal/b', 'Retinal', '0.05', 'face-cream'],
  ['ca/hotlist/m-o-cresol/b', 'o-Cresol', '0.1', 'body-lotion'],
  ['ca/hotlist/benzoyl-peroxide', 'Benzoyl Peroxide', '10', 'artificial-nails'],
  ['ca/hotlist/azelaic-acid', 'Azelaic Acid', '14', 'face-cream'],
  ['ca/hotlist/ethylhexyl-ethylhexanoate/a', 'Ethylhexyl Ethylhexanoate', '0.1', 'body-lotion'],
  ['ca/hotlist/ethylhexyl-ethylhexanoate/b', 'Ethylhexyl Ethylhexanoate', '0.5', 'foot-cream'],
  ['ca/hotlist/ethylhexyl-ethylhexanoate/c', 'Ethylhexyl Ethylhexanoate', '0.6', 'foundation'],
  ['ca/hotlist/methylchloroisothiazolinone/a', 'Methylchloroisothiazolinone', '0.0015', 'shampoo'],
];
const over = (at: string): string => `${at}${at.includes('.') ? '' : '.'}0000001`;
const exceeded = (rule: string, given: Given, asked: Asked): string[] => said(judge([given], { ...CA, ...asked }), 'limit-exceeded').filter((one) => one.endsWith(` ${rule}`));

describe('limits', () => {
  test.each(LIMITS.map(([rule, name, at, category, asked]): [string, string, string, string, Asked] => [rule, name, at, category, asked ?? {}]))('%s: %s at %s %% in %s', (rule, name, at, category, asked) => {
    expect(exceeded(rule, { name, percent: at }, { category, ...asked })).toEqual([]);
    expect(exceeded(rule, { name, percent: over(at) }, { category, ...asked })).toEqual([`limit-exceeded ${name} ${rule}`]);
  });

  test('every limit of Canada’s rows is tried', () => {
    const limited = law.rows.filter(({ markets }) => markets.includes('CA')).flatMap((row) => row.provisions.filter(({ max }) => max !== undefined).map((one) => `${one.letter ? `${row.id}/${one.letter}` : row.id} ${one.max!}`));
    const tried = new Set(LIMITS.map(([rule, , at]) => `${rule} ${at}`));
    expect(limited.length).toBeGreaterThan(18);
    expect(limited.filter((one) => !tried.has(one))).toEqual([]);
  });

  test('esters of retinol count as retinol', () => {
    // 1 × 524.874 / 286.459 = 1.83228… %
    expect(exceeded('ca/hotlist/retinol/b', { name: 'Retinyl Palmitate', percent: '1.8322' }, { category: 'face-cream' })).toEqual([]);
    expect(exceeded('ca/hotlist/retinol/b', { name: 'Retinyl Palmitate', percent: '1.8323' }, { category: 'face-cream' })).toHaveLength(1);
  });
});

describe('uses', () => {
  test.each<[string, Given, Asked, string[]]>([
    ['hydroquinone on the face', { name: 'Hydroquinone', percent: '0.1' }, { category: 'face-cream' }, ['not-for-this-use Hydroquinone ca/hotlist/hydroquinone']],
    ['hydroquinone in hair dye', { name: 'Hydroquinone', percent: '0.1' }, { category: 'hair-dye-oxidative' }, []],
    ['benzoyl peroxide on the face', { name: 'Benzoyl Peroxide', percent: '1' }, { category: 'face-cream' }, ['not-for-this-use Benzoyl Peroxide ca/hotlist/benzoyl-peroxide']],
    ['benzoyl peroxide for nails at home', { name: 'Benzoyl Peroxide', percent: '1' }, { category: 'artificial-nails', flags: { professionalUseOnly: false } }, ['not-for-this-use Benzoyl Peroxide ca/hotlist/benzoyl-peroxide']],
    ['cresol round the mouth', { name: 'm-Cresol', percent: '0.01' }, { category: 'lip-balm' }, ['not-for-this-use m-Cresol ca/hotlist/m-o-cresol/a']],
    ['peroxide for the genital area', { name: 'Hydrogen Peroxide', percent: '0.1' }, { category: 'intimate-wash' }, ['not-for-this-use Hydrogen Peroxide ca/hotlist/hydrogen-peroxide']],
    ['peroxide on lashes at home', { name: 'Hydrogen Peroxide', percent: '2' }, { category: 'lash-lift', flags: { professionalUseOnly: false } }, ['not-for-this-use Hydrogen Peroxide ca/hotlist/hydrogen-peroxide/b']],
    ['the isothiazolinone mixture in what stays on', { name: 'Methylchloroisothiazolinone', percent: '0.001' }, { category: 'face-cream' }, ['not-for-this-use Methylchloroisothiazolinone ca/hotlist/methylchloroisothiazolinone/b']],
    ['a coal-tar dye on the brows', { name: 'p-Phenylenediamine', percent: '0.1' }, { category: 'brow-and-lash-dye' }, ['prohibited p-Phenylenediamine ca/cr-14']],
    ['a coal-tar dye on the hair', { name: 'p-Phenylenediamine', percent: '0.1' }, { category: 'hair-dye-oxidative' }, []],
    ['mercury in a wash', { name: 'Thimerosal', percent: '0.001' }, { category: 'body-wash' }, ['prohibited Thimerosal ca/cr-15.1']],
    ['mercury to preserve a mascara', { name: 'Thimerosal', percent: '0.001', purpose: 'preservative' }, { category: 'mascara' }, []],
    ['mercury in a mascara for another reason', { name: 'Thimerosal', percent: '0.001', purpose: 'other' }, { category: 'mascara' }, ['prohibited Thimerosal ca/cr-15.1']],
    ['sulfides in a shampoo', { name: 'Sodium Sulfide', percent: '1' }, { category: 'shampoo' }, ['not-for-this-use Sodium Sulfide ca/hotlist/alkali-sulfides']],
    ['sulfides to remove hair', { name: 'Sodium Sulfide', percent: '1' }, { category: 'depilatory' }, []],
  ])('%s', (_, given, asked, expected) => {
    expect(found(given, asked)).toEqual(expected);
  });

  test('what the hotlist prohibits is prohibited', () => {
    const rows = law.rows.filter(({ instrument, list }) => instrument === 'ca-hotlist' && list === 'prohibited');
    expect(rows.length).toBeGreaterThan(35);
    for (const row of rows) for (const { name } of row.members) expect(found({ name, percent: '0.01' }, {}).some((one) => one === `prohibited ${name} ${row.id}`), name).toBe(true);
  });
});

describe('the days', () => {
  const near = (day: string): string[] => [-1, 0, 1].map((step) => dayAfter(day, step));
  const on = (name: string, percent: string, category: string, rule: string) => (available: string): boolean => judge([{ name, percent }], { ...CA, category, available }).findings.some((one) => one.rule === rule && one.kind !== 'upcoming');

  test.each<[string, (day: string) => boolean]>([
    ['2025-02-28', on('Retinal', '0.06', 'face-cream', 'ca/hotlist/retinal/b')],
    ['2025-02-28', on('Retinol', '0.3', 'body-lotion', 'ca/hotlist/retinol/a')],
    ['2025-02-28', on('Hydrogen Peroxide', '11', 'hair-bleach', 'ca/hotlist/hydrogen-peroxide/a')],
    ['2025-02-28', on('Glyceryl Thioglycolate', '1', 'hair-perm', 'ca/hotlist/thioglycolic-acid-esters')],
    ['2025-02-28', on('m-Cresol', '0.2', 'body-lotion', 'ca/hotlist/m-o-cresol/b')],
    ['2025-02-28', on('Benzoyl Peroxide', '1', 'face-cream', 'ca/hotlist/benzoyl-peroxide')],
    ['2022-08-26', on('Azelaic Acid', '15', 'face-cream', 'ca/hotlist/azelaic-acid')],
    ['2022-08-26', on('Ethylhexyl Ethylhexanoate', '0.2', 'body-lotion', 'ca/hotlist/ethylhexyl-ethylhexanoate/a')],
    ['2026-04-12', (day) => scented('1', 'face-cream', 'Limonene', day).length === 1],
    ['2026-08-01', (day) => scented('1', 'face-cream', 'Linalyl Acetate', day).length === 1],
    ['2028-08-01', (day) => scented('1', 'face-cream', 'Linalyl Acetate', '2026-07-31', day).length === 1],
    ['2024-10-09', (day) => lacks('canadaContact', { available: day })],
  ])('%s: the day before, the day, the day after (%#)', (day, binds) => {
    expect(near(day).map(binds)).toEqual([false, true, true]);
  });

  test('every dated row of Canada is tried', () => {
    const days = new Set(law.rows.filter(({ markets }) => markets.includes('CA')).flatMap((row) => [row.from, row.until, ...row.provisions.flatMap((one) => [one.from, one.until])]).flatMap((dates) => (dates ? [dates.available] : [])));
    expect([...days].sort()).toEqual(['2022-08-26', '2025-02-28']);
  });
});

describe('fragrance allergens', () => {
  test.each([['face-cream', '0.01', '0.0100001'], ['body-wash', '0.1', '0.1000001']])('%s: named strictly above the threshold', (category, at, above) => {
    // A tenth of the product is perfume.
    expect([scented(at, category, 'Limonene'), scented(above, category, 'Limonene')]).toEqual([[], ['Limonene']]);
  });

  test('an ingredient keeps its own INCI name', () => {
    const document = formula([material('m', [part('Aqua', '95'), part('Lavandula Angustifolia Oil', '5')])], [line('m', '10 g')], { product: { category: 'face-cream', markets: ['EU', 'CA'], placedOnMarket: '2026-12-01' } });
    const text = (market: 'EU' | 'CA'): string => present(document, { markets: [market] }).results[0]!.declaration.text;
    expect(text('CA')).toContain('Lavandula Angustifolia Oil');
    expect(text('EU')).toContain('Lavandula Oil/Extract');
  });
});

describe('words for the label', () => {
  const AEROSOL: Asked = { category: 'hair-spray' };
  test.each<[string, Asked, string[]]>([
    ['ca/cr-26-1', { facts: { flameProjectionCm: '14.9', flashback: false } }, ['Caution. Flammable', 'Attention. Inflammable']],
    ['ca/cr-26-2', { facts: { flameProjectionCm: '15', flashback: false } }, ['Warning. Flammable', 'Avertissement. Inflammable']],
    ['ca/cr-26-2', { facts: { flameProjectionCm: '44.9', flashback: false } }, ['Warning. Flammable', 'Avertissement. Inflammable']],
    ['ca/cr-26-3', { facts: { flameProjectionCm: '45', flashback: false } }, ['Danger. Extremely Flammable', 'Danger. Extrêmement inflammable']],
    ['ca/cr-26-3', { facts: { flameProjectionCm: '5', flashback: true } }, ['Danger. Extremely Flammable', 'Danger. Extrêmement inflammable']],
    ['ca/cr-26-1', { facts: { flameProjectionCm: '5', flashback: true } }, []],
    ['ca/cr-26', { facts: { flameProjectionCm: '0', flashback: false } }, []],
  ])('%s with %j', (rule, asked, expected) => {
    expect(words(rule, { ...AEROSOL, ...asked })).toEqual(expected);
  });

  test('a deodorant for the genital area under pressure bears directions and caution in both languages', () => {
    const asked: Asked = { category: 'intimate-deodorant-spray', flags: { aerosol: true }, facts: { flameProjectionCm: '0', flashback: false } };
    expect(words('ca/cr-23-directions', asked).map((text) => text.split(':')[0]!.trim())).toEqual(['Directions', "Mode d'emploi"]);
    expect(words('ca/cr-23-caution', asked).map((text) => text.split(':')[0]!.trim())).toEqual(['Caution', 'Mise en garde']);
    expect(words('ca/cr-23-caution', { category: 'deodorant-spray' })).toEqual([]);
  });

  test('the caution on eucalyptus is due strictly above 0.022 %, and not in a bar', () => {
    const due = (percent: string, category: string): number => judge([{ name: 'Eucalyptus Globulus Leaf Oil', percent }], { ...CA, category }).requiredWording.filter(({ rule }) => rule === 'ca/hotlist/eucalyptus-oil').length;
    expect([due('0.022', 'body-lotion'), due('0.0220001', 'body-lotion'), due('1', 'soap-bar')].map((count) => count > 0)).toEqual([false, true, false]);
    const balm = (facts: Asked['facts']): readonly (string | undefined)[] => judge([{ name: 'Eucalyptus Globulus Leaf Oil', percent: '1' }], { ...CA, category: 'body-balm', facts }).findings.filter(({ kind, rule }) => kind === 'wording-required' && rule === 'ca/hotlist/eucalyptus-oil').map(({ certainty }) => certainty);
    // A balm is taken as solid until it is said to be otherwise.
    expect([balm({}), balm({ physicalForm: 'cream' }), balm({ physicalForm: 'solid' })]).toEqual([[], ['certain'], []]);
  });

  test('the sunburn caution is due above 3 % of alpha hydroxy acids', () => {
    const due = (percent: string): boolean => judge([{ name: 'Glycolic Acid', percent }], { ...CA, category: 'face-cream' }).requiredWording.some(({ rule }) => rule.startsWith('ca/hotlist/alpha'));
    expect([due('3'), due('3.0000001')]).toEqual([false, true]);
  });

  test('bromates and methyl alcohol ask how much one pack holds', () => {
    const asks = (name: string, category: string, facts: Asked['facts'] = {}): readonly string[] => judge([{ name, percent: '1' }], { ...CA, category, facts }).findings.filter(({ kind }) => kind === 'wording-required').flatMap(({ needs, certainty }) => needs ?? [certainty!]);
    expect(asks('Sodium Bromate', 'hair-perm', { physicalForm: 'liquid' })).toEqual(['packHoldsBromateLimit']);
    expect(asks('Sodium Bromate', 'hair-perm', { physicalForm: 'liquid', packHoldsBromateLimit: true })).toEqual(['certain']);
    expect(asks('Sodium Bromate', 'hair-perm', { physicalForm: 'liquid', packHoldsBromateLimit: false })).toEqual([]);
    expect(asks('Methyl Alcohol', 'nail-polish-remover')).toEqual(['packHolds5MlMethylAlcohol']);
  });
});

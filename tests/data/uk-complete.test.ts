/**
 * Every fact of the digest on the United Kingdom, and where it is held. Numbers are those of the
 * digest's items; days and figures are typed out here, from the instruments' texts and, where
 * marked, from trade pages.
 */
import { describe, expect, test } from 'vitest';
import { judge, law, said, type Asked } from '#tests/shared/rules/judging.ts';
import { formula, inside, judge as assess, line, material, part, present } from '#tests/support/engine.ts';
import { minimumsFor } from '#shared/artwork/heights.ts';
import { RESTRICTED_GB, PROHIBITED_GB } from './boundary-days/great-britain.ts';
import { dayAfter } from './boundary-days/boundary.ts';
import { coverage, faultsOf, type Item } from './checklist.ts';

const GB: Asked = { market: 'UK' };
const notChecked = (name: string, asked: Asked = {}): string[] => judge([{ name, percent: '0.5' }], { ...GB, category: 'face-cream', ...asked }).notChecked.map(({ rule }) => rule);
const bans = (name: string, asked: Asked = {}): boolean => judge([{ name, percent: '0.5' }], { ...GB, ...asked }).findings.some(({ kind }) => kind === 'prohibited');
const lacks = (field: string, asked: Asked): boolean => said(judge([], { ...GB, ...asked }), 'particular-missing').some((one) => one.includes(` ${field} `));
const EU_PERSON = { responsiblePerson: { EU: { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' } } };

/** A cream with limonene hidden in its perfume at this share of the whole. */
const scented = (percent: string, category: string, name = 'Limonene') =>
  formula([material('base', [part('Glycerin', '100')]), material('scent', [part('Glycerin', '100')], { declareAs: 'parfum', constituents: [inside(name, percent)] })], [line('base', '90 g'), line('scent', '10 g')], { product: { category, markets: ['UK'] } });
const names = (percent: string, category: string, name?: string): string[] => assess(scented(percent, category, name), { markets: ['UK'] }).results[0]!.allergens.filter(({ disclose }) => disclose).map((one) => one.name);
/** Two ingredients, the second at this share: where it stands. */
const zoneAt = (percent: string, rest: string): string => present(formula([material('m', [part('Aqua', rest), part('Glycerin', percent)])], [line('m', '100 g')]), { markets: ['UK'] }).results[0]!.declaration.entries.find(({ inci }) => inci === 'Glycerin')!.zone;
const sheet = { shape: 'cylinder', width: 100_000, height: 50_000, round: 95_000 } as unknown as Parameters<typeof minimumsFor>[1];
const figures = (quantity: bigint): number => minimumsFor('UK', sheet, quantity).netContent.height;

const ITEMS: readonly Item[] = [
  ['0', 'framework: assimilated Regulation, SI 2019/696, enforced by SI 2013/1478', { duty: 'uk/duty/framework' }, { instrument: 'eu-1223-2009' }],
  ['1', 'Great Britain is three countries; Northern Ireland follows the Union', { duty: 'uk/duty/territory', firm: 'secondary' }, { shown: () => judge([], GB).notChecked.some(({ subject }) => subject === 'Northern Ireland') }],
  ['2', 'responsible person based in the United Kingdom', { duty: 'uk/duty/responsible-person-established' }],
  ['3', 'seven years in which the details of the Union’s person are enough', { change: 'uk-own-responsible-person' }, { shown: () => !lacks('responsiblePerson', { particulars: EU_PERSON, available: '2027-12-31' }) }, { shown: () => lacks('responsiblePerson', { particulars: EU_PERSON, available: '2028-01-01' }) }],
  ['4', 'notification before placing', { duty: 'uk/duty/notification' }],
  ['4', 'nanomaterials ahead: not verified', { duty: 'uk/duty/nano-notification', firm: 'memory' }],
  ['5', 'information file in English, 10 years', { duty: 'uk/duty/information-file' }],
  ['6', 'label in English', { duty: 'uk/duty/english', firm: 'memory' }, { shown: () => judge([{ name: 'DMDM Hydantoin', percent: '0.5' }], { ...GB, category: 'shampoo', facts: { releasedFormaldehyde: '0.06' } }).requiredWording.every(({ lang }) => lang === 'en') }],
  ['7', 'origin of goods made outside the United Kingdom', { duty: 'uk/duty/origin' }, { shown: () => lacks('countryOfOrigin', { particulars: EU_PERSON, facts: { imported: true } }) }],
  ['8', 'content of the label', { duty: 'uk/duty/label' }, { shown: () => ['batchCode', 'durability', 'function', 'netContent'].every((field) => lacks(field, { particulars: EU_PERSON })) }, { shown: () => !lacks('netContent', { particulars: EU_PERSON, facts: { freeSample: true } }) }],
  ['9', 'descending by weight, below 1 % free, colourants last, heading', { shown: () => zoneAt('1', '99') === 'ordered' && zoneAt('0.9999999', '99.0000001') === 'free' }, { shown: () => present(scented('1', 'face-cream'), { markets: ['UK'] }).results[0]!.declaration.heading === 'Ingredients' }],
  ['10', 'glossary of names; Decision (EU) 2022/677 is no law there', { duty: 'uk/duty/glossary', firm: 'memory' }],
  ['11', '24 older allergens at 0.001 % and 0.01 %, the newer recommended', { duty: 'uk/duty/allergens-recommended' }, { shown: () => law.allergenGroups.filter(({ markets }) => markets.some(({ market }) => market === 'UK')).length === 24 }],
  ['11', 'two of the 26 are prohibited', { row: 'eu/annex-ii/1380' }, { row: 'uk/si-2022-659/eu-1666', sourcing: 'secondary' }, { shown: () => bans('Hydroxyisohexyl 3-Cyclohexene Carboxaldehyde') && bans('Butylphenyl Methylpropional') }],
  ['12', 'the Union’s longer list from 1 August 2026 and 2028, for Northern Ireland', { change: 'eu-2023-1545' }],
  ['13', 'SI 2022/659', { instrument: 'uk-2022-659', sourcing: 'secondary' }, { change: 'uk-2022-659' }, { change: 'uk-2022-659-cmr' }, { row: 'uk/annex-ii/1645', sourcing: 'secondary' }],
  ['13', 'SI 2023/836 restricts methyl-N-methylanthranilate', { instrument: 'uk-2023-836' }, { change: 'uk-2023-836' }, { row: 'uk/annex-iii/323', sourcing: 'secondary' }],
  ['13', 'SI 2023/836 permits HAA299', { shown: () => said(judge([{ name: 'Bis-(Diethylaminohydroxybenzoyl Benzoyl) Piperazine', percent: '10', purpose: 'uv-filter' }], { ...GB, category: 'sunscreen-lotion' })).length === 0 }],
  ['13', 'SI 2024/455', { instrument: 'uk-2024-455', sourcing: 'secondary' }, { change: 'uk-2024-455' }, { row: 'uk/annex-iii/322', sourcing: 'secondary' }],
  ['13', 'SI 2024/1334: classified substances and kojic acid', { instrument: 'uk-2024-1334', sourcing: 'secondary' }, { change: 'uk-2024-1334-cmr' }, { change: 'uk-2024-1334-cmr-2' }, { change: 'uk-2024-1334-kojic' }, { row: 'uk/si-2024-1334/kojic-acid', sourcing: 'secondary' }, { row: 'uk/annex-ii/1704', sourcing: 'secondary' }],
  ['13', 'SI 2025/413: methyl salicylate', { instrument: 'uk-2025-413' }, { change: 'uk-2025-413' }, { row: 'uk/annex-iii/324', sourcing: 'secondary' }],
  ['14', '"releases formaldehyde" above 0.001 % from 15 July 2026', { formaldehyde: 'uk/annex-v/preamble-2/releases' }, { formaldehyde: 'uk/annex-v/preamble-2/contains' }, { change: 'uk-2026-formaldehyde' }, { instrument: 'uk-2026-restriction', sourcing: 'secondary' }],
  ['14', '4-MBC to Annex II', { row: 'uk/annex-ii/4-mbc', sourcing: 'secondary' }],
  ['14', 'sixteen substances from 15 August 2026', { duty: 'uk/duty/cmr-2026', firm: 'secondary' }, { change: 'uk-2026-cmr' }],
  ['15', '"placed on the market"', { duty: 'uk/duty/placing' }],
  ['16', 'the British list of classifications governs Article 15', { duty: 'uk/duty/cmr' }],
  ['16', 'retinol limits and TPO ban are the Union’s only', { shown: () => notChecked('Retinol').includes('eu/annex-iii/376/not-read') && said(judge([{ name: 'Retinol', percent: '0.5' }], { ...GB, category: 'face-cream' })).length === 0 }, { shown: () => !bans('Trimethylbenzoyl Diphenylphosphine Oxide') && notChecked('Trimethylbenzoyl Diphenylphosphine Oxide').includes('eu/annex-ii/1731/not-read') }],
  ['17', 'qualifying Northern Ireland goods', { duty: 'uk/duty/northern-irish-goods' }],
  ['18', 'aerosols', { duty: 'uk/duty/aerosols' }],
  ['18', 'figures of the net content: 2, 3, 4 and 6 mm', { duty: 'uk/duty/quantity', firm: 'memory' }, { shown: () => [50n, 51n, 200n, 201n, 1000n, 1001n].map(figures).join(' ') === '2000000 3000000 3000000 4000000 4000000 6000000' }],
  ['19', 'who enforces', { duty: 'uk/duty/authority' }],
  ['20', 'claims: common criteria and advertising codes', { duty: 'uk/duty/claims', firm: 'memory' }],
  ['gaps', 'no copy of the British annexes', { shown: () => law.instruments.get('eu-1223-2009')!.elsewhere!.UK!.note.includes('No copy of the text in force') }],
];

describe('the law of Great Britain', () => {
  test('holds every fact of the digest', () => {
    console.info(coverage('United Kingdom', ITEMS));
    expect(ITEMS.length).toBeGreaterThan(30);
    expect(faultsOf(ITEMS)).toEqual([]);
  });

  test('a fact that is held nowhere is found', () => {
    expect(faultsOf([['x', 'nothing'], ['y', 'no such row', { row: 'uk/none' }]])).toHaveLength(2);
  });

  test('every row of its own names a British instrument and says how firm it is', () => {
    const own = law.rows.filter(({ markets }) => markets.length === 1 && markets[0] === 'UK');
    expect(own.length).toBeGreaterThan(45);
    expect(own.filter((row) => law.sourcing(row, 'UK') === 'official').map(({ id }) => id)).toEqual([]);
  });
});

describe('exactly the limit is allowed', () => {
  // The boundary table tries each limit a hair above; here it is tried at the limit itself.
  const atLimit = RESTRICTED_GB.filter((one) => one.says === 'limit-exceeded' && one.given[0]!.percent!.endsWith('0001') && !one.ends);
  test.each(atLimit.map((one): [string, (typeof atLimit)[number]] => [`${one.rule} ${one.given[0]!.name} in ${one.asked.category!}`, one]))('%s', (_, one) => {
    const given = one.given.map((each) => ({ ...each, percent: each.percent!.replace(/\.?0*1$/, '') }));
    expect(judge(given, { ...one.asked, market: 'UK', available: '2026-12-01' }).findings.filter(({ kind, rule }) => kind === 'limit-exceeded' && rule === one.rule)).toEqual([]);
    expect(judge(one.given, { ...one.asked, market: 'UK', available: '2026-12-01' }).findings.filter(({ kind, rule }) => kind === 'limit-exceeded' && rule === one.rule)).toHaveLength(1);
  });
  test('they are tried', () => expect(atLimit.length).toBeGreaterThan(20));
});

test('what Great Britain prohibits is prohibited today, and left to the Union’s own days there', () => {
  for (const one of PROHIBITED_GB) expect(judge(one.given, { market: 'UK', available: '2027-03-01' }).findings.map(({ kind }) => kind), one.rule).toContain('prohibited');
});

test('released formaldehyde: 0.05 % and then 0.001 %, by the day', () => {
  const words = (released: string, placed: string, available: string): string[] => judge([{ name: 'DMDM Hydantoin', percent: '0.5' }], { market: 'UK', category: 'shampoo', placed, available, facts: { releasedFormaldehyde: released } }).requiredWording.map(({ rule }) => rule);
  const old = ['uk/annex-v/preamble-2/contains'];
  const now = ['uk/annex-v/preamble-2/releases'];
  expect([words('0.05', '2026-07-14', '2026-07-14'), words('0.0500001', '2026-07-14', '2026-07-14')]).toEqual([[], old]);
  expect([words('0.001', '2026-07-15', '2026-07-15'), words('0.0010001', '2026-07-15', '2026-07-15')]).toEqual([[], now]);
  expect([words('0.0010001', '2026-07-14', '2027-01-14'), words('0.0010001', '2026-07-14', '2027-01-15')]).toEqual([[], now]);
});

describe('fragrance allergens', () => {
  test.each([['face-cream', '0.01', '0.0100001'], ['body-wash', '0.1', '0.1000001']])('%s: named strictly above the threshold', (category, at, over) => {
    // A tenth of the product is perfume.
    expect([names(at, category), names(over, category)]).toEqual([[], ['Limonene']]);
  });
  test('the newer ones are not asked for', () => expect(names('1', 'face-cream', 'Linalyl Acetate')).toEqual([]));
  test('nor on any later day', () => {
    for (const step of [-1, 0, 1]) {
      const day = dayAfter('2028-08-01', step);
      const document = scented('1', 'face-cream', 'Linalyl Acetate');
      expect(assess({ ...document, product: { ...document.product, placedOnMarket: day, availableOn: day } }, { markets: ['UK'] }).results[0]!.allergens.filter(({ disclose }) => disclose)).toEqual([]);
    }
  });
});

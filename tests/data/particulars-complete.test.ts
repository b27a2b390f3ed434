import { expect, test } from 'vitest';
import { lawTables } from '#shared/law/tables.ts';
import type { Market, Sourcing } from '#shared/law/types.ts';
import { particularRows } from '#shared/rules/particulars/particular-rows.ts';
import { minimumsFor } from '#shared/artwork/heights.ts';
import { netStatement } from '#shared/artwork/net-content.ts';

/** Where a paragraph about labels is held: a row, a duty left open with its reason, a warning, or a reason why it is none of these. */
type Held = { readonly row: string; readonly sourcing?: Sourcing } | { readonly duty: string } | { readonly warning: RegExp } | { readonly kept: () => boolean; readonly by: string } | { readonly none: string };
type Paragraph = readonly [paragraph: string, fact: string, ...held: Held[]];

const row = (id: string, sourcing?: Sourcing): Held => ({ row: id, ...(sourcing ? { sourcing } : {}) });
const duty = (id: string): Held => ({ duty: id });
const flat = { shape: 'flat', width: 50_000, height: 60_000, overlap: 0, round: 50_000, diameter: 0 } as const;
const letters = (market: Market): number => minimumsFor(market, flat, 250n).text.height;

const both = (key: string): readonly Held[] => [row(`eu/particulars/${key}`), row(`uk/particulars/${key}`)];

const EU: readonly Paragraph[] = [
  ['19(1)', 'container and packaging, indelible, legible, visible', ...both('placement')],
  ['19(1)(a)', 'responsible person: name and address', ...both('responsiblePerson')],
  ['19(1)(a), 4', 'established in the Union', ...both('responsiblePerson-established')],
  ['19(1)(a)', 'country of origin when imported', ...both('countryOfOrigin')],
  ['19(1)(b)', 'content, and its exemptions', ...both('netContent')],
  ['19(1)(c)', 'durability or period after opening', ...both('durability')],
  ['19(1)(c)', 'conditions of storage', ...both('storage')],
  ['19(1)(d)', 'precautions', ...both('precautions')],
  ['19(1)(d)', 'precautions for professional use', ...both('precautions-professional')],
  ['19(1)(e)', 'batch', ...both('batchCode')],
  ['19(1)(f)', 'function', ...both('function')],
  ['19(1)(g)', 'list of ingredients under its heading', { none: 'It is worked out, headed and set by the product itself; a label without it does not exist here.' }],
  ['19(2)', 'enclosed information and the symbol of a hand on a book', ...both('enclosed')],
  ['19(3)', 'soap, bath balls and other small goods', ...both('display')],
  ['19(4)', 'goods not pre-packed', ...both('not-prepacked')],
  ['19(5)', 'languages', ...both('languages')],
  ['Annex VII', 'symbols', { none: 'The label draws the open jar and the hourglass; the hand on a book stands with Article 19(2).' }],
  ['76/211', 'height of the figures', row('eu/particulars/netContent-height', 'secondary'), row('uk/particulars/netContent-height', 'memory')],
  ['76/211', 'e mark: range and height', ...both('eMark'), ...both('eMark-height')],
  ['76/211', 'tolerable negative error', { none: 'It binds the filling of a batch, not what its label says.' }],
  ['2007/45', 'no prescribed sizes', { none: 'It frees and asks for nothing.' }],
];
const UK: readonly Paragraph[] = [
  ['2', 'based in the United Kingdom', duty('uk/duty/responsible-person-established'), row('uk/particulars/responsiblePerson-established')],
  ['3', 'own person from 1 January 2028', row('uk/particulars/responsiblePerson-own', 'secondary')],
  ['6', 'English', row('uk/particulars/languages', 'memory'), duty('uk/duty/english')],
  ['7', 'origin of what was made outside the United Kingdom', row('uk/particulars/countryOfOrigin'), duty('uk/duty/origin')],
  ['8', 'content of the label', duty('uk/duty/label')],
  ['18', 'heights of figures', row('uk/particulars/netContent-height', 'memory'), duty('uk/duty/quantity')],
];
const US: readonly Paragraph[] = [
  ['A1, C4', 'identity', row('us/particulars/identity', 'memory')],
  ['A2, E1', 'net quantity', row('us/particulars/netContent'), row('us/particulars/netContent-kind', 'memory')],
  ['A3, B1', 'ingredients', { none: 'Worked out and set by the product itself.' }],
  ['A4, D1, D4, D5', 'name and place of business', row('us/particulars/responsiblePerson', 'memory')],
  ['D3', 'street, city, state, ZIP', row('us/particulars/responsiblePerson-address', 'secondary')],
  ['A7, D2', 'qualifier of a firm that did not make it', row('us/particulars/responsiblePerson-qualifier', 'memory')],
  ['A5, F1', 'contact for adverse events from 29 December 2024', row('us/particulars/usContact', 'secondary')],
  ['A6, G', 'warnings', { warning: /^us\// }],
  ['A8', 'origin of imports', row('us/particulars/countryOfOrigin', 'memory')],
  ['A9', 'English', row('us/particulars/languages', 'memory')],
  ['A10', 'inner and outer', { none: 'One label is set here and bears everything; it stands on whichever piece is bought.' }],
  ['A11, A13', 'prominence', row('us/particulars/prominence')],
  ['A12', 'a name that suggests one ingredient', { none: 'Judged with the claims: the name is read as one.' }],
  ['B2', 'letters of 1/16 inch', { kept: () => letters('US') === 1_587_500, by: 'the label' }],
  ['B3', 'measured on the small o', { kept: () => minimumsFor('US', flat, 250n).text.of === 'small o', by: 'the label' }],
  ['B4', 'letters of 1/32 inch below 12 square inches', { kept: () => minimumsFor('US', { ...flat, width: 20_000, height: 20_000 }, 20n, false).text.height === 793_750, by: 'the label' }],
  ['B13, B14', 'list off the package', row('us/particulars/off-package')],
  ['C1-C3', 'area of the panel', row('us/particulars/netContent-height')],
  ['E2, E10-E12', 'both systems, never overstated', row('us/particulars/netContent-both-systems'), { kept: () => netStatement({ value: '250', unit: 'ml' }, 'US')!.parts.join(' ') === '8.45 fl oz (250 ml)', by: 'the label' }],
  ['E3', 'heights by area', row('us/particulars/netContent-height')],
  ['E4', 'bottom 30 %', row('us/particulars/netContent-zone')],
  ['E5, E6', 'clear space, bold', row('us/particulars/netContent-clear-space')],
  ['E7', 'Net Wt', { kept: () => netStatement({ value: '100', unit: 'g' }, 'US')!.parts[0] === 'Net Wt 3.52 oz', by: 'the label' }],
  ['E8', 'fractions', { none: 'The label prints decimals of at most two places.' }],
  ['E9', 'ounces and pounds', { none: 'Allowed, no longer required (digest E10).' }],
  ['E13', 'no exaggerating words', { none: 'The statement is worked out; nothing can be typed into it.' }],
  ['E14', 'aerosols by weight', row('us/particulars/netContent-kind')],
  ['E15', 'smallest packs', row('us/particulars/small-packs', 'memory')],
  ['F2', 'fragrance allergens', { none: 'No final rule: no duty today.' }],
  ['F5', 'professional products', { warning: /609-c/ }],
];
const CA: readonly Paragraph[] = [
  ['B1', 'both languages', row('ca/particulars/languages', 'official'), row('ca/particulars/directions-languages'), duty('ca/duty/two-languages')],
  ['B1', 'legible', duty('ca/duty/legible')],
  ['B1', 'one label', duty('ca/duty/one-label')],
  ['B2', 'contact from 9 October 2024', row('ca/particulars/canadaContact', 'official')],
  ['B2', 'identity', duty('ca/duty/identity')],
  ['B3-B8', 'list of ingredients', { none: 'Worked out and set by the product itself.' }],
  ['C1', 'tag, tape, card or website', duty('ca/duty/small-packs')],
  ['C2', 'ornamental containers', duty('ca/duty/ornamental')],
  ['C3', 'leaflet', duty('ca/duty/leaflet')],
  ['C4', 'height of the figures', row('ca/particulars/netContent-height', 'official')],
  ['C4', 'other letters of 1.6 mm', { kept: () => letters('CA') === 1_600_000, by: 'the label' }, duty('ca/duty/type-height')],
  ['C5', 'display surface', duty('ca/duty/display-surface')],
  ['E1', 'avoidable hazard', duty('ca/duty/avoidable-hazard')],
  ['F1', 'net quantity on the panel; dealer', row('ca/particulars/netContent'), row('ca/particulars/responsiblePerson'), duty('ca/duty/display-panel')],
  ['F2', 'volume or weight', row('ca/particulars/netContent-kind', 'official'), duty('ca/duty/volume-or-weight')],
  ['F3', 'metric, three figures', row('ca/particulars/netContent-figures', 'official'), duty('ca/duty/figures'), { kept: () => netStatement({ value: '1500', unit: 'ml' }, 'CA')!.parts[0] === '1.5 L', by: 'the label' }],
  ['F4', 'imported by', row('ca/particulars/importer', 'official'), duty('ca/duty/imported-by')],
  ['F5', 'tolerance', duty('ca/duty/tolerance')],
  ['F6', 'exemptions from both languages', duty('ca/duty/bilingual-exemptions')],
  ['F7', 'Quebec', duty('ca/duty/quebec')],
];

const DUTIES = new Set(lawTables.duties.map(({ id }) => id));
function faultOf(held: Held): string | undefined {
  if ('none' in held) return held.none.length > 15 ? undefined : 'no reason';
  if ('kept' in held) return held.kept() ? undefined : `not kept by ${held.by}`;
  if ('duty' in held) return DUTIES.has(held.duty) ? undefined : `no duty ${held.duty}`;
  if ('warning' in held) return lawTables.warnings.some(({ id, market }) => market === 'US' && held.warning.test(id)) ? undefined : `no warning ${String(held.warning)}`;
  const found = particularRows.find(({ id }) => id === held.row);
  if (!found) return `no row ${held.row}`;
  return held.sourcing && found.sourcing !== held.sourcing ? `${held.row} is sourced ${found.sourcing}` : undefined;
}
const faultsOf = (paragraphs: readonly Paragraph[]): string[] => paragraphs.flatMap(([at, fact, ...held]) => (held.length === 0 ? [`${at} ${fact}: held nowhere`] : held.flatMap((one) => faultOf(one) ?? []).map((fault) => `${at} ${fact}: ${fault}`)));
const ALL = { EU, UK, US, CA };

test.each(Object.entries(ALL))('every paragraph about labels of %s is a row, or has a reason not to be', (market, paragraphs) => {
  const rows = paragraphs.filter(([, , ...held]) => held.some((one) => 'row' in one || 'kept' in one || 'warning' in one)).length;
  console.info(`${market}: ${String(paragraphs.length)} paragraphs, ${String(rows)} held by rows, ${String(paragraphs.length - rows)} with a reason`);
  expect(faultsOf(paragraphs)).toEqual([]);
});

test('every row stands in the list of its law', () => {
  const named = new Set(Object.values(ALL).flat().flatMap(([, , ...held]) => held.flatMap((one) => ('row' in one ? [one.row] : []))));
  expect(particularRows.filter(({ id }) => !named.has(id)).map(({ id }) => id)).toEqual([]);
});

test('a paragraph that is held nowhere is found', () => {
  expect(faultsOf([['x', 'nothing'], ['y', 'no row', row('eu/particulars/none')], ['z', 'another sourcing', row('eu/particulars/netContent', 'memory')]])).toHaveLength(3);
});

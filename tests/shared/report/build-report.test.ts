import { expect, test } from 'vitest';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Finding } from '#shared/engine/types.ts';
import { buildReport, type ReportedResult } from '#shared/report/build-report.ts';
import { mergeFindings } from '#shared/report/merge-findings.ts';
import { decimal } from '#shared/kernel/rational.ts';
import { dayInWords, shareAsBand } from '#shared/report/words.ts';

const finding = (over: Partial<Finding> = {}): Finding => ({
  kind: 'limit-exceeded',
  severity: 'stop',
  rule: 'eu/annex-v/29',
  subject: 'Phenoxyethanol',
  citation: 'Regulation (EC) No 1223/2009, Annex V, entry 29',
  message: 'It is at 1.08 %.',
  remedy: 'Bring Phenoxyethanol to 1 % or less.',
  arithmetic: [{ step: 'Share in the product', figure: '6 × 90 ÷ 500 = 1.08 %' }],
  ...over,
});

const document: FormulaDocument = {
  document: 'formula/1',
  product: { name: 'Test Wash', brand: 'Brackenmere Bathhouse', category: 'body-wash', markets: ['EU'], flags: {}, facts: {}, claims: [], mayContain: [], netContent: { value: '250', unit: 'ml' } },
  materials: [
    { id: 'water', tradeName: 'Water', declareAs: 'ingredients', composition: [], constituents: [] },
    { id: 'blend', tradeName: 'Preservative blend', declareAs: 'ingredients', composition: [], constituents: [] },
  ],
  formula: { batchSize: '500', lines: [{ material: 'water', phase: 'Water', amount: '', unit: 'qs' }, { material: 'blend', phase: 'Cool-down', amount: '6', unit: 'g' }] },
};
const result: ReportedResult = {
  market: 'EU',
  placedOnMarket: '2026-12-01',
  availableOn: '2026-12-01',
  exposure: 'rinse-off',
  declaration: { heading: 'Ingredients', text: 'Ingredients: Aqua, 1,2-Hexanediol, Phenoxyethanol', entries: [{ name: 'Phenoxyethanol', inci: 'Phenoxyethanol', zone: 'ordered', share: { min: '1.08', typical: '1.08', max: '1.08' } }] },
  allergens: [{ name: 'Limonene', total: { min: '0', typical: '0.0015', max: '0.003' }, threshold: '0.01', disclose: false }],
  findings: [finding()],
  requiredWording: [],
};
const input = { house: 'Brackenmere Bathhouse', document, results: [result], dataRelease: '2026-12', lawReadOn: '2026-12-01' };

test('a point that two markets make is told once, with both citations', () => {
  const merged = mergeFindings([
    { market: 'EU', findings: [finding()] },
    { market: 'UK', findings: [finding({ citation: 'as assimilated' })] },
    { market: 'US', findings: [finding({ message: 'another reason' })] },
  ]);
  expect(merged.map((point) => point.markets)).toEqual([['EU', 'UK'], ['US']]);
  expect(merged[0]!.citations).toEqual(['Regulation (EC) No 1223/2009, Annex V, entry 29', 'as assimilated']);
});

test('the report says how many points stop sale and leads with what to do', () => {
  const report = buildReport({ ...input, showShares: true });
  expect(report.counts).toEqual({ stop: 1, decide: 0, note: 0 });
  expect(report.finding).toBe('One point stops sale.');
  expect(report.verdicts.stop[0]!.act).toBe('Bring Phenoxyethanol to 1 % or less.');
});

test('the formula stands in grams and percent with the make-up line worked out', () => {
  const { formula } = buildReport({ ...input, showShares: true });
  expect(formula.phases).toEqual([
    { name: 'Water', lines: [{ name: 'Water', note: 'makes up', grams: '494.00', percent: '98.80' }] },
    { name: 'Cool-down', lines: [{ name: 'Preservative blend', note: '', grams: '6.00', percent: '1.20' }] },
  ]);
  expect(formula.total).toEqual({ grams: '500.00', percent: '100.00' });
});

test('a name with a comma inside stays one name', () => {
  expect(buildReport({ ...input, showShares: true }).declarations[0]!.names).toEqual(['Aqua', '1,2-Hexanediol', 'Phenoxyethanol']);
});

test('for outsiders no exact figure of the formula is left anywhere in the report', () => {
  const report = buildReport({ ...input, showShares: false });
  expect(report.ladder).toBeUndefined();
  expect(JSON.stringify(report)).not.toMatch(/1\.08|494|98\.8|1\.20|6 ×/);
  expect(report.formula.phases[1]!.lines[0]!.percent).toBe('over 1 to 3');
});

test('the ladder keeps what stays unnamed apart from what is printed', () => {
  const { ladder } = buildReport({ ...input, showShares: true });
  expect(ladder!.rows.map((row) => [row.name, row.zone])).toEqual([['Phenoxyethanol', 'ordered'], ['Limonene', 'unnamed']]);
});

/** Edges of the table in Cosmetic Regulations, C.R.C., c. 869, s. 30. */
test.each([
  ['100', 'over 80 to 100'],
  ['80', 'over 65 to 80'],
  ['3', 'over 1 to 3'],
  ['3.01', 'over 3 to 10'],
  ['0.1', 'over 0.001 to 0.1'],
  ['0.001', 'up to 0.001'],
])('a share of %s %% falls in the band %s', (share, band) => {
  expect(shareAsBand(decimal(share))).toBe(band);
});

test('days are written without a chance of confusion', () => {
  expect(dayInWords('2026-12-01')).toBe('1 December 2026');
});

test('conditions that nothing entered decides stand once in the list of what was not checked', () => {
  const open = 'Triethanolamine: Nitrosamines must be kept out. (Annex III, entry 62)';
  const two = { ...input, results: [{ ...result, notChecked: [open] }, { ...result, market: 'UK' as const, notChecked: [open] }], showShares: true };
  expect(buildReport(two).notChecked.filter((one) => one.startsWith('Triethanolamine'))).toEqual([open]);
});

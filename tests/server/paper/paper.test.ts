import { execFileSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import type { ReportModel, WeighOutModel } from '#shared/report/report-model.ts';
import { renderReportPdf } from '#server/paper/report-pdf.ts';
import { renderWeighOutPdf } from '#server/paper/weigh-out-pdf.ts';

/** Read back with poppler, an outside reader. */
const HASH = 'a5d77530aa4053d9f7ba3c3669e6a724c5d1b0f2a5d77530aa4053d9f7ba3c36';

function read(pdf: Uint8Array, tool: 'pdftotext' | 'pdffonts' | 'pdfinfo'): string {
  const file = join(mkdtempSync(join(tmpdir(), 'paper-')), 'paper.pdf');
  writeFileSync(file, pdf);
  return execFileSync(tool, tool === 'pdftotext' ? ['-layout', file, '-'] : [file], { encoding: 'utf8' });
}

const report = (lines: number): ReportModel => ({
  house: 'Brackenmere Bathhouse',
  name: 'Juniper & Oat Body Wash',
  function: 'Body wash',
  subtitle: 'EU, as first sold on 1 December 2026.',
  markets: ['EU'],
  counts: { stop: 0, decide: 1, note: 0 },
  finding: 'No rule in data release 2026-12 is broken.',
  declarations: [{ label: 'EU, English', heading: 'Ingredients', names: ['Aqua', 'Decyl Glucoside', 'Lavandula Oil/Extract'], text: '' }],
  requiredWording: [],
  verdicts: {
    stop: [],
    decide: [{ severity: 'decide', kind: 'order-uncertain', rule: 'order', subject: 'Glycerin', markets: ['EU'], act: 'Ask the supplier.', why: 'The ranges overlap.', arithmetic: ['75 g × 29–32 % = 4.35–4.8 %'], citations: ['Regulation (EC) No 1223/2009, Article 19(1)(g)'] }],
    note: [],
  },
  formula: {
    basis: 'As added, 500 g',
    isExact: true,
    phases: [{ name: 'Water', lines: Array.from({ length: lines }, (_, index) => ({ name: `Material ${index + 1}`, note: '', grams: '5.00', percent: '1.00' })) }],
    total: { grams: '500.00', percent: '100.00' },
  },
  particulars: [{ name: 'Batch', value: 'BW-0412', rule: 'Art. 19(1)(e)' }],
  notChecked: ['Stability.'],
  cautions: ['It is not a safety assessment.'],
  dataRelease: '2026-12',
  lawReadOn: '1 December 2026',
});

const weighOut = (lines: number): WeighOutModel => ({
  house: 'Brackenmere Bathhouse',
  name: 'Juniper & Oat Body Wash',
  function: 'Body wash',
  batchCode: 'BW-0412',
  size: '500.00 g',
  phases: [{ letter: 'A', name: 'Water', total: '500.00', steps: [{ text: 'Stir until clear.', temperature: '20–25 °C', unit: 'C' }], lines: Array.from({ length: lines }, (_, index) => ({ name: `Material ${index + 1}`, target: '5.00', from: '4.95', to: '5.05', caution: '' })) }],
  sum: '500.00',
  makesUp: '',
  cautions: ['Weigh as added.'],
  dataRelease: '2026-12',
});

test('the report reads back with finding, declaration, arithmetic, citation and page numbers', async () => {
  const text = read(await renderReportPdf(report(3), HASH, '2026-12-01'), 'pdftotext');
  for (const part of ['Juniper & Oat Body Wash', 'Aqua, Decyl Glucoside, Lavandula Oil/Extract.', '75 g × 29–32 % = 4.35–4.8 %', 'Article 19(1)(g)', 'SHA-256 of the document a5d7 7530', '1 of 1', 'Not checked'])
    expect(text.replaceAll('\u00a0', ' ')).toContain(part);
});

test('a long formula turns pages and repeats the head of its table', async () => {
  const text = read(await renderReportPdf(report(70), HASH, '2026-12-01'), 'pdftotext');
  const pages = text.split('\f').filter((page) => page.includes('Material 1') || page.includes('Material 69'));
  expect(pages.length).toBeGreaterThan(1);
  for (const page of pages) expect(page).toMatch(/Material\s+g\s+%/);
});

test('every face is embedded, subset and readable as text', async () => {
  const fonts = read(await renderReportPdf(report(3), HASH, '2026-12-01'), 'pdffonts').split('\n').slice(2).filter(Boolean);
  expect(fonts.length).toBeGreaterThan(1);
  for (const font of fonts) expect(font).toMatch(/^PAPER[A-D]\+IBMPlexSans-\w+\s+CID TrueType\s+Identity-H\s+yes yes yes/);
});

test('equal input gives equal bytes', async () => {
  expect(Buffer.from(await renderReportPdf(report(3), HASH, '2026-12-01')).equals(Buffer.from(await renderReportPdf(report(3), HASH, '2026-12-01')))).toBe(true);
});

test('the weigh-out sheet carries each target between its limits and asks for the temperature read', async () => {
  const text = read(await renderWeighOutPdf(weighOut(4), HASH, '2026-12-01'), 'pdftotext');
  expect(text).toMatch(/Material 4\s+5\.00\s+4\.95\s+5\.05/);
  expect(text).toMatch(/Stir until clear\.\s+20–25 °C\s+read\s+°C/);
  expect(text).toMatch(/Sum\s+500\.00/);
});

test('a weigh-out sheet of sixty lines repeats its head on every page', async () => {
  const pdf = await renderWeighOutPdf(weighOut(60), HASH, '2026-12-01');
  expect(read(pdf, 'pdfinfo')).toMatch(/Pages:\s+[3-4]/);
  const heads = read(pdf, 'pdftotext').match(/Target, g/g) ?? [];
  expect(heads.length).toBeGreaterThanOrEqual(2);
});

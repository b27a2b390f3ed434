import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, type Page } from 'playwright-core';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import { makeHome, removeHome, startProduct } from '#tests/support/product.ts';
import { median, ms, quantile, type Row } from './report.ts';
import { measureSuggestions } from './suggest.bench.ts';

const MATERIALS = 40;
const KEYSTROKES = 60;
const TABLES = join(import.meta.dirname, '../../data/dictionary');

/** A formula document of 40 materials, each with so many substances; one line's amount is what is typed over. */
function largeDocument(substances: number): object {
  const names = ['thickeners-polymers', 'oils-butters-waxes', 'humectants'].flatMap((file) => parseEntries(readFileSync(join(TABLES, `${file}.csv`), 'utf8')).map(({ inci }) => inci));
  const shares = substances === 1 ? ['100'] : ['52.5', '20', '12.25', '7', '4.5', '2.5', '1', '0.25'].slice(0, substances);
  const materials = Array.from({ length: MATERIALS }, (_, index) => ({
    id: `m${index}`,
    tradeName: `Bench material ${index} of ${substances}`,
    composition: shares.map((percent, at) => ({ inci: names[(index * 11 + at * 37) % names.length]!, percent })),
  }));
  return {
    document: 'formula/1',
    product: { name: `Bench ${substances}`, brand: 'Bench', category: 'face-cream', markets: ['EU'] },
    materials,
    formula: {
      batchSize: { value: '500', unit: 'g' },
      // As makers write it: the first line makes up the batch.
      lines: materials.map(({ id }, index) => (index === 0 ? { material: id, phase: 'A', unit: 'qs' } : { material: id, phase: 'A', amount: `${(index % 9) + 1}`, unit: 'g' })),
    },
  };
}

async function importProduct(page: Page, document: object): Promise<string> {
  const { csrfToken } = (await (await page.request.get('/api/session')).json()) as { csrfToken: string };
  const origin = new URL(page.url()).origin;
  const answer = await page.request.post('/api/products/import', { data: { document }, headers: { 'x-colophon-token': csrfToken, origin } });
  if (!answer.ok()) throw new Error(await answer.text());
  return ((await answer.json()) as { id: string }).id;
}

/** Milliseconds from the input event to the printed list's change, one keystroke each, after a warm-up. */
async function typeOver(page: Page, name: string): Promise<number[]> {
  const field = page.getByRole('textbox', { name, exact: true });
  await field.focus();
  await page.evaluate(() => {
    const store = window as unknown as { times: number[]; from: number };
    store.times = [];
    store.from = 0;
    document.addEventListener('input', () => (store.from = performance.now()), { capture: true });
    new MutationObserver(() => {
      if (store.from > 0) store.times.push(performance.now() - store.from);
      store.from = 0;
    }).observe(document.querySelector('.printed')!, { subtree: true, childList: true, characterData: true });
  });
  for (let index = 0; index < KEYSTROKES; index += 1) {
    await field.evaluate((input: HTMLInputElement) => input.select());
    await page.keyboard.press(index % 2 === 0 ? '9' : '1');
    await page.waitForTimeout(250);
  }
  const times = await page.evaluate(() => (window as unknown as { times: number[] }).times);
  return times.slice(10);
}

/** The list a maker sees follow her typing, in Debian's Chromium against the running product. */
export async function runLiveBench(): Promise<Row[]> {
  const home = makeHome();
  const product = await startProduct(home);
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--disable-gpu', '--no-sandbox', '--disable-background-networking', '--disable-component-update'] });
  try {
    const page = await (await browser.newContext({ baseURL: product.address, viewport: { width: 1440, height: 1000 } })).newPage();
    await page.goto('/auth/sign-in?next=/');
    await page.getByRole('button', { name: /Ines Tarrow/ }).click();
    await page.waitForURL(`${product.address}/**`);
    const rows: Row[] = [];
    for (const substances of [1, 8]) {
      const id = await importProduct(page, largeDocument(substances));
      await page.goto(`/products/${id}`);
      await page.getByText('Bench material 39').first().waitFor();
      await page.waitForTimeout(2000);
      const times = await typeOver(page, `Bench material 1 of ${substances}, grams`);
      const typical = times.length > 0 ? median(times) : Infinity;
      rows.push({
        name: `keystroke to declaration, 40 materials of ${substances}`,
        measured: `median ${ms(typical)}, p95 ${ms(times.length > 0 ? quantile(times, 0.95) : Infinity)} (${times.length})`,
        promise: 'median under 16 ms',
        isKept: typical < 16,
      });
    }
    rows.push(await measureSuggestions(page));
    return rows;
  } finally {
    await browser.close();
    await product.stop();
    removeHome(home);
  }
}

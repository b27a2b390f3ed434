import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';
import { median, ms, quantile, type Row } from './report.ts';

const TABLES = join(import.meta.dirname, '../../data/dictionary');
const WORDS = 30;
/** Letters typed of each word: a maker has what she seeks after five or six. */
const LETTERS = 6;

/** Names from all over the dictionary, each begun as it is typed. */
function wordsToType(): string[] {
  const names = readdirSync(TABLES).filter((file) => file.endsWith('.csv') && file !== 'oil-profiles.csv').flatMap((file) => parseEntries(readFileSync(join(TABLES, file), 'utf8')).map(({ inci }) => inci));
  return Array.from({ length: WORDS }, (_, index) => names[(index * 173 + 41) % names.length]!.slice(0, LETTERS).toLowerCase());
}

/**
 * From the keystroke to the frame in which its suggestions stand: the search's answer in the
 * list, drawn. Typed at five letters a second in a new material, against the whole dictionary.
 */
export async function measureSuggestions(page: Page): Promise<Row> {
  await page.goto('/materials/new');
  const field = page.getByRole('combobox', { name: 'Ingredient 1', exact: true });
  await field.waitFor();
  await page.waitForTimeout(1500);
  await page.evaluate(() => {
    const store = window as unknown as { times: number[] };
    store.times = [];
    const plain = (text: string | null | undefined): string => (text ?? '').toLowerCase().replaceAll(/[^a-z0-9]/g, '');
    document.addEventListener('input', (event) => {
      const from = performance.now();
      const field = event.target as HTMLInputElement;
      const typed = field.value;
      // Drawn: some entry of the list marks exactly what is typed by now.
      const look = (): void => {
        if (field.value !== typed || plain(typed) === '' || performance.now() - from > 2000) return;
        const isDrawn = [...document.querySelectorAll('.options .option mark')].some((mark) => plain(mark.textContent) === plain(typed));
        // The frame is on the screen once the task after it runs.
        if (isDrawn) setTimeout(() => store.times.push(performance.now() - from));
        else requestAnimationFrame(look);
      };
      requestAnimationFrame(look);
    }, { capture: true });
  });
  const words = wordsToType();
  for (const word of words) {
    await field.fill('');
    await page.waitForTimeout(250);
    await field.pressSequentially(word, { delay: 200 });
  }
  await page.waitForTimeout(500);
  const drawn = await page.evaluate(() => (window as unknown as { times: number[] }).times);
  // A letter whose suggestions never came counts as the slowest of all.
  const typed = words.reduce((sum, word) => sum + word.length, 0);
  const times = [...drawn, ...new Array<number>(Math.max(0, typed - drawn.length)).fill(Infinity)].slice(10);
  const p95 = times.length > 0 ? quantile(times, 0.95) : Infinity;
  return { name: 'keystroke to painted suggestions', measured: `median ${ms(times.length > 0 ? median(times) : Infinity)}, p95 ${ms(p95)} (${drawn.length} of ${typed} letters)`, promise: 'p95 under 30 ms', isKept: p95 < 30 };
}

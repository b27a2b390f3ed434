/** What a person's hands do in every journey. */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Download, Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { checkout } from '#tests/support/cluster.ts';

/** A word that sets this run's materials and products apart, so that a journey may be walked again on the same data. */
export const RUN = Date.now().toString(36).slice(-5);

/** Waits until a figure or text of the page is what it should be. */
export async function expectSoon<T>(read: () => Promise<T>, expected: T, why = ''): Promise<void> {
  await expect.poll(read, { timeout: 15_000, interval: 60, message: why }).toEqual(expected);
}

/** The page's one level-one heading. */
export function heading(page: Page, name: string): Locator {
  return page.getByRole('heading', { level: 1, name, exact: true });
}

/** Opens one of the house's products from the list, by its name. @returns its address */
export async function openProduct(page: Page, name: string): Promise<string> {
  await page.goto(`/products?find=${encodeURIComponent(name)}`);
  await page.getByRole('table', { name: 'Products' }).getByRole('link', { name, exact: true }).click();
  await heading(page, name).waitFor();
  return new URL(page.url()).pathname;
}

/** Begins a product from nothing. @returns its address */
export async function beginProduct(page: Page, product: { readonly name: string; readonly kind: string; readonly markets: readonly string[] }): Promise<string> {
  await page.goto('/products/new?from=nothing');
  await page.getByRole('textbox', { name: 'Name', exact: true }).fill(product.name);
  await page.getByRole('combobox', { name: 'What it is' }).selectOption({ label: product.kind });
  for (const box of await page.getByRole('group', { name: 'Sold in' }).getByRole('checkbox').all()) {
    const word = (await box.evaluate((input) => input.closest('label')?.textContent)) ?? '';
    await box.setChecked(product.markets.includes(word.slice(0, 2)));
  }
  await page.getByRole('button', { name: 'Create product' }).click();
  await heading(page, product.name).waitFor();
  return new URL(page.url()).pathname;
}

/** Adds one of the house's materials as the next line, by keyboard alone, and writes its amount. */
export async function addLine(page: Page, material: string, amount: string, column: 'grams' | 'percent' = 'grams'): Promise<void> {
  const field = page.getByRole('combobox', { name: 'Add a material' });
  await field.focus();
  await field.fill(material);
  await page.getByRole('option', { name: material }).filter({ hasNotText: 'New material' }).first().waitFor();
  await field.press('ArrowDown');
  await field.press('Enter');
  const figure = page.getByRole('textbox', { name: `${material}, ${column}`, exact: true });
  await figure.waitFor();
  await figure.fill(amount);
}

export function figure(page: Page, material: string, column: 'grams' | 'percent' = 'grams'): Locator {
  return page.getByRole('textbox', { name: `${material}, ${column}`, exact: true });
}

/** Waits until the product says that it is saved. @returns the version it names */
export async function waitSaved(page: Page, after = 0): Promise<number> {
  const words = page.getByRole('status').filter({ hasText: /^Version \d+, saved / });
  const version = async () => Number(/^Version (\d+),/.exec((await words.textContent({ timeout: 1_000 }).catch(() => '')) ?? '')?.[1] ?? 0);
  await expect.poll(version, { timeout: 20_000, interval: 80, message: 'the product says that it is saved' }).toBeGreaterThan(after);
  return version();
}

/** The names of a printed list in their order, as one text. */
export async function printedList(page: Page, market: string): Promise<string> {
  const list = page.getByRole('region', { name: 'Declaration', exact: true }).getByRole('group', { name: `Ingredients for ${market}, as printed` });
  // The measure over the slip is drawn, not printed.
  return oneLine(await list.evaluate((group) => {
    const copy = group.cloneNode(true) as HTMLElement;
    for (const drawn of copy.querySelectorAll('[aria-hidden="true"]')) drawn.remove();
    return copy.textContent;
  }));
}

export function oneLine(text: string): string {
  return text.replaceAll(' ', ' ').replace(/\s+/g, ' ').trim();
}

/** Presses something and keeps the file it hands over. @returns its path */
export async function keepFile(page: Page, press: () => Promise<void>): Promise<{ readonly path: string; readonly name: string }> {
  const waiting: Promise<Download> = page.waitForEvent('download', { timeout: 30_000 });
  await press();
  const download = await waiting;
  const folder = join(checkout, 'build/downloads');
  mkdirSync(folder, { recursive: true });
  const path = join(folder, `${RUN}-${download.suggestedFilename().replaceAll(/[^\w.-]/g, '_')}`);
  await download.saveAs(path);
  return { path, name: download.suggestedFilename() };
}

/** Puts text into whatever has the focus, as a paste from another program does. */
export async function paste(field: Locator, text: string): Promise<void> {
  await field.focus();
  await field.evaluate((element, words) => {
    const data = new DataTransfer();
    data.setData('text/plain', words);
    element.dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }));
  }, text);
}

/** Tabs until the focus is on something of this name. @returns how many times */
export async function tabTo(page: Page, name: string | RegExp, most = 60): Promise<number> {
  for (let pressed = 1; pressed <= most; pressed += 1) {
    await page.keyboard.press('Tab');
    const said = await page.evaluate(() => {
      const element = document.activeElement;
      const label = element instanceof HTMLInputElement ? element.labels?.[0]?.textContent : undefined;
      return (element?.getAttribute('aria-label') ?? label ?? element?.textContent ?? '').trim();
    });
    if (typeof name === 'string' ? said.startsWith(name) : name.test(said)) return pressed;
  }
  throw new Error(`${String(name)} was not reached with ${most} presses of Tab`);
}

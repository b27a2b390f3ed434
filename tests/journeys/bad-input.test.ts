import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import { launchBrowser, openVisit, signIn, takePicture, type Visit } from '#tests/support/browser.ts';
import { addLine, beginProduct, expectSoon, figure, oneLine, openProduct, RUN, waitSaved } from './hands.ts';
import { HOSTILE, makeTooLarge } from './papers.ts';

let browser: Browser;
let visit: Visit;
let page: Page;
let count = 0;

beforeAll(async () => {
  browser = await launchBrowser();
});
beforeEach(async () => {
  visit = await openVisit(browser);
  page = visit.page;
  await signIn(page, 'Ines Tarrow');
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await takePicture(page, 'bad-input-stopped-here');
  await visit.close();
});
afterAll(() => browser.close());

/** A small product of its own for each mishap. @returns its address */
async function smallProduct(): Promise<string> {
  count += 1;
  const address = await beginProduct(page, { name: `Mishap ${RUN} ${count}`, kind: 'Body wash', markets: ['EU'] });
  await page.getByRole('textbox', { name: 'Batch size, g' }).fill('100');
  await addLine(page, 'Purified water', '90');
  await addLine(page, 'Vegetable glycerine', '10');
  await figure(page, 'Vegetable glycerine').press('Tab');
  await waitSaved(page, 1);
  return address;
}

test('an amount that cannot be is refused where it stands, and the figure before it stays in force', async () => {
  await smallProduct();
  const glycerine = figure(page, 'Vegetable glycerine');
  for (const [typed, why] of [
    ['-3', 'An amount cannot be negative.'],
    ['a lot', '“a lot” is not a number. Write one such as 12.5.'],
    ['99999999999', 'That is more than a thousand tonnes. Check the figure.'],
  ] as const) {
    await glycerine.fill(typed);
    await page.getByRole('alert').filter({ hasText: why }).waitFor();
    expect(await glycerine.getAttribute('aria-invalid')).toBe('true');
    expect(await figure(page, 'Vegetable glycerine', 'percent').inputValue()).toBe('10');
  }
  await glycerine.press('Escape');
  await expectSoon(() => glycerine.inputValue(), '10');
  await glycerine.fill('0');
  await page.getByText('10 g short of the batch of 100 g').first().waitFor();
  await glycerine.fill('30');
  await page.getByText('20 g over the batch of 100 g').first().waitFor();
});

test('a composition over 100 % says by how much and an unknown name is marked, and both may be put right', async () => {
  await page.goto('/materials/new');
  await page.getByRole('textbox', { name: 'Name, as you call it' }).fill(`Overfull ${RUN}`);
  await page.getByRole('combobox', { name: 'Ingredient 1', exact: true }).fill('Moonlight Essence');
  await page.keyboard.press('Tab');
  await page.getByRole('textbox', { name: 'Share or least of ingredient 1, percent' }).fill('104');
  const composition = page.getByRole('region', { name: 'Composition' });
  await composition.getByText('Not a known INCI name', { exact: false }).waitFor();
  await composition.getByText('104', { exact: false }).first().waitFor();
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByText('Not saved yet.', { exact: false }).first().waitFor();
  expect(new URL(page.url()).pathname).toBe('/materials/new');
  await page.getByRole('textbox', { name: 'Share or least of ingredient 1, percent' }).fill('100');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByRole('status').filter({ hasText: /^Saved / }).waitFor();
});

test('an empty formula says how to begin on every part of its product', async () => {
  const address = await beginProduct(page, { name: `Empty ${RUN}`, kind: 'Hand cream', markets: ['EU'] });
  await page.getByText('No line yet.').waitFor();
  await page.getByText('Nothing to judge yet.').waitFor();
  for (const part of ['declaration', 'verdicts', 'label', 'report']) {
    await page.goto(`${address}/${part}`);
    await page.getByRole('heading', { level: 1, name: `Empty ${RUN}` }).waitFor();
    expect(await page.getByText('This page could not be shown').count(), part).toBe(0);
  }
  expect(visit.faults).toEqual([]);
});

test('of two people who save one product, the second sees both versions and chooses', async () => {
  const address = await smallProduct();
  const other = await openVisit(browser);
  await signIn(other.page, 'Maud Pellow', address);
  await figure(other.page, 'Vegetable glycerine').waitFor();
  const version = await waitSaved(page);
  await page.getByRole('textbox', { name: 'Batch code' }).fill('FROM-INES');
  await figure(page, 'Vegetable glycerine').fill('12');
  await figure(page, 'Vegetable glycerine').press('Tab');
  await waitSaved(page, version);
  await figure(other.page, 'Vegetable glycerine').fill('15');
  await figure(other.page, 'Vegetable glycerine').press('Tab');
  const dialog = other.page.getByRole('alertdialog', { name: 'Two versions of this product' });
  await dialog.waitFor();
  const row = dialog.getByRole('row').filter({ hasText: 'Vegetable glycerine' });
  expect(oneLine((await row.textContent()) ?? '')).toMatch(/10 g.*15 g.*12 g/);
  await row.getByRole('radio', { name: /theirs/ }).check();
  await dialog.getByRole('button', { name: 'Save what is chosen' }).click();
  await dialog.waitFor({ state: 'detached' });
  await waitSaved(other.page, version + 1);
  expect(await figure(other.page, 'Vegetable glycerine').inputValue()).toBe('12');
  expect(await other.page.getByRole('textbox', { name: 'Batch code' }).inputValue(), 'what only Ines changed is kept').toBe('FROM-INES');
  await other.close();
});

test('a reload in the middle keeps what was not saved yet', async () => {
  await smallProduct();
  // Saving cannot reach the server: the change lives on this computer alone.
  await page.route('**/api/products/*', (route) => (route.request().method() === 'GET' ? route.continue() : route.abort()));
  await figure(page, 'Vegetable glycerine').fill('11');
  await figure(page, 'Vegetable glycerine').press('Tab');
  await page.getByRole('status').filter({ hasText: /^Not saved/ }).waitFor();
  page.once('dialog', (dialog) => void dialog.accept());
  await page.reload();
  await page.unroute('**/api/products/*');
  await page.getByText('Work that was not saved is still here.').waitFor();
  expect(await figure(page, 'Vegetable glycerine').inputValue()).toBe('10');
  await page.getByRole('button', { name: 'Take it up again' }).click();
  await expectSoon(() => figure(page, 'Vegetable glycerine').inputValue(), '11');
  await waitSaved(page);
});

test('a lost connection is said, and what was typed is sent when it is back', async () => {
  const address = await smallProduct();
  const version = await waitSaved(page);
  await visit.context.setOffline(true);
  await figure(page, 'Vegetable glycerine').fill('9.5');
  await figure(page, 'Vegetable glycerine').press('Tab');
  await page.getByRole('status').filter({ hasText: /^Not saved: / }).waitFor();
  await visit.context.setOffline(false);
  await waitSaved(page, version);
  await page.goto(address);
  await expectSoon(() => figure(page, 'Vegetable glycerine').inputValue(), '9.5');
});

test('a session that ends in the middle loses nothing', async () => {
  const address = await smallProduct();
  const cookies = await visit.context.cookies();
  await visit.context.clearCookies();
  await figure(page, 'Vegetable glycerine').fill('8.5');
  await figure(page, 'Vegetable glycerine').press('Tab');
  const dialog = page.getByRole('alertdialog', { name: 'Please sign in again' });
  await dialog.waitFor();
  await visit.context.addCookies(cookies);
  await dialog.getByRole('button', { name: 'I have signed in' }).click();
  await dialog.waitFor({ state: 'detached' });
  await expectSoon(() => figure(page, 'Vegetable glycerine').inputValue(), '8.5');
  await page.getByRole('button', { name: 'Try again' }).click({ timeout: 2_000 }).catch(() => undefined);
  await waitSaved(page);
  await page.goto(address);
  await expectSoon(() => figure(page, 'Vegetable glycerine').inputValue(), '8.5');
});

test('a label that cannot fit says what needs how many millimetres more, and makes no press file', async () => {
  const address = await openProduct(page, 'Oat Milk Body Lotion');
  await page.goto(`${address}/label`);
  await page.getByRole('group', { name: 'Shape' }).getByRole('button', { name: 'Flat' }).click();
  await page.getByRole('textbox', { name: 'Width, mm' }).fill('24');
  await page.getByRole('textbox', { name: 'Height, mm' }).fill('16');
  await page.getByText('This label does not hold everything').waitFor();
  await page.getByText(/needs? \d+(\.\d+)? mm more (height|width)/).first().waitFor();
  expect(await page.getByRole('button', { name: 'Download the press file' }).isDisabled()).toBe(true);
  await page.getByRole('button', { name: 'Undo (Ctrl Z)' }).click();
});

test('another house’s product and material are not there', async () => {
  const otter = await openVisit(browser);
  await signIn(otter.page, 'Bram Otter', '/products');
  const theirs = await openProduct(otter.page, 'Plain Olive Bar');
  await otter.close();
  for (const address of [theirs, `${theirs}/report`]) {
    await page.goto(address);
    await page.getByRole('heading', { level: 1, name: 'Nothing stands here' }).waitFor();
    expect((await page.textContent('main')) ?? '').not.toContain('Olive');
  }
  expect((await page.request.get(`/api${theirs}`)).status()).toBe(404);
  expect((await page.request.get(`/api${theirs}/report.pdf`)).status()).toBe(404);
});

test('a hostile file is refused and one over 20 MB is not even sent', async () => {
  await page.goto('/materials?find=shea');
  await page.getByRole('link', { name: /^Shea butter/ }).click();
  const papers = page.getByRole('group', { name: 'Add a document' });
  await papers.getByLabel('Add a document').setInputFiles(HOSTILE);
  await papers.getByRole('button', { name: 'Add', exact: true }).click();
  await papers.getByRole('alert').filter({ hasText: 'Only a PDF or a photo as JPEG, PNG or WebP is taken' }).waitFor();
  await papers.getByRole('button', { name: 'Not this one' }).click();
  let sent = 0;
  page.on('request', (request) => {
    if (request.method() === 'POST') sent += 1;
  });
  await papers.getByLabel('Add a document').setInputFiles(makeTooLarge());
  await papers.getByRole('alert').filter({ hasText: 'A document may be 20 MB at most' }).waitFor();
  expect(sent).toBe(0);
  await page.getByText('None on file.', { exact: false }).waitFor();
});

import type { Browser, Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { expectNoAxeFindings, launchBrowser, openVisit, signIn, type Visit } from '#tests/support/browser.ts';
import { addLine, beginProduct, expectSoon, figure, printedList, RUN } from './hands.ts';

/** What is done with the pointer: every drag has its keyboard way too, which the walk shows. */
let browser: Browser;
let visit: Visit;
let page: Page;

beforeAll(async () => {
  browser = await launchBrowser();
  visit = await openVisit(browser);
  page = visit.page;
  await signIn(page, 'Ines Tarrow');
  await beginProduct(page, { name: `Curlew Wash ${RUN}`, kind: 'Body wash', markets: ['EU'] });
  for (const [material, amount] of [['Vegetable glycerine', '97.9'], ['Xanthan gum, clear', '0.8'], ['Citric acid', '0.7'], ['Lavender oil', '0.6']] as const) await addLine(page, material, amount);
});
afterAll(async () => {
  await visit.close();
  await browser.close();
});

/** Takes something by its middle and lets go over the upper or lower part of something else. */
async function drag(from: Locator, to: Locator, part: number, letGo = true): Promise<void> {
  const [start, end] = [(await from.boundingBox())!, (await to.boundingBox())!];
  await page.mouse.move(start.x + start.width / 2, start.y + start.height / 2);
  await page.mouse.down();
  const target = { x: start.x + start.width / 2, y: end.y + end.height * part };
  await page.mouse.move(target.x, (start.y + target.y) / 2, { steps: 4 });
  await page.mouse.move(target.x, target.y, { steps: 4 });
  if (letGo) await page.mouse.up();
}
const order = () => page.getByRole('textbox', { name: /, grams$/ }).evaluateAll((fields) => fields.map((field) => field.getAttribute('aria-label')?.replace(', grams', '')));
const grip = (material: string) => page.getByRole('button', { name: `${material}: move, note, remove` });

test('a line is dragged to another place, and undo brings it back', async () => {
  const before = ['Vegetable glycerine', 'Xanthan gum, clear', 'Citric acid', 'Lavender oil'];
  expect(await order()).toEqual(before);
  await drag(grip('Lavender oil'), figure(page, 'Xanthan gum, clear'), 0.1);
  await expectSoon(order, ['Vegetable glycerine', 'Lavender oil', 'Xanthan gum, clear', 'Citric acid']);
  await page.getByRole('button', { name: 'Undo (Ctrl Z)' }).click();
  await expectSoon(order, before);
});

test('Escape lets a dragged line go back', async () => {
  const before = await order();
  await drag(grip('Lavender oil'), figure(page, 'Vegetable glycerine'), 0.1, false);
  await page.keyboard.press('Escape');
  await page.mouse.up();
  expect(await order()).toEqual(before);
});

test('a line is dragged into another phase', async () => {
  await page.getByRole('button', { name: 'Add a phase' }).click();
  await addLine(page, 'Purified water', '0');
  const first = figure(page, 'Vegetable glycerine');
  await drag(grip('Purified water'), first, 0.1);
  await expectSoon(async () => (await order())[0], 'Purified water');
  await page.getByRole('button', { name: 'Undo (Ctrl Z)' }).click();
  await expectSoon(async () => (await order()).at(-1), 'Purified water');
});

test('below 1 % an entry of the list is dragged where she wants it, and the list is printed so', async () => {
  const list = 'Ingredients: Glycerin, Xanthan Gum, Citric Acid, Lavandula Oil/Extract, Linalyl Acetate, Linalool';
  await expectSoon(() => printedList(page, 'EU'), list);
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Declaration' }).click();
  const row = (name: string) => page.getByRole('listitem').filter({ has: page.getByRole('button', { name: new RegExp(`^\\d+ ${name}`) }) });
  await drag(row('Lavandula').locator('.grip'), row('Xanthan').locator('.grip'), 0.2);
  const names = () => page.getByRole('listitem').getByRole('button', { name: /^\d+ / }).evaluateAll((all) => all.map((one) => one.textContent.replace(/^\d+/, '')));
  await expectSoon(async () => (await names()).slice(0, 4), ['Glycerin', 'Lavandula Oil/Extract', 'Xanthan Gum', 'Citric Acid']);
});

test('a rung of the ladder is dragged below its neighbour', async () => {
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Formula' }).click();
  const rung = (name: string) => page.getByRole('option', { name: new RegExp(`^${name}`) });
  await drag(rung('Lavandula'), rung('Citric Acid'), 0.9);
  await expectSoon(() => printedList(page, 'EU'), 'Ingredients: Glycerin, Xanthan Gum, Citric Acid, Lavandula Oil/Extract, Linalyl Acetate, Linalool');
});

test('a page whose data cannot be read says so, accessibly, and can be tried again', async () => {
  await page.route('**/api/materials?*', (call) => call.fulfill({ status: 503, contentType: 'application/problem+json', body: JSON.stringify({ type: 'about:blank', title: 'Unavailable', status: 503, detail: 'The database does not answer. Try again in a minute.', code: 'unavailable', requestId: 'r' }) }));
  await page.route('**/api/materials', (call) => call.fulfill({ status: 503, contentType: 'application/problem+json', body: JSON.stringify({ type: 'about:blank', title: 'Unavailable', status: 503, detail: 'The database does not answer. Try again in a minute.', code: 'unavailable', requestId: 'r' }) }));
  await page.goto('/materials');
  await page.getByText('The database does not answer. Try again in a minute.').first().waitFor();
  await expectNoAxeFindings(page);
  await page.unroute('**/api/materials?*');
  await page.unroute('**/api/materials');
  await page.getByRole('button', { name: /try again/i }).first().click();
  await page.getByRole('navigation', { name: 'Materials' }).waitFor();
});

test('a page that waits for its data is accessible', async () => {
  let release = (): void => undefined;
  const held = new Promise<void>((done) => { release = done; });
  await page.route('**/api/session', async (call) => {
    await held;
    await call.continue();
  });
  await page.goto('/products', { waitUntil: 'commit' });
  await page.locator('main[aria-busy="true"]').waitFor();
  await expectNoAxeFindings(page);
  release();
  await page.getByRole('table', { name: 'Products' }).waitFor();
  await page.unroute('**/api/session');
});

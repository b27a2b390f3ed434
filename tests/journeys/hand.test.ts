import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { expectNoAxeFindings, launchBrowser, openVisit, signIn, type Visit } from '#tests/support/browser.ts';
import { addLine, beginProduct, expectSoon, RUN } from './hands.ts';

/** A label composed by hand: by pointer, by keyboard, with a picture of the house's, and told in the trail. */
let browser: Browser;
let visit: Visit;
let page: Page;
let product = '';

beforeAll(async () => {
  browser = await launchBrowser();
  visit = await openVisit(browser, { width: 1440, height: 1100 });
  page = visit.page;
  await signIn(page, 'Maud Pellow');
  product = await beginProduct(page, { name: `Heron Wash ${RUN}`, kind: 'Body wash', markets: ['EU'] });
  for (const [material, amount] of [['Vegetable glycerine', '90'], ['Citric acid', '10']] as const) await addLine(page, material, amount);
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Label' }).click();
  await page.getByRole('button', { name: 'Compose by hand' }).click();
});
afterAll(async () => {
  await visit.close();
  await browser.close();
});

const left = () => page.getByRole('textbox', { name: 'From left, mm' }).inputValue().then(Number);
const row = (name: string) => page.getByRole('list', { name: 'On the label' }).getByRole('button', { name: new RegExp(`^${name}`) });
const thing = (key: string) => page.locator(`[data-key="${key}"]`);

test('a drag moves an element of the label, and one undo brings it back to its template', async () => {
  const box = (await thing('brand').boundingBox())!;
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width / 2 + 30, box.y + box.height / 2 - 6, { steps: 6 });
  await page.mouse.move(box.x + box.width / 2 + 60, box.y + box.height / 2 - 6, { steps: 6 });
  await page.mouse.up();
  await expectSoon(() => row('Brand').textContent(), 'Brandby hand');
  const moved = (await thing('brand').boundingBox())!;
  expect(Math.abs(moved.x - box.x - 60)).toBeLessThan(10);
  await page.getByRole('button', { name: 'Undo (Ctrl Z)' }).click();
  await expectSoon(() => row('Brand').textContent(), 'Brandtemplate');
});

test('a handle pulls the frame wider, and type that fills its frame grows', async () => {
  await row('Product name').click();
  const size = () => page.locator('.board text').filter({ hasText: 'Heron' }).first().getAttribute('font-size').then(Number);
  await page.getByRole('textbox', { name: 'Size, pt' }).fill('');
  await page.getByRole('textbox', { name: 'Size, pt' }).press('Enter');
  const before = await size();
  const handle = (await page.locator('.hand-handle').nth(4).boundingBox())!;
  await page.mouse.move(handle.x + 4, handle.y + 4);
  await page.mouse.down();
  await page.mouse.move(handle.x - 60, handle.y - 20, { steps: 8 });
  await page.mouse.up();
  await expect.poll(size, { timeout: 10_000 }).toBeLessThan(before);
});

test('the keyboard moves what is chosen, and the whole screen passes axe while composing', async () => {
  await row('Net content|Durability|Barcode|Brand').first().click();
  await page.getByRole('region', { name: /Label, unrolled/ }).focus();
  await page.keyboard.press('ArrowRight');
  const from = await left();
  await page.keyboard.press('Shift+ArrowRight');
  await expectSoon(async () => Math.round((await left()) * 1000), Math.round((from + 1) * 1000));
  await expectNoAxeFindings(page);
});

test('a logo sent as SVG is put on the label; a hostile one is refused in words', async () => {
  const file = (name: string, text: string) => ({ name, mimeType: 'image/svg+xml', buffer: Buffer.from(text) });
  const input = page.locator('.picture-shelf input[type=file]');
  await input.setInputFiles(file('bad.svg', '<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 9 9"><script>alert(1)</script></svg>'));
  await page.getByText(/This drawing cannot be taken: it holds a program/).waitFor();
  await input.setInputFiles(file(`Reed ${RUN}.svg`, '<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 20 10"><path d="M0 0h20v10z" fill="#206759"/></svg>'));
  await expectSoon(() => row(`Reed ${RUN}`).textContent(), `Reed ${RUN}by hand`);
  await page.getByText(/^Version \d+, saved/).waitFor();
});

test('what was done stands in the product’s trail, and the chain is whole', async () => {
  await page.goto(`${product}/trail`);
  await page.getByText('saved this product').first().waitFor();
  await expectSoon(async () => (await page.getByRole('main').textContent())?.includes('composing by hand') ?? false, true);
  await page.goto('/trail');
  await page.getByRole('button', { name: 'Verify the chain' }).click();
  await page.getByText('The chain is whole.').waitFor();
  await expectNoAxeFindings(page);
});

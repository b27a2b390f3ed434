import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { launchBrowser, openVisit, signIn, takePicture, type Visit } from '#tests/support/browser.ts';
import { addLine, beginProduct, expectSoon, RUN, waitSaved } from './hands.ts';
import { makeSheet, MISNAMED } from './papers.ts';

/** Ines writes claims, reads what each market says of them, and attaches what shows one. */
const WASH = `Claimed Wash ${RUN}`;

let browser: Browser;
let visit: Visit;
let page: Page;
let product = '';

beforeAll(async () => {
  browser = await launchBrowser();
  visit = await openVisit(browser);
  page = visit.page;
  await signIn(page, 'Ines Tarrow');
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await takePicture(page, 'claims-stopped-here');
});
afterAll(async () => {
  await visit.close();
  await browser.close();
});

const row = (claim: string) => page.getByRole('region', { name: 'Claims and their evidence' }).getByRole('article', { name: claim, exact: true });

async function writeClaims(...claims: readonly string[]): Promise<void> {
  for (const claim of claims) {
    await page.getByRole('button', { name: 'Add a claim' }).click();
    await page.getByRole('textbox', { name: 'Add a claim' }).fill(claim);
    await page.keyboard.press('Enter');
  }
}

test('claims are judged as they are written, market by market, with their words marked', async () => {
  product = await beginProduct(page, { name: WASH, kind: 'Body wash', markets: ['EU', 'US'] });
  await addLine(page, 'Mild glucoside, 52 % active', '100');
  await addLine(page, 'Lavender oil', '1');
  await writeClaims('Leaves skin soft', 'Fragrance-free', 'Hypoallergenic and mild', 'Anti-dandruff');
  await waitSaved(page, 1);
  await page.goto(`${product}/verdicts`);
  await row('Fragrance-free').getByText('not true of it').first().waitFor();
  const answers = async (claim: string) => (await row(claim).locator('[data-market]').allInnerTexts()).map((text) => text.replace(/^\w\w:\s*/, ''));
  await expectSoon(() => answers('Leaves skin soft'), Array.from({ length: 4 }, () => 'nothing found'));
  await expectSoon(() => answers('Anti-dandruff'), ['to be shown', 'to be shown', 'a medicine or drug', 'a medicine or drug']);
  expect(await row('Hypoallergenic and mild').locator('mark').allInnerTexts()).toEqual(['Hypoallergenic']);
  expect(await row('Fragrance-free').getByRole('group', { name: /Attach evidence/ }).count(), 'no paper mends what is not true').toBe(0);
  await page.getByText('The product holds fragrance: Lavandula Angustifolia Oil.', { exact: false }).first().waitFor();
});

test('a paper is attached, counted beside the verdict, opened, and the verdict stays open', async () => {
  const claim = row('Hypoallergenic and mild');
  const place = claim.getByRole('group', { name: 'Attach evidence for Hypoallergenic and mild' });
  await place.locator('input[type=file]').setInputFiles(MISNAMED);
  await place.getByRole('button', { name: 'Attach', exact: true }).click();
  await place.getByText('Only a PDF or a photo as JPEG, PNG or WebP is taken; this file holds something else.').waitFor();
  await place.getByRole('button', { name: 'Not this one' }).click();
  await place.locator('input[type=file]').setInputFiles(await makeSheet('Patch test on 50 people'));
  await place.getByRole('textbox', { name: 'Dated' }).or(place.getByLabel('Dated')).first().fill('2026-05-04');
  await place.getByRole('button', { name: 'Attach', exact: true }).click();
  const link = claim.getByRole('link', { name: 'Test report, composition sheet.pdf' });
  await link.waitFor();
  const kept = await page.request.get((await link.getAttribute('href')) ?? '');
  expect([kept.status(), kept.headers()['content-type']]).toEqual([200, 'application/pdf']);
  await page.getByRole('link', { name: 'Look at the paper attached' }).waitFor();
  await claim.getByText('to be shown').first().waitFor();
});

test('a claim that is reworded leaves its paper in sight', async () => {
  await page.goto(product);
  const field = page.getByRole('textbox', { name: 'Claims 3', exact: true });
  await field.fill('Mild');
  await field.blur();
  await waitSaved(page, 2);
  await page.goto(`${product}/verdicts`);
  const claims = page.getByRole('region', { name: 'Claims and their evidence' });
  await claims.getByRole('heading', { name: 'Papers for words that no longer stand here' }).waitFor();
  await claims.getByText('for “Hypoallergenic and mild”', { exact: false }).waitFor();
  expect(visit.faults).toEqual([]);
});

import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { expectNoAxeFindings, launchBrowser, openVisit, signIn, takePicture, type Visit } from '#tests/support/browser.ts';
import { expectSoon, heading, openProduct, printedList, RUN } from './hands.ts';

/** Ines reads a list from a pack, begins a product from it, and looks at what the law has ahead. */
let browser: Browser;
let visit: Visit;
let page: Page;

beforeAll(async () => {
  browser = await launchBrowser();
  visit = await openVisit(browser);
  page = visit.page;
  await signIn(page, 'Ines Tarrow', '/');
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await takePicture(page, 'lists-and-dates-stopped-here');
});
afterAll(async () => {
  await visit.close();
  await browser.close();
});

const NAME = `Pack wash ${RUN}`;
const list = () => page.getByRole('textbox', { name: 'The list, as it stands on the pack' });
const rows = () => page.getByRole('table', { name: 'Names and their bounds' }).getByRole('row');

describe('a list from a pack', () => {
  test('is read as it is typed, without asking the server', async () => {
    await page.goto('/products');
    await page.getByRole('link', { name: 'Read a list' }).click();
    await heading(page, 'Read a list').waitFor();
    const asked: string[] = [];
    page.on('request', (request) => asked.push(new URL(request.url()).pathname));
    await list().fill('INGREDIENTS/INGRÉDIENTS: AQUA/WATER/EAU, GLYCERIN, 1,2-HEXANEDIOL, PHENOXYETANOL, XANTHAN GUM, PARFUM, LIMONENE*. *from organic farming');
    await rows().filter({ hasText: 'PHENOXYETANOL' }).waitFor();
    expect(await rows().count()).toBe(8);
    await rows().filter({ hasText: 'XANTHAN GUM' }).getByText('at most 1', { exact: true }).waitFor();
    expect(asked.filter((path) => path.startsWith('/api/'))).toEqual([]);
  });

  test('a misspelt name is put right with one press, and the text survives a reload', async () => {
    await page.getByRole('button', { name: 'write it so: Phenoxyethanol for PHENOXYETANOL' }).click();
    await expectSoon(() => list().inputValue().then((text) => text.includes('Phenoxyethanol, XANTHAN GUM')), true);
    await page.reload();
    await expectSoon(() => list().inputValue().then((text) => text.includes('Phenoxyethanol, XANTHAN GUM')), true);
  });

  test('another market reads the same list by its own law', async () => {
    await page.getByText('the law allows 1 %: Regulation (EC) No 1223/2009, Annex V, entry 29').waitFor();
    await page.getByRole('button', { name: 'US', exact: true }).click();
    await page.getByText('the law allows 1 %: Regulation (EC) No 1223/2009, Annex V, entry 29').waitFor({ state: 'detached' });
    await page.getByRole('button', { name: 'EU', exact: true }).click();
    expect(new URL(page.url()).searchParams.get('market')).toBe('EU');
  });

  test('a product is begun from it, its shares marked as estimated and adding up to 100', async () => {
    await page.getByRole('textbox', { name: 'Name of the product' }).fill(NAME);
    await page.getByRole('button', { name: 'Start a product from it' }).click();
    await heading(page, NAME).waitFor();
    await page.getByText('Estimated from an ingredient list').or(page.locator('input[value="Estimated from an ingredient list"]')).first().waitFor();
    // Above the 1 % line the order is the pack's; below it the house's own, so there the names alone are held.
    const printed = await printedList(page, 'EU');
    expect(printed).toMatch(/^Ingredients: Aqua, Glycerin, 1,2-Hexanediol, /);
    for (const name of ['Phenoxyethanol', 'Xanthan Gum', 'Parfum', 'Limonene']) expect(printed).toContain(name);
    await page.goto(`${new URL(page.url()).pathname}/verdicts`);
    await page.getByText('Worth knowing').first().waitFor();
    expect(await page.getByText('add up to').count()).toBe(0);
  });
});

describe('the law calendar', () => {
  test('tells which date touches which product, and leads to its verdicts on that day', async () => {
    await page.getByRole('navigation', { name: 'Rooms' }).getByRole('link', { name: 'Law calendar' }).click();
    await heading(page, 'Law calendar').waitFor();
    await page.getByText(/dates? (?:touch|touches) a product of yours/).waitFor({ timeout: 60_000 });
    const step = page.getByRole('article', { name: /1 Aug 2028, EU: 81 fragrance allergens/ });
    await step.getByText('Juniper & Oat Body Wash').click();
    await step.getByText('it then names').first().waitFor();
    await step.getByRole('link', { name: 'Its verdicts on that day' }).first().click();
    await heading(page, 'Juniper & Oat Body Wash').waitFor();
    const asked = new URL(page.url()).searchParams;
    expect([asked.get('market') ?? 'EU', asked.get('placed'), asked.get('available')]).toEqual(['EU', '2026-07-31', '2028-08-01']);
  });

  test('no day is taken beyond the last one known, and the field says why', async () => {
    const path = await openProduct(page, 'Juniper & Oat Body Wash');
    await page.getByRole('button', { name: /^First sold on: / }).click();
    await page.locator('.day-edit input').fill('2040-01-01');
    await page.getByRole('alert').filter({ hasText: 'what comes later is not guessed' }).waitFor();
    expect(new URL(page.url()).searchParams.get('placed')).toBeNull();
    await page.goto(`${path}/verdicts?placed=2040-01-01`);
    await page.getByText('what comes later is not guessed').first().waitFor();
    await page.getByText('what will bind on 2040-01-01 is not guessed').first().waitFor();
  });
});

test('a verdict opens to its rule, its choices and the official text', async () => {
  const path = await openProduct(page, 'Juniper & Oat Body Wash');
  await page.goto(`${path}/verdicts`);
  await page.getByRole('button', { name: /^Why: / }).first().click();
  await page.getByRole('heading', { name: 'What the rule says' }).waitFor();
  await page.getByRole('heading', { name: 'Where the text leaves a choice' }).waitFor();
  expect(await page.getByRole('link', { name: 'Official text' }).first().getAttribute('href')).toMatch(/^https:\/\//);
});

test.each(['light', 'dark'] as const)('the list and the calendar pass the accessibility checker in the %s theme, wide and narrow', async (theme) => {
  const other = await openVisit(browser, { theme });
  await signIn(other.page, 'Ines Tarrow', '/');
  for (const width of [1440, 390]) {
    await other.page.setViewportSize({ width, height: 900 });
    await other.page.goto('/read');
    if (width === 1440) {
      const example = other.page.getByRole('button', { name: 'Read an example' });
      await example.waitFor();
      await expectNoAxeFindings(other.page);
      await example.click();
    }
    await other.page.getByRole('table', { name: 'Names and their bounds' }).waitFor();
    await expectNoAxeFindings(other.page);
    await other.page.goto('/calendar?since=beginning');
    await other.page.getByText(/dates? (?:touch|touches) a product of yours/).waitFor({ timeout: 60_000 });
    await other.page.locator('.step summary').first().click();
    await expectNoAxeFindings(other.page);
    expect(await other.page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)).toBe(0);
    await takePicture(other.page, `calendar-${width}-${theme}`);
  }
  const path = await openProduct(other.page, 'Juniper & Oat Body Wash');
  await other.page.goto(`${path}/verdicts`);
  for (const button of await other.page.getByRole('button', { name: /^Why: / }).all()) await button.click().catch(() => undefined);
  await expectNoAxeFindings(other.page);
  expect(other.faults).toEqual([]);
  await other.close();
}, 240_000);

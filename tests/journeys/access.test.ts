import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { expectNoAxeFindings, launchBrowser, openVisit, signIn, takePicture, type Visit } from '#tests/support/browser.ts';
import { expectSoon, figure, openProduct, RUN, tabTo, waitSaved } from './hands.ts';

const PRODUCT = 'Juniper & Oat Body Wash';
/** Every screen: its name, its address from the product's and a material's, and something that says that it stands. */
const SCREENS: readonly (readonly [name: string, address: (product: string, material: string) => string, stands: RegExp])[] = [
  ['today', () => '/', /Law dates ahead/],
  ['products', () => '/products', /Judged as of today/],
  ['new product', () => '/products/new?from=nothing', /Create product/],
  ['product from a spreadsheet', () => '/products/new?from=paste', /Rows copied from your spreadsheet/],
  ['materials', () => '/materials', /Citric acid/],
  ['new material', () => '/materials/new', /Write the first ingredient/],
  ['material', (_product, material) => material, /The parts make 100 %/],
  ['dictionary', () => '/dictionary?find=phenoxy', /122-99-6/],
  ['entry', () => '/dictionary/Phenoxyethanol', /Printed name/],
  ['read a list', () => '/read', /Nothing pasted yet/],
  ['law calendar', () => '/calendar', /touch(?:es)? a product of yours/],
  ['house', () => '/house', /Members/],
  ['formula', (product) => product, /All verdicts, in every market/],
  ['declaration', (product) => `${product}/declaration`, /As it must be printed/],
  ['verdicts', (product) => `${product}/verdicts`, /What was not checked/],
  ['label', (product) => `${product}/label`, /Before the press/],
  ['report', (product) => `${product}/report`, /Cautions/],
  ['trail of a product', (product) => `${product}/trail`, /beginning of the trail/],
  ['trail', () => '/trail', /Verify the chain/],
  ['nothing', () => '/nothing-here', /Nothing stands here/],
];
const REFUSALS = new WeakMap<Visit, string[]>();

let browser: Browser;
let product = '';
let material = '';

beforeAll(async () => {
  browser = await launchBrowser();
  const visit = await openVisit(browser);
  await signIn(visit.page, 'Ines Tarrow');
  product = await openProduct(visit.page, PRODUCT);
  await visit.page.goto('/materials?find=lavender');
  material = (await visit.page.getByRole('link', { name: /^Lavender oil/ }).getAttribute('href')) ?? '';
  await visit.close();
});
afterAll(() => browser.close());

/** Collects what the content policy of the page would not let through. */
async function watchPolicy(visit: Visit): Promise<void> {
  const refused: string[] = [];
  REFUSALS.set(visit, refused);
  await visit.context.exposeFunction('tellRefusal', (words: string) => void refused.push(words));
  await visit.context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      (window as unknown as { tellRefusal: (words: string) => void }).tellRefusal(`${event.violatedDirective} ${event.blockedURI}`);
    });
  });
}

/** Elements that reach beyond the window's right edge without standing in something that scrolls. */
function findOverflow(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const wide = document.documentElement.scrollWidth - document.documentElement.clientWidth;
    if (wide <= 0) return [];
    const right = document.documentElement.clientWidth;
    return [`${wide} px`, ...[...document.querySelectorAll('main *')].filter((each) => each.getBoundingClientRect().right > right + 1).slice(0, 3).map((each) => `${each.tagName}.${each.className}`)];
  });
}

describe.each([
  ['light', 1440],
  ['dark', 1440],
  ['light', 390],
  ['dark', 390],
] as const)('in the %s theme, %i pixels wide', (theme, width) => {
  test('every screen is accessible, fits, says no fault and stays at home', async () => {
    const visit = await openVisit(browser, { theme, width, height: width === 390 ? 844 : 900 });
    await watchPolicy(visit);
    const { page } = visit;
    await page.goto('/sign-in');
    await page.getByRole('link', { name: 'Sign in through your house' }).waitFor();
    await expectNoAxeFindings(page);
    await signIn(page, 'Ines Tarrow');
    const overflow: string[] = [];
    for (const [name, address, stands] of SCREENS) {
      await page.goto(address(product, material));
      await page.getByText(stands).first().waitFor({ state: 'attached' });
      await expectNoAxeFindings(page).catch((error: unknown) => {
        throw new Error(`${name}: ${JSON.stringify((error as { actual?: unknown }).actual ?? String(error))}`);
      });
      overflow.push(...(await findOverflow(page)).map((each) => `${name}: ${each}`));
      await takePicture(page, `${name.replaceAll(' ', '-')}-${width}-${theme}`);
    }
    expect(overflow).toEqual([]);
    expect(visit.faults).toEqual([]);
    expect(REFUSALS.get(visit)).toEqual([]);
    await visit.close();
  });
});

test('the formula is written, moved and left by keyboard alone, and the focus is always seen', async () => {
  const visit = await openVisit(browser);
  const { page } = visit;
  await signIn(page, 'Ines Tarrow', product);
  await figure(page, 'Citric acid').waitFor();
  await tabTo(page, 'Xanthan gum, clear, grams', 40);
  await page.keyboard.press('Enter');
  await expectSoon(() => focusName(page), 'Vegetable glycerine, grams');
  await page.keyboard.press('ArrowDown');
  await expectSoon(() => focusName(page), 'Oat extract in water and glycerine, grams');
  await page.keyboard.press('ArrowRight');
  await expectSoon(() => focusName(page), 'Oat extract in water and glycerine, percent');
  await page.keyboard.press('Enter');
  await expectSoon(() => focusName(page), 'Mild glucoside, 52 % active, percent');
  await expectFocusSeen(page);
  await page.getByRole('button', { name: 'Scale to another batch' }).focus();
  await page.keyboard.press('Enter');
  await expectSoon(() => focusName(page), 'New batch size, g');
  // The focus goes round inside the dialog and comes back to where it was.
  for (let pressed = 0; pressed < 8; pressed += 1) {
    await page.keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.closest('[role="dialog"]') !== null)).toBe(true);
  }
  await page.keyboard.press('Escape');
  await page.getByRole('dialog').waitFor({ state: 'detached' });
  await expectSoon(() => focusName(page), 'Scale to another batch');
  await page.keyboard.press('Control+k');
  await page.keyboard.type('lavender');
  await page.getByRole('dialog', { name: 'Find' }).getByRole('option').first().waitFor();
  await page.keyboard.press('Escape');
  await page.getByRole('dialog', { name: 'Find' }).waitFor({ state: 'detached' });
  expect(visit.faults).toEqual([]);
  await visit.close();
});

function focusName(page: Page): Promise<string> {
  return page.evaluate(() => {
    const element = document.activeElement;
    const label = element instanceof HTMLInputElement ? element.labels?.[0]?.textContent : '';
    return (element?.getAttribute('aria-label') ?? (label || element?.textContent) ?? '').trim();
  });
}

/** WCAG 2.4.11: what has the focus is not hidden under a bar that sticks. */
async function expectFocusSeen(page: Page): Promise<void> {
  const isSeen = await page.evaluate(() => {
    const element = document.activeElement;
    if (!element) return false;
    const box = element.getBoundingClientRect();
    const above = document.elementFromPoint(box.left + box.width / 2, box.top + box.height / 2);
    return above !== null && (element.contains(above) || above.contains(element));
  });
  expect(isSeen, 'the focus is in sight').toBe(true);
}

test('an assessor reads the whole product and can change nothing', async () => {
  const visit = await openVisit(browser);
  await signIn(visit.page, 'Dr Odile Marsh', product);
  const { page } = visit;
  await page.getByText('Purified water makes up the rest').waitFor();
  expect(await figure(page, 'Citric acid').getAttribute('readonly')).not.toBeNull();
  for (const name of ['Add a phase', 'Paste from a spreadsheet', 'Undo (Ctrl Z)', 'Scale to another batch']) expect(await page.getByRole('button', { name }).count(), name).toBe(0);
  expect(await page.getByRole('combobox', { name: 'Add a material' }).count()).toBe(0);
  await page.goto(`${product}/label`);
  await page.getByRole('textbox', { name: 'Label height, mm' }).waitFor();
  expect(await page.getByRole('textbox', { name: 'Label height, mm' }).isDisabled()).toBe(true);
  await page.goto('/products');
  await page.getByRole('heading', { level: 1, name: 'Products' }).waitFor();
  expect(await page.getByRole('link', { name: 'New product' }).count()).toBe(0);
  expect(await answerTo(page, product)).toBe(403);
  await visit.close();
});

test('an artworker changes the label and nothing else', async () => {
  const visit = await openVisit(browser);
  const { page } = visit;
  await signIn(page, 'Piet Lund', product);
  await page.getByText('Purified water makes up the rest').waitFor();
  expect(await figure(page, 'Citric acid').getAttribute('readonly')).not.toBeNull();
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Label' }).click();
  const before = await waitSaved(page);
  await page.getByRole('radio', { name: 'Sloe' }).check();
  await waitSaved(page, before);
  await page.reload();
  await expectSoon(() => page.getByRole('radio', { name: 'Sloe' }).isChecked(), true);
  await page.getByRole('radio', { name: 'Juniper' }).check();
  await waitSaved(page, before + 1);
  expect(await answerTo(page, product)).toBe(403);
  await visit.close();
});

test('a seller reads the label and the report, and is shown no way to change them', async () => {
  const visit = await openVisit(browser);
  const { page } = visit;
  await signIn(page, 'Rhea Colby', `${product}/report`);
  await page.getByRole('article', { name: 'Compliance report' }).waitFor();
  await page.goto('/materials?find=lavender');
  await page.getByRole('link', { name: /^Lavender oil/ }).click();
  await page.getByText('You may read materials, not change them').waitFor();
  expect(await page.getByRole('button', { name: 'Save', exact: true }).count()).toBe(0);
  expect(await page.getByRole('link', { name: 'New material' }).count()).toBe(0);
  expect(await answerTo(page, product)).toBe(403);
  await visit.close();
});

/** Sends the product to the server past every screen. @returns the server's answer */
function answerTo(page: Page, address: string, name = `Taken over ${RUN}`): Promise<number> {
  return page.evaluate(async ([path, name]) => {
    const session = (await (await fetch('/api/session')).json()) as { csrfToken: string };
    const { product } = (await (await fetch(`/api${path}`)).json()) as { product: { version: number; draft: object } };
    const answer = await fetch(`/api${path}`, {
      method: 'PUT',
      headers: { 'content-type': 'application/json', 'x-colophon-token': session.csrfToken },
      body: JSON.stringify({ version: product.version, draft: { ...product.draft, name } }),
    });
    return answer.status;
  }, [address, name] as const);
}

test('the same words from a formulator are taken', async () => {
  const visit = await openVisit(browser);
  await signIn(visit.page, 'Ines Tarrow');
  expect(await answerTo(visit.page, product, PRODUCT)).toBe(200);
  await visit.close();
});

test('with reduced motion nothing moves', async () => {
  const visit = await openVisit(browser);
  await signIn(visit.page, 'Ines Tarrow', product);
  await figure(visit.page, 'Citric acid').waitFor();
  const moving = await visit.page.evaluate(() =>
    [...document.querySelectorAll('*')].flatMap((element) => {
      const { transitionDuration, animationDuration, animationName } = getComputedStyle(element);
      const longest = Math.max(...transitionDuration.split(',').map(Number.parseFloat), animationName === 'none' ? 0 : Number.parseFloat(animationDuration));
      return longest > 0.01 ? [`${element.tagName}.${element.className}`] : [];
    }),
  );
  expect(moving).toEqual([]);
  await visit.close();
});

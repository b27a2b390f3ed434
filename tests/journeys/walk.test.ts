import { execFileSync } from 'node:child_process';
import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { launchBrowser, openVisit, takePicture, type Visit } from '#tests/support/browser.ts';
import { addLine, beginProduct, expectSoon, figure, keepFile, oneLine, paste, printedList, RUN, tabTo, waitSaved } from './hands.ts';
import { makePhoto, makeSheet, MISNAMED } from './papers.ts';

/** One day of Ines Tarrow, formulator: the steps build on each other. */
const OAT = `Oat drops ${RUN}`;
const FOAM = `Foam betaine ${RUN}`;
const ORANGE = `Orange oil ${RUN}`;
const WASH = `Heron Wash ${RUN}`;

let browser: Browser;
let visit: Visit;
let page: Page;
let product = '';

beforeAll(async () => {
  browser = await launchBrowser();
  visit = await openVisit(browser);
  page = visit.page;
});
afterEach(async ({ task }) => {
  // What the page showed when a step failed.
  if (task.result?.state === 'fail') await takePicture(page, 'walk-stopped-here');
});
afterAll(async () => {
  await visit.close();
  await browser.close();
});

const share = (index: number, which: 'least' | 'most' = 'least') =>
  page.getByRole('textbox', { name: `${which === 'least' ? 'Share or least' : 'Most'} of ingredient ${index}, percent` });
const ingredient = (index: number) => page.getByRole('combobox', { name: `Ingredient ${index}`, exact: true });

/** Writes a name as a person does, and takes the first suggestion once it is the right one. */
async function choose(index: number, typed: string, found: string): Promise<void> {
  await ingredient(index).click();
  await ingredient(index).pressSequentially(typed);
  const first = page.getByRole('listbox').getByRole('option').first();
  await expect.poll(() => first.innerText({ timeout: 1_000 }).catch(() => ''), { timeout: 10_000, interval: 60, message: `${typed} finds ${found}` }).toContain(found);
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
}

async function saveMaterial(): Promise<void> {
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByRole('status').filter({ hasText: /^Saved .* by Ines Tarrow$/ }).waitFor();
}

/** A reader of files that is not ours. @returns what it writes */
const run = (tool: string, args: readonly string[]) => execFileSync(tool, args, { encoding: 'utf8' });

test('Ines signs in through the identity page with the keyboard', async () => {
  await page.goto('/products');
  await page.getByRole('heading', { name: 'Colophon' }).waitFor();
  await tabTo(page, 'Sign in through your house');
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { name: 'Who is signing in?' }).waitFor();
  await tabTo(page, 'Ines Tarrow');
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { level: 1, name: 'Products' }).waitFor();
  expect(new URL(page.url()).pathname).toBe('/products');
  await page.getByRole('link', { name: 'Juniper & Oat Body Wash' }).first().waitFor();
});

test('a supplier’s line fills a composition, which is judged while it is typed', async () => {
  await page.goto('/materials/new');
  await page.getByRole('textbox', { name: 'Name, as you call it' }).fill(OAT);
  await page.getByRole('button', { name: 'Paste a composition' }).click();
  const dialog = page.getByRole('dialog', { name: 'Paste a composition' });
  await dialog.getByRole('textbox').fill('Aqua (and) Glycerin (and) Avena Sativa Kernel Extract');
  await dialog.getByRole('row', { name: /Avena Sativa Kernel Extract/ }).waitFor();
  await dialog.getByRole('button', { name: 'Fill in' }).click();
  await expectSoon(() => ingredient(3).inputValue(), 'Avena Sativa Kernel Extract');
  expect([await ingredient(1).inputValue(), await ingredient(2).inputValue()]).toEqual(['Aqua', 'Glycerin']);
  const sum = page.getByRole('region', { name: 'Composition' });
  await share(1).fill('68');
  await share(2).fill('30');
  await share(3).fill('3');
  await sum.getByText('101', { exact: false }).first().waitFor();
  expect(oneLine((await sum.getByRole('alert').or(sum.getByRole('status')).first().textContent()) ?? '')).toMatch(/1 % (over|more|too)|over 100|101/);
  await share(3).fill('2');
  await sum.getByText('The parts make 100 %.').waitFor();
  await page.getByRole('textbox', { name: 'Price per kg' }).fill('18.50');
  await page.getByRole('textbox', { name: 'Not above' }).fill('50');
  await page.getByRole('combobox', { name: 'On whose word' }).selectOption({ label: 'common practice' });
  await saveMaterial();
});

test('names are found by misspelling, common name and CAS number, and ranges are judged together', async () => {
  await page.goto('/materials/new');
  await page.getByRole('textbox', { name: 'Name, as you call it' }).fill(FOAM);
  await choose(1, 'glycerine', 'Glycerin');
  await expectSoon(() => ingredient(1).inputValue(), 'Glycerin');
  await page.getByRole('button', { name: 'Add an ingredient' }).click();
  await choose(2, 'phenoxyethnol', 'Phenoxyethanol');
  await expectSoon(() => ingredient(2).inputValue(), 'Phenoxyethanol');
  await page.getByRole('button', { name: 'Add an ingredient' }).click();
  await choose(3, '77-92-9', 'Citric Acid');
  await expectSoon(() => ingredient(3).inputValue(), 'Citric Acid');
  const sum = page.getByRole('region', { name: 'Composition' });
  await share(1).fill('61');
  await share(1, 'most').fill('65');
  await share(2).fill('29');
  await share(2, 'most').fill('32');
  await share(3).fill('1');
  await share(3, 'most').fill('2');
  // Together 91 to 99: no choice within the ranges makes 100.
  await sum.getByText(/99/).first().waitFor();
  expect(await sum.getByText('The ranges can make 100', { exact: false }).count()).toBe(0);
  await share(3).fill('4');
  await share(3, 'most').fill('7');
  await sum.getByText('The ranges can make 100: their least is 94, their most 104.', { exact: false }).waitFor();
  await saveMaterial();
});

test('an oil is filled in from published ranges, and they are marked as such', async () => {
  await page.goto('/materials/new');
  await page.getByRole('textbox', { name: 'Name, as you call it' }).fill(ORANGE);
  await choose(1, 'sweet orange oil', 'Citrus');
  await share(1).fill('100');
  await page.getByRole('button', { name: 'Fill in from published ranges' }).click();
  const dialog = page.getByRole('dialog', { name: 'Fill in from published ranges' });
  await dialog.getByRole('combobox', { name: 'Oil' }).locator('option').nth(20).waitFor({ state: 'attached' });
  const orange = await dialog.getByRole('combobox', { name: 'Oil' }).locator('option').filter({ hasText: /orange/i }).first().textContent();
  await dialog.getByRole('combobox', { name: 'Oil' }).selectOption({ label: orange ?? '' });
  await dialog.getByRole('cell', { name: 'Limonene', exact: true }).waitFor();
  await dialog.getByRole('button', { name: /^Fill in \d+ lines$/ }).click();
  const rows = page.getByRole('table', { name: 'Constituents' });
  await rows.getByText('published range, not your lot').first().waitFor();
  expect(await rows.getByRole('combobox').evaluateAll((fields) => fields.map((field) => (field as HTMLInputElement).value))).toContain('Limonene');
  await page.getByRole('textbox', { name: 'Not above' }).fill('40');
  await saveMaterial();
});

test('a sheet and a photo are kept, a renamed text is refused', async () => {
  const papers = page.getByRole('group', { name: 'Add a document' });
  const file = papers.getByLabel('Add a document');
  await file.setInputFiles(await makeSheet('Orange oil, composition'));
  await papers.getByRole('button', { name: 'Add', exact: true }).click();
  const table = page.getByRole('table', { name: 'Documents' });
  await table.getByText(/composition sheet\.pdf/).waitFor();
  await file.setInputFiles(await makePhoto());
  await papers.getByRole('combobox', { name: 'Kind' }).selectOption({ label: 'Allergen statement' });
  await papers.getByRole('button', { name: 'Add', exact: true }).click();
  await table.getByText(/allergens\.jpg/).waitFor();
  const kept = await page.request.get((await table.getByRole('link', { name: 'Allergen statement' }).getAttribute('href')) ?? '');
  expect(kept.headers()['content-type']).toBe('image/jpeg');
  expect((await kept.body()).includes('Invented Camera Works'), 'the photo tells its device no more').toBe(false);
  await file.setInputFiles(MISNAMED);
  await papers.getByRole('button', { name: 'Add', exact: true }).click();
  await papers.getByText('Only a PDF or a photo as JPEG, PNG or WebP is taken; this file holds something else.').waitFor();
  await papers.getByRole('button', { name: 'Not this one' }).click();
  expect(await table.getByRole('row').count()).toBe(3);
});

test('a product begins with a formula in phases, in grams and in percent', async () => {
  product = await beginProduct(page, { name: WASH, kind: 'Body wash', markets: ['EU', 'US'] });
  await page.getByRole('textbox', { name: 'Batch size, g' }).fill('500');
  await addLine(page, 'Purified water', '300');
  await page.getByRole('button', { name: 'Purified water: move, note, remove' }).click();
  await page.getByRole('menuitem', { name: 'Make up the batch with it' }).click();
  await addLine(page, 'Vegetable glycerine', '4', 'percent');
  await expectSoon(() => figure(page, 'Vegetable glycerine').inputValue(), '20', '4 % of 500 g');
  await page.getByRole('button', { name: 'Add a phase' }).click();
  await addLine(page, 'Mild glucoside, 52 % active', '100');
  await expectSoon(() => figure(page, 'Mild glucoside, 52 % active', 'percent').inputValue(), '20');
  await page.getByText('Purified water makes up the rest').waitFor();
  await waitSaved(page, 1);
});

test('rows from a spreadsheet become lines', async () => {
  await paste(
    page.getByRole('combobox', { name: 'Add a material' }),
    ['Material\tg', `${OAT}\t25`, 'Preservative blend\t6', 'Citric acid\t1.25', 'Lavender oil\t1.5'].join('\n'),
  );
  const dialog = page.getByRole('dialog', { name: 'Paste from a spreadsheet' });
  await dialog.getByRole('button', { name: 'Add 4 lines' }).click();
  await figure(page, 'Lavender oil').waitFor();
  await expectSoon(() => figure(page, 'Preservative blend', 'percent').inputValue(), '1.2');
  const total = page.getByRole('row', { name: /^Total/ });
  expect(await total.getByRole('cell').allInnerTexts()).toEqual(['500', '100']);
});

test('the list of each market is exactly the one that must be printed', async () => {
  // By hand, of 500 g: Decyl Glucoside 52 g; Glycerin 20 + 7.5 g; Phenoxyethanol 5.4 g = 1.08 %, so still in order;
  // below 1 %: Lavandula 1.5 g, Citric Acid 1.25 g, Ethylhexylglycerin 0.6 g, Avena 0.5 g; allergens at most: Linalyl Acetate 0.135 %, Linalool 0.114 %.
  const eu = 'Ingredients: Aqua, Decyl Glucoside, Glycerin, Phenoxyethanol, Lavandula Oil/Extract, Citric Acid, Ethylhexylglycerin, Avena Sativa Kernel Extract, Linalyl Acetate, Linalool';
  await expectSoon(() => printedList(page, 'EU'), eu);
  await page.getByRole('group', { name: 'Market' }).getByRole('button', { name: 'US' }).click();
  await expectSoon(() => printedList(page, 'US'), 'Ingredients: Water, Decyl Glucoside, Glycerin, Phenoxyethanol, Lavandula Angustifolia (Lavender) Oil, Citric Acid, Ethylhexylglycerin, Avena Sativa (Oat) Kernel Extract');
  await page.getByRole('group', { name: 'Market' }).getByRole('button', { name: 'UK' }).click();
  await expectSoon(() => printedList(page, 'UK'), 'Ingredients: Aqua, Decyl Glucoside, Glycerin, Phenoxyethanol, Lavandula Angustifolia Oil, Citric Acid, Ethylhexylglycerin, Avena Sativa Kernel Extract, Linalool');
  await page.getByRole('group', { name: 'Market' }).getByRole('button', { name: 'CA' }).click();
  await expectSoon(() => printedList(page, 'CA'), 'Ingredients/Ingrédients: Aqua, Decyl Glucoside, Glycerin, Phenoxyethanol, Lavandula Angustifolia Oil, Citric Acid, Ethylhexylglycerin, Avena Sativa Kernel Extract, Linalyl Acetate, Linalool');
  await page.getByRole('group', { name: 'Market' }).getByRole('button', { name: 'EU' }).click();
  await expectSoon(() => printedList(page, 'EU'), eu);
});

test('lines are reordered with the keyboard, and every step can be taken back and done again', async () => {
  const order = () => page.getByRole('textbox', { name: /, grams$/ }).evaluateAll((fields) => fields.map((field) => field.getAttribute('aria-label')?.replace(', grams', '')));
  const before = await order();
  expect(before.slice(-2)).toEqual(['Citric acid', 'Lavender oil']);
  await figure(page, 'Lavender oil').focus();
  await page.keyboard.press('Alt+ArrowUp');
  const moved = [...before.slice(0, -2), 'Lavender oil', 'Citric acid'];
  await expectSoon(order, moved);
  await page.getByRole('button', { name: 'Undo (Ctrl Z)' }).click();
  await expectSoon(order, before);
  await page.getByRole('button', { name: 'Redo (Ctrl Shift Z)' }).click();
  await expectSoon(order, moved);
  await figure(page, 'Citric acid').fill('9');
  await figure(page, 'Citric acid').press('Enter');
  await page.keyboard.press('Control+z');
  await expectSoon(() => figure(page, 'Citric acid').inputValue(), '1.25');
  const version = await waitSaved(page);
  await page.reload();
  await figure(page, 'Citric acid').waitFor();
  expect(await order()).toEqual(moved);
  expect(await waitSaved(page)).toBe(version);
});

test('the batch is scaled, and scaled back without a trace', async () => {
  const scale = async (to: string) => {
    await page.getByRole('button', { name: 'Scale to another batch' }).click();
    const dialog = page.getByRole('dialog', { name: 'Scale to another batch' });
    await dialog.getByRole('textbox', { name: 'New batch size, g' }).fill(to);
    await dialog.getByRole('button', { name: 'Scale the formula' }).click();
  };
  const list = await printedList(page, 'EU');
  await scale('1750');
  await expectSoon(() => figure(page, 'Citric acid').inputValue(), '4.375', '1.25 g of 500 g');
  expect(await figure(page, 'Citric acid', 'percent').inputValue()).toBe('0.25');
  await expectSoon(() => printedList(page, 'EU'), list);
  await scale('500');
  await expectSoon(() => figure(page, 'Citric acid').inputValue(), '1.25');
});

test('two exchanged digits are found and put right with one press', async () => {
  // Without a make-up line the lines must meet the batch: 345.25 g written as 354.25 g.
  await page.getByRole('button', { name: 'Purified water: move, note, remove' }).click();
  await page.getByRole('menuitem', { name: 'Fix the grams it has now' }).click();
  await expectSoon(() => figure(page, 'Purified water').inputValue(), '346.25');
  await figure(page, 'Purified water').fill('364.25');
  await figure(page, 'Purified water').press('Tab');
  await page.getByText('18 g over the batch of 500 g').first().waitFor();
  await page.getByRole('button', { name: 'Take 346.25 g', exact: true }).click();
  await page.getByText('adds up to the batch of 500 g').waitFor();
  expect(await figure(page, 'Purified water').inputValue()).toBe('346.25');
});

test('a step hotter than a material bears says so where it stands', async () => {
  const steps = page.getByRole('region', { name: 'Steps of Phase B' });
  await steps.getByRole('button', { name: 'Add a step to Phase B' }).click();
  await steps.getByRole('textbox', { name: 'Step 1', exact: true }).fill('Stir everything in.');
  await steps.getByRole('textbox', { name: 'Step 1, temperature' }).fill('158 °F');
  await steps.getByRole('textbox', { name: 'Step 1, time' }).fill('8 h');
  await steps.getByRole('textbox', { name: 'Step 1, time' }).press('Tab');
  const told = steps.getByRole('status').filter({ hasText: OAT });
  await told.waitFor();
  expect(oneLine((await told.textContent()) ?? '')).toMatch(/50 °C/);
  await steps.getByRole('textbox', { name: 'Step 1, temperature' }).fill('20 to 30 °C');
  await steps.getByRole('textbox', { name: 'Step 1, time' }).focus();
  await told.waitFor({ state: 'detached' });
  await waitSaved(page);
});

test('every entry opens to its arithmetic', async () => {
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Declaration' }).click();
  await page.getByRole('button', { name: /^3 Glycerin/ }).click();
  const sum = page.getByRole('table', { name: 'Where the Glycerin comes from' });
  expect(await sum.getByRole('row').filter({ hasText: 'Vegetable glycerine' }).getByRole('cell').allInnerTexts()).toEqual(['20 g', '100 %', '4 %']);
  expect(await sum.getByRole('row').filter({ hasText: OAT }).getByRole('cell').allInnerTexts()).toEqual(['25 g', '30 %', '1.5 %']);
  expect(await sum.getByRole('row').filter({ hasText: 'Sum over 500 g' }).getByRole('cell').allInnerTexts()).toEqual(['5.5 %']);
});

test('below 1 % the order is hers, by keyboard, and it is kept', async () => {
  const order = () => page.getByRole('listitem').getByRole('button', { name: /^\d+ / }).evaluateAll((names) => names.map((name) => name.textContent.replace(/^\d+/, '')));
  const before = await order();
  expect(before.slice(3, 6)).toEqual(['Phenoxyethanol', 'Lavandula Oil/Extract', 'Citric Acid']);
  const version = await waitSaved(page);
  await page.getByRole('button', { name: /^6 Citric Acid/ }).focus();
  await page.keyboard.press('Alt+ArrowUp');
  const chosen = ['Phenoxyethanol', 'Citric Acid', 'Lavandula Oil/Extract'];
  await expectSoon(async () => (await order()).slice(3, 6), chosen);
  await waitSaved(page, version);
  // Phenoxyethanol stands at 1.08 %: no key moves it.
  await page.getByRole('button', { name: /^4 Phenoxyethanol/ }).focus();
  await page.keyboard.press('Alt+ArrowUp');
  await page.reload();
  await page.getByRole('button', { name: /^5 Citric Acid/ }).waitFor();
  expect((await order()).slice(3, 6)).toEqual(chosen);
  await page.getByRole('button', { name: 'Back to the default order' }).click();
  await expectSoon(order, before);
});

test('a preservative over its limit stops the sale, with its figure and its citation', async () => {
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: /^Verdicts/ }).click();
  const stops = page.getByRole('region', { name: /^Stops sale/ });
  const told = stops.getByRole('article').filter({ hasText: 'Phenoxyethanol' });
  const words = oneLine((await told.first().textContent()) ?? '');
  expect(words).toContain('Bring Phenoxyethanol to 1 % or less');
  expect(words).toContain('1.08 %');
  expect(words).toMatch(/Regulation \(EC\) No 1223\/2009, Annex V, (entry )?29/);
});

test('before 1 August 2026 fewer allergens are named', async () => {
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Formula' }).click();
  const now = await printedList(page, 'EU');
  expect(now).toContain('Linalyl Acetate');
  await page.getByRole('button', { name: /^First sold on: .* Change$/ }).click();
  await page.getByLabel('First sold on', { exact: true }).and(page.locator('input[type="date"]')).first().fill('2026-07-31');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'First sold on: 31 Jul 2026. Change' }).waitFor();
  await expectSoon(() => printedList(page, 'EU'), now.replace('Lavandula Oil/Extract', 'Lavandula Angustifolia Oil').replace('Linalyl Acetate, ', ''));
  expect(new URL(page.url()).search).toContain('2026-07-31');
  await page.getByRole('button', { name: 'First sold on: 31 Jul 2026. Change' }).click();
  await page.getByLabel('First sold on', { exact: true }).and(page.locator('input[type="date"]')).first().fill('2026-12-01');
  await page.keyboard.press('Enter');
  await expectSoon(() => printedList(page, 'EU'), now);
});

test('less preservative and the label’s particulars clear what stopped the sale', async () => {
  await figure(page, 'Preservative blend').fill('5');
  await page.getByRole('textbox', { name: 'Batch size, g' }).fill('499');
  const particulars = page.getByRole('region', { name: 'Particulars' });
  await particulars.getByRole('textbox', { name: 'Net content' }).fill('250');
  await particulars.getByRole('combobox', { name: 'Durability' }).selectOption({ label: 'months after opening' });
  await particulars.getByRole('spinbutton', { name: 'Months' }).fill('12');
  await particulars.getByRole('textbox', { name: 'Batch code' }).fill('HW-0001');
  await particulars.getByRole('textbox', { name: 'Function' }).fill('Body wash');
  await particulars.getByRole('textbox', { name: 'Directions' }).fill('Lather on wet skin and rinse.');
  await particulars.getByRole('textbox', { name: 'pH' }).fill('5.3');
  await particulars.getByRole('textbox', { name: 'pH' }).press('Tab');
  const stops = page.getByRole('region', { name: 'Verdicts', exact: true }).getByRole('heading', { name: /^Stops sale/ });
  await expectSoon(() => stops.count(), 0, 'nothing stops the sale');
  await page.getByRole('status').filter({ hasText: 'Not saved yet' }).waitFor({ state: 'detached' });
  await waitSaved(page);
});

test('the label stands at its bottle’s size, and its press file holds what the screen shows', async () => {
  const list = await printedList(page, 'EU');
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Label' }).click();
  await page.getByRole('combobox', { name: 'Start from' }).selectOption({ label: 'Bottle, 250 ml (8 fl oz)' });
  await page.getByRole('textbox', { name: 'Figures' }).fill('9521234567899');
  await page.getByText('The check figure agrees.').waitFor();
  const board = page.getByRole('region', { name: 'Label, unrolled, at 100 % of true size' });
  await board.waitFor();
  await page.getByRole('status').filter({ hasText: 'Not saved yet' }).waitFor({ state: 'detached' });
  await waitSaved(page);
  const diameter = await page.getByRole('textbox', { name: 'Diameter, mm' }).inputValue();
  const press = page.getByRole('button', { name: 'Download the press file' });
  await expectSoon(() => press.isEnabled(), true);
  const { path } = await keepFile(page, () => press.click());
  // TrimBox by pdfinfo: the round of the bottle with its paper and its overlap, in points of 1/72 inch.
  const box = /^TrimBox:\s+([\d.]+)\s+([\d.]+)\s+([\d.]+)\s+([\d.]+)/m.exec(run('pdfinfo', ['-box', path]));
  const [left, bottom, right, top] = (box ?? []).slice(1).map(Number) as [number, number, number, number];
  const wide = ((right - left) * 25.4) / 72;
  expect(Math.abs(wide - (Math.PI * (Number(diameter) + 0.06) + 5))).toBeLessThan(0.1);
  expect(Math.abs(((top - bottom) * 25.4) / 72 - Number(await page.getByRole('textbox', { name: 'Label height, mm' }).inputValue()))).toBeLessThan(0.02);
  expect(oneLine(run('pdftotext', ['-raw', path, '-']))).toContain(list);
  run('pdftoppm', ['-r', '300', '-png', '-singlefile', path, path.replace(/\.pdf$/, '')]);
  expect(run('zbarimg', ['-q', path.replace(/\.pdf$/, '.png')]).trim()).toBe('EAN-13:9521234567899');
});

test('the report says the same on screen and on paper, with shares or without', async () => {
  await page.getByRole('navigation', { name: 'Parts of the product' }).getByRole('link', { name: 'Report' }).click();
  const paper = page.getByRole('article', { name: 'Compliance report' });
  await paper.getByText('Decyl Glucoside').first().waitFor();
  const figures = () => paper.getByRole('cell', { name: '52.00' }).count();
  const said = await paper.getByText(/^No rule in the law data named below is broken/).textContent();
  const whole = await keepFile(page, () => page.getByRole('button', { name: 'Report for the file' }).click());
  const text = oneLine(run('pdftotext', ['-layout', whole.path, '-']));
  expect(text).toContain(WASH);
  expect(text).toContain(oneLine(said ?? '').slice(0, 50));
  expect(text).toMatch(/SHA-256 of the document ([0-9a-f]{4} ){8}/);
  expect(text).toMatch(/ 1 of \d/);
  expect(await figures()).toBe(0);
  await page.getByRole('checkbox', { name: 'For an outsider: bands instead of exact shares' }).check();
  const hidden = await keepFile(page, () => page.getByRole('button', { name: 'Report for the file' }).click());
  const outside = oneLine(run('pdftotext', ['-layout', hidden.path, '-']));
  expect(text).toContain('100.00');
  expect(outside).not.toContain('20.04');
  expect(outside).not.toMatch(/Mild glucoside, 52 % active\s+100/);
  expect(outside).toContain('Decyl Glucoside');
});

test('the weigh-out sheet lists every line with its grams', async () => {
  const { path } = await keepFile(page, () => page.getByRole('button', { name: 'Weigh-out sheet' }).click());
  const text = oneLine(run('pdftotext', ['-layout', path, '-']));
  for (const line of ['Purified water', 'Vegetable glycerine', 'Mild glucoside, 52 % active', OAT, 'Preservative blend', 'Lavender oil', 'Citric acid']) expect(text).toContain(line);
  expect(text).toContain('346.25');
  expect(text).toContain('Stir everything in.');
});

test('nothing went wrong in the page meanwhile', () => {
  expect(product).toMatch(/^\/products\//);
  expect(visit.faults).toEqual([]);
});

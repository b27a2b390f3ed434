/** Debian's Chromium for journeys, with the checks that hold on every screen. */
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { delimiter, join } from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { expect } from 'vitest';
import type * as Axe from 'axe-core';
import { checkout } from './cluster.ts';

/** The running product's address; the journeys' set-up starts it. */
export function productAddress(): string {
  const address = process.env['COLOPHON_ADDRESS'];
  if (address === undefined) throw new Error('journeys run through npm test, which starts the product for them');
  return address;
}

export interface Visit {
  readonly page: Page;
  readonly context: BrowserContext;
  /** What went wrong in the page so far: errors, refused content, requests to anywhere else. */
  readonly faults: readonly string[];
  close(): Promise<void>;
}

export interface VisitOptions {
  readonly theme?: 'light' | 'dark';
  readonly width?: number;
  readonly height?: number;
  /** Address of the product when it is not the journeys' own. */
  readonly baseUrl?: string;
}

/** Starts the browser; needs the package chromium. About a second. */
export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: findChromium(),
    headless: true,
    args: [
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      // Its sandbox refuses root.
      ...(process.getuid?.() === 0 ? ['--no-sandbox'] : []),
    ],
  });
}

function findChromium(): string {
  const found = (process.env['PATH'] ?? '').split(delimiter).map((folder) => join(folder, 'chromium')).find((file) => existsSync(file));
  if (found === undefined) throw new Error('Chromium is missing. On Debian: apt-get install chromium');
  return found;
}

/** A person's own window: no cookies, no memory of others. */
export async function openVisit(browser: Browser, options: VisitOptions = {}): Promise<Visit> {
  const baseURL = options.baseUrl ?? productAddress();
  const context = await browser.newContext({
    baseURL,
    viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
    colorScheme: options.theme ?? 'light',
    reducedMotion: 'reduce',
    locale: 'en-GB',
    timezoneId: 'UTC',
    acceptDownloads: true,
  });
  context.setDefaultTimeout(15_000);
  const page = await context.newPage();
  return { page, context, faults: listen(page), close: () => context.close() };
}

function listen(page: Page): string[] {
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(`error: ${error.message}`));
  page.on('console', (message) => {
    // A refusal that a journey provokes is logged by the browser itself; it is no fault of the page.
    if (message.type() === 'error' && !message.text().startsWith('Failed to load resource')) faults.push(`console: ${message.text()}`);
  });
  page.on('request', (request) => {
    const url = new URL(request.url());
    const isHere = url.hostname === '127.0.0.1' || ['data:', 'blob:', 'about:'].includes(url.protocol);
    if (!isHere) faults.push(`request to elsewhere: ${url.href}`);
  });
  return faults;
}

/** Signs in by the list of the built-in identity service and waits for a page of the product. */
export async function signIn(page: Page, name: string, next = '/'): Promise<void> {
  await page.goto(`/auth/sign-in?next=${encodeURIComponent(next)}`);
  await page.getByRole('button', { name }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/auth/') && !url.pathname.startsWith('/sign-in/'));
}

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/**
 * Fails on any automatic accessibility finding (WCAG 2.0 to 2.2, A and AA). The
 * checker is put in past the content policy, which stays in force for the page.
 */
export async function expectNoAxeFindings(page: Page, options: { readonly exclude?: readonly string[] } = {}): Promise<void> {
  await page.evaluate(axeSource);
  const results = await page.evaluate(
    async (exclude): Promise<Axe.AxeResults> => {
      const { axe } = window as unknown as { axe: typeof Axe };
      const context = { include: [['html']], exclude: exclude.map((selector) => [selector]) };
      return axe.run(context, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'], resultTypes: ['violations'] });
    },
    options.exclude ?? [],
  );
  const told = results.violations.flatMap((each) => each.nodes.map((node) => `${each.id}: ${node.target.join(' ')} ${node.failureSummary ?? ''}`));
  expect(results.passes.length + results.inapplicable.length, 'the accessibility checker ran').toBeGreaterThan(0);
  expect(told).toEqual([]);
}

/** A picture of the page for people to look at, in `build/screenshots`. @returns its file */
export async function takePicture(page: Page, name: string): Promise<string> {
  const folder = join(checkout, 'build/screenshots');
  mkdirSync(folder, { recursive: true });
  const path = join(folder, `${name}.png`);
  await page.screenshot({ path, fullPage: true });
  return path;
}

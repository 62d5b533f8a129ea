import { readFileSync, mkdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import {
  chromium,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  type Page,
} from 'playwright-core';
import { afterAll, afterEach } from 'vitest';

const launchFlags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export interface OpenPage {
  page: Page;
  context: BrowserContext;
  /** What the page complained about: console errors, uncaught faults, answers of 500 and above. */
  faults: string[];
}

export interface PageOpener {
  /** A page in a context of its own (no cookies shared), closed after the test. 1440 × 900 unless told otherwise. */
  open: (options?: BrowserContextOptions) => Promise<OpenPage>;
}

function collectFaults(page: Page): string[] {
  const faults: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error') faults.push(`console: ${message.text()} (${message.location().url})`);
  });
  page.on('pageerror', (error) => faults.push(`uncaught: ${error.message}`));
  page.on('response', (response) => {
    if (response.status() >= 500) faults.push(`${response.status()} from ${response.url()}`);
  });
  return faults;
}

/** Call it once at the top of a test file: one browser for the file, one context for every page opened. */
export function createBrowser(): PageOpener {
  let browser: Promise<Browser> | null = null;
  const contexts = new Set<BrowserContext>();
  afterEach(async () => {
    await Promise.all([...contexts].map((context) => context.close()));
    contexts.clear();
  });
  afterAll(async () => {
    await (await browser)?.close();
  });
  return {
    async open(options = {}) {
      browser ??= chromium.launch({ executablePath: '/usr/bin/chromium', headless: true, args: launchFlags });
      const context = await (
        await browser
      ).newContext({
        viewport: { width: 1440, height: 900 },
        locale: 'en-GB',
        timezoneId: 'UTC',
        reducedMotion: 'reduce',
        ...options,
      });
      contexts.add(context);
      const page = await context.newPage();
      page.setDefaultTimeout(15_000);
      return { page, context, faults: collectFaults(page) };
    },
  };
}

/** Kept in .cache/screenshots for a person to look at. */
export async function screenshot(page: Page, name: string): Promise<string> {
  const folder = join('.cache', 'screenshots');
  mkdirSync(folder, { recursive: true });
  const path = join(folder, `${name}.png`);
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
  await page.screenshot({ path, fullPage: true });
  return path;
}

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

interface AxeResult {
  violations: { id: string; help: string; nodes: { target: unknown[]; failureSummary?: string }[] }[];
}

/** Faults against WCAG 2.2 A and AA, one line a place; empty when there are none. */
export async function accessibilityFaults(page: Page): Promise<string[]> {
  // The page's content policy refuses script tags, not evaluation by the browser itself.
  await page.evaluate(axeSource);
  const result = await page.evaluate<AxeResult>(
    `axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] })`,
  );
  return result.violations.flatMap(({ id, help, nodes }) =>
    nodes.map(
      ({ target, failureSummary }) => `${id}: ${help} at ${JSON.stringify(target)} ${failureSummary ?? ''}`,
    ),
  );
}

import { mkdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import type { Knex } from 'knex';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { DEMO_PASSWORD, PEOPLE } from '../../server/demo/scenario';
import { ensureChromium } from '../lib/chromium';
import { allScreens, type DemoRole, type Screen } from './screens';

const WINDOWS = [
  { width: 390, height: 844 },
  { width: 1280, height: 800 },
  { width: 1920, height: 1080 },
];
const THEMES = ['light', 'dark'] as const;

export interface PictureOptions {
  baseUrl: string;
  /** The database behind it, which holds the demo. */
  db: Knex;
  folder: string;
  /** The picture in the README. */
  benchFile: string;
  /** Names of screens; empty = all. */
  chosen: readonly string[];
  say: (line: string) => void;
}

async function launch(say: (line: string) => void): Promise<Browser> {
  const executablePath = await ensureChromium(say);
  const args = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-sync'];
  return chromium.launch({ executablePath, headless: true, args });
}

/** A context of its own for each person, signed in. */
async function contextOf(browser: Browser, baseUrl: string, role: DemoRole | null): Promise<BrowserContext> {
  const context = await browser.newContext({
    locale: 'en-GB',
    timezoneId: 'UTC',
    reducedMotion: 'reduce',
  });
  const person = PEOPLE.find((one) => one.role === role);
  if (person)
    await context.request.post(`${baseUrl}/api/v1/session`, {
      headers: { Origin: baseUrl },
      data: { email: person.email, password: DEMO_PASSWORD },
      failOnStatusCode: true,
    });
  return context;
}

async function settle(page: Page): Promise<void> {
  await page.evaluate('document.fonts.ready.then(() => undefined)');
  await page.waitForTimeout(400);
}

async function open(page: Page, baseUrl: string, { path, shows }: Screen): Promise<void> {
  await page.goto(`${baseUrl}${path}`);
  await page.getByRole(shows.role, { name: shows.name }).first().waitFor();
}

async function takeScreen(page: Page, screen: Screen, options: PictureOptions): Promise<void> {
  await open(page, options.baseUrl, screen);
  for (const size of WINDOWS)
    for (const colorScheme of THEMES) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme });
      await settle(page);
      const path = join(options.folder, `${screen.name}-${size.width}-${colorScheme}.png`);
      await page.screenshot({ path, fullPage: true });
    }
}

/** Every screen at three widths in both themes, and the Bench as the README shows it. */
export async function takePictures(options: PictureOptions): Promise<void> {
  const { baseUrl, chosen, folder, say } = options;
  for (const path of [folder, dirname(options.benchFile)]) mkdirSync(path, { recursive: true });
  const browser = await launch(say);
  try {
    const screens = (await allScreens(options.db)).filter(
      ({ name }) => chosen.length === 0 || chosen.includes(name),
    );
    for (const role of new Set(screens.map((screen) => screen.role))) {
      const page = await (await contextOf(browser, baseUrl, role)).newPage();
      for (const screen of screens.filter((one) => one.role === role)) {
        if (screen.name === 'bench') await takeBench(page, screen, options);
        await takeScreen(page, screen, options);
        say(screen.name);
      }
      await page.context().close();
    }
  } finally {
    await browser.close();
  }
}

async function takeBench(page: Page, screen: Screen, options: PictureOptions): Promise<void> {
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.emulateMedia({ colorScheme: 'light' });
  await open(page, options.baseUrl, screen);
  await settle(page);
  await page.screenshot({ path: options.benchFile });
}

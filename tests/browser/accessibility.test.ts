import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { allScreens, type Screen } from '../../scripts/pictures/screens';
import { accessibilityFaults, createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { enter, expectNoFaults } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();
const screens = await allScreens(app.knex);
const viewers = [...new Set(screens.map((screen) => screen.role))];
const WIDTHS = [390, 1280, 1920, 2560];
const THEMES = ['light', 'dark'] as const;

async function show(page: Page, screen: Screen): Promise<void> {
  await page.goto(`${app.baseUrl}${screen.path}`);
  await page.getByRole(screen.shows.role, { name: screen.shows.name }).first().waitFor();
}

const widerBy = (page: Page): Promise<number> =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

/** A page may be longer than the window, never wider; drawings take a moment to follow the window. */
async function widthFaults(page: Page, screen: Screen): Promise<string[]> {
  const faults: string[] = [];
  for (const width of WIDTHS) {
    await page.setViewportSize({ width, height: 900 });
    const end = Date.now() + 5_000;
    while ((await widerBy(page)) > 0 && Date.now() < end) await page.waitForTimeout(50);
    const over = await widerBy(page);
    if (over > 0) faults.push(`${screen.name} is ${over} px wider than a window of ${width} px`);
  }
  await page.setViewportSize({ width: 1440, height: 900 });
  return faults;
}

/** Colours are those of the theme only when its transitions have ended. */
const themeSettled = (page: Page): Promise<void> =>
  page.evaluate(async () => {
    const frame = () => new Promise((resolve) => requestAnimationFrame(resolve));
    await frame();
    await frame();
    const transitions = document.getAnimations().filter((one) => one instanceof CSSTransition);
    await Promise.allSettled(transitions.map((one) => one.finished));
  });

async function themeFaults(page: Page, screen: Screen): Promise<string[]> {
  const faults: string[] = [];
  for (const colorScheme of THEMES) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await themeSettled(page);
    faults.push(
      ...(await accessibilityFaults(page)).map((fault) => `${screen.name}, ${colorScheme}: ${fault}`),
    );
  }
  return faults;
}

describe.each(viewers)('as seen by %s', (role) => {
  it(
    'every screen is accessible in both themes, fits every window and complains of nothing',
    { timeout: 180_000 },
    async () => {
      const { page, faults } = role === null ? await browser.open() : await enter(browser, app.baseUrl, role);
      const found: string[] = [];
      for (const screen of screens.filter((one) => one.role === role)) {
        await show(page, screen);
        found.push(...(await themeFaults(page, screen)), ...(await widthFaults(page, screen)));
      }
      expect(found).toEqual([]);
      expectNoFaults(faults);
    },
  );
});

interface Focused {
  name: string;
  /** whether a ring or another mark shows where the keyboard is */
  isMarked: boolean;
}

async function tab(page: Page, key: string): Promise<Focused> {
  await page.keyboard.press(key);
  return page.evaluate(() => {
    const element = document.activeElement;
    if (element === document.body) return { name: '', isMarked: true };
    if (!(element instanceof HTMLElement || element instanceof SVGElement))
      return { name: '', isMarked: true };
    const labels = 'labels' in element ? (element.labels as NodeListOf<HTMLLabelElement> | null) : null;
    const words = labels?.[0]?.innerText ?? element.textContent ?? '';
    const name = (element.getAttribute('aria-label') ?? words).replace(/\s+/g, ' ').trim();
    // A hidden slider hands its mark to what it walks through.
    const seen = [element, element.nextElementSibling, element.parentElement, ...element.children];
    const isMarked = seen.some((one) => {
      if (one === null) return false;
      const style = getComputedStyle(one);
      const outlined = style.outlineStyle !== 'none' && Number.parseFloat(style.outlineWidth) > 0;
      const stroked = one instanceof SVGElement && style.stroke !== 'none';
      return outlined || stroked || style.boxShadow !== 'none';
    });
    return { name, isMarked };
  });
}

/** Presses Tab until the named thing has the focus; everything on the way must show that it has it. */
async function tabTo(page: Page, name: string | RegExp, key = 'Tab'): Promise<void> {
  const passed: string[] = [];
  for (let i = 0; i < 90; i += 1) {
    const focused = await tab(page, key);
    if (!focused.isMarked) throw new Error(`nothing shows that “${focused.name}” has the focus`);
    if (typeof name === 'string' ? focused.name === name : name.test(focused.name)) return;
    passed.push(focused.name);
  }
  throw new Error(`Tab never came to ${String(name)}; it passed ${passed.join(' | ')}`);
}

it(
  'the main job goes by keyboard alone: sheet, fit, edit, undo, interpretation',
  { timeout: 120_000 },
  async () => {
    const sheet = screens
      .find((screen) => screen.name === 'bench-without-runs')!
      .path.replace('bench', 'readings');
    const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist');
    await page.goto(`${app.baseUrl}${sheet}`);
    await page.getByRole('table', { name: 'Readings' }).waitFor();
    await tabTo(page, 'Skip to the content');
    await page.keyboard.press('Enter');
    await tabTo(page, 'To the Bench');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Fit beds' }).waitFor();
    await tabTo(page, 'Fit beds');
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Run A', exact: true }).waitFor({ timeout: 60_000 });
    await tabTo(page, 'Resistivity of bed 1');
    await page.keyboard.type('555');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Back to run A' }).waitFor();
    await tabTo(page, 'Undo', 'Shift+Tab');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Back to run A' }).waitFor({ state: 'detached' });
    await tabTo(page, 'Interpret this run');
    await page.keyboard.press('Enter');
    await page.getByRole('dialog', { name: 'Interpret a run' }).waitFor();
    await tabTo(page, 'Begin');
    await page.keyboard.press('Enter');
    await page.getByLabel('Ground of bed 1').waitFor();
    await tabTo(page, /^Ground of bed 1/);
    await page.keyboard.type('gravel');
    await tabTo(page, 'Save changes');
    await page.keyboard.press('Enter');
    await page.getByText('Everything is saved').waitFor();
    expectNoFaults(faults);
    const written = await app.knex('interpretation').where({ title: 'Ground at S-05' });
    expect(written).toHaveLength(1);
  },
);

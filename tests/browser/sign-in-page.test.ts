import { expect, it } from 'vitest';
import { accessibilityFaults, screenshot, createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';

const app = await startApp();
const browser = createBrowser();

it('a visitor without a session meets the sign-in page, whole and accessible', async () => {
  const { page, faults } = await browser.open();
  await page.goto(app.baseUrl);
  await page.getByLabel('Password').waitFor();
  expect(await page.title()).toContain('Layerwell');
  expect(await accessibilityFaults(page)).toEqual([]);
  await screenshot(page, 'sign-in');
  // Asking who is signed in is answered 401, which the browser itself reports.
  expect(faults.filter((fault) => !fault.includes('401'))).toEqual([]);
});

it('with less motion a box has a new size at once, so that no drawing is made at the old one', async () => {
  const { page } = await browser.open();
  await page.goto(app.baseUrl);
  await page.getByLabel('Password').waitFor();
  const width = await page.locator('main').evaluate((element) => {
    element.style.maxWidth = 'none';
    element.style.width = `${element.clientWidth - 100}px`;
    const before = element.clientWidth;
    element.style.width = '200px';
    return [before > 200, element.clientWidth];
  });
  expect(width).toEqual([true, 200]);
});

it('pages of one test share no cookies', async () => {
  const [first, second] = [await browser.open(), await browser.open()];
  await first.context.addCookies([{ name: 'mark', value: 'one', url: app.baseUrl }]);
  expect(await second.context.cookies()).toEqual([]);
});

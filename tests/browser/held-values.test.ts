import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { fitAndWait, openRun } from './support/bench';
import { enter, expectNoFaults } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();

it('a bad value is told in words, a held one has no range, and Side by side opens with the newest runs', async () => {
  const { id } = await app.knex('sounding').where({ name: 'S-02' }).first<{ id: string }>('id');
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', `/soundings/${id}/bench`);
  await openRun(page, 'A').waitFor();
  const thickness = page.getByLabel('Thickness of bed 1', { exact: true });
  const before = await thickness.inputValue();
  await thickness.fill('abc');
  await page.getByRole('alert').getByText('write a number from 0.001').waitFor();
  await thickness.press('Escape');
  expect(await thickness.inputValue()).toBe(before);
  await page.getByText('This model explains the readings.').waitFor();
  await page.getByRole('columnheader', { name: 'Limit' }).waitFor();
  const start = page.getByLabel('Start', { exact: true });
  expect(await start.inputValue()).toBe('curve');
  await thickness.fill('2.55');
  await thickness.press('Enter');
  expect(await start.inputValue()).toBe('model');
  await page.getByRole('heading', { name: 'How many beds run A' }).waitFor();
  await page.getByLabel('Hold the thickness of bed 1 in the next fit').check();
  await fitAndWait(page, 'B');
  await page.getByRole('table', { name: 'Beds' }).getByText('held', { exact: true }).waitFor();
  await page.getByText('the ranges of the others hold only if it is right').waitFor();
  expect(await page.getByText('The readings limit every value at both ends').count()).toBe(0);
  await page.getByRole('link', { name: 'Side by side' }).click();
  await page.getByText('2 chosen').waitFor();
  await page.getByText('holds the thickness of bed 1 at 2.55 m').waitFor();
  expect(
    await page.getByRole('table', { name: 'Beds of each run' }).getByText('held').count(),
  ).toBeGreaterThan(0);
  expectNoFaults(faults);
});

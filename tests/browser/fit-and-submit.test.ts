import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { openRun, shownEarth } from './support/bench';
import { enter, expectNoFaults } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();
const benchOf = async (name: string): Promise<string> =>
  `/soundings/${(await app.knex('sounding').where({ name }).first('id')).id}/bench`;

const byHand = (page: Page) => page.getByRole('button', { name: 'Back to run A' });

it('the keys of the Bench act on arrival and after undo greys out, and not outside the drawing', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', await benchOf('S-01'));
  await page.getByRole('button', { name: 'Fit beds' }).waitFor();
  const before = await shownEarth(page);
  const thickness = page.getByLabel('Thickness of bed 1', { exact: true });
  await thickness.fill('6');
  await thickness.press('Enter');
  await byHand(page).waitFor();
  await page.getByRole('button', { name: 'Undo', exact: true }).click();
  await byHand(page).waitFor({ state: 'detached' });
  await page.keyboard.press('Shift+Z');
  // The button that takes the run up again goes as it is pressed, and the focus must not go with it.
  await byHand(page).click();
  await byHand(page).waitFor({ state: 'detached' });
  await page.keyboard.press('z');
  await byHand(page).waitFor();
  await page.keyboard.press('z');
  await byHand(page).waitFor({ state: 'detached' });
  expect(await shownEarth(page)).toEqual(before);
  await page.getByRole('heading', { name: 'Ledger' }).click();
  await page.keyboard.press('Shift+Z');
  expect(await byHand(page).count()).toBe(0);

  await page.reload();
  await page.getByRole('button', { name: 'Fit beds' }).waitFor();
  expect(await page.evaluate(() => window.scrollY)).toBe(0);
  await page.keyboard.press('f');
  await openRun(page, 'B').waitFor({ timeout: 60_000 });
  expectNoFaults(faults);
});

it('the start that is shown is the start that is asked for, before and after a fit', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', await benchOf('S-02'));
  const start = page.getByLabel('Start', { exact: true });
  const beds = page.getByRole('combobox', { name: 'Beds' });
  await openRun(page, 'A').waitFor();
  await start.selectOption('From this model');
  await page.getByRole('button', { name: 'Fit beds' }).click();
  await page.getByRole('heading', { name: 'Run B', exact: true }).waitFor({ timeout: 60_000 });
  expect(await start.inputValue()).toBe('model');
  expect(await beds.isDisabled()).toBe(true);
  await page.getByRole('region', { name: 'Run B' }).getByText('a given model').waitFor();
  await start.selectOption('From the curve');
  expect(await beds.isDisabled()).toBe(false);
  expect(await beds.inputValue()).toBe('auto');
  expectNoFaults(faults);
});

it('a Ledger that was asked for before the run ended does not hide its end', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', await benchOf('S-03'));
  await openRun(page, 'A').waitFor();
  // a request that no earlier run has answered
  await page.getByRole('combobox', { name: 'Beds' }).selectOption('6');
  await page.route(/\/api\/v1\/soundings\/[^/]+\/runs$/, async (route) => {
    if (route.request().method() !== 'GET') return route.continue();
    const response = await route.fetch();
    await new Promise((resolve) => setTimeout(resolve, 2000));
    return route.fulfill({ response });
  });
  await page.getByRole('button', { name: 'Fit beds' }).click();
  await page.getByRole('heading', { name: 'Run B', exact: true }).waitFor({ timeout: 60_000 });
  expect(new URL(page.url()).searchParams.get('run')).not.toBeNull();
  expectNoFaults(faults);
});

it('an interpretation with nothing written is submitted only when that is confirmed', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', await benchOf('S-01'));
  await openRun(page, 'A').click();
  const facts = page.getByRole('region', { name: 'Run A' });
  await facts.getByRole('link', { name: 'Interpret this run' }).click();
  await page.getByRole('button', { name: 'Begin' }).click();
  await page.getByRole('button', { name: 'Submit for review' }).click();
  const dialog = page.getByRole('dialog', { name: 'Submit for review' });
  await dialog.getByText('No bed is named. The narrative is empty.').waitFor();
  await dialog.getByRole('button', { name: 'Submit', exact: true }).click();
  await dialog.getByRole('alert').waitFor();
  const id = new URL(page.url()).pathname.split('/').at(-1);
  const stateOf = async () => (await app.knex('interpretation').where({ id }).first('state')).state;
  expect(await stateOf()).toBe('draft');
  await dialog.getByLabel('Submit it as it stands').check();
  await dialog.getByRole('button', { name: 'Submit', exact: true }).click();
  await page.getByText('Waits for a hydrogeologist').waitFor();
  expect(await stateOf()).toBe('in-review');
  expectNoFaults(faults);
});

it('a smooth ground is fitted from the Bench, and its cells are no beds to edit, compare or interpret', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', await benchOf('S-04'));
  await openRun(page, 'A').waitFor();
  await page
    .getByRole('form', { name: 'Fit' })
    .getByRole('combobox', { name: 'Ground' })
    .selectOption('Smooth');
  expect(await page.getByRole('combobox', { name: 'Beds' }).count()).toBe(0);
  await page.getByRole('button', { name: 'Fit ground' }).click();
  await page.getByRole('heading', { name: 'Run B', exact: true }).waitFor({ timeout: 60_000 });
  await page.getByRole('heading', { name: 'Cells', exact: true }).waitFor();
  expect(await shownEarth(page)).toEqual({ resistivity: [], thickness: [] });
  expect(await page.getByRole('link', { name: 'Interpret this run' }).count()).toBe(0);
  await page.getByText('Fit beds to interpret.').waitFor();
  const { id } = await app.knex('sounding').where({ name: 'S-04' }).first<{ id: string }>('id');
  const runs = await app.knex('run').where({ sounding_id: id }).orderBy('number').pluck<string[]>('id');
  await page.goto(`${app.baseUrl}/soundings/${id}/side-by-side?runs=${runs.slice(-2).join(',')}`);
  await page.getByText('they are not compared bed by bed').waitFor();
  await page.getByText('cells, no beds').waitFor();
  expectNoFaults(faults);
});

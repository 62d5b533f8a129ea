import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { waitForAnswer } from '../../scripts/lib/ready';
import { enter, expectNoFaults, nameOf, signInHere } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();

async function soundingId(name: string): Promise<string> {
  const row = await app.knex('sounding').where({ name }).first<{ id: string } | undefined>('id');
  return row!.id;
}

const sheetOf = async (name: string): Promise<string> => `/soundings/${await soundingId(name)}/readings`;

const cell = (page: Page, row: number, column: string) =>
  page.getByLabel(`Row ${row}, ${column}`, { exact: true });

const draftIs = (page: Page, words: RegExp): Promise<void> =>
  page.getByRole('status').filter({ hasText: words }).waitFor();

it('whoever is not signed in comes back to the page they asked for', async () => {
  const path = `${await sheetOf('S-07')}?from=mail`;
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', path);
  await page.getByRole('heading', { name: 'S-07', exact: true }).waitFor();
  expect(new URL(page.url()).pathname + new URL(page.url()).search).toBe(path);
  expectNoFaults(faults);
});

it('what is not there, or is not one’s own, is said not to be there', async () => {
  const { page } = await enter(browser, app.baseUrl, 'geophysicist');
  await page.goto(`${app.baseUrl}/no-such-page`);
  await page.getByText('Nothing stands at this address').waitFor();
  await page.goto(`${app.baseUrl}/soundings/00000000-0000-4000-8000-000000000000/bench`);
  await page.getByText('Nothing stands at this address').waitFor();
  const admin = await enter(browser, app.baseUrl, 'admin', await sheetOf('S-07'));
  await admin.page.getByText('belongs to a survey you are not a member of').waitFor();
  expect(await admin.page.getByText('S-07').count()).toBe(0);
});

it('a role that may not is told so, and is offered nothing it cannot do', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', '/admin');
  await page.getByText('Only an administrator sees this page.').waitFor();
  await page.goto(`${app.baseUrl}${await sheetOf('S-07')}`);
  await page.getByText('Your role reads this sheet.').waitFor();
  for (const name of ['Save the readings', 'Read in a file'])
    expect(await page.getByRole('button', { name }).count()).toBe(0);
  expect(await cell(page, 1, 'V').getAttribute('readonly')).not.toBeNull();
  await page.getByRole('navigation').getByRole('link', { name: 'Bench' }).click();
  await page.getByRole('heading', { name: 'Ledger' }).waitFor();
  for (const name of ['Fit beds', 'Compute again'])
    expect(await page.getByRole('button', { name }).count()).toBe(0);
  expectNoFaults(faults);
});

it('two people on one Field sheet: the second sees both versions, and both stay', async () => {
  const path = await sheetOf('S-05');
  const first = await enter(browser, app.baseUrl, 'geophysicist', path);
  const second = await enter(browser, app.baseUrl, 'lead', path);
  await cell(first.page, 2, 'V').fill('123.4');
  await cell(second.page, 3, 'V').fill('234.5');
  await first.page.getByRole('button', { name: 'Save the readings' }).click();
  await draftIs(first.page, /^readings revision 2$/);
  await second.page.getByRole('button', { name: 'Save the readings' }).click();
  const dialog = second.page.getByRole('dialog', { name: 'Someone else saved these readings' });
  await dialog.getByText(`Revision 2 by ${nameOf('geophysicist')}`).waitFor();
  const rows = (await dialog.getByRole('row').allInnerTexts()).map((text) => text.replaceAll('\u00a0', ' '));
  expect(rows).toHaveLength(3);
  expect(rows[1]).toContain('V 123.4 mV');
  expect(rows[2]).toContain('V 234.5 mV');
  expect(rows[1]).toMatch(/V 123\.4 mV was [\d.]+ mV[\s\S]*revision 2/);
  expect(rows[2]).toMatch(/V 234\.5 mV was [\d.]+ mV[\s\S]*yours/);
  await dialog.getByRole('button', { name: 'Save mine as the newest' }).click();
  await draftIs(second.page, /^readings revision 3$/);
  const kept = await app
    .knex('data_revision')
    .where({ sounding_id: await soundingId('S-05') })
    .orderBy('number');
  const text = kept.map((revision: { readings: unknown }) => JSON.stringify(revision.readings));
  expect(text[1]).toContain('123.4');
  expect(text[2]).toContain('234.5');
});

it('a session ended elsewhere leads to the sign-in page and back, and what was typed is still there', async () => {
  const path = await sheetOf('S-16');
  const { page } = await enter(browser, app.baseUrl, 'geophysicist', path);
  await cell(page, 1, 'V').waitFor();
  const elsewhere = await enter(browser, app.baseUrl, 'geophysicist', '/settings');
  await elsewhere.page.getByRole('button', { name: 'Sign out everywhere' }).click();
  const dialog = elsewhere.page.getByRole('dialog', { name: 'Sign out everywhere?' });
  await dialog.getByRole('button', { name: 'Sign out everywhere' }).click();
  await elsewhere.page.getByLabel('E-mail address').waitFor();
  await cell(page, 1, 'V').fill('77.7');
  await page.getByText('Sign in to go on where you were.').waitFor();
  await signInHere(page, 'geophysicist');
  expect(new URL(page.url()).pathname).toBe(path);
  expect(await cell(page, 1, 'V').inputValue()).toBe('77.7');
  await page.getByText('These rows were kept on this device').waitFor();
});

it(
  'while the server is away the draft stays on the device and is sent when it is back',
  { timeout: 90_000 },
  async () => {
    const path = await sheetOf('S-23');
    const { page } = await enter(browser, app.baseUrl, 'geophysicist', path);
    await cell(page, 1, 'V').waitFor();
    await app.web.stop();
    await cell(page, 1, 'V').fill('88.8');
    await draftIs(page, /draft not sent yet \(kept on this device\)/);
    await page.getByRole('button', { name: 'Save the readings' }).click();
    await page.getByText('The server cannot be reached. What you wrote is still here').waitFor();
    app.web.start();
    expect(await waitForAnswer(`${app.baseUrl}/readyz`, 30_000)).toBe(true);
    await page.reload();
    expect(await cell(page, 1, 'V').inputValue()).toBe('88.8');
    await page.getByRole('button', { name: 'Save the readings' }).click();
    await draftIs(page, /^readings revision 2$/);
  },
);

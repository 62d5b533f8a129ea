import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { enter, expectNoFaults, nameOf } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();
const { id: surveyId } = await app.knex('survey').first<{ id: string }>('id');
const members = `/surveys/${surveyId}/members`;

/** Follows the link of the newest letter to this address, as an administrator reads it in the sink. */
async function linkOfLetter(to: string): Promise<string> {
  // a letter is sent after the answer to whoever asked for it
  const arrived = () => app.knex('received_mail').whereRaw('? = any(recipients)', [to]);
  await expect.poll(arrived, { timeout: 15_000 }).not.toHaveLength(0);
  const { page } = await enter(browser, app.baseUrl, 'admin', '/admin?view=mail');
  const letter = page.getByRole('listitem').filter({ hasText: `to ${to}` });
  await letter.first().locator('summary').click();
  return (await letter.first().getByRole('link').getAttribute('href')) ?? '';
}

async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

it('an invitation goes out by mail, makes an account in its role, and holds once', async () => {
  const lead = await enter(browser, app.baseUrl, 'lead', members);
  await lead.page.getByRole('button', { name: 'Invite' }).click();
  const dialog = lead.page.getByRole('dialog', { name: 'Invite to Ostrel valley' });
  await dialog.getByLabel('E-mail address').fill('newcomer@layerwell.example');
  await dialog.getByLabel('Role').selectOption('guest');
  await dialog.getByRole('button', { name: 'Send the invitation' }).click();
  await lead.page.getByRole('status').filter({ hasText: 'newcomer@layerwell.example' }).waitFor();
  const link = await linkOfLetter('newcomer@layerwell.example');

  const { page, faults } = await browser.open();
  await page.goto(link);
  await page.getByText(`${nameOf('lead')} invites you to Ostrel valley as guest.`).waitFor();
  await page.getByLabel('Your name').fill('Gerrit Halm');
  await page.getByLabel('Password').fill('short');
  await page.getByRole('button', { name: 'Join the survey' }).click();
  await page.getByText('must have at least 12 characters').waitFor();
  await page.getByLabel('Password').fill('a password of some length');
  await page.getByRole('button', { name: 'Join the survey' }).click();
  await page.getByText('Your role: guest').waitFor();
  expectNoFaults(faults);

  await lead.page.reload();
  await lead.page.getByRole('row', { name: 'Gerrit Halm' }).waitFor();
  await page.goto(link);
  await page.getByText('This invitation no longer holds').waitFor();
  expect(await page.getByLabel('Password').count()).toBe(0);
});

it('a forgotten password is set anew by a link that holds once and ends every session', async () => {
  const email = 'guest@layerwell.example';
  const before = await enter(browser, app.baseUrl, 'guest');
  const { page } = await browser.open();
  await page.goto(`${app.baseUrl}/sign-in`);
  await page.getByRole('link', { name: 'Forgot the password?' }).click();
  // the page that is left has such a field too
  await page.getByRole('heading', { name: 'Forgotten password' }).waitFor();
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Send the letter' }).click();
  await page.getByText('Look into your mail').waitFor();
  const link = await linkOfLetter(email);
  await page.goto(link);
  await page.getByLabel('New password').fill('a password quite new');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('The password is set').waitFor();

  await before.page.reload();
  await before.page.getByLabel('E-mail address').waitFor();
  await signIn(before.page, email, 'a password quite new');
  await before.page.getByText('Your role: guest').waitFor();

  await page.goto(link);
  await page.getByLabel('New password').fill('a password newer still');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('This link was used already').waitFor();
  expect(await page.getByText('The password is set').count()).toBe(0);
  await page.getByRole('link', { name: 'Ask for a new letter' }).click();
  await page.getByRole('button', { name: 'Send the letter' }).waitFor();
});

it('a lead gives a member another role, which holds at once; the last lead keeps theirs', async () => {
  const lead = await enter(browser, app.baseUrl, 'lead', members);
  const analyst = await enter(browser, app.baseUrl, 'analyst', `/surveys/${surveyId}/boreholes`);
  const add = analyst.page.getByRole('button', { name: 'New borehole' });
  await analyst.page.getByRole('heading', { name: /^BH-1/ }).waitFor();
  expect(await add.count()).toBe(0);
  const roleOf = (name: string) => lead.page.getByRole('row', { name }).getByRole('combobox');
  await roleOf(nameOf('analyst')).selectOption('hydrogeologist');
  await lead.page.getByRole('status').filter({ hasText: 'is now hydrogeologist' }).waitFor();
  await analyst.page.reload();
  await add.waitFor();
  await roleOf(nameOf('lead')).selectOption('guest');
  await lead.page.getByText('A survey keeps at least one lead.').waitFor();
  expect(await roleOf(nameOf('lead')).inputValue()).toBe('lead');
});

it('a disabled account is signed out and stays out until it is enabled again', async () => {
  const person = await enter(browser, app.baseUrl, 'geophysicist');
  const { page } = await enter(browser, app.baseUrl, 'admin', '/admin');
  const account = `the account of ${nameOf('geophysicist')}`;
  await page.getByRole('button', { name: `Disable ${account}` }).click();
  const dialog = page.getByRole('alertdialog').or(page.getByRole('dialog'));
  await dialog.getByRole('button', { name: 'Disable the account' }).click();
  const enable = page.getByRole('button', { name: `Enable ${account}` });
  await enable.waitFor();

  await person.page.reload();
  await signIn(person.page, 'geophysicist@layerwell.example', 'ostrel-valley-well');
  await person.page.getByText('Not signed in').waitFor();
  expect(new URL(person.page.url()).pathname).toBe('/sign-in');
  await enable.click();
  await page.getByRole('button', { name: `Disable ${account}` }).waitFor();
  await signIn(person.page, 'geophysicist@layerwell.example', 'ostrel-valley-well');
  await person.page.getByRole('heading', { name: 'Surveys', exact: true }).waitFor();
});

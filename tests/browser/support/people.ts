import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { DEMO_PASSWORD, PEOPLE } from '../../../server/demo/scenario';
import type { DemoRole } from '../../../scripts/pictures/screens';
import type { OpenPage, PageOpener } from '../../setup/browser';

export const nameOf = (role: DemoRole): string => PEOPLE.find((person) => person.role === role)!.name;

/** Fills in the sign-in page that is open. */
export async function signInHere(page: Page, role: DemoRole): Promise<void> {
  await page.getByLabel('E-mail address').fill(PEOPLE.find((person) => person.role === role)!.email);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByLabel('E-mail address').waitFor({ state: 'detached' });
}

/** A person of the demo in a browser context of their own, on the page they asked for. */
export async function enter(
  opener: PageOpener,
  baseUrl: string,
  role: DemoRole,
  path = '/',
): Promise<OpenPage> {
  const opened = await opener.open();
  await opened.page.goto(`${baseUrl}${path}`);
  await signInHere(opened.page, role);
  return opened;
}

/** The browser itself reports the 401 of asking who is signed in; nothing else may be complained about. */
export const expectNoFaults = (faults: readonly string[]): void =>
  expect(faults.filter((fault) => !fault.includes('401'))).toEqual([]);

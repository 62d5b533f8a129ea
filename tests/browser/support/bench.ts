import type { Locator, Page } from 'playwright-core';

/** Of a bed's table on the Bench, in Ω·m and m; the last bed has no thickness. */
export interface ShownEarth {
  resistivity: number[];
  thickness: number[];
}

async function numbers(page: Page, quantity: string): Promise<number[]> {
  const inputs = await page.getByLabel(new RegExp(`^${quantity} of bed \\d+$`)).all();
  return Promise.all(inputs.map(async (input) => Number(await input.inputValue())));
}

export async function shownEarth(page: Page): Promise<ShownEarth> {
  return { resistivity: await numbers(page, 'Resistivity'), thickness: await numbers(page, 'Thickness') };
}

const ledger = (page: Page): Locator => page.getByRole('region', { name: 'Ledger' });

/** One run in the Ledger. */
export const ledgerRow = (page: Page, letter: string): Locator =>
  ledger(page)
    .getByRole('listitem')
    .filter({ has: page.getByRole('button', { name: `Run ${letter}: more` }) });

export const openRun = (page: Page, letter: string): Locator =>
  ledger(page).getByRole('button', { name: `Open run ${letter}:` });

/** Asks for a fit and waits until its run stands on the Bench. */
export async function fitAndWait(page: Page, letter: string): Promise<void> {
  await page.getByRole('button', { name: 'Fit beds' }).click();
  await page.getByRole('heading', { name: `Run ${letter}`, exact: true }).waitFor({ timeout: 60_000 });
}

/** The lines of the sounding curve as they are drawn. */
export const drawnCurve = (page: Page): Promise<string> =>
  page
    .getByRole('figure', { name: 'Apparent resistivity' })
    .locator('svg path')
    .evaluateAll((paths) => paths.map((path) => path.getAttribute('d')).join(' '));

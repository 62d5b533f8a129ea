import type { Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { drawnCurve, fitAndWait, ledgerRow, openRun, shownEarth } from './support/bench';
import { brokenCopy, publishedFile, type UploadedFile } from './support/files';
import { enter, expectNoFaults } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();

const soundingOf = (page: Page): string => new URL(page.url()).pathname.split('/')[2]!;
const revisionsOf = async (soundingId: string): Promise<number> =>
  (await app.knex('data_revision').where({ sounding_id: soundingId })).length;

const computations = async (): Promise<number> => (await app.knex('computation')).length;

async function makeSounding(page: Page, name: string, spread: string): Promise<string> {
  await page.getByRole('link', { name: 'Ostrel valley' }).first().click();
  await page.getByRole('navigation').getByRole('link', { name: 'Soundings' }).click();
  await page.getByRole('button', { name: 'New sounding' }).click();
  const dialog = page.getByRole('dialog', { name: 'New sounding' });
  await dialog.getByLabel('Name').fill(name);
  await dialog.getByLabel('Spread', { exact: true }).selectOption(spread);
  await dialog.getByRole('button', { name: 'Create the sounding' }).click();
  await page.getByRole('heading', { name, exact: true }).waitFor();
  return soundingOf(page);
}

async function lookAt(page: Page, file: UploadedFile): Promise<void> {
  await page.getByRole('button', { name: 'Read in a file' }).click();
  await page
    .getByRole('dialog', { name: 'Read in a file' })
    .getByLabel('File of readings')
    .setInputFiles(file);
  await page.getByRole('dialog', { name: 'Read in a file' }).getByText('SHA-256').waitFor();
}

async function readIn(page: Page, file: UploadedFile, count: number): Promise<void> {
  await lookAt(page, file);
  await page.getByRole('button', { name: `Import all ${count} readings` }).click();
  await page.getByRole('dialog', { name: 'Read in a file' }).waitFor({ state: 'detached' });
}

const stateOfSheet = (page: Page, words: string): Promise<void> =>
  page.getByRole('status').filter({ hasText: words }).waitFor();

async function toTheBench(page: Page): Promise<void> {
  await page.getByRole('navigation').getByRole('link', { name: 'Bench' }).click();
  await page.getByRole('button', { name: 'Fit beds' }).waitFor();
}

/** Faults are told where they are, and a file that nobody accepts leaves nothing behind. */
async function refuseBrokenFile(page: Page, soundingId: string): Promise<void> {
  await lookAt(page, brokenCopy('earthing-two-layer-b.csv', { 4: '4,41S', 5: '-6,294' }));
  const faults = page
    .getByRole('dialog', { name: 'Read in a file' })
    .getByRole('table', { name: 'Faults in the file' });
  const rows = await faults.getByRole('row').allInnerTexts();
  expect(rows).toHaveLength(3);
  expect(rows[1]).toMatch(/4\s+rhoa \(ohm m\)\s+41S\s/);
  expect(rows[2]).toMatch(/5\s+a \(m\)\s+-6\s/);
  expect(rows[2]).toMatch(/above 0/);
  expect(await page.getByRole('button', { name: 'Import all 7 readings' }).isDisabled()).toBe(true);
  await page.getByRole('button', { name: 'Import nothing' }).click();
  expect(await revisionsOf(soundingId)).toBe(0);
  await stateOfSheet(page, 'no readings saved');
}

/** Published as the rounded curve of 700 over 180 Ω·m with 2.5 m of cover. */
async function findTheCount(page: Page): Promise<void> {
  await fitAndWait(page, 'A');
  await ledgerRow(page, 'A').getByText('2 beds, count found').waitFor();
  const { resistivity, thickness } = await shownEarth(page);
  expect(resistivity).toHaveLength(2);
  expect(Math.abs(resistivity[0]! / 700 - 1)).toBeLessThan(0.01);
  expect(Math.abs(resistivity[1]! / 180 - 1)).toBeLessThan(0.01);
  expect(Math.abs(thickness[0]! / 2.5 - 1)).toBeLessThan(0.01);
  const beds = page.getByRole('table', { name: 'Beds' });
  const [low, high] = (await beds.getByRole('row').nth(2).innerText()).match(/(\d+)\s*–\s*(\d+)/)!.slice(1);
  expect(Number(low)).toBeGreaterThan(150);
  expect(Number(low)).toBeLessThan(180);
  expect(Number(high)).toBeGreaterThan(180);
  expect(Number(high)).toBeLessThan(215);
  const doubts = page.getByRole('region', { name: 'What the data cannot tell' });
  expect(await doubts.innerText()).toContain('All intervals assume flat layers.');
}

/** The curve follows the hand, undo brings the run's own model back to the last digit. */
async function editAndUndo(page: Page): Promise<void> {
  const before = { earth: await shownEarth(page), curve: await drawnCurve(page) };
  const thickness = page.getByLabel('Thickness of bed 1', { exact: true });
  await thickness.fill('6');
  await thickness.press('Enter');
  await page.getByRole('button', { name: 'Back to run A' }).waitFor();
  await expect.poll(() => drawnCurve(page)).not.toBe(before.curve);
  await page.getByRole('button', { name: 'Undo', exact: true }).click();
  await expect.poll(() => drawnCurve(page)).toBe(before.curve);
  expect(await shownEarth(page)).toEqual(before.earth);
}

/** A held value is kept to the digit while the rest is fitted around it. */
async function fitHeld(page: Page): Promise<void> {
  const thickness = page.getByLabel('Thickness of bed 1', { exact: true });
  await thickness.fill('3.2');
  await thickness.press('Enter');
  await page.getByLabel('Hold the thickness of bed 1 in the next fit').check();
  await fitAndWait(page, 'B');
  await ledgerRow(page, 'B').getByText('2 beds, 1 value held').waitFor();
  expect((await shownEarth(page)).thickness).toEqual([3.2]);
}

async function compareRuns(page: Page): Promise<void> {
  for (const letter of ['A', 'B']) await page.getByLabel(`Choose run ${letter} for side by side`).check();
  await page.getByRole('button', { name: 'Side by side: 2 runs' }).click();
  const difference = page.getByRole('region', { name: 'Runs A and B' });
  const words = await difference.innerText();
  expect(words).toContain('Both models have 2 beds');
  expect(words).toMatch(/thickness of bed 1 \(2\.\d+ against 3\.20\sm, held\)/);
  expect(words).toContain('Run A fits closer');
}

/** The same request is not computed twice unless a person asks, and then every bit must agree. */
async function askAgain(page: Page): Promise<void> {
  await openRun(page, 'A').click();
  await page.getByRole('heading', { name: 'Run A', exact: true }).waitFor();
  const before = await computations();
  await fitAndWait(page, 'C');
  expect(await computations()).toBe(before);
  await page.getByRole('region', { name: 'Run C' }).getByText('by run A').waitFor();
  await page.getByRole('region', { name: 'Run C' }).getByRole('button', { name: 'Compute again' }).click();
  await ledgerRow(page, 'D').getByText('identical').waitFor({ timeout: 60_000 });
}

async function writeAndSubmit(page: Page): Promise<string> {
  await openRun(page, 'A').click();
  const facts = page.getByRole('region', { name: 'Run A' });
  await facts.getByRole('link', { name: 'Interpret this run' }).click();
  await page.getByRole('button', { name: 'Begin' }).click();
  await page.getByLabel('Ground of bed 1').fill('dry gravel');
  await page.getByLabel('Ground of bed 2').fill('damp clay');
  await page.getByLabel('Role of bed 2').selectOption('aquitard');
  await page.getByLabel('Confidence of bed 2').selectOption('likely');
  await page.getByLabel('Narrative').fill('Gravel over clay; the base of the gravel is well held.');
  await page.getByRole('button', { name: 'Save changes' }).click();
  await page.getByText('Everything is saved').waitFor();
  await page.getByRole('button', { name: 'Submit for review' }).click();
  await page.getByRole('button', { name: 'Submit', exact: true }).click();
  await page.getByText('Waits for a hydrogeologist').waitFor();
  await page.getByRole('region', { name: 'Beds' }).getByText('damp clay').waitFor();
  // Its own author is not offered the decision.
  expect(await page.getByRole('button', { name: 'Accept' }).count()).toBe(0);
  return new URL(page.url()).pathname;
}

async function readAsGuest(path: string): Promise<void> {
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', path);
  await page.getByRole('region', { name: 'Beds' }).getByText('damp clay').waitFor();
  for (const name of ['Accept', 'Ask for changes', 'Submit for review', 'Save changes'])
    expect(await page.getByRole('button', { name }).count()).toBe(0);
  expectNoFaults(faults);
}

async function acceptAsHydrogeologist(name: string): Promise<void> {
  const { page, faults } = await enter(browser, app.baseUrl, 'hydrogeologist');
  await page.getByRole('region', { name: 'Waiting for you' }).getByRole('link', { name }).click();
  await page.getByRole('link', { name: `Ground at ${name}` }).click();
  await page.getByText('Gravel over clay; the base of the gravel is well held.').waitFor();
  await page.getByRole('button', { name: 'Accept' }).click();
  await page.getByRole('dialog', { name: 'Accept' }).getByRole('button', { name: 'Accept' }).click();
  await page.getByText('Accepted. It stands until').waitFor();
  expectNoFaults(faults);
}

it(
  'from a crew’s file to an accepted interpretation, and the same answer again',
  { timeout: 240_000 },
  async () => {
    const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist');
    const soundingId = await makeSounding(page, 'W-1', 'wenner');
    await refuseBrokenFile(page, soundingId);
    await readIn(page, publishedFile('earthing-two-layer-b.csv'), 7);
    await stateOfSheet(page, 'readings revision 1');
    expect(await revisionsOf(soundingId)).toBe(1);
    await toTheBench(page);
    await findTheCount(page);
    await editAndUndo(page);
    await fitHeld(page);
    await compareRuns(page);
    await toTheBench(page);
    await askAgain(page);
    const path = await writeAndSubmit(page);
    await readAsGuest(path);
    await acceptAsHydrogeologist('W-1');
    await page.reload();
    await page.getByText('Accepted. It stands until').waitFor();
    expectNoFaults(faults);
  },
);

it('a Schlumberger sheet without MN is read, said to be so, and gives the published ground', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist');
  await makeSounding(page, 'X-1', 'schlumberger');
  await readIn(page, publishedFile('conductive-base-schlumberger.csv'), 18);
  await toTheBench(page);
  await fitAndWait(page, 'A');
  // F. Fès, university exercise: 28.26 over 4.09 Ω·m at 91.5 m by least squares of relative errors.
  const { resistivity, thickness } = await shownEarth(page);
  expect(resistivity.map((rho) => Number(rho.toFixed(1)))).toEqual([28.3, 4.1]);
  expect(thickness[0]).toBeCloseTo(91.5, 0);
  const doubts = page.getByRole('region', { name: 'What the data cannot tell' });
  expect(await doubts.innerText()).toContain('MN was not recorded');
  expectNoFaults(faults);
});

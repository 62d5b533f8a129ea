import type { Locator, Page } from 'playwright-core';
import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { enter, expectNoFaults } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();

const idOf = async (table: string, where: object): Promise<string> =>
  (await app.knex(table).where(where).first<{ id: string }>('id')).id;
const surveyPath = async (): Promise<string> => `/surveys/${await idOf('survey', {})}`;
const sounding = (name: string): Promise<string> => idOf('sounding', { name });

const row = (page: Page, name: string): Locator =>
  page.getByRole('table', { name: 'Soundings' }).getByRole('row').filter({ hasText: name });

it('the list of soundings names the run of a misfit, and says which runs do not explain the readings', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', `${await surveyPath()}/soundings`);
  await row(page, 'S-07').getByText('run B').waitFor();
  const rejected = page.getByRole('row').filter({ hasText: 'does not explain the readings' });
  expect((await rejected.allInnerTexts()).map((text) => text.slice(0, 4))).toEqual(['S-10', 'S-13']);
  expectNoFaults(faults);
});

it('the overview words its steps apart from its states, and names on a telephone cover none another', async () => {
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', await surveyPath());
  await page.getByText('Each step counts the soundings that went further, too.').waitFor();
  await page.getByText('Each counted once, by how far it is now:').waitFor();
  await page.setViewportSize({ width: 390, height: 844 });
  const plan = page.getByRole('navigation', { name: /^Plan of/ });
  await expect.poll(() => overlaps(plan)).toEqual([]);
  expect(await plan.locator('svg').evaluate((drawing) => drawing.clientHeight)).toBeGreaterThan(450);
  expectNoFaults(faults);
});

/** Pairs of names on the plan that lie over one another. */
const overlaps = (plan: Locator): Promise<string[]> =>
  plan.evaluate((element) => {
    const boxes = [...element.querySelectorAll('text')]
      .filter((text) => getComputedStyle(text).visibility === 'visible')
      .map((text) => ({ name: text.textContent, box: text.getBoundingClientRect() }));
    return boxes.flatMap((a, i) =>
      boxes
        .slice(i + 1)
        .filter(
          (b) =>
            a.box.left < b.box.right - 1 &&
            b.box.left < a.box.right - 1 &&
            a.box.top < b.box.bottom - 3 &&
            b.box.top < a.box.bottom - 3,
        )
        .map((b) => `${a.name} over ${b.name}`),
    );
  });

it('a Field sheet shows every column at 1280 px, and names the floor of its errors', async () => {
  const path = `/soundings/${await sounding('S-07')}/readings`;
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', path);
  await page.getByText(/own error and the survey’s floor of 3\.0\s%, added in quadrature/).waitFor();
  const frame = page.getByRole('table', { name: 'Readings' }).locator('..');
  for (const width of [1280, 1536, 1920]) {
    await page.setViewportSize({ width, height: 800 });
    const over = () => frame.evaluate((element) => element.scrollWidth - element.clientWidth);
    await expect.poll(over, { message: `at ${width} px` }).toBeLessThanOrEqual(0);
    expect(await cutNumbers(frame)).toEqual([]);
  }
  await page.setViewportSize({ width: 390, height: 844 });
  await expect.poll(() => cutNumbers(frame), { message: 'on a telephone' }).toEqual([]);
  expectNoFaults(faults);
});

/** Numbers of a sheet that are wider than their cells. */
const cutNumbers = (frame: Locator): Promise<string[]> =>
  frame.evaluate((element) => {
    const pen = document.createElement('canvas').getContext('2d')!;
    return [...element.querySelectorAll<HTMLInputElement>('input.figure')].flatMap((input) => {
      const { font, paddingLeft, paddingRight } = getComputedStyle(input);
      pen.font = font;
      const text = input.value === '' ? input.placeholder : input.value;
      const room = input.clientWidth - parseFloat(paddingLeft) - parseFloat(paddingRight);
      return pen.measureText(text).width > room + 0.5 ? [text] : [];
    });
  });

it('an interpretation shows what was drilled beside it, other models and what its run was given', async () => {
  const path = `/soundings/${await sounding('S-07')}/interpretations/${await idOf('interpretation', { title: 'Proposed site of the second well' })}`;
  const { page, faults } = await enter(browser, app.baseUrl, 'hydrogeologist', path);
  const holes = page.getByRole('region', { name: 'Nearest boreholes' });
  await holes.getByText('BH-2, 285 m away').waitFor();
  expect(await holes.getByRole('row').filter({ hasText: 'grey clay' }).innerText()).toMatch(/^2–6\.5\sm/);
  await holes.getByText('Water 3.9 m below ground on 20 May 2026').waitFor();
  const others = page.getByRole('region', { name: 'Other models of this sounding' });
  await others.getByText('does not explain the readings').waitFor();
  await page.getByText('Nothing: no value is held, and none was known beforehand.').waitFor();
  expectNoFaults(faults);
});

it('a borehole that stands at a sounding is drawn beside its ground on a wide screen', async () => {
  const path = `/soundings/${await sounding('S-09')}/interpretations/${await idOf('interpretation', { title: 'Gravel over marl at the village' })}`;
  const { page, faults } = await enter(browser, app.baseUrl, 'guest', path);
  await page.setViewportSize({ width: 1920, height: 1080 });
  const log = page.getByRole('img', { name: /^Borehole BH-2: 0 to 2 m sandy silt, dry/ });
  await log.waitFor();
  await page.setViewportSize({ width: 1280, height: 800 });
  await expect.poll(() => log.count()).toBe(0);
  expectNoFaults(faults);
});

it('a file with faults leaves word of the lines that were not taken, and of the revision it made', async () => {
  const soundingId = await sounding('S-05');
  const path = `/soundings/${soundingId}/readings`;
  const { page, faults } = await enter(browser, app.baseUrl, 'geophysicist', path);
  await page.getByRole('button', { name: 'Read in a file' }).click();
  const text = 'a (m),R (ohm)\n1,38\n2,abc\n4,11\n8,-3\n16,4\n';
  const file = { name: 'survey.csv', mimeType: 'text/csv', buffer: Buffer.from(text) };
  await page.locator('input[type=file]').setInputFiles(file);
  await page.getByRole('button', { name: 'Import the 3 good rows' }).click();
  await page
    .getByText('3 readings of survey.csv read in. Saved as revision 2. 2 lines with faults left out.')
    .waitFor();
  const leftOut = page.getByRole('region', { name: 'Left out at import' });
  await leftOut.getByText('2 lines of survey.csv were left out at import').waitFor();
  expect((await leftOut.getByRole('listitem').allInnerTexts())[0]).toBe(
    'Line 3, R (ohm): “abc” is not a number',
  );
  await page
    .getByRole('region', { name: 'Revisions' })
    .getByText('2 lines of it left out at import')
    .waitFor();
  expectNoFaults(faults);
});

import { expect, it } from 'vitest';
import { createBrowser } from '../setup/browser';
import { startApp } from '../setup/start-app';
import { enter } from './support/people';

const app = await startApp({ demo: true });
const browser = createBrowser();

it('a telephone shows ρa of a reading while it is typed, and never covers the cell one is in', async () => {
  const { id } = await app.knex('sounding').where({ name: 'S-07' }).first<{ id: string }>('id');
  const { page } = await enter(browser, app.baseUrl, 'geophysicist', `/soundings/${id}/readings`);
  await page.setViewportSize({ width: 390, height: 844 });
  const rowOne = page.getByRole('row').nth(1);
  const derived = rowOne.getByRole('cell').filter({ hasText: /^134\.5$/ });
  const frame = (await page.getByRole('table', { name: 'Readings' }).locator('..').boundingBox())!;
  for (const column of ['AB/2', 'V', 'I', 'R']) {
    await page.getByLabel(`Row 1, ${column}`, { exact: true }).focus();
    const [cell, shown] = await Promise.all([
      page.getByLabel(`Row 1, ${column}`, { exact: true }).boundingBox(),
      derived.boundingBox(),
    ]);
    expect(shown!.x + shown!.width).toBeLessThanOrEqual(frame.x + frame.width + 1);
    expect(cell!.x + cell!.width).toBeLessThanOrEqual(shown!.x + 1);
  }
});

import { createHash } from 'node:crypto';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { beforeAll, expect, test } from 'vitest';
import { createBrowser } from '../setup/browser';
import { GOLDEN_CASES, goldenText } from '../inversion/support/golden-results';

const browser = createBrowser();
const digest = (text: string): string => createHash('sha256').update(text).digest('hex');
let script = '';

beforeAll(async () => {
  const entry = fileURLToPath(new URL('../inversion/support/golden-results.ts', import.meta.url));
  const built = await build({
    configFile: false,
    logLevel: 'error',
    build: { write: false, lib: { entry, formats: ['iife'], name: 'engine' } },
  });
  if (!Array.isArray(built)) throw new Error('one bundle was expected');
  const [chunk] = built[0]!.output;
  script = chunk.code;
});

test('Chromium finds the same bits as Node for every kind of result', { timeout: 120_000 }, async () => {
  const { page, faults } = await browser.open();
  await page.addScriptTag({ content: script });
  const inBrowser: Record<string, string> = {};
  for (const name of Object.keys(GOLDEN_CASES))
    inBrowser[name] = digest(await page.evaluate<string>(`engine.goldenText(${JSON.stringify(name)})`));
  const inNode = Object.keys(GOLDEN_CASES).map((name) => [name, digest(goldenText(name))]);
  expect(inBrowser).toEqual(Object.fromEntries(inNode));
  expect(faults).toEqual([]);
});

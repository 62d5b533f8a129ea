import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { ENGINE_VERSION } from '../../inversion';
import { GOLDEN_CASES, goldenText } from './support/golden-results';

interface Golden {
  engine: string;
  /** SHA-256 of each result */
  results: Record<string, string>;
}

const FILE = new URL('golden.json', import.meta.url);
const digest = (text: string): string => createHash('sha256').update(text).digest('hex');

// GOLDEN=write npx vitest run --project inversion tests/inversion/golden.test.ts
if (process.env.GOLDEN === 'write') {
  const results = Object.fromEntries(
    Object.keys(GOLDEN_CASES).map((name) => [name, digest(goldenText(name))]),
  );
  writeFileSync(FILE, `${JSON.stringify({ engine: ENGINE_VERSION, results }, null, 2)}\n`);
}
const golden = JSON.parse(readFileSync(FILE, 'utf8')) as Golden;

test('the kept results are those of this version of the engine', () => {
  expect(golden.engine).toBe(ENGINE_VERSION);
  expect(Object.keys(golden.results)).toEqual(Object.keys(GOLDEN_CASES));
});

test.each(Object.keys(GOLDEN_CASES))('%s: no number moves while ENGINE_VERSION stays', (name) => {
  expect(digest(goldenText(name))).toBe(golden.results[name]);
});

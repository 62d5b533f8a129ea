import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const example = (name: string): string =>
  readFileSync(new URL(`../../examples/${name}`, import.meta.url), 'utf8');

/** One node may round the last bits of exp and log otherwise than another; anything more is a change of the engine. */
const SAME = 1e-9;

function expectSame(found: unknown, expected: unknown, path: string): void {
  if (typeof expected === 'number' && typeof found === 'number') {
    expect(Math.abs(found - expected), path).toBeLessThanOrEqual(SAME * Math.max(1e-6, Math.abs(expected)));
  } else if (typeof expected === 'object' && expected !== null) {
    expect(Object.keys(found as object), path).toEqual(Object.keys(expected));
    for (const [key, value] of Object.entries(expected))
      expectSame((found as Record<string, unknown>)[key], value, `${path}.${key}`);
  } else {
    expect(found, path).toEqual(expected);
  }
}

describe.each(['forward', 'fit'])('the example of %s', (command) => {
  it('gives the expected lines by the command of the README', () => {
    const output = execFileSync('npm', ['run', '-s', 'layerwell', '--', command], {
      input: example(`${command}.jsonl`),
      encoding: 'utf8',
    });
    const lines = (text: string): unknown[] =>
      text
        .trim()
        .split('\n')
        .map((line) => JSON.parse(line) as unknown);
    const [found, expected] = [lines(output), lines(example(`${command}.expected.jsonl`))];
    expect(found).toHaveLength(expected.length);
    expected.forEach((line, i) => expectSame(found[i], line, `line ${i + 1}`));
  });
});

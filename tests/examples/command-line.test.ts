import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const example = (name: string): string =>
  readFileSync(new URL(`../../examples/${name}`, import.meta.url), 'utf8');

/** One node may round the last bits of exp and log otherwise than another; anything more is a change of the engine. */
const SAME = 1e-9;

/** Paths at which two answers differ beyond rounding. */
function differences(found: unknown, expected: unknown, path: string): string[] {
  if (typeof expected === 'number' && typeof found === 'number')
    return Math.abs(found - expected) <= SAME * Math.max(1e-6, Math.abs(expected))
      ? []
      : [`${path}: ${found} for ${expected}`];
  if (typeof expected !== 'object' || expected === null || typeof found !== 'object' || found === null)
    return found === expected ? [] : [`${path}: ${JSON.stringify(found)} for ${JSON.stringify(expected)}`];
  const keys = new Set([...Object.keys(found), ...Object.keys(expected)]);
  const at = (from: object, key: string): unknown => (from as Record<string, unknown>)[key];
  return [...keys].flatMap((key) => differences(at(found, key), at(expected, key), `${path}.${key}`));
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
    expect(differences(lines(output), lines(example(`${command}.expected.jsonl`)), 'line')).toEqual([]);
  });
});

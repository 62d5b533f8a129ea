import { describe, expect, it } from 'vitest';
import { compareResults, fitLayered } from '../../../inversion';
import { layered } from '../support/fit-settings';

const readings = [1, 2, 4, 8, 16].map((spacing, i) => ({
  spread: { type: 'wenner', spacing } as const,
  apparentResistivity: [90, 70, 40, 25, 21][i]!,
  relativeError: 0.03,
}));

describe('compareResults', () => {
  const result = fitLayered(readings, layered(2));

  it('calls a result that went through JSON and back identical', () => {
    const archived: object = JSON.parse(JSON.stringify(result));
    expect(compareResults(archived, fitLayered(readings, layered(2)))).toEqual({
      verdict: 'identical',
      differences: [],
    });
  });

  it('finds a difference in the last bit, with its path and both values', () => {
    const before = result.earth.resistivity[1]!;
    const after = before + before * Number.EPSILON;
    const changed = structuredClone(result);
    changed.earth.resistivity[1] = after;
    expect(compareResults(result, changed)).toEqual({
      verdict: 'differs',
      differences: [{ path: 'earth.resistivity.1', before, after }],
    });
  });

  it('finds what is missing, added, or of another kind', () => {
    expect(compareResults({ a: 1, b: [1, 2] }, { b: [1, 2, 3], c: null }).differences).toEqual([
      { path: 'a', before: 1, after: undefined },
      { path: 'b.2', before: undefined, after: 3 },
      { path: 'c', before: undefined, after: null },
    ]);
    expect(compareResults({ a: [] }, { a: {} }).verdict).toBe('differs');
    expect(compareResults({ a: 0 }, { a: -0 }).verdict).toBe('differs');
  });

  it('does not mind the order of keys', () => {
    expect(compareResults({ a: 1, b: 2 }, { b: 2, a: 1 }).verdict).toBe('identical');
  });
});

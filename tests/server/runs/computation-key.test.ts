import { describe, expect, it } from 'vitest';
import { computationKey } from '../../../server/runs/computation-key';

describe('the key of a computation', () => {
  const input = {
    readings: [
      { spread: { type: 'wenner' as const, spacing: 5 }, apparentResistivity: 100, relativeError: 0.03 },
    ],
    settings: {
      kind: 'layered' as const,
      layers: 1,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5] as [number, number], thickness: [0.02, 1000] as [number, number] },
      fixed: [],
      priors: [],
      outlierTolerant: false,
    },
  };

  it('does not depend on the order of keys, and changes with engine, readings, settings and seed', () => {
    const key = computationKey('1.0.0', input);
    const reordered = { settings: input.settings, readings: input.readings };
    expect(computationKey('1.0.0', reordered)).toBe(key);
    expect(key).toMatch(/^[0-9a-f]{64}$/);
    const others = [
      computationKey('1.0.1', input),
      computationKey('1.0.0', { ...input, settings: { ...input.settings, seed: 2 } }),
      computationKey('1.0.0', { ...input, settings: { ...input.settings, layers: 2 } }),
      computationKey('1.0.0', {
        ...input,
        readings: [{ ...input.readings[0]!, relativeError: 0.030000000000000002 }],
      }),
    ];
    expect(new Set([key, ...others]).size).toBe(5);
  });
});

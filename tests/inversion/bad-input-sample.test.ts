import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sampleEnsemble, type Reading, type SampleSettings } from '../../inversion';
import {
  answerOrRefusal,
  manyReadings,
  ODD_SOUNDINGS,
  spoiltNumber,
  spoiltReading,
  tally,
} from './support/bad-input';

const PRIOR: SampleSettings['prior'] = { resistivity: [1, 1e4], thickness: [0.2, 200] };
const settings: SampleSettings = { layers: 2, prior: PRIOR, draws: 40, seed: 1 };

const answer = (readings: readonly Reading[], more: Partial<SampleSettings> = {}) => {
  const all = { ...settings, ...more };
  return answerOrRefusal({ readings, settings: all }, () => sampleEnsemble(readings, all));
};

describe.each([2, 'unknown'] as const)('samples of %s layers', (layers) => {
  it.each(ODD_SOUNDINGS.filter((_, i) => i === 0 || i === 3))('answer %s', (_, readings) => {
    expect(answer(readings, { layers })!.status).toBe('chain-too-short');
  });
});

it('end where readings with errors of a millionth fit no ground', () => {
  const [, readings] = ODD_SOUNDINGS.find(([name]) => name.startsWith('scattered'))!;
  let steps = 0;
  const result = sampleEnsemble(
    readings,
    { ...settings, layers: 'unknown' },
    {
      onProgress: ({ stage }) => void (steps += stage === 'tempering' ? 1 : 0),
      // a ladder without an end must fail here, not hang
      shouldStop: () => steps > 62,
    },
  );
  expect(result.status).toBe('chain-too-short');
});

it('refuse readings that cannot be', () => {
  const seen = tally();
  fc.assert(
    fc.property(fc.array(spoiltReading, { minLength: 1, maxLength: 4 }), (readings) =>
      seen.count(answer(readings, { layers: 1 })),
    ),
    { seed: 1, numRuns: 12 },
  );
  expect(Math.min(seen.answered(), seen.refused())).toBeGreaterThan(2);
});

it('answer or refuse priors and targets that are wrong, each with its place', () => {
  const seen = tally();
  const range = (low: number, high: number) =>
    fc.tuple(spoiltNumber(low, 10 * low), spoiltNumber(high / 10, high));
  const prior = fc.record({ resistivity: range(1, 1e4), thickness: range(0.2, 200) });
  const target = fc.record({
    resistivity: range(5, 500),
    minThickness: spoiltNumber(1, 10),
    topAbove: spoiltNumber(1, 50),
  });
  fc.assert(
    fc.property(prior, fc.option(target, { nil: undefined, freq: 1 }), (one, bed) =>
      seen.count(answer(manyReadings(4), { layers: 1, prior: one, target: bed })),
    ),
    { seed: 1, numRuns: 20 },
  );
  expect(Math.min(seen.answered(), seen.refused())).toBeGreaterThan(3);
});

it.each(['prior', 'narrow', 'wide'] as const)('refuse absurd ranges of the %s', (field) => {
  const run = () =>
    sampleEnsemble(manyReadings(4), { ...settings, [field]: { ...PRIOR, thickness: [1e-300, 10] } });
  expect(run).toThrow(expect.objectContaining({ code: 'bounds', path: ['settings', field, 'thickness'] }));
});

it.each([[[1e-12, 10]], [[10, 1e15]], [[10, 5]]] as const)('refuse the target range %j', (resistivity) => {
  const target = { resistivity, minThickness: 1, topAbove: 5 };
  const run = () => sampleEnsemble(manyReadings(4), { ...settings, target });
  expect(run).toThrow(
    expect.objectContaining({ code: 'bounds', path: ['settings', 'target', 'resistivity'] }),
  );
});

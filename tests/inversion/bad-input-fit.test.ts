import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitLayered, fitSmooth, type FitResult, type FitSettings, type Reading } from '../../inversion';
import {
  answerOrRefusal,
  manyReadings,
  ODD_SOUNDINGS,
  spoiltEarth,
  spoiltNumber,
  spoiltReading,
  tally,
  wildReading,
} from './support/bad-input';
import { layered } from './support/fit-settings';

type Kind = [
  name: string,
  settings: FitSettings,
  fit: (readings: readonly Reading[], settings: FitSettings) => FitResult,
];

const KINDS: Kind[] = [
  ['one bed', layered(1), fitLayered],
  ['three beds, outlier-tolerant', layered(3, { outlierTolerant: true }), fitLayered],
  [
    'four beds in the widest bounds',
    layered(4, { bounds: { resistivity: [1e-9, 1e12], thickness: [1e-9, 1e9] } }),
    fitLayered,
  ],
  ['as many beds as are needed', layered('auto'), fitLayered],
  ['a smooth ground', layered('auto', { kind: 'smooth' }), fitSmooth],
  ['a stepped ground', layered('auto', { kind: 'stepped' }), fitSmooth],
];

describe.each(KINDS)('a fit of %s', (_, settings, fit) => {
  const answer = (readings: readonly Reading[]) =>
    answerOrRefusal({ readings, settings }, () => fit(readings, settings));

  it.each(ODD_SOUNDINGS)('answers %s', (_name, readings) => {
    const result = answer(readings)!;
    expect(result.predicted).toHaveLength(readings.length);
    // what does not fit, or is not determined, is said
    const told = result.warnings.length > 0 || result.chi2PerReading < 2;
    expect(told).toBe(true);
  });

  it('answers readings that are each allowed and together fit no ground', () => {
    fc.assert(
      fc.property(fc.array(wildReading, { minLength: 1, maxLength: 8 }), (readings) => {
        expect(answer(readings)).not.toBeNull();
      }),
      { seed: 1, numRuns: 10 },
    );
  });

  it('refuses readings that cannot be', () => {
    const seen = tally();
    fc.assert(
      fc.property(fc.array(spoiltReading, { maxLength: 4 }), (readings) => seen.count(answer(readings))),
      { seed: 1, numRuns: 30 },
    );
    expect(Math.min(seen.answered(), seen.refused())).toBeGreaterThan(3);
  });
});

it('answers or refuses settings that are wrong, each with its place', () => {
  const seen = tally();
  const readings = manyReadings(8);
  const pair = fc.oneof(
    { weight: 4, arbitrary: fc.constant<[number, number]>([0.1, 1e4]) },
    { weight: 1, arbitrary: fc.tuple(spoiltNumber(1e-2, 1), spoiltNumber(10, 1e3)) },
  );
  const index = fc.constantFrom(0, 0, 0, 0, 1, 2, -1, 0.5, NaN);
  const settings: fc.Arbitrary<FitSettings> = fc
    .record({
      layers: fc.constantFrom<number | 'auto'>(1, 2, 2, 3, 3, 3, 'auto', 0, 9, -1, 1.5, NaN, Infinity),
      seed: fc.constantFrom(1, 0, -1, NaN),
      bounds: fc.option(fc.record({ resistivity: pair, thickness: pair }), { nil: layered(1).bounds }),
      fixed: fc.array(
        fc.record({ on: fc.constantFrom('resistivity', 'thickness'), index, value: spoiltNumber(1, 100) }),
        { maxLength: 1 },
      ),
      priors: fc.array(
        fc.record({
          on: fc.constantFrom('resistivity', 'thickness', 'depth'),
          index,
          value: spoiltNumber(1, 100),
          sigma: spoiltNumber(1e-3, 10),
        }),
        { maxLength: 1 },
      ),
      branchShiftSigma: fc.option(spoiltNumber(1e-3, 1), { nil: undefined }),
      start: fc.oneof(
        { weight: 6, arbitrary: fc.constant(undefined) },
        { weight: 1, arbitrary: spoiltEarth },
      ),
    })
    .map((more) => layered(1, more));
  fc.assert(
    fc.property(settings, (one) =>
      seen.count(answerOrRefusal({ readings, settings: one }, () => fitLayered(readings, one))),
    ),
    { seed: 1, numRuns: 150 },
  );
  expect(Math.min(seen.answered(), seen.refused())).toBeGreaterThan(10);
});

it('answers two thousand readings', () => {
  const readings = manyReadings(2000);
  expect(fitLayered(readings, layered(2)).predicted).toHaveLength(2000);
});

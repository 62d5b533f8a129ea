import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitLine, type LineSettings, type LineSounding } from '../../inversion';
import { alongLine } from './line/invented-line';
import {
  answerOrRefusal,
  manyReadings,
  ODD_SOUNDINGS,
  spoiltNumber,
  spoiltReading,
  tally,
  wildReading,
} from './support/bad-input';

const answer = (soundings: readonly LineSounding[], settings: LineSettings) =>
  answerOrRefusal({ soundings, settings }, () => fitLine(soundings, settings));

const SETTINGS: [string, LineSettings][] = [
  ['three beds', alongLine(3)],
  ['as many beds as are needed', alongLine('auto')],
  [
    'the widest bounds and the tightest ties',
    alongLine(3, {
      bounds: { resistivity: [1e-9, 1e12], thickness: [1e-9, 1e9] },
      lateral: { resistivity: 1e-3, depth: 1e-3 },
      outlierTolerant: true,
    }),
  ],
];

describe.each(SETTINGS)('a line of %s', (_, settings) => {
  it.each(ODD_SOUNDINGS)('answers %s, at one place, beside others, and far away', (_name, readings) => {
    const soundings = [
      { x: 0, readings },
      { x: 0, readings: manyReadings(8) },
      { x: 1e9, readings },
    ];
    expect(answer(soundings, settings)!.soundings).toHaveLength(3);
  });

  it('answers readings that are each allowed and together fit no ground', () => {
    const sounding = fc.record({
      x: fc.double({ min: -1e9, max: 1e9, noNaN: true }),
      readings: fc.array(wildReading, { minLength: 1, maxLength: 6 }),
    });
    fc.assert(
      fc.property(fc.array(sounding, { minLength: 1, maxLength: 4 }), (soundings) => {
        expect(answer(soundings, settings)).not.toBeNull();
      }),
      { seed: 1, numRuns: 10 },
    );
  });
});

it('refuses soundings, ties and boreholes that cannot be', () => {
  const [whole, settled] = [tally(), tally()];
  const soundings = fc.array(
    fc.record({ x: spoiltNumber(1, 1e4), readings: fc.array(spoiltReading, { maxLength: 3 }) }),
    { maxLength: 3 },
  );
  const contact = fc.record({
    boundary: fc.constantFrom(0, 1, 2, -1, 0.5, NaN),
    depth: spoiltNumber(1, 100),
    sigma: spoiltNumber(1e-2, 10),
  });
  const settings = fc.record({
    layers: fc.constantFrom<number | 'auto'>(1, 2, 3, 'auto', 0, 9, NaN),
    lateral: fc.record({ resistivity: spoiltNumber(1e-2, 1), depth: spoiltNumber(1e-2, 1) }),
    boreholes: fc.array(
      fc.record({ x: spoiltNumber(1, 1e4), contacts: fc.array(contact, { maxLength: 2 }) }),
      {
        maxLength: 2,
      },
    ),
  });
  fc.assert(
    fc.property(soundings, settings, (given, more) => whole.count(answer(given, alongLine(1, more)))),
    { seed: 1, numRuns: 100 },
  );
  const sound = [0, 50].map((x) => ({ x, readings: manyReadings(8) }));
  fc.assert(
    fc.property(settings, (more) => settled.count(answer(sound, alongLine(1, more)))),
    { seed: 1, numRuns: 100 },
  );
  expect(whole.refused()).toBeGreaterThan(10);
  expect(Math.min(settled.answered(), settled.refused())).toBeGreaterThan(3);
});

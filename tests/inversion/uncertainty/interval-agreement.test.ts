import { describe, expect, it } from 'vitest';
import {
  createRandomStream,
  fitLayered,
  geometricFactor,
  type FitResult,
  type Interval,
  type Reading,
} from '../../../inversion';
import { crewReadings } from '../../../server/demo/crew-sheet';
import { SOUNDINGS, SURVEY } from '../../../server/demo/scenario';
import { layered } from '../support/fit-settings';
import { trialSounding } from '../support/trial-soundings';

const BOUNDS = layered(1).bounds;
const ROUNDING = 1 + 1e-9;
const lower = ([low]: Interval): number => low ?? 0;
const upper = ([, high]: Interval): number => high ?? Infinity;

/** Depths looser than their thicknesses or out of order. */
function depthFaults({ intervals: { thickness, depth } }: FitResult): string[] {
  let thin = 0;
  let thick = 0;
  return depth.flatMap((range, k) => {
    thin += lower(thickness[k]!);
    thick += upper(thickness[k]!);
    const above = k > 0 ? lower(depth[k - 1]!) : 0;
    const below = k + 1 < depth.length ? upper(depth[k + 1]!) : Infinity;
    const agrees =
      lower(range) * ROUNDING >= Math.max(thin, above) && upper(range) <= ROUNDING * Math.min(thick, below);
    return agrees ? [] : [`base ${k + 1}: ${range.join(' to ')} against ${thin} to ${thick}`];
  });
}

/** Values outside of their range, ends beside a bound, and factors that make less of a range than it is. */
function valueFaults({ earth, intervals, factors }: FitResult): string[] {
  return (['resistivity', 'thickness'] as const).flatMap((on) =>
    earth[on].flatMap((value, i) => {
      const range = intervals[on][i]!;
      const [low, high] = range;
      const [least, most] = BOUNDS[on];
      const reach = Math.max(value / lower(range), upper(range) / value);
      const faults = [
        lower(range) <= value && value <= upper(range) ? '' : 'outside',
        low !== null && low < 1.1 * least && value > 1.5 * least ? 'low end beside the bound' : '',
        high !== null && high > most / 1.1 && value < most / 1.5 ? 'high end beside the bound' : '',
        (factors[on][i] ?? Infinity) * ROUNDING >= reach ** (1 / 1.959964) ? '' : 'factor too small',
      ].filter(Boolean);
      return faults.map((fault) => `${on} ${i + 1} ${value} (${low} to ${high}): ${fault}`);
    }),
  );
}

const faultsOf = (fit: FitResult): string[] => [...depthFaults(fit), ...valueFaults(fit)];

it('gives intervals that agree with each other and factors that agree with them', { timeout: 60_000 }, () => {
  const random = createRandomStream(5);
  const faults = Array.from({ length: 30 }, (_, t) => {
    const { truth, readings } = trialSounding(random, t);
    return faultsOf(fitLayered(readings, layered(truth.resistivity.length)));
  });
  expect(faults.flat()).toEqual([]);
});

function demoReadings(name: string): Reading[] {
  return crewReadings(SOUNDINGS.find((sounding) => sounding.name === name)!).map(
    ({ spread, voltageMv, currentMa, errorPercent }) => ({
      spread,
      apparentResistivity: (voltageMv / currentMa) * geometricFactor(spread)!,
      relativeError: Math.hypot(SURVEY.errorFloor, errorPercent / 100),
    }),
  );
}

/** χ² above the least of the fit, with one value held. */
function rise(
  fit: FitResult,
  readings: Reading[],
  on: 'resistivity' | 'thickness',
  i: number,
  value: number,
) {
  const layers = fit.earth.resistivity.length;
  const start = { ...fit.earth, [on]: fit.earth[on].with(i, value) };
  const held = fitLayered(readings, layered(layers, { fixed: [{ on, index: i, value }], start }));
  return readings.length * (held.chi2PerReading - fit.chi2PerReading);
}

describe.each([
  ['S-03', 4],
  ['S-08', 4],
  ['S-09', 4],
  ['S-12', 3],
] as const)('the intervals of %s with %i beds', (name, layers) => {
  const readings = demoReadings(name);
  const fit = fitLayered(readings, layered(layers));

  it('agree with each other', () => {
    expect(faultsOf(fit)).toEqual([]);
  });

  it('are open where a value fits within 15 % of its bound, and nowhere else', { timeout: 60_000 }, () => {
    const wrong = (['resistivity', 'thickness'] as const).flatMap((on) =>
      fit.earth[on].flatMap((value, i) =>
        fit.intervals[on][i]!.flatMap((end, side) => {
          if (end === null) {
            const beside = BOUNDS[on][side]! * Math.exp(side === 0 ? 0.15 : -0.15);
            const excess = rise(fit, readings, on, i, beside);
            return excess < 3.8415 ? [] : [`${on} ${i + 1} beside its bound: χ² ${excess} higher`];
          }
          const beyond = end * (end / value) ** 0.25;
          const [least, most] = BOUNDS[on];
          if (beyond <= least || beyond >= most) return [];
          const excess = rise(fit, readings, on, i, beyond);
          return excess > 3.8415 ? [] : [`${on} ${i + 1} beyond ${end}: χ² ${excess} higher`];
        }),
      ),
    );
    expect(wrong).toEqual([]);
  });
});

it('agree where there are beds to spare too', () => {
  expect(faultsOf(fitLayered(demoReadings('S-12'), layered(4)))).toEqual([]);
});

it('calls no value of the demo well determined beside a second valley', () => {
  const fit = fitLayered(demoReadings('S-12'), layered(3));
  const [low, high] = fit.intervals.resistivity[0]!;
  expect(high! / low!).toBeGreaterThan(10);
  expect(fit.factors.resistivity[0]).toBeGreaterThan(2);
});

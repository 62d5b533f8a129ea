import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createRandomStream,
  fitLayered,
  geometricFactor,
  type FitBounds,
  type FitResult,
  type Interval,
  type Reading,
} from '../../../inversion';
import { crewReadings } from '../../../server/demo/crew-sheet';
import { SOUNDINGS, SURVEY } from '../../../server/demo/scenario';
import { layered } from '../support/fit-settings';
import { trialSounding } from '../support/trial-soundings';

const BOUNDS = layered(1).bounds;
/** Of a hundred times as much either way. */
const WIDER: FitBounds = { resistivity: [1e-3, 1e7], thickness: [2e-4, 1e5] };
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
  bounds = BOUNDS,
) {
  const layers = fit.earth.resistivity.length;
  const start = { ...fit.earth, [on]: fit.earth[on].with(i, value) };
  const held = fitLayered(readings, layered(layers, { fixed: [{ on, index: i, value }], start, bounds }));
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

  // a value may need its partner beyond the bound of that: a bed of 0.12 Ω·m a thickness of 0.016 m
  it(
    'are open where a value fits within 15 % of its bound, were other bounds wider, and nowhere else',
    { timeout: 60_000 },
    () => {
      const wrong = (['resistivity', 'thickness'] as const).flatMap((on) =>
        fit.earth[on].flatMap((value, i) =>
          fit.intervals[on][i]!.flatMap((end, side) => {
            if (end === null) {
              const beside = BOUNDS[on][side]! * Math.exp(side === 0 ? 0.15 : -0.15);
              const excess = rise(fit, readings, on, i, beside, WIDER);
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
    },
  );
});

it('are open where a value ends only with its partner at a bound', () => {
  const { thickness, resistivity } = fitLayered(demoReadings('S-03'), layered(4)).intervals;
  // h/ρ alone is known of bed 2: 0.141 S, and 0.02 m of it would be 0.14 Ω·m
  expect(thickness[1]![0]).toBeNull();
  expect(resistivity[1]![0]).toBeNull();
  expect(resistivity[1]![1]).toBeLessThan(60);
});

it('agree where there are beds to spare too', () => {
  expect(faultsOf(fitLayered(demoReadings('S-12'), layered(4)))).toEqual([]);
});

it('are open for a bed beyond what a bed less explains', () => {
  const truth = { resistivity: [120, 25, 300], thickness: [4, 16] };
  const spreads = Array.from({ length: 16 }, (_, i) => {
    return { type: 'schlumberger', halfAB: 1.5 * 1.4 ** i, halfMN: 0.3 } as const;
  });
  const random = createRandomStream(12);
  const readings = Array.from(createForwardOperator(spreads).predict(truth), (value, i): Reading => {
    const apparentResistivity = value * Math.exp(0.03 * random.normal());
    return { spread: spreads[i]!, apparentResistivity, relativeError: 0.03 };
  });
  const three = fitLayered(readings, layered(3));
  const four = fitLayered(readings, layered(4));
  expect(16 * (three.chi2PerReading - four.chi2PerReading)).toBeLessThan(3);
  // three beds over a fourth that no reading reaches
  expect(four.intervals.resistivity[3]).toEqual([null, null]);
  expect(faultsOf(four)).toEqual([]);
});

it('calls no value of the demo well determined beside a second valley', () => {
  const fit = fitLayered(demoReadings('S-12'), layered(3));
  const [low, high] = fit.intervals.resistivity[0]!;
  expect(high! / (low ?? 0)).toBeGreaterThan(10);
  expect(fit.factors.resistivity[0] ?? Infinity).toBeGreaterThan(2);
});

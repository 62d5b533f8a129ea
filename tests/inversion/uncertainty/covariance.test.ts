import { describe, expect, it } from 'vitest';
import { createForwardOperator, createRandomStream, fitLayered, type Reading } from '../../../inversion';
import { logCovariance, parameterDoubt } from '../../../inversion/uncertainty/covariance';
import { layered } from '../support/fit-settings';

const BOUNDS = layered(2).bounds;

describe('logCovariance', () => {
  it('is (JᵀJ)⁻¹', () => {
    const jacobian = Float64Array.from([3, 0, 0, 2, 1, 1]);
    const { covariance, deviation } = logCovariance(jacobian, 3, [false, false]);
    // JᵀJ = [[10, 1], [1, 5]]
    const expected = [5 / 49, -1 / 49, -1 / 49, 10 / 49];
    expected.forEach((value, i) => expect(covariance[i]).toBeCloseTo(value, 12));
    expect(deviation[1]).toBeCloseTo(Math.sqrt(10 / 49), 12);
  });

  it('leaves held parameters out: they are certain, and the others do not pay for them', () => {
    const jacobian = Float64Array.from([3, 0, 0, 2, 1, 1]);
    const { covariance, deviation } = logCovariance(jacobian, 3, [true, false]);
    expect(deviation[0]).toBe(0);
    expect(covariance[3]).toBeCloseTo(1 / 5, 12);
    expect(covariance[1]).toBe(0);
  });

  it('calls a parameter that no reading sees unresolved, not certain', () => {
    const { deviation } = logCovariance(Float64Array.from([1, 0, 2, 0]), 2, [false, false]);
    expect(deviation[0]).toBeCloseTo(1 / Math.sqrt(5), 12);
    expect(deviation[1]).toBe(Infinity);
  });

  it('calls two parameters that only their sum moves unresolved', () => {
    const { deviation } = logCovariance(Float64Array.from([1, 1, 2, 2, 3, 3]), 3, [false, false]);
    expect(Array.from(deviation)).toEqual([Infinity, Infinity]);
  });

  it('takes fewer readings than parameters', () => {
    const { deviation } = logCovariance(Float64Array.from([2, 0, 0]), 1, [false, false, false]);
    expect(Array.from(deviation)).toEqual([0.5, Infinity, Infinity]);
  });
});

describe('parameterDoubt', () => {
  const earth = { resistivity: [100, 10], thickness: [4] };
  const doubt = (deviation: number[], covariance: number[], e = earth) =>
    parameterDoubt(
      e,
      { deviation: Float64Array.from(deviation), covariance: Float64Array.from(covariance) },
      BOUNDS,
    );

  it('gives 95 % intervals and 68 % factors in ln space', () => {
    const { intervals, factors } = doubt([0.1, 0.2, 0.3], [0.01, 0, 0, 0, 0.04, 0, 0, 0, 0.09]);
    expect(intervals.resistivity[0]![0]).toBeCloseTo(100 * Math.exp(-0.1959964), 4);
    expect(intervals.thickness[0]![1]).toBeCloseTo(4 * Math.exp(0.5879892), 5);
    expect(factors.resistivity[1]).toBeCloseTo(Math.exp(0.2), 10);
    expect(intervals.depth).toEqual(intervals.thickness);
  });

  it('counts the correlation of thicknesses in the depth of a boundary', () => {
    const three = { resistivity: [1, 1, 1], thickness: [3, 1] };
    const covariance = Array.from({ length: 25 }, () => 0);
    covariance[18] = 0.04;
    covariance[24] = 0.36;
    covariance[19] = covariance[23] = -0.12;
    const { factors } = doubt([0.1, 0.1, 0.1, 0.2, 0.6], covariance, three);
    // 0.75²·0.04 + 0.25²·0.36 − 2·0.75·0.25·0.12 = 0: the depth is known though neither thickness is
    expect(factors.depth[1]).toBeCloseTo(1, 6);
    expect(factors.depth[0]).toBeCloseTo(Math.exp(0.2), 10);
  });

  it('is null where a factor passes 100 or a bound cuts an interval off', () => {
    const { intervals, factors } = doubt([5, 2.4, Infinity], [25, 0, 0, 0, 5.76, 0, 0, 0, 0]);
    expect(factors.resistivity).toEqual([null, Math.exp(2.4)]);
    expect(intervals.resistivity[0]).toEqual([null, null]);
    expect(intervals.resistivity[1]![0]).toBeNull();
    expect(intervals.resistivity[1]![1]).toBeGreaterThan(1000);
    expect(intervals.thickness[0]).toEqual([null, null]);
    expect(factors.depth).toEqual([null]);
  });

  it('gives [v, v], factor 1 and no correlation for a held value', () => {
    const { intervals, factors, correlation } = doubt([0, 0.2, 0.3], [0, 0, 0, 0, 0.04, 0.03, 0, 0.03, 0.09]);
    expect(intervals.resistivity[0]).toEqual([100, 100]);
    expect(factors.resistivity[0]).toBe(1);
    expect(correlation[0]).toEqual([null, null, null]);
    expect(correlation[1]![2]).toBeCloseTo(0.5, 12);
    expect(correlation[1]![1]).toBe(1);
  });
});

it('covers the truth in about 95 % of noisy soundings of a well-resolved ground', { timeout: 60_000 }, () => {
  const truth = { resistivity: [100, 20], thickness: [4] };
  const spreads = Array.from({ length: 15 }, (_, i) => ({ type: 'wenner', spacing: 1.4 ** i }) as const);
  const clean = createForwardOperator(spreads).predict(truth);
  const random = createRandomStream(77);
  const inside = [0, 0, 0];
  const trials = 150;
  for (let t = 0; t < trials; t++) {
    const readings = spreads.map((spread, i): Reading => ({
      spread,
      apparentResistivity: clean[i]! * Math.exp(0.03 * random.normal()),
      relativeError: 0.03,
    }));
    const { intervals } = fitLayered(readings, layered(2));
    const all = [...intervals.resistivity, ...intervals.thickness];
    [100, 20, 4].forEach((value, j) => {
      const [low, high] = all[j]!;
      if ((low ?? 0) <= value && value <= (high ?? Infinity)) inside[j]! += 1;
    });
  }
  // three standard errors of a share of 0.95 in 150 trials are 0.053
  inside.forEach((count) => {
    expect(count / trials).toBeGreaterThan(0.89);
    expect(count).toBeLessThan(trials);
  });
});

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
  /** the doubt of uncorrelated ln parameters with these standard deviations */
  const doubt = (deviation: number[], e = earth) =>
    parameterDoubt(
      e,
      {
        deviation: Float64Array.from(deviation),
        covariance: Float64Array.from(
          deviation.flatMap((a, i) => deviation.map((_, j) => (i === j ? a * a : 0))),
        ),
        directions: deviation.map((a, i) => ({
          vector: Float64Array.from(deviation, (_, j) => (i === j ? 1 : 0)),
          variance: a * a,
        })),
      },
      BOUNDS,
    );

  it('gives 95 % intervals and 68 % factors in ln space', () => {
    const { intervals, factors } = doubt([0.1, 0.2, 0.3]);
    expect(intervals.resistivity[0]![0]).toBeCloseTo(100 * Math.exp(-0.1959964), 4);
    expect(intervals.thickness[0]![1]).toBeCloseTo(4 * Math.exp(0.5879892), 5);
    expect(factors.resistivity[1]).toBeCloseTo(Math.exp(0.2), 10);
    expect(intervals.depth).toEqual(intervals.thickness);
  });

  it('counts the correlation of thicknesses in the depth of a boundary', () => {
    const three = { resistivity: [1, 1, 1], thickness: [3, 1] };
    // three readings that see the resistivities, and one that sees the depth h₁ + h₂ alone: 0.75 ln h₁ + 0.25 ln h₂
    const jacobian = new Float64Array(20);
    [0, 1, 2].forEach((i) => (jacobian[i * 5 + i] = 10));
    jacobian[18] = 0.75 / 0.1;
    jacobian[19] = 0.25 / 0.1;
    const c = logCovariance(jacobian, 4, [false, false, false, false, false]);
    const { factors } = parameterDoubt(three, c, BOUNDS);
    expect(factors.thickness).toEqual([null, null]);
    expect(factors.depth[0]).toBeNull();
    expect(factors.depth[1]).toBeCloseTo(Math.exp(0.1), 8);
  });

  it('knows S though neither h nor ρ is known, and T not', () => {
    // readings that see ln h − ln ρ of the first layer, and the half-space
    const c = logCovariance(Float64Array.from([-5, 0, 5, 0, 10, 0]), 2, [false, false, false]);
    const found = parameterDoubt(earth, c, BOUNDS);
    expect(found.factors.thickness).toEqual([null]);
    expect(found.conductanceFactor[0]).toBeCloseTo(Math.exp(0.2), 8);
    expect(found.resistanceFactor).toEqual([null]);
  });

  it('is null where a factor passes 100 or a bound cuts an interval off', () => {
    const { intervals, factors } = doubt([5, 2.4, Infinity]);
    expect(factors.resistivity).toEqual([null, Math.exp(2.4)]);
    expect(intervals.resistivity[0]).toEqual([null, null]);
    expect(intervals.resistivity[1]![0]).toBeNull();
    expect(intervals.resistivity[1]![1]).toBeGreaterThan(1000);
    expect(intervals.thickness[0]).toEqual([null, null]);
    expect(factors.depth).toEqual([null]);
  });

  it('gives [v, v], factor 1 and no correlation for a held value', () => {
    // JᵀJ = [[4, −2], [−2, 4]] over the two free parameters: correlation 1/2
    const jacobian = Float64Array.from([9, 2, -1, 9, 0, Math.sqrt(3)]);
    const c = logCovariance(jacobian, 2, [true, false, false]);
    const { intervals, factors, correlation } = parameterDoubt(earth, c, BOUNDS);
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

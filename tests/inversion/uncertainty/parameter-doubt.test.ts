import { describe, expect, it } from 'vitest';
import { logCovariance, type LogCovariance } from '../../../inversion/uncertainty/covariance';
import { parameterDoubt } from '../../../inversion/uncertainty/parameter-doubt';
import { layered } from '../support/fit-settings';

const BOUNDS = layered(2).bounds;

/** The covariance of uncorrelated ln parameters with these standard deviations. */
function uncorrelated(deviation: readonly number[]): LogCovariance {
  return {
    deviation: Float64Array.from(deviation),
    covariance: Float64Array.from(
      deviation.flatMap((a, i) => deviation.map((_, j) => (i === j ? a * a : 0))),
    ),
    directions: deviation.map((a, i) => ({
      vector: Float64Array.from(deviation, (_, j) => (i === j ? 1 : 0)),
      variance: a * a,
    })),
  };
}

describe('parameterDoubt', () => {
  const earth = { resistivity: [100, 10], thickness: [4] };
  /** the doubt of uncorrelated ln parameters with these standard deviations */
  const doubt = (deviation: number[], e = earth) =>
    parameterDoubt([{ earth: e, excess: 0, covariance: uncorrelated(deviation) }], BOUNDS);

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
    const { factors } = parameterDoubt([{ earth: three, covariance: c, excess: 0 }], BOUNDS);
    expect(factors.thickness).toEqual([null, null]);
    expect(factors.depth[0]).toBeNull();
    expect(factors.depth[1]).toBeCloseTo(Math.exp(0.1), 8);
  });

  it('knows S though neither h nor ρ is known, and T not', () => {
    // readings that see ln h − ln ρ of the first layer, and the half-space
    const c = logCovariance(Float64Array.from([-5, 0, 5, 0, 10, 0]), 2, [false, false, false]);
    const found = parameterDoubt([{ earth, covariance: c, excess: 0 }], BOUNDS);
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
    const { intervals, factors, correlation } = parameterDoubt([{ earth, covariance: c, excess: 0 }], BOUNDS);
    expect(intervals.resistivity[0]).toEqual([100, 100]);
    expect(factors.resistivity[0]).toBe(1);
    expect(correlation[0]).toEqual([null, null, null]);
    expect(correlation[1]![2]).toBeCloseTo(0.5, 12);
    expect(correlation[1]![1]).toBe(1);
  });

  it('reaches over another model that the readings allow, by what its excess of χ² leaves', () => {
    const near = { resistivity: [100, 30], thickness: [4] };
    const found = (excess: number) =>
      parameterDoubt(
        [
          { earth, covariance: uncorrelated([0.1, 0.2, 0.3]), excess: 0 },
          { earth: near, covariance: uncorrelated([0.01, 0.1, 0.01]), excess },
        ],
        BOUNDS,
      );
    const [low, high] = found(0.84).intervals.resistivity[1]!;
    expect(low).toBeCloseTo(10 * Math.exp(-1.959964 * 0.2), 5);
    // √(1.96² − 0.84) = √3.0015
    expect(high).toBeCloseTo(30 * Math.exp(Math.sqrt(3.001459) * 0.1), 4);
    expect(found(0.84).intervals.resistivity[0]![1]).toBeCloseTo(100 * Math.exp(0.1959964), 3);
    expect(found(0.84).factors.resistivity[1]).toBeCloseTo(3 * Math.exp(0.4 * 0.1), 6);
    // past the 68 % point the other model no longer counts in the factors, past the 95 % point in nothing
    expect(found(1.5).factors.resistivity[1]).toBeCloseTo(Math.exp(0.2), 10);
    expect(found(4).intervals.resistivity[1]![1]).toBeCloseTo(10 * Math.exp(1.959964 * 0.2), 5);
  });
});

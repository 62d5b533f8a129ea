import { describe, expect, it } from 'vitest';
import { earthOf } from '../../../inversion/fit/allowed-models';
import type { LayeredProblem } from '../../../inversion/fit/layered-problem';
import { logCovariance } from '../../../inversion/uncertainty/covariance';
import { parameterDoubt } from '../../../inversion/uncertainty/parameter-doubt';
import { layered } from '../support/fit-settings';

const BOUNDS = layered(2).bounds;

/** One valley of misfit: χ² = excess + ‖J(p − centre)‖². */
interface Valley {
  readonly centre: readonly number[];
  readonly rows: readonly (readonly number[])[];
  readonly excess: number;
}

/** A problem whose misfit is the lowest of its valleys; `held` columns leave it. */
function problemOf(valleys: readonly Valley[], layers: number, held: readonly boolean[]): LayeredProblem {
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const full = Float64Array.from(valleys[0]!.centre);
  const expand = (parameters: ArrayLike<number>) => {
    const all = Float64Array.from(full);
    free.forEach((j, k) => (all[j] = parameters[k]!));
    return all;
  };
  const rows = valleys[0]!.rows.length + 1;
  const at = (parameters: ArrayLike<number>) => {
    const all = expand(parameters);
    return valleys
      .map((valley) => {
        const residual = [
          Math.sqrt(valley.excess),
          ...valley.rows.map((row) =>
            row.reduce((sum, value, j) => sum + value * (all[j]! - valley.centre[j]!), 0),
          ),
        ];
        return { valley, residual, chi2: residual.reduce((sum, r) => sum + r * r, 0) };
      })
      .toSorted((a, b) => a.chi2 - b.chi2)[0]!;
  };
  const limits = (side: 0 | 1) =>
    Float64Array.from(free, (j) => Math.log((j < layers ? BOUNDS.resistivity : BOUNDS.thickness)[side]));
  return {
    layers,
    held,
    expand,
    restrict: (all) => Float64Array.from(free, (j) => all[j]!),
    startFrom: (all) => Float64Array.from(free, (j) => all[j]!),
    problem: {
      residuals: rows,
      low: limits(0),
      high: limits(1),
      evaluate: (parameters, residual) => {
        const found = at(parameters);
        residual.set(found.residual);
        return found.chi2;
      },
      linearise: (parameters, residual, jacobian) => {
        const found = at(parameters);
        residual.set(found.residual);
        jacobian.fill(0);
        found.valley.rows.forEach((row, i) =>
          free.forEach((j, k) => (jacobian[(i + 1) * free.length + k] = row[j]!)),
        );
        return found.chi2;
      },
    },
  };
}

/** Parameter doubt of an earth with the misfit of `rows` about it, and of others with theirs. */
function doubtOf(valleys: readonly Valley[], held: readonly boolean[] = valleys[0]!.centre.map(() => false)) {
  const layers = (held.length + 1) / 2;
  const problem = problemOf(valleys, layers, held);
  const models = valleys.map(({ centre, rows, excess }) => ({
    parameters: Float64Array.from(centre),
    earth: earthOf(Float64Array.from(centre), layers),
    covariance: logCovariance(Float64Array.from(rows.flat()), rows.length, held),
    excess,
  }));
  const [best, ...others] = models;
  return parameterDoubt([best!, ...others], [], problem, 0);
}

/** `found` = centre × exp(reach), the reach within 1 %. */
function near(found: number | null | undefined, centre: number, reach: number) {
  expect(Math.abs(Math.log(found! / centre) - reach)).toBeLessThan(0.01 * Math.abs(reach));
}

const diagonal = (deviation: readonly number[]) =>
  deviation.map((a, i) => deviation.map((_, j) => (i === j ? 1 / a : 0)));
const logs = (...values: number[]) => values.map(Math.log);

describe('parameterDoubt', () => {
  const centre = logs(100, 10, 4);
  const doubt = (deviation: number[]) => doubtOf([{ centre, rows: diagonal(deviation), excess: 0 }]);

  it('gives 95 % intervals and 68 % factors in ln space', () => {
    const { intervals, factors } = doubt([0.1, 0.2, 0.3]);
    near(intervals.resistivity[0]![0], 100, -0.1959964);
    near(intervals.thickness[0]![1], 4, 0.5879892);
    near(factors.resistivity[1], 1, 0.2);
    expect(intervals.depth).toEqual(intervals.thickness);
  });

  it('lets the bounds of one value hold another that is tied to it', () => {
    // readings that see the resistivities, and one that sees h₁ + h₂ alone near h = 3, 1: 0.75 ln h₁ + 0.25 ln h₂
    const rows = [
      [10, 0, 0, 0, 0],
      [0, 10, 0, 0, 0],
      [0, 0, 10, 0, 0],
      [0, 0, 0, 0.75 / 0.001, 0.25 / 0.001],
    ];
    const { factors } = doubtOf([{ centre: logs(1, 1, 1, 3, 1), rows, excess: 0 }]);
    // h₂ goes to both of its bounds; at the upper one, 1000 m, h₁ has come down by 1000^(0.25/0.75) = 10
    expect(factors.thickness[1]).toBeNull();
    expect(factors.thickness[0]).toBeCloseTo(10, 1);
  });

  it('knows S though neither h nor ρ is known, and T not', () => {
    // readings that see ln h − ln ρ of the first layer, and the half-space
    const rows = [
      [-5, 0, 5],
      [0, 10, 0],
    ];
    const found = doubtOf([{ centre, rows, excess: 0 }]);
    expect(found.factors.thickness).toEqual([null]);
    near(found.conductanceFactor[0], 1, 0.2);
    expect(found.resistanceFactor).toEqual([null]);
  });

  it('is null where a factor passes 100 or a bound cuts an interval off', () => {
    const { intervals, factors } = doubt([5, 2.4, 1e6]);
    // ρ₁ reaches its bounds, 0.1 and 10⁵, before 5 standard deviations in ln
    expect(intervals.resistivity[0]).toEqual([null, null]);
    // of ρ₂ one standard deviation stays above its bound, 1.96 of them do not
    expect(factors.resistivity[1]).toBeNull();
    expect(intervals.resistivity[1]![0]).toBeNull();
    expect(intervals.resistivity[1]![1]).toBeGreaterThan(1000);
    expect(intervals.thickness[0]).toEqual([null, null]);
    expect(factors.depth).toEqual([null]);
  });

  it('opens an end beside a bound, where the misfit passes its limit only there', () => {
    const low = (value: number, deviation: number) =>
      doubtOf([{ centre: logs(100, value, 4), rows: diagonal([0.1, deviation, 0.3]), excess: 0 }]).intervals
        .resistivity[1]![0];
    // ln(10/0.1) = 4.605: an end 4.50 below is within 15 % of the bound of 0.1 Ω·m, one 4.35 below is not
    expect(low(10, 4.5 / 1.959964)).toBeNull();
    near(low(10, 4.35 / 1.959964), 10, -4.35);
    // a value known to 4 %, whose bound is another 5 % away
    near(low(0.11, 0.02), 0.11, -0.0392);
  });

  it('gives [v, v], factor 1 and no correlation for a held value', () => {
    // JᵀJ = [[4, −2], [−2, 4]] over the two free parameters: correlation 1/2
    const rows = [
      [9, 2, -1],
      [9, 0, Math.sqrt(3)],
    ];
    const { intervals, factors, correlation } = doubtOf([{ centre, rows, excess: 0 }], [true, false, false]);
    expect(intervals.resistivity[0]![0]).toBeCloseTo(100, 12);
    expect(intervals.resistivity[0]![1]).toBe(intervals.resistivity[0]![0]);
    expect(factors.resistivity[0]).toBe(1);
    expect(correlation[0]).toEqual([null, null, null]);
    expect(correlation[1]![2]).toBeCloseTo(0.5, 12);
    expect(correlation[1]![1]).toBe(1);
  });

  it('reaches over another model that the readings allow, by what its excess of χ² leaves', () => {
    const found = (excess: number) =>
      doubtOf([
        { centre, rows: diagonal([0.1, 0.2, 0.3]), excess: 0 },
        { centre: logs(100, 30, 4), rows: diagonal([0.01, 0.1, 0.01]), excess },
      ]);
    expect(found(0.84).intervals.resistivity[1]).not.toContain(null);
    const [low, high] = found(0.84).intervals.resistivity[1]!;
    near(low, 10, -1.959964 * 0.2);
    // √(1.96² − 0.84) = √3.0015
    near(high, 30, Math.sqrt(3.001459) * 0.1);
    near(found(0.84).factors.resistivity[1], 3, 0.4 * 0.1);
    // past the 68 % point the other model counts by its 95 % reach per 1.96, past the 95 % point in nothing
    near(found(1.5).factors.resistivity[1], 1, (Math.log(3) + Math.sqrt(2.341459) * 0.1) / 1.959964);
    near(found(4).factors.resistivity[1], 1, 0.2);
    near(found(4).intervals.resistivity[1]![1], 10, 1.959964 * 0.2);
  });
});

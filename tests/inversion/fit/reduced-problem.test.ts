import { describe, expect, it } from 'vitest';
import { createRandomStream } from '../../../inversion';
import { packagedStep } from '../../../inversion/fit/damped-step';
import { createReduction, reducedMisfit, reduceProblem } from '../../../inversion/fit/reduced-problem';

const random = createRandomStream(4);
const [m, n] = [12, 4];
const jacobian = Float64Array.from({ length: m * n }, random.normal);
const residual = Float64Array.from({ length: m }, random.normal);
const scale = Float64Array.of(1, 2, 0.5, 3);

/** ‖r + JS⁻¹δ‖² over the columns in `free`, sum by sum. */
function wholeMisfit(free: readonly number[], delta: readonly number[]): number {
  return residual.reduce((sum, r, i) => {
    const value = free.reduce((v, j, k) => v + (jacobian[i * n + j]! / scale[j]!) * delta[k]!, r);
    return sum + value * value;
  }, 0);
}

describe('reduceProblem', () => {
  it('keeps every difference of the misfit, for all and for some of the parameters', () => {
    for (const free of [[0, 1, 2, 3], [1, 3], [2]]) {
      const reduced = reduceProblem(jacobian, residual, n, free, scale, createReduction(m, n));
      const [a, b] = [free.map((j) => 0.3 * j - 0.4), free.map((j) => 1 / (j + 1))];
      expect(reducedMisfit(reduced, a) - reducedMisfit(reduced, b)).toBeCloseTo(
        wholeMisfit(free, a) - wholeMisfit(free, b),
        10,
      );
    }
  });

  it('keeps zero rows where there are fewer readings than parameters, or a column says nothing', () => {
    const few = reduceProblem(
      Float64Array.of(1, 0, 2, 2, 0, 1),
      Float64Array.of(3, 4),
      3,
      [0, 1, 2],
      Float64Array.of(1, 1, 1),
      createReduction(2, 3),
    );
    expect(reducedMisfit(few, [0, 0, 0])).toBeCloseTo(25, 12);
    expect(reducedMisfit(few, [0, 7, 0])).toBeCloseTo(25, 12);
    expect(reducedMisfit(few, [-5 / 3, 0, -2 / 3])).toBeCloseTo(0, 12);
  });
});

describe('packagedStep', () => {
  const free = [0, 1, 2, 3];
  const reduced = reduceProblem(jacobian, residual, n, free, scale, createReduction(m, n));
  const wide = { low: [-9, -9, -9, -9], high: [9, 9, 9, 9] };

  it('is the least of the misfit where it is not damped, and the shorter the more it is', () => {
    const step = Array.from(packagedStep(reduced, wide.low, wide.high, 1e-12));
    const least = wholeMisfit(free, step);
    for (const k of free) {
      for (const move of [-0.01, 0.01])
        expect(wholeMisfit(free, step.with(k, step[k]! + move))).toBeGreaterThan(least);
    }
    const damped = Array.from(packagedStep(reduced, wide.low, wide.high, 10));
    expect(Math.max(...damped.map(Math.abs))).toBeLessThan(Math.max(...step.map(Math.abs)));
  });

  it('keeps within the bounds', () => {
    const step = Array.from(
      packagedStep(reduced, [-0.01, -0.01, -0.01, -0.01], [0.01, 0.01, 0.01, 0.01], 1e-6),
    );
    expect(Math.max(...step.map(Math.abs))).toBe(0.01);
  });
});

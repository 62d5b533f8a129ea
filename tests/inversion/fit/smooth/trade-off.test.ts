import { describe, expect, it } from 'vitest';
import type { CellProblem } from '../../../../inversion/fit/smooth/cell-problem';
import { balanceAt, smoothestWithin } from '../../../../inversion/fit/smooth/trade-off';

/** One unknown x with (x − 1)² + λx², so x = 1/(1 + λ); χ² is any curve of x. */
function oneUnknown(chi2Of: (x: number) => number): CellProblem {
  return {
    cells: 1,
    thickness: [],
    expand: (free) => Float64Array.from(free),
    describe: (free) => ({ predicted: [], residuals: [], chi2: chi2Of(free[0]!) }),
    problem: ({ lambda }) => {
      const evaluate = (free: ArrayLike<number>, residual: Float64Array) => {
        residual[0] = free[0]! - 1;
        residual[1] = Math.sqrt(lambda) * free[0]!;
        return residual[0]! ** 2 + residual[1]! ** 2;
      };
      return {
        residuals: 2,
        low: Float64Array.of(-10),
        high: Float64Array.of(10),
        evaluate,
        linearise: (free, residual, jacobian) => {
          jacobian.set([1, Math.sqrt(lambda)]);
          return evaluate(free, residual);
        },
      };
    },
  };
}

const optionsOf = (chi2Of: (x: number) => number) => ({
  cell: oneUnknown(chi2Of),
  shape: { boundaryWeights: [] },
});

describe('smoothestWithin', () => {
  it('finds the largest λ that keeps χ² at the goal, from either side', () => {
    const options = optionsOf((x) => (x - 1) ** 2);
    for (const lambda of [100, 0.01]) {
      const first = balanceAt(options, lambda, [0.5]);
      const { balance, reached } = smoothestWithin(options, 0.25, first, [1e-4, 1e4]);
      expect(reached).toBe(true);
      expect(balance.chi2).toBeLessThanOrEqual(0.25);
      expect(balance.chi2).toBeGreaterThan(0.995 * 0.25);
      // χ² = (λ/(1 + λ))² = 1/4 at λ = 1
      expect(balance.lambda).toBeCloseTo(1, 1);
    }
  });

  it('gives back the least χ² on the way where the goal is out of reach, not the last', () => {
    // least at x = 0.5, λ = 1, and rising again towards smaller λ
    const options = optionsOf((x) => 2 + (x - 0.5) ** 2);
    const first = balanceAt(options, 64, [0]);
    const { balance, reached } = smoothestWithin(options, 1, first, [1e-4, 64]);
    expect(reached).toBe(false);
    expect(balance.lambda).toBeCloseTo(1, 9);
    expect(balance.chi2).toBeCloseTo(2, 6);
  });

  it('stops at the largest λ where even that stays within the goal', () => {
    const options = optionsOf(() => 0.1);
    const { balance } = smoothestWithin(options, 1, balanceAt(options, 1, [0.5]), [1e-4, 64]);
    expect(balance.lambda).toBe(64);
  });
});

import { describe, expect, it } from 'vitest';
import { minimise, type LeastSquaresProblem } from '../../../inversion/fit/levenberg-marquardt';
import { createDescent } from '../../../inversion/fit/search-descent';

/** r = (10(y − x²), 1 − x): a bent valley whose least, 0, is at (1, 1) (Rosenbrock 1960). */
const valley = (low: number[], high: number[]): LeastSquaresProblem => {
  const evaluate: LeastSquaresProblem['evaluate'] = (p, residual) => {
    residual.set([10 * (p[1]! - p[0]! * p[0]!), 1 - p[0]!]);
    return residual[0]! * residual[0]! + residual[1]! * residual[1]!;
  };
  return {
    residuals: 2,
    low: Float64Array.from(low),
    high: Float64Array.from(high),
    evaluate,
    linearise: (p, residual, jacobian) => {
      jacobian.set([-20 * p[0]!, 10, -1, 0]);
      return evaluate(p, residual);
    },
  };
};

describe('createDescent', () => {
  it('comes down a bent valley to its least, from start to start', () => {
    const descend = createDescent(valley([-5, -5], [5, 5]));
    for (const start of [
      [-1.2, 1],
      [3, -3],
    ]) {
      const { parameters, chi2 } = descend(start, { promise: 1e-12 });
      expect(chi2).toBeLessThan(1e-12);
      expect(Array.from(parameters, (value) => Math.round(1e6 * value) / 1e6)).toEqual([1, 1]);
    }
  });

  it('ends on a bound where the packaged descent ends', () => {
    const problem = valley([-5, -5], [0.5, 5]);
    const own = createDescent(problem)([-1.2, 1], { promise: 1e-12 });
    const packaged = minimise(problem, [-1.2, 1]);
    expect(own.parameters[0]).toBe(0.5);
    expect(own.parameters[1]).toBeCloseTo(packaged.parameters[1]!, 6);
  });

  it('stops after its steps, where little is promised, and where it is told to', () => {
    const descend = createDescent(valley([-5, -5], [5, 5]));
    expect(descend([-1.2, 1], { promise: 1e-12, iterations: 3 })).toMatchObject({
      status: 'iteration-limit',
      iterations: 3,
    });
    expect(descend([-1.2, 1], { promise: 1 })).toMatchObject({ status: 'converged-decrease', iterations: 0 });
    const abandoned = descend([-1.2, 1], { promise: 0, abandon: (at) => at[0]! > 0 });
    expect(abandoned.status).toBe('iteration-limit');
    expect(abandoned.parameters[0]).toBeGreaterThan(0);
  });
});

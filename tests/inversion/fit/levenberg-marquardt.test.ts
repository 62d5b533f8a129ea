import { describe, expect, it } from 'vitest';
import { minimise, type LeastSquaresProblem } from '../../../inversion/fit/levenberg-marquardt';

function problem(
  residuals: (p: ArrayLike<number>) => number[],
  jacobian: (p: ArrayLike<number>) => number[],
  low: number[],
  high: number[],
): LeastSquaresProblem {
  const fill = (p: ArrayLike<number>, out: Float64Array) => {
    out.set(residuals(p));
    return out.reduce((sum, r) => sum + r * r, 0);
  };
  return {
    residuals: residuals(low).length,
    low: Float64Array.from(low),
    high: Float64Array.from(high),
    evaluate: fill,
    linearise: (p, out, into) => {
      into.set(jacobian(p));
      return fill(p, out);
    },
  };
}

const valley = (low: number[], high: number[]) =>
  problem(
    (p) => [10 * (p[1]! - p[0]! ** 2), 1 - p[0]!],
    (p) => [-20 * p[0]!, 10, -1, 0],
    low,
    high,
  );

describe('minimise', () => {
  it('finds the end of a curved valley (Rosenbrock 1960)', () => {
    const outcome = minimise(valley([-5, -5], [5, 5]), [-1.2, 1]);
    expect(outcome.chi2).toBeLessThan(1e-12);
    expect(outcome.parameters[0]).toBeCloseTo(1, 6);
    expect(outcome.status).toMatch(/^converged-/);
  });

  it('stops on a bound at the least value that the bound allows', () => {
    const outcome = minimise(valley([-5, -5], [0.5, 5]), [-1.2, 1]);
    expect(outcome.parameters[0]).toBe(0.5);
    expect(outcome.parameters[1]).toBeCloseTo(0.25, 6);
    expect(outcome.chi2).toBeCloseTo(0.25, 10);
  });

  it('never ends above its start, and clips a start outside the bounds', () => {
    const outcome = minimise(valley([-5, -5], [0.5, 5]), [9, 9], { iterations: 3 });
    expect(outcome.parameters[0]).toBeLessThanOrEqual(0.5);
    expect(outcome.chi2).toBeLessThanOrEqual((10 * (5 - 0.25)) ** 2 + 0.25);
  });

  it('says that the step limit was reached, and goes on from there with the damping it hands back', () => {
    const half = minimise(valley([-5, -5], [5, 5]), [-1.2, 1], { iterations: 5 });
    expect(half).toMatchObject({ status: 'iteration-limit', iterations: 5 });
    const rest = minimise(valley([-5, -5], [5, 5]), half.parameters, { initialDamping: half.damping });
    const whole = minimise(valley([-5, -5], [5, 5]), [-1.2, 1]);
    expect(rest.iterations + 5).toBe(whole.iterations);
    expect(rest.parameters).toEqual(whole.parameters);
  });

  it('stops at once where there is no slope', () => {
    const flat = problem(
      () => [3, 4],
      () => [0, 0],
      [-1],
      [1],
    );
    expect(minimise(flat, [0])).toMatchObject({ status: 'converged-gradient', iterations: 0, chi2: 25 });
  });

  it('gives up where the slope promises a descent that is not there', () => {
    const liar = problem(
      (p) => [1 + Math.abs(p[0]!)],
      () => [1],
      [-1],
      [1],
    );
    expect(minimise(liar, [0])).toMatchObject({ status: 'no-descent', chi2: 1 });
  });

  it('stops where three steps in a row gain next to nothing, long before the slope is gone', () => {
    const flattening = problem(
      (p) => [10, p[0]! ** 3],
      (p) => [0, 3 * p[0]! ** 2],
      [-1],
      [1],
    );
    const outcome = minimise(flattening, [0.3]);
    expect(outcome.status).toBe('converged-decrease');
    expect(outcome.parameters[0]).toBeGreaterThan(0.03);
  });

  it('solves a problem of one residual', () => {
    const one = problem(
      (p) => [p[0]! - 0.3],
      () => [1],
      [-1],
      [1],
    );
    expect(minimise(one, [0]).parameters[0]).toBeCloseTo(0.3, 6);
  });

  it('reports each kept step with a falling χ²', () => {
    const seen: number[] = [];
    minimise(valley([-5, -5], [5, 5]), [-1.2, 1], { onIteration: (_, chi2) => seen.push(chi2) });
    expect(seen.length).toBeGreaterThan(5);
    expect(seen).toEqual(seen.toSorted((a, b) => b - a));
  });
});

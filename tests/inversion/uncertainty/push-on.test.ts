import { expect, it } from 'vitest';
import type { LeastSquaresProblem } from '../../../inversion/fit/levenberg-marquardt';
import { pushOn } from '../../../inversion/uncertainty/push-on';
import type { ProfileEnd } from '../../../inversion/uncertainty/profile-reach';

/** A valley that bends: χ² = (x/2)² + (20(y − sin x))², with |x|, |y| ≤ 10; along its floor x is known to ± 2. */
const bent: LeastSquaresProblem = {
  residuals: 2,
  low: Float64Array.of(-10, -10),
  high: Float64Array.of(10, 10),
  evaluate: (at, residual) => {
    residual.set([at[0]! / 2, 20 * (at[1]! - Math.sin(at[0]!))]);
    return residual[0]! ** 2 + residual[1]! ** 2;
  },
  linearise: (at, residual, jacobian) => {
    jacobian.set([0.5, 0, -20 * Math.cos(at[0]!), 20]);
    return bent.evaluate(at, residual);
  },
};
const towards = (side: 1 | -1) => ({
  value: (at: ArrayLike<number>) => side * at[0]!,
  gradient: () => Float64Array.of(side, 0),
});
const foot: ProfileEnd = {
  parameters: Float64Array.of(0, 0),
  chi2: 0,
  reach: 0,
  unfinished: true,
  straight: false,
  damping: 1,
};
const never = () => false;

it('follows a bent valley to where the misfit ends it, from inside', () => {
  for (const side of [1, -1] as const) {
    const end = pushOn(bent, towards(side), 3.8415, foot, 0, never);
    expect(end.reach).toBeLessThanOrEqual(2 * 1.96);
    expect(end.reach).toBeGreaterThan(0.96 * 2 * 1.96);
    expect(end.chi2).toBeLessThanOrEqual(3.8415);
    expect(end.unfinished).toBe(false);
  }
});

it('stops where the bounds hold the quantity', () => {
  const end = pushOn(bent, towards(1), 100, foot, 0, ({ parameters }) => parameters[0] === 10);
  expect(end.reach).toBe(10);
  expect(end.chi2).toBeLessThanOrEqual(100);
});

import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import { minimise } from '../levenberg-marquardt';
import type { CellProblem, Regularisation } from './cell-problem';

/** A ground of cells at one weight of the roughness. */
export interface Balance {
  readonly free: Float64Array;
  readonly lambda: number;
  /** of the readings alone */
  readonly chi2: number;
  /** of the last step towards it */
  readonly damping: number;
}

export interface TradeOffOptions {
  readonly cell: CellProblem;
  readonly shape: Omit<Regularisation, 'lambda'>;
  /** how close under its goal χ² must end, as a share */
  readonly close?: number | undefined;
  /** called after each weight that was tried */
  readonly onBalance?: ((balance: Balance, iterations: number) => void) | undefined;
}

/** λ runs from the first to the second times the mean squared column norm of the whitened Jacobian. */
const SMOOTHEST = 1e4;
const ROUGHEST = 1e-8;
const LAMBDA_STEP = 4;
const BISECTIONS = 16;
/** χ² this close under its goal, as a share, ends the search of a result that is shown. */
const CLOSE = 0.005;
const STEPS = 30;
/** The rows of the penalty keep the problem well-posed, so that little damping is needed. */
const DAMPING = 1e-3;

/** Smallest and largest λ that are tried. */
export function lambdaRange({ cell, shape }: TradeOffOptions, free: Float64Array): [number, number] {
  const { residuals, low, linearise } = cell.problem({ ...shape, lambda: 0 });
  const jacobian = new Float64Array(residuals * low.length);
  linearise(free, new Float64Array(residuals), jacobian);
  const strength = jacobian.reduce((sum, value) => sum + value * value, 0) / cell.cells;
  return [ROUGHEST * strength, SMOOTHEST * strength];
}

/** The ground that minimises χ² + roughness at one λ, sought from a ground near it. */
export function balanceAt(options: TradeOffOptions, lambda: number, from: ArrayLike<number>): Balance {
  const { cell, shape, onBalance } = options;
  const { parameters, iterations, damping } = minimise(cell.problem({ ...shape, lambda }), from, {
    iterations: STEPS,
    initialDamping: DAMPING,
  });
  const balance = { free: parameters, lambda, chi2: cell.describe(parameters).chi2, damping };
  onBalance?.(balance, iterations);
  return balance;
}

/** The largest λ between a balance within the goal and one beyond it. */
function bisect(options: TradeOffOptions, within: Balance, beyond: Balance, goal: number): Balance {
  const near = (1 - (options.close ?? CLOSE)) * goal;
  let best = within;
  let over = beyond;
  for (let i = 0; i < BISECTIONS && best.chi2 < near; i++) {
    const middle = balanceAt(options, exp((log(best.lambda) + log(over.lambda)) / 2), best.free);
    if (middle.chi2 <= goal) best = middle;
    else over = middle;
  }
  return best;
}

/**
 * The smoothest ground with χ² ≤ `goal`: the largest λ that keeps it, sought from `first` upwards while χ² stays within
 * the goal and else downwards, each ground started from the one before, then by bisection of
 * ln λ until χ² is within 0.5 % of the goal.
 * Where no λ reaches the goal, `reached` is false and the balance is the one of least χ².
 */
export function smoothestWithin(
  options: TradeOffOptions,
  goal: number,
  first: Balance,
  [lowest, highest]: readonly [number, number],
): { balance: Balance; reached: boolean } {
  let last = first;
  while (last.chi2 <= goal && last.lambda < highest) {
    const next = balanceAt(options, last.lambda * LAMBDA_STEP, last.free);
    if (next.chi2 > goal) return { balance: bisect(options, last, next, goal), reached: true };
    last = next;
  }
  if (last.chi2 <= goal) return { balance: last, reached: true };
  let least = last;
  while (last.lambda > lowest) {
    const next = balanceAt(options, last.lambda / LAMBDA_STEP, last.free);
    if (next.chi2 <= goal) return { balance: bisect(options, next, last, goal), reached: true };
    if (next.chi2 < least.chi2) least = next;
    last = next;
  }
  return { balance: least, reached: false };
}

/** Where a goal is out of reach, the smoothest ground within this share above the least χ² stands for it. */
const SPARE = 0.05;

/**
 * The smoothest ground at the `target` χ² or, where that is out of reach, within 5 % of the least; `goal` is the χ² that was
 * aimed at in the end, `first` the ground of the largest λ, all but uniform or at its reference.
 */
export function smoothestOrClosest(
  options: TradeOffOptions,
  target: number,
  uniform: Float64Array,
): { balance: Balance; reached: boolean; goal: number; first: Balance; range: [number, number] } {
  const range = lambdaRange(options, uniform);
  const first = balanceAt(options, range[1], uniform);
  const { balance, reached } = smoothestWithin(options, target, first, range);
  if (reached) return { balance, reached, goal: target, first, range };
  const goal = (1 + SPARE) * balance.chi2;
  return { balance: smoothestWithin(options, goal, balance, range).balance, reached, goal, first, range };
}

import { TOLERANCES } from '../tolerances';
import type { FitStatus } from '../types';
import { packagedStep } from './damped-step';
import { createReduction, reducedMisfit, reduceProblem, type ReducedProblem } from './reduced-problem';

/** A least-squares problem in n free parameters between `low` and `high`, m whitened residuals. */
export interface LeastSquaresProblem {
  readonly residuals: number;
  readonly low: Float64Array;
  readonly high: Float64Array;
  /** Σ residual²; writes m residuals. */
  readonly evaluate: (parameters: ArrayLike<number>, residual: Float64Array) => number;
  /** The same, and the row-major m × n Jacobian. */
  readonly linearise: (
    parameters: ArrayLike<number>,
    residual: Float64Array,
    jacobian: Float64Array,
  ) => number;
}

export interface LeastSquaresOutcome {
  readonly status: FitStatus;
  readonly parameters: Float64Array;
  readonly chi2: number;
  readonly iterations: number;
  /** damping at the end; hand it back as `initialDamping` to go on */
  readonly damping: number;
}

export interface LeastSquaresOptions {
  readonly iterations?: number;
  readonly initialDamping?: number;
  readonly onIteration?: ((iteration: number, chi2: number) => void) | undefined;
}

export const FASTER = 4;
export const SLOWER = 5;
/** The damping is lowered when χ² fell by more than this share of what the linearised problem promised. */
export const WELL_KEPT = 0.25;
export const INITIAL_DAMPING = 0.3;
/** `initialDamping` from where a search ended: so near to the least, hardly any is needed. */
export const POLISH_DAMPING = 1e-6;
export const LOWEST_DAMPING = 1e-9;
/** A parameter is damped as if its sensitivity were at least this share of the strongest one's. */
export const SCALE_FLOOR = 0.1;

interface Point {
  readonly parameters: Float64Array;
  readonly residual: Float64Array;
  chi2: number;
}

const createPoint = (n: number, m: number): Point => ({
  parameters: new Float64Array(n),
  residual: new Float64Array(m),
  chi2: Infinity,
});

/**
 * Writes into `trial` where one damped step from `current` leads, each parameter scaled by its own sensitivity; returns the
 * fall of χ² that the linearised problem promises for it.
 */
function stepInto(
  trial: Point,
  current: Point,
  problem: LeastSquaresProblem,
  reduced: ReducedProblem,
  free: readonly number[],
  scale: Float64Array,
  damping: number,
): number {
  const low = free.map((j) => (problem.low[j]! - current.parameters[j]!) * scale[j]!);
  const high = free.map((j) => (problem.high[j]! - current.parameters[j]!) * scale[j]!);
  const delta = packagedStep(reduced, low, high, damping);
  trial.parameters.set(current.parameters);
  free.forEach((j, k) => {
    const moved = current.parameters[j]! + delta[k]! / scale[j]!;
    // a clipped step ends on the bound itself, not a rounding beside it
    trial.parameters[j] =
      delta[k]! <= low[k]! ? problem.low[j]! : delta[k]! >= high[k]! ? problem.high[j]! : moved;
  });
  trial.chi2 = problem.evaluate(trial.parameters, trial.residual);
  return norm2(reduced.rest) - reducedMisfit(reduced, delta);
}

/** Gradient Jᵀr and the column norms of J. */
function slopes(jacobian: Float64Array, residual: Float64Array, n: number) {
  const gradient = new Float64Array(n);
  const norms = new Float64Array(n);
  for (let i = 0; i < residual.length; i++) {
    for (let j = 0; j < n; j++) {
      const value = jacobian[i * n + j]!;
      gradient[j]! += value * residual[i]!;
      norms[j]! += value * value;
    }
  }
  return { gradient, norms: norms.map(Math.sqrt) };
}

/**
 * The parameters that a step may move (one on a bound that would leave it is held), and the steepest |Jᵀr|ⱼ/‖Jⱼ‖ among
 * them: √χ² times the cosine between the residual and a column, so a scale-free slope.
 */
function freeParameters(
  problem: LeastSquaresProblem,
  parameters: Float64Array,
  gradient: Float64Array,
  norms: Float64Array,
) {
  const free: number[] = [];
  let steepest = 0;
  gradient.forEach((slope, j) => {
    const leaves =
      (parameters[j]! <= problem.low[j]! && slope > 0) || (parameters[j]! >= problem.high[j]! && slope < 0);
    if (leaves) return;
    free.push(j);
    if (slope !== 0) steepest = Math.max(steepest, Math.abs(slope) / norms[j]!);
  });
  return { free, steepest };
}

function norm2(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return sum;
}

function farthestMove(from: Float64Array, to: Float64Array): number {
  let far = 0;
  for (let j = 0; j < from.length; j++) far = Math.max(far, Math.abs(to[j]! - from[j]!));
  return far;
}

/**
 * Bounded Levenberg–Marquardt from `start`: one step at a time on the reduced problem, kept only if χ² falls, damping ÷4 on success and ×5 on failure; one run of the forward model a step, one Jacobian a kept step.
 * A parameter that sits on a bound and would leave it is held for that step.
 * Source: Marquardt 1963; scaled damping after Moré 1978.
 */
export function minimise(
  problem: LeastSquaresProblem,
  start: ArrayLike<number>,
  options: LeastSquaresOptions = {},
): LeastSquaresOutcome {
  const n = problem.low.length;
  const m = problem.residuals;
  const limit = options.iterations ?? TOLERANCES.iterations;
  const jacobian = new Float64Array(m * n);
  const reduction = createReduction(m, n);
  let current = createPoint(n, m);
  let trial = createPoint(n, m);
  for (let j = 0; j < n; j++)
    current.parameters[j] = Math.min(problem.high[j]!, Math.max(problem.low[j]!, start[j]!));
  current.chi2 = problem.linearise(current.parameters, current.residual, jacobian);
  let damping = options.initialDamping ?? INITIAL_DAMPING;
  let slow = 0;
  let iteration = 0;
  const done = (status: FitStatus): LeastSquaresOutcome => ({
    status,
    parameters: current.parameters,
    chi2: current.chi2,
    iterations: iteration,
    damping,
  });
  while (iteration < limit) {
    const { gradient, norms } = slopes(jacobian, current.residual, n);
    const { free, steepest } = freeParameters(problem, current.parameters, gradient, norms);
    const level = Math.sqrt(Math.max(current.chi2, TOLERANCES.exactFit));
    if (steepest <= TOLERANCES.gradient * level) return done('converged-gradient');
    const strongest = norms.reduce((most, norm) => Math.max(most, norm), 0);
    const scale = norms.map((norm) => Math.max(norm, SCALE_FLOOR * strongest, 1e-300));
    const reduced = reduceProblem(jacobian, current.residual, n, free, scale, reduction);
    const fall = norm2(reduced.rest);
    if (fall <= TOLERANCES.promise * current.chi2) return done('converged-decrease');
    let promised: number;
    for (;;) {
      promised = stepInto(trial, current, problem, reduced, free, scale, damping);
      iteration++;
      if (trial.chi2 < current.chi2) break;
      damping *= SLOWER;
      if (damping > TOLERANCES.damping) return done('no-descent');
      if (iteration >= limit) return done('iteration-limit');
    }
    const move = farthestMove(current.parameters, trial.parameters);
    slow = current.chi2 - trial.chi2 < TOLERANCES.decrease * current.chi2 ? slow + 1 : 0;
    const kept = (current.chi2 - trial.chi2) / promised;
    if (kept > WELL_KEPT) damping = Math.max(LOWEST_DAMPING, damping / FASTER);
    [current, trial] = [trial, current];
    options.onIteration?.(iteration, current.chi2);
    if (move <= TOLERANCES.step) return done('converged-step');
    if (slow >= 3) return done('converged-decrease');
    if (iteration < limit) problem.linearise(current.parameters, current.residual, jacobian);
  }
  return done('iteration-limit');
}

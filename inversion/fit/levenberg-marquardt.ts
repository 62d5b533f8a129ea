import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { TOLERANCES } from '../tolerances';
import type { FitStatus } from '../types';

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
  readonly onIteration?: (iteration: number, chi2: number) => void;
}

const FASTER = 4;
const SLOWER = 5;
const INITIAL_DAMPING = 0.3;
const LOWEST_DAMPING = 1e-9;
/** A parameter is damped as if its sensitivity were at least this share of the strongest one's. */
const SCALE_FLOOR = 0.1;

interface Trial {
  readonly parameters: Float64Array;
  readonly residual: Float64Array;
  readonly chi2: number;
}

/**
 * One damped step from `current` by the packaged solver: `maxIterations: 1`, whitened residuals, only the parameters in
 * `free`, each scaled by `scale` so that damping is relative to its own sensitivity.
 */
function oneStep(
  problem: LeastSquaresProblem,
  current: Trial,
  jacobian: Float64Array,
  free: readonly number[],
  scale: Float64Array,
  damping: number,
  data: { x: Float64Array; y: Float64Array },
): Trial {
  const m = problem.residuals;
  const n = problem.low.length;
  const row = free.map(() => 0);
  const origin = free.map((j) => current.parameters[j]! * scale[j]!);
  let last: Trial = current;
  const at = (scaled: readonly number[]): Trial => {
    if (scaled.every((value, k) => value === origin[k])) return current;
    const parameters = Float64Array.from(current.parameters);
    free.forEach((j, k) => {
      parameters[j] = Math.min(problem.high[j]!, Math.max(problem.low[j]!, scaled[k]! / scale[j]!));
    });
    if (last !== current && parameters.every((value, j) => value === last.parameters[j])) return last;
    const residual = new Float64Array(m);
    last = { parameters, residual, chi2: problem.evaluate(parameters, residual) };
    return last;
  };
  levenbergMarquardt(
    data,
    (scaled) => {
      const { residual } = at(scaled);
      return (i) => (i < m ? residual[i]! : 0);
    },
    {
      initialValues: origin,
      minValues: free.map((j) => problem.low[j]! * scale[j]!),
      maxValues: free.map((j) => problem.high[j]! * scale[j]!),
      damping,
      maxIterations: 1,
      errorTolerance: 0,
      jacobianFunction: () => (i) => {
        for (let k = 0; k < free.length; k++) {
          const j = free[k]!;
          row[k] = i < m ? jacobian[i * n + j]! / scale[j]! : 0;
        }
        return row;
      },
    },
  );
  return last;
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

/**
 * Bounded Levenberg–Marquardt from `start`: the packaged solver driven one step at a time, a step kept only if χ² falls,
 * damping ÷4 on success and ×5 on failure. A parameter that sits on a bound and would leave it is held for that step.
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
  // x is the index of a residual, y the zero that it aims at; the packaged solver refuses a single point, and a second,
  // always zero residual changes nothing
  const points = Math.max(2, m);
  const data = { x: Float64Array.from({ length: points }, (_, i) => i), y: new Float64Array(points) };
  const jacobian = new Float64Array(m * n);
  const parameters = Float64Array.from({ length: n }, (_, j) =>
    Math.min(problem.high[j]!, Math.max(problem.low[j]!, start[j]!)),
  );
  const residual = new Float64Array(m);
  let current: Trial = { parameters, residual, chi2: problem.linearise(parameters, residual, jacobian) };
  let damping = options.initialDamping ?? INITIAL_DAMPING;
  let slow = 0;
  const done = (status: FitStatus, iterations: number): LeastSquaresOutcome => ({
    status,
    parameters: current.parameters,
    chi2: current.chi2,
    iterations,
    damping,
  });
  let { gradient, norms } = slopes(jacobian, current.residual, n);
  for (let iteration = 0; iteration < limit; iteration++) {
    const { free, steepest } = freeParameters(problem, current.parameters, gradient, norms);
    const level = Math.sqrt(Math.max(current.chi2, TOLERANCES.exactFit));
    if (steepest <= TOLERANCES.gradient * level) return done('converged-gradient', iteration);
    const strongest = Math.max(...norms);
    const scale = norms.map((norm) => Math.max(norm, SCALE_FLOOR * strongest, 1e-300));
    const trial = oneStep(problem, current, jacobian, free, scale, damping, data);
    if (!(trial.chi2 < current.chi2)) {
      damping *= SLOWER;
      if (damping > TOLERANCES.damping) return done('no-descent', iteration + 1);
      continue;
    }
    const move = trial.parameters.reduce(
      (far, p, j) => Math.max(far, Math.abs(p - current.parameters[j]!)),
      0,
    );
    slow = current.chi2 - trial.chi2 < TOLERANCES.decrease * current.chi2 ? slow + 1 : 0;
    damping = Math.max(LOWEST_DAMPING, damping / FASTER);
    current = trial;
    options.onIteration?.(iteration + 1, current.chi2);
    if (move <= TOLERANCES.step) return done('converged-step', iteration + 1);
    if (slow >= 3) return done('converged-decrease', iteration + 1);
    problem.linearise(current.parameters, current.residual, jacobian);
    ({ gradient, norms } = slopes(jacobian, current.residual, n));
  }
  return done('iteration-limit', limit);
}

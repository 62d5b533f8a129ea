import { choleskyInPlace, choleskySolve } from '../matrix/cholesky';
import { normalEquations } from '../matrix/normal-equations';
import { TOLERANCES } from '../tolerances';
import type { FitStatus } from '../types';
import {
  FASTER,
  INITIAL_DAMPING,
  LOWEST_DAMPING,
  SCALE_FLOOR,
  SLOWER,
  WELL_KEPT,
  type LeastSquaresOptions,
  type LeastSquaresOutcome,
  type LeastSquaresProblem,
} from './levenberg-marquardt';

export interface DescentOptions extends LeastSquaresOptions {
  /** converged-decrease as soon as the linearised problem promises less than this × χ² */
  readonly promise: number;
  /** asked before each linearised step, with the χ² that the linearised problem promises; true ends the run as if the limit were reached */
  readonly abandon?: (parameters: Float64Array, promised: number) => boolean;
}

export type Descent = (start: ArrayLike<number>, options: DescentOptions) => LeastSquaresOutcome;

/** Share of a diagonal entry that lifts the normal matrix off its rounding floor. */
const RIDGE = 1e-12;

/**
 * The descent of `minimise` for the many starts of a search: the same damping, scales and bounds, but by the normal equations
 * in working arrays that are kept from start to start. They lose half of the digits, which a search does not need.
 */
export function createDescent(problem: LeastSquaresProblem): Descent {
  const { low, high } = problem;
  const n = low.length;
  const residual = new Float64Array(problem.residuals);
  const jacobian = new Float64Array(problem.residuals * n);
  const normal = new Float64Array(n * n);
  const slope = new Float64Array(n);
  const factor = new Float64Array(n * n);
  const packed = new Float64Array(n);
  const delta = new Float64Array(n);
  const free = new Int32Array(n);
  let current = new Float64Array(n);
  let trial = new Float64Array(n);
  let count = 0;

  /** Takes over what was last linearised, at `current`. */
  const gather = (): void => {
    normalEquations(jacobian, residual, normal, slope);
    count = 0;
    for (let j = 0; j < n; j++) {
      const leaves = (current[j]! <= low[j]! && slope[j]! > 0) || (current[j]! >= high[j]! && slope[j]! < 0);
      if (!leaves) free[count++] = j;
    }
  };
  /** (A + damping·S²)⁻¹Jᵀr over the free parameters into `packed`, S their scales; false where rounding forbids it. */
  const solve = (damping: number): boolean => {
    let strongest = 0;
    for (let j = 0; j < n; j++) strongest = Math.max(strongest, normal[j * (n + 1)]!);
    const floor = Math.max(SCALE_FLOOR * SCALE_FLOOR * strongest, Number.MIN_VALUE);
    for (let a = 0; a < count; a++) {
      const row = free[a]! * n;
      for (let b = 0; b <= a; b++) factor[a * count + b] = normal[row + free[b]!]!;
      factor[a * count + a]! += (damping + RIDGE) * Math.max(normal[row + free[a]!]!, floor);
      packed[a] = slope[free[a]!]!;
    }
    if (!choleskyInPlace(factor, count)) return false;
    choleskySolve(factor, count, packed);
    return true;
  };
  /** The fall of χ² that the linearised problem promises for its least. */
  const wholeFall = (): number => {
    if (!solve(0)) return Infinity;
    let fall = 0;
    for (let a = 0; a < count; a++) fall += slope[free[a]!]! * packed[a]!;
    return fall;
  };
  /** Writes a damped step, clipped to the bounds, into `trial`; returns the fall of χ² that it promises. */
  const stepInto = (damping: number): number => {
    for (let j = 0; j < n; j++) {
      trial[j] = current[j]!;
      delta[j] = 0;
    }
    if (!solve(damping)) return 0;
    for (let a = 0; a < count; a++) {
      const j = free[a]!;
      trial[j] = Math.min(high[j]!, Math.max(low[j]!, current[j]! - packed[a]!));
      delta[j] = trial[j]! - current[j]!;
    }
    let fall = 0;
    for (let j = 0; j < n; j++) {
      let row = normal[j * (n + 1)]! * delta[j]!;
      for (let k = 0; k < j; k++) row += 2 * normal[j * n + k]! * delta[k]!;
      fall -= delta[j]! * (2 * slope[j]! + row);
    }
    return fall;
  };
  const outcome = (
    status: FitStatus,
    chi2: number,
    iterations: number,
    damping: number,
  ): LeastSquaresOutcome => ({ status, parameters: current.slice(), chi2, iterations, damping });

  return (start, { iterations: limit = TOLERANCES.iterations, ...options }) => {
    for (let j = 0; j < n; j++) current[j] = Math.min(high[j]!, Math.max(low[j]!, start[j]!));
    let chi2 = problem.linearise(current, residual, jacobian);
    gather();
    let damping = options.initialDamping ?? INITIAL_DAMPING;
    let iterations = 0;
    for (;;) {
      const fall = wholeFall();
      if (fall <= options.promise * chi2) return outcome('converged-decrease', chi2, iterations, damping);
      if (options.abandon?.(current, chi2 - fall))
        return outcome('iteration-limit', chi2, iterations, damping);
      for (;;) {
        const promised = stepInto(damping);
        iterations++;
        // most steps are kept: what goes on from there is computed with the misfit, which has the same bits either way
        const reached =
          iterations < limit
            ? problem.linearise(trial, residual, jacobian)
            : problem.evaluate(trial, residual);
        if (reached < chi2) {
          if (chi2 - reached > WELL_KEPT * promised) damping = Math.max(LOWEST_DAMPING, damping / FASTER);
          chi2 = reached;
          break;
        }
        damping *= SLOWER;
        if (damping > TOLERANCES.damping) return outcome('no-descent', chi2, iterations, damping);
        if (iterations >= limit) return outcome('iteration-limit', chi2, iterations, damping);
      }
      [current, trial] = [trial, current];
      options.onIteration?.(iterations, chi2);
      if (iterations >= limit) return outcome('iteration-limit', chi2, iterations, damping);
      gather();
    }
  };
}

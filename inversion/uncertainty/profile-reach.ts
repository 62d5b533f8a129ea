import type { LeastSquaresProblem } from '../fit/levenberg-marquardt';
import { choleskyInPlace, choleskySolve } from '../matrix/cholesky';

/** How far a quantity goes on one side while the misfit stays within a limit. */
export interface ProfileEnd {
  /** the furthest point found, in free parameters */
  readonly parameters: Float64Array;
  /** s · ln quantity there, s = ±1 the side */
  readonly reach: number;
  readonly chi2: number;
  /** true when the bounds end it before the misfit does */
  readonly open: boolean;
  /** true when the first step from the foot of the valley led there */
  readonly straight: boolean;
}

/** s · ln quantity and its gradient on the free parameters. */
export interface DirectedQuantity {
  readonly value: (parameters: Float64Array) => number;
  readonly gradient: (parameters: Float64Array) => Float64Array;
}

const STEPS = 40;
/** No free parameter moves further than this (in ln) in one step: beyond it the tangent says little. */
const LONGEST = 1.5;
/** The end is found when χ² is within this share of its rise of the limit … */
const CLOSE = 0.03;
/** … and a further step would gain less than this share of the reach. */
const GAIN = 0.005;
/**
 * A move of 1 in ln counts for this much χ² at first, so that a step leaves out what gains little along a flat valley. It falls
 * with every step that stays within the limit and rises with every one that does not.
 */
const DAMPING = 0.1;
const FASTER = 4;
const SLOWER = 5;
const STIFFEST = 1e6;
/** Steps in a row outside of the limit before the search goes back. */
const RETURNS = 2;
/** Share of the strongest sensitivity, squared, that lifts the normal matrix off its rounding floor. */
const RIDGE = 1e-12;

/** The misfit about one point: χ², JᵀJ (row-major n × n) and Jᵀr. */
export interface Linearised {
  readonly at: Float64Array;
  readonly chi2: number;
  readonly normal: Float64Array;
  readonly slope: Float64Array;
}

/** Working arrays of one problem. */
interface Work {
  readonly residual: Float64Array;
  readonly jacobian: Float64Array;
  readonly factor: Float64Array;
  readonly alongG: Float64Array;
  readonly alongB: Float64Array;
}

function linearise(problem: LeastSquaresProblem, at: Float64Array, work: Work): Linearised {
  const n = at.length;
  const { residual, jacobian } = work;
  const chi2 = problem.linearise(at, residual, jacobian);
  const normal = new Float64Array(n * n);
  const slope = new Float64Array(n);
  for (let i = 0; i < residual.length; i++) {
    for (let j = 0; j < n; j++) {
      const value = jacobian[i * n + j]!;
      slope[j]! += value * residual[i]!;
      for (let k = 0; k <= j; k++) normal[j * n + k]! += value * jacobian[i * n + k]!;
    }
  }
  for (let j = 0; j < n; j++) for (let k = j + 1; k < n; k++) normal[j * n + k] = normal[k * n + j]!;
  return { at, chi2, normal, slope };
}

/** A⁻¹g and A⁻¹b over the columns in `free` into `work`, A the normal matrix lifted off its rounding floor; false where it cannot. */
function solveBoth(
  { factor, alongG, alongB }: Work,
  normal: Float64Array,
  damping: number,
  free: readonly number[],
  g: Float64Array,
  b: Float64Array,
): boolean {
  const n = g.length;
  const k = free.length;
  let strongest = 0;
  for (const j of free) strongest = Math.max(strongest, normal[j * n + j]!);
  for (let r = 0; r < k; r++) {
    const row = free[r]! * n;
    for (let c = 0; c <= r; c++) factor[r * k + c] = normal[row + free[c]!]!;
    factor[r * k + r]! += damping + RIDGE * strongest;
    alongG[r] = g[free[r]!]!;
    alongB[r] = b[free[r]!]!;
  }
  if (!choleskyInPlace(factor, k)) return false;
  choleskySolve(factor, k, alongG);
  choleskySolve(factor, k, alongB);
  return true;
}

function inner(free: readonly number[], a: Float64Array, packed: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < free.length; k++) sum += a[free[k]!]! * packed[k]!;
  return sum;
}

/**
 * The step from a point, no longer than `longest` and no further than the first bound in its way: going on from there with
 * that parameter held keeps to the valley. null where nothing is left to move.
 */
function constrainedStep(
  problem: LeastSquaresProblem,
  work: Work,
  { at, chi2, normal, slope }: Linearised,
  g: Float64Array,
  limit: number,
  damping: number,
): Float64Array | null {
  const delta = new Float64Array(at.length);
  let free = Array.from(at, (_, j) => j);
  for (;;) {
    if (!solveBoth(work, normal, damping, free, g, slope)) return null;
    const least = chi2 - inner(free, slope, work.alongB);
    const perG = inner(free, g, work.alongG);
    if (perG === 0) return null;
    const alpha = perG > 0 && limit > least ? Math.sqrt((limit - least) / perG) : 0;
    delta.fill(0);
    free.forEach((j, k) => (delta[j] = alpha * work.alongG[k]! - work.alongB[k]!));
    const stay = free.filter((j) => (delta[j]! < 0 ? at[j]! > problem.low[j]! : at[j]! < problem.high[j]!));
    if (stay.length === free.length) break;
    free = stay;
    if (free.length === 0) return null;
  }
  let longestMove = 0;
  let share = Infinity;
  for (const j of free) {
    const move = Math.abs(delta[j]!);
    longestMove = Math.max(longestMove, move);
    if (move > 0)
      share = Math.min(share, Math.abs((delta[j]! < 0 ? problem.low : problem.high)[j]! - at[j]!) / move);
  }
  if (longestMove === 0) return null;
  share = Math.min(share, 1, LONGEST / longestMove);
  const parameters = at.map((value, j) =>
    Math.min(problem.high[j]!, Math.max(problem.low[j]!, value + share * delta[j]!)),
  );
  return parameters;
}

/** Finds ends of profile intervals of one problem, each from the foot of a valley or from a point found before. */
export interface Profiler {
  /** the misfit about a model at the foot of its valley, to be shared by all quantities */
  readonly foot: (parameters: Float64Array) => Linearised;
  readonly end: (
    foot: Linearised,
    quantity: DirectedQuantity,
    limit: number,
    /** a point under the limit to go on from, such as an end at a lower limit */
    from?: Pick<ProfileEnd, 'parameters' | 'reach' | 'chi2'>,
  ) => ProfileEnd;
}

/**
 * The furthest value of one quantity with χ² ≤ `limit`: an end of its profile-likelihood interval.
 *
 * Each step solves max gᵀδ subject to ‖r + Jδ‖² ≤ limit: δ = −A⁻¹Jᵀr + α A⁻¹g, A = JᵀJ, α from the limit. A parameter
 * that sits on a bound and would leave it is held and the rest solved again. A step may leave the limit by as much as the whole
 * rise, since the next one comes back along the valley; further out it is halved. What is returned keeps to the limit.
 * Accuracy: χ² at the end is within 3 % of its rise of the limit, so the reach within 1.5 %; exact where χ² is a parabola.
 * Where the first step lands on the limit the misfit is a parabola so far, and that is the end.
 * Source: Venzon & Moolgavkar 1988, Appl. Statist. 37, 87–94 (from memory).
 */
export function createProfiler(problem: LeastSquaresProblem): Profiler {
  const n = problem.low.length;
  const work: Work = {
    residual: new Float64Array(problem.residuals),
    jacobian: new Float64Array(problem.residuals * n),
    factor: new Float64Array(n * n),
    alongG: new Float64Array(n),
    alongB: new Float64Array(n),
  };
  return {
    foot: (parameters) => linearise(problem, parameters, work),
    end: (foot, quantity, limit, from) => {
      const rise = limit - foot.chi2;
      const tolerance = CLOSE * rise;
      const origin = quantity.value(foot.at);
      let best: Pick<ProfileEnd, 'parameters' | 'reach' | 'chi2'> = from ?? {
        parameters: foot.at,
        reach: origin,
        chi2: foot.chi2,
      };
      let here = from ? linearise(problem, from.parameters, work) : foot;
      let damping = DAMPING;
      let outside = 0;
      let calm = true;
      let steps = 0;
      for (; steps < STEPS && damping < STIFFEST; steps++) {
        const parameters = constrainedStep(problem, work, here, quantity.gradient(here.at), limit, damping);
        if (parameters === null) break;
        const chi2 = problem.evaluate(parameters, work.residual);
        if (!(chi2 <= limit + rise) || (chi2 > limit + tolerance && ++outside > RETURNS)) {
          damping *= SLOWER;
          calm = false;
          outside = 0;
          if (here.at !== best.parameters) here = linearise(problem, best.parameters, work);
          continue;
        }
        if (chi2 > limit + tolerance) {
          here = linearise(problem, parameters, work);
          continue;
        }
        outside = 0;
        const reach = quantity.value(parameters);
        const gained = reach - best.reach;
        if (gained > 0) best = { parameters, reach, chi2 };
        const small = gained <= GAIN * Math.max(GAIN, best.reach - origin);
        if (chi2 >= limit - tolerance && (here === foot || small)) break;
        if (small) damping *= SLOWER;
        else if (calm) damping /= FASTER;
        calm = !small;
        if (here.at !== best.parameters) here = linearise(problem, best.parameters, work);
      }
      const open = best.chi2 < limit - tolerance;
      // on a parabola √(rise of χ²) grows as the reach does
      const straight = steps === 0 && !open;
      const share = straight ? Math.sqrt(rise / (best.chi2 - foot.chi2)) : 1;
      return { ...best, reach: origin + share * (best.reach - origin), open, straight };
    },
  };
}

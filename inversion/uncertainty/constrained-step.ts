import type { LeastSquaresProblem } from '../fit/levenberg-marquardt';
import { choleskyInPlace, choleskySolve } from '../matrix/cholesky';
import { normalEquations } from '../matrix/normal-equations';

/** The misfit about one point: χ², JᵀJ (lower triangle, row-major n × n) and Jᵀr. */
export interface Linearised {
  at: Float64Array;
  chi2: number;
  readonly normal: Float64Array;
  readonly slope: Float64Array;
}

/** Room for the misfit about a point of n parameters. */
export const emptyPoint = (n: number): Linearised => ({
  at: new Float64Array(n),
  chi2: Infinity,
  normal: new Float64Array(n * n),
  slope: new Float64Array(n),
});

/** Where a step leads, and what it promises. */
export interface LimitStep {
  readonly parameters: Float64Array;
  /** by how much the quantity grows along its tangent */
  readonly gain: number;
  /** true when neither a bound nor the longest step cut it short */
  readonly whole: boolean;
}

/** Linearises one problem and steps from there to a limit of χ², in working arrays of its own. */
export interface LimitStepper {
  /** the misfit about a point, written over a point that is no longer needed where one is given */
  readonly linearise: (at: Float64Array, over?: Linearised) => Linearised;
  /**
   * max gᵀδ subject to ‖r + Jδ‖² ≤ limit: δ = −A⁻¹Jᵀr + α A⁻¹g, A = JᵀJ + damping, α from the limit. A parameter that sits on
   * a bound and would leave it is held and the rest solved again; the step ends at the first bound in its way, so that going
   * on from there with that parameter held keeps to the valley. null where nothing is left to move.
   */
  readonly step: (from: Linearised, g: Float64Array, limit: number, damping: number) => LimitStep | null;
}

/** No free parameter moves further than this (in ln) in one step: beyond it the tangent says little. */
const LONGEST = 3;
/** Share of the strongest sensitivity, squared, that lifts the normal matrix off its rounding floor. */
const RIDGE = 1e-12;

export function createLimitStepper({ low, high, residuals, linearise }: LeastSquaresProblem): LimitStepper {
  const n = low.length;
  const residual = new Float64Array(residuals);
  const jacobian = new Float64Array(residuals * n);
  const factor = new Float64Array(n * n);
  const alongG = new Float64Array(n);
  const alongB = new Float64Array(n);
  const delta = new Float64Array(n);
  const free = new Int32Array(n);

  /** A⁻¹g and A⁻¹b over the first `count` columns in `free`; false where rounding forbids it. */
  const solveBoth = (
    normal: Float64Array,
    damping: number,
    g: Float64Array,
    b: Float64Array,
    count: number,
  ) => {
    let strongest = 0;
    for (let r = 0; r < count; r++) strongest = Math.max(strongest, normal[free[r]! * (n + 1)]!);
    for (let r = 0; r < count; r++) {
      const row = free[r]! * n;
      for (let c = 0; c <= r; c++) factor[r * count + c] = normal[row + free[c]!]!;
      factor[r * count + r]! += damping + RIDGE * strongest;
      alongG[r] = g[free[r]!]!;
      alongB[r] = b[free[r]!]!;
    }
    if (!choleskyInPlace(factor, count)) return false;
    choleskySolve(factor, count, alongG);
    choleskySolve(factor, count, alongB);
    return true;
  };
  const inner = (a: Float64Array, packed: Float64Array, count: number): number => {
    let sum = 0;
    for (let k = 0; k < count; k++) sum += a[free[k]!]! * packed[k]!;
    return sum;
  };
  /** δ over the parameters in `free` into `delta`; false where there is none. */
  const solve = (
    { chi2, normal, slope }: Linearised,
    g: Float64Array,
    limit: number,
    damping: number,
    count: number,
  ) => {
    if (!solveBoth(normal, damping, g, slope, count)) return false;
    const least = chi2 - inner(slope, alongB, count);
    const perG = inner(g, alongG, count);
    if (perG === 0) return false;
    const alpha = perG > 0 && limit > least ? Math.sqrt((limit - least) / perG) : 0;
    delta.fill(0);
    for (let k = 0; k < count; k++) delta[free[k]!] = alpha * alongG[k]! - alongB[k]!;
    return true;
  };
  /** Drops from `free` what sits on a bound and would leave it; returns how many stay. */
  const dropHeld = (at: Float64Array, count: number): number => {
    let stay = 0;
    for (let k = 0; k < count; k++) {
      const j = free[k]!;
      if (delta[j]! < 0 ? at[j]! > low[j]! : at[j]! < high[j]!) free[stay++] = j;
    }
    return stay;
  };
  /** The share of `delta` that is taken; 0 where it moves nothing. */
  const shareOf = (at: Float64Array, count: number): number => {
    let longest = 0;
    let share = 1;
    for (let k = 0; k < count; k++) {
      const j = free[k]!;
      const move = Math.abs(delta[j]!);
      longest = Math.max(longest, move);
      if (move > 0) share = Math.min(share, Math.abs((delta[j]! < 0 ? low : high)[j]! - at[j]!) / move);
    }
    return longest === 0 ? 0 : Math.min(share, LONGEST / longest);
  };

  return {
    linearise: (at, over = emptyPoint(n)) => {
      over.at = at;
      over.chi2 = linearise(at, residual, jacobian);
      normalEquations(jacobian, residual, over.normal, over.slope);
      return over;
    },
    step: (from, g, limit, damping) => {
      const { at } = from;
      for (let j = 0; j < n; j++) free[j] = j;
      let count = n;
      for (;;) {
        if (count === 0 || !solve(from, g, limit, damping, count)) return null;
        const stay = dropHeld(at, count);
        if (stay === count) break;
        count = stay;
      }
      const share = shareOf(at, count);
      if (share === 0) return null;
      const parameters = new Float64Array(n);
      let gain = 0;
      for (let j = 0; j < n; j++) {
        parameters[j] = Math.min(high[j]!, Math.max(low[j]!, at[j]! + share * delta[j]!));
        gain += share * g[j]! * delta[j]!;
      }
      return { parameters, gain, whole: share === 1 };
    },
  };
}

import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import type { LateralScales } from './line-types';

/** Distance over which the lateral scales are stated, m. */
const SCALE_DISTANCE = 100;
/** Places closer than this count as this far apart: two soundings on one spot still average different ground. */
const LEAST_DISTANCE = 1;

/** 1/σ of the change of ln ρ and of ln D from one place on a line to the next. */
export interface LateralTie {
  readonly perResistivity: number;
  readonly perDepth: number;
}

/**
 * σ(d) = scale √(max(d, 1 m)/100 m): beds wander along a line as a random walk, so that the tie of two soundings stays the
 * same when a third is set between them. ln ρ and ln D (D the depth of the base of a bed, not its thickness) are tied:
 * shares, since both are resolved as shares. Source: Auken & Christiansen 2004 for the idea of tying ρ and depths.
 */
export function lateralTie(distance: number, { resistivity, depth }: LateralScales): LateralTie {
  const root = Math.sqrt(Math.max(distance, LEAST_DISTANCE) / SCALE_DISTANCE);
  return { perResistivity: 1 / (resistivity * root), perDepth: 1 / (depth * root) };
}

/** ln ρ₁…ln ρ_N, then ln of the depths of the N − 1 bases, of ln parameters. */
export function tiedValues(logEarth: ArrayLike<number>, layers: number): Float64Array {
  const values = new Float64Array(2 * layers - 1);
  let depth = 0;
  for (let i = 0; i < layers; i++) values[i] = logEarth[i]!;
  for (let i = layers; i < 2 * layers - 1; i++) {
    depth += exp(logEarth[i]!);
    values[i] = log(depth);
  }
  return values;
}

/** The ln parameters of tied values whose depths rise; the way back from `tiedValues`. */
export function logEarthOf(values: ArrayLike<number>, layers: number): Float64Array {
  const logEarth = Float64Array.from(values);
  for (let i = 2 * layers - 2; i > layers; i--) logEarth[i] = log(exp(values[i]!) - exp(values[i - 1]!));
  return logEarth;
}

/** Residuals of a tie, (right − left)/σ for each tied value; returns Σ residual². */
export function tieResiduals(
  left: Float64Array,
  right: Float64Array,
  layers: number,
  tie: LateralTie,
  residual: Float64Array,
): number {
  let sum = 0;
  for (let i = 0; i < residual.length; i++) {
    const r = (right[i]! - left[i]!) * (i < layers ? tie.perResistivity : tie.perDepth);
    residual[i] = r;
    sum += r * r;
  }
  return sum;
}

/** ∂(tied value i)/∂(ln parameter j): 1 on the diagonal of ρ; of depths ∂lnD_i/∂lnh_j = h_j/D_i for j ≤ i. */
export function tiedSlope(logEarth: ArrayLike<number>, values: Float64Array, layers: number) {
  return (i: number, j: number): number => {
    if (i < layers) return i === j ? 1 : 0;
    return j >= layers && j <= i ? exp(logEarth[j]! - values[i]!) : 0;
  };
}

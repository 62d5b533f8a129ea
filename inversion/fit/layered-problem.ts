import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import type { FitBounds, FixedParameter, GaussianPrior } from '../types';
import type { LeastSquaresProblem } from './levenberg-marquardt';
import type { ResidualSystem } from './residual-system';

/** A layered fit with N layers: which parameters are free, and the problem over those alone. */
export interface LayeredProblem {
  readonly layers: number;
  /** held[j] for the 2N − 1 ln values and the shifts */
  readonly held: readonly boolean[];
  readonly problem: LeastSquaresProblem;
  /** all parameters from the free ones */
  readonly expand: (free: ArrayLike<number>) => Float64Array;
  /** the free ones, clipped to the bounds, from all parameters */
  readonly restrict: (all: ArrayLike<number>) => Float64Array;
  /** the free ones from the ln values of an earth, its boundaries moved to the depths known beforehand, shifts at 0 */
  readonly startFrom: (logEarth: ArrayLike<number>) => Float64Array;
}

export interface LayeredConstraints {
  readonly bounds: FitBounds;
  readonly fixed: readonly FixedParameter[];
  readonly priors: readonly GaussianPrior[];
}

/** A shift beyond this many of its standard deviations is not looked for. */
const SHIFT_REACH = 10;

/** ln thicknesses stretched so that each boundary with a known depth stands there; one that cannot is left. */
function alignedWithDepths(
  logEarth: ArrayLike<number>,
  layers: number,
  priors: readonly GaussianPrior[],
): Float64Array {
  const aligned = Float64Array.from(logEarth);
  let next = 0;
  let above = 0;
  const contacts = priors.filter(({ on }) => on === 'depth').toSorted((a, b) => a.index - b.index);
  for (const { index, value } of contacts) {
    let thickness = 0;
    for (let k = next; k <= index; k++) thickness += exp(aligned[layers + k]!);
    if (index < next || value <= above) continue;
    const stretch = log((value - above) / thickness);
    for (let k = next; k <= index; k++) aligned[layers + k]! += stretch;
    above = value;
    next = index + 1;
  }
  return aligned;
}

export function createLayeredProblem(
  system: ResidualSystem,
  layers: number,
  { bounds, fixed, priors }: LayeredConstraints,
  shiftSigma = 0,
): LayeredProblem {
  const earthCount = 2 * layers - 1;
  const count = earthCount + system.shifts;
  const full = new Float64Array(count);
  const held = Array.from({ length: count }, () => false);
  for (const { on, index, value } of fixed) {
    const j = on === 'resistivity' ? index : layers + index;
    held[j] = true;
    full[j] = log(value);
  }
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const limit = (side: 0 | 1) =>
    Float64Array.from(free, (j) =>
      j >= earthCount
        ? (2 * side - 1) * SHIFT_REACH * shiftSigma
        : log((j < layers ? bounds.resistivity : bounds.thickness)[side]),
    );
  const low = limit(0);
  const high = limit(1);
  const jacobianOfAll = new Float64Array(system.rows * count);
  const place = (parameters: ArrayLike<number>) => free.forEach((j, k) => (full[j] = parameters[k]!));
  const restrict = (all: ArrayLike<number>) =>
    Float64Array.from(free, (j, k) => Math.min(high[k]!, Math.max(low[k]!, all[j] ?? 0)));
  return {
    layers,
    held,
    problem: {
      residuals: system.rows,
      low,
      high,
      evaluate: (parameters, residual) => {
        place(parameters);
        return system.evaluate(full, layers, residual);
      },
      linearise: (parameters, residual, jacobian) => {
        place(parameters);
        const n = free.length;
        if (n === count) return system.linearise(full, layers, residual, jacobian);
        const chi2 = system.linearise(full, layers, residual, jacobianOfAll);
        for (let i = 0; i < system.rows; i++) {
          for (let k = 0; k < n; k++) jacobian[i * n + k] = jacobianOfAll[i * count + free[k]!]!;
        }
        return chi2;
      },
    },
    expand: (parameters) => {
      place(parameters);
      return Float64Array.from(full);
    },
    restrict,
    startFrom: (logEarth) => restrict(alignedWithDepths(logEarth, layers, priors)),
  };
}

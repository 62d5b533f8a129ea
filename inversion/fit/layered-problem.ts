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
  /** priors of depths, from the shallowest boundary on */
  contacts: readonly GaussianPrior[],
): ArrayLike<number> {
  if (contacts.length === 0) return logEarth;
  const aligned = Float64Array.from(logEarth);
  let next = 0;
  let above = 0;
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
  const free = Int32Array.from(held.flatMap((isHeld, j) => (isHeld ? [] : [j])));
  const n = free.length;
  const limit = (side: 0 | 1) =>
    Float64Array.from(free, (j) =>
      j >= earthCount
        ? (2 * side - 1) * SHIFT_REACH * shiftSigma
        : log((j < layers ? bounds.resistivity : bounds.thickness)[side]),
    );
  const low = limit(0);
  const high = limit(1);
  const contacts = priors.filter(({ on }) => on === 'depth').toSorted((a, b) => a.index - b.index);
  const jacobianOfAll = new Float64Array(n === count ? 0 : system.rows * count);
  /** all parameters, which stand in `full` unless all are free */
  const place = (parameters: ArrayLike<number>): ArrayLike<number> => {
    if (n === count) return parameters;
    for (let k = 0; k < n; k++) full[free[k]!] = parameters[k]!;
    return full;
  };
  const restrict = (all: ArrayLike<number>): Float64Array => {
    const restricted = new Float64Array(n);
    for (let k = 0; k < n; k++) restricted[k] = Math.min(high[k]!, Math.max(low[k]!, all[free[k]!] ?? 0));
    return restricted;
  };
  return {
    layers,
    held,
    problem: {
      residuals: system.rows,
      low,
      high,
      evaluate: (parameters, residual) => system.evaluate(place(parameters), layers, residual),
      linearise: (parameters, residual, jacobian) => {
        if (n === count) return system.linearise(parameters, layers, residual, jacobian);
        const chi2 = system.linearise(place(parameters), layers, residual, jacobianOfAll);
        for (let i = 0; i < system.rows; i++) {
          for (let k = 0; k < n; k++) jacobian[i * n + k] = jacobianOfAll[i * count + free[k]!]!;
        }
        return chi2;
      },
    },
    expand: (parameters) => Float64Array.from(place(parameters)),
    restrict,
    startFrom: (logEarth) => restrict(alignedWithDepths(logEarth, layers, contacts)),
  };
}

import type { FitBounds, FixedParameter } from '../types';
import type { LeastSquaresProblem } from './levenberg-marquardt';
import type { ResidualSystem } from './residual-system';

/** A layered fit with N layers: which ln parameters are free, and the problem over those alone. */
export interface LayeredProblem {
  readonly layers: number;
  /** held[j] for all 2N − 1 parameters */
  readonly held: readonly boolean[];
  readonly problem: LeastSquaresProblem;
  /** all ln parameters from the free ones */
  readonly expand: (free: ArrayLike<number>) => Float64Array;
  /** the free ones, clipped to the bounds, from all ln parameters */
  readonly restrict: (all: ArrayLike<number>) => Float64Array;
}

export function createLayeredProblem(
  system: ResidualSystem,
  layers: number,
  bounds: FitBounds,
  fixed: readonly FixedParameter[],
): LayeredProblem {
  const count = 2 * layers - 1;
  const full = new Float64Array(count);
  const held = Array.from({ length: count }, () => false);
  for (const { on, index, value } of fixed) {
    const j = on === 'resistivity' ? index : layers + index;
    held[j] = true;
    full[j] = Math.log(value);
  }
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const limit = (side: 0 | 1) =>
    Float64Array.from(free, (j) => Math.log((j < layers ? bounds.resistivity : bounds.thickness)[side]));
  const low = limit(0);
  const high = limit(1);
  const jacobianOfAll = new Float64Array(system.readings * count);
  const place = (parameters: ArrayLike<number>) => free.forEach((j, k) => (full[j] = parameters[k]!));
  return {
    layers,
    held,
    problem: {
      residuals: system.readings,
      low,
      high,
      evaluate: (parameters, residual) => {
        place(parameters);
        return system.evaluate(full, layers, residual);
      },
      linearise: (parameters, residual, jacobian) => {
        place(parameters);
        const chi2 = system.linearise(full, layers, residual, jacobianOfAll);
        const n = free.length;
        for (let i = 0; i < system.readings; i++) {
          for (let k = 0; k < n; k++) jacobian[i * n + k] = jacobianOfAll[i * count + free[k]!]!;
        }
        return chi2;
      },
    },
    expand: (parameters) => {
      place(parameters);
      return Float64Array.from(full);
    },
    restrict: (all) => Float64Array.from(free, (j, k) => Math.min(high[k]!, Math.max(low[k]!, all[j]!))),
  };
}

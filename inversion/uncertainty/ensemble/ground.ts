/**
 * One trial ground of a sampler, in a buffer that is written over: `values` are lnρ₁…lnρ_N, then N − 1 boundary values whose
 * meaning (ln thickness or ln depth) belongs to the `GroundSpace`.
 */
export interface Ground {
  layers: number;
  readonly values: Float64Array;
  logPrior: number;
  logLikelihood: number;
  /** the same by the exact operator, where `logLikelihood` is only near to it; known at β = 1 alone */
  logExact: number;
  /** ln density under the proposal mixture; NaN = not known yet */
  logMixture: number;
}

export function createGround(mostLayers: number): Ground {
  return {
    layers: 0,
    values: new Float64Array(2 * mostLayers - 1),
    logPrior: 0,
    logLikelihood: 0,
    logExact: 0,
    logMixture: NaN,
  };
}

export function copyValues(from: Ground, to: Ground): void {
  to.layers = from.layers;
  for (let j = 0; j < 2 * from.layers - 1; j++) to.values[j] = from.values[j]!;
}

export function copyGround(from: Ground, to: Ground): void {
  copyValues(from, to);
  to.logPrior = from.logPrior;
  to.logLikelihood = from.logLikelihood;
  to.logExact = from.logExact;
  to.logMixture = from.logMixture;
}

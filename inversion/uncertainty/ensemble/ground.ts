/**
 * One trial ground of a sampler, in a buffer that is written over: `values` are lnρ₁…lnρ_N, then N − 1 boundary values whose
 * meaning (ln thickness or ln depth) belongs to the `GroundSpace`.
 */
export interface Ground {
  layers: number;
  readonly values: Float64Array;
  logPrior: number;
  logLikelihood: number;
  /** ln density under the proposal mixture; NaN = not known yet */
  logMixture: number;
}

export function createGround(mostLayers: number): Ground {
  return {
    layers: 0,
    values: new Float64Array(2 * mostLayers - 1),
    logPrior: 0,
    logLikelihood: 0,
    logMixture: NaN,
  };
}

export function copyGround(from: Ground, to: Ground): void {
  const count = 2 * from.layers - 1;
  for (let j = 0; j < count; j++) to.values[j] = from.values[j]!;
  to.layers = from.layers;
  to.logPrior = from.logPrior;
  to.logLikelihood = from.logLikelihood;
  to.logMixture = from.logMixture;
}

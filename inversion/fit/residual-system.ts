import type { ForwardOperator } from '../operator/forward-operator';
import { TOLERANCES } from '../tolerances';
import type { Reading } from '../types';

/** Whitened residuals of a set of readings under one forward operator. */
export interface ResidualSystem {
  readonly readings: number;
  readonly operator: ForwardOperator;
  /** Σ residual² for ln parameters; `residual` receives the residuals. */
  readonly evaluate: (logParameters: ArrayLike<number>, layers: number, residual: Float64Array) => number;
  /** The same, and ∂residual/∂lnparameter into `jacobian`, row-major readings × (2N − 1). */
  readonly linearise: (
    logParameters: ArrayLike<number>,
    layers: number,
    residual: Float64Array,
    jacobian: Float64Array,
  ) => number;
}

/**
 * ln(predicted/observed), and its slope against predicted, both per unit observed.
 * Below `TOLERANCES.logResidualFloor` (a prediction near or under zero) the logarithm goes on along its tangent.
 */
export function logRatio(ratio: number): { value: number; slope: number } {
  const floor = TOLERANCES.logResidualFloor;
  if (ratio >= floor) return { value: Math.log(ratio), slope: 1 / ratio };
  return { value: Math.log(floor) + (ratio - floor) / floor, slope: 1 / floor };
}

/** residualᵢ = (ln predictedᵢ − ln observedᵢ)/σᵢ over the readings, in their order. */
export function createResidualSystem(
  operator: ForwardOperator,
  readings: readonly Reading[],
): ResidualSystem {
  const observed = Float64Array.from(readings, (reading) => reading.apparentResistivity);
  const perSigma = Float64Array.from(readings, (reading) => 1 / reading.relativeError);
  const predicted = new Float64Array(readings.length);
  const parameters = new Float64Array(99);

  const exponentiate = (logParameters: ArrayLike<number>, layers: number) => {
    for (let j = 0; j < 2 * layers - 1; j++) parameters[j] = Math.exp(logParameters[j]!);
  };
  return {
    readings: readings.length,
    operator,
    evaluate: (logParameters, layers, residual) => {
      exponentiate(logParameters, layers);
      operator.predictInto(parameters, layers, predicted);
      let chi2 = 0;
      for (let i = 0; i < predicted.length; i++) {
        const r = logRatio(predicted[i]! / observed[i]!).value * perSigma[i]!;
        residual[i] = r;
        chi2 += r * r;
      }
      return chi2;
    },
    linearise: (logParameters, layers, residual, jacobian) => {
      exponentiate(logParameters, layers);
      operator.predictWithJacobianInto(parameters, layers, predicted, jacobian);
      const count = 2 * layers - 1;
      let chi2 = 0;
      for (let i = 0; i < predicted.length; i++) {
        const { value, slope } = logRatio(predicted[i]! / observed[i]!);
        const r = value * perSigma[i]!;
        residual[i] = r;
        chi2 += r * r;
        const scale = (slope * perSigma[i]!) / observed[i]!;
        for (let j = 0; j < count; j++) jacobian[i * count + j]! *= scale;
      }
      return chi2;
    },
  };
}

import { log } from '../math/logarithm';
import type { GaussianPrior } from '../types';

/** Residual rows of what is known beforehand: one a prior, from row `first` on. */
export interface PriorRows {
  readonly rows: number;
  /** Σ residual²; `values` are the exponentiated parameters. */
  readonly evaluate: (
    parameters: ArrayLike<number>,
    values: Float64Array,
    layers: number,
    residual: Float64Array,
  ) => number;
  /** ∂residual/∂ln parameter into rows of `width` that hold zeros. */
  readonly linearise: (values: Float64Array, layers: number, jacobian: Float64Array, width: number) => void;
}

/** Depth of the base of layer `index`, m; `values` are ρ₁…ρ_N, h₁…h_{N−1}. */
function baseDepth(values: ArrayLike<number>, layers: number, index: number): number {
  let depth = 0;
  for (let k = 0; k <= index; k++) depth += values[layers + k]!;
  return depth;
}

/**
 * (ln v − ln v₀)/σ for a resistivity or a thickness, (D − D₀)/σ for the depth D = h₁ + … of a boundary, σ in m:
 * a borehole tells a depth within so many metres, whatever the depth.
 */
export function createPriorRows(priors: readonly GaussianPrior[], first: number): PriorRows {
  const column = ({ on, index }: GaussianPrior, layers: number) => (on === 'thickness' ? layers : 0) + index;
  return {
    rows: priors.length,
    evaluate: (parameters, values, layers, residual) => {
      let sum = 0;
      for (let p = 0; p < priors.length; p++) {
        const prior = priors[p]!;
        const off =
          prior.on === 'depth'
            ? baseDepth(values, layers, prior.index) - prior.value
            : parameters[column(prior, layers)]! - log(prior.value);
        const r = off / prior.sigma;
        residual[first + p] = r;
        sum += r * r;
      }
      return sum;
    },
    linearise: (values, layers, jacobian, width) => {
      priors.forEach((prior, p) => {
        const at = (first + p) * width;
        if (prior.on !== 'depth') {
          jacobian[at + column(prior, layers)] = 1 / prior.sigma;
          return;
        }
        for (let k = 0; k <= prior.index; k++) jacobian[at + layers + k] = values[layers + k]! / prior.sigma;
      });
    },
  };
}

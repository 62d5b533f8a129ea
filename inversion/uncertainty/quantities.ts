import { exp } from '../math/exponential';
import { log } from '../math/logarithm';

/** The logarithm of one positive quantity of an earth of N layers as a function of its 2N − 1 ln parameters. */
export interface Quantity {
  readonly kind: 'value' | 'depth' | 'product';
  /** of a value of a bounded layer: the index of the other one, to which it may be tied */
  readonly partner?: number;
  readonly value: (parameters: ArrayLike<number>) => number;
  /** Writes the gradient into `slope`; entries beyond 2N − 1 become 0. */
  readonly gradient: (parameters: ArrayLike<number>, slope: Float64Array) => void;
}

const coordinate = (j: number, partner?: number): Quantity => ({
  kind: 'value',
  ...(partner === undefined ? {} : { partner }),
  value: (parameters) => parameters[j]!,
  gradient: (_, slope) => void (slope.fill(0)[j] = 1),
});

export const resistivityOf = (layers: number, i: number): Quantity =>
  coordinate(i, i < layers - 1 ? layers + i : undefined);

export const thicknessOf = (layers: number, i: number): Quantity => coordinate(layers + i, i);

/** Depth D of the base of layer `base`: ∂lnD/∂lnh_k = h_k/D. */
export function depthOf(layers: number, base: number): Quantity {
  const depthAt = (parameters: ArrayLike<number>): number => {
    let depth = 0;
    for (let k = 0; k <= base; k++) depth += exp(parameters[layers + k]!);
    return depth;
  };
  return {
    kind: 'depth',
    value: (parameters) => log(depthAt(parameters)),
    gradient: (parameters, slope) => {
      const depth = depthAt(parameters);
      slope.fill(0);
      for (let k = layers; k <= layers + base; k++) slope[k] = exp(parameters[k]!) / depth;
    },
  };
}

/** hρ (`sign` 1) or h/ρ (`sign` −1) of bounded layer i. */
export const productOf = (layers: number, i: number, sign: 1 | -1): Quantity => ({
  kind: 'product',
  value: (parameters) => parameters[layers + i]! + sign * parameters[i]!,
  gradient: (_, slope) => {
    slope.fill(0);
    slope[layers + i] = 1;
    slope[i] = sign;
  },
});

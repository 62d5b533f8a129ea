import type { LayeredEarth } from '../types';

/** One positive quantity of an earth: its value, and the gradient of its logarithm on the ln parameters. */
export interface Quantity {
  readonly value: number;
  readonly gradient: (j: number) => number;
}
export type QuantityOf = (earth: LayeredEarth) => Quantity;

export const resistivityOf =
  (i: number): QuantityOf =>
  ({ resistivity }) => ({ value: resistivity[i]!, gradient: (j) => (j === i ? 1 : 0) });

export const thicknessOf =
  (i: number): QuantityOf =>
  ({ resistivity, thickness }) => ({
    value: thickness[i]!,
    gradient: (j) => (j === resistivity.length + i ? 1 : 0),
  });

/** Depth D of the base of layer `base`: ∂lnD/∂lnh_k = h_k/D. */
export const depthOf =
  (base: number): QuantityOf =>
  ({ resistivity, thickness }) => {
    const layers = resistivity.length;
    const depth = thickness.slice(0, base + 1).reduce((sum, h) => sum + h, 0);
    return {
      value: depth,
      gradient: (j) => (j >= layers && j <= layers + base ? thickness[j - layers]! / depth : 0),
    };
  };

/** hρ (`sign` 1) or h/ρ (`sign` −1) of bounded layer i. */
export const productOf =
  (i: number, sign: 1 | -1): QuantityOf =>
  ({ resistivity, thickness }) => ({
    value: sign === 1 ? thickness[i]! * resistivity[i]! : thickness[i]! / resistivity[i]!,
    gradient: (j) => (j === resistivity.length + i ? 1 : j === i ? sign : 0),
  });

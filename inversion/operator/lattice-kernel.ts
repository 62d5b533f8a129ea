import { createKernelScratch, transformAndDerivatives, transformAtNodes } from '../earth/transform-kernel';
import { latticeColumn, latticeProduct, type LatticeRows } from './lattice-product';

/** Where T₁ is asked, and what the readings weigh it by. */
export interface Lattice extends LatticeRows {
  /** 1/m, ascending */
  readonly lambda: Float64Array;
  /** nodes to a factor of two */
  readonly perOctave: number;
}

/** ρa of a lattice from exponentiated parameters ρ₁…ρ_N, h₁…h_{N−1} (Ω·m, m). */
export interface LatticeKernel {
  readonly predictInto: (parameters: ArrayLike<number>, layers: number, predicted: Float64Array) => void;
  /** rows of 2N entries, ∂ρa/∂ln parameters and then ρa, in an array that the next call writes over */
  readonly slopeRows: (parameters: ArrayLike<number>, layers: number) => Float64Array;
}

/** All makers give the same bits; they differ in time alone. */
export type KernelMaker = (lattice: Lattice) => LatticeKernel;

/** The kernel in TypeScript, for every host. */
export const plainKernel: KernelMaker = (lattice) => {
  const { lambda, perOctave } = lattice;
  const scratch = createKernelScratch(lambda.length, perOctave);
  let rows = new Float64Array(0);
  return {
    predictInto: (parameters, layers, predicted) => {
      transformAtNodes(parameters, layers, lambda, scratch);
      latticeColumn(lattice, scratch.transform, predicted);
    },
    slopeRows: (parameters, layers) => {
      const width = 2 * layers;
      if (rows.length < lattice.rows * width) rows = new Float64Array(lattice.rows * width);
      transformAndDerivatives(parameters, layers, lambda, scratch);
      latticeProduct(lattice, scratch.columns, width, rows);
      return rows;
    },
  };
};

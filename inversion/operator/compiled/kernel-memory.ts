import type { Lattice } from '../lattice-kernel';
import { SIDE } from '../lattice-product';

/** Where the arrays of one lattice stand in the memory, in doubles. */
export interface Placed {
  /** how often the memory had been emptied before */
  readonly emptied: number;
  /** most layers for which there is room */
  readonly layers: number;
  /** from column to column: the nodes, made even */
  readonly stride: number;
  readonly lambda: number;
  readonly weights: number;
  readonly blocks: number;
  /** ρ and h of a layer */
  readonly values: number;
  readonly decay: number;
  readonly pass: number;
  readonly columns: number;
  /** rows of the product, with room for whole blocks of them */
  readonly out: Float64Array;
  readonly outAt: number;
}

export interface KernelMemory {
  readonly doubles: Float64Array;
  /** Gives a lattice its place, with room for so many layers; null where the memory is too small for it. */
  readonly place: (lattice: Lattice, layers: number) => Placed | null;
  /** false once others stand in its place */
  readonly holds: (placed: Placed) => boolean;
}

/** Lattices one behind another in one memory; when it is full all leave it, and come back as they are asked for. */
export function createKernelMemory(buffer: ArrayBuffer): KernelMemory {
  const doubles = new Float64Array(buffer);
  const wholes = new Int32Array(buffer);
  let emptied = 0;
  let end = 0;
  const room = (count: number): number => {
    const at = end;
    end += count + (count % 2);
    return at;
  };
  const arrange = ({ nodes, weights, from }: Lattice, layers: number): Placed => {
    const stride = nodes + (nodes % 2);
    const outLength = SIDE * from.length * 2 * layers;
    return {
      emptied,
      layers,
      stride,
      lambda: room(stride),
      weights: room(weights.length),
      blocks: room(from.length),
      values: room(2),
      // the last pair of the octaves may reach one beyond the nodes
      decay: room(stride + 2),
      pass: room(layers * stride),
      columns: room(2 * layers * stride),
      outAt: room(outLength),
      out: doubles.subarray(end - outLength, end),
    };
  };
  return {
    doubles,
    holds: (placed) => placed.emptied === emptied,
    place: (lattice, layers) => {
      const start = end;
      let placed = arrange(lattice, layers);
      if (end - start > doubles.length) {
        end = start;
        return null;
      }
      if (end > doubles.length) {
        emptied++;
        end = 0;
        placed = arrange(lattice, layers);
      }
      doubles.fill(0, placed.lambda, end);
      doubles.set(lattice.lambda, placed.lambda);
      doubles.set(lattice.weights, placed.weights);
      lattice.from.forEach((from, b) => {
        wholes[2 * (placed.blocks + b)] = from;
        wholes[2 * (placed.blocks + b) + 1] = lattice.to[b]!;
      });
      return placed;
    },
  };
}

import { expm1 } from '../../math/exponential';
import { plainKernel, type KernelMaker } from '../lattice-kernel';
import { assemble, DOUBLE } from './assembler';
import { createKernelMemory, type Placed } from './kernel-memory';
import { product } from './product-routine';
import { chainEnd, chainLayer, layerDerivatives, layerTransform } from './transform-routines';

/** The little of WebAssembly that is used here. */
declare const WebAssembly: {
  readonly Module: new (bytes: Uint8Array) => object;
  readonly Instance: new (module: object) => { readonly exports: unknown };
};

const ROUTINES = [layerTransform, layerDerivatives, chainLayer, chainEnd, product];
/** Pages of 64 KiB: room for some two hundred usual lattices. */
const PAGES = 256;

/** Each called with its parameters in their order. */
type Exports = Readonly<
  Record<
    'layerTransform' | 'layerDerivatives' | 'chainLayer' | 'chainEnd' | 'product',
    (...parameters: number[]) => void
  >
> & { readonly memory: { readonly buffer: ArrayBuffer } };

const columnAt = ({ columns, stride }: Placed, j: number): number => DOUBLE * (columns + j * stride);
const passAt = ({ pass, stride }: Placed, i: number): number => DOUBLE * (pass + i * stride);

/**
 * The kernel in WebAssembly, two doubles at a time: the operations of `plainKernel` in their order, so its bits, in a third of its
 * time. One memory serves all lattices; what does not fit goes the plain way. For hosts that may compile: the content policy of
 * the pages does not let them.
 */
export function compiledKernel(pages = PAGES): KernelMaker {
  const module = new WebAssembly.Module(assemble(ROUTINES, pages));
  const run = new WebAssembly.Instance(module).exports as Exports;
  const memory = createKernelMemory(run.memory.buffer);
  const { doubles } = memory;

  return (lattice) => {
    const { lambda, perOctave } = lattice;
    const plain = plainKernel(lattice);
    const octave = DOUBLE * perOctave;
    const seeds = Math.min(perOctave, lambda.length);
    let placed: Placed | null = null;

    const placeFor = (layers: number): Placed | null => {
      if (!placed || placed.layers < layers || !memory.holds(placed)) placed = memory.place(lattice, layers);
      return placed;
    };
    /** Puts ρ and h of a layer and the first octave of its decay where the routines look for them. */
    const put = ({ values, decay }: Placed, rho: number, thickness: number): void => {
      doubles[values] = rho;
      doubles[values + 1] = thickness;
      for (let g = 0; g < seeds; g++) doubles[decay + g] = expm1(-2 * lambda[g]! * thickness);
    };
    const fillColumn = ({ columns, stride }: Placed, j: number, value: number): void => {
      for (let at = columns + j * stride, end = at + stride; at < end; at++) doubles[at] = value;
    };
    const multiply = ({ blocks, weights, columns, stride, outAt }: Placed, count: number): void =>
      run.product(
        DOUBLE * blocks,
        DOUBLE * (blocks + lattice.from.length),
        DOUBLE * weights,
        DOUBLE * columns,
        count,
        DOUBLE * stride,
        DOUBLE * outAt,
      );
    const transformAndDerivatives = (p: Placed, parameters: ArrayLike<number>, layers: number): void => {
      const length = DOUBLE * p.stride;
      const values = DOUBLE * p.values;
      const chain = passAt(p, 0);
      const transform = columnAt(p, 2 * layers - 1);
      for (let i = layers - 2; i >= 0; i--) {
        put(p, parameters[i]!, parameters[layers + i]!);
        run.layerDerivatives(
          values,
          DOUBLE * p.decay,
          transform,
          length,
          octave,
          DOUBLE * p.lambda,
          passAt(p, i),
          columnAt(p, i),
          columnAt(p, layers + i),
        );
      }
      for (let i = 1; i < layers - 1; i++)
        run.chainLayer(chain, passAt(p, i), columnAt(p, i), columnAt(p, layers + i), length);
      doubles[p.values] = parameters[layers - 1]!;
      run.chainEnd(chain, values, columnAt(p, layers - 1), length);
    };

    return {
      predictInto: (parameters, layers, predicted) => {
        const p = placeFor(layers);
        if (!p) return plain.predictInto(parameters, layers, predicted);
        fillColumn(p, 0, parameters[layers - 1]!);
        for (let i = layers - 2; i >= 0; i--) {
          put(p, parameters[i]!, parameters[layers + i]!);
          run.layerTransform(
            DOUBLE * p.values,
            DOUBLE * p.decay,
            DOUBLE * p.columns,
            DOUBLE * p.stride,
            octave,
          );
        }
        multiply(p, 1);
        for (let i = 0; i < lattice.rows; i++) predicted[i] = p.out[i]!;
      },
      slopeRows: (parameters, layers) => {
        const p = placeFor(layers);
        if (!p) return plain.slopeRows(parameters, layers);
        fillColumn(p, 2 * layers - 1, parameters[layers - 1]!);
        if (layers === 1) fillColumn(p, 0, parameters[0]!);
        else transformAndDerivatives(p, parameters, layers);
        multiply(p, 2 * layers);
        return p.out;
      },
    };
  };
}

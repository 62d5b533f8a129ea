import { expm1 } from '../math/exponential';

/** Working arrays of one kernel; made once an operator, written over at each call. */
export interface KernelScratch {
  /** nodes of the lattice to a factor of two */
  readonly perOctave: number;
  /** T₁ at the nodes, Ω·m */
  readonly transform: Float64Array;
  /** dT₁/dparameter, then T₁ again, each `nodes` long: [parameter * nodes + node], Ω·m; grows with the layer count */
  columns: Float64Array;
  decay: Float64Array;
  pass: Float64Array;
}

export function createKernelScratch(nodes: number, perOctave: number): KernelScratch {
  return {
    perOctave,
    transform: new Float64Array(nodes),
    columns: new Float64Array(0),
    decay: new Float64Array(nodes),
    pass: new Float64Array(0),
  };
}

/**
 * exp(−2λh) − 1 at every node. Only the first octave calls expm1; the rest follows by expm1(2x) = expm1(x)(2 + expm1(x)),
 * whose relative error grows by about two roundings an octave (≤ 2e-14 over the longest lattice).
 */
function fillDecay({ decay, perOctave }: KernelScratch, lambda: Float64Array, thickness: number): void {
  const nodes = lambda.length;
  const seeds = Math.min(perOctave, nodes);
  for (let g = 0; g < seeds; g++) decay[g] = expm1(-2 * lambda[g]! * thickness);
  for (let g = seeds; g < nodes; g++) {
    const half = decay[g - perOctave]!;
    decay[g] = half * (2 + half);
  }
}

/**
 * T₁ at the nodes of an octave lattice. `parameters` = lnρ₁…lnρ_N, lnh₁…lnh_{N−1} already exponentiated (Ω·m, m);
 * `lambda` in 1/m, ascending. With E = exp(−2λh) − 1 the recurrence of `resistivityTransform` reads
 * T ← (T(2 + E) − ρE)/((2 + E) − TE/ρ). Result in `scratch.transform`.
 */
export function transformAtNodes(
  parameters: ArrayLike<number>,
  layers: number,
  lambda: Float64Array,
  scratch: KernelScratch,
): void {
  const { transform, decay } = scratch;
  const nodes = lambda.length;
  transform.fill(parameters[layers - 1]!);
  for (let i = layers - 2; i >= 0; i--) {
    const rho = parameters[i]!;
    const perRho = 1 / rho;
    fillDecay(scratch, lambda, parameters[layers + i]!);
    for (let g = 0; g < nodes; g++) {
      const e = decay[g]!;
      const t = transform[g]!;
      const over = 2 + e;
      // the same operations as below, so that both kernels give the same bits
      const perD = 1 / (over - t * e * perRho);
      transform[g] = (t * over - rho * e) * perD;
    }
  }
}

/**
 * T₁ and its derivatives dT₁/dlnρ_i and dT₁/dlnh_i at the nodes, in `scratch.transform` and `scratch.columns`.
 *
 * Symbols: u = tanh(λh), T from below, D = 1 + Tu/ρ. For one layer
 * ∂T_i/∂T_{i+1} = (1 − u²)/D²,  ∂T_i/∂lnρ_i = u(ρ + 2Tu + T²/ρ)/D²,  ∂T_i/∂lnh_i = λh(1 − u²)(ρ − T²/ρ)/D²,
 * and the chain of the first factors from the surface down carries each to T₁. Accuracy: `tests/inversion/earth`.
 */
export function transformAndDerivatives(
  parameters: ArrayLike<number>,
  layers: number,
  lambda: Float64Array,
  scratch: KernelScratch,
): void {
  const nodes = lambda.length;
  const count = 2 * layers - 1;
  if (scratch.columns.length < (count + 1) * nodes) scratch.columns = new Float64Array((count + 1) * nodes);
  if (scratch.pass.length < layers * nodes) scratch.pass = new Float64Array(layers * nodes);
  const { transform, columns, decay, pass } = scratch;
  const halfSpace = parameters[layers - 1]!;
  transform.fill(halfSpace);
  for (let i = layers - 2; i >= 0; i--) {
    const rho = parameters[i]!;
    const perRho = 1 / rho;
    const thickness = parameters[layers + i]!;
    fillDecay(scratch, lambda, thickness);
    const atPass = i * nodes;
    const atRho = i * nodes;
    const atThickness = (layers + i) * nodes;
    for (let g = 0; g < nodes; g++) {
      const e = decay[g]!;
      const t = transform[g]!;
      const over = 2 + e;
      const perD = 1 / (over - t * e * perRho);
      const perD2 = perD * perD;
      const sech = 4 * (1 + e) * perD2;
      pass[atPass + g] = sech;
      columns[atRho + g] = -e * (over * (rho + t * t * perRho) - 2 * t * e) * perD2;
      columns[atThickness + g] = lambda[g]! * thickness * sech * (rho - t * t * perRho);
      transform[g] = (t * over - rho * e) * perD;
    }
  }
  chainFromSurface(columns, pass, layers, nodes, halfSpace);
  columns.set(transform, count * nodes);
}

function chainFromSurface(
  columns: Float64Array,
  pass: Float64Array,
  layers: number,
  nodes: number,
  halfSpace: number,
): void {
  const last = (layers - 1) * nodes;
  if (layers === 1) {
    columns.fill(halfSpace, 0, nodes);
    return;
  }
  for (let g = 0; g < nodes; g++) {
    let chain = pass[g]!;
    for (let i = 1; i < layers - 1; i++) {
      columns[i * nodes + g]! *= chain;
      columns[(layers + i) * nodes + g]! *= chain;
      chain *= pass[i * nodes + g]!;
    }
    columns[last + g] = chain * halfSpace;
  }
}

import { NODES_PER_OCTAVE } from '../earth/transform-kernel';
import type { ImageResponse } from '../spread/image-response';
import { TOLERANCES } from '../tolerances';
import { solveQr, thinQr, type ThinQr } from './householder';
import { exp } from '../math/exponential';
import { log2 } from '../math/logarithm';
import { pow10, pow2 } from '../math/power';

/** Nodes above 1/nearest: 2^(33/5) ≈ 97. */
const HIGHEST = 33;
/** Nodes below 1/farthest: 2^(−15) ≈ 3e-5 for responses that fall like 1/c³, 2^(−26.6) ≈ 1e-8 for those that fall like 1/c. */
const LOWEST_NEUTRAL = -75;
const LOWEST_CHARGED = -133;
/** farthest/nearest is rounded up to a power of 2³, so that one factorisation serves nearly every spread. */
const OCTAVES_PER_CLASS = 3;
const DEPTHS_PER_DECADE = 25;
/**
 * Design depths reach 10^this × the spread: beyond the slowest exponential, so that the uncounted images of a nearly
 * insulating base (10⁹ of them at a contrast of 10⁹) add nothing.
 */
const DEEPEST_NEUTRAL = 6;
const DEEPEST_CHARGED = 8.5;

/** Weights of one reading on the lattice: node `first + j` carries `values[j]`. */
export interface LatticeWeights {
  readonly first: number;
  readonly values: Float64Array;
}

interface Design {
  readonly first: number;
  readonly depths: Float64Array;
  readonly qr: ThinQr;
}

function factorise(first: number, highestDepth: number): Design {
  const nodes = HIGHEST - first + 1;
  const depthCount = Math.ceil((highestDepth + 4) * DEPTHS_PER_DECADE) + 1;
  const depths = Float64Array.from({ length: depthCount }, (_, i) =>
    i === 0 ? 0 : pow10(-4 + (i - 1) / DEPTHS_PER_DECADE),
  );
  const rows = depthCount + nodes;
  const matrix = new Float64Array(rows * nodes);
  for (let j = 0; j < nodes; j++) {
    const lambda = pow2((first + j) / NODES_PER_OCTAVE);
    for (let i = 0; i < depthCount; i++) matrix[j * rows + i] = exp(-depths[i]! * lambda);
    matrix[j * rows + depthCount + j] = TOLERANCES.designRidge;
  }
  return { first, depths, qr: thinQr(matrix, rows, nodes, depthCount) };
}

/**
 * Factorisations already made, by class of spread. A pure memo: an entry depends on its key alone, so sharing it
 * saves 30 ms a sounding and cannot change a result.
 */
const designs = new Map<string, Design>();

function designFor(response: ImageResponse, anchor: number): Design {
  const octaves = log2(response.farthest / anchor);
  const widening = Math.max(1, Math.ceil(octaves / OCTAVES_PER_CLASS - 1e-9));
  const key = `${response.neutral ? 'neutral' : 'charged'}:${widening}`;
  let design = designs.get(key);
  if (!design) {
    const lowest = response.neutral ? LOWEST_NEUTRAL : LOWEST_CHARGED;
    const decades = widening * OCTAVES_PER_CLASS * Math.LOG10E * Math.LN2;
    const first = lowest - widening * OCTAVES_PER_CLASS * NODES_PER_OCTAVE;
    design = factorise(first, (response.neutral ? DEEPEST_NEUTRAL : DEEPEST_CHARGED) + decades);
    designs.set(key, design);
  }
  return design;
}

/**
 * Weights w on the lattice λ_g = 2^(g/5) 1/m with Σ_g w_g exp(−cλ_g) = F(c) for all image depths c ≥ 0, by least squares.
 *
 * Every layered earth is a sum of images, T₁(λ) − ρ₁ = Σ q exp(−cλ), and its ρa is the same sum of q·F(c): what is right
 * for every c is right for every layered earth, and ρa = w·T₁. The problem is solved in units of the nearest distance
 * snapped to the lattice, so its matrix is the same for every sounding. Worst residual of the design: 1e-13.
 */
export function designWeights(response: ImageResponse): LatticeWeights {
  const offset = Math.floor(NODES_PER_OCTAVE * log2(response.nearest));
  const anchor = pow2(offset / NODES_PER_OCTAVE);
  const { first, depths, qr } = designFor(response, anchor);
  const target = depths.map((c) => response.at(c * anchor));
  return { first: first - offset, values: solveQr(qr, target) };
}

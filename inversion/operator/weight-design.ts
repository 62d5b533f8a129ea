import { imageResponse, type ImageResponse } from '../spread/image-response';
import type { Spread } from '../types';
import { solveQr, thinQr, type ThinQr } from './householder';
import type { LatticeGrade } from './lattice-grade';
import { exp } from '../math/exponential';
import { log2 } from '../math/logarithm';
import { pow10, pow2 } from '../math/power';

/** farthest/nearest is rounded up to a power of 2³, so that one factorisation serves nearly every spread. */
const OCTAVES_PER_CLASS = 3;

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

function factorise(grade: LatticeGrade, first: number, highestDepth: number): Design {
  const { perOctave, depthsPerDecade } = grade;
  const nodes = grade.highest - first + 1;
  const depthCount = Math.ceil((highestDepth + 4) * depthsPerDecade) + 1;
  const depths = Float64Array.from({ length: depthCount }, (_, i) =>
    i === 0 ? 0 : pow10(-4 + (i - 1) / depthsPerDecade),
  );
  const rows = depthCount + nodes;
  const matrix = new Float64Array(rows * nodes);
  for (let j = 0; j < nodes; j++) {
    const lambda = pow2((first + j) / perOctave);
    for (let i = 0; i < depthCount; i++) matrix[j * rows + i] = exp(-depths[i]! * lambda);
    matrix[j * rows + depthCount + j] = grade.ridge;
  }
  return { first, depths, qr: thinQr(matrix, rows, nodes, depthCount) };
}

/**
 * Factorisations already made, by class of spread. A pure memo: an entry depends on its key alone, so sharing it
 * saves 30 ms a sounding and cannot change a result.
 */
const designs = new Map<string, Design>();

function designFor(grade: LatticeGrade, { farthest, neutral }: ImageResponse, anchor: number): Design {
  const widening = Math.max(1, Math.ceil(log2(farthest / anchor) / OCTAVES_PER_CLASS - 1e-9));
  const key = `${grade.name}:${neutral ? 'neutral' : 'charged'}:${widening}`;
  let design = designs.get(key);
  if (!design) {
    const octaves = widening * OCTAVES_PER_CLASS;
    const lowest = neutral ? grade.lowestNeutral : grade.lowestCharged;
    const deepest = neutral ? grade.deepestNeutral : grade.deepestCharged;
    design = factorise(grade, lowest - octaves * grade.perOctave, deepest + octaves * Math.LOG10E * Math.LN2);
    designs.set(key, design);
  }
  return design;
}

/**
 * Weights w on the lattice λ_g of `grade` with Σ_g w_g exp(−cλ_g) = F(c) for all image depths c ≥ 0, by least squares.
 *
 * Every layered earth is a sum of images, T₁(λ) − ρ₁ = Σ q exp(−cλ), and its ρa is the same sum of q·F(c): what is right
 * for every c is right for every layered earth, and ρa = w·T₁. The problem is solved in units of the nearest distance
 * snapped to the lattice, so its matrix is the same for every sounding.
 */
function designWeights(response: ImageResponse, grade: LatticeGrade): LatticeWeights {
  const offset = Math.floor(grade.perOctave * log2(response.nearest));
  const anchor = pow2(offset / grade.perOctave);
  const { first, depths, qr } = designFor(grade, response, anchor);
  const target = depths.map((c) => response.at(c * anchor));
  return { first: first - offset, values: solveQr(qr, target) };
}

/** Weights already designed, by spread: crews measure at the same spacings again and again. A pure memo of a few megabytes. */
const designed = new Map<string, LatticeWeights>();
const MOST_DESIGNED = 2000;

/** `designWeights` of a spread, from the memo where it has it; the oldest entry leaves first. Not to be changed by the receiver. */
export function weightsOf(spread: Spread, grade: LatticeGrade): LatticeWeights {
  const key = `${grade.name}:${JSON.stringify(spread)}`;
  let weights = designed.get(key);
  if (!weights) {
    weights = designWeights(imageResponse(spread), grade);
    designed.set(key, weights);
    if (designed.size > MOST_DESIGNED) designed.delete(designed.keys().next().value!);
  }
  return weights;
}

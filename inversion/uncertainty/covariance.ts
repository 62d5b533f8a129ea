import { Matrix, SingularValueDecomposition } from 'ml-matrix';
import { TOLERANCES } from '../tolerances';
import type { FitBounds, Interval, LayeredEarth } from '../types';

/** Standard normal point that leaves 2.5 % above it. */
const Z95 = 1.959963984540054;
/** A singular value below this × the largest carries no information in double precision. */
const SINGULAR = 1e-10;
/** A parameter with more than this share (squared) in a lost direction is unresolved. */
const LOST_SHARE = 1e-6;

/** Linearised doubt of the logarithms of the parameters, in their order; Infinity = unresolved, 0 = held. */
export interface LogCovariance {
  /** standard deviation of ln parameter */
  readonly deviation: Float64Array;
  /** row-major covariance of the resolved directions, 0 for held parameters */
  readonly covariance: Float64Array;
  /** principal directions: unit vectors over all parameters, each with its variance; Infinity = lost */
  readonly directions: readonly { readonly vector: Float64Array; readonly variance: number }[];
}

/**
 * C = (JᵀJ)⁻¹ in ln space through the singular values of J, so that the condition is not squared.
 *
 * `jacobian` is the row-major m × n matrix of whitened residuals at the solution; `held[j]` marks fixed parameters, which
 * leave the problem. A direction lost to rounding or to too few readings makes its parameters unresolved instead of
 * letting the pseudo-inverse call them certain. Never rescaled by the misfit.
 */
export function logCovariance(jacobian: Float64Array, m: number, held: readonly boolean[]): LogCovariance {
  const n = held.length;
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const deviation = new Float64Array(n);
  const covariance = new Float64Array(n * n);
  if (free.length === 0) return { deviation, covariance, directions: [] };
  const rows = Math.max(m, free.length);
  const matrix = Matrix.zeros(rows, free.length);
  for (let i = 0; i < m; i++) free.forEach((j, k) => matrix.set(i, k, jacobian[i * n + j]!));
  const svd = new SingularValueDecomposition(matrix, { computeLeftSingularVectors: false });
  const strongest = Math.max(...svd.diagonal);
  const directions = svd.diagonal.map((s, k) => {
    const vector = new Float64Array(n);
    free.forEach((j, row) => (vector[j] = svd.rightSingularVectors.get(row, k)));
    return { vector, variance: s > SINGULAR * strongest ? 1 / (s * s) : Infinity };
  });
  for (const { vector, variance } of directions) {
    if (variance === Infinity) continue;
    for (const a of free) for (const b of free) covariance[a * n + b]! += vector[a]! * vector[b]! * variance;
  }
  for (const j of free) deviation[j] = deviationAlong({ directions }, (index) => (index === j ? 1 : 0));
  return { deviation, covariance, directions };
}

/**
 * Standard deviation of a function of the ln parameters from its gradient there (the delta method, correlations counted).
 * Summed over the principal directions, so that a combination which is known stays known when its parts are not:
 * Infinity only where the gradient reaches into a lost direction.
 */
export function deviationAlong(
  c: Pick<LogCovariance, 'directions'>,
  gradient: (j: number) => number,
): number {
  let sum = 0;
  for (const { vector, variance } of c.directions) {
    const share = vector.reduce((total, value, j) => total + value * gradient(j), 0) ** 2;
    if (variance !== Infinity) sum += share * variance;
    else if (share > LOST_SHARE) return Infinity;
  }
  return Math.sqrt(sum);
}

function interval(value: number, deviation: number, low: number, high: number): Interval {
  if (deviation === 0) return [value, value];
  if (Math.exp(deviation) > TOLERANCES.factorLimit) return [null, null];
  const bottom = value * Math.exp(-Z95 * deviation);
  const top = value * Math.exp(Z95 * deviation);
  return [bottom <= low ? null : bottom, top >= high ? null : top];
}

function factor(deviation: number): number | null {
  const value = Math.exp(deviation);
  return value > TOLERANCES.factorLimit ? null : value;
}

export interface ParameterDoubt {
  readonly intervals: { resistivity: Interval[]; thickness: Interval[]; depth: Interval[] };
  readonly factors: {
    resistivity: (number | null)[];
    thickness: (number | null)[];
    depth: (number | null)[];
  };
  readonly correlation: (number | null)[][];
  /** 68 % factors of S = h/ρ and T = hρ of the bounded layers */
  readonly conductanceFactor: (number | null)[];
  readonly resistanceFactor: (number | null)[];
}

/** Standard deviation of the ln depth of base i: gradient h_k/D_i on ln h_k. */
function depthDeviation(
  thickness: readonly number[],
  layers: number,
  base: number,
  c: LogCovariance,
): number {
  const depth = thickness.slice(0, base + 1).reduce((sum, h) => sum + h, 0);
  return deviationAlong(c, (j) => (j >= layers && j <= layers + base ? thickness[j - layers]! / depth : 0));
}

/** Standard deviation of ln(hρ) (`sign` 1) or ln(h/ρ) (`sign` −1) of bounded layer i. */
function productDeviation(layers: number, i: number, sign: 1 | -1, c: LogCovariance): number {
  return deviationAlong(c, (j) => (j === layers + i ? 1 : j === i ? sign : 0));
}

/**
 * 95 % intervals, 68 % factors and correlations of ρ, h, the depth of each boundary, S and T, from the covariance in ln space.
 * A factor above `TOLERANCES.factorLimit` is null; an end of an interval that the bounds cut off is null (unbounded);
 * a held parameter gives [v, v], factor 1 and null correlations.
 */
export function parameterDoubt(earth: LayeredEarth, c: LogCovariance, bounds: FitBounds): ParameterDoubt {
  const layers = earth.resistivity.length;
  const n = 2 * layers - 1;
  const depthDeviations = earth.thickness.map((_, i) => depthDeviation(earth.thickness, layers, i, c));
  let base = 0;
  const depths = earth.thickness.map((h) => (base += h));
  const [rhoLow, rhoHigh] = bounds.resistivity;
  const [hLow, hHigh] = bounds.thickness;
  const known = (j: number) => c.deviation[j]! > 0 && c.deviation[j]! < Infinity;
  return {
    intervals: {
      resistivity: earth.resistivity.map((rho, i) => interval(rho, c.deviation[i]!, rhoLow, rhoHigh)),
      thickness: earth.thickness.map((h, i) => interval(h, c.deviation[layers + i]!, hLow, hHigh)),
      depth: depths.map((depth, i) => interval(depth, depthDeviations[i]!, (i + 1) * hLow, (i + 1) * hHigh)),
    },
    factors: {
      resistivity: earth.resistivity.map((_, i) => factor(c.deviation[i]!)),
      thickness: earth.thickness.map((_, i) => factor(c.deviation[layers + i]!)),
      depth: depthDeviations.map(factor),
    },
    conductanceFactor: earth.thickness.map((_, i) => factor(productDeviation(layers, i, -1, c))),
    resistanceFactor: earth.thickness.map((_, i) => factor(productDeviation(layers, i, 1, c))),
    correlation: Array.from({ length: n }, (_, a) =>
      Array.from({ length: n }, (_unused, b) => {
        if (!known(a) || !known(b)) return null;
        if (a === b) return 1;
        const value = c.covariance[a * n + b]! / (c.deviation[a]! * c.deviation[b]!);
        return Math.min(1, Math.max(-1, value));
      }),
    ),
  };
}

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
  if (free.length === 0) return { deviation, covariance };
  const rows = Math.max(m, free.length);
  const matrix = Matrix.zeros(rows, free.length);
  for (let i = 0; i < m; i++) free.forEach((j, k) => matrix.set(i, k, jacobian[i * n + j]!));
  const svd = new SingularValueDecomposition(matrix, { computeLeftSingularVectors: false });
  const v = svd.rightSingularVectors;
  const strongest = Math.max(...svd.diagonal);
  svd.diagonal.forEach((s, k) => {
    const lost = !(s > SINGULAR * strongest);
    free.forEach((a, ia) => {
      const va = v.get(ia, k);
      if (lost) {
        if (va * va > LOST_SHARE) deviation[a] = Infinity;
        return;
      }
      free.forEach((b, ib) => {
        covariance[a * n + b]! += (va * v.get(ib, k)) / (s * s);
      });
    });
  });
  for (const j of free) if (deviation[j] !== Infinity) deviation[j] = Math.sqrt(covariance[j * n + j]!);
  return { deviation, covariance };
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
}

/** Standard deviation of the ln depth of base i by the delta method: gradient h_k/D_i on ln h_k, correlations counted. */
function depthDeviation(
  thickness: readonly number[],
  layers: number,
  base: number,
  c: LogCovariance,
): number {
  const n = 2 * layers - 1;
  const above = thickness.slice(0, base + 1);
  const depth = above.reduce((sum, h) => sum + h, 0);
  let variance = 0;
  for (let a = 0; a <= base; a++) {
    if (c.deviation[layers + a] === Infinity) return Infinity;
    for (let b = 0; b <= base; b++) {
      variance += ((above[a]! * above[b]!) / depth ** 2) * c.covariance[(layers + a) * n + layers + b]!;
    }
  }
  return Math.sqrt(Math.max(0, variance));
}

/**
 * 95 % intervals, 68 % factors and correlations of ρ, h and the depth of each boundary, from the covariance in ln space.
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

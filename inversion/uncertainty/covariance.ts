import { Matrix, SingularValueDecomposition } from 'ml-matrix';

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
    const along = vector.reduce((total, value, j) => total + value * gradient(j), 0);
    const share = along * along;
    if (variance !== Infinity) sum += share * variance;
    else if (share > LOST_SHARE) return Infinity;
  }
  return Math.sqrt(sum);
}

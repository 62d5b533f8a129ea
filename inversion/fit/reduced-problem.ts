/** min ‖z + Rδ‖²: the linearised least-squares problem in as many rows as it has free parameters. */
export interface ReducedProblem {
  /** free parameters */
  readonly size: number;
  /** upper triangle of R, row-major with row length `size`; what follows it is of no account */
  readonly triangle: Float64Array;
  readonly rest: Float64Array;
}

/** ‖z + Rδ‖². */
export function reducedMisfit({ size, triangle, rest }: ReducedProblem, delta: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < size; i++) {
    let value = rest[i]!;
    for (let k = i; k < size; k++) value += triangle[i * size + k]! * delta[k]!;
    sum += value * value;
  }
  return sum;
}

/** Working arrays of the reduction, kept by its caller from one step to the next. */
export interface Reduction {
  /** column-major, the residual last */
  readonly work: Float64Array;
  readonly triangle: Float64Array;
  readonly rest: Float64Array;
}

export const createReduction = (rows: number, columns: number): Reduction => ({
  work: new Float64Array(rows * (columns + 1)),
  triangle: new Float64Array(columns * columns),
  rest: new Float64Array(columns),
});

/**
 * Householder QR of the columns `free` of a row-major `rows × columns` Jacobian, each divided by its `scale`, with the
 * residual carried along: JS⁻¹ = QR and z = Qᵀr, so that ‖r + JS⁻¹δ‖² = ‖z + Rδ‖² + what no δ can change. A problem with
 * fewer rows than parameters keeps zero rows. The result stands in `reduction` until the next call. Source: Golub & Van Loan 2013, Matrix Computations, algorithm 5.2.1.
 */
export function reduceProblem(
  jacobian: Float64Array,
  residual: Float64Array,
  columns: number,
  free: readonly number[],
  scale: Float64Array,
  reduction: Reduction,
): ReducedProblem {
  const { work, triangle, rest } = reduction;
  const rows = residual.length;
  const size = free.length;
  for (let k = 0; k < size; k++) {
    const j = free[k]!;
    const perScale = 1 / scale[j]!;
    for (let i = 0; i < rows; i++) work[k * rows + i] = jacobian[i * columns + j]! * perScale;
  }
  work.set(residual, size * rows);
  const pivots = Math.min(size, rows);
  triangle.fill(0);
  rest.fill(0);
  for (let k = 0; k < pivots; k++) {
    triangle[k * size + k] = reflectColumn(work, rows, k, size);
    for (let j = k + 1; j < size; j++) triangle[k * size + j] = work[j * rows + k]!;
  }
  for (let k = 0; k < pivots; k++) rest[k] = work[size * rows + k]!;
  return { size, triangle, rest };
}

/** Turns column k to a single entry at row k, which is returned, and reflects the columns k + 1 … `last` with it. */
function reflectColumn(work: Float64Array, rows: number, k: number, last: number): number {
  const at = k * rows;
  let square = 0;
  for (let i = k; i < rows; i++) square += work[at + i]! * work[at + i]!;
  if (square === 0) return 0;
  const head = work[at + k]!;
  const pivot = head > 0 ? -Math.sqrt(square) : Math.sqrt(square);
  const beta = 1 / (square - head * pivot);
  work[at + k] = head - pivot;
  for (let j = k + 1; j <= last; j++) {
    const other = j * rows;
    let along = 0;
    for (let i = k; i < rows; i++) along += work[at + i]! * work[other + i]!;
    const share = beta * along;
    for (let i = k; i < rows; i++) work[other + i]! -= share * work[at + i]!;
  }
  return pivot;
}

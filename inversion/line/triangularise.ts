/**
 * Householder reflections that bring the first `columns` columns of a row-major `rows × width` matrix to upper-triangular
 * form, in place; the remaining columns are carried along, so that a right-hand side may stand among them.
 * The factor is that of the Cholesky factorisation of AᵀA, without squaring the condition of A. Rows ≥ columns.
 * Source: Golub & Van Loan 2013, Matrix Computations, algorithm 5.2.1.
 */
export function triangularise(matrix: Float64Array, rows: number, columns: number, width: number): void {
  const share = new Float64Array(width);
  for (let k = 0; k < columns; k++) {
    let below = 0;
    for (let i = k + 1; i < rows; i++) below += matrix[i * width + k]! * matrix[i * width + k]!;
    if (below === 0) continue;
    const head = matrix[k * width + k]!;
    const norm = Math.sqrt(head * head + below);
    const pivot = head > 0 ? -norm : norm;
    matrix[k * width + k] = head - pivot;
    reflectRows(matrix, k, rows, width, 1 / (norm * (norm + Math.abs(head))), share);
    matrix[k * width + k] = pivot;
    for (let i = k + 1; i < rows; i++) matrix[i * width + k] = 0;
  }
}

/** A ← A − β v (vᵀA) on rows k…, columns k + 1…, where v stands in column k. */
function reflectRows(
  matrix: Float64Array,
  k: number,
  rows: number,
  width: number,
  beta: number,
  share: Float64Array,
): void {
  share.fill(0);
  for (let i = k; i < rows; i++) {
    const v = matrix[i * width + k]!;
    if (v === 0) continue;
    for (let j = k + 1; j < width; j++) share[j]! += v * matrix[i * width + j]!;
  }
  for (let i = k; i < rows; i++) {
    const v = beta * matrix[i * width + k]!;
    if (v === 0) continue;
    for (let j = k + 1; j < width; j++) matrix[i * width + j]! -= v * share[j]!;
  }
}

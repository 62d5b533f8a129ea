import { dot } from './dot-product';

/** Thin QR of a tall matrix, kept column-major: `q[j * rows + i]`, `r[j * columns + i]` (upper triangle). */
export interface ThinQr {
  readonly rows: number;
  readonly columns: number;
  readonly q: Float64Array;
  readonly r: Float64Array;
}

/**
 * Householder QR of a column-major `rows × columns` matrix, rows ≥ columns; returns the first `keep` rows of the thin Q.
 * Backward stable: needed because the matrix of exponentials is singular to working precision.
 * Source: Golub & Van Loan 2013, Matrix Computations, algorithms 5.1.1 and 5.2.1.
 */
export function thinQr(matrix: Float64Array, rows: number, columns: number, keep: number): ThinQr {
  const v = Float64Array.from(matrix);
  const beta = new Float64Array(columns);
  const r = new Float64Array(columns * columns);
  for (let k = 0; k < columns; k++) {
    const at = k * rows;
    let norm2 = 0;
    for (let i = k; i < rows; i++) norm2 += v[at + i]! * v[at + i]!;
    const head = v[at + k]!;
    const alpha = head > 0 ? -Math.sqrt(norm2) : Math.sqrt(norm2);
    v[at + k] = head - alpha;
    beta[k] = 1 / (norm2 - head * alpha);
    for (let j = k + 1; j < columns; j++) reflect(v, j * rows, at, k, rows, beta[k]!);
    for (let j = 0; j < k; j++) r[k * columns + j] = v[at + j]!;
    r[k * columns + k] = alpha;
  }
  const full = new Float64Array(columns * rows);
  for (let j = columns - 1; j >= 0; j--) {
    full[j * rows + j] = 1;
    for (let k = j; k >= 0; k--) reflect(full, j * rows, k * rows, k, rows, beta[k]!, v);
  }
  const q = new Float64Array(columns * keep);
  for (let j = 0; j < columns; j++) q.set(full.subarray(j * rows, j * rows + keep), j * keep);
  return { rows: keep, columns, q, r };
}

/** x ← x − β v (vᵀx) on rows k…, x at `x0` in `target`, v at `v0` in `source`. */
function reflect(
  target: Float64Array,
  x0: number,
  v0: number,
  k: number,
  rows: number,
  beta: number,
  source: Float64Array = target,
): void {
  const share = beta * dot(source, v0 + k, target, x0 + k, rows - k);
  for (let i = k; i < rows; i++) target[x0 + i]! -= share * source[v0 + i]!;
}

/** Least-squares solution R⁻¹Qᵀf of a factorised system; `f` has the kept rows. */
export function solveQr({ rows, columns, q, r }: ThinQr, f: Float64Array): Float64Array {
  const x = new Float64Array(columns);
  for (let j = 0; j < columns; j++) x[j] = dot(q, j * rows, f, 0, rows);
  for (let j = columns - 1; j >= 0; j--) {
    const value = x[j]! / r[j * columns + j]!;
    x[j] = value;
    for (let i = 0; i < j; i++) x[i]! -= value * r[j * columns + i]!;
  }
  return x;
}

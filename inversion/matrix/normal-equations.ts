/**
 * JᵀJ (lower triangle, row-major n × n) and Jᵀr of a row-major Jacobian, into `normal` and `slope`.
 *
 * Every sum runs over the rows in their order by itself, so its bits are those of a plain loop. Two columns by four go side by
 * side, since one sum alone waits on its own additions; where fewer are left the last is computed again.
 */
export function normalEquations(
  jacobian: Float64Array,
  residual: Float64Array,
  normal: Float64Array,
  slope: Float64Array,
): void {
  const n = slope.length;
  const end = residual.length * n;
  for (let j = 0; j < n; j += 2) {
    const j1 = Math.min(j + 1, n - 1);
    let slope0 = 0;
    let slope1 = 0;
    for (let at = 0, i = 0; at < end; at += n, i++) {
      const r = residual[i]!;
      slope0 += jacobian[at + j]! * r;
      slope1 += jacobian[at + j1]! * r;
    }
    slope[j] = slope0;
    slope[j1] = slope1;
    for (let k = 0; k <= j1; k += 4) {
      const k1 = Math.min(k + 1, j1);
      const k2 = Math.min(k + 2, j1);
      const k3 = Math.min(k + 3, j1);
      let a0 = 0;
      let a1 = 0;
      let a2 = 0;
      let a3 = 0;
      let b0 = 0;
      let b1 = 0;
      let b2 = 0;
      let b3 = 0;
      for (let at = 0; at < end; at += n) {
        const a = jacobian[at + j]!;
        const b = jacobian[at + j1]!;
        const x0 = jacobian[at + k]!;
        const x1 = jacobian[at + k1]!;
        const x2 = jacobian[at + k2]!;
        const x3 = jacobian[at + k3]!;
        a0 += a * x0;
        a1 += a * x1;
        a2 += a * x2;
        a3 += a * x3;
        b0 += b * x0;
        b1 += b * x1;
        b2 += b * x2;
        b3 += b * x3;
      }
      const atJ = j * n;
      const atJ1 = j1 * n;
      normal[atJ + k] = a0;
      normal[atJ + k1] = a1;
      normal[atJ + k2] = a2;
      normal[atJ + k3] = a3;
      normal[atJ1 + k] = b0;
      normal[atJ1 + k1] = b1;
      normal[atJ1 + k2] = b2;
      normal[atJ1 + k3] = b3;
    }
  }
}

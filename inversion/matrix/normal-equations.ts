/** JᵀJ (lower triangle, row-major n × n) and Jᵀr of a row-major Jacobian, into `normal` and `slope`. */
export function normalEquations(
  jacobian: Float64Array,
  residual: Float64Array,
  normal: Float64Array,
  slope: Float64Array,
): void {
  const n = slope.length;
  const end = residual.length * n;
  for (let j = 0; j < n; j++) {
    let along = 0;
    for (let i = 0; i < residual.length; i++) along += jacobian[i * n + j]! * residual[i]!;
    slope[j] = along;
    for (let k = 0; k <= j; k++) {
      let sum = 0;
      for (let at = 0; at < end; at += n) sum += jacobian[at + j]! * jacobian[at + k]!;
      normal[j * n + k] = sum;
    }
  }
}

/** Σ a[a0 + k] b[b0 + k], k < length, in four sums side by side: one alone waits on its own additions. */
export function dot(a: Float64Array, a0: number, b: Float64Array, b0: number, length: number): number {
  let s0 = 0;
  let s1 = 0;
  let s2 = 0;
  let s3 = 0;
  let k = 0;
  for (; k + 3 < length; k += 4) {
    s0 += a[a0 + k]! * b[b0 + k]!;
    s1 += a[a0 + k + 1]! * b[b0 + k + 1]!;
    s2 += a[a0 + k + 2]! * b[b0 + k + 2]!;
    s3 += a[a0 + k + 3]! * b[b0 + k + 3]!;
  }
  for (; k < length; k++) s0 += a[a0 + k]! * b[b0 + k]!;
  return s0 + s1 + (s2 + s3);
}

/** Rows of lattice weights, each zero outside of its own `from` … `to` (excluded). */
export interface LatticeRows {
  readonly rows: number;
  readonly nodes: number;
  /** row-major rows × nodes */
  readonly weights: Float64Array;
  readonly from: Int32Array;
  readonly to: Int32Array;
}

/**
 * out[i·count + c] = Σ_g weights[i, g]·columns[c, g] for an even number of columns, each `nodes` long.
 *
 * Every sum runs from the lowest node up by itself, so its bits depend on its row and column alone (a zero weight adds
 * nothing). Three rows and two columns go side by side, since one sum alone waits on its own additions; that is why the body
 * is long. At the end of the list the last row is computed again instead of a shorter block.
 */
export function latticeProduct(
  { rows, nodes, weights, from, to }: LatticeRows,
  columns: Float64Array,
  count: number,
  out: Float64Array,
): void {
  for (let i = 0; i < rows; i += 3) {
    const i1 = Math.min(i + 1, rows - 1);
    const i2 = Math.min(i + 2, rows - 1);
    const low = Math.min(from[i]!, from[i1]!, from[i2]!);
    const high = Math.max(to[i]!, to[i1]!, to[i2]!);
    const [w0, w1, w2] = [i * nodes, i1 * nodes, i2 * nodes];
    for (let c = 0; c < count; c += 2) {
      const x0 = c * nodes;
      const y0 = x0 + nodes;
      let [x0Sum, x1Sum, x2Sum, y0Sum, y1Sum, y2Sum] = [0, 0, 0, 0, 0, 0];
      for (let g = low; g < high; g++) {
        const x = columns[x0 + g]!;
        const y = columns[y0 + g]!;
        const a = weights[w0 + g]!;
        const b = weights[w1 + g]!;
        const d = weights[w2 + g]!;
        x0Sum += a * x;
        x1Sum += b * x;
        x2Sum += d * x;
        y0Sum += a * y;
        y1Sum += b * y;
        y2Sum += d * y;
      }
      out[i * count + c] = x0Sum;
      out[i1 * count + c] = x1Sum;
      out[i2 * count + c] = x2Sum;
      out[i * count + c + 1] = y0Sum;
      out[i1 * count + c + 1] = y1Sum;
      out[i2 * count + c + 1] = y2Sum;
    }
  }
}

/** out[i] = Σ_g weights[i, g]·column[g]: the same sums, and bits, as `latticeProduct` over one column. */
export function latticeColumn(
  { rows, nodes, weights, from, to }: LatticeRows,
  column: Float64Array,
  out: Float64Array,
): void {
  for (let i = 0; i < rows; i += 4) {
    const i1 = Math.min(i + 1, rows - 1);
    const i2 = Math.min(i + 2, rows - 1);
    const i3 = Math.min(i + 3, rows - 1);
    const low = Math.min(from[i]!, from[i1]!, from[i2]!, from[i3]!);
    const high = Math.max(to[i]!, to[i1]!, to[i2]!, to[i3]!);
    const [w0, w1, w2, w3] = [i * nodes, i1 * nodes, i2 * nodes, i3 * nodes];
    let [s0, s1, s2, s3] = [0, 0, 0, 0];
    for (let g = low; g < high; g++) {
      const x = column[g]!;
      s0 += weights[w0 + g]! * x;
      s1 += weights[w1 + g]! * x;
      s2 += weights[w2 + g]! * x;
      s3 += weights[w3 + g]! * x;
    }
    out[i] = s0;
    out[i1] = s1;
    out[i2] = s2;
    out[i3] = s3;
  }
}

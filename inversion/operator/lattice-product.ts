import type { LatticeWeights } from './weight-design';

/** Rows that go side by side. */
export const SIDE = 4;

/** Rows of lattice weights in blocks of four; where fewer are left the last row stands again. */
export interface LatticeRows {
  readonly rows: number;
  readonly nodes: number;
  /** node for node the weights of four rows, block after block, each from its own `from` … `to` (excluded) */
  readonly weights: Float64Array;
  readonly from: Int32Array;
  readonly to: Int32Array;
}

/** Weights whose nodes are counted from `first`, on a lattice of `nodes`. */
export function packRows(weights: readonly LatticeWeights[], first: number, nodes: number): LatticeRows {
  const rows = weights.length;
  const blocks = Array.from({ length: Math.ceil(rows / SIDE) }, (_, b) =>
    Array.from({ length: SIDE }, (_unused, r) => weights[Math.min(SIDE * b + r, rows - 1)]!),
  );
  const from = Int32Array.from(blocks, (block) => Math.min(...block.map((row) => row.first)) - first);
  const to = Int32Array.from(
    blocks,
    (block) => Math.max(...block.map((row) => row.first + row.values.length)) - first,
  );
  const packed = new Float64Array(from.reduce((sum, low, b) => sum + SIDE * (to[b]! - low), 0));
  let start = 0;
  blocks.forEach((block, b) => {
    block.forEach((row, r) => {
      const at = start + SIDE * (row.first - first - from[b]!) + r;
      row.values.forEach((value, g) => (packed[at + SIDE * g] = value));
    });
    start += SIDE * (to[b]! - from[b]!);
  });
  return { rows, nodes, weights: packed, from, to };
}

/**
 * out[i·count + c] = Σ_g weights[i, g]·columns[c, g] for an even number of columns, each `nodes` long.
 *
 * Every sum runs from the lowest node up by itself, so its bits depend on its row and column alone (a zero weight adds
 * nothing). Four rows and two columns go side by side, since one sum alone waits on its own additions; that is why the body
 * is long.
 */
export function latticeProduct(
  { rows, nodes, weights, from, to }: LatticeRows,
  columns: Float64Array,
  count: number,
  out: Float64Array,
): void {
  let start = 0;
  for (let b = 0; b < from.length; b++) {
    const low = from[b]!;
    const high = to[b]!;
    const row0 = SIDE * b * count;
    const last = (rows - 1) * count;
    const row1 = Math.min(row0 + count, last);
    const row2 = Math.min(row1 + count, last);
    const row3 = Math.min(row2 + count, last);
    for (let c = 0; c < count; c += 2) {
      const x0 = c * nodes;
      const y0 = x0 + nodes;
      let a0 = 0;
      let a1 = 0;
      let a2 = 0;
      let a3 = 0;
      let b0 = 0;
      let b1 = 0;
      let b2 = 0;
      let b3 = 0;
      let w = start;
      for (let g = low; g < high; g++) {
        const x = columns[x0 + g]!;
        const y = columns[y0 + g]!;
        const w0 = weights[w]!;
        const w1 = weights[w + 1]!;
        const w2 = weights[w + 2]!;
        const w3 = weights[w + 3]!;
        w += SIDE;
        a0 += w0 * x;
        a1 += w1 * x;
        a2 += w2 * x;
        a3 += w3 * x;
        b0 += w0 * y;
        b1 += w1 * y;
        b2 += w2 * y;
        b3 += w3 * y;
      }
      out[row0 + c] = a0;
      out[row1 + c] = a1;
      out[row2 + c] = a2;
      out[row3 + c] = a3;
      out[row0 + c + 1] = b0;
      out[row1 + c + 1] = b1;
      out[row2 + c + 1] = b2;
      out[row3 + c + 1] = b3;
    }
    start += SIDE * (high - low);
  }
}

/** out[i] = Σ_g weights[i, g]·column[g]: the same sums, and bits, as `latticeProduct` over one column. */
export function latticeColumn(
  { rows, weights, from, to }: LatticeRows,
  column: Float64Array,
  out: Float64Array,
): void {
  let w = 0;
  for (let b = 0; b < from.length; b++) {
    const high = to[b]!;
    let s0 = 0;
    let s1 = 0;
    let s2 = 0;
    let s3 = 0;
    for (let g = from[b]!; g < high; g++) {
      const x = column[g]!;
      s0 += weights[w]! * x;
      s1 += weights[w + 1]! * x;
      s2 += weights[w + 2]! * x;
      s3 += weights[w + 3]! * x;
      w += SIDE;
    }
    const i = SIDE * b;
    out[i] = s0;
    out[Math.min(i + 1, rows - 1)] = s1;
    out[Math.min(i + 2, rows - 1)] = s2;
    out[Math.min(i + 3, rows - 1)] = s3;
  }
}

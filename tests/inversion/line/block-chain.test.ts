import { Matrix, inverse, solve } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { createRandomStream } from '../../../inversion';
import {
  chainCovarianceRoots,
  factoriseChain,
  solveChain,
  type ChainNode,
  type ChainTie,
} from '../../../inversion/line/block-chain';

const random = createRandomStream(7);
const values = (count: number) => Float64Array.from({ length: count }, () => random.normal());

/** A chain of nodes of unlike size with unlike numbers of rows, one of them with none. */
const SIZES = [3, 5, 2, 4, 1, 3];
const ROWS = [6, 0, 9, 2, 4, 3];
const nodes = SIZES.map((size, s): ChainNode => ({
  size,
  rows: ROWS[s]!,
  matrix: values(ROWS[s]! * (size + 1)),
}));
const ties = SIZES.slice(1).map((size, s): ChainTie => {
  const rows = 4;
  return { rows, matrix: values(rows * (SIZES[s]! + size + 1)) };
});
const diagonals = SIZES.map((size) => values(size).map(Math.abs));

/** The same problem as one dense matrix, row by row from its statement. */
function dense() {
  const starts = SIZES.map((_, s) => SIZES.slice(0, s).reduce((sum, size) => sum + size, 0));
  const total = SIZES.reduce((sum, size) => sum + size, 0);
  const rows: number[][] = [];
  const right: number[] = [];
  const add = (matrix: Float64Array, count: number, width: number, from: number) => {
    for (let i = 0; i < count; i++) {
      const row = Array.from({ length: total }, () => 0);
      for (let j = 0; j < width; j++) row[from + j] = matrix[i * (width + 1) + j]!;
      rows.push(row);
      right.push(matrix[i * (width + 1) + width]!);
    }
  };
  nodes.forEach(({ matrix, rows: count, size }, s) => add(matrix, count, size, starts[s]!));
  ties.forEach(({ matrix, rows: count }, s) => add(matrix, count, SIZES[s]! + SIZES[s + 1]!, starts[s]!));
  diagonals.forEach((diagonal, s) =>
    diagonal.forEach((value, j) => {
      rows.push(Array.from({ length: total }, (_, k) => (k === starts[s]! + j ? value : 0)));
      right.push(0);
    }),
  );
  return { matrix: new Matrix(rows), right: Matrix.columnVector(right), starts };
}

describe('a chain of tied nodes against one dense matrix', () => {
  const { matrix, right, starts } = dense();
  const factors = factoriseChain(nodes, ties, diagonals);

  it('has the same least-squares solution', () => {
    const expected = solve(matrix, right, true).to1DArray();
    const found = solveChain(factors).flatMap((part) => Array.from(part));
    expected.forEach((value, j) => expect(found[j]).toBeCloseTo(value, 10));
  });

  it('has the diagonal blocks of the inverse of the normal matrix', () => {
    const covariance = inverse(matrix.transpose().mmul(matrix));
    chainCovarianceRoots(factors).forEach((root, s) => {
      const size = SIZES[s]!;
      const T = Matrix.from1DArray(size, size, Array.from(root));
      const block = T.transpose().mmul(T);
      for (let a = 0; a < size; a++)
        for (let b = 0; b < size; b++)
          expect(block.get(a, b)).toBeCloseTo(covariance.get(starts[s]! + a, starts[s]! + b), 10);
    });
  });

  it('leaves the rows it was given as they were', () => {
    const before = nodes.map(({ matrix: rows }) => Array.from(rows));
    factoriseChain(nodes, ties, diagonals);
    expect(nodes.map(({ matrix: rows }) => Array.from(rows))).toEqual(before);
  });
});

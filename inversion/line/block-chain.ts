import { triangularise } from './triangularise';

/** Rows over the unknowns of one node: row-major `rows × (size + 1)`, the right-hand side last. */
export interface ChainNode {
  readonly size: number;
  readonly rows: number;
  readonly matrix: Float64Array;
}

/** Rows over the unknowns of a node and the next: row-major `rows × (size + next size + 1)`, the right-hand side last. */
export interface ChainTie {
  readonly rows: number;
  readonly matrix: Float64Array;
}

/** One block row [R S | z] of the factor: R upper triangular over a node, S over the next. Row-major. */
export interface ChainFactor {
  readonly size: number;
  readonly next: number;
  readonly matrix: Float64Array;
}

/** The triangle [R | z] of a node: what the nodes before left over it, its own rows, and its diagonal. */
function gather(chain: ChainNode, carried: ChainTie | null, diagonal: Float64Array): Float64Array {
  const width = chain.size + 1;
  const above = carried?.rows ?? 0;
  const rows = above + chain.rows + chain.size;
  const stack = new Float64Array(rows * width);
  if (carried) stack.set(carried.matrix);
  stack.set(chain.matrix.subarray(0, chain.rows * width), above * width);
  for (let j = 0; j < chain.size; j++) stack[(above + chain.rows + j) * width + j] = diagonal[j]!;
  triangularise(stack, rows, chain.size, width);
  return stack.subarray(0, chain.size * width);
}

/** The triangle of a node above its tie to the next: its block row of the factor, and what is left over the next node alone. */
function eliminate(triangle: Float64Array, size: number, tie: ChainTie, next: number) {
  const width = size + next + 1;
  const stack = new Float64Array((size + tie.rows) * width);
  for (let i = 0; i < size; i++) {
    stack.set(triangle.subarray(i * (size + 1), i * (size + 1) + size), i * width);
    stack[i * width + width - 1] = triangle[i * (size + 1) + size]!;
  }
  stack.set(tie.matrix, size * width);
  triangularise(stack, size + tie.rows, size, width);
  const left = new Float64Array(tie.rows * (next + 1));
  for (let i = 0; i < tie.rows; i++)
    left.set(stack.subarray((size + i) * width + size, (size + i + 1) * width), i * (next + 1));
  return {
    factor: { size, next, matrix: stack.slice(0, size * width) },
    carried: { rows: tie.rows, matrix: left },
  };
}

/**
 * Orthogonal factorisation of the least-squares problem of a chain of nodes, each tied to the next:
 * min Σ ‖A_s x_s − b_s‖² + Σ ‖T_s (x_s, x_{s+1}) − c_s‖² + Σ ‖d_s ∘ x_s‖².
 * The normal matrix is block-tridiagonal; this is its block Cholesky factor, found from the rows themselves, from the first
 * node to the last, so that the condition is not squared. Work is linear in the number of nodes. `diagonals[s]` are the d_s.
 * Source: Bierman 1977, Factorization Methods for Discrete Sequential Estimation (the square-root information filter; from memory).
 */
export function factoriseChain(
  nodes: readonly ChainNode[],
  ties: readonly ChainTie[],
  diagonals: readonly Float64Array[],
): ChainFactor[] {
  let carried: ChainTie | null = null;
  return nodes.map((chain, s) => {
    const triangle = gather(chain, carried, diagonals[s]!);
    const tie = ties[s];
    if (!tie) return { size: chain.size, next: 0, matrix: triangle.slice() };
    const step = eliminate(triangle, chain.size, tie, nodes[s + 1]!.size);
    carried = step.carried;
    return step.factor;
  });
}

/** The x that minimises the factorised problem, one array a node. */
export function solveChain(factors: readonly ChainFactor[]): Float64Array[] {
  const solution = factors.map(({ size }) => new Float64Array(size));
  for (let s = factors.length - 1; s >= 0; s--) {
    const { size, next, matrix } = factors[s]!;
    const width = size + next + 1;
    const x = solution[s]!;
    const following = solution[s + 1];
    for (let i = size - 1; i >= 0; i--) {
      let value = matrix[i * width + width - 1]!;
      for (let j = i + 1; j < size; j++) value -= matrix[i * width + j]! * x[j]!;
      for (let j = 0; j < next; j++) value -= matrix[i * width + size + j]! * following![j]!;
      x[i] = value / matrix[i * width + i]!;
    }
  }
  return solution;
}

/** Each of the `count` rows b of a row-major matrix becomes R⁻¹b. */
function divideByTriangle(rows: Float64Array, count: number, { size, next, matrix }: ChainFactor): void {
  const width = size + next + 1;
  for (let at = 0; at < count * size; at += size) {
    for (let i = size - 1; i >= 0; i--) {
      let value = rows[at + i]!;
      for (let j = i + 1; j < size; j++) value -= matrix[i * width + j]! * rows[at + j]!;
      rows[at + i] = value / matrix[i * width + i]!;
    }
  }
}

/** The rows of I, and under them the rows of T Sᵀ for the root T of the next node. */
function spreadOfNode(
  { size, next, matrix }: ChainFactor,
  following: Float64Array | undefined,
): Float64Array {
  const width = size + next + 1;
  const rows = new Float64Array((size + next) * size);
  for (let i = 0; i < size; i++) rows[i * size + i] = 1;
  for (let r = 0; r < next; r++)
    for (let i = 0; i < size; i++) {
      let sum = 0;
      for (let j = r; j < next; j++) sum += following![r * next + j]! * matrix[i * width + size + j]!;
      rows[(size + r) * size + i] = sum;
    }
  return rows;
}

/**
 * Square roots of the diagonal blocks of the inverse of the normal matrix: for each node an upper-triangular T, row-major
 * size × size, with TᵀT the covariance of its unknowns. Only these blocks of the inverse are formed:
 * P_s = R_s⁻¹ (I + S_s P_{s+1} S_sᵀ) R_s⁻ᵀ, from the last node to the first, on the roots themselves.
 */
export function chainCovarianceRoots(factors: readonly ChainFactor[]): Float64Array[] {
  const roots = factors.map(() => new Float64Array(0));
  for (let s = factors.length - 1; s >= 0; s--) {
    const factor = factors[s]!;
    const { size, next } = factor;
    const rows = spreadOfNode(factor, roots[s + 1]);
    divideByTriangle(rows, size + next, factor);
    triangularise(rows, size + next, size, size);
    roots[s] = rows.slice(0, size * size);
  }
  return roots;
}

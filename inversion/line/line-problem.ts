import type { LayeredProblem } from '../fit/layered-problem';
import type { ChainNode, ChainTie } from './block-chain';
import { tiedSlope, tiedValues, tieResiduals, type LateralTie } from './lateral-ties';
import { triangularise } from './triangularise';

/** The soundings and boreholes of a line in the order of their places, each tied to the next. */
export interface LineProblem {
  readonly layers: number;
  readonly nodes: readonly LayeredProblem[];
  readonly ties: readonly LateralTie[];
  /** what is known of parameters that were computed before: a place that stands still is not computed again */
  readonly known: {
    readonly misfits: WeakMap<Float64Array, number>;
    readonly slopes: WeakMap<Float64Array, LinearPlace>;
  };
}

/** The own rows of a node at its parameters: a triangle with −r, Jᵀr and the squares of the columns of J. */
export interface LinearPlace {
  readonly node: ChainNode;
  readonly gradient: Float64Array;
  readonly squares: Float64Array;
}

/** Free parameters, one array a node; an array is never changed once it is made. */
export type LineState = readonly Float64Array[];

export interface LineMisfit {
  /** Σ residual² over all nodes and ties */
  readonly objective: number;
  /** what each node has of it: its own rows and half of its ties */
  readonly shares: Float64Array;
}

/** A line linearised at a state: rows for its step, with −residual on the right, and slopes of the objective. */
export interface LinearLine {
  readonly nodes: readonly ChainNode[];
  readonly ties: readonly ChainTie[];
  /** Jᵀr and column norms of J, one array a node */
  readonly gradients: readonly Float64Array[];
  readonly norms: readonly Float64Array[];
}

const tiedValuesOf = ({ nodes, layers }: LineProblem, state: LineState): Float64Array[] =>
  nodes.map((node, s) => tiedValues(node.expand(state[s]!), layers));

function ownMisfit({ problem }: LayeredProblem, at: Float64Array, known: LineProblem['known']): number {
  const misfit = known.misfits.get(at) ?? problem.evaluate(at, new Float64Array(problem.residuals));
  known.misfits.set(at, misfit);
  return misfit;
}

export function evaluateLine(problem: LineProblem, state: LineState): LineMisfit {
  const { nodes, ties, layers, known } = problem;
  const shares = Float64Array.from(nodes, (node, s) => ownMisfit(node, state[s]!, known));
  const values = tiedValuesOf(problem, state);
  const residual = new Float64Array(2 * layers - 1);
  ties.forEach((tie, s) => {
    const half = tieResiduals(values[s]!, values[s + 1]!, layers, tie, residual) / 2;
    shares[s]! += half;
    shares[s + 1]! += half;
  });
  return { objective: shares.reduce((sum, share) => sum + share, 0), shares };
}

function lineariseNode({ problem }: LayeredProblem, at: Float64Array): LinearPlace {
  const size = at.length;
  const width = size + 1;
  const residual = new Float64Array(problem.residuals);
  const jacobian = new Float64Array(problem.residuals * size);
  problem.linearise(at, residual, jacobian);
  const rows = Math.max(problem.residuals, size);
  const matrix = new Float64Array(rows * width);
  for (let i = 0; i < problem.residuals; i++) {
    matrix.set(jacobian.subarray(i * size, (i + 1) * size), i * width);
    matrix[i * width + size] = -residual[i]!;
  }
  const slopes = { gradient: new Float64Array(size), squares: new Float64Array(size) };
  addSlopes(slopes, matrix, problem.residuals, width, 0);
  triangularise(matrix, rows, size, width);
  return { node: { size, rows: size, matrix: matrix.slice(0, size * width) }, ...slopes };
}

/** Adds Jᵀr and the squares of the columns `from` … of rows whose last column is −r. */
function addSlopes(
  { gradient, squares }: { gradient: Float64Array; squares: Float64Array },
  matrix: Float64Array,
  rows: number,
  width: number,
  from: number,
): void {
  for (let i = 0; i < rows; i++) {
    const r = -matrix[i * width + width - 1]!;
    for (let j = 0; j < gradient.length; j++) {
      const value = matrix[i * width + from + j]!;
      gradient[j]! += value * r;
      squares[j]! += value * value;
    }
  }
}

function linearPlace(node: LayeredProblem, at: Float64Array, known: LineProblem['known']): LinearPlace {
  const place = known.slopes.get(at) ?? lineariseNode(node, at);
  known.slopes.set(at, place);
  return { ...place, gradient: place.gradient.slice(), squares: place.squares.slice() };
}

/** Columns of the full ln parameters that are free. */
const freeColumns = ({ held }: LayeredProblem): number[] => held.flatMap((isHeld, j) => (isHeld ? [] : [j]));

export function lineariseLine(problem: LineProblem, state: LineState): LinearLine {
  const { nodes, layers } = problem;
  const own = nodes.map((node, s) => linearPlace(node, state[s]!, problem.known));
  const earths = nodes.map((node, s) => node.expand(state[s]!));
  const values = earths.map((earth) => tiedValues(earth, layers));
  const free = nodes.map(freeColumns);
  const rows = 2 * layers - 1;
  const ties = problem.ties.map((tie, s): ChainTie => {
    const [left, right] = [free[s]!, free[s + 1]!];
    const width = left.length + right.length + 1;
    const matrix = new Float64Array(rows * width);
    const residual = new Float64Array(rows);
    tieResiduals(values[s]!, values[s + 1]!, layers, tie, residual);
    const slopeLeft = tiedSlope(earths[s]!, values[s]!, layers);
    const slopeRight = tiedSlope(earths[s + 1]!, values[s + 1]!, layers);
    for (let i = 0; i < rows; i++) {
      const per = i < layers ? tie.perResistivity : tie.perDepth;
      left.forEach((j, k) => (matrix[i * width + k] = j < rows ? -per * slopeLeft(i, j) : 0));
      right.forEach((j, k) => (matrix[i * width + left.length + k] = j < rows ? per * slopeRight(i, j) : 0));
      matrix[i * width + width - 1] = -residual[i]!;
    }
    addSlopes(own[s]!, matrix, rows, width, 0);
    addSlopes(own[s + 1]!, matrix, rows, width, left.length);
    return { rows, matrix };
  });
  return {
    nodes: own.map(({ node }) => node),
    ties,
    gradients: own.map(({ gradient }) => gradient),
    norms: own.map(({ squares }) => squares.map(Math.sqrt)),
  };
}

import { overshoots } from './step-trust';
import { TOLERANCES } from '../tolerances';
import type { FitStatus } from '../types';
import { factoriseChain, solveChain, type ChainNode, type ChainTie } from './block-chain';
import {
  evaluateLine,
  lineariseLine,
  type LineMisfit,
  type LineProblem,
  type LineState,
  type LinearLine,
} from './line-problem';

export interface LineOutcome extends LineMisfit {
  readonly status: FitStatus;
  readonly state: LineState;
  readonly iterations: number;
  /** strongest damping of the last step */
  readonly damping: number;
}

const FASTER = 4;
const SLOWER = 5;
const INITIAL_DAMPING = 0.1;
const LOWEST_DAMPING = 1e-9;
/** A parameter is damped as if its sensitivity were at least this share of the strongest one's of its node. */
const SCALE_FLOOR = 0.1;
/** A place that would move by no more than this share of the furthest move stands still. */
const STILL = 1e-4;
/** Overshoot of a node from which it is damped more, and up to which it is damped less. */
const TOO_FAR = 0.5;
const KEPT = 0.1;

/** For each node the parameters that may not move in this step: they sit on a bound that they would leave. */
function frozenParameters({ nodes }: LineProblem, state: LineState, { gradients }: LinearLine): boolean[][] {
  return nodes.map(({ problem: { low, high } }, s) =>
    Array.from(
      state[s]!,
      (value, j) =>
        (value <= low[j]! && gradients[s]![j]! > 0) || (value >= high[j]! && gradients[s]![j]! < 0),
    ),
  );
}

/** Steepest |Jᵀr|ⱼ/‖Jⱼ‖ among the parameters that may move. */
function steepest({ gradients, norms }: LinearLine, frozen: readonly boolean[][]): number {
  let most = 0;
  gradients.forEach((gradient, s) =>
    gradient.forEach((slope, j) => {
      if (!frozen[s]![j] && slope !== 0) most = Math.max(most, Math.abs(slope) / norms[s]![j]!);
    }),
  );
  return most;
}

function withoutColumns(matrix: Float64Array, width: number, frozen: readonly boolean[]): Float64Array {
  if (!frozen.includes(true)) return matrix;
  return matrix.map((value, at) => (frozen[at % width] === true ? 0 : value));
}

/** The linear line without its frozen columns. */
function thaw(
  { nodes, ties }: LinearLine,
  frozen: readonly boolean[][],
): { nodes: ChainNode[]; ties: ChainTie[] } {
  return {
    nodes: nodes.map((node, s) => ({
      ...node,
      matrix: withoutColumns(node.matrix, node.size + 1, frozen[s]!),
    })),
    ties: ties.map((tie, s) => {
      const columns = [...frozen[s]!, ...frozen[s + 1]!];
      return { ...tie, matrix: withoutColumns(tie.matrix, columns.length + 1, columns) };
    }),
  };
}

/** √damping × the sensitivity of each parameter; 1 for a frozen one, which then stays. */
function dampingRows(
  { norms }: LinearLine,
  frozen: readonly boolean[][],
  damping: Float64Array,
): Float64Array[] {
  return norms.map((norm, s) => {
    const strongest = norm.reduce((most, value) => Math.max(most, value), 0);
    const root = Math.sqrt(damping[s]!);
    return norm.map((value, j) =>
      frozen[s]![j] ? 1 : root * Math.max(value, SCALE_FLOOR * strongest, 1e-150),
    );
  });
}

/**
 * The state after a step within the bounds, the step as it was taken and its largest part. A place that would hardly move,
 * compared with the one that moves most, stands still and need not be computed again.
 */
function move({ nodes }: LineProblem, state: LineState, step: readonly Float64Array[]) {
  const wanted = nodes.map(({ problem: { low, high } }, s) =>
    state[s]!.map((value, j) => Math.min(high[j]!, Math.max(low[j]!, value + step[s]![j]!))),
  );
  const far = wanted.map((values, s) =>
    values.reduce((most, value, j) => Math.max(most, Math.abs(value - state[s]![j]!)), 0),
  );
  const furthest = far.reduce((most, value) => Math.max(most, value), 0);
  const moved = wanted.map((values, s) => (far[s]! <= STILL * furthest ? state[s]! : values));
  const taken = moved.map((values, s) => values.map((value, j) => value - state[s]![j]!));
  return { moved, taken, furthest };
}

/** After a refused step: the nodes that overshot are damped more; all of them where the bounds alone are to blame. */
function refuse(damping: Float64Array, overshot: Float64Array): void {
  const all = !overshot.some((value) => value > TOO_FAR);
  damping.forEach((value, s) => {
    if (all || overshot[s]! > TOO_FAR) damping[s] = value * SLOWER;
  });
}

/** Damps the nodes that overshot more, and those that kept to the linear line less. */
function adapt(damping: Float64Array, overshot: Float64Array): void {
  damping.forEach((value, s) => {
    if (overshot[s]! > TOO_FAR) damping[s] = value * SLOWER;
    else if (overshot[s]! < KEPT) damping[s] = Math.max(LOWEST_DAMPING, value / FASTER);
  });
}

/**
 * Bounded Levenberg–Marquardt over all nodes of a line at once: a step is kept only if the whole objective falls. Each node
 * has its own damping, so that one difficult sounding does not slow the line. Work of a step is linear in the number of
 * nodes. Source: Marquardt 1963; scaled damping after Moré 1978.
 */
export function minimiseLine(
  problem: LineProblem,
  start: LineState,
  onIteration?: (iteration: number, objective: number) => void,
): LineOutcome {
  const limit = TOLERANCES.iterations;
  const damping = new Float64Array(problem.nodes.length).fill(INITIAL_DAMPING);
  let state = start;
  let misfit = evaluateLine(problem, state);
  let slow = 0;
  const done = (status: FitStatus, iterations: number): LineOutcome => ({
    status,
    state,
    ...misfit,
    iterations,
    damping: damping.reduce((most, value) => Math.max(most, value), 0),
  });
  let line = lineariseLine(problem, state);
  for (let iteration = 0; iteration < limit; iteration++) {
    const frozen = frozenParameters(problem, state, line);
    const level = Math.sqrt(Math.max(misfit.objective / problem.nodes.length, TOLERANCES.exactFit));
    if (steepest(line, frozen) <= TOLERANCES.gradient * level) return done('converged-gradient', iteration);
    const { nodes, ties } = thaw(line, frozen);
    const diagonals = dampingRows(line, frozen, damping);
    const step = solveChain(factoriseChain(nodes, ties, diagonals));
    const { moved, taken, furthest } = move(problem, state, step);
    const trial = evaluateLine(problem, moved);
    const overshot = overshoots(nodes, ties, diagonals, taken, misfit, trial);
    if (!(trial.objective < misfit.objective)) {
      refuse(damping, overshot);
      if (damping.some((value) => value > TOLERANCES.damping)) return done('no-descent', iteration + 1);
      continue;
    }
    slow = misfit.objective - trial.objective < TOLERANCES.decrease * misfit.objective ? slow + 1 : 0;
    adapt(damping, overshot);
    state = moved;
    misfit = trial;
    onIteration?.(iteration + 1, misfit.objective);
    if (furthest <= TOLERANCES.step) return done('converged-step', iteration + 1);
    if (slow >= 3) return done('converged-decrease', iteration + 1);
    line = lineariseLine(problem, state);
  }
  return done('iteration-limit', limit);
}

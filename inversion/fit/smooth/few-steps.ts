import type { CellProblem } from './cell-problem';
import { balanceAt, smoothestWithin, type Balance, type TradeOffOptions } from './trade-off';

/** Reweighted rounds, of which the first few take the sum of |steps| and the rest their number. */
const ROUNDS = 14;
const BY_SIZE = 4;
/** A change of lnρ between cells counts as a step as far as it passes this. */
const STEP_SIZE = 0.05;
/** Rounds end when no lnρ moves by more than this. */
const SETTLED = 0.02;
/** How close under its goal χ² ends in rounds that another follows. */
const ROUGHLY = 0.03;

/** λ of the reweighted ground may be this much above that of the smooth one. */
const WIDER = 1e4;

const square = (x: number): number => x * x;

/** Number of boundaries at which the ground steps, Σ d²/(d² + β²) with d = Δlnρ and β = 0.05: a smooth change counts in part. */
export function stepCount(logResistivity: ArrayLike<number>): number {
  let count = 0;
  for (let k = 1; k < logResistivity.length; k++) {
    const d2 = square(logResistivity[k]! - logResistivity[k - 1]!);
    count += d2 / (d2 + square(STEP_SIZE));
  }
  return count;
}

/** Weights under which the squares of the differences stand for their size (first rounds) or for their number. */
function boundaryWeights(free: ArrayLike<number>, cells: number, round: number): Float64Array {
  return Float64Array.from({ length: cells - 1 }, (_, k) => {
    const d2 = square(free[k + 1]! - free[k]!);
    const floor = d2 + square(STEP_SIZE);
    return round < BY_SIZE ? STEP_SIZE / Math.sqrt(floor) : square(STEP_SIZE) / floor;
  });
}

/**
 * A ground with few steps and χ² ≤ `goal`, from a smooth one: the roughness is reweighted round by round, w = β/√(d² + β²),
 * then w = β²/(d² + β²), whose fixed points have the least Σ|d| and then the least Σ d²/(d² + β²) about, and λ sought anew each time.
 * The number of steps has many local minima; this one is reached from the smooth ground and is the same each time.
 * Source: Portniaguine & Zhdanov 1999, Geophysics 64, 874–887 (minimum gradient support); Farquharson & Oldenburg 1998.
 */
export function fewestSteps(
  cell: CellProblem,
  smooth: Balance,
  goal: number,
  range: readonly [number, number],
  onBalance: TradeOffOptions['onBalance'],
): { balance: Balance; shape: TradeOffOptions['shape'] } {
  // weights fall to β²/d² at a step, so λ may have to rise beyond the range of the smooth ground
  const widened = [range[0], range[1] * WIDER] as const;
  let balance = smooth;
  let shape: TradeOffOptions['shape'] = { boundaryWeights: new Float64Array(cell.cells - 1).fill(1) };
  const balanced = (weights: Float64Array, close?: number): Balance | null => {
    const options = { cell, shape: { boundaryWeights: weights }, close, onBalance };
    const first = balanceAt(options, balance.lambda, balance.free);
    const found = smoothestWithin(options, goal, first, widened);
    return found.reached ? found.balance : null;
  };
  for (let round = 0; round < ROUNDS; round++) {
    const weights = boundaryWeights(balance.free, cell.cells, round);
    const next = balanced(weights, round < ROUNDS - 1 ? ROUGHLY : undefined);
    if (!next) break;
    const moved = furthestMove(balance.free, next.free);
    balance = next;
    shape = { boundaryWeights: weights };
    if (moved > SETTLED || round < BY_SIZE) continue;
    return { balance: balanced(weights) ?? balance, shape };
  }
  return { balance, shape };
}

function furthestMove(from: Float64Array, to: Float64Array): number {
  return from.reduce((far, value, j) => Math.max(far, Math.abs(to[j]! - value)), 0);
}

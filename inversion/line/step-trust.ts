import type { ChainNode, ChainTie } from './block-chain';
import type { LineMisfit } from './line-problem';

/** ‖J δ‖² and ‖J δ − b‖² − ‖b‖² of rows [J | b]: how much a step bends, and what it promises. */
function promise(matrix: Float64Array, rows: number, step: ArrayLike<number>) {
  const width = step.length + 1;
  let bend = 0;
  let change = 0;
  for (let i = 0; i < rows; i++) {
    let sum = 0;
    for (let j = 0; j < step.length; j++) sum += matrix[i * width + j]! * step[j]!;
    bend += sum * sum;
    change += sum * (sum - 2 * matrix[i * width + step.length]!);
  }
  return { bend, change };
}

/** Below this share of the objective an excess is rounding. */
const ROUNDING = 1e-13;

/**
 * For each node how far its share of the objective came to stand above what the linear line promised, e, against what a step
 * can afford: e/(‖Jδ‖² + 2‖Dδ‖²), D the damping. As a damped step promises −‖Jδ‖² − 2‖Dδ‖² in all, the objective falls where
 * every node stays below 1; a node above says that it was taken too far. Ties count by halves.
 */
export function overshoots(
  nodes: readonly ChainNode[],
  ties: readonly ChainTie[],
  diagonals: readonly Float64Array[],
  step: readonly Float64Array[],
  before: LineMisfit,
  after: LineMisfit,
): Float64Array {
  const afford = new Float64Array(nodes.length);
  const excess = after.shares.map((share, s) => share - before.shares[s]!);
  nodes.forEach(({ matrix, rows }, s) => {
    const { bend, change } = promise(matrix, rows, step[s]!);
    const damped = diagonals[s]!.reduce((sum, d, j) => sum + d * d * step[s]![j]! * step[s]![j]!, 0);
    afford[s]! += bend + 2 * damped;
    excess[s]! -= change;
  });
  ties.forEach(({ matrix, rows }, s) => {
    const { bend, change } = promise(matrix, rows, [...step[s]!, ...step[s + 1]!]);
    for (const side of [s, s + 1]) {
      afford[side]! += bend / 2;
      excess[side]! -= change / 2;
    }
  });
  const blur = ROUNDING * before.objective;
  return excess.map((value, s) => (value > blur ? value / afford[s]! : Number.isNaN(value) ? Infinity : 0));
}

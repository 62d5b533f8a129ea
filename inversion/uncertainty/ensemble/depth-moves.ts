import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import { createGround, type Ground } from './ground';
import type { MoveName } from './ensemble-types';
import type { Move } from './metropolis';

/** One move after another as one: the ground between them is an auxiliary variable, so the ln ratios add up. */
export function movesInTurn(
  name: MoveName,
  weight: number,
  first: Move,
  second: Move,
  mostLayers: number,
): Move {
  const between = createGround(mostLayers + 1);
  return {
    name,
    weight,
    propose: (from, to, random) => {
      const ratio = first.propose(from, between, random);
      return ratio === -Infinity ? ratio : ratio + second.propose(between, to, random);
    },
  };
}

/** lnρ and ln h into lnρ and ln depth; returns ln |∂ ln h/∂ ln depth| = Σ ln(depth/h). */
function toDepths(from: Ground, to: Ground): number {
  const { layers, values } = from;
  let depth = 0;
  let logJacobian = 0;
  to.layers = layers;
  for (let j = 0; j < layers; j++) to.values[j] = values[j]!;
  for (let j = layers; j < 2 * layers - 1; j++) {
    depth += exp(values[j]!);
    to.values[j] = log(depth);
    logJacobian += to.values[j]! - values[j]!;
  }
  return logJacobian;
}

/** The way back; −Infinity where depths do not ascend. */
function toThicknesses(from: Ground, to: Ground): number {
  const { layers, values } = from;
  let top = 0;
  let logJacobian = 0;
  to.layers = layers;
  for (let j = 0; j < layers; j++) to.values[j] = values[j]!;
  for (let j = layers; j < 2 * layers - 1; j++) {
    const base = exp(values[j]!);
    if (!(base > top)) return -Infinity;
    to.values[j] = log(base - top);
    logJacobian += values[j]! - to.values[j]!;
    top = base;
  }
  return logJacobian;
}

/** A move of boundaries in ln depth for grounds whose coordinates are ln thicknesses; the change of measure goes into the ratio. */
export function inDepth(move: Move, mostLayers: number): Move {
  const [before, after] = [createGround(mostLayers + 1), createGround(mostLayers + 1)];
  return {
    ...move,
    propose: (from, to, random) => {
      const jacobianBefore = toDepths(from, before);
      const ratio = move.propose(before, after, random);
      if (ratio === -Infinity) return ratio;
      const jacobianAfter = toThicknesses(after, to);
      return jacobianAfter === -Infinity ? jacobianAfter : ratio + jacobianAfter - jacobianBefore;
    },
  };
}

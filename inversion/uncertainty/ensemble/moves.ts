import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { birthMove, deathMove } from './birth-death-moves';
import type { MoveRange } from './cut-layer';
import { inDepth, movesInTurn } from './depth-moves';
import { differenceMove } from './difference-move';
import { FEW_LAYERS, type GroundSpace } from './ground-space';
import type { Move } from './metropolis';
import { mixtureMoves } from './mixture-move';
import type { Population } from './population';
import { boundaryMove, equivalenceMove, resistivityMove, stepAt } from './step-moves';

/** A boundary and a layer set anew elsewhere. */
function relocationMove(range: MoveRange, weight: number): Move {
  const more = { ...range, fewest: 1, most: range.most + 1 };
  return movesInTurn('relocation', weight, birthMove(more, 1), deathMove(more, 1), range.most);
}

/** Moves of one boundary or one layer at a time. Their depths are ln depths, also where the coordinates are thicknesses. */
function localMoves(space: GroundSpace, beta: number): Move[] {
  const step = stepAt(beta);
  const moves = [boundaryMove(step, 0.1), equivalenceMove(step, 0.08)];
  if (space.fewest < space.most)
    return [
      birthMove(space, 0.15),
      deathMove(space, 0.15),
      relocationMove(space, 0.12),
      resistivityMove(step, 0.1),
      ...moves,
    ];
  const { most, logBoundary } = space;
  if (most <= FEW_LAYERS) return [];
  const range = { ...space, logBoundary: [logBoundary[0], logBoundary[1] + log(most - 1)] as const };
  return [
    resistivityMove(step, 0.04),
    ...[relocationMove(range, 0.08), ...moves].map((move) => inDepth(move, most)),
  ];
}

/** A draw of the prior, whatever the present ground: for β = 0, where each is accepted. */
export function priorMove(space: GroundSpace): Move {
  return {
    name: 'relocation',
    weight: 1,
    propose: (from, to, random) => {
      space.draw(random, to);
      return from.logPrior - space.logPrior(to);
    },
  };
}

/** At one temperature: differences within a population that stands still, and draws from what is quickly fitted to it. */
export function temperingMoves(
  space: GroundSpace,
  population: Population,
  beta: number,
  random: RandomStream,
): Move[] {
  const moves = [...localMoves(space, beta), differenceMove(population, 0.3)];
  // the members of one count are too few for a fit where the count is unknown
  if (space.fewest < space.most) return moves;
  const source = { population, share: 1, componentsPerValue: 1, rounds: 5 };
  return [...moves, ...mixtureMoves([source], 0.3, random)];
}

/**
 * For walks whose samples are kept, of a stated count: the populations stand still, so every move keeps its detailed balance. A part
 * of the mixture is fitted to a tempered population, which reaches into the tails.
 */
export function samplingMoves(
  space: GroundSpace,
  posterior: Population,
  tempered: Population,
  random: RandomStream,
): Move[] {
  const sources = [
    { population: posterior, share: 0.8, componentsPerValue: 3, rounds: 12 },
    { population: tempered, share: 0.2, componentsPerValue: 1, rounds: 12 },
  ];
  return [...localMoves(space, 1), differenceMove(posterior, 0.3), ...mixtureMoves(sources, 0.45, random)];
}

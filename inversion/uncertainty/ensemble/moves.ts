import type { RandomStream } from '../../random';
import { birthMove, boundaryMove, deathMove, equivalenceMove, resistivityMove } from './birth-death-moves';
import { differenceMove } from './difference-move';
import type { GroundSpace } from './ground-space';
import type { Move } from './metropolis';
import { mixtureMove } from './mixture-move';
import type { Population } from './population';

/** The moves from count to count and of one value at a time; none where the count is stated. */
function countMoves(space: GroundSpace): Move[] {
  if (space.fewest === space.most) return [];
  return [
    birthMove(space, 0.18),
    deathMove(space, 0.18),
    boundaryMove(0.12),
    resistivityMove(0.12),
    equivalenceMove(0.1),
  ];
}

/** While the population is still being tempered. */
export function temperingMoves(space: GroundSpace, population: Population): Move[] {
  return [...countMoves(space), differenceMove(population, 0.3)];
}

/** For the chains whose samples are kept: the populations stand still, so every move keeps its detailed balance. */
export function samplingMoves(
  space: GroundSpace,
  posterior: Population,
  tempered: Population,
  random: RandomStream,
): Move[] {
  const mixture = mixtureMove(posterior, tempered, 0.45, random);
  return [...temperingMoves(space, posterior), ...(mixture ? [mixture] : [])];
}

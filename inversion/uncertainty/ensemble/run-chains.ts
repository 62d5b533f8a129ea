import type { RandomStream } from '../../random';
import type { MoveName } from './ensemble-types';
import { createGround } from './ground';
import { metropolisStep, pickMove, type Model, type Move } from './metropolis';
import { createPopulation, getGround, putGround, type Population } from './population';

export interface MoveCount {
  readonly move: MoveName;
  tried: number;
  accepted: number;
}

/** Samples of one chain, in order. */
export interface ChainRun {
  readonly samples: Population;
  readonly counts: MoveCount[];
}

/** A chain from member `start` of `population`: every `thinning`-th ground of `draws` × `thinning` steps is kept. */
export function runChain(
  model: Model,
  moves: readonly Move[],
  population: Population,
  start: number,
  draws: number,
  thinning: number,
  random: RandomStream,
  onDraw: (draw: number) => void,
): ChainRun {
  const { space } = model;
  const [current, trial] = [createGround(space.most), createGround(space.most)];
  const counts = moves.map(({ name }): MoveCount => ({ move: name, tried: 0, accepted: 0 }));
  const samples = createPopulation(draws, space.most);
  getGround(population, start, current);
  current.logPrior = space.logPrior(current);
  for (let draw = 0; draw < draws; draw++) {
    for (let turn = 0; turn < thinning; turn++) {
      const m = pickMove(moves, random.uniform());
      counts[m]!.tried++;
      if (metropolisStep(model, moves[m]!, 1, current, trial, random)) counts[m]!.accepted++;
    }
    putGround(samples, draw, current);
    onDraw(draw);
  }
  return { samples, counts };
}

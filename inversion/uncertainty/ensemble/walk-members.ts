import type { RandomStream } from '../../random';
import type { MoveName } from './ensemble-types';
import { createGround } from './ground';
import { metropolisStep, pickMove, type Model, type Move } from './metropolis';
import { chosenMembers, createPopulation, getGround, putGround, type Population } from './population';

export interface MoveCount {
  readonly move: MoveName;
  tried: number;
  accepted: number;
}

export interface Walk {
  readonly samples: Population;
  readonly counts: MoveCount[];
}

/**
 * Every member of a population walks on, and every `thinning`-th of its grounds is kept until there are `draws` in all. The samples
 * of one member stand together, and members that come of one ancestor beside each other, so that the correlation along the
 * sequence tells how much the samples are worth, as it does in a single chain.
 */
export function walkMembers(
  model: Model,
  moves: readonly Move[],
  population: Population,
  draws: number,
  thinning: number,
  random: RandomStream,
  onMember: (share: number) => void,
): Walk {
  const { space, logExact } = model;
  const [current, trial] = [createGround(space.most), createGround(space.most)];
  const counts = moves.map(({ name }): MoveCount => ({ move: name, tried: 0, accepted: 0 }));
  const each = Math.ceil(draws / population.size);
  const samples = createPopulation(each * population.size, space.most);
  for (let member = 0; member < population.size; member++) {
    getGround(population, member, current);
    current.logPrior = space.logPrior(current);
    if (logExact) current.logExact = logExact(current);
    for (let turn = 1; turn <= each * thinning; turn++) {
      const m = pickMove(moves, random.uniform());
      counts[m]!.tried++;
      if (metropolisStep(model, moves[m]!, 1, current, trial, random)) counts[m]!.accepted++;
      if (turn % thinning === 0) putGround(samples, member * each + turn / thinning - 1, current);
    }
    onMember(member / population.size);
  }
  const kept = Int32Array.from({ length: draws }, (_, i) => Math.floor((i * samples.size) / draws));
  return { samples: chosenMembers(samples, kept), counts };
}

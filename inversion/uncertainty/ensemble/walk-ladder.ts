import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { createGround, type Ground } from './ground';
import { metropolisStep, passesExactly, pickMove, type Model, type Move } from './metropolis';
import { createPopulation, getGround, putGround } from './population';
import type { Rung } from './temper';
import type { MoveCount, Walk } from './walk-members';

/** One inverse temperature and the ground that stands there now. */
interface Place {
  readonly beta: number;
  readonly moves: readonly Move[];
  ground: Ground;
}

/** A place at each rung, hottest first, whose ground is any member of population `c` there. */
function startPlaces(model: Model, rungs: readonly Rung[], c: number, random: RandomStream): Place[] {
  const { space, logExact } = model;
  const places = rungs.map(({ beta, populations, moves }): Place => {
    const ground = createGround(space.most);
    getGround(populations[c]!, random.below(populations[c]!.size), ground);
    ground.logPrior = space.logPrior(ground);
    return { beta, moves: moves[c]!, ground };
  });
  const { ground } = places.at(-1)!;
  if (logExact) ground.logExact = logExact(ground);
  return places;
}

/**
 * Lets two neighbours change grounds with chance min(1, (L_hot/L_cold)^(β_cold − β_hot)); at β = 1 the exact likelihood must agree.
 */
function mayChange({ logExact }: Model, hot: Place, cold: Place, random: RandomStream): void {
  const gain = (cold.beta - hot.beta) * (hot.ground.logLikelihood - cold.ground.logLikelihood);
  if (!(gain >= 0 || log(random.uniform()) < gain)) return;
  if (logExact && cold.beta === 1 && !passesExactly(logExact, cold.ground, hot.ground, random)) return;
  const { ground } = hot;
  hot.ground = cold.ground;
  cold.ground = ground;
  hot.ground.logMixture = NaN;
  cold.ground.logMixture = NaN;
}

/**
 * Parallel tempering: one ground at each rung walks on, and after each turn every second pair of neighbours may change places, the even
 * pairs and the odd ones by turns. Ladder and proposals stand still, so the ground at β = 1, kept after every `thinning` turns,
 * keeps the posterior.
 * Source: Geyer 1991, Computing Science and Statistics 23, 156–163; even and odd pairs: Okabe et al. 2001, Chemical Physics
 * Letters 335, 435–439 (from memory).
 */
export function walkLadder(
  model: Model,
  rungs: readonly Rung[],
  c: number,
  draws: number,
  thinning: number,
  random: RandomStream,
  onShare: (share: number) => void,
): Walk {
  const { most } = model.space;
  const places = startPlaces(model, rungs, c, random);
  const last = places.length - 1;
  const trial = createGround(most);
  const samples = createPopulation(draws, most);
  const counts = places[last]!.moves.map(({ name }): MoveCount => ({ move: name, tried: 0, accepted: 0 }));
  for (let turn = 1; turn <= draws * thinning; turn++) {
    for (let rung = 0; rung <= last; rung++) {
      const { beta, moves, ground } = places[rung]!;
      const m = pickMove(moves, random.uniform());
      const accepted = metropolisStep(model, moves[m]!, beta, ground, trial, random);
      if (rung < last) continue;
      counts[m]!.tried++;
      if (accepted) counts[m]!.accepted++;
    }
    for (let hot = turn % 2; hot < last; hot += 2) mayChange(model, places[hot]!, places[hot + 1]!, random);
    if (turn % thinning > 0) continue;
    putGround(samples, turn / thinning - 1, places[last]!.ground);
    if (turn % (128 * thinning) === 0) onShare(turn / (draws * thinning));
  }
  return { samples, counts };
}

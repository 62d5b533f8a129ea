import { exp } from '../../math/exponential';
import type { RandomStream } from '../../random';
import { createGround } from './ground';
import { FEW_LAYERS } from './ground-space';
import { metropolisStep, pickMove, type Model, type Move } from './metropolis';
import { priorMove, temperingMoves } from './moves';
import {
  chosenMembers,
  otherPopulations,
  createPopulation,
  getGround,
  putGround,
  type Population,
} from './population';

/** Draws of the prior, times the size of the population, that are screened by forward runs. */
const SCREENED = 12;
/** Steps of every member in a round, and rounds at each temperature and at the last. */
const SWEEPS = 4;
const ROUNDS = 2;
const LAST_ROUNDS = 4;

/** The next temperature leaves this share of the members' weight as effective size. */
const KEPT_SHARE = { few: 0.5, many: 0.7 };

/** After so many steps, far more than readings that fit a ground need, β grows at least fourfold: at most 20 steps are left. */
const MANY_STEPS = 40;
const LEAST_GROWTH = 4;
const LEAST_BETA = 1e-12;

/** The inverse temperature whose population is given back too: wider than the posterior, but about where it is. */
export const HALF_WAY = 0.4;

/** One inverse temperature of the ladder; entry c of each list belongs to population c. */
export interface Rung {
  readonly beta: number;
  readonly populations: readonly Population[];
  /** what the members of c were proposed at the end, made of the other populations */
  readonly moves: readonly (readonly Move[])[];
}

/** Exact draws of the prior with their likelihoods. */
function priorPopulation({ space, logLikelihood }: Model, size: number, random: RandomStream): Population {
  const ground = createGround(space.most);
  const population = createPopulation(size, space.most);
  for (let i = 0; i < size; i++) {
    space.draw(random, ground);
    ground.logLikelihood = logLikelihood(ground);
    putGround(population, i, ground);
  }
  return population;
}

/** Weights L^step against the best member into `weights`; returns their effective size (Σw)²/Σw². */
function weigh(logLikelihood: Float64Array, step: number, weights: Float64Array): number {
  let top = -Infinity;
  for (const value of logLikelihood) top = Math.max(top, value);
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < weights.length; i++) {
    const w = exp(step * (logLikelihood[i]! - top));
    weights[i] = w;
    sum += w;
    squares += w * w;
  }
  return (sum * sum) / squares;
}

/** The largest step up to `most` that keeps the effective size at `wanted`, by bisection. */
function nextStep(logLikelihood: Float64Array, most: number, wanted: number, weights: Float64Array): number {
  if (weigh(logLikelihood, most, weights) >= wanted) return most;
  let low = 0;
  let high = most;
  for (let i = 0; i < 60 && high - low > 0.01 * high; i++) {
    const middle = low === 0 ? high / 8 : 0.5 * (low + high);
    if (weigh(logLikelihood, middle, weights) >= wanted) low = middle;
    else high = middle;
  }
  return low === 0 ? high : low;
}

/** `size` members by systematic resampling: member i about size · wᵢ/Σw times (Kitagawa 1996). */
function resample(weights: Float64Array, size: number, random: RandomStream): Int32Array {
  const chosen = new Int32Array(size);
  const total = weights.reduce((sum, w) => sum + w, 0);
  const offset = random.uniform();
  let reached = weights[0]!;
  for (let i = 0, member = 0; i < size; i++) {
    const wanted = ((i + offset) / size) * total;
    while (reached < wanted && member < weights.length - 1) reached += weights[++member]!;
    chosen[i] = member;
  }
  return chosen;
}

/** One step of every member at inverse temperature `beta`; returns nothing, the population is moved in place. */
function sweep(
  model: Model,
  population: Population,
  moves: readonly Move[],
  beta: number,
  random: RandomStream,
): void {
  const [current, trial] = [createGround(model.space.most), createGround(model.space.most)];
  for (let i = 0; i < population.size; i++) {
    getGround(population, i, current);
    current.logPrior = model.space.logPrior(current);
    if (metropolisStep(model, moves[pickMove(moves, random.uniform())]!, beta, current, trial, random))
      putGround(population, i, current);
  }
}

/**
 * Sweeps at one temperature, in rounds; each round first fits what it proposes to the populations as they stand. What a population
 * is proposed comes from the others alone: a proposal fitted to the members that it moves would hold them where they are.
 * Returns the moves of the last round.
 */
function settle(
  model: Model,
  populations: readonly Population[],
  beta: number,
  streams: readonly RandomStream[],
): Move[][] {
  const rounds = beta === 1 ? LAST_ROUNDS : ROUNDS;
  for (let round = 1; ; round++) {
    const moves = streams.map((random, c) =>
      temperingMoves(model.space, otherPopulations(populations, c), beta, random),
    );
    populations.forEach((population, c) => {
      for (let turn = 0; turn < SWEEPS; turn++) sweep(model, population, moves[c]!, beta, streams[c]!);
    });
    if (round === rounds) return moves;
  }
}

/**
 * Populations, one a stream, that are led from the prior to the posterior: draws of the prior, screened by forward runs, are resampled
 * by L^Δβ and moved at each of a ladder of inverse temperatures β from 0 to 1 that sets itself. They start from no fit.
 * Returns the rungs from the prior at β = 0 to β = 1; one is at `HALF_WAY`.
 * Source: Del Moral, Doucet & Jasra 2006, J. R. Statist. Soc. B 68, 411–436 (from memory).
 */
export function temperedLadder(
  { space, logLikelihood }: Model,
  size: number,
  streams: readonly RandomStream[],
  onStep: (beta: number) => void,
): Rung[] {
  // no exact stage: these populations only start the walks and shape what is proposed there
  const model: Model = { space, logLikelihood };
  let populations = streams.map((random) => priorPopulation(model, SCREENED * size, random));
  const keptShare = model.space.most <= FEW_LAYERS ? KEPT_SHARE.few : KEPT_SHARE.many;
  const rungs: Rung[] = [{ beta: 0, populations, moves: streams.map(() => [priorMove(space)]) }];
  let beta = 0;
  let taken = 0;
  while (beta < 1) {
    const next = beta < HALF_WAY ? HALF_WAY : 1;
    const weights = populations.map((population) => new Float64Array(population.size));
    const steps = populations.map(({ logLikelihood }, c) =>
      nextStep(logLikelihood, next - beta, keptShare * size, weights[c]!),
    );
    const floor = taken++ < MANY_STEPS ? 0 : Math.max(LEAST_BETA, LEAST_GROWTH * beta);
    const reached = Math.max(beta + Math.min(...steps), floor);
    const step = Math.min(reached, next) - beta;
    beta = reached >= next ? next : reached;
    populations = populations.map((population, c) => {
      weigh(population.logLikelihood, step, weights[c]!);
      return chosenMembers(population, resample(weights[c]!, size, streams[c]!));
    });
    rungs.push({ beta, populations, moves: settle(model, populations, beta, streams) });
    onStep(beta);
  }
  return rungs;
}

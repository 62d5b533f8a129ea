import { exp } from '../../math/exponential';
import type { RandomStream } from '../../random';
import { createGround } from './ground';
import { metropolisStep, pickMove, type Model } from './metropolis';
import { temperingMoves } from './moves';
import { chosenMembers, createPopulation, getGround, putGround, type Population } from './population';

/** Draws of the prior, times the size of the population, that are screened by forward runs. */
const SCREENED = 12;
/** Steps of every member at each temperature, and at the last. */
const SWEEPS = 3;
const LAST_SWEEPS = 12;
/** The next temperature leaves this share of the members' weight as effective size. */
const KEPT_SHARE = 0.5;

/** The inverse temperature whose population is given back too: wider than the posterior, but about where it is. */
const HALF_WAY = 0.4;

export interface TemperedPopulations {
  readonly posterior: Population;
  /** the same at an inverse temperature of 0.4 */
  readonly tempered: Population;
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

/** The largest step up to `most` that keeps the effective size at `wanted`, by bisection in the ratio; `weights` are left for it. */
function nextStep(logLikelihood: Float64Array, most: number, wanted: number, weights: Float64Array): number {
  if (weigh(logLikelihood, most, weights) >= wanted) return most;
  let low = 0;
  let high = most;
  for (let i = 0; i < 60 && high - low > 0.01 * high; i++) {
    const middle = low === 0 ? high / 8 : 0.5 * (low + high);
    if (weigh(logLikelihood, middle, weights) >= wanted) low = middle;
    else high = middle;
  }
  const step = low === 0 ? high : low;
  weigh(logLikelihood, step, weights);
  return step;
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

/** One step of every member at inverse temperature `beta`; differences are taken from the population as it stood before. */
function sweep(model: Model, population: Population, beta: number, random: RandomStream): void {
  const [current, trial] = [createGround(model.space.most), createGround(model.space.most)];
  const before = chosenMembers(
    population,
    Int32Array.from({ length: population.size }, (_, i) => i),
  );
  const moves = temperingMoves(model.space, before);
  for (let i = 0; i < population.size; i++) {
    getGround(population, i, current);
    current.logPrior = model.space.logPrior(current);
    if (metropolisStep(model, moves[pickMove(moves, random.uniform())]!, beta, current, trial, random))
      putGround(population, i, current);
  }
}

/**
 * A population that is led from the prior to the posterior: draws of the prior, screened by forward runs, are resampled by
 * L^Δβ and moved at each of a ladder of inverse temperatures β from 0 to 1 that sets itself. It starts from no fit.
 * Source: Del Moral, Doucet & Jasra 2006, J. R. Statist. Soc. B 68, 411–436 (from memory).
 */
export function temperedPopulation(
  model: Model,
  size: number,
  random: RandomStream,
  onStep: (beta: number) => void,
): TemperedPopulations {
  let population = priorPopulation(model, SCREENED * size, random);
  let halfWay = population;
  let beta = 0;
  while (beta < 1) {
    const weights = new Float64Array(population.size);
    const wanted = KEPT_SHARE * size;
    const next = beta < HALF_WAY ? HALF_WAY : 1;
    const step = nextStep(population.logLikelihood, next - beta, wanted, weights);
    beta = step >= next - beta ? next : beta + step;
    population = chosenMembers(population, resample(weights, size, random));
    for (let turn = 0; turn < (beta === 1 ? LAST_SWEEPS : SWEEPS); turn++) {
      sweep(model, population, beta, random);
    }
    if (beta === HALF_WAY) halfWay = population;
    onStep(beta);
  }
  return { posterior: population, tempered: halfWay };
}

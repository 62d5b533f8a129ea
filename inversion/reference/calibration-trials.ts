import { exp } from '../math/exponential';
import { pow } from '../math/power';
import { createForwardOperator } from '../operator/forward-operator';
import { createRandomStream, type RandomStream } from '../random';
import type { Reading, Spread } from '../types';
import { chiSquaredSurvival } from '../uncertainty/chi-squared';
import { drawPosterior, type PosteriorDraws } from '../uncertainty/ensemble/draw-posterior';
import type { EnsemblePrior, SampleSettings, TargetBed } from '../uncertainty/ensemble/ensemble-types';
import { createGround } from '../uncertainty/ensemble/ground';
import { monitoredChains } from '../uncertainty/ensemble/monitored-chains';
import { createPopulation, putGround, type Population } from '../uncertainty/ensemble/population';
import { modelUnder } from '../uncertainty/ensemble/sampled-model';
import { sampledEarths } from '../uncertainty/ensemble/sampled-earths';
import { holdsBed } from '../uncertainty/ensemble/target-bed';
import type { Model } from '../uncertainty/ensemble/metropolis';

/** The prior that true grounds are drawn from and sampled under. */
const PRIOR: EnsemblePrior = { resistivity: [5, 1000], thickness: [0.7, 30] };
const RELATIVE_ERROR = 0.05;
const SPREADS: Spread[] = Array.from({ length: 12 }, (_, i) => ({ type: 'wenner', spacing: pow(1.5, i) }));
const DRAWS = 1000;
/** Samples that the truth is ranked among. */
const RANKED = 99;

/** One true ground drawn from the prior, its noisy readings, and the samples that they lead to. */
export interface CalibrationTrial {
  readonly model: Model;
  readonly truth: Population;
  readonly drawn: PosteriorDraws;
}

export function calibrationTrial(layers: SampleSettings['layers'], seed: number): CalibrationTrial {
  const random = createRandomStream(seed);
  const settings = { layers, prior: PRIOR, draws: DRAWS, seed };
  const operator = createForwardOperator(SPREADS);
  const { space } = modelUnder(PRIOR, settings, operator, []);
  const ground = createGround(space.most);
  space.draw(random, ground);
  const parameters = new Float64Array(2 * space.most - 1);
  const predicted = new Float64Array(SPREADS.length);
  space.toParameters(ground, parameters);
  operator.predictInto(parameters, ground.layers, predicted);
  const readings = SPREADS.map((spread, i): Reading => ({
    spread,
    apparentResistivity: predicted[i]! * exp(RELATIVE_ERROR * random.normal()),
    relativeError: RELATIVE_ERROR,
  }));
  const model = modelUnder(PRIOR, settings, operator, readings);
  ground.logLikelihood = model.logLikelihood(ground);
  const truth = createPopulation(1, space.most);
  putGround(truth, 0, ground);
  return { model, truth, drawn: drawPosterior(model, { ...settings, report: () => undefined }) };
}

/**
 * Rank of the truth among 99 samples, 0 … 99, in each monitored quantity; ties are broken by chance. Even over many trials if the
 * sampler is right. Source: Talts et al. 2018, Validating Bayesian inference algorithms with simulation-based calibration (from memory).
 */
export function ranksOfTruth({ model, truth, drawn }: CalibrationTrial, random: RandomStream): number[] {
  const trueValues = monitoredChains(model.space, [truth]).map(([chain]) => chain![0]!);
  return monitoredChains(model.space, drawn.chains).map((chains, quantity) => {
    const all = chains.flatMap((chain) => [...chain]);
    let rank = 0;
    for (let i = 0; i < RANKED; i++) {
      const sample = all[Math.floor(((i + 0.5) * all.length) / RANKED)]!;
      const truthValue = trueValues[quantity]!;
      if (sample < truthValue || (sample === truthValue && random.uniform() < 0.5)) rank++;
    }
    return rank;
  });
}

/** Chance of ranks (0 … 99) as uneven as these if they are even, by χ² over ten cells. */
export function evenness(ranks: readonly number[]): number {
  const cells = Array.from(
    { length: 10 },
    (_, cell) => ranks.filter((rank) => Math.floor(rank / 10) === cell).length,
  );
  const expected = ranks.length / 10;
  const sum = cells.reduce((total, count) => total + ((count - expected) * (count - expected)) / expected, 0);
  return chiSquaredSurvival(sum, 9);
}

/** A wanted bed that such grounds hold about as often as not. */
function randomTarget(random: RandomStream): TargetBed {
  const low = exp(1.6 + 3.5 * random.uniform());
  return {
    resistivity: [low, low * exp(0.7 + 2 * random.uniform())],
    minThickness: exp(3 * random.uniform()),
    topAbove: exp(0.5 + 3 * random.uniform()),
  };
}

export interface AnsweredTarget {
  readonly probability: number;
  readonly true: boolean;
}

/** Random target questions to the samples of a trial, and whether the true ground holds the bed. */
export function answeredTargets(
  { model, truth, drawn }: CalibrationTrial,
  count: number,
  random: RandomStream,
): AnsweredTarget[] {
  const earths = drawn.chains.map((chain) => sampledEarths(model.space, chain));
  const trueEarth = sampledEarths(model.space, truth);
  return Array.from({ length: count }, () => {
    const target = randomTarget(random);
    const held = earths.map((chain) => holdsBed(chain, target));
    const total = held.reduce((sum, chain) => sum + chain.reduce((a, b) => a + b, 0), 0);
    return {
      probability: total / held.reduce((sum, chain) => sum + chain.length, 0),
      true: holdsBed(trueEarth, target)[0] === 1,
    };
  });
}

/** Of the answers within [low, high]: how many, their mean, and the share that came true. */
export function reliability(
  answers: readonly AnsweredTarget[],
  low: number,
  high: number,
): { count: number; mean: number; cameTrue: number } {
  const within = answers.filter(({ probability }) => probability >= low && probability <= high);
  return {
    count: within.length,
    mean: within.reduce((sum, { probability }) => sum + probability, 0) / within.length,
    cameTrue: within.filter((answer) => answer.true).length / within.length,
  };
}

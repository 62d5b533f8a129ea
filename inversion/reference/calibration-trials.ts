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
/** More where the count is unknown: those chains are more correlated. */
const DRAWS = { stated: 1000, unknown: 8000 };
/** Samples that the truth is ranked among. */
const RANKED = 99;

/** One true ground drawn from the prior, its noisy readings, and the samples that they lead to. */
export interface CalibrationTrial {
  readonly seed: number;
  readonly model: Model;
  readonly truth: Population;
  readonly drawn: PosteriorDraws;
}

export function calibrationTrial(layers: SampleSettings['layers'], seed: number): CalibrationTrial {
  const random = createRandomStream(seed);
  const draws = layers === 'unknown' ? DRAWS.unknown : DRAWS.stated;
  const settings = { layers, prior: PRIOR, draws, seed };
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
  return { seed, model, truth, drawn: drawPosterior(model, { ...settings, report: () => undefined }) };
}

/**
 * Rank of the truth among 99 samples, 0 … 99, in each monitored quantity; among ties each place is as likely. Even over many trials if the
 * sampler is right. Source: Talts et al. 2018, Validating Bayesian inference algorithms with simulation-based calibration (from memory).
 */
export function ranksOfTruth({ model, truth, drawn }: CalibrationTrial, random: RandomStream): number[] {
  const trueValues = monitoredChains(model.space, [truth]).map(([chain]) => chain![0]!);
  return monitoredChains(model.space, drawn.chains).map((chains, quantity) => {
    const all = chains.flatMap((chain) => [...chain]);
    const truthValue = trueValues[quantity]!;
    let below = 0;
    let ties = 0;
    for (let i = 0; i < RANKED; i++) {
      const sample = all[Math.floor(((i + 0.5) * all.length) / RANKED)]!;
      if (sample < truthValue) below++;
      else if (sample === truthValue) ties++;
    }
    return below + random.below(ties + 1);
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
  /** seed of the trial that it was asked in */
  readonly trial: number;
  readonly probability: number;
  readonly true: boolean;
}

/** Random target questions to the samples of a trial, and whether the true ground holds the bed. */
export function answeredTargets(
  { seed, model, truth, drawn }: CalibrationTrial,
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
      trial: seed,
      probability: total / held.reduce((sum, chain) => sum + chain.length, 0),
      true: holdsBed(trueEarth, target)[0] === 1,
    };
  });
}

export interface Reliability {
  readonly count: number;
  /** of the stated probabilities */
  readonly mean: number;
  readonly cameTrue: number;
  /** of `cameTrue` − `mean`; answers of one trial are about one ground, so that trials are what is counted */
  readonly standardError: number;
}

/** Of the answers from `low` up to below `high`: how many, their mean, and the share that came true. */
export function reliability(answers: readonly AnsweredTarget[], low: number, high: number): Reliability {
  const within = answers.filter(({ probability }) => probability >= low && probability < high);
  const count = within.length;
  const mean = within.reduce((sum, { probability }) => sum + probability, 0) / count;
  const cameTrue = within.filter((answer) => answer.true).length / count;
  const off = new Map<number, number>();
  for (const { trial, probability, true: held } of within)
    off.set(trial, (off.get(trial) ?? 0) + (held ? 1 : 0) - probability - (cameTrue - mean));
  const squares = [...off.values()].reduce((sum, value) => sum + value * value, 0);
  return { count, mean, cameTrue, standardError: Math.sqrt(squares) / count };
}

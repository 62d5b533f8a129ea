import { threeDigits } from '../../three-digits';
import { createRandomStream } from '../../random';
import { effectiveSize } from './diagnostics';
import type { PosteriorDraws } from './draw-posterior';
import type { EnsemblePrior, TargetAnswer, TargetBed, TargetChance } from './ensemble-types';
import { createGround } from './ground';
import type { GroundSpace } from './ground-space';
import { createPopulation, putGround, type Population } from './population';
import { sampledEarths } from './sampled-earths';
import { holdsBed } from './target-bed';

/** Exact draws of the prior that the chance before the data is counted from: its error is at most 0.0035. */
const PRIOR_DRAWS = 20_000;
/** Answers further apart than this are made by the prior. */
const PRIOR_DECIDES = 0.1;

function meanOf(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/**
 * Share of the samples that hold the bed, and its Monte-Carlo error √(p(1 − p)/n), n the effective size of the answers themselves.
 * p is drawn towards ½ by half a sample there, so that an answer of 0 or 1 keeps an error.
 */
export function countBed(
  space: GroundSpace,
  { chains, effectiveSampleSize }: PosteriorDraws,
  target: TargetBed,
): { probability: number; standardError: number } {
  const answers = chains.map((chain) => holdsBed(sampledEarths(space, chain), target));
  const probability = answers.reduce((sum, chain) => sum + meanOf(chain), 0) / answers.length;
  const varies = probability > 0 && probability < 1;
  const n = varies ? effectiveSize(answers) : effectiveSampleSize;
  const p = (probability * n + 0.5) / (n + 1);
  return { probability, standardError: Math.sqrt((p * (1 - p)) / n) };
}

/** The space filled with exact draws of the prior. */
function priorDraws(space: GroundSpace, seed: number): Population {
  const random = createRandomStream(seed);
  const ground = createGround(space.most);
  const population = createPopulation(PRIOR_DRAWS, space.most);
  for (let i = 0; i < PRIOR_DRAWS; i++) {
    space.draw(random, ground);
    putGround(population, i, ground);
  }
  return population;
}

/** Chance of the bed before any reading, from exact draws of the ranges of the prior. */
export function chanceBefore(space: GroundSpace, target: TargetBed, seed: number): number {
  return meanOf(holdsBed(sampledEarths(space, priorDraws(space, seed)), target));
}

export function plainPrior({ resistivity, thickness }: EnsemblePrior): TargetChance['prior'] {
  return { resistivity: [...resistivity], thickness: [...thickness] };
}

const percent = (chance: number): string => `${(100 * chance).toFixed(0)} %`;

function describe(main: TargetChance, narrow: TargetChance, wide: TargetChance, decides: boolean): string {
  const range = `${percent(narrow.probability)} under the narrow prior and ${percent(wide.probability)} under the wide one`;
  const stated = `${percent(main.probability)} after the readings, ${percent(main.before)} before them`;
  const spanned = ({ prior }: TargetChance) =>
    `${threeDigits(prior.resistivity[0])} to ${threeDigits(prior.resistivity[1])} Ω·m`;
  if (decides)
    return `The prior decides, not the sounding: ${stated}, but ${range} (${spanned(narrow)} and ${spanned(wide)}). A borehole nearby would narrow the prior.`;
  return `The chance of the bed is ${stated}; it is ${range}, so it hardly hangs on the prior.`;
}

/** The answers under three priors side by side, with words for how far they hang on the prior. */
export function weighPriors(main: TargetChance, narrow: TargetChance, wide: TargetChance): TargetAnswer {
  const chances = [main, narrow, wide].map(({ probability }) => probability);
  const priorDecides = Math.max(...chances) - Math.min(...chances) > PRIOR_DECIDES;
  return { ...main, narrow, wide, priorDecides, words: describe(main, narrow, wide, priorDecides) };
}

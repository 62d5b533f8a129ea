import { createRandomStream, type RandomStream } from '../../random';
import type { EnsembleProgress } from './ensemble-types';
import { bulkEffectiveSize, rankRHat, type Chains } from './diagnostics';
import type { GroundSpace } from './ground-space';
import type { Model } from './metropolis';
import { monitoredChains } from './monitored-chains';
import { samplingMoves } from './moves';
import { chosenMembers, otherPopulations, type Population } from './population';
import { walkLadder } from './walk-ladder';
import { walkMembers, type MoveCount, type Walk } from './walk-members';
import { HALF_WAY, temperedLadder, type Rung } from './temper';

export const CHAINS = 4;
/** R-hat below this and at least so many effective samples: the chains are long enough (Vehtari et al. 2021). */
export const R_HAT_LIMIT = 1.01;
export const LEAST_EFFECTIVE = 400;
/** How often all is done again. */
const RETRIES = 1;
/** Moves at β = 1 from one kept sample to the next. */
const THINNING = { stated: 6, unknown: 12 };
/** Of an unknown count: members of each population, which rungs are walked on, and the β where grounds change freely. */
const UNKNOWN = { size: 250, everyRung: 2, hotEnough: 0.01 };
/** Members of each population by layer count. */
const SIZES = [0, 150, 150, 250, 600];
/** Where few samples are asked for, this is enough. */
const ENOUGH = 250;
/** About as many members of all populations serve to fit proposals. */
const MOST_FITTED = 4000;

export interface PosteriorDraws {
  readonly chains: readonly Population[];
  readonly counts: MoveCount[];
  readonly thinning: number;
  readonly rHat: number;
  readonly effectiveSampleSize: number;
}

export interface DrawOptions {
  readonly draws: number;
  readonly seed: number;
  readonly report: (progress: EnsembleProgress) => void;
}

/** Every so-manieth member, so that about `MOST_FITTED` are left. */
function thinnedMembers(population: Population): Population {
  const every = Math.max(1, Math.floor(population.size / MOST_FITTED));
  const size = Math.floor(population.size / every);
  return chosenMembers(
    population,
    Int32Array.from({ length: size }, (_, i) => i * every),
  );
}

function addCounts(runs: readonly Walk[]): MoveCount[] {
  return runs[0]!.counts.map(({ move }, m) => ({
    move,
    tried: runs.reduce((sum, run) => sum + run.counts[m]!.tried, 0),
    accepted: runs.reduce((sum, run) => sum + run.counts[m]!.accepted, 0),
  }));
}

function diagnose(monitored: readonly Chains[]): Pick<PosteriorDraws, 'rHat' | 'effectiveSampleSize'> {
  let rHat = 1;
  let effectiveSampleSize = Infinity;
  for (const chains of monitored) {
    rHat = Math.max(rHat, rankRHat(chains));
    effectiveSampleSize = Math.min(effectiveSampleSize, bulkEffectiveSize(chains));
  }
  return { rHat, effectiveSampleSize };
}

/** Members of each population: more where there is more to find. */
function firstSize({ fewest, most }: GroundSpace): number {
  if (fewest < most) return UNKNOWN.size;
  return SIZES[most] ?? 600;
}

/** Every so-manieth rung down from β = 1 to the first that is hot enough; the prior always is. */
function walkedRungs(rungs: readonly Rung[]): Rung[] {
  let r = rungs.length - 1;
  const walked = [rungs[r]!];
  while (rungs[r]!.beta > UNKNOWN.hotEnough) {
    r = Math.max(0, r - UNKNOWN.everyRung);
    walked.unshift(rungs[r]!);
  }
  return walked;
}

/** How chain c is walked from what the populations have become. */
type WalkOn = (c: number, random: RandomStream, onShare: (share: number) => void) => Walk;

function walkOn(model: Model, rungs: readonly Rung[], length: number): WalkOn {
  const { space } = model;
  if (space.fewest < space.most) {
    const walked = walkedRungs(rungs);
    return (c, random, onShare) => walkLadder(model, walked, c, length, THINNING.unknown, random, onShare);
  }
  const posterior = rungs.at(-1)!.populations;
  const tempered = rungs.find(({ beta }) => beta === HALF_WAY)!.populations;
  const others = (populations: readonly Population[], c: number) =>
    thinnedMembers(otherPopulations(populations, c));
  return (c, random, onShare) => {
    const moves = samplingMoves(space, others(posterior, c), others(tempered, c), random);
    return walkMembers(model, moves, posterior[c]!, length, THINNING.stated, random, onShare);
  };
}

/**
 * Samples of prior × likelihood from four populations, each tempered from draws of the prior. Of a stated count their members walk on;
 * of an unknown one a ground at each temperature does, and neighbours change places. No ground of one population enters another:
 * they lend each other only what proposals are made from, which stands still while samples are kept. Where members of a stated
 * count do not agree, all is done again with three times as many.
 */
export function drawPosterior(model: Model, { draws, seed, report }: DrawOptions): PosteriorDraws {
  const { space } = model;
  const streams = Array.from({ length: CHAINS }, (_, c) => createRandomStream((seed + c * 0x9e3779b9) >>> 0));
  const length = Math.max(4, Math.ceil(draws / CHAINS));
  const stated = space.fewest === space.most;
  const thinning = THINNING[stated ? 'stated' : 'unknown'];
  const first = Math.min(firstSize(space), Math.max(ENOUGH, length));
  for (let attempt = 0, size = first; ; attempt++, size *= 3) {
    const rungs = temperedLadder(model, size, streams, (beta) => report({ stage: 'tempering', share: beta }));
    const walk = walkOn(model, rungs, length);
    const walks = streams.map((random, c) =>
      walk(c, random, (share) => report({ stage: 'sampling', share: (c + share) / CHAINS })),
    );
    const chains = walks.map(({ samples }) => samples);
    const found = diagnose(monitoredChains(space, chains));
    const enough = found.rHat < R_HAT_LIMIT && found.effectiveSampleSize >= LEAST_EFFECTIVE;
    // more members do not help where too few samples are asked for
    const few = length * CHAINS < 2 * LEAST_EFFECTIVE;
    if (enough || few || !stated || attempt === RETRIES)
      return { chains, counts: addCounts(walks), thinning, ...found };
  }
}

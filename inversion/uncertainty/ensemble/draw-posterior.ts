import { createRandomStream } from '../../random';
import type { EnsembleProgress } from './ensemble-types';
import { bulkEffectiveSize, rankRHat, type Chains } from './diagnostics';
import type { Model } from './metropolis';
import { monitoredChains } from './monitored-chains';
import { samplingMoves } from './moves';
import { chosenMembers, joinPopulations, type Population } from './population';
import { runChain, type ChainRun, type MoveCount } from './run-chains';
import { temperedPopulation } from './temper';

export const CHAINS = 4;
/** R-hat below this and at least so many effective samples: the chains are long enough (Vehtari et al. 2021). */
export const R_HAT_LIMIT = 1.01;
export const LEAST_EFFECTIVE = 400;
/** How often the run may be taken up again, twice as long each time. */
const RETRIES = 3;
/** Moves from one kept sample to the next, at first. */
const THINNING = { stated: 3, unknown: 10 };
/** Samples a chain takes before the proposals are fitted anew, and those of all chains that they are fitted to. */
const WARM_UP = 400;
const MOST_FITTED = 2000;
const REPORT_EVERY = 100;

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

function addCounts(runs: readonly ChainRun[]): MoveCount[] {
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

/**
 * Samples of prior × likelihood by four chains, each from a tempered population of its own. Proposals are fitted to what
 * came before and then stand still; where the chains do not agree, all is thrown away and run twice as long.
 */
export function drawPosterior(model: Model, { draws, seed, report }: DrawOptions): PosteriorDraws {
  const { space } = model;
  const stated = space.fewest === space.most;
  const size = stated ? Math.min(500, Math.max(150, 50 * (2 * space.most - 1))) : 400;
  const streams = Array.from({ length: CHAINS }, (_, c) => createRandomStream((seed + c * 0x9e3779b9) >>> 0));
  const starts = streams.map((random, c) =>
    temperedPopulation(model, size, random, (beta) =>
      report({ stage: 'tempering', share: (c + beta) / CHAINS }),
    ),
  );
  const tempered = joinPopulations(starts.map((start) => start.tempered));
  const run = (from: readonly Population[], length: number, thinning: number): ChainRun[] => {
    const pool = thinnedMembers(joinPopulations(from));
    const moves = samplingMoves(space, pool, tempered, streams[0]!);
    return streams.map((random, c) =>
      runChain(model, moves, from[c]!, from[c]!.size - 1, length, thinning, random, (draw) => {
        if (draw % REPORT_EVERY === 0) report({ stage: 'sampling', share: (c + draw / length) / CHAINS });
      }),
    );
  };
  const length = Math.max(2, Math.ceil(draws / CHAINS));
  let thinning = stated ? THINNING.stated : THINNING.unknown;
  let runs = run(
    starts.map((start) => start.posterior),
    Math.min(WARM_UP, length),
    thinning,
  );
  for (let attempt = 0; ; attempt++, thinning *= 2) {
    const before = runs.map(({ samples }) => samples);
    runs = run(before, length, thinning);
    const chains = runs.map(({ samples }) => samples);
    const found = diagnose(monitoredChains(space, chains));
    const enough = found.rHat < R_HAT_LIMIT && found.effectiveSampleSize >= LEAST_EFFECTIVE;
    if (enough || attempt === RETRIES) return { chains, counts: addCounts(runs), thinning, ...found };
  }
}

import { log } from '../math/logarithm';
import type { RandomStream } from '../random';
import { TOLERANCES } from '../tolerances';
import type { FitProgress, LayeredEarth } from '../types';
import type { LayeredProblem } from './layered-problem';
import { minimise, type LeastSquaresOptions, type LeastSquaresOutcome } from './levenberg-marquardt';
import { evenStart, randomStart, splitStarts, type SoundingCurve } from './starting-models';

/** How hard a search looks. */
export interface SearchEffort {
  /** random models screened by forward runs alone */
  readonly screened: number;
  /** how many of the best of those are run */
  readonly random: number;
  /** steps of the short run that sorts the starts */
  readonly shortRun: number;
  /** carried starts in a row without a gain of `TOLERANCES.startImprovement` that end the search */
  readonly patience: number;
  /** most steps of a carried start, and of the best one at the end */
  readonly carried: number;
  readonly polish: number;
}

/** For a result that is shown. */
const FULL: SearchEffort = {
  screened: 200,
  random: 8,
  shortRun: 6,
  patience: 5,
  carried: 40,
  polish: TOLERANCES.iterations,
};
/** For a model that only serves to start the next layer count. */
const SCOUT: SearchEffort = { screened: 0, random: 0, shortRun: 8, patience: 0, carried: 20, polish: 0 };

export interface MultiStartOutcome extends LeastSquaresOutcome {
  readonly starts: number;
  /** where the other carried starts ended, in the order in which they were carried */
  readonly others: readonly Pick<LeastSquaresOutcome, 'parameters' | 'chi2'>[];
}

export interface MultiStartOptions {
  readonly userStart?: LayeredEarth | undefined;
  /** ln parameters of a model with one layer fewer, whose layers are split in turn */
  readonly fewer?: Float64Array | undefined;
  readonly onProgress?: ((progress: FitProgress) => void) | undefined;
}

function logEarth(earth: LayeredEarth): Float64Array {
  return Float64Array.from([...earth.resistivity, ...earth.thickness], log);
}

/** The best of `effort.screened` random models by misfit; only forward runs are spent on them. */
function screenedStarts(
  layered: LayeredProblem,
  curve: SoundingCurve,
  random: RandomStream,
  effort: SearchEffort,
): Float64Array[] {
  if (layered.layers === 1) return [];
  const residual = new Float64Array(layered.problem.residuals);
  return Array.from({ length: effort.screened }, () => {
    const start = layered.startFrom(randomStart(curve, layered.layers, random));
    return { start, chi2: layered.problem.evaluate(start, residual) };
  })
    .sort((a, b) => a.chi2 - b.chi2)
    .slice(0, effort.random)
    .map(({ start }) => start);
}

interface Candidate {
  readonly start: number;
  readonly outcome: LeastSquaresOutcome;
}

function search(
  layered: LayeredProblem,
  queue: readonly Float64Array[],
  effort: SearchEffort,
  onProgress: MultiStartOptions['onProgress'],
): MultiStartOutcome {
  const { problem, layers } = layered;
  let iterations = 0;
  const run = (from: ArrayLike<number>, start: number, more: LeastSquaresOptions): LeastSquaresOutcome => {
    const outcome = minimise(problem, from, {
      ...more,
      onIteration: (iteration, chi2) =>
        onProgress?.({
          layers,
          start: start + 1,
          starts: queue.length,
          iteration,
          chi2PerReading: chi2 / problem.residuals,
        }),
    });
    iterations += outcome.iterations;
    return outcome;
  };
  const [leader, ...others] = queue
    .map((from, start) => ({ start, outcome: run(from, start, { iterations: effort.shortRun }) }))
    .sort((a, b) => a.outcome.chi2 - b.outcome.chi2);
  const goOn = ({ start, outcome }: Candidate, steps: number): Candidate =>
    outcome.status === 'iteration-limit' && steps > 0
      ? {
          start,
          outcome: run(outcome.parameters, start, { initialDamping: outcome.damping, iterations: steps }),
        }
      : { start, outcome };
  let best = goOn(leader!, effort.carried);
  const ends = [best];
  let idle = 0;
  for (const candidate of others) {
    if (idle >= effort.patience) break;
    const end = goOn(candidate, effort.carried);
    ends.push(end);
    const gain = 1 - end.outcome.chi2 / best.outcome.chi2;
    idle = gain > TOLERANCES.startImprovement ? 0 : idle + 1;
    if (gain > 0) best = end;
  }
  const { outcome } = goOn(best, effort.polish);
  return {
    ...outcome,
    iterations,
    starts: queue.length,
    others: ends.filter((end) => end !== best).map((end) => end.outcome),
  };
}

/**
 * The best of several local fits. Starts: the user's, an even one, the model with one layer fewer with each of its layers
 * split, and the best of many random models. A short run from each sorts them; they are then carried to convergence in
 * that order, until `patience` of them in a row bring no better χ² by 5 % (never because the noise level is reached:
 * that says nothing about a lower one).
 */
export function multiStart(
  layered: LayeredProblem,
  curve: SoundingCurve,
  random: RandomStream,
  options: MultiStartOptions = {},
): MultiStartOutcome {
  const queue = [
    ...(options.userStart ? [logEarth(options.userStart)] : []),
    evenStart(curve, layered.layers),
    ...(options.fewer ? splitStarts(options.fewer, curve) : []),
  ].map(layered.startFrom);
  return search(
    layered,
    [...queue, ...screenedStarts(layered, curve, random, FULL)],
    FULL,
    options.onProgress,
  );
}

/** A quick fit that serves to start the next layer count. */
export function scoutFit(
  layered: LayeredProblem,
  curve: SoundingCurve,
  fewer: Float64Array | undefined,
): MultiStartOutcome {
  const queue = [evenStart(curve, layered.layers), ...(fewer ? splitStarts(fewer, curve) : [])];
  return search(layered, queue.map(layered.startFrom), SCOUT, undefined);
}

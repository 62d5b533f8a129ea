import type { RandomStream } from '../random';
import { TOLERANCES } from '../tolerances';
import type { FitProgress } from '../types';
import { Z95 } from '../uncertainty/parameter-doubt';
import type { LayeredProblem } from './layered-problem';
import type { LeastSquaresOutcome } from './levenberg-marquardt';
import type { Descent, DescentOptions } from './search-descent';
import { randomStart, type SoundingCurve } from './starting-models';

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
  /** most steps of a carried start */
  readonly carried: number;
}

/** For a result that is shown. */
export const FULL: SearchEffort = {
  screened: 200,
  random: 24,
  shortRun: 3,
  patience: 20,
  carried: 40,
};
/** For a layer count beyond those that the readings ask for: beside what the count below grew into, little is tried. */
export const LIGHT: SearchEffort = { screened: 40, random: 4, shortRun: 3, patience: 5, carried: 20 };
/** A carried start has converged once its linearised problem promises a fall of χ² of no more than this × χ². */
const PROMISE = 1e-3;
/** A carried start this close (in ln) to where another ended goes to the same place. */
const SAME_PLACE = 0.2;
/** χ² above the least under which a model is allowed by the readings: it is then kept beside the best. */
const ALLOWED = Z95 * Z95;
/** For a model that only serves to start the next layer count. */
export const SCOUT: SearchEffort = { screened: 0, random: 0, shortRun: 8, patience: 0, carried: 20 };

export type OnProgress = ((progress: FitProgress) => void) | undefined;

/** Tells the progress of the run from one start. */
export const teller = (
  { layers, problem }: LayeredProblem,
  starts: number,
  start: number,
  onProgress: OnProgress,
): ((iteration: number, chi2: number) => void) | undefined =>
  onProgress &&
  ((iteration, chi2) =>
    onProgress({ layers, start: start + 1, starts, iteration, chi2PerReading: chi2 / problem.residuals }));

/** The best of `effort.screened` random models by misfit; only forward runs are spent on them. */
export function screenedStarts(
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

export interface Candidate {
  readonly start: number;
  readonly outcome: LeastSquaresOutcome;
  /** left on its way, so that it stands for no model of its own */
  readonly abandoned: boolean;
}

export interface Found {
  readonly best: Candidate;
  /** where the carried starts ended, in the order in which they were carried */
  readonly ends: readonly Candidate[];
  readonly iterations: number;
}

function samePlace(a: Float64Array, b: Float64Array): boolean {
  for (let j = 0; j < a.length; j++) if (!(Math.abs(a[j]! - b[j]!) < SAME_PLACE)) return false;
  return true;
}

/** True for what cannot come into the 95 % range of the best, or goes where another went: it is not carried to its end. */
function hopeless(parameters: Float64Array, promised: number, best: Candidate, ends: readonly Candidate[]) {
  if (ends.length === 0) return false;
  if (promised > best.outcome.chi2 + ALLOWED) return true;
  for (const end of ends) if (samePlace(parameters, end.outcome.parameters)) return true;
  return false;
}

/**
 * A short run from each start of the queue sorts them; they are then carried on in that order, until `effort.patience` of them in
 * a row bring no better χ² by 5 %.
 */
export function searchFrom(
  queue: readonly Float64Array[],
  layered: LayeredProblem,
  descend: Descent,
  effort: SearchEffort,
  onProgress?: OnProgress,
): Found {
  let iterations = 0;
  const run = (
    from: Float64Array,
    start: number,
    options: Omit<DescentOptions, 'promise' | 'onIteration'>,
  ): LeastSquaresOutcome => {
    const onIteration = teller(layered, queue.length, start, onProgress);
    const outcome = descend(from, { ...options, promise: PROMISE, onIteration });
    iterations += outcome.iterations;
    return outcome;
  };
  const shortRun = { iterations: effort.shortRun };
  const sorted = queue
    .map((from, start): Candidate => ({ start, outcome: run(from, start, shortRun), abandoned: false }))
    .sort((a, b) => a.outcome.chi2 - b.outcome.chi2);
  const ends: Candidate[] = [];
  let best = sorted[0]!;
  let abandoned = false;
  const abandon = (at: Float64Array, promised: number) => (abandoned = hopeless(at, promised, best, ends));
  const carry = (candidate: Candidate): Candidate => {
    const { status, parameters, damping } = candidate.outcome;
    if (status !== 'iteration-limit') return candidate;
    abandoned = false;
    const outcome = run(parameters, candidate.start, {
      initialDamping: damping,
      iterations: effort.carried,
      abandon,
    });
    return { start: candidate.start, outcome, abandoned };
  };
  let idle = 0;
  for (const candidate of sorted) {
    if (ends.length > 0 && idle >= effort.patience) break;
    const end = carry(candidate);
    ends.push(end);
    const gain = 1 - end.outcome.chi2 / best.outcome.chi2;
    idle = gain > TOLERANCES.startImprovement ? 0 : idle + 1;
    if (end.outcome.chi2 <= best.outcome.chi2) best = end;
  }
  return { best, ends, iterations };
}

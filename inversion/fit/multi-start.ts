import type { RandomStream } from '../random';
import { TOLERANCES } from '../tolerances';
import type { FitProgress, LayeredEarth } from '../types';
import { Z95 } from '../uncertainty/parameter-doubt';
import type { LayeredProblem } from './layered-problem';
import { minimise, POLISH_DAMPING, type LeastSquaresOutcome } from './levenberg-marquardt';
import { createDescent, type DescentOptions } from './search-descent';
import {
  evenStart,
  logEarth,
  randomStart,
  sameWithOneMore,
  splitStarts,
  type SoundingCurve,
} from './starting-models';

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
const FULL: SearchEffort = {
  screened: 200,
  random: 24,
  shortRun: 3,
  patience: 20,
  carried: 40,
};
/** For a layer count beyond those that the readings ask for: beside what the count below grew into, little is tried. */
const LIGHT: SearchEffort = { screened: 40, random: 4, shortRun: 3, patience: 5, carried: 20 };
/** A carried start has converged once its linearised problem promises a fall of χ² of no more than this × χ². */
const PROMISE = 1e-3;
/** The best of them is carried on until that is no more than this, before the exact problem takes it over. */
const QUICK_PROMISE = 1e-6;
/** A carried start this close (in ln) to where another ended goes to the same place. */
const SAME_PLACE = 0.2;
/** χ² above the least under which a model is allowed by the readings: it is then kept beside the best. */
const ALLOWED = Z95 * Z95;
/** For a model that only serves to start the next layer count. */
const SCOUT: SearchEffort = { screened: 0, random: 0, shortRun: 8, patience: 0, carried: 20 };

export interface MultiStartOutcome extends LeastSquaresOutcome {
  readonly starts: number;
  /** where the other carried starts ended */
  readonly others: readonly Pick<LeastSquaresOutcome, 'parameters' | 'chi2'>[];
}

export interface MultiStartOptions {
  readonly userStart?: LayeredEarth | undefined;
  /** the same problem over the quick operator, on which the search is made; its best is then carried on with the exact one */
  readonly quick?: LayeredProblem | undefined;
  /** ln parameters of a model with one layer fewer, whose layers are split in turn */
  readonly fewer?: Float64Array | undefined;
  /** all parameters of the best model with one layer fewer: the search ends no worse than that */
  readonly below?: Float64Array | undefined;
  /** true where the readings do not ask for so many layers: what `below` splits into then leads, and little else is tried */
  readonly beyondNoise?: boolean | undefined;
  readonly onProgress?: ((progress: FitProgress) => void) | undefined;
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
  /** left on its way, so that it stands for no model of its own */
  readonly abandoned?: boolean;
}

/** Tells the progress of the run from one start. */
const teller =
  ({ layers, problem }: LayeredProblem, starts: number, onProgress: MultiStartOptions['onProgress']) =>
  (start: number) =>
  (iteration: number, chi2: number): void =>
    onProgress?.({ layers, start: start + 1, starts, iteration, chi2PerReading: chi2 / problem.residuals });

interface Found {
  readonly best: Candidate;
  /** where the carried starts ended, in the order in which they were carried */
  readonly ends: readonly Candidate[];
  readonly iterations: number;
}

function search(
  layered: LayeredProblem,
  queue: readonly Float64Array[],
  effort: SearchEffort,
  onProgress: MultiStartOptions['onProgress'],
): Found {
  let iterations = 0;
  const descend = createDescent(layered.problem);
  const tell = teller(layered, queue.length, onProgress);
  const run = (
    from: ArrayLike<number>,
    start: number,
    more: Partial<DescentOptions>,
  ): LeastSquaresOutcome => {
    const outcome = descend(from, { promise: PROMISE, ...more, onIteration: tell(start) });
    iterations += outcome.iterations;
    return outcome;
  };
  const [leader, ...others] = queue
    .map((from, start) => ({ start, outcome: run(from, start, { iterations: effort.shortRun }) }))
    .sort((a, b) => a.outcome.chi2 - b.outcome.chi2);
  const ends: Candidate[] = [];
  let best = leader!;
  // what cannot come into the 95 % range of the best, or goes where another went, is not carried to its end
  const hopeless = (parameters: Float64Array, promised: number) =>
    ends.length > 0 &&
    (promised > best.outcome.chi2 + ALLOWED ||
      ends.some((end) => parameters.every((p, j) => Math.abs(p - end.outcome.parameters[j]!) < SAME_PLACE)));
  const carry = ({ start, outcome }: Candidate): Candidate => {
    const { status, parameters, damping } = outcome;
    if (status !== 'iteration-limit') return { start, outcome };
    let abandoned = false;
    const outcomeOfMore = run(parameters, start, {
      initialDamping: damping,
      iterations: effort.carried,
      abandon: (at, promised) => (abandoned = hopeless(at, promised)),
    });
    return { start, outcome: outcomeOfMore, abandoned };
  };
  let idle = 0;
  for (const candidate of [leader!, ...others]) {
    if (ends.length > 0 && idle >= effort.patience) break;
    const end = carry(candidate);
    ends.push(end);
    const gain = 1 - end.outcome.chi2 / best.outcome.chi2;
    idle = gain > TOLERANCES.startImprovement ? 0 : idle + 1;
    if (end.outcome.chi2 <= best.outcome.chi2) best = end;
  }
  return { best, ends, iterations };
}

/** The ends of a search, and a model it must not end above, judged by the exact problem; the best is carried to convergence there. */
function polish(
  layered: LayeredProblem,
  quick: LayeredProblem,
  { ends, iterations }: Found,
  least: Float64Array | undefined,
  starts: number,
  onProgress: MultiStartOptions['onProgress'],
): MultiStartOutcome {
  const { problem } = layered;
  const residual = new Float64Array(problem.residuals);
  const judge = (start: number, parameters: Float64Array, damping: number, abandoned = false) => {
    return { start, parameters, damping, abandoned, chi2: problem.evaluate(parameters, residual) };
  };
  const judged = [
    ...ends.map(({ start, abandoned, outcome }) =>
      judge(start, outcome.parameters, outcome.damping, abandoned),
    ),
    ...(least ? [judge(0, least, POLISH_DAMPING, true)] : []),
  ].sort((a, b) => a.chi2 - b.chi2);
  const [best, ...others] = judged;
  const tell = teller(layered, starts, onProgress)(best!.start);
  tell(0, best!.chi2);
  const near = createDescent(quick.problem)(best!.parameters, {
    initialDamping: best!.damping,
    promise: QUICK_PROMISE,
    onIteration: tell,
  });
  // where the quick operator strays, its descent is not followed
  const follow = problem.evaluate(near.parameters, residual) <= best!.chi2;
  const outcome = minimise(problem, follow ? near.parameters : best!.parameters, {
    initialDamping: POLISH_DAMPING,
    onIteration: tell,
  });
  return {
    ...outcome,
    iterations: iterations + outcome.iterations,
    starts,
    others: others.filter((other) => !other.abandoned),
  };
}

/**
 * The best of several local fits. Starts: the user's, an even one, the model with one layer fewer with each of its layers
 * split, and the best of many random models. A short run from each sorts them; they are then carried on in that order, until
 * `patience` of them in a row bring no better χ² by 5 % (never because the noise level is reached: that says nothing about a
 * lower one), and the best is carried to convergence.
 */
export function multiStart(
  layered: LayeredProblem,
  curve: SoundingCurve,
  random: RandomStream,
  options: MultiStartOptions = {},
): MultiStartOutcome {
  const quick = options.quick ?? layered;
  const below = options.below?.subarray(0, 2 * layered.layers - 3);
  const queue = [
    ...(options.userStart ? [logEarth(options.userStart)] : []),
    evenStart(curve, layered.layers),
    ...(options.fewer ? splitStarts(options.fewer, curve) : []),
    ...(below && options.beyondNoise ? splitStarts(below, curve) : []),
  ].map(layered.startFrom);
  const effort = options.beyondNoise ? LIGHT : FULL;
  queue.push(...screenedStarts(quick, curve, random, effort));
  const found = search(quick, queue, effort, options.onProgress);
  const same = below && [...sameWithOneMore(below, curve), ...options.below!.subarray(below.length)];
  return polish(layered, quick, found, same && layered.restrict(same), queue.length, options.onProgress);
}

/** A quick fit that serves to start the next layer count. */
export function scoutFit(
  layered: LayeredProblem,
  curve: SoundingCurve,
  fewer: Float64Array | undefined,
): MultiStartOutcome {
  const queue = [evenStart(curve, layered.layers), ...(fewer ? splitStarts(fewer, curve) : [])].map(
    layered.startFrom,
  );
  const { best, ends, iterations } = search(layered, queue, SCOUT, undefined);
  return {
    ...best.outcome,
    iterations,
    starts: queue.length,
    others: ends.filter((end) => end !== best).map((end) => end.outcome),
  };
}

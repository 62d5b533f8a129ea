import type { RandomStream } from '../random';
import type { LayeredEarth } from '../types';
import type { LayeredProblem } from './layered-problem';
import { minimise, POLISH_DAMPING, type LeastSquaresOutcome } from './levenberg-marquardt';
import { createDescent, type Descent } from './search-descent';
import {
  FULL,
  LIGHT,
  SCOUT,
  screenedStarts,
  searchFrom,
  teller,
  type Found,
  type OnProgress,
} from './start-search';
import { evenStart, logEarth, splitHalfSpace, splitStarts, type SoundingCurve } from './starting-models';

/** The best of them is carried on until that is no more than this, before the exact problem takes it over. */
const QUICK_PROMISE = 1e-6;

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
  readonly onProgress?: OnProgress;
}

/** The ends of a search, and a model it must not end above, judged by the exact problem; the best is carried to convergence there. */
function polish(
  layered: LayeredProblem,
  descend: Descent,
  { ends, iterations }: Found,
  least: Float64Array | undefined,
  starts: number,
  onProgress: OnProgress,
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
  const onIteration = teller(layered, starts, best!.start, onProgress);
  onIteration?.(0, best!.chi2);
  const near = descend(best!.parameters, {
    initialDamping: best!.damping,
    promise: QUICK_PROMISE,
    onIteration,
  });
  // where the quick operator strays, its descent is not followed
  const follow = problem.evaluate(near.parameters, residual) <= best!.chi2;
  const outcome = minimise(problem, follow ? near.parameters : best!.parameters, {
    initialDamping: POLISH_DAMPING,
    onIteration,
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
  const descend = createDescent(quick.problem);
  const found = searchFrom(queue, quick, descend, effort, options.onProgress);
  const same = below && [...splitHalfSpace(below, curve), ...options.below!.subarray(below.length)];
  return polish(layered, descend, found, same && layered.restrict(same), queue.length, options.onProgress);
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
  const { best, ends, iterations } = searchFrom(queue, layered, createDescent(layered.problem), SCOUT);
  return {
    ...best.outcome,
    iterations,
    starts: queue.length,
    others: ends.filter((end) => end !== best).map((end) => end.outcome),
  };
}

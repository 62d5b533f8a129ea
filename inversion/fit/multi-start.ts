import type { RandomStream } from '../random';
import { TOLERANCES } from '../tolerances';
import type { FitProgress, LayeredEarth } from '../types';
import type { LayeredProblem } from './layered-problem';
import { minimise, type LeastSquaresOutcome } from './levenberg-marquardt';
import { evenStart, randomStart, type SoundingCurve } from './starting-models';

/** Random models that are screened by forward runs alone, per start that may be used. */
const SCREENED = 160;
const MOST_STARTS = 16;
/** Starts in a row without a gain of `TOLERANCES.startImprovement` that end the search. */
const PATIENCE = 5;

export interface MultiStartOutcome extends LeastSquaresOutcome {
  readonly starts: number;
}

export interface MultiStartOptions {
  readonly userStart?: LayeredEarth | undefined;
  /** further ln-parameter models to start from, tried first */
  readonly extraStarts?: readonly Float64Array[];
  readonly onProgress?: ((progress: FitProgress) => void) | undefined;
}

function logParameters(earth: LayeredEarth): Float64Array {
  return Float64Array.from([...earth.resistivity, ...earth.thickness], Math.log);
}

/** Random models in ascending order of misfit; only forward runs are spent on them. */
function screenedStarts(
  layered: LayeredProblem,
  curve: SoundingCurve,
  random: RandomStream,
): { start: Float64Array; chi2: number }[] {
  const residual = new Float64Array(layered.problem.residuals);
  return Array.from({ length: SCREENED }, () => {
    const start = layered.restrict(randomStart(curve, layered.layers, random));
    return { start, chi2: layered.problem.evaluate(start, residual) };
  }).sort((a, b) => a.chi2 - b.chi2);
}

/**
 * The best of several local fits: the user's start, the even start, then screened random starts, until `PATIENCE` of
 * them in a row bring no better χ² by 5 % (never because the noise level is reached: that says nothing about a lower one).
 */
export function multiStart(
  layered: LayeredProblem,
  curve: SoundingCurve,
  random: RandomStream,
  options: MultiStartOptions = {},
): MultiStartOutcome {
  const { problem, layers } = layered;
  const first = [
    ...(options.userStart ? [logParameters(options.userStart)] : []),
    ...(options.extraStarts ?? []),
    evenStart(curve, layers),
  ].map(layered.restrict);
  const queue =
    layers === 1 ? first : [...first, ...screenedStarts(layered, curve, random).map((s) => s.start)];
  const most = Math.min(queue.length, Math.max(first.length, MOST_STARTS));
  let best: LeastSquaresOutcome | null = null;
  let iterations = 0;
  let starts = 0;
  let idle = 0;
  while (starts < most && (starts < first.length || idle < PATIENCE)) {
    const start = starts;
    const outcome = minimise(problem, queue[start]!, {
      onIteration: (iteration, chi2) =>
        options.onProgress?.({
          layers,
          start: start + 1,
          starts: most,
          iteration,
          chi2PerReading: chi2 / problem.residuals,
        }),
    });
    starts++;
    iterations += outcome.iterations;
    const gained: boolean = best === null || outcome.chi2 < best.chi2 * (1 - TOLERANCES.startImprovement);
    idle = gained ? 0 : idle + 1;
    if (best === null || outcome.chi2 < best.chi2) best = outcome;
  }
  return { ...best!, iterations, starts };
}

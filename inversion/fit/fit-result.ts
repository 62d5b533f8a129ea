import { ENGINE_VERSION } from '../engine-version';
import { darZarrouk } from '../hydro/dar-zarrouk';
import { geometricFactor } from '../spread/geometric-factor';
import { parameterDoubt, type ParameterDoubt } from '../uncertainty/parameter-doubt';
import type { FitResult, LayeredEarth, FitSettings, FitStatus, LayerCountFit, Reading } from '../types';
import { allowedModels, standsApart, type FittedModel } from './allowed-models';
import { describeShifts } from './branch-shifts';
import { fitWarnings } from './fit-warnings';
import { misfitProbability } from './layer-count';
import type { LayeredProblem } from './layered-problem';
import type { ReadingFit, ResidualSystem } from './residual-system';
import { downWeighted } from './tolerant-residual';

export interface FitResultParts {
  readonly readings: readonly Reading[];
  readonly settings: FitSettings;
  readonly system: ResidualSystem;
  readonly layered: LayeredProblem;
  /** the same problem over the quick operator */
  readonly quick: LayeredProblem;
  readonly best: FittedModel;
  /** where other starts of the same search ended */
  readonly others: readonly FittedModel[];
  /** grounds with one layer fewer, written with this count */
  readonly split: readonly FittedModel[];
  readonly readingFit: ReadingFit;
  readonly status: FitStatus;
  readonly layerCounts: LayerCountFit[] | null;
  readonly oneFewer: FitResult['oneFewer'];
  readonly starts: number;
  readonly iterations: number;
  readonly damping: number;
}

const square = (x: number): number => x * x;

/** rms of predicted/observed − 1 in %. */
export function rmsPercent(predicted: readonly number[], readings: readonly Reading[]): number {
  const sum = readings.reduce(
    (total, reading, i) => total + square(predicted[i]! / reading.apparentResistivity - 1),
    0,
  );
  return 100 * Math.sqrt(sum / readings.length);
}

export function summariseDarZarrouk(earth: LayeredEarth, doubt: ParameterDoubt): FitResult['darZarrouk'] {
  const { conductanceS, resistanceOhmM2, totalConductanceS, totalResistanceOhmM2, anisotropy } =
    darZarrouk(earth);
  const { conductanceFactor, resistanceFactor } = doubt;
  return {
    conductanceS,
    resistanceOhmM2,
    conductanceFactor,
    resistanceFactor,
    totalConductanceS,
    totalResistanceOhmM2,
    anisotropy,
  };
}

/** Residuals of the quick operator that are off by no more than this, in standard errors, tell the ends of intervals. */
const QUICK_ENOUGH = 0.03;

/** The problem whose χ² is followed to the ends of the intervals, and χ² of the best there: the quick one where it is enough. */
function problemForDoubt({ layered, quick, best }: FitResultParts): {
  problem: LayeredProblem;
  chi2: number;
} {
  const at = (problem: LayeredProblem) => {
    const residual = new Float64Array(problem.problem.residuals);
    const chi2 = problem.problem.evaluate(problem.restrict(best.parameters), residual);
    return { problem, residual, chi2 };
  };
  const exact = at(layered);
  const short = at(quick);
  const enough = short.residual.every((r, i) => Math.abs(r - exact.residual[i]!) <= QUICK_ENOUGH);
  return enough ? short : exact;
}

/** Everything a layered fit says about its best model: predictions, residuals, doubt, Maillet's quantities, warnings. */
export function buildFitResult(parts: FitResultParts): FitResult {
  const { readings, settings, system, layered, best, readingFit } = parts;
  const { layers, held } = layered;
  const { predicted, residuals, chi2 } = readingFit;
  const m = readings.length;
  const models = allowedModels(best, parts.others, system, layers, held, settings.fixed);
  const [{ earth, covariance }] = models;
  const followed = problemForDoubt(parts);
  const [, ...split] = allowedModels(best, parts.split, system, layers, held, settings.fixed);
  const doubt = parameterDoubt(models, split, followed.problem, followed.chi2);
  const free = held.filter((isHeld) => !isHeld).length;
  const probability = misfitProbability(chi2, free, m);
  return {
    status: parts.status,
    earth: { resistivity: [...earth.resistivity], thickness: [...earth.thickness] },
    chi2PerReading: chi2 / m,
    rmsPercent: rmsPercent(predicted, readings),
    predicted,
    residuals,
    geometricFactor: readings.map((reading) => geometricFactor(reading.spread)),
    intervals: doubt.intervals,
    factors: doubt.factors,
    correlation: doubt.correlation,
    misfitProbability: probability,
    darZarrouk: summariseDarZarrouk(earth, doubt),
    warnings: fitWarnings({
      readings,
      settings,
      earth,
      held,
      predicted,
      chi2,
      freeParameters: free,
      probability,
      apart: standsApart(models),
    }),
    layerCounts: parts.layerCounts,
    oneFewer: parts.oneFewer,
    reachedTarget: null,
    shifts: describeShifts(system.branches, best.parameters, covariance.deviation),
    downWeighted: settings.outlierTolerant ? downWeighted(residuals) : [],
    starts: parts.starts,
    iterations: parts.iterations,
    damping: parts.damping,
    engine: ENGINE_VERSION,
  };
}

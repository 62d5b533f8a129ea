import { ENGINE_VERSION } from '../engine-version';
import { darZarrouk } from '../hydro/dar-zarrouk';
import { geometricFactor } from '../spread/geometric-factor';
import { parameterDoubt, type ParameterDoubt } from '../uncertainty/parameter-doubt';
import type { EarthModel, FitResult, FitSettings, FitStatus, LayerCountFit, Reading } from '../types';
import { allowedModels, earthOf, standsApart, type FittedModel } from './allowed-models';
import { fitWarnings } from './fit-warnings';
import { misfitProbability } from './layer-count';
import type { ResidualSystem } from './residual-system';

export interface FitResultParts {
  readonly readings: readonly Reading[];
  readonly settings: FitSettings;
  readonly system: ResidualSystem;
  readonly layers: number;
  readonly logParameters: Float64Array;
  /** where other starts of the same search ended */
  readonly others: readonly FittedModel[];
  readonly held: readonly boolean[];
  readonly status: FitStatus;
  readonly layerCounts: LayerCountFit[] | null;
  readonly starts: number;
  readonly iterations: number;
}

/** rms of predicted/observed − 1 in %. */
function rmsPercent(predicted: readonly number[], readings: readonly Reading[]): number {
  const sum = readings.reduce(
    (total, reading, i) => total + (predicted[i]! / reading.apparentResistivity - 1) ** 2,
    0,
  );
  return 100 * Math.sqrt(sum / readings.length);
}

function summariseDarZarrouk(earth: EarthModel, doubt: ParameterDoubt): FitResult['darZarrouk'] {
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

/** Everything a fit says about its best model: predictions, residuals, doubt, Maillet's quantities, warnings. */
export function buildFitResult(parts: FitResultParts): FitResult {
  const { readings, settings, system, layers, logParameters, held } = parts;
  const m = readings.length;
  const earth = earthOf(logParameters, settings.fixed);
  const residual = new Float64Array(m);
  const chi2 = system.evaluate(logParameters, layers, residual);
  const predicted = Array.from(system.operator.predict(earth));
  const models = allowedModels({ logParameters, chi2 }, parts.others, system, held, settings.fixed);
  const doubt = parameterDoubt(models, settings.bounds);
  const free = held.filter((isHeld) => !isHeld).length;
  const probability = misfitProbability(chi2, free, m);
  return {
    status: parts.status,
    earth,
    chi2PerReading: chi2 / m,
    rmsPercent: rmsPercent(predicted, readings),
    predicted,
    residuals: Array.from(residual),
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
    starts: parts.starts,
    iterations: parts.iterations,
    engine: ENGINE_VERSION,
  };
}

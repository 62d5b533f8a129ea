import { earthOf } from '../fit/allowed-models';
import { describeShifts } from '../fit/branch-shifts';
import { rmsPercent, summariseDarZarrouk } from '../fit/fit-result';
import { fitWarnings } from '../fit/fit-warnings';
import { aicc, bic, misfitProbability, withinNoise } from '../fit/layer-count';
import type { LayeredProblem } from '../fit/layered-problem';
import type { ReadingFit } from '../fit/residual-system';
import { downWeighted } from '../fit/tolerant-residual';
import { ENGINE_VERSION } from '../engine-version';
import { geometricFactor } from '../spread/geometric-factor';
import type { FitResult, FitStatus, LayerCountFit } from '../types';
import { placeCovariance, placeDoubt } from './line-doubt';
import type { PlacedSounding } from './line-layout';
import type { LineSettings } from './line-types';

/** One sounding of a line fitted with one count. */
export interface SoundingFit {
  readonly sounding: PlacedSounding;
  readonly layered: LayeredProblem;
  /** ln values then shifts */
  readonly parameters: Float64Array;
  readonly readingFit: ReadingFit;
  /** root of the covariance of its free parameters */
  readonly root: Float64Array;
  /** parameters that its own readings settle: the trace of J P Jᵀ */
  readonly effective: number;
}

/** How a sounding of a line speaks of one count; its parameters are the effective ones. */
export function soundingCount(
  { layered: { layers }, ...fit }: SoundingFit,
  status: FitStatus,
): LayerCountFit {
  const { chi2, residuals } = fit.readingFit;
  const readings = residuals.length;
  return {
    layers,
    status,
    chi2PerReading: chi2 / readings,
    bic: bic(chi2, fit.effective, readings),
    aicc: aicc(chi2, fit.effective, readings),
    withinNoise: withinNoise(chi2, fit.effective, readings),
    chosen: false,
    earth: earthOf(fit.parameters, layers),
  };
}

export interface SoundingResultParts {
  readonly settings: LineSettings;
  readonly status: FitStatus;
  readonly layerCounts: LayerCountFit[] | null;
  readonly starts: number;
  readonly iterations: number;
  readonly damping: number;
}

/** The result of one sounding of a line: what a fit by itself says, with the doubt that the whole line leaves. */
export function soundingResult(fit: SoundingFit, parts: SoundingResultParts): FitResult {
  const { readings, system } = fit.sounding;
  const { layers, held } = fit.layered;
  const { predicted, residuals, chi2 } = fit.readingFit;
  const { settings } = parts;
  const earth = earthOf(fit.parameters, layers, settings.fixed);
  const covariance = placeCovariance(fit.root, held);
  const doubt = placeDoubt(earth, covariance, settings.bounds);
  const probability = misfitProbability(chi2, fit.effective, readings.length);
  return {
    status: parts.status,
    earth,
    chi2PerReading: chi2 / readings.length,
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
      freeParameters: Math.round(fit.effective),
      probability,
      apart: null,
    }),
    layerCounts: parts.layerCounts,
    oneFewer: null,
    reachedTarget: null,
    shifts: describeShifts(system.branches, fit.parameters, covariance.deviation),
    downWeighted: settings.outlierTolerant ? downWeighted(residuals) : [],
    starts: parts.starts,
    iterations: parts.iterations,
    damping: parts.damping,
    engine: ENGINE_VERSION,
  };
}

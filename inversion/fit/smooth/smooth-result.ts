import { ENGINE_VERSION } from '../../engine-version';
import { log } from '../../math/logarithm';
import { geometricFactor } from '../../spread/geometric-factor';
import { TOLERANCES } from '../../tolerances';
import type { FitResult, FitSettings, LayeredEarth } from '../../types';
import { earthOf } from '../allowed-models';
import { describeShifts } from '../branch-shifts';
import { rmsPercent, summariseDarZarrouk } from '../fit-result';
import { fitWarnings } from '../fit-warnings';
import { misfitProbability } from '../layer-count';
import type { LeastSquaresProblem } from '../levenberg-marquardt';
import type { ResidualSystem } from '../residual-system';
import { downWeighted } from '../tolerant-residual';
import type { CellProblem } from './cell-problem';
import { cellCovariance, doubtOfCells } from './smooth-doubt';
import { smoothWarnings, type SmoothWarningInput } from './smooth-warnings';
import type { Balance } from './trade-off';

export interface SmoothResultParts extends Omit<SmoothWarningInput, 'readingFit' | 'cellsAtBound'> {
  readonly settings: FitSettings;
  readonly system: ResidualSystem;
  readonly cell: CellProblem;
  readonly balance: Balance;
  /** the problem whose minimum the balance is */
  readonly problem: LeastSquaresProblem;
  readonly iterations: number;
}

/** Cells whose value the bounds end, from 1. */
function cellsAtBound({ resistivity }: LayeredEarth, { bounds }: FitSettings): number[] {
  return resistivity.flatMap((value, i) =>
    bounds.resistivity.some((bound) => Math.abs(log(value / bound)) <= TOLERANCES.atBound) ? [i + 1] : [],
  );
}

/**
 * Everything a smooth or stepped fit says. `misfitProbability` takes no degrees of freedom off for the cells: χ² was led
 * to its target, so it is improbable only where it would be for a ground that was known.
 */
export function buildSmoothResult(parts: SmoothResultParts): FitResult {
  const { readings, settings, system, cell, balance, reached } = parts;
  const readingFit = cell.describe(balance.free);
  const { predicted, residuals, chi2 } = readingFit;
  const parameters = cell.expand(balance.free);
  const earth = { ...earthOf(parameters, cell.cells), thickness: [...cell.thickness] };
  const covariance = cellCovariance(parts.problem, balance.free);
  const doubt = doubtOfCells(earth, covariance, settings.bounds);
  const probability = misfitProbability(chi2, 0, readings.length);
  const general = fitWarnings({
    readings,
    settings,
    earth,
    // cells on a bound are told together, below
    held: Array.from({ length: 2 * cell.cells - 1 }, () => true),
    predicted,
    chi2,
    freeParameters: 0,
    probability,
    apart: null,
  });
  return {
    status: reached ? 'target-reached' : 'target-out-of-reach',
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
    warnings: [
      ...smoothWarnings({ ...parts, readingFit, cellsAtBound: cellsAtBound(earth, settings) }),
      ...general,
    ],
    layerCounts: null,
    oneFewer: null,
    reachedTarget: reached,
    shifts: describeShifts(system.branches, balance.free, covariance.deviation),
    downWeighted: settings.outlierTolerant ? downWeighted(residuals) : [],
    starts: 1,
    iterations: parts.iterations,
    damping: balance.damping,
    engine: ENGINE_VERSION,
  };
}

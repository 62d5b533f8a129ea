import { useMemo } from 'react';
import type { LayeredEarthModel } from '../../../server/contract/fit';
import type { Run } from '../../../server/contract/runs';
import type { CurveLine } from '../../charts/chart-data';
import { curvePoints, lineOfRun, overReadings, type CurveData } from '../../runs/curve-of-run';
import { misfitOf, type Misfit } from './misfit';
import { useLiveCurve } from './use-live-curve';

export interface BenchCurve {
  lines: readonly CurveLine[];
  chosenLine: string | null;
  /** Of the model that is shown; null before it has been computed. */
  misfit: Pick<Misfit, 'chi2PerReading' | 'rmsPercent'> | null;
  fault: string | null;
}

/** The run's curve, and over it the curve of the model by hand as it is moved. */
export function useBenchCurve(data: CurveData, run: Run | null, hand: LayeredEarthModel | null): BenchCurve {
  const live = useLiveCurve(data.kept, hand);
  return useMemo(() => {
    const runLine = run ? lineOfRun(run) : null;
    const { predicted } = live;
    if (!hand)
      return {
        lines: runLine ? [runLine] : [],
        chosenLine: runLine?.id ?? null,
        misfit: run?.result ?? null,
        fault: null,
      };
    const misfit = predicted?.length === data.kept.length ? misfitOf(predicted, data.kept) : null;
    const handLine: CurveLine | null =
      predicted && misfit
        ? {
            id: 'hand',
            kind: 'hand',
            letter: '',
            name: 'by hand',
            points: curvePoints(data.kept, predicted),
            predicted: overReadings(data, predicted),
            residuals: overReadings(data, misfit.residuals),
          }
        : null;
    return {
      lines: [runLine, handLine].filter((line) => line !== null),
      chosenLine: handLine ? 'hand' : (runLine?.id ?? null),
      misfit,
      fault: live.fault,
    };
  }, [data, run, hand, live]);
}

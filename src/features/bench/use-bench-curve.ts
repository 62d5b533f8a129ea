import { useMemo } from 'react';
import type { Run } from '../../../server/contract/runs';
import type { CurveLine } from '../../charts/chart-data';
import {
  beyondOf,
  curvePoints,
  curveRequest,
  overReadings,
  residualsOf,
  spreadsOf,
  type CurveData,
} from '../../runs/curve-of-run';
import { useRunLines } from '../../runs/use-run-lines';
import { misfitOf, type Misfit } from './misfit';
import { useLiveCurve } from './use-live-curve';
import type { ModelHandle } from './use-model';

export interface BenchCurve {
  lines: readonly CurveLine[];
  chosenLine: string | null;
  /** Of the model that is shown; null before it has been computed. */
  misfit: Pick<Misfit, 'chi2PerReading' | 'rmsPercent'> | null;
  fault: string | null;
}

/** The run's curve, and over it the curve of the model by hand as it is moved. */
export function useBenchCurve(
  data: CurveData,
  run: Run | null,
  { hand, handName }: Pick<ModelHandle, 'hand' | 'handName'>,
): BenchCurve {
  const runs = useMemo(() => (run ? [run] : []), [run]);
  const runLines = useRunLines(runs);
  const request = useMemo(() => curveRequest(data), [data]);
  const spreads = useMemo(
    () => [...data.kept.map((reading) => reading.spread), ...spreadsOf(request)],
    [data, request],
  );
  const live = useLiveCurve(spreads, hand);
  return useMemo(() => {
    if (hand === null)
      return {
        lines: runLines,
        chosenLine: runLines[0]?.id ?? null,
        misfit: run?.result ?? null,
        fault: null,
      };
    const { kept, excluded } = data;
    const isOfThese = live.predicted?.length === spreads.length;
    const predicted = isOfThese ? (live.predicted ?? []).slice(0, kept.length) : null;
    if (predicted === null || live.predicted === null)
      return { lines: runLines, chosenLine: runLines[0]?.id ?? null, misfit: null, fault: live.fault };
    const misfit = misfitOf(predicted, kept);
    const beyond = beyondOf(request, live.predicted.slice(kept.length));
    const handLine: CurveLine = {
      id: 'hand',
      kind: 'hand',
      letter: '',
      name: handName,
      points: beyond.points ?? curvePoints(kept, predicted),
      predicted: overReadings(data, [...predicted, ...beyond.excluded]),
      residuals: overReadings(data, [...misfit.residuals, ...residualsOf(excluded, beyond.excluded)]),
    };
    return { lines: [...runLines, handLine], chosenLine: 'hand', misfit, fault: live.fault };
  }, [data, run, runLines, hand, handName, live, request, spreads]);
}

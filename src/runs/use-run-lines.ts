import { queryOptions, useQueries } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Run } from '../../server/contract/runs';
import type { CurveLine } from '../charts/chart-data';
import { predictCurve } from '../workers/engine';
import {
  beyondOf,
  curveDataOfRun,
  curveRequest,
  lineOfRun,
  spreadsOf,
  type BeyondReadings,
} from './curve-of-run';

/** A run never changes, so neither does its curve. */
const runCurveQuery = (run: Run) =>
  queryOptions({
    queryKey: ['run-curve', run.id, run.result !== null],
    queryFn: async (): Promise<BeyondReadings | null> => {
      const request = curveRequest(curveDataOfRun(run));
      if (!run.result) return null;
      return beyondOf(request, await predictCurve(spreadsOf(request), run.result.earth));
    },
    staleTime: Infinity,
    retry: false,
  });

/** Curves of the runs that have one: straight between the readings at first, then as the engine gives them. */
export function useRunLines(runs: readonly Run[]): CurveLine[] {
  const beyond = useQueries({
    queries: runs.map(runCurveQuery),
    combine: (results) => results.map((result) => result.data ?? null),
  });
  return useMemo(() => runs.flatMap((run, i) => lineOfRun(run, beyond[i] ?? null) ?? []), [runs, beyond]);
}

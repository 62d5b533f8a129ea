import { useEffect, useRef, useState } from 'react';
import type { RunSummary } from '../../../server/contract/runs';
import { hasEnded } from '../../api/run-queries';
import { letterOfRun } from '../../runs/run-title';
import { showToast } from '../../ui/show-toast';

/** Runs asked for at this Bench: each is opened once it has its result, and a failure is told. */
export function useAwaitedRuns(
  runs: readonly RunSummary[],
  onFinished: (run: RunSummary) => void,
): (runId: string) => void {
  const [awaited, setAwaited] = useState<readonly string[]>([]);
  const told = useRef(new Set<string>());
  useEffect(() => {
    const ended = runs.filter(
      (run) => awaited.includes(run.id) && hasEnded(run) && !told.current.has(run.id),
    );
    for (const run of ended) {
      told.current.add(run.id);
      if (run.state === 'finished') onFinished(run);
      if (run.state === 'failed')
        showToast({
          kind: 'bad',
          title: `Run ${letterOfRun(run)} failed`,
          description: run.errorMessage ?? 'No reason was given.',
        });
    }
  }, [runs, awaited, onFinished]);
  return (runId) => setAwaited((ids) => [...ids, runId]);
}

import type { RunSummary } from '../../server/contract/runs';
import { formatDuration } from '../ui/format';
import { letterOfRun } from './run-title';

type Asked = Pick<RunSummary, 'number' | 'computationKey'>;

/** The first run of the sounding that asked the same, before this one did. */
function firstAlike(run: Asked, runs: readonly Asked[]): Asked | undefined {
  return runs
    .filter((other) => other.computationKey === run.computationKey && other.number < run.number)
    .toSorted((a, b) => a.number - b.number)[0];
}

/** The mark of a run whose answer was not computed for it. */
export function cacheWords(run: Asked, runs: readonly Asked[]): string {
  const first = firstAlike(run, runs);
  return first ? `same as run ${letterOfRun(first)}` : 'computed before';
}

/** How a run came by its answer, as a fact of the run. */
export function answerFact(
  run: Asked & Pick<RunSummary, 'fromCache' | 'durationMs' | 'engineVersion'>,
  runs: readonly Asked[],
): { label: string; value: string } {
  const time = run.durationMs === null ? [] : [`in\u00a0${formatDuration(run.durationMs)}`];
  const engine = `engine ${run.engineVersion}`;
  if (!run.fromCache) return { label: 'Computed', value: [...time, engine].join(', ') };
  const first = firstAlike(run, runs);
  const by = first ? `by run ${letterOfRun(first)}` : 'by an earlier computation of the same';
  return {
    label: 'Answered',
    value: [by, ...time.map((words) => `computed there ${words}`), engine].join(', '),
  };
}

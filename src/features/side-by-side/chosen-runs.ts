import type { RunSummary } from '../../../server/contract/runs';
import { isRejected } from '../../runs/rejected-fit';
import { weightOfInterpretation } from '../../runs/run-standing';
import { FEWEST_RUNS, MOST_RUNS } from '../../runs/ticked-runs';

export interface ChosenRuns {
  /** In the order they were chosen. */
  runIds: string[];
  /** The run the reader wants the others held against; null leaves it to `baseOf`. */
  baseId: string | null;
}

/**
 * What the address asks for, as far as it can be shown: known ids, each once, no more than fit. An address that asks for none
 * gets the first two known, the newest; one that asks for an empty list gets that.
 */
export function chosenRuns(search: URLSearchParams, known: readonly string[]): ChosenRuns {
  const named = search.get('runs');
  const asked =
    named === null ? known.slice(0, FEWEST_RUNS) : named.split(',').filter((id) => known.includes(id));
  const runIds = [...new Set(asked)].slice(0, MOST_RUNS);
  const base = search.get('base');
  return { runIds, baseId: base !== null && runIds.includes(base) ? base : null };
}

/**
 * The run the others are held against: the one asked for; else, of those that explain the readings, the one under the
 * weightiest interpretation, then the pinned one, then the closest fit.
 */
export function baseOf({ runIds, baseId }: ChosenRuns, runs: readonly RunSummary[]): string | null {
  if (baseId !== null) return baseId;
  const chosen = runs.filter((run) => runIds.includes(run.id));
  const misfit = (run: RunSummary) => run.outcome?.chi2PerReading ?? Infinity;
  const best = chosen.toSorted(
    (a, b) =>
      Number(isRejected(a.outcome)) - Number(isRejected(b.outcome)) ||
      weightOfInterpretation(a) - weightOfInterpretation(b) ||
      Number(b.note.pinned) - Number(a.note.pinned) ||
      misfit(a) - misfit(b),
  )[0];
  return best?.id ?? null;
}

/** The address of a choice. */
export function searchOf({ runIds, baseId }: ChosenRuns): Record<string, string> {
  return {
    runs: runIds.join(','),
    ...(baseId !== null && runIds.includes(baseId) ? { base: baseId } : {}),
  };
}

export function withRun(chosen: ChosenRuns, runId: string, isChosen: boolean): ChosenRuns {
  const others = chosen.runIds.filter((id) => id !== runId);
  if (!isChosen) return { runIds: others, baseId: chosen.baseId === runId ? null : chosen.baseId };
  return others.length >= MOST_RUNS ? chosen : { ...chosen, runIds: [...others, runId] };
}

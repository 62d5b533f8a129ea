export const FEWEST_RUNS = 2;
export const MOST_RUNS = 6;

export interface ChosenRuns {
  /** In the order they were chosen. */
  runIds: string[];
  /** The run the others are held against. */
  baseId: string | null;
}

/** What the address asks for, as far as it can be shown: known ids, each once, no more than fit. */
export function chosenRuns(search: URLSearchParams, known: ReadonlySet<string>): ChosenRuns {
  const asked = (search.get('runs') ?? '').split(',').filter((id) => known.has(id));
  const runIds = [...new Set(asked)].slice(0, MOST_RUNS);
  const base = search.get('base');
  return { runIds, baseId: base !== null && runIds.includes(base) ? base : (runIds[0] ?? null) };
}

/** The address of a choice; the base is left out where it is the first run anyway. */
export function searchOf({ runIds, baseId }: ChosenRuns): Record<string, string> {
  return {
    ...(runIds.length > 0 ? { runs: runIds.join(',') } : {}),
    ...(baseId !== null && baseId !== runIds[0] && runIds.includes(baseId) ? { base: baseId } : {}),
  };
}

export function withRun(chosen: ChosenRuns, runId: string, isChosen: boolean): ChosenRuns {
  const others = chosen.runIds.filter((id) => id !== runId);
  if (!isChosen)
    return { runIds: others, baseId: chosen.baseId === runId ? (others[0] ?? null) : chosen.baseId };
  return others.length >= MOST_RUNS ? chosen : { ...chosen, runIds: [...others, runId] };
}

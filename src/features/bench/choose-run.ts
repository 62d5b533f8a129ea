import type { RunSummary } from '../../../server/contract/runs';

const isShowable = (run: RunSummary): boolean => run.state === 'finished' && run.outcome !== null;

/** The run asked for by the address; else the pinned one, else the newest that has a result. */
export function chooseRun(runs: readonly RunSummary[], wanted: string | null): RunSummary | null {
  const finished = runs.filter(isShowable);
  return (
    finished.find((run) => run.id === wanted) ??
    finished.find((run) => run.note.pinned) ??
    finished.toSorted((a, b) => b.number - a.number)[0] ??
    null
  );
}

/** Pinned runs first, then newest first. */
export function ledgerOrder(runs: readonly RunSummary[]): RunSummary[] {
  return runs.toSorted((a, b) => Number(b.note.pinned) - Number(a.note.pinned) || b.number - a.number);
}

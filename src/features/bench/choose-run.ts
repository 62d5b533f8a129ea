import type { RunSummary } from '../../../server/contract/runs';
import { byStanding, isShowable } from '../../runs/run-standing';

/** The run asked for by the address; else the one that stands for the sounding. */
export function chooseRun(runs: readonly RunSummary[], wanted: string | null): RunSummary | null {
  const finished = runs.filter(isShowable);
  return finished.find((run) => run.id === wanted) ?? finished.toSorted(byStanding)[0] ?? null;
}

/** Pinned runs first, then newest first. */
export function ledgerOrder(runs: readonly RunSummary[]): RunSummary[] {
  return runs.toSorted((a, b) => Number(b.note.pinned) - Number(a.note.pinned) || b.number - a.number);
}

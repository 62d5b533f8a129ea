import { STANDING_STATES } from '../../server/contract/interpretations';
import type { RunSummary } from '../../server/contract/runs';

/** A run that has a result to show. */
export const isShowable = (run: RunSummary): boolean => run.state === 'finished' && run.outcome !== null;

/** 0 = the weightiest interpretation stands on it; larger = lighter; the largest = none does. */
export function weightOfInterpretation(run: Pick<RunSummary, 'interpretedAs'>): number {
  return run.interpretedAs === null ? STANDING_STATES.length : STANDING_STATES.indexOf(run.interpretedAs);
}

/** A smooth or stepped ground has cells of a fixed grid, which are no beds. */
export const hasBeds = ({ settings }: Pick<RunSummary, 'settings'>): boolean => settings.kind === 'layered';

/** What stands for the sounding first: the pinned run, then by its interpretation, then one that has beds, then the newest. */
export function byStanding(first: RunSummary, second: RunSummary): number {
  return (
    Number(second.note.pinned) - Number(first.note.pinned) ||
    weightOfInterpretation(first) - weightOfInterpretation(second) ||
    Number(hasBeds(second)) - Number(hasBeds(first)) ||
    second.number - first.number
  );
}

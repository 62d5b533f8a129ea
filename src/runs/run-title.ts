import { runLetter } from '../../server/contract/run-letter';
import type { RunSummary } from '../../server/contract/runs';
import { formatCount } from '../ui/format';

export const letterOfRun = (run: Pick<RunSummary, 'number'>): string => runLetter(run.number);

export function bedCount(count: number): string {
  return formatCount(count, 'bed');
}

/** The beds a run ended with, or was asked for: "4 beds", "4 beds, count found"; of many cells their kind: "smooth ground". */
export function describeBeds(run: Pick<RunSummary, 'settings' | 'outcome'>): string {
  if (run.settings.kind !== 'layered') return `${run.settings.kind} ground`;
  const asked = run.settings.layers;
  const found = run.outcome?.earth.resistivity.length;
  if (asked === 'auto') return found === undefined ? 'finding the count' : `${bedCount(found)}, count found`;
  return bedCount(found ?? asked);
}

/** What a run is, in a few words: its own label, or its beds and what was held. */
export function titleOfRun(run: Pick<RunSummary, 'settings' | 'outcome' | 'note'>): string {
  if (run.note.label !== '') return run.note.label;
  const held = run.settings.fixed.length;
  return held === 0 ? describeBeds(run) : `${describeBeds(run)}, ${formatCount(held, 'value')} held`;
}

import { runLetter } from '../../server/contract/run-letter';
import type { RunSummary } from '../../server/contract/runs';
import { formatCount } from '../ui/format';

export const letterOfRun = (run: Pick<RunSummary, 'number'>): string => runLetter(run.number);

export function bedCount(count: number): string {
  return formatCount(count, 'bed');
}

/** The kinds of ground that have cells, each by its one name. */
export const GROUND_NAMES = { smooth: 'smooth', stepped: 'few steps' } as const;

/** The beds a run ended with, or was asked for: "4 beds", "4 beds, count found"; of many cells: "few steps, 24 cells". */
export function describeBeds(run: Pick<RunSummary, 'settings' | 'outcome'>): string {
  const { kind, layers: asked } = run.settings;
  const found = run.outcome?.earth.resistivity.length;
  if (kind !== 'layered')
    return found === undefined ? GROUND_NAMES[kind] : `${GROUND_NAMES[kind]}, ${formatCount(found, 'cell')}`;
  if (asked === 'auto') return found === undefined ? 'finding the count' : `${bedCount(found)}, count found`;
  return bedCount(found ?? asked);
}

/** What a run is, in a few words: its own label, or its beds and what was held. */
export function titleOfRun(run: Pick<RunSummary, 'settings' | 'outcome' | 'note'>): string {
  if (run.note.label !== '') return run.note.label;
  const held = run.settings.fixed.length;
  return held === 0 ? describeBeds(run) : `${describeBeds(run)}, ${formatCount(held, 'value')} held`;
}

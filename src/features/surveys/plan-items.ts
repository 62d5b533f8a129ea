import type { SoundingRow, SoundingState } from '../../../server/contract/soundings';
import type { Borehole } from '../../../server/contract/surveys';
import { addressOf } from '../../app/addresses';

interface PlanPlace {
  id: string;
  name: string;
  xM: number;
  yM: number;
  lineName: string | null;
  to: string;
}
export type PlanItem = PlanPlace & ({ kind: 'sounding'; state: SoundingState } | { kind: 'borehole' });

/** Everything that has a position, and how much has none. */
export function planItems(
  surveyId: string,
  soundings: readonly SoundingRow[],
  boreholes: readonly Borehole[],
): { items: PlanItem[]; unplaced: number } {
  const items: PlanItem[] = [];
  for (const { id, name, xM, yM, lineName, state } of soundings) {
    if (xM === null || yM === null) continue;
    const to = addressOf(state === 'no-readings' ? 'readings' : 'bench', { soundingId: id });
    items.push({ kind: 'sounding', id, name, xM, yM, lineName, state, to });
  }
  for (const { id, name, xM, yM } of boreholes) {
    if (xM === null || yM === null) continue;
    const to = `${addressOf('surveyBoreholes', { surveyId })}#${id}`;
    items.push({ kind: 'borehole', id, name, xM, yM, lineName: null, to });
  }
  return { items, unplaced: soundings.length + boreholes.length - items.length };
}

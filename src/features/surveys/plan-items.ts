import type { SoundingRow, SoundingState } from '../../../server/contract/soundings';
import type { Borehole } from '../../../server/contract/surveys';
import {
  lookOf,
  SOUNDING_STATE_LOOK,
  SOUNDING_STATES,
  type SoundingStateLook,
} from '../../soundings/sounding-state-look';
import { addressOf } from '../../app/addresses';

interface PlanPlace {
  id: string;
  name: string;
  xM: number;
  yM: number;
  lineName: string | null;
  to: string;
}
export type PlanItem = PlanPlace &
  ({ kind: 'sounding'; state: SoundingState; look: SoundingStateLook } | { kind: 'borehole' });

/** Everything that has a position, and how much has none. */
export function planItems(
  surveyId: string,
  soundings: readonly SoundingRow[],
  boreholes: readonly Borehole[],
): { items: PlanItem[]; unplaced: number } {
  const items: PlanItem[] = [];
  for (const sounding of soundings) {
    const { id, name, xM, yM, lineName, state } = sounding;
    if (xM === null || yM === null) continue;
    const to = addressOf(state === 'no-readings' ? 'readings' : 'bench', { soundingId: id });
    items.push({ kind: 'sounding', id, name, xM, yM, lineName, state, look: lookOf(sounding), to });
  }
  for (const { id, name, xM, yM } of boreholes) {
    if (xM === null || yM === null) continue;
    const to = `${addressOf('surveyBoreholes', { surveyId })}#${id}`;
    items.push({ kind: 'borehole', id, name, xM, yM, lineName: null, to });
  }
  return { items, unplaced: soundings.length + boreholes.length - items.length };
}

export interface PlanCount {
  state: SoundingState;
  look: SoundingStateLook;
  count: number;
}

/** How many soundings bear each mark, from the first state to the last. */
export function planCounts(items: readonly PlanItem[]): PlanCount[] {
  const counts = new Map<SoundingStateLook, PlanCount>();
  for (const item of items) {
    if (item.kind === 'borehole') continue;
    const { state, look } = item;
    counts.set(look, { state, look, count: (counts.get(look)?.count ?? 0) + 1 });
  }
  const place = ({ state }: PlanCount): number => SOUNDING_STATES.indexOf(state);
  return [...counts.values()].toSorted(
    (a, b) =>
      place(a) - place(b) ||
      Number(b.look === SOUNDING_STATE_LOOK[b.state]) - Number(a.look === SOUNDING_STATE_LOOK[a.state]),
  );
}

import { create } from 'zustand';
import { addressOf } from '../app/addresses';

/** How many runs Side by side sets against one another. */
export const FEWEST_RUNS = 2;
export const MOST_RUNS = 6;

interface TickedRunsStore {
  soundings: Record<string, readonly string[]>;
  tick: (soundingId: string, runIds: readonly string[]) => void;
}

/** The runs ticked for Side by side, by sounding, in the order of their ticks; kept from page to page. */
export const useTickedRuns = create<TickedRunsStore>((set) => ({
  soundings: {},
  tick: (soundingId, runIds) =>
    set(({ soundings }) => ({ soundings: { ...soundings, [soundingId]: runIds } })),
}));

const NONE: readonly string[] = [];

export const tickedRuns = ({ soundings }: Pick<TickedRunsStore, 'soundings'>, soundingId: string) =>
  soundings[soundingId] ?? NONE;

/** Side by side with the runs that are ticked; with too few of them it chooses its own. */
export function sideBySideAddress(soundingId: string, runIds: readonly string[]): string {
  const address = addressOf('sideBySide', { soundingId });
  return runIds.length < FEWEST_RUNS ? address : `${address}?runs=${encodeURIComponent(runIds.join(','))}`;
}

import { create } from 'zustand';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import { sameEarth, type ModelValue } from './hand-model';

/** One sounding's model by hand. Null stands for what the shown run has: its model, its held values. */
export interface HandState {
  earth: LayeredEarthModel | null;
  /** Values held in the next fit, as "resistivity 0". */
  held: readonly string[] | null;
  /** Where the model comes from while it stands untouched; absent for one made by hand. */
  name?: string;
}

interface HandHistory {
  now: HandState;
  past: readonly HandState[];
  future: readonly HandState[];
  gesture: string | null;
}

interface HandModelStore {
  soundings: Record<string, HandHistory>;
  /** A first model, where no run is there to take one from. */
  begin: (soundingId: string, earth: LayeredEarthModel) => void;
  /** From the model that was shown to the one wanted; edits of one gesture (one drag) are undone as one. */
  edit: (soundingId: string, from: LayeredEarthModel, to: LayeredEarthModel, gesture?: string) => void;
  /** A model that was computed, to look at and to go on from. */
  lookAt: (soundingId: string, earth: LayeredEarthModel, name: string) => void;
  hold: (soundingId: string, held: readonly string[]) => void;
  /** Back to the run's own model, or on to another run: undone like any other edit. */
  takeUpRun: (soundingId: string) => void;
  undo: (soundingId: string) => void;
  redo: (soundingId: string) => void;
}

const MAX_HISTORY = 200;
const UNTOUCHED: HandState = { earth: null, held: null };
const EMPTY: HandHistory = { now: UNTOUCHED, past: [], future: [], gesture: null };

export const heldKey = ({ on, index }: ModelValue): string => `${on} ${index}`;

export const historyOf = (store: Pick<HandModelStore, 'soundings'>, soundingId: string): HandHistory =>
  store.soundings[soundingId] ?? EMPTY;

function advance(history: HandHistory, now: HandState, gesture: string | null = null): HandHistory {
  const goesOn = gesture !== null && gesture === history.gesture;
  const past = goesOn ? history.past : [...history.past, history.now].slice(-MAX_HISTORY);
  return { now, past, future: [], gesture };
}

function stepBack(history: HandHistory): HandHistory {
  const before = history.past.at(-1);
  if (!before) return history;
  const future = [history.now, ...history.future];
  return { now: before, past: history.past.slice(0, -1), future, gesture: null };
}

function stepForward(history: HandHistory): HandHistory {
  const [next, ...future] = history.future;
  return next ? { now: next, past: [...history.past, history.now], future, gesture: null } : history;
}

/** What was held keeps its meaning only while the count of beds stays. */
const heldAfter = (before: HandState, from: LayeredEarthModel, to: LayeredEarthModel) =>
  from.resistivity.length === to.resistivity.length ? before.held : [];

export const useHandModelStore = create<HandModelStore>()((set) => {
  const change = (soundingId: string, step: (history: HandHistory) => HandHistory) =>
    set((store) => ({
      soundings: { ...store.soundings, [soundingId]: step(historyOf(store, soundingId)) },
    }));
  return {
    soundings: {},
    begin: (soundingId, earth) => change(soundingId, (history) => advance(history, { earth, held: null })),
    edit: (soundingId, from, to, gesture) =>
      change(soundingId, (history) =>
        sameEarth(from, to)
          ? history
          : advance(history, { earth: to, held: heldAfter(history.now, from, to) }, gesture),
      ),
    lookAt: (soundingId, earth, name) =>
      change(soundingId, (history) => advance(history, { earth, held: [], name })),
    hold: (soundingId, held) => change(soundingId, (history) => advance(history, { ...history.now, held })),
    takeUpRun: (soundingId) =>
      change(soundingId, (history) =>
        history.now.earth === null && history.now.held === null ? history : advance(history, UNTOUCHED),
      ),
    undo: (soundingId) => change(soundingId, stepBack),
    redo: (soundingId) => change(soundingId, stepForward),
  };
});

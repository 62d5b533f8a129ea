import { create } from 'zustand';
import type { LayeredEarthModel } from '../../../server/contract/fit';
import { sameEarth, type ModelValue } from './hand-model';

/** One sounding's model by hand. `earth` null = the run's own model is shown untouched. */
export interface HandState {
  earth: LayeredEarthModel | null;
  /** Values held in the next fit, as "resistivity 0". */
  held: readonly string[];
}

interface HandHistory {
  now: HandState;
  past: readonly HandState[];
  future: readonly HandState[];
  gesture: string | null;
}

interface HandModelStore {
  soundings: Record<string, HandHistory>;
  /** From the model that was shown to the one wanted; edits of one gesture (one drag) are undone as one. */
  edit: (soundingId: string, from: LayeredEarthModel, to: LayeredEarthModel, gesture?: string) => void;
  hold: (soundingId: string, value: ModelValue, held: boolean) => void;
  undo: (soundingId: string) => void;
  redo: (soundingId: string) => void;
  /** Back to the run: undone like any other edit. */
  discard: (soundingId: string) => void;
  /** Lets every held value go, as when another run is taken up. */
  releaseAll: (soundingId: string) => void;
}

const MAX_HISTORY = 200;
const EMPTY: HandHistory = { now: { earth: null, held: [] }, past: [], future: [], gesture: null };

export const heldKey = ({ on, index }: ModelValue): string => `${on} ${index}`;

export const historyOf = (store: Pick<HandModelStore, 'soundings'>, soundingId: string): HandHistory =>
  store.soundings[soundingId] ?? EMPTY;

function advance(history: HandHistory, now: HandState, gesture: string | null): HandHistory {
  const goesOn = gesture !== null && gesture === history.gesture;
  const past = goesOn ? history.past : [...history.past, history.now].slice(-MAX_HISTORY);
  return { now, past, future: [], gesture };
}

function stepBack(history: HandHistory): HandHistory {
  const before = history.past.at(-1);
  if (!before) return history;
  return {
    now: before,
    past: history.past.slice(0, -1),
    future: [history.now, ...history.future],
    gesture: null,
  };
}

function stepForward(history: HandHistory): HandHistory {
  const [next, ...future] = history.future;
  return next ? { now: next, past: [...history.past, history.now], future, gesture: null } : history;
}

/** What was held keeps its meaning only while the count of beds stays. */
const heldAfter = (before: HandState, from: LayeredEarthModel, to: LayeredEarthModel): readonly string[] =>
  from.resistivity.length === to.resistivity.length ? before.held : [];

export const useHandModelStore = create<HandModelStore>()((set) => {
  const change = (soundingId: string, step: (history: HandHistory) => HandHistory) =>
    set((store) => ({
      soundings: { ...store.soundings, [soundingId]: step(historyOf(store, soundingId)) },
    }));
  return {
    soundings: {},
    edit: (soundingId, from, to, gesture) =>
      change(soundingId, (history) =>
        sameEarth(from, to)
          ? history
          : advance(history, { earth: to, held: heldAfter(history.now, from, to) }, gesture ?? null),
      ),
    hold: (soundingId, value, held) =>
      change(soundingId, (history) => {
        const others = history.now.held.filter((key) => key !== heldKey(value));
        const next = held ? [...others, heldKey(value)] : others;
        return advance(history, { ...history.now, held: next }, null);
      }),
    undo: (soundingId) => change(soundingId, stepBack),
    redo: (soundingId) => change(soundingId, stepForward),
    discard: (soundingId) =>
      change(soundingId, (history) =>
        history.now.earth === null
          ? history
          : advance(history, { earth: null, held: history.now.held }, null),
      ),
    releaseAll: (soundingId) =>
      change(soundingId, (history) =>
        history.now.held.length === 0 ? history : advance(history, { ...history.now, held: [] }, null),
      ),
  };
});

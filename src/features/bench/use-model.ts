import { useCallback } from 'react';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import type { Run } from '../../../server/contract/runs';
import type { ModelValue } from './hand-model';
import { heldKey, historyOf, useHandModelStore } from './hand-model-store';

export interface ModelHandle {
  /** What is drawn: the hand model where there is one, else the run's. */
  earth: LayeredEarthModel | null;
  /** The model by hand; null while the run's own is shown. */
  hand: LayeredEarthModel | null;
  /** What the model by hand is, as "5 beds, from the ladder". */
  handName: string;
  /** The model was computed, and is looked at as it stands in a ladder. */
  isFromLadder: boolean;
  held: readonly string[];
  canUndo: boolean;
  canRedo: boolean;
  edit: (next: LayeredEarthModel, gesture?: string) => void;
  /** Puts a computed model on the Bench, under its name until it is changed. */
  lookAt: (earth: LayeredEarthModel, name: string) => void;
  setHeld: (value: ModelValue, isHeld: boolean) => void;
  releaseAll: () => void;
  /** Puts a first model down where no run is there; null where the readings give none. */
  begin: (() => void) | null;
  takeUpRun: () => void;
  undo: () => void;
  redo: () => void;
}

/** The model on the Bench and what can be done to it. `fallback` is begun with where no run is there yet. */
export function useModel(
  soundingId: string,
  run: Run | null,
  fallback: LayeredEarthModel | null,
): ModelHandle {
  const history = useHandModelStore((store) => historyOf(store, soundingId));
  const store = useHandModelStore.getState();
  const hand = history.now.earth;
  const earth = hand ?? run?.result?.earth ?? null;
  const held = history.now.held ?? (run ? run.settings.fixed.map(heldKey) : []);
  const takeUpRun = useCallback(() => useHandModelStore.getState().takeUpRun(soundingId), [soundingId]);
  return {
    earth,
    hand,
    handName: history.now.name ?? 'by hand',
    isFromLadder: history.now.name !== undefined,
    held,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    edit: (next, gesture) => earth && store.edit(soundingId, earth, next, gesture),
    lookAt: (next, name) => store.lookAt(soundingId, next, name),
    setHeld: (value, isHeld) => {
      const others = held.filter((key) => key !== heldKey(value));
      store.hold(soundingId, isHeld ? [...others, heldKey(value)] : others);
    },
    releaseAll: () => store.hold(soundingId, []),
    begin: fallback && (() => store.begin(soundingId, fallback)),
    takeUpRun,
    undo: () => store.undo(soundingId),
    redo: () => store.redo(soundingId),
  };
}

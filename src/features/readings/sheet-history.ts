import type { SheetRow, SheetUnits } from '../../../server/contract/readings';

export interface SheetContent {
  rows: readonly SheetRow[];
  units: SheetUnits;
}

export interface SheetHistory {
  past: readonly SheetContent[];
  present: SheetContent;
  future: readonly SheetContent[];
  /** Keystrokes with the same mark are one step of undo. */
  mark: string | null;
}

export type SheetAction =
  { type: 'edit'; content: SheetContent; mark?: string | null } | { type: 'undo' } | { type: 'redo' };

const MOST_STEPS = 200;

export const startHistory = (present: SheetContent): SheetHistory => ({
  past: [],
  present,
  future: [],
  mark: null,
});

export function sheetReducer(history: SheetHistory, action: SheetAction): SheetHistory {
  const { past, present, future } = history;
  if (action.type === 'undo') {
    const before = past.at(-1);
    return before
      ? { past: past.slice(0, -1), present: before, future: [present, ...future], mark: null }
      : history;
  }
  if (action.type === 'redo') {
    const [after, ...later] = future;
    return after ? { past: [...past, present], present: after, future: later, mark: null } : history;
  }
  const mark = action.mark ?? null;
  const joinsLast = mark !== null && mark === history.mark;
  return {
    past: joinsLast ? past : [...past, present].slice(-MOST_STEPS),
    present: action.content,
    future: [],
    mark,
  };
}

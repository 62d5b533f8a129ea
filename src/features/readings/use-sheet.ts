import { useMemo, useReducer, useState } from 'react';
import type { FieldSheet } from '../../../server/contract/readings';
import type { Sounding } from '../../../server/contract/soundings';
import type { Draft, DraftKeeper } from './draft-keeper';
import { sheetReducer, startHistory, type SheetContent } from './sheet-history';
import { createSheetReader } from './sheet-reader';
import { trimRows } from './sheet-rows';
import { startSheet } from './start-sheet';

/** The sheet being written: its rows with undo, what they mean, and the draft that follows each change. */
export function useSheet(sounding: Sounding, fieldSheet: FieldSheet, keeper: DraftKeeper) {
  const [start] = useState(() => startSheet(fieldSheet, keeper.readLocal()));
  const [history, dispatch] = useReducer(sheetReducer, start.content, startHistory);
  const [base, setBase] = useState(start.baseRevisionId);
  const [saved, setSaved] = useState<SheetContent | null>(
    start.origin === 'revision' || start.origin === 'empty' ? start.content : null,
  );
  const { present, past, future } = history;
  const { spreadType, errorFloor } = sounding;
  const read = useMemo(
    () => createSheetReader(spreadType, present.units, errorFloor),
    [spreadType, present.units, errorFloor],
  );
  const sheet = useMemo(() => read(present.rows), [read, present.rows]);
  const keep = (content: SheetContent, baseRevisionId = base) =>
    keeper.change({ rows: trimRows(content.rows), units: content.units, baseRevisionId });
  const edit = (content: SheetContent, mark: string | null = null) => {
    dispatch({ type: 'edit', content, mark });
    keep(content);
  };
  const step = (type: 'undo' | 'redo', content: SheetContent | undefined) => {
    if (!content) return;
    dispatch({ type });
    keep(content);
  };
  const draft: Draft = { rows: trimRows(present.rows), units: present.units, baseRevisionId: base };
  return {
    content: present,
    sheet,
    draft,
    baseRevisionId: base,
    origin: start.origin,
    isChanged: present !== saved,
    canUndo: past.length > 0,
    canRedo: future.length > 0,
    edit,
    undo: () => step('undo', past.at(-1)),
    redo: () => step('redo', future[0]),
    /** The content now on the sheet is what the revision holds. */
    markSaved: (revisionId: string | null, content: SheetContent = present) => {
      setBase(revisionId);
      setSaved(content);
    },
    /** Shows other content, as one step that can be undone. */
    replace: (content: SheetContent, baseRevisionId: string | null) => {
      dispatch({ type: 'edit', content });
      setBase(baseRevisionId);
    },
  };
}

export type Sheet = ReturnType<typeof useSheet>;

import { useCallback, type RefObject } from 'react';
import type { GridColumn } from './sheet-rows';

export interface CellPlace {
  row: number;
  column: GridColumn;
}

export const cellId = ({ row, column }: CellPlace): string => `${row}:${column}`;

const MOST_TRIES = 10;

/** Puts the cursor into a cell, after bringing its row into the part of the sheet that is drawn. */
export function useGridFocus(frame: RefObject<HTMLElement | null>, scrollToRow: (row: number) => void) {
  return useCallback(
    (place: CellPlace) => {
      scrollToRow(place.row);
      const attempt = (triesLeft: number) => {
        const cell = frame.current?.querySelector<HTMLInputElement>(`[data-cell="${cellId(place)}"]`);
        if (cell) {
          cell.focus();
          if (cell.type === 'text') cell.select();
        } else if (triesLeft > 0) requestAnimationFrame(() => attempt(triesLeft - 1));
      };
      attempt(MOST_TRIES);
    },
    [frame, scrollToRow],
  );
}

import type { KeyboardEvent } from 'react';

export type CellMove = { rows: number; columns: number };

/** Where a key leads from a cell, or null where the key belongs to the text in it. */
export function cellMove(event: KeyboardEvent<HTMLInputElement>): CellMove | null {
  const { key, shiftKey, ctrlKey, metaKey, altKey } = event;
  if (ctrlKey || metaKey || altKey) return null;
  if (key === 'Enter') return { rows: shiftKey ? -1 : 1, columns: 0 };
  if (shiftKey) return null;
  if (key === 'ArrowDown') return { rows: 1, columns: 0 };
  if (key === 'ArrowUp') return { rows: -1, columns: 0 };
  const { value, selectionStart, selectionEnd } = event.currentTarget;
  const isWhole = selectionStart === 0 && selectionEnd === value.length;
  if (key === 'ArrowLeft' && (isWhole || (selectionStart === 0 && selectionEnd === 0)))
    return { rows: 0, columns: -1 };
  if (key === 'ArrowRight' && (isWhole || (selectionStart === value.length && selectionEnd === value.length)))
    return { rows: 0, columns: 1 };
  return null;
}

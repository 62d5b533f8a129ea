import { isBlankRow } from '../../../server/contract/field-sheet';
import type { SheetColumn, SheetRow } from '../../../server/contract/readings';

/** Columns a person writes in; "excluded" holds the reason for leaving a reading out. */
export type GridColumn = SheetColumn | 'excluded';

export const MOST_ROWS = 5000;
const LEAST_ROWS = 8;

export const blankRow = (): SheetRow => ({ cells: {}, excluded: null });

export const cellOf = (row: SheetRow, column: GridColumn): string =>
  column === 'excluded' ? (row.excluded ?? '') : (row.cells[column] ?? '');

/** The row with another text in one cell. An emptied cell is absent; an emptied reason stays, for the box is still ticked. */
export function withCell(row: SheetRow, column: GridColumn, text: string): SheetRow {
  if (column === 'excluded') return { ...row, excluded: text };
  const { [column]: _replaced, ...others } = row.cells;
  return { ...row, cells: text === '' ? others : { ...others, [column]: text } };
}

export const withExcluded = (row: SheetRow, excluded: string | null): SheetRow => ({ ...row, excluded });

const replaced = <T>(items: readonly T[], index: number, item: T): T[] =>
  items.map((old, i) => (i === index ? item : old));

export const setRow = (rows: readonly SheetRow[], index: number, row: SheetRow): SheetRow[] =>
  padRows(replaced(rows, index, row));

export const insertRow = (rows: readonly SheetRow[], index: number): SheetRow[] =>
  rows.length >= MOST_ROWS ? [...rows] : padRows(rows.toSpliced(index, 0, blankRow()));

export const removeRow = (rows: readonly SheetRow[], index: number): SheetRow[] =>
  padRows(rows.toSpliced(index, 1));

/** Always one empty row to write the next reading in, and never fewer than a handful. */
export function padRows(rows: readonly SheetRow[]): SheetRow[] {
  const padded = [...rows];
  while (padded.length < LEAST_ROWS) padded.push(blankRow());
  const last = padded.at(-1);
  if (last && !isBlankRow(last) && padded.length < MOST_ROWS) padded.push(blankRow());
  return padded;
}

/** The rows without the empty ones at the end, as they are sent. */
export function trimRows(rows: readonly SheetRow[]): SheetRow[] {
  const end = rows.findLastIndex((row) => !isBlankRow(row) || row.excluded !== null);
  return rows.slice(0, end + 1);
}

/** Writes a block of texts from one cell on, to the right and down; what does not fit to the right is left off. */
export function pasteBlock(
  rows: readonly SheetRow[],
  at: { row: number; column: GridColumn },
  block: readonly (readonly string[])[],
  columns: readonly GridColumn[],
): SheetRow[] {
  const first = columns.indexOf(at.column);
  const next = [...rows];
  block.forEach((texts, i) => {
    const index = at.row + i;
    if (index >= MOST_ROWS) return;
    while (next.length <= index) next.push(blankRow());
    let row = next[index] ?? blankRow();
    texts.forEach((text, j) => {
      const column = columns[first + j];
      if (column === undefined) return;
      row =
        column === 'excluded' && text.trim() === ''
          ? withExcluded(row, null)
          : withCell(row, column, text.trim());
    });
    next[index] = row;
  });
  return padRows(next);
}

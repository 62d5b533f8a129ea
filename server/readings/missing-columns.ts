import { SPACING_COLUMNS, type SheetColumn } from '../contract/readings';
import { SHEET_COLUMN_NAMES } from '../contract/sheet-columns';
import type { SpreadType } from '../contract/spread';

/** Names of the columns that a sheet of this spread needs and that nothing is mapped to. */
export function missingColumns(columns: readonly (SheetColumn | null)[], spreadType: SpreadType): string[] {
  const has = (column: SheetColumn): boolean => columns.includes(column);
  const missing = SPACING_COLUMNS[spreadType]
    .filter((column) => !has(column) && isNeeded(column, has))
    .map((column) => SHEET_COLUMN_NAMES[column]);
  const hasValue = (has('voltage') && has('current')) || has('resistance') || has('apparentResistivity');
  return hasValue ? missing : [...missing, 'V and I, or R, or ρa'];
}

function isNeeded(column: SheetColumn, has: (column: SheetColumn) => boolean): boolean {
  // an old sheet without MN serves when it says ρa
  if (column === 'halfMN') return !has('apparentResistivity');
  // an electrode at infinity has no column at all
  if (column === 'bm') return has('bn');
  if (column === 'bn') return has('bm');
  if (column === 'an') return has('bn');
  return true;
}

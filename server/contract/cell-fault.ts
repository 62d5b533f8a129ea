import type { RowFault, SheetColumn } from './readings';

/** A fault of one row, before the row has a number. */
export interface CellFault extends Omit<RowFault, 'row' | 'column'> {
  /** 'row' = the row as a whole */
  readonly column: SheetColumn | 'excluded' | 'row';
}

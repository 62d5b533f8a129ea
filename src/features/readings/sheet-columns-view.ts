import type { SheetUnits } from '../../../server/contract/readings';
import { columnUnit, SHEET_COLUMN_NAMES, sheetColumnsOf } from '../../../server/contract/sheet-columns';
import type { SpreadType } from '../../../server/contract/spread';
import type { GridColumn } from './sheet-rows';

/** Columns one writes in, in the order of a crew's sheet; the reason for leaving out and the remark stand last. */
export const gridColumns = (spreadType: SpreadType): GridColumn[] => [
  ...sheetColumnsOf(spreadType).filter((column) => column !== 'remark'),
  'excluded',
  'remark',
];

/** What a column is called on this sheet; the current electrode of a half-spread stands at AO. */
export function gridColumnName(column: GridColumn, spreadType: SpreadType): string {
  if (column === 'excluded') return 'left out';
  if (column === 'halfAB' && spreadType === 'half-schlumberger') return 'AO';
  if (column === 'apparentResistivity') return 'ρa on sheet';
  if (column === 'standardError') return 'error';
  return SHEET_COLUMN_NAMES[column];
}

export const gridColumnUnit = (column: GridColumn, units: SheetUnits): string =>
  column === 'excluded' ? '' : columnUnit(column, units);

export const isTextColumn = (column: GridColumn): boolean => column === 'remark' || column === 'excluded';

/** Side and least width of a column, so that a sheet with all of them fits beside its curve at 1280 px. */
export function gridColumnLook(column: GridColumn): string {
  if (isTextColumn(column)) return 'min-w-19 text-left sm:min-w-23 3xl:min-w-36';
  // R is small where the spread is long: 0.006237
  if (column === 'resistance') return 'min-w-20 text-right 3xl:min-w-22';
  const isRead = column === 'voltage' || column === 'current' || column === 'apparentResistivity';
  return `${isRead ? 'min-w-16' : 'min-w-14'} text-right 3xl:min-w-22`;
}

import { asGiven } from '../../inversion/three-digits';
import type { CellFault } from './cell-fault';
import { SPACING_COLUMNS, type SheetColumn, type SheetRow, type SheetUnits } from './readings';
import { columnScale, columnUnit, NUMBER_COLUMNS, type NumberColumnName } from './sheet-columns';
import { parseSheetNumber, scaleNumber, type DecimalMark } from './sheet-number';
import type { SheetLengths } from './sheet-spread';
import type { SpreadType } from './spread';

export interface SheetOptions {
  /** the survey's, relative; 0 = own errors alone */
  readonly errorFloor?: number;
  /** the sign that the whole file uses; both are taken when absent */
  readonly decimalMark?: DecimalMark;
}

export const cellText = (row: SheetRow, column: SheetColumn): string => (row.cells[column] ?? '').trim();

/** What a cell of this column may hold, in the units of the sheet. */
export function allowedNumber(column: NumberColumnName, units: SheetUnits): string {
  const { low, high, openLow } = NUMBER_COLUMNS[column];
  const scale = columnScale(column, units);
  const unit = columnUnit(column, units);
  const say = (bound: number) =>
    `${asGiven(Number((bound / scale).toPrecision(6)))}${unit && `\u00a0${unit}`}`;
  const range = openLow ? `above ${say(low)} and up to ${say(high)}` : `from ${say(low)} to ${say(high)}`;
  return `a number ${range}, such as 12.5 or 12,5`;
}

export function parseCell(
  row: SheetRow,
  column: NumberColumnName,
  units: SheetUnits,
  options: SheetOptions,
  faults: CellFault[],
): number | null {
  const text = cellText(row, column);
  if (text === '') return null;
  const parsed = parseSheetNumber(text, options.decimalMark);
  const fault = (message: string) => {
    faults.push({ column, found: text, message, allowed: allowedNumber(column, units) });
    return null;
  };
  if (parsed.message !== null) return fault(parsed.message);
  const value = scaleNumber(parsed.value, columnScale(column, units));
  const { low, high, openLow } = NUMBER_COLUMNS[column];
  if (value < low || (openLow && value === low)) return fault('is too small');
  return value > high ? fault('is too large') : value;
}

const INFINITE = /^(∞|inf|infinity|infinite)$/i;

export function parseLengths(
  row: SheetRow,
  spreadType: SpreadType,
  units: SheetUnits,
  options: SheetOptions,
  faults: CellFault[],
): SheetLengths {
  const lengths: SheetLengths = {};
  for (const column of SPACING_COLUMNS[spreadType]) {
    const atInfinity = spreadType === 'electrodes' && INFINITE.test(cellText(row, column));
    lengths[column] = atInfinity ? null : parseCell(row, column, units, options, faults);
  }
  return lengths;
}

import { tryDeriveReading } from '../../inversion/readings/derive-reading';
import { checkSpread } from '../../inversion/spread/check-spread';
import { geometricFactor } from '../../inversion/spread/geometric-factor';
import type { CellFault } from './cell-fault';
import { type DerivedReading, type Reading, type RowFault, type SheetRow, type SheetUnits } from './readings';
import { cellText, parseCell, parseLengths, type SheetOptions } from './sheet-cells';
import { columnScale, SHEET_COLUMN_NAMES, sheetColumnsOf, type NumberColumnName } from './sheet-columns';
import { writeNumber } from './sheet-number';
import { spreadOfLengths, spreadLengths } from './sheet-spread';
import type { SpreadType } from './spread';

export type ParsedRow =
  | { readonly reading: Reading; readonly derived: DerivedReading; readonly faults: null }
  | { readonly reading: null; readonly derived: null; readonly faults: readonly CellFault[] };

/** `readings`, `derived` and `rows` run together; `rows` are row numbers from 1. Blank rows keep their number and give nothing. */
export interface ParsedSheet {
  readings: Reading[];
  derived: DerivedReading[];
  rows: number[];
  faults: RowFault[];
}

export const isBlankRow = (row: SheetRow): boolean =>
  Object.values(row.cells).every((text) => text.trim() === '');

const LONGEST_TEXT = 500;

/** One row of a Field sheet as a reading with what follows from it, or all its faults. */
export function parseSheetRow(
  row: SheetRow,
  spreadType: SpreadType,
  units: SheetUnits,
  options: SheetOptions = {},
): ParsedRow {
  const faults: CellFault[] = [];
  const lengths = parseLengths(row, spreadType, units, options, faults);
  const number = (column: NumberColumnName) => parseCell(row, column, units, options, faults);
  const values = {
    voltageMv: number('voltage'),
    currentMa: number('current'),
    resistanceOhm: number('resistance'),
    sheetApparentResistivityOhmM: number('apparentResistivity'),
    standardError: number('standardError'),
  };
  const remark = cellText(row, 'remark');
  const excluded = row.excluded?.trim() ?? null;
  if (excluded === '')
    faults.push({ column: 'excluded', found: '', message: 'no reason is given', allowed: 'a short reason' });
  for (const [column, text] of [
    ['remark', remark],
    ['excluded', excluded ?? ''],
  ] as const)
    if (text.length > LONGEST_TEXT)
      faults.push({
        column,
        found: `${text.length} signs`,
        message: 'is too long',
        allowed: `up to ${LONGEST_TEXT} signs`,
      });
  if (faults.length > 0) return { reading: null, derived: null, faults };
  const spread = spreadOfLengths(spreadType, lengths);
  if ('column' in spread) return rowFault({ ...spread, found: foundIn(row, spread.column) });
  const reading: Reading = { spread, ...values, remark, excluded };
  const { derived, fault } = tryDeriveReading(reading, options.errorFloor ?? 0);
  if (!fault) return { reading, derived, faults: null };
  const column = sheetColumnsOf(spreadType).find((name) => name === fault.field) ?? 'row';
  return rowFault({ column, found: foundIn(row, column), message: fault.message, allowed: fault.allowed });
}

const rowFault = (fault: CellFault): ParsedRow => ({ reading: null, derived: null, faults: [fault] });

const foundIn = (row: SheetRow, column: CellFault['column']): string =>
  column === 'row' || column === 'excluded' ? '' : cellText(row, column);

/** All rows of a sheet. A row that is blank gives neither a reading nor a fault. */
export function parseSheet(
  rows: readonly SheetRow[],
  spreadType: SpreadType,
  units: SheetUnits,
  options: SheetOptions = {},
): ParsedSheet {
  const sheet: ParsedSheet = { readings: [], derived: [], rows: [], faults: [] };
  rows.forEach((row, index) => {
    if (isBlankRow(row)) return;
    const parsed = parseSheetRow(row, spreadType, units, options);
    if (parsed.faults) {
      for (const fault of parsed.faults)
        sheet.faults.push({ ...fault, row: index + 1, column: faultColumnName(fault.column) });
      return;
    }
    sheet.readings.push(parsed.reading);
    sheet.derived.push(parsed.derived);
    sheet.rows.push(index + 1);
  });
  return sheet;
}

/** The name of a column at fault; empty for the row as a whole. */
export function faultColumnName(column: CellFault['column']): string {
  if (column === 'row') return '';
  return column === 'excluded' ? 'left out' : SHEET_COLUMN_NAMES[column];
}

/** K in m of a row whose lengths are written, whatever else is missing; null when it cannot be told yet. */
export function geometricFactorOfRow(
  row: SheetRow,
  spreadType: SpreadType,
  units: SheetUnits,
): number | null {
  const faults: CellFault[] = [];
  const lengths = parseLengths(row, spreadType, units, {}, faults);
  if (faults.length > 0) return null;
  const spread = spreadOfLengths(spreadType, lengths);
  return 'column' in spread || checkSpread(spread) ? null : geometricFactor(spread);
}

/** The cells of a reading in these units; parsing them gives the same reading again. */
export function formatSheetRow(reading: Reading, units: SheetUnits): SheetRow {
  const cells: SheetRow['cells'] = {};
  const write = (column: NumberColumnName, value: number | null) => {
    if (value !== null) cells[column] = writeNumber(value, columnScale(column, units));
  };
  for (const [column, value] of spreadLengths(reading.spread)) {
    if (value === null && reading.spread.type === 'electrodes') cells[column] = '∞';
    else write(column, value);
  }
  write('voltage', reading.voltageMv);
  write('current', reading.currentMa);
  write('resistance', reading.resistanceOhm);
  write('apparentResistivity', reading.sheetApparentResistivityOhmM);
  write('standardError', reading.standardError);
  if (reading.remark !== '') cells.remark = reading.remark;
  return { cells, excluded: reading.excluded };
}

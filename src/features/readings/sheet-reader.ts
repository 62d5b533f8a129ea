import type { CellFault } from '../../../server/contract/cell-fault';
import {
  faultColumnName,
  geometricFactorOfRow,
  isBlankRow,
  parseSheetRow,
  type ParsedRow,
} from '../../../server/contract/field-sheet';
import type { DerivedReading, Reading, SheetRow, SheetUnits } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';

/** A fault with its place: row counted from 1, and the column's own name for jumping there. */
export interface SheetFault extends CellFault {
  row: number;
  columnName: string;
}

export interface SheetLine {
  /** null for a blank row. */
  parsed: ParsedRow | null;
  geometricFactorM: number | null;
}

export interface SheetReading {
  row: number;
  reading: Reading;
  derived: DerivedReading;
}

/** A whole sheet as read: one line for each row, and what is good and what is at fault among them. */
export interface ReadSheet {
  lines: readonly SheetLine[];
  readings: readonly SheetReading[];
  faults: readonly SheetFault[];
}

export type SheetReader = (rows: readonly SheetRow[]) => ReadSheet;

/** Reads sheets of one kind; a row that has not changed since the last time is not read again. */
export function createSheetReader(
  spreadType: SpreadType,
  units: SheetUnits,
  errorFloor: number,
): SheetReader {
  const known = new WeakMap<SheetRow, SheetLine>();
  const lineOf = (row: SheetRow): SheetLine => {
    const before = known.get(row);
    if (before) return before;
    const line = readRow(row, spreadType, units, errorFloor);
    known.set(row, line);
    return line;
  };
  return (rows) => collect(rows.map(lineOf));
}

function readRow(row: SheetRow, spreadType: SpreadType, units: SheetUnits, errorFloor: number): SheetLine {
  const parsed = isBlankRow(row) ? null : parseSheetRow(row, spreadType, units, { errorFloor });
  const geometricFactorM =
    parsed?.derived?.geometricFactorM ?? (parsed ? geometricFactorOfRow(row, spreadType, units) : null);
  return { parsed, geometricFactorM };
}

function collect(lines: readonly SheetLine[]): ReadSheet {
  const readings: SheetReading[] = [];
  const faults: SheetFault[] = [];
  lines.forEach(({ parsed }, i) => {
    if (parsed === null) return;
    if (parsed.faults === null)
      readings.push({ row: i + 1, reading: parsed.reading, derived: parsed.derived });
    else
      for (const fault of parsed.faults)
        faults.push({ ...fault, row: i + 1, columnName: faultColumnName(fault.column) });
  });
  return { lines, readings, faults };
}

import { isBlankRow, parseSheetRow, faultColumnName } from '../contract/field-sheet';
import {
  type DerivedReading,
  type ImportMapping,
  type Reading,
  type RowFault,
  type SheetColumn,
  type SheetRow,
} from '../contract/readings';
import { SHEET_COLUMN_NAMES, sheetColumnsOf } from '../contract/sheet-columns';
import { parseSheetNumber } from '../contract/sheet-number';
import type { SpreadType } from '../contract/spread';
import { AppError } from '../errors';
import type { FileRow } from './delimited-rows';
import { findMapping, readTable, type FileTable } from './find-mapping';
import { areUnitsStated, headingFaults } from './heading-faults';
import { textOfFile } from './file-text';
import { cut } from './cut-text';
import { missingColumns } from './missing-columns';

/** A file read as a Field sheet. Nothing is stored by reading. */
export interface SheetFile {
  readonly headings: readonly string[];
  readonly mapping: ImportMapping;
  readonly unitsStated: boolean;
  readonly rows: readonly (SheetRow & { readonly line: number })[];
  /** the good rows, in order */
  readonly good: readonly {
    readonly line: number;
    readonly reading: Reading;
    readonly derived: DerivedReading;
  }[];
  /** what is wrong with the headings, which concerns every row */
  readonly headingFaults: readonly RowFault[];
  readonly rowFaults: readonly RowFault[];
  readonly missingColumns: readonly string[];
}

export interface SheetFileOptions {
  readonly spreadType: SpreadType;
  readonly errorFloor: number;
  /** as chosen by the person; null = as found in the file */
  readonly mapping: ImportMapping | null;
}

const MAX_READINGS = 5000;
const MAX_LINES = 50_000;
const LONGEST_CELL = 500;

const count = (value: number): string => String(value).replace(/\B(?=(\d{3})+$)/g, '\u202f');

function refuseLong(name: string, rows: number, what: string, limit: number): void {
  if (rows > limit)
    throw new AppError(
      'too-large',
      `${name} holds ${count(rows)} ${what}; one sounding takes up to ${count(MAX_READINGS)} readings.`,
    );
}

/** Reads a file by the mapping given or found. Throws `AppError` where it is no table of readings at all. */
export function readSheetFile(name: string, bytes: Buffer, options: SheetFileOptions): SheetFile {
  const text = textOfFile(name, bytes);
  refuseLong(name, text.split('\n').length, 'lines', MAX_LINES);
  const table = readTable(text, options.spreadType, options.mapping?.delimiter ?? null);
  const mapping = options.mapping ?? findMapping(table);
  requireUsableMapping(mapping, options.spreadType);
  const headed = mapping.hasHeader ? withHeader(table) : withoutHeader(table, mapping);
  refuseLong(name, headed.rows.length, 'rows', MAX_READINGS);
  const missing = missingColumns(mapping.columns, options.spreadType);
  const rows = headed.rows.map((row) => ({ line: row.line, ...sheetRowOf(row, mapping) }));
  const parsed = missing.length > 0 ? { good: [], faults: [] } : parseRows(headed, rows, mapping, options);
  return {
    headings: headed.headings,
    mapping,
    unitsStated: areUnitsStated(headed, mapping),
    rows: rows.map((row) => ({ ...row, cells: cutCells(row.cells) })),
    good: parsed.good,
    headingFaults: headingFaults(headed, mapping),
    rowFaults: parsed.faults,
    missingColumns: missing,
  };
}

function requireUsableMapping({ columns }: ImportMapping, spreadType: SpreadType): void {
  const allowed = sheetColumnsOf(spreadType);
  const faults = columns.flatMap((column, i) => {
    if (column === null) return [];
    const path = ['body', 'mapping', 'columns', i];
    const name = SHEET_COLUMN_NAMES[column];
    if (!allowed.includes(column))
      return [{ path, message: `${name} does not belong to a ${spreadType} sounding` }];
    return columns.indexOf(column) < i ? [{ path, message: `${name} is mapped twice` }] : [];
  });
  if (faults.length > 0)
    throw new AppError('invalid', 'The columns of the file cannot be used like this.', { faults });
}

/** A file without a recognised heading line, which its reader says has one: the first row is it. */
function withHeader(table: FileTable): FileTable {
  if (table.headerLine !== null) return table;
  const [header, ...rows] = table.rows;
  return { ...table, headerLine: header?.line ?? 1, headings: header?.cells ?? [], rows };
}

/** Without headings, the sheet begins at the first row that has a number where one belongs. */
function withoutHeader(table: FileTable, { columns, decimalMark }: ImportMapping): FileTable {
  const hasNumber = (row: FileRow): boolean =>
    columns.some(
      (column, i) =>
        column !== null &&
        column !== 'remark' &&
        parseSheetNumber(row.cells[i] ?? '', decimalMark).value !== null,
    );
  const isMapped = columns.some((column) => column !== null);
  const start = isMapped ? Math.max(0, table.rows.findIndex(hasNumber)) : 0;
  const width = Math.max(columns.length, ...table.rows.slice(start).map((row) => row.cells.length));
  return {
    ...table,
    headerLine: null,
    headings: Array.from({ length: width }, (_, i) => `Column ${i + 1}`),
    found: [],
    rows: table.rows.slice(start),
  };
}

function sheetRowOf(row: FileRow, { columns }: ImportMapping): SheetRow {
  const cells: SheetRow['cells'] = {};
  columns.forEach((column, i) => {
    const text = row.cells[i] ?? '';
    if (column !== null && text !== '') cells[column] = text;
  });
  return { cells, excluded: null };
}

const cutCells = (cells: SheetRow['cells']): SheetRow['cells'] =>
  Object.fromEntries(Object.entries(cells).map(([column, text]) => [column, cut(text, LONGEST_CELL)]));

function parseRows(
  table: FileTable,
  rows: readonly (SheetRow & { line: number })[],
  mapping: ImportMapping,
  { spreadType, errorFloor }: SheetFileOptions,
): { good: SheetFile['good']; faults: RowFault[] } {
  const good: { line: number; reading: Reading; derived: DerivedReading }[] = [];
  const faults: RowFault[] = [];
  const headingOf = (column: SheetColumn | 'excluded' | 'row'): string => {
    const at = mapping.columns.findIndex((mapped) => mapped === column);
    return table.headings[at] ?? faultColumnName(column);
  };
  rows.forEach((row, i) => {
    const extra = table.headerLine === null ? [] : (table.rows[i]?.cells.slice(table.headings.length) ?? []);
    if (extra.some((cell) => cell !== '')) return faults.push(tooManyCells(table, row.line, extra));
    if (isBlankRow(row)) return;
    const parsed = parseSheetRow(row, spreadType, mapping.units, {
      errorFloor,
      decimalMark: mapping.decimalMark,
    });
    if (!parsed.faults)
      return good.push({ line: row.line, reading: parsed.reading, derived: parsed.derived });
    for (const { column, found, message, allowed } of parsed.faults)
      faults.push({ row: row.line, column: headingOf(column), found: cut(found, 80), message, allowed });
  });
  return { good, faults };
}

const tooManyCells = ({ headings }: FileTable, line: number, extra: readonly string[]): RowFault => ({
  row: line,
  column: '',
  found: cut(extra.filter((cell) => cell !== '').join(' | '), 80),
  message: `has ${headings.length + extra.length} values where the headings name ${headings.length}`,
  allowed: 'one value a heading; is the delimiter also the decimal comma?',
});

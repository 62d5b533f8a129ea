import {
  DEFAULT_SHEET_UNITS,
  sheetUnitsSchema,
  type ImportMapping,
  type SheetColumn,
  type SheetUnits,
} from '../contract/readings';
import { parseSheetNumber, type DecimalMark } from '../contract/sheet-number';
import type { SpreadType } from '../contract/spread';
import { delimitedRows, DELIMITERS, namedDelimiter, type Delimiter, type FileRow } from './delimited-rows';
import { readHeading, readUnitCell, unitKeyOf, type Heading, type HeadingUnit } from './sheet-headings';

/** A file cut into rows, with its heading line where one was found. */
export interface FileTable {
  readonly delimiter: Delimiter;
  /** the line of the headings; null = none found */
  readonly headerLine: number | null;
  readonly headings: readonly string[];
  /** one a heading; null = names no column of this spread */
  readonly found: readonly (Heading | null)[];
  /** all rows below the headings, comments left out */
  readonly rows: readonly FileRow[];
}

const HEADER_SEARCH_ROWS = 200;

const readHeadings = (row: FileRow, spreadType: SpreadType): (Heading | null)[] =>
  row.cells.map((cell) => (cell === '' ? null : readHeading(cell, spreadType)));

const distinctColumns = (headings: readonly (Heading | null)[]): number =>
  new Set(headings.flatMap((heading) => heading?.column ?? [])).size;

/** A second line that holds units alone, under its headings. */
function unitLine(row: FileRow | undefined, found: readonly (Heading | null)[]): HeadingUnit[] | null {
  if (!row) return null;
  const units = row.cells.map((cell, i): HeadingUnit => {
    const column = found[i]?.column;
    return column && cell !== '' ? readUnitCell(cell, column) : { kind: 'none' };
  });
  const isUnits = row.cells.every((cell, i) => cell === '' || units[i]?.kind !== 'none' || !found[i]);
  return isUnits && units.some(({ kind }) => kind !== 'none') ? units : null;
}

function tableOf(text: string, delimiter: Delimiter, spreadType: SpreadType): FileTable {
  const all = delimitedRows(text, delimiter);
  const candidates = all.slice(0, HEADER_SEARCH_ROWS).map((row) => {
    const found = readHeadings(row, spreadType);
    return { row, found, columns: distinctColumns(found) };
  });
  const named = candidates.filter(({ columns }) => columns >= 2);
  // headings may stand in a comment, but a heading line of its own comes first
  const header = named.find(({ row }) => !row.comment) ?? named[0];
  const rows = all.filter((row) => !row.comment);
  if (!header) return { delimiter, headerLine: null, headings: [], found: [], rows };
  const below = rows.filter((row) => row.line > header.row.line);
  const units = unitLine(below[0], header.found);
  return {
    delimiter,
    headerLine: header.row.line,
    headings: header.row.cells,
    found: header.found.map((heading, i) => {
      const unit = units?.[i];
      return heading && unit && unit.kind !== 'none' ? { ...heading, unit } : heading;
    }),
    rows: units ? below.slice(1) : below,
  };
}

/** Columns recognised count first, then cells that are numbers against cells that are not. */
function scoreOf(table: FileTable): number {
  const cells = table.rows.slice(0, HEADER_SEARCH_ROWS).flatMap((row) => row.cells);
  const numbers = cells.filter((cell) => parseSheetNumber(cell).value !== null).length;
  const words = cells.filter((cell) => cell !== '').length - numbers;
  return 1e6 * distinctColumns(table.found) + numbers - words;
}

/** Cuts a file by the delimiter that is named, or by the one that makes the most sense of it. */
export function readTable(text: string, spreadType: SpreadType, delimiter: Delimiter | null): FileTable {
  const named = delimiter ?? namedDelimiter(text);
  if (named) return tableOf(text, named, spreadType);
  const tables = DELIMITERS.map((candidate) => tableOf(text, candidate, spreadType));
  return tables.reduce((best, table) => (scoreOf(table) > scoreOf(best) ? table : best));
}

/** Comma where more cells hold one comma than one point. */
function decimalMarkOf(table: FileTable): DecimalMark {
  const cells = table.rows.slice(0, HEADER_SEARCH_ROWS).flatMap((row) => row.cells);
  const count = (pattern: RegExp): number => cells.filter((cell) => pattern.test(cell)).length;
  return count(/^[+-]?[\d ]*,\d+(e[+-]?\d+)?$/i) > count(/^[+-]?[\d ]*\.\d+(e[+-]?\d+)?$/i) ? ',' : '.';
}

/** Units by the headings of the columns that are used; the first to name one counts. */
export function statedUnits(
  table: FileTable,
  columns: readonly (SheetColumn | null)[],
): Partial<Record<keyof SheetUnits, string>> {
  const stated: Partial<Record<keyof SheetUnits, string>> = {};
  columns.forEach((column, i) => {
    const key = column && unitKeyOf(column);
    const heading = table.found[i];
    if (key && heading?.column === column && heading.unit.kind === 'named') stated[key] ??= heading.unit.unit;
  });
  return stated;
}

/** What the headings of a file make of it, to be shown before anything is stored. */
export function findMapping(table: FileTable): ImportMapping {
  const taken = new Set<SheetColumn>();
  const columns = table.found.map((heading) => {
    if (!heading || taken.has(heading.column)) return null;
    taken.add(heading.column);
    return heading.column;
  });
  const width = Math.max(0, ...table.rows.slice(0, HEADER_SEARCH_ROWS).map((row) => row.cells.length));
  return {
    hasHeader: table.headerLine !== null,
    delimiter: table.delimiter,
    decimalMark: decimalMarkOf(table),
    columns: (table.headerLine === null ? Array.from({ length: width }, () => null) : columns).slice(0, 100),
    units: sheetUnitsSchema.parse({ ...DEFAULT_SHEET_UNITS, ...statedUnits(table, columns) }),
  };
}

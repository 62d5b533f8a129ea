import Papa from 'papaparse';
import { parseSheetNumber } from '../../../server/contract/sheet-number';

export interface PastedBlock {
  rows: string[][];
  /** The first line was a heading and is not among the rows. */
  headingLeftOut: boolean;
}

/** True where a paste fills more than the one cell it is made in. */
export const isBlock = (text: string): boolean => /\t|\r|\n./.test(text.trimEnd());

/** Text from a spreadsheet as rows of cells; a decimal comma is never taken for the sign between cells. */
export function readPasted(text: string): PastedBlock {
  const parsed = Papa.parse<string[]>(text.replace(/(\r\n|\r|\n)+$/, ''), {
    delimiter: delimiterOf(text),
    skipEmptyLines: false,
  });
  const rows = parsed.data.map((cells) => cells.map((cell) => cell.trim()));
  const [first] = rows;
  const headingLeftOut = rows.length > 1 && first !== undefined && isHeading(first);
  return { rows: headingLeftOut ? rows.slice(1) : rows, headingLeftOut };
}

/** Spreadsheets paste tabs. Commas separate only where they cannot be decimal: beside points, or several to a line. */
function delimiterOf(text: string): string {
  if (text.includes('\t')) return '\t';
  if (text.includes(';')) return ';';
  const lines = text.split(/\r\n|\r|\n/).filter((line) => line.trim() !== '');
  const commas = lines.map((line) => line.split(',').length - 1);
  const separates =
    commas.every((count) => count > 0) && (commas.some((count) => count > 1) || text.includes('.'));
  return separates ? ',' : '\t';
}

const isHeading = (cells: readonly string[]): boolean =>
  cells.some((cell) => cell !== '') && cells.every((cell) => parseSheetNumber(cell).message !== null);

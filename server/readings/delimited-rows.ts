import Papa from 'papaparse';
import type { ImportMapping } from '../contract/readings';

export type Delimiter = ImportMapping['delimiter'];
export const DELIMITERS: readonly Delimiter[] = [';', '\t', ',', '|'];

export interface FileRow {
  /** line of the file that the row starts on, from 1 */
  readonly line: number;
  readonly cells: readonly string[];
  /** the line is marked as a comment; the mark is not in the cells */
  readonly comment: boolean;
}

const COMMENT = /^\s*(#|\/\/|%|!)+\s*/;
const SEPARATOR_LINE = /^sep=(.)$/i;

const UNLIKELY_QUOTE = '\u0001';

function parse(text: string, delimiter: Delimiter): string[][] {
  const options = { delimiter, newline: '\n' as const };
  const parsed = Papa.parse<string[]>(text, options);
  // a quote that is never closed would swallow the rest of the file into one cell
  return parsed.errors.some(({ type }) => type === 'Quotes')
    ? Papa.parse<string[]>(text, { ...options, quoteChar: UNLIKELY_QUOTE }).data
    : parsed.data;
}

/** The rows of a delimited text that hold anything, each with its line. */
export function delimitedRows(text: string, delimiter: Delimiter): FileRow[] {
  const rows: FileRow[] = [];
  let line = 1;
  for (const raw of parse(text, delimiter)) {
    const first = raw[0] ?? '';
    const comment = COMMENT.test(first) || SEPARATOR_LINE.test(raw.join(delimiter));
    const cells = [first.replace(COMMENT, ''), ...raw.slice(1)].map((cell) => cell.trim());
    if (cells.some((cell) => cell !== '')) rows.push({ line, cells, comment });
    line += 1 + raw.reduce((breaks, cell) => breaks + cell.split('\n').length - 1, 0);
  }
  return rows;
}

/** The delimiter that the first line names, as some spreadsheets write it. */
export function namedDelimiter(text: string): Delimiter | null {
  const named = SEPARATOR_LINE.exec(text.slice(0, text.indexOf('\n')))?.[1];
  return DELIMITERS.find((delimiter) => delimiter === named) ?? null;
}

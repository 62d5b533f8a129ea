export type ChartCell = string | number | null;

export interface ChartColumn {
  label: string;
  /** Written beside the label; in a CSV after it in brackets. */
  unit?: string;
  /** How a number is shown; the CSV keeps it in full. */
  format?: (value: number) => string;
}

/** The data of a drawing as a table. */
export interface ChartTable {
  columns: readonly ChartColumn[];
  rows: readonly (readonly ChartCell[])[];
}

export function cellText(cell: ChartCell, column: ChartColumn): string {
  if (cell === null) return '';
  return typeof cell === 'number' ? (column.format?.(cell) ?? String(cell)) : cell;
}

/** RFC 4180: comma, double quotes, CRLF; numbers with a point and twelve significant figures. */
export function tableToCsv({ columns, rows }: ChartTable): string {
  const head = columns.map(({ label, unit }) => (unit ? `${label} (${unit})` : label));
  return [head, ...rows].map((row) => row.map(csvField).join(',')).join('\r\n') + '\r\n';
}

function csvField(cell: ChartCell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(Number(cell.toPrecision(12)));
  // A text that a spreadsheet would run as a formula is kept a text.
  const safe = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** "Apparent resistivity, S-07" → "apparent-resistivity-s-07". */
export function fileNameOf(title: string): string {
  const plain = title
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return plain === '' ? 'layerwell' : plain;
}

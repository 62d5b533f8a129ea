import type { ImportPreview } from '../../../server/contract/readings';

/** Which ways of taking a file are open; nothing is taken in units that nobody has stated. */
export function importReadiness(
  preview: Pick<ImportPreview, 'faults' | 'rows' | 'readings' | 'missingColumns' | 'unitsStated'>,
  unitsConfirmed: boolean,
): { all: boolean; goodRows: boolean } {
  const isClear =
    preview.missingColumns.length === 0 &&
    (preview.unitsStated || unitsConfirmed) &&
    preview.readings.length > 0;
  return {
    all: isClear && preview.faults.length === 0,
    goodRows: isClear && preview.faults.length > 0 && !hasHeadingFault(preview),
  };
}

/** A fault of the headings concerns every row: none of them is good. */
function hasHeadingFault({ faults, rows }: Pick<ImportPreview, 'faults' | 'rows'>): boolean {
  const lines = new Set(rows.map(({ line }) => line));
  return faults.some(({ row }) => !lines.has(row));
}

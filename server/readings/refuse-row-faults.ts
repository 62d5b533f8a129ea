import type { RowFault } from '../contract/readings';
import { AppError } from '../errors';

/** Refuses readings with what is wrong in which row; `lineWord` is what the person counts by. */
export function refuseRowFaults(faults: readonly RowFault[], lineWord: 'Row' | 'Line'): void {
  if (faults.length === 0) return;
  const rows = new Set(faults.map(({ row }) => row)).size;
  throw new AppError(
    'invalid',
    rows === 1
      ? `One ${lineWord.toLowerCase()} cannot be used. Nothing was saved.`
      : `${rows} ${lineWord.toLowerCase()}s cannot be used. Nothing was saved.`,
    {
      faults: faults.map(({ row, column, found, message, allowed }) => ({
        path: ['rows', row, column],
        message: `${lineWord} ${row}${column && `, ${column}`}: ${message}`,
        found,
        allowed,
      })),
    },
  );
}

import type { Revision, RowFault } from '../../../server/contract/readings';
import { formatCount } from '../../ui/format';

const MOST_SHOWN = 50;

/** Lines of the file that are not among the readings it was read into: which, and why. */
export function LeftOutLines({ revision }: { revision: Revision }) {
  const { importFaults, sourceFile } = revision;
  if (importFaults.length === 0) return null;
  return (
    <section aria-label="Left out at import" className="border-l-2 border-l-copper pl-3">
      <h2 className="font-semibold">
        {leftOutHeading(revision.linesLeftOut, sourceFile?.name ?? 'the file')}
      </h2>
      <p className="text-sm text-muted">
        They are in the file and not among the readings of revision {revision.number}.
      </p>
      <ul className="mt-1 max-h-72 overflow-y-auto">
        {importFaults.slice(0, MOST_SHOWN).map((fault) => (
          <li key={`${fault.row} ${fault.column}`}>{leftOutWords(fault)}</li>
        ))}
      </ul>
      {importFaults.length > MOST_SHOWN ? (
        <p className="text-sm text-muted">The first {MOST_SHOWN} reasons are listed.</p>
      ) : null}
    </section>
  );
}

/** "3 lines of survey.csv were left out at import". */
export const leftOutHeading = (lines: number, fileName: string): string =>
  `${formatCount(lines, 'line')} of ${fileName} ${lines === 1 ? 'was' : 'were'} left out at import`;

/** "Line 5, V (mV): “abc” is not a number". */
export const leftOutWords = ({ row, column, found, message }: RowFault): string =>
  `Line ${row}${column === '' ? '' : `, ${column}`}: ${found === '' ? '' : `“${found}” `}${message}`;

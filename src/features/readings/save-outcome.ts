import type { ImportPreview, Revision } from '../../../server/contract/readings';
import { formatCount } from '../../ui/format';

/** What saving came to, in a sentence. */
export const saveOutcome = ({ isNew, revision }: { isNew: boolean; revision: Revision }): string =>
  isNew
    ? `Saved as revision ${revision.number}.`
    : `Same content as revision ${revision.number}, which is the current one again.`;

/** What reading in a file came to: how many readings, which revision, and how many lines are not among them. */
export function importOutcome(
  { fileName, faults }: Pick<ImportPreview, 'fileName' | 'faults'>,
  saved: { isNew: boolean; revision: Revision },
): string {
  const leftOut = new Set(faults.map(({ row }) => row)).size;
  const read = `${formatCount(saved.revision.readings.length, 'reading')} of ${fileName} read in. ${saveOutcome(saved)}`;
  return leftOut === 0
    ? `${read} There is nothing left to save.`
    : `${read} ${formatCount(leftOut, 'line')} with faults left out.`;
}

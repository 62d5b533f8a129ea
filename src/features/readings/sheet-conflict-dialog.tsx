import { useMemo } from 'react';
import type { Revision, SheetRow } from '../../../server/contract/readings';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { formatCount, formatMoment } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { compareSheets } from './compare-sheets';
import type { Sheet } from './use-sheet';

interface SheetConflictDialogProps {
  sheet: Sheet;
  theirs: Revision;
  working: boolean;
  onSaveMine: () => void;
  onTakeTheirs: () => void;
  onClose: () => void;
}

/** Two people wrote on one sheet: both versions, reading by reading, and a choice. Revisions are never lost either way. */
export function SheetConflictDialog(props: SheetConflictDialogProps) {
  const { sheet, theirs, working, onSaveMine, onTakeTheirs, onClose } = props;
  const { differences, same } = useMemo(
    () =>
      compareSheets(
        sheet.sheet.readings.map(({ reading }) => reading),
        theirs.readings,
        sheet.content.units,
      ),
    [sheet.sheet, sheet.content.units, theirs],
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      width="wide"
      title="Someone else saved these readings"
      description={`Revision ${theirs.number} by ${theirs.author.name}, ${formatMoment(theirs.createdAt)}. It stays in the list of revisions whatever you choose.`}
      actions={
        <>
          <Button onClick={onClose}>Keep on editing</Button>
          <Button onClick={onTakeTheirs}>Take revision {theirs.number}</Button>
          <Button kind="main" loading={working} onClick={onSaveMine}>
            Save mine as the newest
          </Button>
        </>
      }
    >
      <p className="mb-3">
        {differences.length === 0
          ? 'Both versions hold the same readings.'
          : `${formatCount(differences.length, 'reading')} differ, ${same} are the same in both.`}
      </p>
      {differences.length === 0 ? null : (
        <Table caption="Readings that differ">
          <TableHead>
            <HeaderCell numeric>Spacing, m</HeaderCell>
            <HeaderCell>Yours</HeaderCell>
            <HeaderCell>Revision {theirs.number}</HeaderCell>
          </TableHead>
          <TableBody>
            {differences.map((difference, i) => (
              <TableRow key={i}>
                <Cell numeric>{difference.spacing}</Cell>
                <Cell className="figure">{rowInWords(difference.mine)}</Cell>
                <Cell className="figure">{rowInWords(difference.theirs)}</Cell>
              </TableRow>
            ))}
          </TableBody>
        </Table>
      )}
    </Dialog>
  );
}

const VALUES = [
  ['voltage', 'V'],
  ['current', 'I'],
  ['resistance', 'R'],
  ['apparentResistivity', 'ρa'],
  ['standardError', 'error'],
] as const;

function rowInWords(row: SheetRow | null): string {
  if (row === null) return 'not there';
  const values = VALUES.flatMap(([column, name]) => {
    const text = row.cells[column];
    return text === undefined ? [] : [`${name} ${text}`];
  });
  const words = [...values, ...(row.cells.remark ? [row.cells.remark] : [])];
  if (row.excluded !== null) words.push(`left out: ${row.excluded}`);
  return words.join(', ');
}

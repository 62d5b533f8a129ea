import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Revision, SheetUnits } from '../../../server/contract/readings';
import { revisionQuery } from '../../api/sounding-queries';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { formatCount, formatMoment } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { compareSheets, type SheetDifference } from './compare-sheets';
import { rowParts, type RowPart } from './row-parts';
import type { Sheet } from './use-sheet';

const NO_READINGS = [] as const;

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
  const began = useQuery({
    ...revisionQuery(sheet.baseRevisionId ?? ''),
    enabled: sheet.baseRevisionId !== null,
  });
  const base = sheet.baseRevisionId === null ? NO_READINGS : (began.data?.readings ?? null);
  const { differences, same } = useMemo(
    () =>
      compareSheets(
        sheet.sheet.readings.map(({ reading }) => reading),
        theirs.readings,
        sheet.content.units,
        base,
      ),
    [sheet.sheet, sheet.content.units, theirs, base],
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
          : `${formatCount(differences.length, 'reading differs', 'readings differ')}, ${same === 1 ? '1 is' : `${same} are`} the same in both.`}{' '}
        {base && differences.length > 0
          ? `Bold is what was changed since ${began.data ? `revision ${began.data.number}, which both began from` : 'the sheet was empty'}.`
          : null}
        {began.error
          ? 'Who changed what cannot be told: the revision that both began from could not be read.'
          : null}
      </p>
      {differences.length === 0 ? null : (
        <Table caption="Readings that differ">
          <TableHead>
            <HeaderCell numeric>Spacing, m</HeaderCell>
            <HeaderCell>Yours</HeaderCell>
            <HeaderCell>Revision {theirs.number}</HeaderCell>
            {base ? <HeaderCell className="hidden sm:table-cell">Changed in</HeaderCell> : null}
          </TableHead>
          <TableBody>
            {differences.map((difference, i) => (
              <DifferenceRow
                key={i}
                difference={difference}
                units={sheet.content.units}
                revisionNumber={theirs.number}
              />
            ))}
          </TableBody>
        </Table>
      )}
    </Dialog>
  );
}

interface DifferenceRowProps {
  difference: SheetDifference;
  units: SheetUnits;
  revisionNumber: number;
}

/** On a telephone the word of who changed it stands under the spacing. */
function DifferenceRow({ difference, units, revisionNumber }: DifferenceRowProps) {
  const { spacing, mine, theirs, base, changedBy } = difference;
  const changed = changedBy && { me: 'yours', them: `revision ${revisionNumber}`, both: 'both' }[changedBy];
  return (
    <TableRow>
      <Cell numeric className="align-top">
        {spacing}
        {changed ? <span className="block font-sans text-sm text-muted sm:hidden">{changed}</span> : null}
      </Cell>
      <Cell className="align-top">
        <RowWords parts={rowParts(mine, base, units)} />
      </Cell>
      <Cell className="align-top">
        <RowWords parts={rowParts(theirs, base, units)} />
      </Cell>
      {changed ? <Cell className="hidden align-top whitespace-nowrap sm:table-cell">{changed}</Cell> : null}
    </TableRow>
  );
}

function RowWords({ parts }: { parts: readonly RowPart[] }) {
  return (
    <ul className="flex flex-wrap gap-x-3">
      {parts.map(({ text, change }) => (
        <li key={`${text} ${change}`}>
          <span className={change === null ? 'figure' : 'figure font-semibold'}>{text}</span>
          {change === null ? null : <span className="text-sm text-copper"> {change}</span>}
        </li>
      ))}
    </ul>
  );
}

import { useQuery } from '@tanstack/react-query';
import { DEFAULT_SHEET_UNITS, type Revision } from '../../../server/contract/readings';
import { formatSheetRow } from '../../../server/contract/field-sheet';
import type { Sounding } from '../../../server/contract/soundings';
import { revisionQuery } from '../../api/sounding-queries';
import { QueryView } from '../../app/query-view';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { formatCount, formatMoment, formatRelativeError, formatSignificant } from '../../ui/format';
import { showToast } from '../../ui/show-toast';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { CheckList } from './check-list';
import { LeftOutLines } from './left-out-lines';
import { gridColumnName, gridColumnUnit, gridColumns, isTextColumn } from './sheet-columns-view';
import { cellOf } from './sheet-rows';
import { contentOfRevision } from './start-sheet';
import type { Sheet } from './use-sheet';

interface RevisionDialogProps {
  revisionId: string;
  sounding: Sounding;
  sheet: Sheet;
  onClose: () => void;
}

/** A saved revision to read; bringing it back writes its readings on the sheet, where saving makes it current again. */
export function RevisionDialog({ revisionId, sounding, sheet, onClose }: RevisionDialogProps) {
  const revision = useQuery(revisionQuery(revisionId));
  const bringBack = (data: Revision) => {
    sheet.edit(contentOfRevision(data));
    onClose();
    showToast({
      title: `Revision ${data.number} is on the sheet`,
      description: 'Save to make it current. Undo brings back what stood there.',
    });
  };
  const { data } = revision;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      width="wide"
      title={data ? `Revision ${data.number}` : 'Revision'}
      description={
        data
          ? `${data.author.name}, ${formatMoment(data.createdAt)} · ${formatCount(data.readings.length, 'reading')} · content ${data.contentHash.slice(0, 16)}`
          : undefined
      }
      actions={
        <>
          <Button onClick={onClose}>Close</Button>
          {data && sounding.can.editReadings ? (
            <Button kind="main" onClick={() => bringBack(data)}>
              Bring back
            </Button>
          ) : null}
        </>
      }
    >
      <QueryView query={revision} loadingLabel="Loading the revision" what="This revision">
        {(loaded) => (
          <div className="flex flex-col gap-5">
            <RevisionTable revision={loaded} sounding={sounding} />
            <LeftOutLines revision={loaded} />
            <CheckList readings={loaded.readings.length} checks={loaded.checks} />
          </div>
        )}
      </QueryView>
    </Dialog>
  );
}

function RevisionTable({ revision, sounding }: { revision: Revision; sounding: Sounding }) {
  const rows = revision.readings.map((reading) => formatSheetRow(reading, DEFAULT_SHEET_UNITS));
  const columns = gridColumns(sounding.spreadType).filter((column) =>
    rows.some((row) => cellOf(row, column) !== ''),
  );
  return (
    <Table caption={`Readings of revision ${revision.number}`} frameClassName="max-h-96">
      <TableHead>
        <HeaderCell numeric>Row</HeaderCell>
        {columns.map((column) => (
          <HeaderCell
            key={column}
            numeric={!isTextColumn(column)}
            unit={gridColumnUnit(column, DEFAULT_SHEET_UNITS)}
          >
            {gridColumnName(column, sounding.spreadType)}
          </HeaderCell>
        ))}
        <HeaderCell numeric unit="m">
          K
        </HeaderCell>
        <HeaderCell numeric unit="Ω·m">
          ρa
        </HeaderCell>
        <HeaderCell numeric>total error</HeaderCell>
      </TableHead>
      <TableBody>
        {rows.map((row, i) => {
          const derived = revision.derived[i];
          return (
            <TableRow key={i} className={row.excluded === null ? undefined : 'text-muted'}>
              <Cell numeric>{i + 1}</Cell>
              {columns.map((column) => (
                <Cell key={column} numeric={!isTextColumn(column)}>
                  {cellOf(row, column)}
                </Cell>
              ))}
              <Cell numeric>
                {derived?.geometricFactorM ? formatSignificant(derived.geometricFactorM, 4) : ''}
              </Cell>
              <Cell numeric>{derived ? formatSignificant(derived.apparentResistivityOhmM, 4) : ''}</Cell>
              <Cell numeric>{derived ? formatRelativeError(derived.relativeError) : ''}</Cell>
            </TableRow>
          );
        })}
      </TableBody>
    </Table>
  );
}

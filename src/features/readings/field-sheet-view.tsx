import { useMemo, useRef, useState, type KeyboardEvent } from 'react';
import { checkReadings } from '../../../inversion/readings/check-readings';
import type { FieldSheet } from '../../../server/contract/readings';
import type { Sounding } from '../../../server/contract/soundings';
import { showToast } from '../../ui/show-toast';
import { CheckList } from './check-list';
import { CrewCaution } from './crew-caution';
import type { DraftKeeper } from './draft-keeper';
import { errorWords } from './error-words';
import { FaultList } from './fault-list';
import { LeftOutLines } from './left-out-lines';
import { isBlock, readPasted } from './paste-text';
import { RevisionList } from './revision-list';
import { SheetActions } from './sheet-actions';
import { SheetCurve } from './sheet-curve';
import { gridColumns } from './sheet-columns-view';
import { SheetGrid, type SheetGridHandle } from './sheet-grid';
import { SheetNotices } from './sheet-notices';
import { pasteBlock, setRow, withCell, withExcluded, type GridColumn } from './sheet-rows';
import { SheetToolbar } from './sheet-toolbar';
import { useSettled } from './use-settled';
import { useSheet } from './use-sheet';
import type { CellPlace } from './use-grid-focus';

const LONG_SHEET = 300;
const LONG_SHEET_REST_MS = 400;

interface FieldSheetViewProps {
  sounding: Sounding;
  fieldSheet: FieldSheet;
  keeper: DraftKeeper;
}

export function FieldSheetView({ sounding, fieldSheet, keeper }: FieldSheetViewProps) {
  const sheet = useSheet(sounding, fieldSheet, keeper);
  const [currentRow, setCurrentRow] = useState<number | null>(null);
  const grid = useRef<SheetGridHandle>(null);
  const { content, edit } = sheet;
  const { readings, faults } = sheet.sheet;
  // typing comes first; curve and checks of a long sheet follow when it rests
  const settled = useSettled(readings, readings.length > LONG_SHEET ? LONG_SHEET_REST_MS : 0);
  const checks = useMemo(() => checkReadings(settled), [settled]);
  const doubtedRows = useMemo(() => new Set(checks.flatMap((check) => check.rows)), [checks]);
  const columns = gridColumns(sounding.spreadType);
  const readOnly = !sounding.can.editReadings;
  const focusCell = (place: CellPlace) => grid.current?.focusCell(place);
  const [firstColumn] = columns;
  const jumpToRow = (row: number) => firstColumn && focusCell({ row, column: firstColumn });

  const setText = (index: number, column: GridColumn, text: string) => {
    const row = content.rows[index];
    if (!row || readOnly) return;
    edit(
      { ...content, rows: setRow(content.rows, index, withCell(row, column, text)) },
      `${index} ${column}`,
    );
  };
  const exclude = (index: number, excluded: boolean) => {
    const row = content.rows[index];
    if (!row) return;
    edit({ ...content, rows: setRow(content.rows, index, withExcluded(row, excluded ? '' : null)) });
    if (excluded) focusCell({ row: index, column: 'excluded' });
  };
  const paste = (place: CellPlace, text: string): boolean => {
    if (!isBlock(text)) return false;
    const { rows, headingLeftOut } = readPasted(text);
    edit({ ...content, rows: pasteBlock(content.rows, place, rows, columns) });
    if (headingLeftOut)
      showToast({ title: 'Heading line left out', description: 'Its cells hold no numbers.' });
    return true;
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (!(event.ctrlKey || event.metaKey) || readOnly) return;
    const key = event.key.toLowerCase();
    if (key !== 'z' && key !== 'y') return;
    event.preventDefault();
    if (key === 'y' || event.shiftKey) sheet.redo();
    else sheet.undo();
  };
  return (
    <div className="flex flex-col gap-4">
      <SheetActions sounding={sounding} fieldSheet={fieldSheet} sheet={sheet} keeper={keeper} />
      <CrewCaution />
      <SheetNotices fieldSheet={fieldSheet} sheet={sheet} readOnly={readOnly} />
      <div className="grid items-start gap-x-6 gap-y-6 xl:grid-cols-[minmax(0,1fr)_20rem] 2xl:grid-cols-[minmax(0,1fr)_minmax(24rem,36%)] 2xl:gap-x-8">
        {/* The keys of undo belong to the sheet as a whole, not to the one cell that has the cursor. */}
        <div className="flex min-w-0 flex-col gap-3" onKeyDownCapture={onKeyDown}>
          {readOnly ? null : (
            <SheetToolbar sheet={sheet} currentRow={currentRow} onInserted={(row) => jumpToRow(row)} />
          )}
          <SheetGrid
            ref={grid}
            content={content}
            sheet={sheet.sheet}
            spreadType={sounding.spreadType}
            readOnly={readOnly}
            currentRow={currentRow}
            doubtedRows={doubtedRows}
            onText={setText}
            onExclude={exclude}
            onPaste={paste}
            onFocusRow={setCurrentRow}
          />
          <p className="text-sm text-muted">
            {errorWords(
              readings.map(({ reading }) => reading),
              sounding.errorFloor,
            )}
          </p>
          <FaultList
            faults={faults}
            onJump={({ row, column }) =>
              column === 'row' ? jumpToRow(row - 1) : focusCell({ row: row - 1, column })
            }
          />
        </div>
        <div className="flex min-w-0 flex-col gap-6">
          <SheetCurve sounding={sounding} readings={settled} onFocusRow={setCurrentRow} />
          <CheckList readings={settled.length} checks={checks} onJump={jumpToRow} />
          {fieldSheet.revision ? <LeftOutLines revision={fieldSheet.revision} /> : null}
          <RevisionList sounding={sounding} sheet={sheet} />
        </div>
      </div>
    </div>
  );
}

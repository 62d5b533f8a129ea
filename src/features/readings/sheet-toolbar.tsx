import { Redo2, Undo2 } from 'lucide-react';
import { Button } from '../../ui/button';
import { formatCount } from '../../ui/format';
import { IconButton } from '../../ui/icon-button';
import { Popover } from '../../ui/popover';
import { insertRow, MOST_ROWS, removeRow } from './sheet-rows';
import { unitsInWords, UnitsChooser } from './units-chooser';
import type { Sheet } from './use-sheet';

interface SheetToolbarProps {
  sheet: Sheet;
  currentRow: number | null;
  onInserted: (row: number) => void;
}

export function SheetToolbar({ sheet, currentRow, onInserted }: SheetToolbarProps) {
  const { content, edit } = sheet;
  const row = currentRow !== null && currentRow < content.rows.length ? currentRow : null;
  const insert = () => {
    if (row === null) return;
    edit({ ...content, rows: insertRow(content.rows, row) });
    onInserted(row);
  };
  const remove = () => {
    if (row !== null) edit({ ...content, rows: removeRow(content.rows, row) });
  };
  return (
    <div className="flex flex-wrap items-center gap-x-2 gap-y-1.5">
      <IconButton
        label="Undo (Ctrl Z)"
        icon={<Undo2 aria-hidden size={16} />}
        disabled={!sheet.canUndo}
        onClick={sheet.undo}
      />
      <IconButton
        label="Redo (Ctrl Shift Z)"
        icon={<Redo2 aria-hidden size={16} />}
        disabled={!sheet.canRedo}
        onClick={sheet.redo}
      />
      <Button
        size="small"
        kind="quiet"
        disabled={row === null || content.rows.length >= MOST_ROWS}
        onClick={insert}
      >
        {row === null ? 'Insert a row' : `Insert above row ${row + 1}`}
      </Button>
      <Button size="small" kind="quiet" disabled={row === null} onClick={remove}>
        {row === null ? 'Remove a row' : `Remove row ${row + 1}`}
      </Button>
      <Popover
        title="Units of the numbers as written"
        trigger={
          <Button size="small" kind="quiet">
            Units: {unitsInWords(content.units)}
          </Button>
        }
        className="w-[36rem]"
      >
        <p className="mb-3 text-muted">
          The numbers stay as they are written and are read in the units chosen here. K, ρa and the curve are
          always in m and Ω·m.
        </p>
        <UnitsChooser units={content.units} onChange={(units) => edit({ ...content, units })} />
      </Popover>
      <span className="ml-auto text-sm text-muted">
        {formatCount(sheet.sheet.readings.length, 'reading')}
      </span>
    </div>
  );
}

import {
  Fragment,
  useImperativeHandle,
  useRef,
  type ClipboardEvent,
  type KeyboardEvent,
  type Ref,
} from 'react';
import type { SheetUnits } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';
import { classNames } from '../../ui/class-names';
import { useMediaQuery } from '../../ui/use-media-query';
import { cellMove } from './cell-keys';
import { gridColumnLook, gridColumnName, gridColumnUnit, gridColumns } from './sheet-columns-view';
import type { SheetContent } from './sheet-history';
import type { ReadSheet } from './sheet-reader';
import { SheetRowView } from './sheet-row-view';
import type { GridColumn } from './sheet-rows';
import { useGridFocus, type CellPlace } from './use-grid-focus';
import { useRowWindow } from './use-row-window';

export interface SheetGridHandle {
  focusCell: (place: CellPlace) => void;
}

export interface SheetGridProps {
  content: SheetContent;
  sheet: ReadSheet;
  spreadType: SpreadType;
  readOnly: boolean;
  currentRow: number | null;
  doubtedRows: ReadonlySet<number>;
  onText: (row: number, column: GridColumn, text: string) => void;
  onExclude: (row: number, excluded: boolean) => void;
  onPaste: (place: CellPlace, text: string) => boolean;
  onFocusRow: (row: number) => void;
  ref?: Ref<SheetGridHandle>;
}

/** Few rows are drawn at a time, so that a sheet of thousands is as quick as a short one. */
export function SheetGrid({ ref, ...props }: SheetGridProps) {
  const { content, sheet, spreadType, readOnly, currentRow, doubtedRows } = props;
  const { rows, units } = content;
  const frame = useRef<HTMLDivElement>(null);
  const columns = gridColumns(spreadType);
  const rowHeight = useMediaQuery('(pointer: coarse)') ? 45 : 33;
  const { start, end, scrollToRow } = useRowWindow(frame, rows.length, rowHeight);
  const focusCell = useGridFocus(frame, scrollToRow);
  useImperativeHandle(ref, () => ({ focusCell }), [focusCell]);
  const onKey = (row: number, column: GridColumn, event: KeyboardEvent<HTMLInputElement>) => {
    const move = cellMove(event);
    if (!move) return;
    const nextRow = row + move.rows;
    const nextColumn = columns[columns.indexOf(column) + move.columns];
    if (nextRow < 0 || nextRow >= rows.length || nextColumn === undefined) return;
    event.preventDefault();
    focusCell({ row: nextRow, column: nextColumn });
  };
  const onPaste = (row: number, column: GridColumn, event: ClipboardEvent<HTMLInputElement>) => {
    if (readOnly) return;
    if (props.onPaste({ row, column }, event.clipboardData.getData('text'))) event.preventDefault();
  };
  return (
    <div
      ref={frame}
      className="max-h-[70vh] min-h-64 scroll-pt-12 scroll-pr-16 scroll-pl-11 overflow-auto border border-rule bg-sheet"
    >
      <table aria-label="Readings" aria-rowcount={rows.length + 1} className="w-full border-collapse">
        <GridHead columns={columns} spreadType={spreadType} units={units} />
        <Spacer height={start * rowHeight} />
        <tbody>
          {rows.slice(start, end).map((row, i) => {
            const index = start + i;
            const line = sheet.lines[index];
            if (!line) return null;
            return (
              <SheetRowView
                key={index}
                index={index}
                row={row}
                line={line}
                columns={columns}
                units={units}
                spreadType={spreadType}
                readOnly={readOnly}
                isCurrent={index === currentRow}
                isDoubted={doubtedRows.has(index + 1)}
                onText={props.onText}
                onKey={onKey}
                onPaste={onPaste}
                onFocusRow={props.onFocusRow}
                onExclude={props.onExclude}
              />
            );
          })}
        </tbody>
        <Spacer height={(rows.length - end) * rowHeight} />
      </table>
    </div>
  );
}

/** Stands for the rows that are not drawn. */
const Spacer = ({ height }: { height: number }) =>
  height > 0 ? (
    <tbody aria-hidden>
      <tr style={{ height }} />
    </tbody>
  ) : null;

/** What the sheet computes stands after what is written, on another ground; where there is no room ρa stays at the edge. */
const DerivedHeads = () => (
  <>
    <HeadCell name="K" unit="m" className="min-w-15 bg-sunken text-right" />
    <HeadCell name="ρa" unit="Ω·m" className="sticky right-0 z-10 min-w-15 bg-sunken text-right" />
    <HeadCell name="total" unit="error" className="min-w-14 bg-sunken text-right" />
  </>
);

interface GridHeadProps {
  columns: readonly GridColumn[];
  spreadType: SpreadType;
  units: SheetUnits;
}

function GridHead({ columns, spreadType, units }: GridHeadProps) {
  return (
    <thead className="sticky top-0 z-20 bg-paper shadow-[inset_0_-1px_0_var(--edge)]">
      <tr aria-rowindex={1}>
        <th scope="col" className="sticky left-0 z-10 w-10 bg-paper px-2 text-right text-sm">
          <span className="sr-only">Row</span>
        </th>
        {columns.map((column) => (
          <Fragment key={column}>
            {column === 'excluded' ? <DerivedHeads /> : null}
            <HeadCell
              name={gridColumnName(column, spreadType)}
              unit={gridColumnUnit(column, units)}
              className={gridColumnLook(column)}
            />
          </Fragment>
        ))}
      </tr>
    </thead>
  );
}

function HeadCell({ name, unit, className }: { name: string; unit: string; className: string }) {
  return (
    <th
      scope="col"
      className={classNames('border-l border-rule px-1.5 py-1 text-sm leading-tight', className)}
    >
      {name}
      <span className="block font-normal text-muted">{unit === '' ? '\u00a0' : unit}</span>
    </th>
  );
}

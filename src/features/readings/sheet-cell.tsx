import type { ClipboardEvent, KeyboardEvent } from 'react';
import { classNames } from '../../ui/class-names';
import type { SheetFault } from './sheet-reader';
import type { GridColumn } from './sheet-rows';
import { cellId } from './use-grid-focus';

export interface CellHandlers {
  onText: (row: number, column: GridColumn, text: string) => void;
  onKey: (row: number, column: GridColumn, event: KeyboardEvent<HTMLInputElement>) => void;
  onPaste: (row: number, column: GridColumn, event: ClipboardEvent<HTMLInputElement>) => void;
  onFocusRow: (row: number) => void;
}

interface SheetCellProps extends CellHandlers {
  row: number;
  column: GridColumn;
  name: string;
  text: string;
  /** Shown in place of an empty text: what follows from the other cells. */
  derived?: string;
  fault: SheetFault | undefined;
  alignLeft: boolean;
  readOnly: boolean;
}

/** A number of no more than so many characters is never cut off; the sheet scrolls instead. */
const MOST_DIGITS_SHOWN = 24;

export function SheetCell(props: SheetCellProps) {
  const { row, column, name, text, derived, fault, alignLeft, readOnly } = props;
  const faultId = `fault-${row}-${column}`;
  const length = Math.min(Math.max(text.length, derived?.length ?? 0), MOST_DIGITS_SHOWN);
  return (
    <td className={classNames('group relative border-l border-rule p-0', fault && 'bg-rust-tint')}>
      <input
        type="text"
        data-cell={cellId({ row, column })}
        aria-label={`Row ${row + 1}, ${name}`}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? faultId : undefined}
        autoComplete="off"
        spellCheck={column === 'remark'}
        inputMode={alignLeft ? 'text' : 'decimal'}
        maxLength={500}
        readOnly={readOnly}
        title={text === '' ? undefined : text}
        value={text}
        placeholder={derived}
        onChange={(event) => props.onText(row, column, event.target.value)}
        onKeyDown={(event) => props.onKey(row, column, event)}
        onPaste={(event) => props.onPaste(row, column, event)}
        onFocus={() => props.onFocusRow(row)}
        style={alignLeft ? undefined : { minWidth: `calc(${length}ch + 0.8rem)` }}
        className={classNames(
          'block h-8 w-full min-w-0 bg-transparent px-1.5 text-ellipsis outline-none touch:h-11',
          'focus:bg-sheet focus:inset-ring-2 focus:inset-ring-water',
          fault && 'text-rust inset-ring inset-ring-rust',
          alignLeft ? '' : 'figure text-right',
        )}
      />
      {fault ? (
        <span
          id={faultId}
          className="pointer-events-none absolute top-full left-0 z-20 hidden w-max max-w-72 rounded border border-rust bg-sheet px-2 py-1 text-sm whitespace-normal shadow-lift group-focus-within:block"
        >
          {fault.found === '' ? '' : `“${fault.found}” `}
          {fault.message}. Allowed: {fault.allowed}.
        </span>
      ) : null}
    </td>
  );
}

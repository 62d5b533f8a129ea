import { Fragment, memo } from 'react';
import type { SheetRow, SheetUnits } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';
import { classNames } from '../../ui/class-names';
import { formatRelativeError, formatSignificant } from '../../ui/format';
import { gridColumnName, isTextColumn } from './sheet-columns-view';
import { SheetCell, type CellHandlers } from './sheet-cell';
import type { SheetFault, SheetLine } from './sheet-reader';
import { cellOf, type GridColumn } from './sheet-rows';

export interface SheetRowViewProps extends CellHandlers {
  index: number;
  row: SheetRow;
  line: SheetLine;
  columns: readonly GridColumn[];
  units: SheetUnits;
  spreadType: SpreadType;
  readOnly: boolean;
  isCurrent: boolean;
  isDoubted: boolean;
  onExclude: (row: number, excluded: boolean) => void;
}

export const SheetRowView = memo(function SheetRowView(props: SheetRowViewProps) {
  const { index, row, line, columns, spreadType, readOnly, isCurrent, isDoubted, ...handlers } = props;
  const isExcluded = row.excluded !== null;
  const faults = faultsByColumn(line);
  const wholeRow = faults.get('row');
  return (
    <tr
      aria-rowindex={index + 2}
      className={classNames(
        'h-[33px] border-b border-rule touch:h-[45px]',
        isCurrent && 'bg-sunken',
        isExcluded && 'text-muted',
      )}
    >
      <th
        scope="row"
        title={wholeRow?.message}
        className={classNames(
          'figure sticky left-0 z-10 border-r border-rule px-2 text-right text-sm font-normal',
          isCurrent ? 'bg-sunken text-ink' : 'bg-paper text-muted',
          wholeRow && 'bg-rust-tint text-rust',
        )}
      >
        {isDoubted ? (
          <span className="text-copper" title="A check below names this reading">
            ▸
          </span>
        ) : null}
        {index + 1}
      </th>
      {columns.map((column) =>
        column === 'excluded' ? (
          <Fragment key={column}>
            <DerivedCells line={line} />
            <ExcludedCell {...props} fault={faults.get('excluded')} />
          </Fragment>
        ) : (
          <SheetCell
            key={column}
            {...handlers}
            row={index}
            column={column}
            name={gridColumnName(column, spreadType)}
            text={cellOf(row, column)}
            derived={column === 'resistance' ? derivedResistance(line) : undefined}
            fault={faults.get(column)}
            alignLeft={isTextColumn(column)}
            readOnly={readOnly}
          />
        ),
      )}
    </tr>
  );
});

function ExcludedCell(props: SheetRowViewProps & { fault: SheetFault | undefined }) {
  const { index, row, readOnly, onExclude, fault } = props;
  const isExcluded = row.excluded !== null;
  if (isExcluded)
    return (
      <SheetCell
        {...props}
        row={index}
        column="excluded"
        name="reason for leaving it out"
        text={row.excluded ?? ''}
        derived="why?"
        fault={fault}
        alignLeft
      />
    );
  return (
    <td className="border-l border-rule px-1 text-center">
      {readOnly ? null : (
        <button
          type="button"
          aria-label={`Leave out row ${index + 1}`}
          title="Leave this reading out, with a reason"
          onFocus={() => props.onFocusRow(index)}
          onClick={() => onExclude(index, true)}
          className="inline-flex size-6 items-center justify-center rounded text-muted hover:bg-sunken hover:text-ink touch:size-11"
        >
          <svg aria-hidden width="10" height="10" viewBox="0 0 10 10">
            <path d="M5 0.7 9.3 5 5 9.3 0.7 5z" fill="none" stroke="currentColor" />
          </svg>
        </button>
      )}
    </td>
  );
}

function DerivedCells({ line }: { line: SheetLine }) {
  const derived = line.parsed?.derived;
  const cell = 'figure border-l border-rule bg-sunken px-1.5 text-right whitespace-nowrap';
  return (
    <>
      <td className={cell}>
        {line.geometricFactorM === null ? '' : formatSignificant(line.geometricFactorM, 4)}
      </td>
      <td className={classNames(cell, 'sticky right-0 z-10 font-semibold')}>
        {derived ? formatSignificant(derived.apparentResistivityOhmM, 4) : ''}
      </td>
      <td className={cell}>{derived ? formatRelativeError(derived.relativeError) : ''}</td>
    </>
  );
}

function derivedResistance(line: SheetLine): string | undefined {
  const resistance = line.parsed?.derived?.resistanceOhm;
  return resistance === null || resistance === undefined ? undefined : formatSignificant(resistance, 4);
}

function faultsByColumn({ parsed }: SheetLine): Map<string, SheetFault> {
  const faults = parsed?.faults ?? [];
  return new Map(faults.map((fault) => [fault.column, { ...fault, row: 0, columnName: '' }]));
}

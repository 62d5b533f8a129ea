import { Minus, Plus } from 'lucide-react';
import type { FitResult } from '../../../server/contract/fit-result';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import { DETERMINATION_SOURCE } from '../../../inversion';
import { BedSwatch } from '../../runs/bed-swatch';
import { isRejected } from '../../runs/rejected-fit';
import { boundaryDepths } from '../../charts/chart-data';
import { Checkbox } from '../../ui/checkbox';
import { classNames } from '../../ui/class-names';
import { formatLength, formatSignificant } from '../../ui/format';
import { IconButton } from '../../ui/icon-button';
import { Sentence } from '../../ui/sentence';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { BedRange } from './bed-range';
import { HAND_LIMITS, MAX_BEDS, withBedSplit, withoutBed, withValue, type ModelValue } from './hand-model';
import { heldKey } from './hand-model-store';
import { ValueCell } from './value-cell';

export interface BedTableProps {
  earth: LayeredEarthModel;
  /** Of the run that is shown untouched; null for a model by hand, whose doubt nobody has computed. */
  result: FitResult | null;
  /** Values held in the run that is shown, and those to be held in the next. */
  heldInRun: readonly string[];
  held: readonly string[];
  /** Null for one who may read but not fit. */
  onEdit: ((earth: LayeredEarthModel) => void) | null;
  onHold: ((value: ModelValue, held: boolean) => void) | null;
  selectedBed: number | null;
  onSelectBed: (bed: number | null) => void;
}

/** The beds in numbers: values that can be edited, what limits them, and what the next fit holds. */
export function BedTable(props: BedTableProps) {
  const { earth } = props;
  return (
    <div>
      <Table caption="Beds">
        <TableHead>
          <HeaderCell>Bed</HeaderCell>
          <HeaderCell unit="Ω·m">ρ</HeaderCell>
          <HeaderCell unit="m">Thickness</HeaderCell>
          <HeaderCell numeric unit="m" className="hidden sm:table-cell">
            Base
          </HeaderCell>
          {props.onEdit ? (
            <HeaderCell>
              <span className="sr-only">Change</span>
            </HeaderCell>
          ) : null}
        </TableHead>
        <TableBody>
          {earth.resistivity.map((_, index) => (
            <BedRow key={index} {...props} index={index} />
          ))}
        </TableBody>
      </Table>
      {props.result ? (
        <p className="mt-1.5 max-w-prose text-sm text-muted">
          <Sentence text={noteOf(props.result, props)} />
        </p>
      ) : null}
    </div>
  );
}

const HELD_NOTE = 'A held value has no range, and the ranges of the others hold only if it is right.';

function noteOf(result: FitResult, { heldInRun, onHold }: BedTableProps): string {
  // What ranges are worth where the readings reject the model is said once, beside its misfit.
  const ranges = isRejected(result)
    ? 'Under each value its 95\u00a0% range.'
    : `Under each value its 95\u00a0% range, then how well it is known, with its factor ×÷. ${DETERMINATION_SOURCE}.`;
  return [
    ranges,
    heldInRun.length > 0 ? HELD_NOTE : '',
    onHold ? 'A ticked value is held in the next fit.' : '',
  ]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

function BedRow(props: BedTableProps & { index: number }) {
  const { earth, index, onEdit, selectedBed, onSelectBed } = props;
  const base = boundaryDepths(earth)[index];
  const resistivity = earth.resistivity[index] ?? 0;
  return (
    <TableRow
      selected={selectedBed === index}
      onFocus={() => onSelectBed(index)}
      onClick={() => onSelectBed(index)}
    >
      <Cell className="align-top leading-8 whitespace-nowrap">
        <BedSwatch resistivity={resistivity} /> <span className="figure">{index + 1}</span>
      </Cell>
      <ValueCells {...props} value={{ on: 'resistivity', index }} />
      {base === undefined ? (
        <>
          <Cell className="align-top leading-8 whitespace-nowrap text-muted">to any depth</Cell>
          <Cell className="hidden sm:table-cell" />
        </>
      ) : (
        <>
          <ValueCells {...props} value={{ on: 'thickness', index }} />
          <Cell numeric className="hidden align-top leading-8 sm:table-cell">
            {formatLength(base)}
          </Cell>
        </>
      )}
      {onEdit ? <ChangeCell earth={earth} index={index} onEdit={onEdit} /> : null}
    </TableRow>
  );
}

interface ChangeCellProps {
  earth: LayeredEarthModel;
  index: number;
  onEdit: (earth: LayeredEarthModel) => void;
}

function ChangeCell({ earth, index, onEdit }: ChangeCellProps) {
  return (
    <Cell className="text-right align-top whitespace-nowrap">
      <span className="-mx-2.5 inline-flex flex-col sm:mx-0 sm:flex-row">
        <IconButton
          label={`Split bed ${index + 1} in two`}
          icon={<Plus aria-hidden size={15} />}
          disabled={earth.resistivity.length >= MAX_BEDS}
          onClick={() => onEdit(withBedSplit(earth, index))}
        />
        <IconButton
          label={`Take bed ${index + 1} away`}
          icon={<Minus aria-hidden size={15} />}
          disabled={earth.resistivity.length < 2}
          onClick={() => onEdit(withoutBed(earth, index))}
        />
      </span>
    </Cell>
  );
}

function ValueCells(props: BedTableProps & { value: ModelValue }) {
  const { earth, value, result, held, heldInRun, onEdit, onHold } = props;
  const { on, index } = value;
  const words = `${on} of bed ${index + 1}`;
  const number = earth[on][index] ?? Number.NaN;
  const isHeld = held.includes(heldKey(value));
  return (
    <Cell className="align-top whitespace-nowrap">
      <span className="flex min-h-8 items-start gap-1">
        {onHold ? (
          <Checkbox
            labelHidden
            label={`Hold the ${words} in the next fit`}
            title={isHeld ? 'Held in the next fit' : 'Hold in the next fit'}
            checked={isHeld}
            onChange={(event) => onHold(value, event.target.checked)}
          />
        ) : null}
        {onEdit ? (
          <ValueCell
            key={formatSignificant(number, 6)}
            label={`${on === 'resistivity' ? 'Resistivity' : 'Thickness'} of bed ${index + 1}`}
            value={number}
            unit={on === 'resistivity' ? 'Ω·m' : 'm'}
            limits={HAND_LIMITS[on]}
            onCommit={(next) => onEdit(withValue(earth, value, next))}
          />
        ) : (
          <span className="figure px-1.5">{formatSignificant(number)}</span>
        )}
      </span>
      {result ? (
        <div className={onHold ? 'pl-6.5' : 'pl-1.5'}>
          <BedRange result={result} value={value} heldInRun={heldInRun} />
        </div>
      ) : null}
      {on === 'thickness' ? (
        <span className={classNames('figure block text-sm sm:hidden', onHold ? 'pl-6.5' : 'pl-1.5')}>
          <span className="font-sans text-muted">base</span> {formatLength(boundaryDepths(earth)[index] ?? 0)}
        </span>
      ) : null}
    </Cell>
  );
}

import { Minus, Plus } from 'lucide-react';
import type { FitResult, LayeredEarthModel } from '../../../server/contract/fit';
import { determinationOf, DETERMINATION_SOURCE, DETERMINATION_WORDS } from '../../runs/determination';
import { BedSwatch } from '../../runs/bed-swatch';
import { boundaryDepths } from '../../charts/chart-data';
import { Checkbox } from '../../ui/checkbox';
import { formatLength, formatRange, formatResistivity, formatSignificant } from '../../ui/format';
import { IconButton } from '../../ui/icon-button';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { MAX_BEDS, withBedSplit, withoutBed, withValue, type ModelValue } from './hand-model';
import { heldKey } from './hand-model-store';
import { ValueCell } from './value-cell';

export interface BedTableProps {
  earth: LayeredEarthModel;
  /** Of the run that is shown untouched; null for a model by hand, whose doubt nobody has computed. */
  result: FitResult | null;
  /** Values held in the run that is shown, and those to be held in the next. */
  heldInRun: readonly string[];
  held: readonly string[];
  onEdit: (earth: LayeredEarthModel) => void;
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
          <HeaderCell>
            <span className="sr-only">Change</span>
          </HeaderCell>
        </TableHead>
        <TableBody>
          {earth.resistivity.map((_, index) => (
            <BedRow key={index} {...props} index={index} />
          ))}
        </TableBody>
      </Table>
      <p className="mt-1.5 text-sm text-muted">
        {props.result
          ? `Under each value its 95 % range. ${DETERMINATION_SOURCE}. A ticked value is held in the next fit.`
          : 'A model by hand has no ranges; fit it to see what the readings tell of it.'}
      </p>
    </div>
  );
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
        <Cell colSpan={2} className="align-top leading-8 text-muted">
          to any depth
        </Cell>
      ) : (
        <>
          <ValueCells {...props} value={{ on: 'thickness', index }} />
          <Cell numeric className="hidden align-top leading-8 sm:table-cell">
            {formatLength(base)}
          </Cell>
        </>
      )}
      <Cell className="text-right align-top whitespace-nowrap">
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
      </Cell>
    </TableRow>
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
      <span className="flex min-h-8 items-center gap-1">
        {onHold ? (
          <Checkbox
            labelHidden
            label={`Hold the ${words} in the next fit`}
            title={isHeld ? 'Held in the next fit' : 'Hold in the next fit'}
            checked={isHeld}
            onChange={(event) => onHold(value, event.target.checked)}
          />
        ) : null}
        <ValueCell
          key={formatSignificant(number, 6)}
          label={`${on === 'resistivity' ? 'Resistivity' : 'Thickness'} of bed ${index + 1}`}
          value={number}
          onCommit={(next) => onEdit(withValue(earth, value, next))}
        />
      </span>
      {result ? (
        <div className={onHold ? 'pl-6.5' : 'pl-1.5'}>
          <RangeText result={result} value={value} heldInRun={heldInRun} />
        </div>
      ) : null}
    </Cell>
  );
}

interface RangeTextProps {
  result: FitResult;
  value: ModelValue;
  heldInRun: readonly string[];
}

function RangeText({ result, value, heldInRun }: RangeTextProps) {
  const { on, index } = value;
  const isHeld = heldInRun.includes(heldKey(value));
  const factor = result.factors[on][index] ?? null;
  const grade = determinationOf(factor, isHeld);
  const format = on === 'resistivity' ? formatResistivity : formatLength;
  return (
    <span className="block pb-1 leading-tight">
      {isHeld ? null : (
        <span className="figure block text-sm">
          {formatRange(result.intervals[on][index] ?? [null, null], format)}
        </span>
      )}
      <span className="block text-xs text-muted">
        {DETERMINATION_WORDS[grade]}
        {isHeld || factor === null ? null : <span className="figure"> ×÷{formatSignificant(factor, 3)}</span>}
      </span>
    </span>
  );
}
